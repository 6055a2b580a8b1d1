import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "~/db/client";
import { carriers, feedHeads, policies, yards } from "~/db/schema/carriers";
import { memberships, people } from "~/db/schema/people";
import { datedTests, fittings, trucks } from "~/db/schema/trucks";
import type { Actor, Role } from "~/domain/actor";
import { DEFAULT_POLICY, type PolicySettings } from "~/domain/policy/settings";
import type { Clock } from "~/services/clock";
import type { FittingAttributes, FittingKind } from "~/trade/fittings";

/** A clock that stands until it is turned. */
export class TestClock implements Clock {
  constructor(private ms = Date.parse("2026-06-02T11:00:00.000Z")) {}
  now(): Date {
    return new Date(this.ms);
  }
  turn(byMs: number): void {
    this.ms += byMs;
  }
}

export interface TestCarrier {
  carrierId: string;
  yardId: string;
}

let serial = 0;

export async function makeCarrier(
  db: Db,
  clock: Clock,
  settings: Partial<PolicySettings> = {},
  zone = "America/Denver",
): Promise<TestCarrier> {
  const carrierId = uuidv7();
  const yardId = uuidv7();
  const createdAt = clock.now();
  serial += 1;
  await db.insert(carriers).values({ id: carrierId, name: `Carrier ${serial}`, createdAt });
  await db
    .insert(policies)
    .values({ carrierId, version: 1, settings: { ...DEFAULT_POLICY, ...settings }, createdAt });
  await db.insert(feedHeads).values({ carrierId });
  await db.insert(yards).values({
    carrierId,
    id: yardId,
    name: "Home Yard",
    zone,
    elevationM: 240,
    createdAt,
  });
  return { carrierId, yardId };
}

export async function makePerson(
  db: Db,
  carrier: TestCarrier,
  roles: Role[],
  more: { certifier?: boolean; name?: string } = {},
): Promise<Actor> {
  serial += 1;
  const personId = uuidv7();
  const name = more.name ?? `Person ${serial}`;
  const createdAt = new Date("2026-01-01T00:00:00Z");
  const certifier = more.certifier ?? roles.includes("mechanic");
  await db
    .insert(people)
    .values({ id: personId, email: `person-${serial}-${personId}@example.test`, name, createdAt });
  await db
    .insert(memberships)
    .values({ carrierId: carrier.carrierId, personId, roles, certifier, createdAt });
  return { carrierId: carrier.carrierId, personId, name, roles, certifier, yardId: null };
}

/** The least a truck is built of for a gate that asks for nothing but its tags and walks. */
const GATE_FITTINGS: [FittingKind, FittingAttributes][] = [
  ["pump", {}],
  ["pressure-relief", {}],
  ["hitch", {}],
];

/** What a plain three-thousand-gallon truck carries; enough for a whole check sheet. */
const PLAIN_FITTINGS: [FittingKind, FittingAttributes][] = [
  ["tank", { volumeL: 11356, maxPressurePa: 172_369, maxVacuumPa: 94_000 }],
  [
    "pump",
    {
      type: "vane",
      maxPressurePa: 103_421,
      maxVacuumPa: 91_432,
      flowM3s: 0.17,
      minRpm: 900,
      maxRpm: 1200,
    },
  ],
  ["drive", { type: "shaft" }],
  ["changeover-valve", {}],
  ["primary-shutoff", {}],
  ["secondary-trap", {}],
  ["oil-catch", {}],
  ["vacuum-relief", {}],
  ["pressure-relief", {}],
  [
    "compound-gauge",
    {
      maxPressurePa: 206_843,
      maxVacuumPa: 101_592,
      vacuumStepPa: 3386.39,
      pressureStepPa: 6894.76,
    },
  ],
  ["sight-glass", { count: 3 }],
  ["cap", { count: 4 }],
  ["rear-door", {}],
  ["air-brakes", {}],
];

export async function makeTruck(
  db: Db,
  carrier: TestCarrier,
  clock: Clock,
  more: { unitNumber?: string; bare?: boolean; untested?: boolean } = {},
): Promise<{ carrierId: string; truckId: string; unitNumber: string }> {
  serial += 1;
  const truckId = uuidv7();
  const unitNumber = more.unitNumber ?? `T-${1000 + serial}`;
  const createdAt = clock.now();
  await db.insert(trucks).values({
    carrierId: carrier.carrierId,
    id: truckId,
    unitNumber,
    kind: "powered",
    yardId: carrier.yardId,
    createdAt,
  });
  const carried = more.bare ? GATE_FITTINGS : [...PLAIN_FITTINGS, ["hitch", {}] as const];
  await db.insert(fittings).values(
    carried.map(([kind, attributes]) => ({
      carrierId: carrier.carrierId,
      id: uuidv7(),
      truckId,
      kind,
      attributes,
      fittedAt: createdAt,
    })),
  );
  if (!more.untested) {
    await db.insert(datedTests).values({
      carrierId: carrier.carrierId,
      id: uuidv7(),
      truckId,
      kind: "annual-inspection",
      dueOn: "2099-12-31",
      recordedBy: uuidv7(),
      recordedAt: createdAt,
    });
  }
  return { carrierId: carrier.carrierId, truckId, unitNumber };
}

export async function truckRow(db: Db, key: { carrierId: string; truckId: string }) {
  const [row] = await db
    .select()
    .from(trucks)
    .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)));
  if (!row) throw new Error("no such truck");
  return row;
}
