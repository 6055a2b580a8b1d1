import type { Db } from "../../db/client";
import type { Clock } from "../../services/clock";
import type { StandingWord } from "../../trade/standing/standing";
import type { Actor } from "../actor";
import { changeTruck, type GateChange } from "../gate/change-truck";
import { once, type Submission } from "../receipts/once";
import { ok, type Result, refuse } from "../refusals";
import { type OpenTag, readOpenTag, truckOfTag } from "./open-tag";

/** What every signature on a tag answers with. */
export interface TagReceipt {
  id: string;
  tagId: string;
  truckId: string;
  standing: StandingWord;
}

/**
 * A certifier's signature on an open tag: stored once (K4), with the gate that follows from it.
 * The effect writes its row and answers with what its receipt says beside the standing.
 */
export async function changeTag<More extends object>(
  db: Db,
  actor: Actor,
  about: { sent: Submission; tagId: string; clock: Clock },
  effect: (change: GateChange, tag: OpenTag) => Promise<More>,
): Promise<Result<TagReceipt & More>> {
  const { carrierId, personId } = actor;
  const { sent, tagId, clock } = about;
  return once(db, actor, sent, clock, async () => {
    const truckId = await truckOfTag(db, carrierId, tagId);
    if (!truckId) return refuse("not-found");
    const changed = await changeTruck(
      db,
      { carrierId, truckId },
      async (change) => {
        const tag = await readOpenTag(change.tx, carrierId, tagId);
        if (!tag) return change.deny("already-ended");
        const more = await effect(change, tag);
        change.moveTags();
        change.note(sent.kind, sent.id, { tagId });
        const receipt = (standing: StandingWord) => ({
          id: sent.id,
          tagId,
          truckId,
          standing,
          ...more,
        });
        change.receipt = { ...sent, personId, body: (after) => receipt(after.word) };
        return receipt;
      },
      { clock },
    );
    if (!changed.ok) return changed;
    return ok(changed.value.value(changed.value.standing.word));
  });
}
