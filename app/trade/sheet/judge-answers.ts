import { type Colour, colourRank, type Limit } from "../limits";
import { toSi, UnitError } from "../units";
import type { Answer, Answers, DrainAnswer, ProblemAnswer } from "./answers";
import { NO_PRESSURE, NO_VACUUM } from "./catalogue-entry";
import {
  type Check,
  COULD_NOT_CHECK,
  DRAIN_AMOUNTS,
  type DrainSpec,
  NOT_FITTED,
  type Problem,
  type Quantity,
  type RoadSafetyPart,
  type RunUpHalf,
  type Sheet,
  type WalkKind,
} from "./check";
import { allChecks } from "./due-checks";
import { judgeReading, QUANTITY_GROUPS, type ReadingVerdict } from "./judge-reading";

/** A tag that an answer hangs on the truck. Its limit is set only while it is yellow. */
export interface TagProposal {
  checkKey: string;
  problemKey: string;
  fittingId: string | null;
  part: RoadSafetyPart | null;
  colour: Colour;
  limit: Limit | null;
  /** "Primary shutoff: float ball missing". */
  title: string;
  roadSafety: boolean;
  driverFix: boolean;
  remote: boolean;
  note: string | null;
  photoIds: string[];
}

export interface JudgedReading {
  checkKey: string;
  fittingId: string | null;
  quantity: Quantity;
  /** As entered, in `unit`. */
  entered: number;
  unit: string;
  si: number;
  verdict: ReadingVerdict["word"] | "or-more";
}

/** An answer that cannot stand: it counts as missing. */
export interface AnswerFault {
  checkKey: string;
  code:
    | "unknown-check"
    | "wrong-kind"
    | "unknown-problem"
    | "unknown-unit"
    | "wrong-unit"
    | "off-scale"
    | "too-short"
    | "heard-it-open-missing"
    | "no-open-tag"
    | "always-fitted";
}

export interface Judgement {
  /** An answer that stands to every due check. */
  complete: boolean;
  /** Keys of due checks without one, in walking order. */
  missing: string[];
  tags: TagProposal[];
  /** From halves of the run-up that were not done. */
  limits: Limit[];
  readings: JudgedReading[];
  faults: AnswerFault[];
}

/** A tag already open on the truck, as far as a new finding is compared with it. */
export interface OpenTag {
  checkKey: string;
  problemKey: string;
  colour: Colour;
  limit: Limit | null;
}

export interface WalkContext {
  /** Default: before. Only that walk runs the pump up, so only it answers for a skipped half. */
  walkKind?: WalkKind;
  /** Tags open before this walk. Without them no "same, worse, gone" is accepted. */
  openTags?: readonly OpenTag[];
}

/** What one answer comes to. */
interface Finding {
  fault: AnswerFault["code"] | null;
  tags: TagProposal[];
  readings: JudgedReading[];
  /** Good enough to run the pump. */
  unlocks: boolean;
}

const RUN_UP_START = "run-up.pto-in";
const RUN_UP_END = "run-up.pto-out";
const LOAD_ABOARD = "approach.load-aboard";

const UNKNOWN: Finding = { fault: "unknown-check", tags: [], readings: [], unlocks: false };

function raised(problem: Problem, wish: Colour | undefined): Colour {
  if (wish === undefined) return problem.colour;
  return colourRank(wish) >= colourRank(problem.lowest) ? wish : problem.lowest;
}

/** A relief that opens early still allows the vacuum it was seen to hold. */
function limitAt(limit: Limit | null, vacuumPa: number | null): Limit | null {
  if (limit?.kind !== "vacuum-no-deeper") return limit;
  if (vacuumPa === null || vacuumPa < 1) return NO_VACUUM;
  return { kind: "vacuum-no-deeper", vacuumPa: Math.min(limit.vacuumPa, Math.floor(vacuumPa)) };
}

function proposal(
  check: Check,
  problem: Problem,
  colour: Colour,
  more: { vacuumPa?: number | null; note?: string; photoIds?: string[] } = {},
): TagProposal {
  const part = problem.part ?? check.part;
  return {
    checkKey: check.key,
    problemKey: problem.key,
    fittingId: check.fittingId,
    part,
    colour,
    limit: colour === "yellow" ? limitAt(problem.limit, more.vacuumPa ?? null) : null,
    title: `${check.label}: ${problem.label}`,
    roadSafety: check.roadSafety || part !== null,
    driverFix: problem.driverFix,
    remote: problem.remote,
    note: more.note ?? null,
    photoIds: more.photoIds ?? [],
  };
}

const amountRank = (amount: (typeof DRAIN_AMOUNTS)[number]) => DRAIN_AMOUNTS.indexOf(amount);

/** What was found outranks how much: of the findings that apply, the worst counts. */
function drainProblems(check: Check, drain: DrainSpec, answer: DrainAnswer): string[] {
  const colourOf = (key: string) =>
    colourRank(check.problems.find((problem) => problem.key === key)?.colour ?? "white");
  const found = drain.findings
    .filter((one) => one.what === answer.what && amountRank(one.from) <= amountRank(answer.amount))
    .sort((a, b) => colourOf(b.problem) - colourOf(a.problem))
    .slice(0, 1)
    .map((one) => one.problem);
  if (!answer.cracked) found.push(drain.notCracked);
  if (answer.saw === "frozen") found.push(drain.frozen);
  if (!answer.shutAgain) found.push(drain.notShut);
  return found;
}

/** Amounts as a reading, so that a trend can be drawn: "more" is kept as a gallon or more. */
const DRAINED: Readonly<Record<DrainAnswer["amount"], { entered: number; unit: string }>> = {
  none: { entered: 0, unit: "cup" },
  cup: { entered: 1, unit: "cup" },
  quart: { entered: 1, unit: "qt" },
  gallon: { entered: 1, unit: "gal" },
  more: { entered: 1, unit: "gal" },
};

function reading(
  check: Check,
  quantity: Quantity,
  entered: number,
  unit: string,
  verdict: JudgedReading["verdict"],
): JudgedReading {
  const si = toSi(entered, unit, QUANTITY_GROUPS[quantity]);
  return { checkKey: check.key, fittingId: check.fittingId, quantity, entered, unit, si, verdict };
}

/** The number of a reading or timed answer, and the problem it makes. */
function judgeNumber(
  check: Check,
  answer: Extract<Answer, { kind: "reading" | "timed" }>,
): { fault: AnswerFault["code"] } | { fault: null; reading: JudgedReading; found: string[] } {
  const spec = check.reading;
  if (!spec) return { fault: "wrong-kind" };
  const heard = answer.kind === "reading" ? answer.heardItOpen : undefined;
  if (spec.asksHeardOpen && heard === undefined) return { fault: "heard-it-open-missing" };
  if (answer.kind === "timed" && answer.seconds < (spec.seconds ?? 0))
    return { fault: "too-short" };
  const si = toSi(answer.value, answer.unit, QUANTITY_GROUPS[spec.quantity]);
  const verdict = judgeReading(spec, si, heard);
  if (verdict.word === "off-scale") return { fault: "off-scale" };
  return {
    fault: null,
    reading: reading(check, spec.quantity, answer.value, answer.unit, verdict.word),
    found: verdict.problemKey === null ? [] : [verdict.problemKey],
  };
}

/** Problems and readings that an answer of the check's own kind comes to. */
function judgeKind(
  check: Check,
  answer: Answer,
  openTags: readonly OpenTag[],
): Pick<Finding, "fault" | "readings"> & { found: ProblemAnswer[] } {
  const fault = (code: AnswerFault["code"]) => ({ fault: code, readings: [], found: [] });
  const stands = (found: string[], readings: JudgedReading[] = []) => ({
    fault: null,
    readings,
    found: found.map((key) => ({ key })),
  });
  const ownKind = ["look", "level", "drain", "count", "reading", "timed"].includes(answer.kind);
  if (ownKind && answer.kind !== check.kind) return fault("wrong-kind");
  switch (answer.kind) {
    case "look":
    case "problem":
      return stands([]);
    case "level": {
      const added = answer.toppedUp;
      return stands(
        answer.level === "ok" ? [] : [answer.level],
        added ? [reading(check, "topped-up", added.amount, added.unit, "recorded")] : [],
      );
    }
    case "drain": {
      if (!check.drain) return fault("wrong-kind");
      const { entered, unit } = DRAINED[answer.amount];
      const verdict = answer.amount === "more" ? "or-more" : "recorded";
      const seen = answer.cracked && answer.saw !== "frozen";
      return stands(
        drainProblems(check, check.drain, answer),
        seen ? [reading(check, "drained", entered, unit, verdict)] : [],
      );
    }
    case "count":
      return stands(answer.counted < (check.expected ?? 0) ? ["missing"] : []);
    case "reading":
    case "timed": {
      const judged = judgeNumber(check, answer);
      return judged.fault === null ? stands(judged.found, [judged.reading]) : fault(judged.fault);
    }
    case "could-not-check": {
      const { reason: note, colour: raisedColour, photoIds } = answer;
      return { ...stands([]), found: [{ key: COULD_NOT_CHECK, raisedColour, note, photoIds }] };
    }
    case "not-fitted":
      return check.mayBeNotFitted ? stands([NOT_FITTED]) : fault("always-fitted");
    case "tag-seen": {
      // A number or a drain is done again whatever hangs there; only a look can be "the same".
      const open = openTags.some((tag) => tag.checkKey === check.key);
      return check.kind === "look" && open ? stands([]) : fault("no-open-tag");
    }
  }
}

function judgeAnswer(check: Check, answer: Answer, openTags: readonly OpenTag[]): Finding {
  let own: ReturnType<typeof judgeKind>;
  try {
    own = judgeKind(check, answer, openTags);
  } catch (error) {
    if (!(error instanceof UnitError)) throw error;
    own = { fault: error.code, readings: [], found: [] };
  }
  // A problem the driver named hangs its tag even beside a number that cannot stand (K2).
  const named = "problems" in answer ? (answer.problems ?? []) : [];
  const vacuumPa = own.readings.find((one) => one.quantity === "vacuum")?.si ?? null;
  let fault = own.fault;
  const tags = new Map<string, TagProposal>();
  for (const { key, raisedColour, note, photoIds } of [...own.found, ...named]) {
    const problem = check.problems.find((one) => one.key === key);
    if (!problem) {
      fault ??= "unknown-problem";
      continue;
    }
    const colour = raised(problem, raisedColour);
    const known = tags.get(key);
    const most = known && colourRank(known.colour) > colourRank(colour) ? known.colour : colour;
    tags.set(key, proposal(check, problem, most, { vacuumPa, note, photoIds }));
  }
  const proposed = [...tags.values()];
  return {
    fault,
    tags: proposed,
    readings: own.readings,
    unlocks: fault === null && !proposed.some(bars),
  };
}

/** White is to watch: it locks no run-up. */
function bars(tag: { colour: Colour }): boolean {
  return tag.colour !== "white";
}

/** An open tag that already says as much as the new finding would. */
function covers(open: OpenTag, found: TagProposal): boolean {
  if (open.checkKey !== found.checkKey || open.problemKey !== found.problemKey) return false;
  if (colourRank(open.colour) < colourRank(found.colour)) return false;
  if (open.colour === "red" || found.limit === null) return true;
  if (open.limit === null || open.limit.kind !== found.limit.kind) return false;
  if (found.limit.kind === "vacuum-no-deeper" && open.limit.kind === "vacuum-no-deeper") {
    return open.limit.vacuumPa <= found.limit.vacuumPa;
  }
  return true;
}

function halvesDone(
  sheet: Sheet,
  answers: Answers,
  findings: ReadonlyMap<string, Finding>,
  openTags: readonly OpenTag[],
): Set<RunUpHalf> {
  const done = new Set<RunUpHalf>();
  const checks = allChecks(sheet);
  const unlocked = checks
    .filter((check) => check.locksRunUp)
    .every(
      ({ key }) =>
        findings.get(key)?.unlocks === true &&
        !openTags.some((tag) => tag.checkKey === key && bars(tag)),
    );
  const load = findings.get(LOAD_ABOARD)?.readings[0];
  const empty = !checks.some((check) => check.key === LOAD_ABOARD) || load?.si === 0;
  if (!unlocked || !empty) return done;
  for (const half of ["vacuum", "pressure"] as const) {
    const steps = checks.filter((check) => check.half === half);
    const ran = (check: Check) =>
      findings.get(check.key)?.fault === null && answers[check.key]?.kind !== "could-not-check";
    if (steps.length > 0 && steps.every(ran)) done.add(half);
    // Vacuum comes before pressure.
    else break;
  }
  return done;
}

/**
 * Judges a walk, the same on the phone and on the server (K8). Every answer is judged, due or
 * not; every due check needs an answer that stands. The steps of the run-up are the exception:
 * a half not done, done with a lock open, or done on a loaded truck is no gap in the walk but a
 * limit on the truck. A pump that was started and not reported stopped leaves the walk open.
 */
export function judgeAnswers(
  sheet: Sheet,
  due: readonly Check[],
  answers: Answers,
  context: WalkContext = {},
): Judgement {
  const { walkKind = "before", openTags = [] } = context;
  const checks = new Map(allChecks(sheet).map((check) => [check.key, check]));
  const findings = new Map<string, Finding>();
  const faults: AnswerFault[] = [];
  for (const [checkKey, answer] of Object.entries(answers)) {
    const check = checks.get(checkKey);
    const finding = check ? judgeAnswer(check, answer, openTags) : UNKNOWN;
    if (finding.fault) faults.push({ checkKey, code: finding.fault });
    findings.set(checkKey, finding);
  }

  const stands = (key: string) => findings.get(key)?.fault === null;
  const needed = new Set(due.filter((check) => check.half === null).map((check) => check.key));
  if (answers[RUN_UP_START] !== undefined) needed.add(RUN_UP_END);
  const missing = [...checks.keys()].filter((key) => needed.has(key) && !stands(key));

  const limits: Limit[] = [];
  if (walkKind === "before") {
    const done = halvesDone(sheet, answers, findings, openTags);
    for (const half of sheet.halves) {
      if (!done.has(half)) limits.push(half === "vacuum" ? NO_VACUUM : NO_PRESSURE);
    }
  }
  const inOrder = [...checks.keys()].flatMap((key) => findings.get(key) ?? []);
  return {
    complete: missing.length === 0,
    missing,
    tags: inOrder
      .flatMap((finding) => finding.tags)
      .filter((tag) => !openTags.some((open) => covers(open, tag))),
    limits,
    readings: inOrder.flatMap((finding) => finding.readings),
    faults,
  };
}
