import { and, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { memberships, people } from "../../db/schema/people";

/** One membership, by carrier and person: another carrier's people are not found (K7). */
export function thatMember(carrierId: string, personId: string) {
  return and(eq(memberships.carrierId, carrierId), eq(memberships.personId, personId));
}

export async function findMember(tx: Db, carrierId: string, personId: string) {
  const [row] = await tx
    .select({ member: memberships, email: people.email })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(thatMember(carrierId, personId));
  return row ?? null;
}
