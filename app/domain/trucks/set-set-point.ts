import { and, eq, isNull } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { z } from "zod";
import type { Db } from "../../db/client";
import { setPoints } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import { greatestVacuum } from "../../trade/atmosphere";
import { judgeSetPoint, type SetPointInput } from "../../trade/set-points";
import { fromSi } from "../../trade/units";
import type { Actor } from "../actor";
import { changeTruck } from "../gate/change-truck";
import type { TruckKey } from "../gate/read-facts";
import { ok, type Result } from "../refusals";
import { yardOfTruck } from "../tags/yard-of-truck";
import { typedNumber, typedNumberOrNone } from "../typed-number";
import { figures } from "./fitting-attributes";
import { readFittings, readSetPointRows } from "./read-setup";
import { setPointFaults } from "./set-point-faults";
import { writeSetupAudit } from "./setup-audit";

export const setSetPointSchema = z.object({
  reading: z.string({ error: "reading-unknown" }).max(40),
  unit: z.string({ error: "unknown-unit" }).max(12, "unknown-unit"),
  setPoint: typedNumber,
  low: typedNumberOrNone,
  high: typedNumberOrNone,
  stop: typedNumberOrNone,
});
export type SetSetPointInput = z.infer<typeof setSetPointSchema> & { truckId: string };

export interface SetPointSet {
  changed: boolean;
  /** Set when the yard's air never allows this vacuum: the most there is here, in the unit typed. */
  greatestHere: { value: number; unit: string; yard: string } | null;
}

function activeOf(key: TruckKey, reading: string) {
  return and(
    eq(setPoints.carrierId, key.carrierId),
    eq(setPoints.truckId, key.truckId),
    eq(setPoints.reading, reading),
    isNull(setPoints.replacedAt),
  );
}

function sameAs(
  input: SetPointInput,
  row: { unit: string; entered: Omit<SetPointInput, "reading" | "unit"> },
) {
  const { setPoint, low, high, stop } = row.entered;
  return (
    input.unit === row.unit &&
    input.setPoint === setPoint &&
    input.low === low &&
    input.high === high &&
    input.stop === stop
  );
}

/**
 * Sets the value a reading should have, its band and its stop, as typed in the gauge's own
 * unit. Over the lowest of tank, pump and gauge it is refused; deeper than the yard's air it is
 * kept, and the answer says so.
 */
export async function setSetPoint(
  db: Db,
  actor: Actor,
  input: SetSetPointInput,
  clock: Clock = systemClock,
): Promise<Result<SetPointSet>> {
  const { truckId, ...typed } = input;
  const key = { carrierId: actor.carrierId, truckId };
  const [now] = (await readSetPointRows(db, key)).filter((row) => row.reading === typed.reading);
  if (now && sameAs(typed, now)) return ok({ changed: false, greatestHere: null });
  const changed = await changeTruck(
    db,
    key,
    async (change): Promise<SetPointSet> => {
      const { tx } = change;
      // Pressed twice, both may have come past the look above: here one waits for the other.
      const held = (await readSetPointRows(tx, key)).find((row) => row.reading === typed.reading);
      if (held && sameAs(typed, held)) throw new SetBefore("set before");
      const yard = await yardOfTruck(tx, key.carrierId, truckId);
      const verdict = judgeSetPoint(typed, await readFittings(tx, key), yard);
      if (!verdict.ok) {
        return change.deny("invalid", { fields: setPointFaults(verdict.faults, typed.unit) });
      }
      const { setPoint, reachableHere } = verdict;
      const relief = setPoint.reading === "vacuum-relief" || setPoint.reading === "pressure-relief";
      if (relief && setPoint.stopSi === null) {
        change.deny("invalid", { fields: [{ pointer: "/stop", code: "no-plate" }] });
      }
      await tx
        .update(setPoints)
        .set({ replacedAt: change.now })
        .where(activeOf(key, typed.reading));
      const id = uuidv7();
      const { reading, unit, ...entered } = typed;
      const { setPointSi, lowSi, highSi, stopSi } = setPoint;
      await tx.insert(setPoints).values({
        ...key,
        id,
        reading,
        unit,
        entered,
        setPointSi,
        lowSi,
        highSi,
        stopSi,
        setBy: actor.personId,
        setAt: change.now,
      });
      await writeSetupAudit(tx, actor, change.now, "set-point.set", id, typed);
      change.note("setup", id);
      const most = figures(fromSi(greatestVacuum(yard.elevationM), unit));
      return {
        changed: true,
        greatestHere: reachableHere ? null : { value: most, unit, yard: yard.name },
      };
    },
    { clock, setup: true },
  ).catch((error: unknown) => {
    if (error instanceof SetBefore) return ok({ value: { changed: false, greatestHere: null } });
    throw error;
  });
  return changed.ok ? ok(changed.value.value) : changed;
}

/** Rolls back what would end walks for nothing. */
class SetBefore extends Error {}

/** A set point is taken away: the half of the run-up that needs it cannot be run until there is one. */
export async function removeSetPoint(
  db: Db,
  actor: Actor,
  { truckId, reading }: { truckId: string; reading: string },
  clock: Clock = systemClock,
): Promise<Result<null>> {
  const key = { carrierId: actor.carrierId, truckId };
  const changed = await changeTruck(
    db,
    key,
    async (change) => {
      const [removed] = await change.tx
        .update(setPoints)
        .set({ replacedAt: change.now })
        .where(activeOf(key, reading));
      if (removed.affectedRows === 0) change.deny("not-found");
      await writeSetupAudit(change.tx, actor, change.now, "set-point.remove", truckId, { reading });
      change.note("setup", truckId);
    },
    { clock, setup: true },
  );
  return changed.ok ? ok(null) : changed;
}
