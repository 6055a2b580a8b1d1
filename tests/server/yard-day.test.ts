import { expect, test } from "vitest";
import { roundFacts, testFacts } from "~/domain/gate/due-facts";
import { DEFAULT_POLICY } from "~/domain/policy/settings";
import { addMonths, yardDay, yardInstant } from "~/domain/yard-day";

// Zone data: IANA tz database 2026f, through moment-timezone.
test.each([
  ["2026-03-08T06:59:59Z", "America/Denver", "2026-03-07"],
  ["2026-03-08T07:00:00Z", "America/Denver", "2026-03-08"],
  ["2026-11-02T06:59:59Z", "America/Denver", "2026-11-01"],
  ["2026-12-02T07:30:00Z", "America/Vancouver", "2026-12-02"],
])("IANA: at %s it is %s's %s", (instant, zone, day) => {
  expect(yardDay(new Date(instant), zone).day).toBe(day);
});

test("IANA 2026: British Columbia stays seven hours behind", () => {
  expect(yardDay(new Date("2026-12-02T07:30:00Z"), "America/Vancouver").offsetMinutes).toBe(-420);
});

test.each([
  ["2026-03-08", "2026-03-09", 23],
  ["2026-11-01", "2026-11-02", 25],
])("IANA: Denver's %s lasts until %s, %i hours", (day, next, hours) => {
  const from = yardInstant(day, 0, "America/Denver").getTime();
  const to = yardInstant(next, 0, "America/Denver").getTime();
  expect((to - from) / 3_600_000).toBe(hours);
});

test.each([
  ["2026-01-31", 1, "2026-02-28"],
  ["2026-01-31", 2, "2026-03-31"],
  ["2026-01-31", 3, "2026-04-30"],
])("months count from the anchor: %s and %i months is %s", (anchor, months, due) => {
  expect(addMonths(anchor, months)).toBe(due);
});

test("an unknown zone is an error, not UTC", () => {
  expect(() => yardDay(new Date(), "America/Nowhere")).toThrow(RangeError);
});

const yard = { zone: "America/Denver", shopOpensMinute: 360 };

test("a monthly round holds from the shop's opening after due and grace, never at midnight", () => {
  const [, monthly] = roundFacts(
    [{ kind: "monthly", doneOn: "2026-05-01", pumpHours: 100 }],
    "2026-01-01",
    yard,
    DEFAULT_POLICY,
  );
  expect(monthly).toMatchObject({ dueOn: "2026-06-01" });
  expect(new Date(monthly!.holdsAt!).toISOString()).toBe("2026-06-07T12:00:00.000Z");
});

test("a weekly round warns after its grace and never holds", () => {
  const [weekly] = roundFacts(
    [{ kind: "weekly", doneOn: "2026-06-01", pumpHours: null }],
    "2026-01-01",
    yard,
    DEFAULT_POLICY,
  );
  expect(weekly).toMatchObject({ dueOn: "2026-06-08", holdsAt: null });
  expect(new Date(weekly!.warnsAt!).toISOString()).toBe("2026-06-10T12:00:00.000Z");
});

test("pump hours hold at the interval and its grace, counted from the last round", () => {
  const policy = { ...DEFAULT_POLICY, monthlyEveryHours: 250 };
  const [, monthly] = roundFacts(
    [{ kind: "monthly", doneOn: "2026-05-01", pumpHours: 100 }],
    "2026-01-01",
    yard,
    policy,
  );
  expect(monthly?.holdsAtHours).toBe(375);
});

test("a date set by law has no grace: it holds from the first minute after its last day", () => {
  const [test_] = testFacts(
    [{ kind: "annual-inspection", dueOn: "2026-06-30" }],
    ["annual-inspection"],
    yard,
    DEFAULT_POLICY,
  );
  expect(new Date(test_!.holdsAt!).toISOString()).toBe("2026-07-01T06:00:00.000Z");
});

test("a test set by law that is not on file holds at once; a permit's paper only when it has a date", () => {
  const facts = testFacts([], ["annual-inspection"], yard, DEFAULT_POLICY);
  expect(facts).toEqual([
    { kind: "annual-inspection", dueOn: null, warnsAt: null, holdsAt: 0, holdsAtHours: null },
  ]);
});

test("what of the weekly round needs the shop is due by itself, warns after its grace and never holds", () => {
  const done = [
    { kind: "weekly", doneOn: "2026-06-08", pumpHours: null },
    { kind: "weekly-shop", doneOn: "2026-06-01", pumpHours: null },
  ] as const;
  const facts = roundFacts([...done], "2026-05-01", yard, DEFAULT_POLICY, true);
  const shop = facts.find((fact) => fact.kind === "weekly-shop");
  expect(shop).toMatchObject({ dueOn: "2026-06-08", holdsAt: null, holdsAtHours: null });
  expect(new Date(shop!.warnsAt!).toISOString()).toBe("2026-06-10T12:00:00.000Z");
  expect(roundFacts([...done], "2026-05-01", yard, DEFAULT_POLICY).map((f) => f.kind)).toEqual([
    "weekly",
    "monthly",
  ]);
});
