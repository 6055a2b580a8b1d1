import { and, eq, isNull } from "drizzle-orm";
import { memberships, people } from "../../db/schema/people";
import { tags } from "../../db/schema/tags";
import { trucks } from "../../db/schema/trucks";
import type { GateChange } from "../gate/change-truck";
import { queueMail } from "../mail/queue-mail";

/** Tells the driver who raised the tag and the dispatchers that no red tag holds the key any more. */
export async function queueKeyFreed(
  change: GateChange,
  what: { carrierId: string; truckId: string; tagId: string; signOffId: string },
): Promise<void> {
  const { carrierId } = what;
  const [tag] = await change.tx
    .select({ title: tags.title, raisedBy: tags.raisedBy, unitNumber: trucks.unitNumber })
    .from(tags)
    .innerJoin(trucks, and(eq(trucks.carrierId, tags.carrierId), eq(trucks.id, tags.truckId)))
    .where(and(eq(tags.carrierId, carrierId), eq(tags.id, what.tagId)));
  if (!tag) return;
  const staff = await change.tx
    .select({ personId: people.id, email: people.email, roles: memberships.roles })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(and(eq(memberships.carrierId, carrierId), isNull(memberships.deactivatedAt)));
  const readers = staff.filter(
    (person) => person.personId === tag.raisedBy || person.roles.includes("dispatcher"),
  );
  await queueMail(
    change.tx,
    readers.map((person) => ({
      carrierId,
      dedupeKey: `key-freed:${what.signOffId}:${person.personId}`,
      recipient: person.email,
      template: "key-freed" as const,
      props: { unitNumber: tag.unitNumber, title: tag.title },
    })),
    change.now,
  );
}
