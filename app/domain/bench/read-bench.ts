import { and, eq, inArray, isNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { people } from "../../db/schema/people";
import { photos, runLimits, tagChanges, tags } from "../../db/schema/tags";
import { trucks } from "../../db/schema/trucks";
import { colourRank } from "../../trade/limits";
import type { Actor } from "../actor";
import { asItHangs } from "../tags/as-it-hangs";

/** Open tags as they hang now, worst and oldest first, with their photos and any leave to run. */
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
      remote: tags.remote,
      raisedAt: tags.raisedAt,
      raisedBy: people.name,
      unitNumber: trucks.unitNumber,
      yardName: yards.name,
      zone: yards.zone,
    })
    .from(tags)
    .innerJoin(trucks, and(eq(trucks.carrierId, tags.carrierId), eq(trucks.id, tags.truckId)))
    .innerJoin(yards, and(eq(yards.carrierId, trucks.carrierId), eq(yards.id, trucks.yardId)))
    .innerJoin(people, eq(people.id, tags.raisedBy))
    .where(and(eq(tags.carrierId, carrierId), isNull(tags.signedOffAt)));
  if (open.length === 0) return [];
  const ids = open.map((tag) => tag.id);
  const promised = await db
    .select({ id: photos.id, tagId: photos.tagId, storedAt: photos.storedAt })
    .from(photos)
    .where(and(eq(photos.carrierId, carrierId), inArray(photos.tagId, ids)));
  const changes = await db
    .select()
    .from(tagChanges)
    .where(and(eq(tagChanges.carrierId, carrierId), inArray(tagChanges.tagId, ids)))
    .orderBy(tagChanges.changedAt, tagChanges.id);
  const leaves = await db
    .select()
    .from(runLimits)
    .where(and(eq(runLimits.carrierId, carrierId), inArray(runLimits.tagId, ids)))
    .orderBy(runLimits.signedAt, runLimits.id);
  return open
    .map((tag) => {
      const { worse, leave } = asItHangs(tag.id, changes, leaves);
      return {
        ...tag,
        colour: worse?.colour ?? tag.colour,
        limit: worse ? worse.limit : tag.limit,
        leave: leave && { untilDay: leave.untilDay, limit: leave.limit },
        photos: promised.filter((photo) => photo.tagId === tag.id),
      };
    })
    .sort(
      (a, b) =>
        colourRank(b.colour) - colourRank(a.colour) || a.raisedAt.getTime() - b.raisedAt.getTime(),
    );
}

export type BenchTag = Awaited<ReturnType<typeof readBench>>[number];
