import { and, asc, eq, isNotNull, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { memberships } from "../../db/schema/people";
import { thatMember } from "./that-member";

/** Puts a person at a place in the on-call line, or out of it; the others close up. */
export async function placeOnCall(
  tx: Db,
  carrierId: string,
  personId: string,
  place: number | null,
): Promise<void> {
  const line = await tx
    .select({ personId: memberships.personId, order: memberships.onCallOrder })
    .from(memberships)
    .where(
      and(
        eq(memberships.carrierId, carrierId),
        isNull(memberships.deactivatedAt),
        isNotNull(memberships.onCallOrder),
      ),
    )
    .orderBy(asc(memberships.onCallOrder), asc(memberships.personId));
  const was = new Map(line.map((entry) => [entry.personId, entry.order]));
  const order = line.map((entry) => entry.personId).filter((id) => id !== personId);
  if (place === null) {
    if (was.has(personId)) await setOrder(tx, carrierId, personId, null);
  } else {
    order.splice(place - 1, 0, personId);
  }
  for (const [index, id] of order.entries()) {
    if (was.get(id) !== index + 1) await setOrder(tx, carrierId, id, index + 1);
  }
}

async function setOrder(tx: Db, carrierId: string, personId: string, order: number | null) {
  await tx.update(memberships).set({ onCallOrder: order }).where(thatMember(carrierId, personId));
}
