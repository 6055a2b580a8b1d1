import type { Fitting } from "../fittings";
import { type Colour, colourRank, type Limit } from "../limits";
import type { SetPoint, SetPointReading } from "../set-points";
import { fromSi } from "../units";
import { cannotDo, halvesBuilt } from "./cannot-do";
import { CATALOGUE, stationsOf } from "./catalogue";
import type { CheckEntry, LimitOf, ProblemEntry } from "./catalogue-entry";
import type { CautionKey } from "./cautions";
import {
  CADENCES,
  type Cadence,
  type Check,
  COULD_NOT_CHECK,
  NOT_FITTED,
  type Problem,
  type Sheet,
  type Station,
  type StationKey,
  type UnitKind,
} from "./check";
import type { CheckText, SheetText, TextFacts } from "./sheet-text";
import { type TruckParts, truckParts, type Yard } from "./truck-parts";

/** One of the carrier's own checks, always a look. */
export interface OwnCheck {
  id: string;
  station: StationKey;
  cadence: Cadence;
  label: string;
  good: string;
  colour: Colour;
}

/** What a carrier changes in the catalogue: order within a station, and how often. */
export interface SheetChanges {
  /** Check keys; those named come first, in this order. */
  order?: readonly string[];
  cadence?: Readonly<Record<string, Cadence>>;
}

export interface SheetInput {
  kind: UnitKind;
  fittings: readonly Fitting[];
  setPoints: readonly SetPoint[];
  ownChecks: readonly OwnCheck[];
  changes?: SheetChanges;
  yard: Yard;
  text: SheetText;
}

/** Cautions of a whole station, shown on entering it. */
const STATION_CAUTIONS: Partial<Record<StationKey, CautionKey>> = {
  approach: "chocks",
  "pump-side": "stored-vacuum",
  cab: "chocks",
  rear: "clamp-under-pressure",
  "run-up": "at-the-controls",
  shop: "tank-air",
};

const DOWN: Readonly<Record<Colour, Colour>> = { red: "yellow", yellow: "white", white: "white" };

function limitFor(truck: TruckParts, limit: LimitOf | undefined): Limit | null {
  return (typeof limit === "function" ? limit(truck) : limit) ?? null;
}

function worst(problems: readonly { colour: Colour }[]): Colour {
  return problems.reduce<Colour>(
    (most, { colour }) => (colourRank(colour) > colourRank(most) ? colour : most),
    "white",
  );
}

function couldNotCheck(truck: TruckParts, entry: CheckEntry, own: readonly Problem[]) {
  if (entry.couldNotCheck) {
    const { colour, lowest = colour, limit } = entry.couldNotCheck;
    return { colour, lowest, limit: lowest === "red" ? null : limitFor(truck, limit) };
  }
  const colour = worst(own);
  const kept = isRoadSafety(entry) || entry.locksRunUp || entry.half !== undefined;
  const lowest = kept ? colour : DOWN[colour];
  const limit = own.find((problem) => problem.colour === "yellow" && problem.limit)?.limit ?? null;
  return { colour, lowest, limit: lowest === "red" ? null : limit };
}

function isRoadSafety(entry: CheckEntry): boolean {
  return entry.roadSafety ?? entry.part !== undefined;
}

/** A truck without its tank or its pump is another truck: that is for the office, not for an answer. */
function mayBeNotFitted(entry: CheckEntry): boolean {
  const kinds = [...(entry.from ?? []), ...(entry.each ? [entry.each] : [])];
  const made = kinds.length > 0 && !kinds.includes("tank") && !kinds.includes("pump");
  return made && !isRoadSafety(entry) && !entry.locksRunUp && entry.half === undefined;
}

function problemsFor(
  truck: TruckParts,
  entry: CheckEntry,
  words: SheetText,
  facts: TextFacts,
): Problem[] {
  const wordsOf = wordsFor(words, entry.key).problems;
  const own = entry.problems
    .filter(({ when }) => when === undefined || when(truck))
    .map((problem: ProblemEntry): Problem => {
      const label = wordsOf[problem.key];
      if (label === undefined) throw new Error(`no words for ${entry.key} "${problem.key}"`);
      const hands = problem.atTheTruck === undefined;
      const fromAfar = hands && !isRoadSafety(entry) && problem.part === undefined;
      return {
        key: problem.key,
        label: said(label, facts),
        colour: problem.colour,
        lowest: problem.colour,
        limit: problem.colour === "yellow" ? limitFor(truck, problem.limit) : null,
        driverFix: hands && (problem.driverFix ?? false),
        remote: fromAfar && (problem.remote ?? false),
        part: problem.part ?? null,
      };
    });
  const always: Problem[] = [
    {
      key: COULD_NOT_CHECK,
      label: words.couldNotCheck,
      ...couldNotCheck(truck, entry, own),
      driverFix: false,
      remote: false,
      part: null,
    },
  ];
  if (mayBeNotFitted(entry)) {
    always.push({
      key: NOT_FITTED,
      label: words.notFitted,
      colour: "white",
      lowest: "white",
      limit: null,
      driverFix: false,
      remote: true,
      part: null,
    });
  }
  return [...own, ...always];
}

function wordsFor(text: SheetText, key: string): CheckText {
  const words = text.checks[key];
  if (words === undefined) throw new Error(`no words for check ${key}`);
  return words;
}

function said<T>(line: T | ((facts: TextFacts) => T), facts: TextFacts): T {
  return typeof line === "function" ? (line as (facts: TextFacts) => T)(facts) : line;
}

/** What a line may say when it is about no number. */
function plainFacts(truck: TruckParts): TextFacts {
  return {
    count: 1,
    nth: null,
    type: null,
    low: null,
    high: null,
    setPoint: null,
    stop: null,
    ceiling: null,
    unit: "",
    winter: truck.yard.winter ?? false,
    towed: truck.kind === "towed",
    has: (kind) => truck.has(kind),
  };
}

/** One check, or one for each fitting; none where the truck gives no cause for it. */
function checksOf(station: StationKey, entry: CheckEntry, truck: TruckParts, text: SheetText) {
  if (entry.when && !entry.when(truck)) return [];
  if (entry.from && !truck.has(...entry.from)) return [];
  const fittings = entry.each
    ? truck.all(entry.each)
    : [entry.from ? (truck.all(...entry.from)[0] ?? null) : null];
  return fittings.flatMap((fitting, index): Check[] => {
    const reading = entry.reading?.(truck) ?? null;
    if (entry.reading && !reading) return [];
    const expected = entry.expected?.(truck) ?? null;
    const words = wordsFor(text, entry.key);
    const inUnit = (si: number | null | undefined) =>
      si === null || si === undefined || !reading
        ? null
        : Math.round(fromSi(si, reading.unit) * 100) / 100;
    const facts: TextFacts = {
      ...plainFacts(truck),
      count: expected ?? fitting?.attributes.count ?? 1,
      nth: fittings.length > 1 ? index + 1 : null,
      type: fitting?.attributes.type ?? null,
      low: inUnit(reading?.low),
      high: inUnit(reading?.high),
      setPoint: inUnit(reading?.setPoint),
      stop: inUnit(reading?.stop),
      ceiling: inUnit(reading?.ceiling),
      unit: reading?.unit ?? "",
    };
    const caution = typeof entry.caution === "function" ? entry.caution(truck) : entry.caution;
    return [
      {
        key: index === 0 ? entry.key : `${entry.key}.${index + 1}`,
        station,
        kind: entry.kind,
        cadence: entry.cadence ?? "daily",
        fittingId: fitting?.id ?? null,
        part: entry.part ?? null,
        roadSafety: isRoadSafety(entry),
        label: said(words.label, facts),
        good: said(words.good, facts),
        caution: caution ?? null,
        problems: problemsFor(truck, entry, text, facts),
        reading,
        drain: entry.drain ?? null,
        expected,
        steps: words.steps ? [...said(words.steps, facts)] : [],
        half: entry.half ?? null,
        locksRunUp: entry.locksRunUp ?? false,
        who: entry.who ?? "driver",
        walks: [...(entry.walks ?? (["before"] as const))],
        mayBeNotFitted: mayBeNotFitted(entry),
        own: false,
      },
    ];
  });
}

function ownCheck(own: OwnCheck, station: StationKey, text: SheetText): Check {
  const answer = { limit: null, driverFix: false, part: null };
  return {
    key: `own.${own.id}`,
    station,
    kind: "look",
    cadence: own.cadence,
    fittingId: null,
    part: null,
    roadSafety: false,
    label: own.label,
    good: own.good,
    caution: null,
    problems: [
      {
        ...answer,
        key: "not-right",
        label: text.notRight,
        colour: own.colour,
        lowest: own.colour,
        remote: true,
      },
      {
        ...answer,
        key: COULD_NOT_CHECK,
        label: text.couldNotCheck,
        colour: own.colour,
        lowest: DOWN[own.colour],
        remote: false,
      },
    ],
    reading: null,
    drain: null,
    expected: null,
    steps: [],
    half: null,
    locksRunUp: false,
    who: station === "shop" ? "shop" : "driver",
    walks: ["before"],
    mayBeNotFitted: false,
    own: true,
  };
}

/** Road-safety parts, the run-up and what unlocks it: a carrier may do them oftener, never less often. */
function atFloor(check: Check): boolean {
  return check.roadSafety || check.locksRunUp || check.half !== null;
}

function retimed(check: Check, cadence: Cadence | undefined): Check {
  if (cadence === undefined) return check;
  const rarer = CADENCES.indexOf(cadence) > CADENCES.indexOf(check.cadence);
  return rarer && atFloor(check) ? check : { ...check, cadence };
}

function reordered(checks: Check[], order: readonly string[]): Check[] {
  const place = (check: Check) => {
    const at = order.indexOf(check.key);
    return at === -1 ? order.length : at;
  };
  return [...checks].sort((a, b) => place(a) - place(b));
}

/**
 * The check sheet of one truck: every check its fittings give cause for, in walking order, and
 * the carrier's own. The same input gives the same sheet.
 *
 * An own check never goes between the steps of the run-up (it follows at the pull-out) and is
 * left out where the truck has no such station. Changes of order stay within a station and out
 * of the run-up; changes of timing never make a road-safety check rarer.
 * Throws when a check has no words: a fault of the build, not of the truck.
 */
export function makeSheet(input: SheetInput): Sheet {
  const { kind, fittings, setPoints, ownChecks, yard, text, changes = {} } = input;
  const truck = truckParts(kind, fittings, setPoints, yard);
  const order = changes.order ?? [];
  const stations = stationsOf(kind).flatMap((key): Station[] => {
    const made = CATALOGUE[key].flatMap((entry) => checksOf(key, entry, truck, text));
    const own = ownChecks
      .filter((check) => (check.station === "run-up" ? "pull-out" : check.station) === key)
      .map((check) => ownCheck(check, key, text));
    const timed = [...made, ...own].map((check) => retimed(check, changes.cadence?.[check.key]));
    const checks = key === "run-up" ? timed : reordered(timed, order);
    if (checks.length === 0) return [];
    const words = text.stations[key];
    const engine = said(words.engine, plainFacts(truck));
    return [{ key, label: words.label, engine, caution: STATION_CAUTIONS[key] ?? null, checks }];
  });

  const halves = halvesBuilt(truck.has);
  const ran = new Set(stations.flatMap((station) => station.checks.map((check) => check.half)));
  const missingSetPoints = halves
    .filter((half) => !ran.has(half))
    .map((half): SetPointReading => (half === "vacuum" ? "vacuum-relief" : "pressure-relief"));

  const cannot = cannotDo(kind, truck.has);
  return { format: 1, kind, stations, halves, missingSetPoints, cannot };
}
