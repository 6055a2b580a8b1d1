import { and, asc, desc, eq, isNotNull } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { fittings, trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { RequiredTest } from "../../trade/dated-tests";
import type { Fitting } from "../../trade/fittings";
import { plateLimits, SET_POINT_READINGS, type SetPointReading } from "../../trade/set-points";
import type { Actor } from "../actor";
import { days } from "../durations";
import { yardDay } from "../yard-day";
import { NO_LONGER_DUE, type RecordedTest, readTests, testsFor } from "./dated-tests";
import { readFittings, readSetPointRows, type SetPointRow } from "./read-setup";
import { vinWarning } from "./vin";

const SOON_MS = days(30);

export interface SetPointLine {
  reading: SetPointReading;
  /** Null: not set yet. */
  set: SetPointRow | null;
  /** Lowest of tank, pump and gauge; null when no plate says. */
  limit: { by: "tank" | "pump" | "gauge"; valueSi: number } | null;
}

export type TestState = "good" | "soon" | "past" | "never";
export interface TestLine {
  required: RequiredTest;
  recorded: RecordedTest | null;
  state: TestState;
}

async function readUnit(db: Db, carrierId: string, unitNumber: string) {
  const [row] = await db
    .select({
      truck: {
        id: trucks.id,
        unitNumber: trucks.unitNumber,
        kind: trucks.kind,
        vin: trucks.vin,
        inService: trucks.inService,
        standing: trucks.standing,
        standingUntil: trucks.standingUntil,
        detail: trucks.standingDetail,
        gateFault: trucks.gateFault,
      },
      yard: {
        id: yards.id,
        name: yards.name,
        zone: yards.zone,
        elevationM: yards.elevationM,
      },
    })
    .from(trucks)
    .innerJoin(yards, and(eq(yards.carrierId, trucks.carrierId), eq(yards.id, trucks.yardId)))
    .where(
      and(eq(trucks.carrierId, carrierId), eq(trucks.unitNumber, unitNumber.trim().toUpperCase())),
    );
  return row ?? null;
}

async function readRemoved(db: Db, key: { carrierId: string; truckId: string }) {
  return db
    .select({
      id: fittings.id,
      kind: fittings.kind,
      attributes: fittings.attributes,
      removedAt: fittings.removedAt,
    })
    .from(fittings)
    .where(
      and(
        eq(fittings.carrierId, key.carrierId),
        eq(fittings.truckId, key.truckId),
        isNotNull(fittings.removedAt),
      ),
    )
    .orderBy(desc(fittings.removedAt), asc(fittings.id));
}

/** Set points this truck has use for: reliefs it carries, its pump's speed, tires always. */
function setPointLines(fitted: readonly Fitting[], rows: readonly SetPointRow[]): SetPointLine[] {
  const has = (kind: Fitting["kind"]) => fitted.some((fitting) => fitting.kind === kind);
  const wanted: Record<SetPointReading, boolean> = {
    "vacuum-relief": has("vacuum-relief"),
    "pressure-relief": has("pressure-relief"),
    "pump-speed": has("pump"),
    "tire-pressure-steer": true,
    "tire-pressure": true,
  };
  return (Object.keys(SET_POINT_READINGS) as SetPointReading[]).flatMap((reading) => {
    const set = rows.find((row) => row.reading === reading) ?? null;
    if (!set && !wanted[reading]) return [];
    return [{ reading, set, limit: plateLimits(reading, fitted)[0] ?? null }];
  });
}

function stateOf(recorded: RecordedTest | null, today: string, soon: string): TestState {
  if (!recorded) return "never";
  if (recorded.dueOn < today) return "past";
  return recorded.dueOn <= soon ? "soon" : "good";
}

/** Everything the office keeps about one truck, by its unit number; null when there is none such. */
export async function truckSetup(
  db: Db,
  actor: Actor,
  unitNumber: string,
  clock: Clock = systemClock,
) {
  const { carrierId } = actor;
  const unit = await readUnit(db, carrierId, unitNumber);
  if (!unit) return null;
  const { truck, yard } = unit;
  const key = { carrierId, truckId: truck.id };
  const fitted = await readFittings(db, key);
  const recorded = (await readTests(db, key)).filter((test) => test.dueOn !== NO_LONGER_DUE);
  const required = testsFor(truck.kind, fitted);
  const now = clock.now();
  const today = yardDay(now, yard.zone).day;
  const soon = yardDay(new Date(now.getTime() + SOON_MS), yard.zone).day;
  const { standingUntil, ...rest } = truck;
  const past = standingUntil !== null && standingUntil <= now;
  return {
    truck: { ...rest, standing: past ? null : truck.standing, vinWarning: vinWarning(truck.vin) },
    yard,
    today,
    fittings: fitted,
    removed: await readRemoved(db, key),
    setPoints: setPointLines(fitted, await readSetPointRows(db, key)),
    tests: required.map((test): TestLine => {
      const known = recorded.find((one) => one.kind === test.test) ?? null;
      return { required: test, recorded: known, state: stateOf(known, today, soon) };
    }),
    /** Recorded, still counting, but no longer asked of this unit: an old plate's tests. */
    testsLeftOver: recorded.filter((test) => !required.some((one) => one.test === test.kind)),
  };
}
export type TruckSetup = NonNullable<Awaited<ReturnType<typeof truckSetup>>>;
