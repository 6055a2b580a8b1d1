import { and, desc, eq, gt, inArray, isNull, sql } from "drizzle-orm";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { handovers, returns } from "../../db/schema/handovers";
import { acknowledgements, runLimits, signOffs, tagChanges, tags } from "../../db/schema/tags";
import { datedTests, rounds, trucks } from "../../db/schema/trucks";
import { walks } from "../../db/schema/walks";
import type { Fitting, FittingKind } from "../../trade/fittings";
import { cannotDo } from "../../trade/sheet/cannot-do";
import type { StandingFacts, TagFact } from "../../trade/standing/facts";
import { hours } from "../durations";
import type { PolicySettings } from "../policy/settings";
import { asItHangs } from "../tags/as-it-hangs";
import { testsFor } from "../trucks/dated-tests";
import { lastPumpHours } from "../trucks/pump-hours";
import { readFittings } from "../trucks/read-setup";
import { addDays, yardDay, yardInstant } from "../yard-day";
import { roundFacts, testFacts, type YardClock } from "./due-facts";

export interface TruckKey {
  carrierId: string;
  truckId: string;
}

/** A walk counts at most 24 h and a takeover rests on one such walk: three days hold them all. */
const WALKS_BACK = hours(72);

async function readTruck(db: Db, key: TruckKey) {
  const [row] = await db
    .select({
      kind: trucks.kind,
      inService: trucks.inService,
      gateFault: trucks.gateFault,
      outHandover: trucks.outHandover,
      tagsSeq: trucks.tagsSeq,
      gateSeq: trucks.gateSeq,
      setupVersion: trucks.setupVersion,
      createdAt: trucks.createdAt,
      zone: yards.zone,
      shopOpensMinute: yards.shopOpensMinute,
      openHandover: handovers.id,
      openDriver: handovers.driverId,
      openSince: handovers.decidedAt,
    })
    .from(trucks)
    .innerJoin(yards, and(eq(yards.carrierId, trucks.carrierId), eq(yards.id, trucks.yardId)))
    .leftJoin(
      handovers,
      and(eq(handovers.carrierId, trucks.carrierId), eq(handovers.openTruck, trucks.id)),
    )
    .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)));
  if (!row) throw new Error("truck vanished inside its own transaction");
  return row;
}

/** An open tag, and the answer it came from; null for one hung beside the sheet. */
export type OpenTagFact = TagFact & { checkKey: string | null; problemKey: string | null };

/** Open tags with the newest change and the newest run-with-limit of each. */
export async function readOpenTags(db: Db, key: TruckKey, yard: YardClock): Promise<OpenTagFact[]> {
  const open = await db
    .select()
    .from(tags)
    .where(
      and(
        eq(tags.carrierId, key.carrierId),
        eq(tags.truckId, key.truckId),
        isNull(tags.signedOffAt),
      ),
    )
    .orderBy(tags.raisedAt, tags.id);
  if (open.length === 0) return [];
  const ids = open.map((tag) => tag.id);
  const changesSeen = await db
    .select()
    .from(tagChanges)
    .where(and(eq(tagChanges.carrierId, key.carrierId), inArray(tagChanges.tagId, ids)))
    .orderBy(tagChanges.changedAt, tagChanges.id);
  const leaves = await db
    .select()
    .from(runLimits)
    .where(and(eq(runLimits.carrierId, key.carrierId), inArray(runLimits.tagId, ids)))
    .orderBy(runLimits.signedAt, runLimits.id);
  return open.map((tag) => {
    const { worse, leave } = asItHangs(tag.id, changesSeen, leaves);
    const event = leave
      ? { id: leave.id, by: leave.signedBy }
      : worse
        ? { id: worse.id, by: worse.changedBy }
        : { id: tag.id, by: tag.raisedBy };
    return {
      id: tag.id,
      checkKey: tag.checkKey,
      problemKey: tag.problemKey,
      title: tag.title,
      colour: worse?.colour ?? tag.colour,
      limit: worse ? worse.limit : tag.limit,
      roadSafety: tag.roadSafety,
      raisedAt: tag.raisedAt.getTime(),
      runUntil: leave
        ? yardInstant(addDays(leave.untilDay, 1), yard.shopOpensMinute, yard.zone).getTime()
        : null,
      runLimit: leave?.limit ?? null,
      eventId: event.id,
      eventBy: event.by,
    };
  });
}

async function readWalks(db: Db, key: TruckKey, now: Date, setupVersion: number) {
  const rows = await db
    .select({
      id: walks.id,
      driverId: walks.driverId,
      kind: walks.kind,
      baseWalkId: walks.baseWalkId,
      countsFrom: walks.countsFrom,
      receivedAt: walks.receivedAt,
      clearsNot: walks.clearsNot,
      setupVersion: walks.setupVersion,
      limits: walks.limits,
    })
    .from(walks)
    .where(
      and(
        eq(walks.carrierId, key.carrierId),
        eq(walks.truckId, key.truckId),
        gt(walks.countsFrom, new Date(now.getTime() - WALKS_BACK)),
      ),
    )
    .orderBy(walks.countsFrom, walks.id);
  return rows.map(({ clearsNot, setupVersion: made, countsFrom, receivedAt, ...walk }) => ({
    ...walk,
    countsFrom: countsFrom.getTime(),
    receivedAt: receivedAt.getTime(),
    clears: clearsNot === null,
    setupCurrent: made === setupVersion,
  }));
}

async function readSeen(db: Db, key: TruckKey, since: Date) {
  const signed = await db
    .select({ id: signOffs.id, signedAt: signOffs.signedAt })
    .from(signOffs)
    .where(
      and(
        eq(signOffs.carrierId, key.carrierId),
        eq(signOffs.truckId, key.truckId),
        gt(signOffs.signedAt, since),
      ),
    );
  // A leave to run can be older than the review window and still be in force: take every
  // acknowledgement that may name it.
  const seen = await db
    .select({
      driverId: acknowledgements.driverId,
      items: acknowledgements.items,
      satisfied: acknowledgements.satisfied,
    })
    .from(acknowledgements)
    .where(
      and(
        eq(acknowledgements.carrierId, key.carrierId),
        eq(acknowledgements.truckId, key.truckId),
        gt(acknowledgements.receivedAt, new Date(since.getTime() - hours(24 * 150))),
      ),
    );
  return {
    signOffs: signed.map((s) => ({ id: s.id, signedAt: s.signedAt.getTime() })),
    acknowledgements: seen,
  };
}

async function readDayEnds(db: Db, key: TruckKey, now: Date) {
  const rows = await db
    .select({ driverId: returns.driverId, at: returns.returnedAt })
    .from(returns)
    .where(
      and(
        eq(returns.carrierId, key.carrierId),
        eq(returns.truckId, key.truckId),
        eq(returns.endsDay, true),
        gt(returns.returnedAt, new Date(now.getTime() - WALKS_BACK)),
      ),
    );
  return rows.map((row) => ({ driverId: row.driverId, at: row.at.getTime() }));
}

async function readDues(db: Db, key: TruckKey) {
  const ofTruck = <T extends typeof rounds | typeof datedTests>(table: T) =>
    and(eq(table.carrierId, key.carrierId), eq(table.truckId, key.truckId));
  const done = await db
    .select({ kind: rounds.kind, doneOn: rounds.doneOn, pumpHours: rounds.pumpHours })
    .from(rounds)
    .where(
      and(
        ofTruck(rounds),
        // Without a name of its own the inner table would hide the outer one: every truck's rounds.
        sql`(${rounds.kind}, ${rounds.doneOn}) in (select own.kind, max(own.done_on) from rounds own where own.carrier_id = ${rounds.carrierId} and own.truck_id = ${rounds.truckId} group by own.kind)`,
      ),
    )
    .orderBy(desc(rounds.doneAt), desc(rounds.id));
  const tests = await db
    .select({ kind: datedTests.kind, dueOn: datedTests.dueOn })
    .from(datedTests)
    .where(ofTruck(datedTests))
    .orderBy(datedTests.recordedAt, datedTests.id);
  return { done, newest: [...new Map(tests.map((test) => [test.kind, test])).values()] };
}

/** The coupling is looked at with its guard off: shop work, on every drive that has one. */
export function needsShopWeekly(fitted: readonly Fitting[]): boolean {
  const drive = fitted.find((fitting) => fitting.kind === "drive")?.attributes.type;
  const coupled = fitted.some(({ kind }) => kind === "drive" || kind === "gearbox");
  return coupled && drive !== "direct";
}

export interface FactsRead {
  facts: Omit<StandingFacts, "openTags"> & { openTags: readonly OpenTagFact[] };
  tagsSeq: number;
  gateSeq: number;
}

/** All base rows that decide a truck's standing: a fixed number of statements. */
export async function readFacts(
  db: Db,
  key: TruckKey,
  policy: PolicySettings,
  now: Date,
): Promise<FactsRead> {
  const truck = await readTruck(db, key);
  const yard = { zone: truck.zone, shopOpensMinute: truck.shopOpensMinute };
  const since = new Date(now.getTime() - WALKS_BACK - hours(24 * policy.reviewDays));
  const openTags = await readOpenTags(db, key, yard);
  const walkFacts = await readWalks(db, key, now, truck.setupVersion);
  const seen = await readSeen(db, key, since);
  const dayEnds = await readDayEnds(db, key, now);
  const dues = await readDues(db, key);
  const pumpHours = (await lastPumpHours(db, key)) ?? 0;
  const fitted = await readFittings(db, key);
  const has = (kind: FittingKind) => fitted.some((fitting) => fitting.kind === kind);
  const byLaw = testsFor(truck.kind, fitted).filter((required) => required.byLaw);
  const entered = yardDay(truck.createdAt, truck.zone).day;
  return {
    tagsSeq: truck.tagsSeq,
    gateSeq: truck.gateSeq,
    facts: {
      inService: truck.inService,
      gateFault: truck.gateFault,
      out:
        truck.openHandover === null
          ? null
          : {
              handoverId: truck.openHandover,
              driverId: truck.openDriver!,
              since: truck.openSince!.getTime(),
            },
      tankL: fitted.find((fitting) => fitting.kind === "tank")?.attributes.volumeL ?? null,
      cannot: cannotDo(truck.kind, has),
      pumpHours,
      openTags,
      ...seen,
      walks: walkFacts,
      dayEnds,
      rounds: roundFacts(dues.done, entered, yard, policy, needsShopWeekly(fitted)),
      tests: testFacts(
        dues.newest,
        byLaw.map((required) => required.test),
        yard,
        policy,
      ),
    },
  };
}
