import type { Limit } from "~/trade/limits";
import type { Check, Problem, ReadingSpec, Sheet } from "~/trade/sheet/check";
import { allChecks, dueChecks, roundChecks } from "~/trade/sheet/due-checks";
import { fromSi } from "~/trade/units";

const round = (value: number) => String(Math.round(value * 100) / 100);

function limit(limit: Limit | null): string {
  if (!limit) return "";
  switch (limit.kind) {
    case "vacuum-no-deeper":
      return ` [no deeper than ${round(fromSi(limit.vacuumPa, "inHg"))} inHg]`;
    case "fill-no-more":
      return ` [fill no more than ${round(limit.fillL / 3.785411784)} gal]`;
    case "hose-no-longer":
      return ` [hose no longer than ${round(fromSi(limit.hoseM, "ft"))} ft]`;
    default:
      return ` [${limit.kind}]`;
  }
}

function problem(one: Problem): string {
  const lowest = one.lowest === one.colour ? "" : `, at least ${one.lowest}`;
  const extras = [one.driverFix && "driver may fix", one.remote && "from photos"].filter(Boolean);
  const more = extras.length > 0 ? ` (${extras.join(", ")})` : "";
  return `${one.colour.toUpperCase().padEnd(6)} ${one.label}${lowest}${limit(one.limit)}${more}`;
}

function reading(spec: ReadingSpec): string {
  const value = (si: number | null) => (si === null ? "-" : round(fromSi(si, spec.unit)));
  const parts = [
    `${value(spec.scaleLow)}..${value(spec.scaleHigh)} ${spec.unit} by ${value(spec.step)}`,
    `band ${value(spec.low)}..${value(spec.high)}${spec.highExcluded ? " (excluded)" : ""}`,
    `stop ${value(spec.stop)}`,
  ];
  if (spec.ceiling !== null) parts.push(`air here ${value(spec.ceiling)}`);
  if (spec.seconds !== null) parts.push(`${spec.seconds} s`);
  if (spec.asksHeardOpen) parts.push("heard it open?");
  return parts.join("; ");
}

function lines(check: Check): string[] {
  const marks = [
    check.kind,
    check.cadence,
    check.walks.join("+"),
    check.who === "shop" && "shop",
    check.part,
    check.roadSafety && !check.part && "road safety",
    check.half && `${check.half} half`,
    check.locksRunUp && "locks run-up",
    check.mayBeNotFitted && "may be not fitted",
  ].filter(Boolean);
  return [
    `  ${check.label} — ${check.good}`,
    `    <${check.key}> ${marks.join(", ")}`,
    ...(check.caution ? [`    ! ${check.caution}`] : []),
    ...(check.reading ? [`    # ${reading(check.reading)}`] : []),
    ...(check.expected === null ? [] : [`    # expected ${check.expected}`]),
    ...check.steps.map((step, index) => `    ${index + 1}. ${step}`),
    ...check.problems.map((one) => `    - ${problem(one)}`),
  ];
}

/** How many checks each day brings, as a driver would count them. */
export function counts(sheet: Sheet) {
  return {
    daily: dueChecks(sheet, { walkKind: "before" }).length,
    withPressure: dueChecks(sheet, { walkKind: "before", halves: ["vacuum", "pressure"] }).length,
    weeklyDay: dueChecks(sheet, { walkKind: "before", weeklyDue: true }).length,
    after: dueChecks(sheet, { walkKind: "after" }).length,
    takeover: dueChecks(sheet, { walkKind: "takeover" }).length,
    weeklyShop: roundChecks(sheet, "weekly-shop").length,
    monthlyShop: roundChecks(sheet, "monthly").length,
    all: allChecks(sheet).length,
  };
}

/** A sheet as plain text, to be read through by a person. */
export function readableSheet(name: string, sheet: Sheet): string {
  const head = [
    `${name} (${sheet.kind})`,
    JSON.stringify(counts(sheet)),
    `halves: ${sheet.halves.join(", ") || "none"}; owes set points: ${sheet.missingSetPoints.join(", ") || "none"}`,
    `cannot: ${sheet.cannot.map((one) => one.kind).join(", ") || "-"}`,
  ];
  const body = sheet.stations.flatMap((station) => [
    "",
    `${station.label.toUpperCase()} — ${station.engine}${station.caution ? ` ! ${station.caution}` : ""}`,
    ...station.checks.flatMap(lines),
  ]);
  return `${[...head, ...body].join("\n")}\n`;
}
