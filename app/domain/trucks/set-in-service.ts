import type { Db } from "../../db/client";
import { trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { StandingWord } from "../../trade/standing/standing";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import { ok, type Result } from "../refusals";
import { thatTruck } from "./read-setup";
import { writeSetupAudit } from "./setup-audit";

/** Takes a truck out of service, which holds its key, or puts it back. */
export async function setInService(
  db: Db,
  actor: Actor,
  { truckId, inService }: { truckId: string; inService: boolean },
  clock: Clock = systemClock,
): Promise<Result<{ standing: StandingWord }>> {
  const key = { carrierId: actor.carrierId, truckId };
  const changed = await changeTruck(
    db,
    key,
    async (change) => {
      await change.tx.update(trucks).set({ inService }).where(thatTruck(key));
      const action = inService ? "truck.in-service" : "truck.out-of-service";
      await writeSetupAudit(change.tx, actor, change.now, action, truckId);
      change.note("truck", truckId);
    },
    { clock },
  );
  return changed.ok ? ok({ standing: changed.value.standing.word }) : changed;
}
