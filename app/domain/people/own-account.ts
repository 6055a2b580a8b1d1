import { and, eq, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { carriers } from "../../db/schema/carriers";
import { memberships, people, sessions } from "../../db/schema/people";
import type { Actor } from "../actor";
import { ok, type Result, refuse } from "../refusals";

export interface OwnAccount {
  email: string;
  phone: string | null;
  carriers: { id: string; name: string }[];
}

/** One's own address, number, and the carriers one works for. */
export async function readOwnAccount(db: Db, actor: Actor): Promise<OwnAccount> {
  const [person] = await db
    .select({ email: people.email, phone: people.phone })
    .from(people)
    .where(eq(people.id, actor.personId));
  if (!person) throw new Error("person vanished");
  const places = await db
    .select({ id: carriers.id, name: carriers.name })
    .from(memberships)
    .innerJoin(carriers, eq(carriers.id, memberships.carrierId))
    .where(and(eq(memberships.personId, actor.personId), isNull(memberships.deactivatedAt)))
    .orderBy(carriers.name);
  return { ...person, carriers: places };
}

/** Acts for another of one's carriers from now on, in this session. */
export async function switchCarrier(
  db: Db,
  actor: Actor,
  input: { sessionId: string; carrierId: string },
): Promise<Result<{ carrierId: string }>> {
  const { carrierId } = input;
  const account = await readOwnAccount(db, actor);
  if (!account.carriers.some((carrier) => carrier.id === carrierId)) return refuse("not-found");
  await db
    .update(sessions)
    .set({ carrierId })
    .where(and(eq(sessions.id, input.sessionId), eq(sessions.personId, actor.personId)));
  return ok({ carrierId });
}

/** The number others call. Null takes it away. */
export async function changeOwnPhone(
  db: Db,
  actor: Actor,
  input: { phone: string | null },
): Promise<Result<{ phone: string | null }>> {
  const { phone } = input;
  await db.update(people).set({ phone }).where(eq(people.id, actor.personId));
  return ok({ phone });
}
