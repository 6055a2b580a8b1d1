import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { tagChanges, tags } from "../../db/schema/tags";
import { colourRank } from "../../trade/limits";
import type { Check, Sheet } from "../../trade/sheet/check";
import { allChecks } from "../../trade/sheet/due-checks";
import type { Judgement, OpenTag } from "../../trade/sheet/judge-answers";
import type { Actor } from "../actor";
import type { GateChange } from "../gate/change-truck";
import { readOpenTags, type TruckKey } from "../gate/read-facts";
import type { WalkBody } from "./walk-schema";

/** An open tag by what it says, with its id. */
export type HangingTag = OpenTag & { id: string };

/**
 * Tags the phone sent for what hangs already, by the id they came with: the open tag keeps the
 * finding, and a photo of it belongs to that one. A colour raised is a new finding.
 */
export function absorbedTags(
  body: WalkBody,
  judged: Judgement,
  openTags: readonly HangingTag[],
): Map<string, string> {
  const same = (a: { checkKey: string; problemKey: string }, b: typeof a) =>
    a.checkKey === b.checkKey && a.problemKey === b.problemKey;
  return new Map(
    body.tags
      .filter((sent) => !judged.tags.some((proposal) => same(proposal, sent)))
      .flatMap((sent): [string, string][] => {
        const open = openTags.find(
          (tag) => same(tag, sent) && colourRank(tag.colour) >= colourRank(sent.colour),
        );
        // The id of the open tag itself belongs to another record, which refuses it (K4).
        return open && open.id !== sent.id ? [[sent.id, open.id]] : [];
      }),
  );
}

/** Tag rows of a walk: one per problem answer, and any the driver hung beside. The driver's colour may only raise. */
function tagRows(
  body: WalkBody,
  judged: Judgement,
  byKey: Map<string, Check>,
  absorbed: ReadonlyMap<string, string>,
) {
  const proposed = judged.tags.map((proposal) => {
    const sent = body.tags.find(
      (tag) => tag.checkKey === proposal.checkKey && tag.problemKey === proposal.problemKey,
    );
    const raised = sent && colourRank(sent.colour) > colourRank(proposal.colour);
    const colour = raised ? sent.colour : proposal.colour;
    const limit = colour === "yellow" ? proposal.limit : null;
    return {
      ...proposal,
      id: sent?.id ?? uuidv7(),
      colour,
      limit,
      note: sent?.note ?? proposal.note,
    };
  });
  const used = new Set(proposed.map((tag) => tag.id));
  const beside = body.tags
    .filter((tag) => !used.has(tag.id) && !absorbed.has(tag.id))
    .map((tag) => {
      const check = byKey.get(tag.checkKey);
      const problem = check?.problems.find((known) => known.key === tag.problemKey);
      const least = problem?.lowest ?? "white";
      const colour = colourRank(tag.colour) < colourRank(least) ? least : tag.colour;
      const part = problem?.part ?? check?.part ?? null;
      return {
        ...tag,
        colour,
        limit: colour === "yellow" ? (problem?.limit ?? null) : null,
        title: check ? `${check.label}: ${problem?.label ?? tag.problemKey}` : tag.problemKey,
        part,
        fittingId: check?.fittingId ?? null,
        roadSafety: check ? check.roadSafety || part !== null : true,
        driverFix: problem?.driverFix ?? false,
        remote: problem?.remote ?? false,
      };
    });
  return [...proposed, ...beside];
}

/** Open tags as a new finding is compared with them. */
export async function comparableTags(tx: Db, key: TruckKey): Promise<HangingTag[]> {
  const open = await readOpenTags(tx, key, { zone: "UTC", shopOpensMinute: 0 });
  return open.flatMap(({ id, checkKey, problemKey, colour, limit }) =>
    checkKey && problemKey ? [{ id, checkKey, problemKey, colour, limit }] : [],
  );
}

/** Writes the tags of a walk as one statement; answers with what was hung. */
export async function hangTags(
  change: GateChange,
  actor: Actor,
  body: WalkBody,
  sheet: Sheet,
  judged: Judgement,
  raisedAt: Date,
  absorbed: ReadonlyMap<string, string>,
) {
  const byKey = new Map(allChecks(sheet).map((check) => [check.key, check]));
  const hung = tagRows(body, judged, byKey, absorbed);
  if (hung.length === 0) return hung;
  await change.tx.insert(tags).values(
    hung.map((tag) => ({
      carrierId: actor.carrierId,
      truckId: body.truckId,
      id: tag.id,
      walkId: body.id,
      checkKey: tag.checkKey,
      problemKey: tag.problemKey,
      fittingId: tag.fittingId,
      part: tag.part,
      colour: tag.colour,
      limit: tag.limit,
      title: tag.title.slice(0, 160),
      note: tag.note,
      roadSafety: tag.roadSafety,
      driverFix: tag.driverFix,
      remote: tag.remote,
      raisedBy: actor.personId,
      raisedAt,
      receivedAt: change.now,
    })),
  );
  change.moveTags();
  for (const tag of hung) change.note("tag", tag.id, { colour: tag.colour });
  return hung;
}

/** What the walk says of tags that hung before it: `worse` may raise a colour, nothing lowers one. */
export async function writeSeenTags(
  change: GateChange,
  actor: Actor,
  body: WalkBody,
): Promise<void> {
  if (body.seenTags.length === 0) return;
  const key = { carrierId: actor.carrierId, truckId: body.truckId };
  const open = await readOpenTags(change.tx, key, { zone: "UTC", shopOpensMinute: 0 });
  const rows = body.seenTags.flatMap((seen) => {
    const tag = open.find((known) => known.id === seen.tagId);
    if (!tag) return [];
    const asked = seen.seen === "worse" ? (seen.colour ?? tag.colour) : tag.colour;
    const colour = colourRank(asked) > colourRank(tag.colour) ? asked : tag.colour;
    const limit = colour === "yellow" ? tag.limit : null;
    const { id, tagId, seen: word, note } = seen;
    return [{ ...key, id, tagId, walkId: body.id, seen: word, colour, limit, note }];
  });
  if (rows.length === 0) return;
  await change.tx
    .insert(tagChanges)
    .values(rows.map((row) => ({ ...row, changedBy: actor.personId, changedAt: change.now })));
  if (rows.some((row) => row.seen === "worse")) change.moveTags();
}
