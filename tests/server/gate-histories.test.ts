import { and, eq } from "drizzle-orm";
import fc from "fast-check";
import { v7 as uuidv7 } from "uuid";
import { expect, test } from "vitest";
import type { Db } from "~/db/client";
import { clearances } from "~/db/schema/handovers";
import { runLimits, signOffs, tags } from "~/db/schema/tags";
import { datedTests, fittings, sheetVersions, trucks } from "~/db/schema/trucks";
import { walks } from "~/db/schema/walks";
import { acknowledge } from "~/domain/acknowledgements/acknowledge";
import type { Actor } from "~/domain/actor";
import { changeTruck } from "~/domain/gate/change-truck";
import { readFacts } from "~/domain/gate/read-facts";
import { refreshExpired } from "~/domain/gate/ticker";
import { handOver } from "~/domain/handovers/hand-over";
import { takeBack } from "~/domain/handovers/take-back";
import { changePolicy } from "~/domain/policy/change-policy";
import { readPolicy } from "~/domain/policy/read-policy";
import { recordRound } from "~/domain/rounds/record-round";
import { allowRun } from "~/domain/tags/allow-run";
import { signOff } from "~/domain/tags/sign-off";
import { standing } from "~/trade/standing/standing";
import { testDb } from "./database";
import { makeCarrier, makePerson, makeTruck, TestClock, truckRow } from "./factories";
import { type ModelColour, type ModelEvent, mayTakeKey } from "./gate-model";

const HOUR = 3_600_000;
const OFFSET = "-07:00";
const signature = { name: "A Signer", wording: "test" };

function dayOf(ms: number): string {
  return new Date(ms - 7 * HOUR).toISOString().slice(0, 10);
}
function plusDays(day: string, days: number): string {
  return new Date(Date.parse(`${day}T00:00:00Z`) + days * 24 * HOUR).toISOString().slice(0, 10);
}
function plusMonth(day: string): string {
  const [year, month, date] = day.split("-").map(Number) as [number, number, number];
  const last = new Date(Date.UTC(year, month + 1, 0)).getUTCDate();
  return new Date(Date.UTC(year, month, Math.min(date, last))).toISOString().slice(0, 10);
}
const opening = (day: string) => Date.parse(`${day}T06:00:00${OFFSET}`);
const monthlyHolds = (done: string) => opening(plusDays(plusMonth(done), 6));

/** Weighted so that handovers end both ways often. */
const who = fc.constantFrom(0, 0, 0, 0, 1, 2);
const mostly = fc.constantFrom(true, true, true, true, true, false);
const step = fc.oneof(
  {
    weight: 9,
    arbitrary: fc.record({
      do: fc.constant("walk"),
      who,
      age: fc.constantFrom(0, 0, 1, 5, 23),
      clears: mostly,
      skips: fc.boolean(),
      tag: fc.constantFrom(
        null,
        null,
        null,
        null,
        null,
        null,
        "white",
        "yellow",
        "road-yellow",
        "red",
      ),
    }),
  },
  { weight: 1, arbitrary: fc.record({ do: fc.constant("takeover"), who, base: fc.nat(9) }) },
  { weight: 1, arbitrary: fc.record({ do: fc.constant("after"), who }) },
  { weight: 7, arbitrary: fc.record({ do: fc.constant("sign-off"), pick: fc.nat(9) }) },
  {
    weight: 3,
    arbitrary: fc.record({
      do: fc.constant("leave"),
      pick: fc.nat(9),
      days: fc.nat(3),
      deep: fc.boolean(),
    }),
  },
  { weight: 9, arbitrary: fc.record({ do: fc.constant("saw"), who, all: mostly }) },
  {
    weight: 12,
    arbitrary: fc.record({
      do: fc.constant("hand-over"),
      who,
      pressure: fc.boolean(),
      vacuum: fc.constantFrom(0, 40_000, 80_000),
    }),
  },
  { weight: 7, arbitrary: fc.record({ do: fc.constant("take-back"), ends: fc.boolean() }) },
  {
    weight: 3,
    arbitrary: fc.record({
      do: fc.constant("clock"),
      ms: fc.constantFrom(1000, 1000, HOUR, HOUR, 6 * HOUR, 24 * HOUR, 24 * 8 * HOUR),
    }),
  },
  { weight: 1, arbitrary: fc.record({ do: fc.constant("fitting") }) },
  { weight: 1, arbitrary: fc.record({ do: fc.constant("service"), on: mostly }) },
  {
    weight: 1,
    arbitrary: fc.record({ do: fc.constant("policy"), walkHours: fc.constantFrom(6, 12, 24) }),
  },
  {
    weight: 1,
    arbitrary: fc.record({
      do: fc.constant("test"),
      kind: fc.constantFrom("annual", "permit"),
      days: fc.integer({ min: -1, max: 40 }),
    }),
  },
  { weight: 3, arbitrary: fc.record({ do: fc.constant("round") }) },
);
interface Step {
  do: string;
  who: number;
  age: number;
  clears: boolean;
  skips: boolean;
  tag: string | null;
  base: number;
  pick: number;
  days: number;
  deep: boolean;
  all: boolean;
  pressure: boolean;
  vacuum: number;
  ends: boolean;
  ms: number;
  on: boolean;
  walkHours: number;
  kind: string;
}

class History {
  readonly clock = new TestClock();
  readonly events: ModelEvent[] = [];
  readonly tally = { handed: 0, refused: 0 };
  private sheetId = uuidv7();
  private latest: { id: string; by: string }[] = [];

  private constructor(
    private readonly db: Db,
    private readonly key: { carrierId: string; truckId: string },
    private readonly drivers: Actor[],
    private readonly mechanic: Actor,
    private readonly dispatcher: Actor,
    private readonly start: { walkHours: number; reviewDays: number; roundHoldsAt: number },
  ) {}

  static async begin(db: Db): Promise<History> {
    const clock = new TestClock();
    const carrier = await makeCarrier(db, clock, {}, "America/Phoenix");
    const people = [];
    for (let i = 0; i < 3; i += 1) people.push(await makePerson(db, carrier, ["driver"]));
    const mechanic = await makePerson(db, carrier, ["mechanic"]);
    const dispatcher = await makePerson(db, carrier, ["dispatcher"]);
    const truck = await makeTruck(db, carrier, clock, { bare: true });
    const key = { carrierId: truck.carrierId, truckId: truck.truckId };
    const roundHoldsAt = monthlyHolds(dayOf(clock.now().getTime()));
    const start = { walkHours: 24, reviewDays: 30, roundHoldsAt };
    const history = new History(db, key, people, mechanic, dispatcher, start);
    await history.sheet(1);
    await changeTruck(db, key, async () => undefined, { clock });
    return history;
  }

  private async sheet(setupVersion: number): Promise<void> {
    this.sheetId = uuidv7();
    const hash = this.sheetId.replaceAll("-", "").repeat(2);
    const row = { ...this.key, id: this.sheetId, hash, setupVersion, body: {} };
    await this.db.insert(sheetVersions).values({ ...row, createdAt: this.clock.now() });
  }

  private get now(): number {
    return this.clock.now().getTime();
  }

  private open() {
    const rows = this.events.flatMap((e) => (e.what === "tag" ? [e] : []));
    const gone = new Set(this.events.flatMap((e) => (e.what === "signed-off" ? [e.tag] : [])));
    return rows.filter((tag) => !gone.has(tag.id));
  }

  private async walk(s: Step, kind: "before" | "after" | "takeover", base: string | null) {
    const driver = this.drivers[s.who]!;
    const id = uuidv7();
    const from = this.now - (kind === "before" ? s.age * HOUR : 0);
    const clears = kind === "before" ? s.clears : true;
    const setupVersion = (await truckRow(this.db, this.key)).setupVersion;
    await this.sheetOnce(setupVersion);
    let tag: Extract<ModelEvent, { what: "tag" }> | null = null;
    if (kind === "before" && s.tag) {
      const colour = (s.tag === "road-yellow" ? "yellow" : s.tag) as ModelColour;
      const road = s.tag === "road-yellow" || colour === "red";
      const max = colour === "yellow" ? 60_000 : null;
      tag = {
        at: this.now,
        what: "tag",
        id: uuidv7(),
        by: driver.personId,
        colour,
        road,
        maxVacuumPa: max,
      };
    }
    const done = await changeTruck(
      this.db,
      this.key,
      async (change) => {
        await change.tx.insert(walks).values({
          ...this.key,
          id,
          driverId: driver.personId,
          kind,
          baseWalkId: base,
          sheetId: this.sheetId,
          setupVersion,
          hash: "0".repeat(64),
          signedAt: change.now,
          ageMs: this.now - from,
          receivedAt: change.now,
          countsFrom: new Date(from),
          yardDay: dayOf(from),
          complete: clears,
          clearsNot: clears ? null : "incomplete",
          limits: kind === "before" && s.skips ? [{ kind: "no-pressure-off-load" }] : [],
          missing: [],
          signature,
        });
        if (!tag) return;
        await change.tx.insert(tags).values({
          ...this.key,
          id: tag.id,
          walkId: id,
          colour: tag.colour,
          limit:
            tag.maxVacuumPa === null
              ? null
              : { kind: "vacuum-no-deeper", vacuumPa: tag.maxVacuumPa },
          title: "A defect",
          roadSafety: tag.road,
          raisedBy: tag.by,
          raisedAt: new Date(from),
          receivedAt: change.now,
        });
        change.moveTags();
      },
      { clock: this.clock },
    );
    expect(done.ok).toBe(true);
    const at = this.now;
    if (kind === "before") {
      this.events.push({
        at,
        what: "walk",
        id,
        by: driver.personId,
        from,
        clears,
        skipsPressure: s.skips,
      });
    } else if (kind === "after") this.events.push({ at, what: "after", by: driver.personId, from });
    else
      this.events.push({
        at,
        what: "takeover",
        id,
        by: driver.personId,
        from,
        clears,
        base: base!,
      });
    if (tag) this.events.push(tag);
  }

  private sheetVersion = 1;
  private hasRelief = true;
  private async sheetOnce(setupVersion: number) {
    if (setupVersion === this.sheetVersion) return;
    this.sheetVersion = setupVersion;
    await this.sheet(setupVersion);
  }

  private async see(s: Step) {
    const driver = this.drivers[s.who]!;
    const leaves = this.events.flatMap((e) => (e.what === "leave" ? [e.id] : []));
    const raised = this.events.flatMap((e) => (e.what === "tag" ? [e.id] : []));
    const ended = this.events.flatMap((e) => (e.what === "signed-off" ? [e.id] : []));
    const every = [...raised, ...leaves, ...ended];
    const items = s.all ? every : every.slice(0, -1);
    const input = { id: uuidv7(), truckId: this.key.truckId, items, satisfied: true };
    const rest = { disputesSignOffId: null, note: null, signature };
    const done = await acknowledge(this.db, driver, { ...input, ...rest }, this.clock);
    expect(done.ok).toBe(true);
    this.events.push({ at: this.now, what: "saw", by: driver.personId, ids: items });
  }

  private async end(s: Step) {
    const open = this.open();
    const tag = open[s.pick % Math.max(1, open.length)];
    if (!tag) return;
    const id = uuidv7();
    const work = {
      kind: "repaired" as const,
      work: "replaced" as const,
      parts: null,
      roadTested: null,
    };
    const input = { id, tagId: tag.id, remote: false, signature, ...work };
    const done = await signOff(this.db, this.mechanic, input, this.clock);
    expect(done.ok).toBe(true);
    this.events.push({ at: this.now, what: "signed-off", tag: tag.id, id });
  }

  private async leave(s: Step) {
    const yellow = this.open().filter((tag) => tag.colour === "yellow");
    const tag = yellow[s.pick % Math.max(1, yellow.length)];
    if (!tag) return;
    const id = uuidv7();
    const untilDay = plusDays(dayOf(this.now), s.days);
    const max = s.deep ? 70_000 : 30_000;
    const limit = { kind: "vacuum-no-deeper" as const, vacuumPa: max };
    const input = { id, tagId: tag.id, limit, untilDay, signature };
    const done = await allowRun(this.db, this.mechanic, input, this.clock);
    expect(done.ok).toBe(true);
    const until = opening(plusDays(untilDay, 1));
    const by = this.mechanic.personId;
    this.events.push({ at: this.now, what: "leave", tag: tag.id, id, by, until, maxVacuumPa: max });
  }

  private async handOver(s: Step) {
    const driver = this.drivers[s.who]!;
    const needs = { pressure: s.pressure as boolean, vacuumPa: s.vacuum as number };
    const expected = mayTakeKey(this.events, driver.personId, needs, this.now, this.start);
    const id = uuidv7();
    const asked = {
      pressureOffLoad: needs.pressure,
      towing: false,
      hazmat: false,
      vacuumPa: needs.vacuumPa,
      fillL: 0,
      hoseM: 0,
    };
    const input = {
      id,
      truckId: this.key.truckId,
      driverId: driver.personId,
      runName: "Run",
      needs: asked,
    };
    const done = await handOver(this.db, this.dispatcher, input, this.clock);
    const reasons = done.ok ? "" : JSON.stringify(done.refusal);
    expect(done.ok, `model says ${expected}, gate says ${reasons}`).toBe(expected);
    if (done.ok) {
      this.tally.handed += 1;
      this.latest.push({ id, by: driver.personId });
      this.events.push({ at: this.now, what: "out", by: driver.personId });
    } else {
      this.tally.refused += 1;
      expect(done.refusal.reasons?.length).toBeGreaterThan(0);
    }
  }

  private async takeBack(s: Step) {
    const out = this.latest.at(-1);
    if (!out) return;
    const input = { id: uuidv7(), handoverId: out.id, aboard: "empty" as const, pumpHours: null };
    const rest = { endsDay: s.ends as boolean, note: null };
    const done = await takeBack(this.db, this.dispatcher, { ...input, ...rest }, this.clock);
    const isOut =
      this.events.filter((e) => e.what === "out" || e.what === "back").at(-1)?.what === "out";
    expect(done.ok).toBe(isOut);
    if (done.ok)
      this.events.push({ at: this.now, what: "back", by: out.by, endsDay: rest.endsDay });
  }

  /** The pressure relief comes off the truck, or goes back on. */
  private async turnRelief() {
    const { db, key, clock } = this;
    this.hasRelief = !this.hasRelief;
    const { hasRelief } = this;
    const change = async ({ tx, now }: { tx: Db; now: Date }) => {
      await tx
        .update(fittings)
        .set({ removedAt: hasRelief ? null : now })
        .where(
          and(
            eq(fittings.carrierId, key.carrierId),
            eq(fittings.truckId, key.truckId),
            eq(fittings.kind, "pressure-relief"),
          ),
        );
    };
    await changeTruck(db, key, change, { clock, setup: true });
    this.events.push({ at: this.now, what: "fitting", hasRelief });
  }

  async take(s: Step): Promise<void> {
    this.clock.turn(1000);
    const { db, key, clock } = this;
    const bases = this.events.flatMap((e) => (e.what === "walk" ? [e.id] : []));
    switch (s.do) {
      case "walk":
        return this.walk(s, "before", null);
      case "after":
        return this.walk(s, "after", null);
      case "takeover": {
        const base = bases.at(-1 - (s.base % Math.max(1, bases.length)));
        return base ? this.walk(s, "takeover", base) : undefined;
      }
      case "saw":
        return this.see(s);
      case "sign-off":
        return this.end(s);
      case "leave":
        return this.leave(s);
      case "hand-over":
        return this.handOver(s);
      case "take-back":
        return this.takeBack(s);
      case "clock":
        this.clock.turn(s.ms);
        return;
      case "fitting":
        await this.turnRelief();
        return;
      case "service":
        await changeTruck(
          db,
          key,
          async ({ tx }) => {
            await tx
              .update(trucks)
              .set({ inService: s.on })
              .where(and(eq(trucks.carrierId, key.carrierId), eq(trucks.id, key.truckId)));
          },
          { clock },
        );
        this.events.push({ at: this.now, what: "service", on: s.on });
        return;
      case "policy": {
        const { settings } = await readPolicy(db, key.carrierId);
        await changePolicy(db, this.mechanic, { ...settings, walkHours: s.walkHours }, clock);
        this.events.push({ at: this.now, what: "policy", walkHours: s.walkHours });
        return;
      }
      case "test": {
        const dueOn = plusDays(dayOf(this.now), s.days);
        await changeTruck(
          db,
          key,
          async ({ tx, now }) => {
            await tx.insert(datedTests).values({
              ...key,
              id: uuidv7(),
              kind: s.kind,
              dueOn,
              recordedBy: this.mechanic.personId,
              recordedAt: now,
            });
          },
          { clock },
        );
        const holdsAt = Date.parse(`${plusDays(dueOn, 1)}T00:00:00${OFFSET}`);
        this.events.push({ at: this.now, what: "test", kind: s.kind, holdsAt });
        return;
      }
      case "round": {
        const doneOn = dayOf(this.now);
        await recordRound(
          db,
          this.mechanic,
          { id: uuidv7(), truckId: key.truckId, kind: "monthly", doneOn, pumpHours: null },
          clock,
        );
        this.events.push({ at: this.now, what: "round", holdsAt: monthlyHolds(doneOn) });
      }
    }
  }

  /** Stored equals derived: the gate's columns, the clearances, and the word while it is in date. */
  async check(): Promise<void> {
    const { db, key } = this;
    const policy = await readPolicy(db, key.carrierId);
    const now = this.clock.now();
    const { facts, tagsSeq } = await db.transaction((tx) =>
      readFacts(tx, key, policy.settings, now),
    );
    const derived = standing(facts, policy.settings, now.getTime());
    const stored = await truckRow(db, key);
    const ms = (at: Date | null) => at?.getTime() ?? null;
    expect(stored.gateFault).toBeNull();
    // Past its time a stored word is trusted by nobody; the ticker or the next event rewrites it.
    const inDate = stored.standingUntil === null || stored.standingUntil > now;
    if (!inDate) return;
    expect(stored.standing).toBe(derived.word);
    expect({
      openReds: stored.openReds,
      yellowBlockAt: ms(stored.yellowBlockAt),
      testsBlockAt: ms(stored.testsBlockAt),
      roundsBlockAt: ms(stored.roundsBlockAt),
      roundsBlockHours: stored.roundsBlockHours,
      limits: {
        mask: stored.limitsMask,
        vacuumPa: stored.limitVacuumPa,
        fillL: stored.limitFillL,
        hoseMm: stored.limitHoseMm,
      },
    }).toEqual(derived.gate);
    const rows = await db
      .select()
      .from(clearances)
      .where(and(eq(clearances.carrierId, key.carrierId), eq(clearances.truckId, key.truckId)));
    for (const row of rows) {
      const own = derived.clearances.find((c) => c.driverId === row.driverId);
      const live = own !== undefined && own.validUntil > now.getTime();
      expect(row.validUntil > now).toBe(live);
      if (live) expect(row.tagsSeq).toBe(own.unseen.length === 0 ? tagsSeq : -1);
    }
    const live = derived.clearances.filter((c) => c.validUntil > now.getTime());
    expect(rows.length).toBeGreaterThanOrEqual(live.length);
  }
}

const RUNS = Number(process.env.KEYPEG_HISTORIES ?? 60);
const total = { handed: 0, refused: 0 };

test("K1: random histories: gate and naive model agree on every handover, and stored equals derived", async () => {
  await fc.assert(
    fc.asyncProperty(fc.array(step, { minLength: 20, maxLength: 60 }), async (steps) => {
      const history = await History.begin(testDb());
      for (const one of steps) {
        await history.take(one as unknown as Step);
        await history.check();
        if (one.do === "clock") {
          await refreshExpired(testDb(), history.clock);
          await history.check();
        }
      }
      total.handed += history.tally.handed;
      total.refused += history.tally.refused;
    }),
    { numRuns: RUNS },
  );
  expect(total.handed, JSON.stringify(total)).toBeGreaterThan(RUNS / 10);
  expect(total.refused).toBeGreaterThan(RUNS);
}, 600_000);

test("both ends of a tag were reached by the histories", async () => {
  const db = testDb();
  expect((await db.select({ id: signOffs.id }).from(signOffs).limit(1)).length).toBe(1);
  expect((await db.select({ id: runLimits.id }).from(runLimits).limit(1)).length).toBe(1);
});
