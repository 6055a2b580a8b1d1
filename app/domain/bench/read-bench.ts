import { and, eq, inArray, isNull, sql } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { people } from "../../db/schema/people";
import { photos, tags } from "../../db/schema/tags";
import { trucks } from "../../db/schema/trucks";
import type { Actor } from "../actor";

/** Open tags, worst and oldest first, with the photos promised and stored for each. */
export async function readBench(db: Db, actor: Actor) {
  const { carrierId } = actor;
  const open = await db
    .select({
      id: tags.id,
      title: tags.title,
      kind: tags.kind,
      colour: tags.colour,
      limit: tags.limit,
      note: tags.note,
      checkKey: tags.checkKey,
      roadSafety: tags.roadSafety,
      raisedAt: tags.raisedAt,
      raisedBy: people.name,
      truckId: trucks.id,
      unitNumber: trucks.unitNumber,
      standing: trucks.standing,
      yardName: yards.name,
      zone: yards.zone,
    })
    .from(tags)
    .innerJoin(trucks, and(eq(trucks.carrierId, tags.carrierId), eq(trucks.id, tags.truckId)))
    .innerJoin(yards, and(eq(yards.carrierId, trucks.carrierId), eq(yards.id, trucks.yardId)))
    .innerJoin(people, eq(people.id, tags.raisedBy))
    .where(and(eq(tags.carrierId, carrierId), isNull(tags.signedOffAt)))
    .orderBy(sql`field(${tags.colour}, 'red', 'yellow', 'white')`, tags.raisedAt);
  if (open.length === 0) return [];
  const promised = await db
    .select({ id: photos.id, tagId: photos.tagId, storedAt: photos.storedAt })
    .from(photos)
    .where(
      and(
        eq(photos.carrierId, carrierId),
        inArray(
          photos.tagId,
          open.map((tag) => tag.id),
        ),
      ),
    );
  return open.map((tag) => ({
    ...tag,
    photos: promised.filter((photo) => photo.tagId === tag.id),
  }));
}

export type BenchTag = Awaited<ReturnType<typeof readBench>>[number];
