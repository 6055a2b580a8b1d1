import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { audit } from "../../db/schema/people";
import { type Clock, systemClock } from "../../services/clock";
import type { StandingWord } from "../../trade/standing/standing";
import type { Actor } from "../actor";
import { ok, type Result } from "../refusals";
import { changeTruck } from "./change-truck";

/** A manager has looked at a gate fault: work the standing out anew. It stays held if it still cannot be. */
export async function clearGateFault(
  db: Db,
  actor: Actor,
  input: { truckId: string },
  clock: Clock = systemClock,
): Promise<Result<{ standing: StandingWord }>> {
  const { carrierId, personId } = actor;
  const changed = await changeTruck(
    db,
    { carrierId, truckId: input.truckId },
    async (change) => {
      await change.tx.insert(audit).values({
        carrierId,
        id: uuidv7(),
        at: change.now,
        actorId: personId,
        action: "gate-fault.clear",
        subjectId: input.truckId,
      });
    },
    { clock, clearFault: true },
  );
  return changed.ok ? ok({ standing: changed.value.standing.word }) : changed;
}
