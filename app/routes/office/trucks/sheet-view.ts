import { colours, limitWords, office, withUnit } from "~/text/en/office";
import type { Colour } from "~/trade/limits";
import { colourRank } from "~/trade/limits";
import {
  type Check,
  COULD_NOT_CHECK,
  NOT_FITTED,
  type Problem,
  type RunUpHalf,
  type Sheet,
} from "~/trade/sheet/check";
import { allChecks, dueChecks, roundChecks } from "~/trade/sheet/due-checks";
import { fromSi } from "~/trade/units";

/** Problems that end alike, on one line: colour, limit, and what they are called. */
export interface ProblemLine {
  colour: Colour;
  word: string;
  limit: string | null;
  labels: string[];
}

function problemLines(problems: readonly Problem[]): ProblemLine[] {
  const lines = new Map<string, ProblemLine>();
  for (const { key, label: name, colour, limit, driverFix } of problems) {
    if (key === COULD_NOT_CHECK || key === NOT_FITTED) continue;
    const words = limit ? limitWords(limit) : null;
    const label = driverFix ? office.sheet.driverFix(name) : name;
    const line = lines.get(`${colour} ${words}`);
    if (line) line.labels.push(label);
    else {
      lines.set(`${colour} ${words}`, {
        colour,
        word: colours[colour],
        limit: words,
        labels: [label],
      });
    }
  }
  return [...lines.values()].sort((a, b) => colourRank(b.colour) - colourRank(a.colour));
}

function numbers({ reading, expected }: Check): string[] {
  const words = office.sheet;
  const parts: string[] = [];
  if (expected !== null) parts.push(words.expected(expected));
  if (reading) {
    const amount = (si: number | null) =>
      si === null ? null : withUnit(fromSi(si, reading.unit), reading.unit);
    const point = amount(reading.setPoint);
    const stop = amount(reading.stop);
    if (point) parts.push(words.setPoint(point));
    if (reading.low !== null || reading.high !== null) {
      parts.push(office.truck.band(amount(reading.low), amount(reading.high)));
    }
    if (stop) parts.push(office.truck.stopAt(stop));
  }
  return parts;
}

function marks(check: Check): string[] {
  const words = office.sheet;
  const marked: string[] = [];
  if (check.cadence !== "daily") marked.push(words.cadence[check.cadence]);
  if (check.who === "shop") marked.push(words.shopWork);
  if (check.half) marked.push(words.half[check.half]);
  if (!check.walks.includes("before")) marked.push(words.onlyAfter);
  else if (check.walks.includes("after")) marked.push(words.alsoAfter);
  if (check.roadSafety) marked.push(words.roadSafety);
  if (check.locksRunUp) marked.push(words.locks);
  if (check.own) marked.push(words.own);
  return marked;
}

/** The sheet as it is printed: stations in walking order, and how many checks a day. */
export function sheetView(sheet: Sheet, { bothHalvesDaily }: { bothHalvesDaily: boolean }) {
  const halves: readonly RunUpHalf[] = bothHalvesDaily ? sheet.halves : ["vacuum"];
  const daily = dueChecks(sheet, { walkKind: "before", halves }).length;
  const before = (more: Parameters<typeof dueChecks>[1]) => dueChecks(sheet, more).length - daily;
  const weekly = allChecks(sheet).filter(
    (c) => c.cadence === "weekly" && c.who === "driver",
  ).length;
  return {
    daily,
    pressure: before({ walkKind: "before", halves: sheet.halves }),
    weekly,
    monthly: roundChecks(sheet, "monthly").length,
    after: dueChecks(sheet, { walkKind: "after" }).length,
    cannot: sheet.cannot.map(limitWords),
    missingSetPoints: sheet.missingSetPoints,
    stations: sheet.stations.map(({ key, label, engine, caution, checks }) => ({
      key,
      label,
      engine,
      caution,
      checks: checks.map((check) => ({
        key: check.key,
        label: check.label,
        good: check.good,
        caution: check.caution === caution ? null : check.caution,
        steps: check.steps,
        numbers: numbers(check),
        marks: marks(check),
        problems: problemLines(check.problems),
      })),
    })),
  };
}
export type SheetView = ReturnType<typeof sheetView>;
