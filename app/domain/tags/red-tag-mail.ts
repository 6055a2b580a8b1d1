import { and, eq, isNull } from "drizzle-orm";
import { memberships, people } from "../../db/schema/people";
import { trucks } from "../../db/schema/trucks";
import type { Colour } from "../../trade/limits";
import type { GateChange } from "../gate/change-truck";
import type { TruckKey } from "../gate/read-facts";
import { queueMail } from "../mail/queue-mail";

/** Tells certifiers and dispatchers, those of the truck's yard and those of none, of each red tag. */
export async function queueRedTags(
  change: GateChange,
  key: TruckKey,
  hung: readonly { id: string; colour: Colour; title: string }[],
): Promise<void> {
  const reds = hung.filter((tag) => tag.colour === "red");
  if (reds.length === 0) return;
  const [truck] = await change.tx
    .select({ unitNumber: trucks.unitNumber, yardId: trucks.yardId })
    .from(trucks)
    .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)));
  if (!truck) return;
  const staff = await change.tx
    .select({
      personId: people.id,
      email: people.email,
      roles: memberships.roles,
      certifier: memberships.certifier,
      yardId: memberships.yardId,
    })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(and(eq(memberships.carrierId, key.carrierId), isNull(memberships.deactivatedAt)));
  const readers = staff.filter(
    (person) =>
      (person.certifier || person.roles.includes("dispatcher")) &&
      (person.yardId === null || person.yardId === truck.yardId),
  );
  await queueMail(
    change.tx,
    reds.flatMap((tag) =>
      readers.map((person) => ({
        carrierId: key.carrierId,
        dedupeKey: `red-tag:${tag.id}:${person.personId}`,
        recipient: person.email,
        template: "red-tag" as const,
        props: { unitNumber: truck.unitNumber, title: tag.title },
      })),
    ),
    change.now,
  );
}
