import { and, eq, isNull, sql } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { memberships } from "../../db/schema/people";
import { ownChecks, trucks } from "../../db/schema/trucks";
import type { Actor } from "../actor";
import { readPolicy } from "../policy/read-policy";

const howMany = sql<number>`count(*)`.mapWith(Number);

/** How much the office keeps of each thing it sets up. */
export async function officeCounts(db: Db, { carrierId }: Actor) {
  const [yardCount] = await db
    .select({ howMany })
    .from(yards)
    .where(eq(yards.carrierId, carrierId));
  const [truckCount] = await db
    .select({
      howMany,
      outOfService: sql<number>`coalesce(sum(not ${trucks.inService}), 0)`.mapWith(Number),
    })
    .from(trucks)
    .where(eq(trucks.carrierId, carrierId));
  const [people] = await db
    .select({ howMany })
    .from(memberships)
    .where(and(eq(memberships.carrierId, carrierId), isNull(memberships.deactivatedAt)));
  const [checks] = await db
    .select({ howMany })
    .from(ownChecks)
    .where(and(eq(ownChecks.carrierId, carrierId), isNull(ownChecks.removedAt)));
  const policy = await readPolicy(db, carrierId);
  return {
    yards: yardCount?.howMany ?? 0,
    trucks: truckCount?.howMany ?? 0,
    outOfService: truckCount?.outOfService ?? 0,
    people: people?.howMany ?? 0,
    ownChecks: checks?.howMany ?? 0,
    policyVersion: policy.version,
  };
}
