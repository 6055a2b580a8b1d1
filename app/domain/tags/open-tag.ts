import { and, eq } from "drizzle-orm";
import { validate as isUuid } from "uuid";
import type { Db } from "../../db/client";
import { signOffs, tags } from "../../db/schema/tags";
import type { Limit } from "../../trade/limits";
import { readOpenTags } from "../gate/read-facts";
import type { SignableTag } from "./who-signs";

/** Where a tag hangs, scoped to the carrier. Null when there is no such tag here. */
export async function truckOfTag(db: Db, carrierId: string, tagId: string): Promise<string | null> {
  const [row] = await db
    .select({ truckId: tags.truckId })
    .from(tags)
    .where(and(eq(tags.carrierId, carrierId), eq(tags.id, tagId)));
  return row?.truckId ?? null;
}

/** What a tag forbids as it hangs now; null when it forbids nothing or is no open tag here. */
export async function limitOfTag(db: Db, carrierId: string, tagId: string): Promise<Limit | null> {
  if (!isUuid(tagId)) return null;
  const truckId = await truckOfTag(db, carrierId, tagId);
  if (!truckId) return null;
  const open = await readOpenTags(db, { carrierId, truckId }, { zone: "UTC", shopOpensMinute: 0 });
  return open.find((fact) => fact.id === tagId)?.limit ?? null;
}

export interface OpenTag extends SignableTag {
  id: string;
  truckId: string;
  title: string;
}

/**
 * A tag as it stands inside the transaction that wants to end or limit it: its colour is the
 * last one it was given. Null when it has been signed off.
 */
export async function readOpenTag(
  tx: Db,
  carrierId: string,
  tagId: string,
): Promise<OpenTag | null> {
  const [row] = await tx
    .select({ tag: tags, disputedSigner: signOffs.signedBy })
    .from(tags)
    .leftJoin(
      signOffs,
      and(eq(signOffs.carrierId, tags.carrierId), eq(signOffs.id, tags.disputesSignOffId)),
    )
    .where(and(eq(tags.carrierId, carrierId), eq(tags.id, tagId)));
  if (!row || row.tag.signedOffAt !== null) return null;
  const { tag } = row;
  const facts = await readOpenTags(
    tx,
    { carrierId, truckId: tag.truckId },
    { zone: "UTC", shopOpensMinute: 0 },
  );
  const now = facts.find((fact) => fact.id === tagId);
  return {
    id: tag.id,
    truckId: tag.truckId,
    title: tag.title,
    kind: tag.kind,
    colour: now?.colour ?? tag.colour,
    raisedBy: tag.raisedBy,
    fromWalk: tag.walkId !== null,
    roadSafety: tag.roadSafety,
    driverFix: tag.driverFix,
    remote: tag.remote,
    disputedSigner: row.disputedSigner,
  };
}
