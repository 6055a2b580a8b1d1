import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { yards } from "../../db/schema/carriers";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { writeChanges } from "../feed";
import { ok, type Result, refuse } from "../refusals";
import { Refused } from "../refused";
import { writeSetupAudit } from "../trucks/setup-audit";
import { holdYardNames, nameIsTaken } from "./read-yards";
import { readElevation, type YardInput } from "./yard-input";

/** A form sent twice is one yard. */
class SentBefore extends Error {
  constructor(readonly id: string) {
    super("sent before");
  }
}

/** The carrier's yard of that name, if all else of it is as typed too. */
async function sameYard(
  tx: Db,
  typed: Omit<typeof yards.$inferSelect, "id" | "createdAt">,
): Promise<{ id: string } | null> {
  const [known] = await tx
    .select()
    .from(yards)
    .where(and(eq(yards.carrierId, typed.carrierId), eq(yards.name, typed.name)));
  if (!known) return null;
  const { id, createdAt: _, ...stored } = known;
  const keys = Object.keys(stored) as (keyof typeof stored)[];
  return keys.every((key) => stored[key] === typed[key]) ? { id } : null;
}

/** A place where trucks sleep. */
export async function addYard(
  db: Db,
  actor: Actor,
  input: YardInput,
  clock: Clock = systemClock,
): Promise<Result<{ id: string }>> {
  const { carrierId } = actor;
  const elevation = readElevation(input, null);
  if (!elevation.ok) return refuse("invalid", { fields: [elevation.fault] });
  const id = uuidv7();
  const now = clock.now();
  const { name, zone, phone, winter, shopOpens } = input;
  const row = { name, zone, phone, winter, elevationM: elevation.elevationM };
  try {
    await inTransaction(db, async (tx) => {
      await holdYardNames(tx, carrierId);
      const before = await sameYard(tx, { ...row, carrierId, shopOpensMinute: shopOpens });
      if (before) throw new SentBefore(before.id);
      if (await nameIsTaken(tx, carrierId, name, null)) {
        const fields = [{ pointer: "/name", code: "yard-name-taken" }];
        throw new Refused(refuse("invalid", { fields }).refusal);
      }
      await tx
        .insert(yards)
        .values({ ...row, carrierId, id, shopOpensMinute: shopOpens, createdAt: now });
      await writeSetupAudit(tx, actor, now, "yard.add", id, row);
      await writeChanges(tx, carrierId, now, [{ kind: "yard", subjectId: id }]);
    });
  } catch (error) {
    if (error instanceof SentBefore) return ok({ id: error.id });
    if (error instanceof Refused) return { ok: false, refusal: error.refusal };
    throw error;
  }
  return ok({ id });
}
