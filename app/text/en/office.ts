import type { AmountName, FlagName } from "../../domain/trucks/fitting-fields";
import type { UsualTruck } from "../../domain/trucks/usual-trucks";
import type { VinWarning } from "../../domain/trucks/vin";
import type { DatedTest } from "../../trade/dated-tests";
import type { FittingKind } from "../../trade/fittings";
import type { Colour, Limit } from "../../trade/limits";
import type { SetPointReading } from "../../trade/set-points";
import type { Cadence, StationKey, UnitKind } from "../../trade/sheet/check";
import { fromSi } from "../../trade/units";

const number = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 5 });

/** "3,000 gal" */
export function withUnit(value: number, unit: string): string {
  return `${number.format(value)} ${unitLabel(unit)}`;
}

const UNITS: Record<string, string> = {
  "fl-oz": "fl oz",
  "m3/h": "m³/h",
  m3: "m³",
  "in/32": "/32 in",
};
export function unitLabel(unit: string): string {
  return UNITS[unit] ?? unit;
}

interface UnitOption {
  value: string;
  label: string;
}
function unitOption(value: string): UnitOption {
  return { value, label: unitLabel(value) };
}

/** Units as a form offers them, the usual one first. */
export function unitOptions([usual, ...others]: readonly [string, ...string[]]): readonly [
  UnitOption,
  ...UnitOption[],
] {
  return [unitOption(usual), ...others.map(unitOption)];
}

/** "2026-05-20" as "May 20, 2026". */
export function dayLabel(day: string): string {
  return new Intl.DateTimeFormat("en-US", {
    year: "numeric",
    month: "short",
    day: "numeric",
    timeZone: "UTC",
  }).format(new Date(`${day}T00:00:00Z`));
}

function plural(count: number, one: string, many: string): string {
  return `${number.format(count)} ${count === 1 ? one : many}`;
}

export const unitKinds: Record<UnitKind, string> = { powered: "Truck", towed: "Towed unit" };

export const fittingKinds: Record<FittingKind, string> = {
  tank: "Tank",
  pump: "Pump",
  drive: "Pump drive",
  gearbox: "Gearbox",
  "changeover-valve": "Changeover valve",
  "four-way-valve-lock": "Lock on the four-way valve",
  "primary-shutoff": "Primary shutoff",
  "secondary-trap": "Secondary trap (scrubber)",
  "oil-catch": "Oil catch",
  "oil-reservoir": "Pump oil reservoir",
  "pre-filter": "Pre-filter",
  "vacuum-relief": "Vacuum relief",
  "pressure-relief": "Pressure relief",
  "compound-gauge": "Compound gauge",
  "deodorizer-can": "Deodorizer can",
  "flush-kit": "Flush kit",
  "sight-glass": "Sight glasses",
  "rear-door": "Full-opening rear door",
  manway: "Manway",
  valve: "Tank valves",
  hose: "Hoses aboard",
  "hose-tray": "Hose trays",
  cap: "Caps",
  ladder: "Ladder",
  hitch: "Hitch",
  "air-brakes": "Air brakes",
  "hydraulic-brakes": "Hydraulic brakes",
  "spill-kit": "Spill kit",
  toolbox: "Toolbox",
};

/** Groups of the list a manager chooses from. */
export const fittingGroups: readonly { label: string; kinds: readonly FittingKind[] }[] = [
  {
    label: "Tank and what is on it",
    kinds: ["tank", "manway", "rear-door", "sight-glass", "valve", "cap", "ladder"],
  },
  {
    label: "Pump and what drives it",
    kinds: ["pump", "drive", "gearbox", "oil-reservoir", "oil-catch", "flush-kit"],
  },
  {
    label: "Between tank and pump",
    kinds: [
      "primary-shutoff",
      "secondary-trap",
      "pre-filter",
      "changeover-valve",
      "four-way-valve-lock",
      "deodorizer-can",
    ],
  },
  {
    label: "Reliefs and gauge",
    kinds: ["vacuum-relief", "pressure-relief", "compound-gauge"],
  },
  {
    label: "Running gear and stowage",
    kinds: ["air-brakes", "hydraulic-brakes", "hitch", "hose", "hose-tray", "toolbox", "spill-kit"],
  },
];

export const amountNames: Record<AmountName, string> = {
  volumeL: "Volume",
  maxVacuumPa: "Greatest vacuum",
  maxPressurePa: "Greatest pressure",
  flowM3s: "Free air",
  minRpm: "Lowest speed",
  maxRpm: "Highest speed",
  vacuumStepPa: "Smallest step, vacuum side",
  pressureStepPa: "Smallest step, pressure side",
  lengthM: "Length, all together",
};

const amountHints: Partial<Record<FittingKind, Partial<Record<AmountName, string>>>> = {
  tank: {
    maxVacuumPa: "From the tank's plate. Left empty, pump and gauge decide where to stop.",
    maxPressurePa: "The plate's working pressure (MAWP).",
  },
  pump: { maxVacuumPa: "The most the maker allows, as on the plate." },
  "compound-gauge": {
    maxVacuumPa: "Where the scale ends to the left of zero.",
    maxPressurePa: "Where the scale ends to the right of zero.",
  },
};
export function amountHint(kind: FittingKind, name: AmountName): string | null {
  return amountHints[kind]?.[name] ?? null;
}

export const flagNames: Record<FlagName, string> = {
  specificationPlate: "It carries a specification plate (49 CFR 180)",
  fullOpeningRear: "Its rear head opens full",
  insulated: "It is insulated",
  lined: "It is lined",
  corrosiveLoad: "It hauls loads that eat its metal",
};

export const choiceLabels: Record<"type" | "grade" | "count", string> = {
  type: "Type",
  grade: "Accuracy grade on its face",
  count: "How many",
};

const options: Record<string, string> = {
  vane: "Vane",
  "liquid-ring": "Liquid ring",
  blower: "Blower",
  shaft: "Shaft",
  hydraulic: "Hydraulic",
  direct: "Direct",
  "three-shaft": "Three-shaft",
  "right-angle": "Right-angle",
};
export function optionLabel(option: string): string {
  return options[option] ?? option;
}

export const readings: Record<SetPointReading, { label: string; hint: string; unit: string }> = {
  "vacuum-relief": {
    label: "Vacuum relief",
    hint: "What the gauge shows when the relief opens, read steady at run-up.",
    unit: "inHg",
  },
  "pressure-relief": {
    label: "Pressure relief",
    hint: "What the gauge shows when the relief opens, read steady at run-up.",
    unit: "psi",
  },
  "pump-speed": {
    label: "Pump speed",
    hint: "The speed on the card at the controls.",
    unit: "rpm",
  },
  "tire-pressure-steer": { label: "Tire pressure, steer", hint: "Cold.", unit: "psi" },
  "tire-pressure": { label: "Tire pressure, others", hint: "Cold.", unit: "psi" },
};

export const limitedBy = { tank: "the tank", pump: "the pump", gauge: "the gauge" } as const;

const datedTests: Record<DatedTest, string> = {
  "annual-inspection": "Annual inspection",
  "external-visual": "Tank, external visual",
  "internal-visual": "Tank, internal visual",
  lining: "Tank lining",
  leakage: "Tank leakage",
  pressure: "Tank pressure",
  thickness: "Tank thickness",
  permit: "Hauling permit",
  extinguisher: "Fire extinguisher",
};
export function testLabel(kind: string): string {
  return datedTests[kind as DatedTest] ?? kind;
}

export const stations: Record<StationKey, string> = {
  approach: "Approach",
  hood: "Hood",
  "pump-side": "Pump side",
  cab: "Cab",
  "curb-side": "Curb side",
  rear: "Rear",
  "driver-side": "Driver side",
  "run-up": "Run-up",
  "pull-out": "Pull-out",
  shop: "Shop",
};

export const cadences: Record<Cadence, string> = {
  daily: "Every day",
  weekly: "Every week",
  monthly: "Every month",
};

export const colours: Record<Colour, string> = { red: "Red", yellow: "Yellow", white: "White" };

/** What a yellow tag forbids, as a line. */
export function limitWords(limit: Limit): string {
  switch (limit.kind) {
    case "no-pressure-off-load":
      return "no pressure off-load";
    case "no-vacuum-work":
      return "no vacuum work";
    case "no-towing":
      return "no towing";
    case "no-hazmat":
      return "no hazmat";
    case "vacuum-no-deeper":
      return `vacuum work only where the relief holds ${withUnit(fromSi(limit.vacuumPa, "inHg"), "inHg")}`;
    case "fill-no-more":
      return `fill no more than ${withUnit(fromSi(limit.fillL / 1000, "gal"), "gal")}`;
    case "hose-no-longer":
      return `hose length ${withUnit(fromSi(limit.hoseM, "ft"), "ft")} at most`;
  }
}

export const vinWarnings: Record<VinWarning, string> = {
  "vin-length": "A VIN since 1981 has 17 characters. Compare it with the plate.",
  "vin-letters": "A VIN has no I, O or Q: they are 1 and 0. Compare it with the plate.",
  "vin-check-digit": "The ninth character does not fit the others. Compare it with the plate.",
};

export const usualTrucks: Record<UsualTruck, string> = {
  "vane-3000": "Vane pump, 3,000 gal, shaft drive, rear door",
  "hydraulic-2500": "Vane pump, 2,500 gal, hydraulic drive",
  "towed-5000": "Towed unit, 5,000 gal, no pump of its own",
};

/** Notes that follow a change, by the word in the address. */
export const savedNotes = {
  truck: "The truck is entered. Compare each fitting with its plate, then enter the set points.",
  details: "Saved.",
  fitting: "Saved. Walks made before no longer count: the driver walks the truck again.",
  removed: "Taken off. Walks made before no longer count. It can be put back.",
  restored: "Put back. Walks made before no longer count: the driver walks the truck again.",
  "set-point": "Saved. Walks made before no longer count: the driver walks the truck again.",
  moved: "Moved. Walks made before no longer count: the driver walks the truck again.",
  test: "Recorded.",
  service: "Saved.",
  "worked-out": "Its standing was worked out anew.",
  unchanged: "Nothing was different, so nothing changed.",
  yard: "Saved.",
  check: "Added. It is on the sheets from the next walk on.",
  "check-removed": "Taken off the sheets. It is under “Taken off” below, and can be put back.",
  "check-restored": "Back on the sheets from the next walk on.",
  invited: "The invitation is on its way.",
  "invitation-revoked": "The invitation is taken back. Its link no longer works.",
  person: "Saved. It holds from their next step on.",
  deactivated: "Deactivated, and signed out everywhere.",
  reactivated: "Reactivated. They sign in with a code.",
  "sessions-ended": "Signed out everywhere.",
  policy: "Saved. Every truck's standing was worked out again.",
} as const;
export type SavedNote = keyof typeof savedNotes;
export function isSavedNote(word: string | null): word is SavedNote {
  return word !== null && Object.hasOwn(savedNotes, word);
}

export const office = {
  title: "Office",
  product: "Keypeg",
  sections: "Parts of the office",
  save: "Save",
  cancel: "Cancel",
  formFault: "Some of this needs another look. What you typed is still here.",
  choose: "Choose",
  notFound: {
    title: "Not found",
    truck: "There is no truck of that unit number here.",
    other: "There is no such record here.",
    back: "Back to the office",
  },
  failed: {
    title: "This did not work",
    text: "Nothing was saved. Try again; if it stays like this, tell whoever runs Keypeg for you.",
  },
  start: {
    lead: "What the yard's pegs are built from.",
    yards: "Yards",
    trucks: "Trucks",
    people: "People",
    policy: "Policy",
    checks: "Own checks",
    yardsLine: (count: number) => plural(count, "yard", "yards"),
    trucksLine: (count: number, out: number) =>
      out === 0
        ? plural(count, "truck or towed unit", "trucks and towed units")
        : `${plural(count, "truck or towed unit", "trucks and towed units")}, ${out} out of service`,
    peopleLine: (count: number) => plural(count, "person", "people"),
    checksLine: (count: number) =>
      count === 0
        ? "none of your own yet"
        : plural(count, "check of your own", "checks of your own"),
    policyLine: (version: number) =>
      version === 1 ? "as it came, never changed" : `version ${version}`,
    yardsWhat: "Where trucks sleep: time zone, elevation, shop hours.",
    trucksWhat: "Unit numbers, fittings, set points, dated tests and the sheet that follows.",
    peopleWhat: "Who works here, in which role, and who may certify.",
    policyWhat: "How long a walk counts, grace, the driver-fix list.",
    checksWhat: "What your firm looks at beside what the truck needs.",
  },
  yards: {
    title: "Yards",
    add: "Add a yard",
    addTitle: "Add a yard",
    none: "No yard yet. Add the first one: a truck needs a place to sleep.",
    name: "Name",
    zone: "Time zone",
    zoneHint: "Its clock decides which day a walk belongs to. Example: America/Denver.",
    elevation: "Elevation",
    elevationHint:
      "Decides how deep a vacuum the air allows. Changing it ends the walks of its trucks.",
    elevationUnit: "Unit of elevation",
    phone: "Telephone",
    phoneHint: "For whoever stands at a held truck.",
    shopOpens: "The shop opens at",
    shopOpensHint: "A round past its grace holds a truck from this time on, never in the night.",
    winter: "Drains can freeze here",
    winterHint: "The sheet then says what to do at a frozen drain or an iced ladder.",
    trucks: (count: number) => (count === 0 ? "no trucks yet" : plural(count, "truck", "trucks")),
    opens: (clock: string) => `shop opens ${clock}`,
  },
  trucks: {
    title: "Trucks",
    add: "Add a truck",
    none: "No truck yet. Add the first one; it stays on its peg until it is walked.",
    noYard: "Add a yard first: a truck needs a place to sleep.",
    columns: { unit: "Unit", kind: "Kind", yard: "Yard", standing: "Standing" },
    outOfService: "Out of service",
    workingOut: "Being worked out",
    unit: "Unit number",
    unitHint: "As painted on the door: T-118.",
    kind: "Kind",
    vin: "VIN",
    vinHint: "17 letters and digits. May stay empty.",
    yard: "Yard",
    start: "Start from",
    startHint: "A usual truck brings its usual fittings, so that you only put right what differs.",
    startNothing: "Nothing fitted yet",
    submit: "Add the truck",
  },
  truck: {
    sheet: "The sheet that follows",
    changeDetails: "Change details",
    detailsTitle: (unit: string) => `Details of ${unit}`,
    saveDetails: "Save details",
    move: "Move to another yard",
    moveHint: "Another yard has other air and another clock. Walks made before no longer count.",
    moveSubmit: "Move the truck",
    moveTitle: (unit: string) => `Move ${unit} to another yard`,
    kindHint: "Another kind has another sheet. Changing it ends the walks made on this truck.",
    notSaid: "Not said",
    specificationPlate: "specification plate",
    noVin: "not entered",
    workOut: "Work it out anew",
    gateFault: "Its standing could not be worked out, so the key stays on the peg.",
    inService: "In service",
    outOfService: "Out of service: the key stays on the peg.",
    takeOut: "Take out of service",
    putBack: "Put back in service",
    serviceNote:
      "A truck out of service keeps its tags and its record. It can be put back at any time.",
    endsWalks: "Saving a change ends the walks made on this truck: the driver walks it again.",
    fittings: "Fittings",
    fittingsWhat: "The check sheet is made from these.",
    noFittings: "Nothing fitted yet. Start with the tank and the pump.",
    addFitting: "Add a fitting",
    addFittingTo: (unit: string) => `Add a fitting to ${unit}`,
    whichFitting: "Which fitting?",
    next: "Next",
    fittingTitle: (unit: string, kind: string) => `${kind} on ${unit}`,
    nothingToFill:
      "There is nothing to fill in for this one. It is fitted, and its checks are on the sheet.",
    saveFitting: "Save the fitting",
    addIt: "Add it",
    takeOff: "Take off",
    takeOffOf: (kind: string) => `Take off: ${kind}`,
    change: "Change",
    changeOf: (kind: string) => `Change: ${kind}`,
    takenOff: "Taken off",
    takenOffOn: (day: string) => `taken off ${day}`,
    putBackFitting: "Put back",
    putBackOf: (kind: string) => `Put back: ${kind}`,
    setPoints: "Set points",
    setPointsWhat:
      "What each reading should show, the band round it, and where the operator stops.",
    notSet: "not set",
    owed: "The run-up needs this. Until it is set, the truck is limited.",
    setIt: "Set",
    setOf: (reading: string) => `Set: ${reading}`,
    clear: "Clear",
    clearQuestion:
      "Its values go off this page, and its half of the run-up cannot be run until there are new ones.",
    clearOf: (reading: string) => `Clear: ${reading}`,
    point: "Set point",
    low: "Low end of the band",
    high: "High end of the band",
    stop: "Stop value",
    stopHint: (limit: string | null) =>
      limit ? `Left empty: ${limit}, the lowest of the plates.` : "Where the operator stops.",
    unit: "Unit",
    unitHint: "As the gauge shows it.",
    limit: (value: string, by: string) => `Lowest plate: ${value} (${by}).`,
    noLimit: "No plate gives a limit yet. Enter the tank, the pump and the gauge first.",
    setPointTitle: (unit: string, reading: string) => `${reading} on ${unit}`,
    saveSetPoint: "Save the set point",
    band: (low: string | null, high: string | null) => {
      if (low && high) return `band ${low} to ${high}`;
      if (low) return `${low} or more`;
      return high ? `${high} or less` : "no band";
    },
    stopAt: (value: string) => `stop at ${value}`,
    unreachable: (most: string, yard: string) =>
      `Not reachable here: the air at ${yard} allows ${most} at most.`,
    tests: "Dated tests",
    testsWhat: "Dates set by law or by a permit hold the key from the day after. No grace.",
    testStates: {
      good: "In date",
      soon: "Due soon",
      past: "Past its date",
      never: "Never recorded",
    },
    lastDay: (day: string) => `last day ${day}`,
    passed: (day: string) => `passed ${day}`,
    /** How often, and whose rule. */
    everyLine: (months: number, source: string) =>
      `Every ${months % 12 === 0 ? plural(months / 12, "year", "years") : `${months} months`} (${source})`,
    permitLead: "The permit itself says until when it counts.",
    record: "Record",
    recordOf: (test: string) => `Record: ${test}`,
    testTitle: (unit: string, test: string) => `${test} of ${unit}`,
    passedOn: "Passed on",
    passedOnHint: "The day it was passed, yard time.",
    dueOn: "Last day it counts",
    dueOnHint: "Left empty: the longest the rule allows from the day it was passed.",
    permitDueHint: "As printed on the permit.",
    note: "Note",
    noteHint: "Where the paper is kept, or who did it.",
    saveTest: "Record the test",
    end: "No longer needed",
    endQuestion: "Its date no longer holds the key. To have it count again, record it anew.",
    endOf: (test: string) => `No longer needed: ${test}`,
    leftOver:
      "Recorded for an earlier plate. It still holds the key after its last day until you say it is no longer needed.",
  },
  sheet: {
    title: (unit: string) => `The sheet of ${unit}`,
    what: "Made from its fittings and set points. A driver sees one station at a time.",
    daily: (count: number) => plural(count, "check on a plain day", "checks on a plain day"),
    pressure: (count: number) =>
      `${count} more when the day's run off-loads by pressure, or weekly`,
    weekly: (count: number) => `${count} more when the weekly round is due`,
    monthly: (count: number) => `${count} for the monthly round`,
    after: (count: number) => `${count} at the end of the day`,
    cannot: "As it is built, it cannot:",
    missing:
      "The office still owes these set points. Without them a half of the run-up cannot be run:",
    station: (label: string, place: number) => `${place}. ${label}`,
    steps: "Steps",
    ifNot: "If not",
    shopWork: "Shop",
    roadSafety: "Road safety",
    locks: "Unlocks the run-up",
    half: { vacuum: "Vacuum half", pressure: "Pressure half" },
    cadence: { weekly: "Weekly", monthly: "Monthly" },
    onlyAfter: "End of the day only",
    alsoAfter: "Start and end of the day",
    own: "Your own",
    expected: (count: number) => `expects ${count}`,
    setPoint: (value: string) => `set point ${value}`,
    driverFix: (problem: string) => `${problem} (driver-fix)`,
    back: (unit: string) => `Back to ${unit}`,
  },
  checks: {
    title: "Own checks",
    what: "Beside what each truck's fittings call for. Adding one ends no walk; it is asked from the next walk on.",
    none: "No check of your own yet.",
    add: "Add a check",
    label: "What to look at",
    labelHint: "For example: Blue drum strapped",
    good: "What good looks like",
    goodHint: "One line. For example: Both straps tight, lid on",
    station: "Station",
    cadence: "How often",
    colour: "Tag when it is not right",
    colourHint: "Red holds the key. Yellow waits for a certifier's date. White is to watch.",
    truck: "On",
    everyTruck: "Every truck",
    submit: "Add the check",
    remove: "Take off",
    removeOf: (label: string) => `Take off: ${label}`,
    restore: "Put back",
    restoreOf: (label: string) => `Put back: ${label}`,
    takenOff: "Taken off",
  },
} as const;
