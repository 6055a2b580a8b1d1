import fc from "fast-check";
import { expect, test } from "vitest";
import { daysAfter, daysBetween, monthsAfter, nthDue, roundDue } from "~/trade/rounds";

test("months count from the anchor and never slide", () => {
  const series = [1, 2, 3].map((nth) => nthDue("2026-01-31", { months: 1 }, nth));
  expect(series).toEqual(["2026-02-28", "2026-03-31", "2026-04-30"]);
  expect(nthDue("2024-02-29", { months: 12 })).toBe("2025-02-28");
  expect(nthDue("2024-02-29", { months: 12 }, 4)).toBe("2028-02-29");
  expect(monthsAfter("2026-01-15", -1)).toBe("2025-12-15");
});

// Computed by hand: 250 h leave 130 h, 20 days; 150 h leave 30 h, 4 days.
test("a round is due by the calendar or by pump hours, whichever is earlier", () => {
  const due = (every: number) =>
    roundDue("2026-02-01", { days: 30 }, "2026-02-20", { every, used: 120, perDay: 6.3 });
  expect(due(250)).toEqual({ dueOn: "2026-03-03", by: "calendar" });
  expect(due(150)).toEqual({ dueOn: "2026-02-24", by: "hours" });
});

test("a pump that stands is due by the calendar, and nothing divides by its rate", () => {
  const standing = { every: 250, used: 120, perDay: 0 };
  expect(roundDue("2026-02-01", { days: 30 }, "2026-02-20", standing)).toEqual({
    dueOn: "2026-03-03",
    by: "calendar",
  });
  expect(roundDue("2026-02-01", { days: 30 }, "2026-02-20", { ...standing, used: 251 })).toEqual({
    dueOn: "2026-02-20",
    by: "hours",
  });
});

test("days are calendar days, whatever a clock does", () => {
  expect(daysAfter("2026-03-07", 2)).toBe("2026-03-09");
  expect(daysAfter("2026-11-01", -1)).toBe("2026-10-31");
  expect(daysBetween("2026-02-01", "2026-03-03")).toBe(30);
});

test("what is not a day is refused", () => {
  for (const bad of ["2026-02-30", "2026-13-01", "2026-1-1", "", "yesterday"]) {
    expect(() => daysAfter(bad, 1)).toThrow(RangeError);
  }
});

test("days after and days between undo each other", () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 0, max: 20_000 }),
      fc.integer({ min: -400, max: 400 }),
      (a, b) => {
        const day = daysAfter("2000-01-01", a);
        expect(daysBetween(day, daysAfter(day, b))).toBe(b);
      },
    ),
  );
});
