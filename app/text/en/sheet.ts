/** Words of a check: what it is, what good looks like in one line, its problems, levels and steps. */
export interface CheckText {
  label: string;
  good: string;
  problems: Record<string, string>;
  levels?: Record<string, string>;
  steps?: readonly string[];
}

export interface SheetText {
  stations: Record<string, { label: string; engine: string }>;
  checks: Record<string, CheckText>;
  couldNotCheck: string;
}

const SIDE = {
  tires: {
    label: "Tires",
    good: "No cut to cord, no bulge, tread all round, nothing between duals.",
    problems: {
      flat: "Flat, or air leaking",
      cord: "Cord or belt showing",
      tread: "Tread gone: steer 4/32 in, others 2/32 in",
      "low-air": "Looks low",
      cut: "Cut or bulged",
    },
  },
  wheels: {
    label: "Wheels and nuts",
    good: "Every nut there and tight, no rust trails, rims whole, hubs dry.",
    problems: { "nut-loose": "Nut loose or missing", cracked: "Rim or wheel cracked", "seal-leaks": "Hub seal leaks" },
  },
  lamps: {
    label: "Lamps and reflectors",
    good: "All work, clean, none broken.",
    problems: { "lamp-out": "A lamp is out", reflector: "Reflector broken or missing", "none-works": "No lamp works on this side" },
  },
  brakeHoses: {
    label: "Brake hoses",
    good: "Held clear, no rub, no hiss.",
    problems: { leaks: "Air or fluid leaks", "chafed-through": "Worn into the cord", chafed: "Rubbing" },
  },
} as const;

const DRAIN_STEPS = [
  "Tank vented, gauge on zero.",
  "Pan or bottle under the drain.",
  "Crack it open, stand to the side.",
  "Watch it run until it is dry, and look at what comes out.",
  "Shut it and wipe it.",
] as const;

const DRAIN_PROBLEMS = {
  milky: "Milky oil came out",
  "too-much": "A gallon or more came out",
  "left-open": "Drain does not shut, or is open",
  frozen: "Frozen: cannot tell",
  plugged: "Plugged: nothing passes",
} as const;

const HOSE = {
  problems: {
    "lining-loose": "Lining loose inside",
    "lining-swollen": "Lining swollen, bore smaller",
    flaking: "Lining flaking",
  },
  steps: [
    "PTO out, tank vented, hose cool.",
    "Take one end off.",
    "Look in with a light: lining tight all round, full bore.",
    "A hose can be gone inside while the outside feels sound.",
    "New gasket, clamp tight.",
  ],
} as const;

export const sheetText: SheetText = {
  couldNotCheck: "Could not check",
  stations: {
    approach: { label: "Approach", engine: "Engine off, wheels chocked" },
    hood: { label: "Hood", engine: "Engine off" },
    "pump-side": { label: "Pump side", engine: "Engine off" },
    cab: { label: "Cab", engine: "Off, then on; off for a minute for the leak-down; on" },
    "curb-side": { label: "Curb side", engine: "On, lights on" },
    rear: { label: "Rear", engine: "On, lights on" },
    "driver-side": { label: "Driver side", engine: "On, lights on" },
    "run-up": { label: "Run-up", engine: "On, at the controls" },
    "pull-out": { label: "Pull-out", engine: "On" },
    shop: { label: "Shop round", engine: "Off, locked out" },
  },
  checks: {
    "approach.stance": {
      label: "Stance and body",
      good: "Stands level, nothing bent or hanging since yesterday.",
      problems: { leans: "Leans to one side", "body-damage": "New damage", scrape: "Scrape or dent" },
    },
    "approach.ground": {
      label: "Ground under the truck",
      good: "Dry. No fresh drip under engine, pump, valves or axles.",
      problems: { "lading-leak": "Load leaking", "fuel-leak": "Fuel leaking", "oil-leak": "Oil leaking", "coolant-leak": "Coolant leaking" },
    },
    "approach.aboard": {
      label: "Load aboard",
      good: "You know what is in the tank and how much.",
      problems: { "unknown-load": "Not known what is aboard" },
      levels: { empty: "Empty", part: "Part load", full: "Full" },
    },
    "approach.wrong-today": {
      label: "Anything wrong today",
      good: "Ran right all day: brakes, steering, lamps, tires, pump.",
      problems: { unsafe: "Not safe to drive", "needs-shop": "Needs the shop", "to-watch": "Something to watch" },
    },
    "hood.oil": {
      label: "Engine oil",
      good: "Between the marks, clean on the stick.",
      problems: { low: "Low", none: "None on the stick", milky: "Milky" },
      levels: { "in-range": "Between the marks", low: "Low", "none-on-stick": "None on the stick" },
    },
    "hood.coolant": {
      label: "Coolant",
      good: "At the mark in the tank. Never open a hot cap.",
      problems: { low: "Low", empty: "Empty", oily: "Oil in it" },
      levels: { "in-range": "At the mark", low: "Low", empty: "Empty" },
    },
    "hood.belts": {
      label: "Belts and hoses",
      good: "Tight, no cracks, no bulge, nothing rubbing.",
      problems: { torn: "Belt torn or missing", cracked: "Cracked or frayed", "hose-soft": "Hose soft or bulged" },
    },
    "hood.steering": {
      label: "Steering parts",
      good: "No play, no leak, pins in, fluid at the mark.",
      problems: { loose: "Loose or worn part", leak: "Leaks", "fluid-low": "Fluid low" },
    },
    "pump-side.controls": {
      label: "PTO out, valve at neutral",
      good: "PTO out, changeover valve at neutral and moving freely.",
      problems: { "pto-in": "PTO is in", "valve-stuck": "Valve stuck", "valve-stiff": "Valve stiff" },
    },
    "pump-side.vented": {
      label: "Tank vented, gauge on zero",
      good: "Vent open, the needle rests on zero.",
      problems: { "pressure-held": "Tank holds pressure or vacuum", "gauge-off-zero": "Gauge off zero with the tank vented", "gauge-broken": "Gauge broken or unreadable" },
    },
    "pump-side.oil": {
      label: "Pump oil",
      good: "In the glass at the mark, right oil, a spare gallon aboard.",
      problems: { low: "Low", none: "None in the glass", "wrong-oil": "Wrong oil or not known", "no-spare": "No spare gallon aboard" },
      levels: { "in-range": "At the mark", low: "Low", none: "None in the glass" },
    },
    "pump-side.seal-liquid": {
      label: "Seal liquid",
      good: "Reservoir at the mark, clean.",
      problems: { low: "Low", none: "Empty", dirty: "Dirty" },
      levels: { "in-range": "At the mark", low: "Low", none: "Empty" },
    },
    "pump-side.secondary-drain": {
      label: "Drain the secondary trap (scrubber)",
      good: "Cracked open, ran or dry, shut again. A cup of clear water is nothing.",
      problems: { ...DRAIN_PROBLEMS, sewage: "Sewage came out: the primary float is passing" },
      steps: DRAIN_STEPS,
    },
    "pump-side.oil-catch-drain": {
      label: "Drain the oil catch",
      good: "Cracked open, ran or dry, shut again. Spent oil only.",
      problems: { ...DRAIN_PROBLEMS, sewage: "Sewage came out, whatever the amount" },
      steps: DRAIN_STEPS,
    },
    "pump-side.deodorizer": {
      label: "Deodorizer can",
      good: "Filled to the mark, about a quart, lid tight.",
      problems: { low: "Low", empty: "Empty", "can-leaks": "Can leaks" },
      levels: { full: "Full", low: "Low", empty: "Empty" },
    },
    "pump-side.outlet": {
      label: "Outlet",
      good: "Clear, pointing away from people, no oil on it.",
      problems: { blocked: "Blocked", "oil-mist": "Oil mist or wet oil", dirty: "Dirty" },
    },
    "pump-side.guard": {
      label: "Guard",
      good: "On and tight, no rubber or metal shavings seen through it.",
      problems: { "guard-off": "Guard off", shavings: "Shavings under it", "guard-loose": "Loose" },
    },
    "pump-side.leaks": {
      label: "Pump and drive leaks",
      good: "Dry at the pump, the lines and the drive.",
      problems: { runs: "Runs", drips: "Drips", damp: "Damp" },
    },
    "pump-side.hydraulics": {
      label: "Hydraulic drive",
      good: "Hoses sound, fittings dry, oil at the mark.",
      problems: { "hose-bulged": "Hose bulged or cut", weeps: "Fitting weeps", "oil-low": "Oil low" },
    },
    "pump-side.relief-locks": {
      label: "Relief valves",
      good: "Lock nuts and seals as the shop left them, nothing on or in them.",
      problems: { disturbed: "Lock nut moved", plugged: "Plugged, tied or painted", "seal-missing": "Seal missing" },
    },
    "pump-side.flush": {
      label: "Flush the pump, warm",
      good: "Flush drawn through with the kit while warm, then oil.",
      problems: { "not-done": "Not done" },
      levels: { "done-warm": "Done, warm", "not-done": "Not done" },
      steps: ["Pump still warm, at idle, a little vacuum.", "Draw the flush in as the kit says.", "Let it run, then oil as the maker says.", "Drain the oil catch after it."],
    },
    "pump-side.pre-filter": {
      label: "Pre-filter",
      good: "Element clean and whole, gasket seated.",
      problems: { rubber: "Black rubber in it: look into the hoses", plugged: "Plugged", dirty: "Dirty, cleaned" },
      steps: ["PTO out, tank vented.", "Open it, lift the element out.", "Look for black rubber: a hose lining is coming apart although the outside feels sound.", "Wash or change the element.", "Gasket and seat clean, lid tight; snug it again under vacuum."],
    },
    "pump-side.gearbox-oil": {
      label: "Gearbox oil",
      good: "To the level plug; a small three-shaft box takes about 24 fl oz, to about the bottom third of the shaft.",
      problems: { low: "Low", none: "None at the plug", metal: "Metal in it" },
      steps: ["Engine off, box cool, truck level.", "Level plug out: oil at the hole.", "Top up with the maker's oil, plug in."],
    },
    "pump-side.hydraulic-oil": {
      label: "Hydraulic oil",
      good: "At the mark, clear.",
      problems: { low: "Low", none: "None on the glass", milky: "Milky" },
    },
    "pump-side.pto-shaft": {
      label: "PTO shaft",
      good: "Joints tight and greased, no play in the yokes.",
      problems: { "joint-loose": "Joint loose", dry: "Dry", "yoke-worn": "Yoke worn" },
    },
    "pump-side.flush-weekly": {
      label: "Flush the pump",
      good: "Flushed this week; what came out ran clear.",
      problems: { "not-done": "Not done", "came-out-black": "Came out black or thick" },
      steps: ["Pump warm, as its maker's manual says.", "Flush through, then oil.", "Drain secondary trap and oil catch."],
    },
    "cab.papers": {
      label: "Papers and dates",
      good: "Registration, insurance, permit, inspection: aboard and in date.",
      problems: { expired: "Out of date", missing: "Missing" },
    },
    "cab.emergency": {
      label: "Extinguisher, triangles, spill kit, PPE",
      good: "Extinguisher charged and held, three triangles, spill kit and PPE whole.",
      problems: { extinguisher: "Extinguisher missing or flat", triangles: "Triangles missing", "spill-kit": "Spill kit not whole", ppe: "PPE missing" },
    },
    "cab.seat-glass": {
      label: "Seat belt and glass",
      good: "Belt latches and holds, glass clear.",
      problems: { belt: "Belt will not latch or is cut", windshield: "Windshield cracked in the driver's view", glass: "Other glass cracked" },
    },
    "cab.mirrors": {
      label: "Mirrors",
      good: "Whole, clean, set for you.",
      problems: { broken: "Broken or missing", loose: "Loose" },
    },
    "cab.warning-air": {
      label: "Warning lamps and air",
      good: "Lamps go out, air builds to cut-out.",
      problems: { "warning-lamp": "A red lamp stays on", "no-air-build": "Air does not build", gauge: "A gauge is dead" },
    },
    "cab.horn": { label: "Horn", good: "Loud.", problems: { dead: "Does not sound" } },
    "cab.wipers": {
      label: "Wipers and washer",
      good: "Sweep clean, washer wets.",
      problems: { dead: "Do not work", blade: "Blade worn", "washer-empty": "Washer empty" },
    },
    "cab.parking-brake": {
      label: "Parking brake",
      good: "Holds against a light pull in low gear; on a towed unit, with its air off.",
      problems: { slips: "Slips", "will-not-set": "Will not set" },
    },
    "cab.leak-down": {
      label: "Applied leak-down",
      good: "Pedal held one minute, engine off: 3 psi or less for a single, 4 for a combination.",
      problems: { "over-limit": "Loses more", audible: "Can be heard" },
      steps: ["Chocked, engine off, key on, brakes released.", "Press the pedal hard, let the needle settle.", "Hold it one minute and read the drop."],
    },
    "cab.pedal": {
      label: "Brake pedal",
      good: "Firm and high, does not sink under a held foot.",
      problems: { sinks: "Sinks", soft: "Soft", "fluid-low": "Fluid low" },
    },
    "cab.pump-hours": {
      label: "Pump hours",
      good: "As the meter shows.",
      problems: { "meter-dead": "Meter dead" },
    },
    "cab.odometer": {
      label: "Odometer",
      good: "As it shows.",
      problems: { "meter-dead": "Odometer dead" },
    },
    "cab.leak-released": {
      label: "Released leak-down",
      good: "Brakes released, engine off: under 2 psi a minute for a single, 3 for a combination.",
      problems: { "over-limit": "Loses more", audible: "Can be heard" },
      steps: ["Chocked, full air, engine off, brakes released.", "Watch the gauge for one minute."],
    },
    "cab.low-air": {
      label: "Low-air warning",
      good: "Lamp or buzzer on before 60 psi.",
      problems: { "no-warning": "No warning", "too-late": "Warns too late" },
      steps: ["Chocked, engine off, key on.", "Pump the pedal, watch the gauge, note where it warns."],
    },
    "cab.spring-brake": {
      label: "Spring brake",
      good: "Knob pops between 20 and 45 psi.",
      problems: { "does-not-pop": "Does not pop" },
      steps: ["Go on pumping the pedal after the warning.", "The knob must pop by itself."],
    },
    "curb-side.tires": SIDE.tires,
    "curb-side.wheels": SIDE.wheels,
    "curb-side.lamps": SIDE.lamps,
    "curb-side.brake-hoses": SIDE.brakeHoses,
    "curb-side.hoses": {
      label: "Hoses and trays",
      good: "Hoses sound, drained, in their trays; trays shut.",
      problems: { "tray-open": "Tray will not shut", "hose-split": "Hose split", "hose-worn": "Hose worn" },
    },
    "curb-side.boxes": {
      label: "Boxes",
      good: "Shut and locked.",
      problems: { "will-not-lock": "Will not lock", "latch-worn": "Latch worn" },
    },
    "curb-side.tread": {
      label: "Tread by gauge",
      good: "Steer 4/32 in or more, others 2/32 in or more, in a major groove.",
      problems: { "under-limit": "Under the limit", uneven: "Worn uneven" },
      steps: ["Gauge in a major groove, never on a tie bar, hump or fillet.", "Write the lowest."],
    },
    "curb-side.tire-pressure": {
      label: "Tire pressures by gauge",
      good: "Cold, as the placard says for the load.",
      problems: { flat: "Flat", low: "Low" },
    },
    "rear.lamps": {
      label: "Rear lamps",
      good: "Tail, brake, turn and reverse all work, reflectors clean.",
      problems: { "brake-lamps": "Brake lamps out", "lamp-out": "A lamp is out", reflector: "Reflector broken or missing" },
    },
    "rear.door": {
      label: "Rear door and clamps",
      good: "Every clamp tight, seal dry all round.",
      problems: { clamp: "Clamp loose, bent or missing", leaks: "Leaks", gasket: "Gasket damaged" },
    },
    "rear.manway": {
      label: "Manway",
      good: "Clamps tight, gasket seated, seen from the ground or a safe step.",
      problems: { clamp: "Clamp loose or missing", gasket: "Gasket damaged" },
    },
    "rear.valves": {
      label: "Valves",
      good: "Shut, no drip, handles locked.",
      problems: { leaks: "Leaks", stiff: "Stiff", "handle-bent": "Handle bent" },
    },
    "rear.caps": {
      label: "Caps",
      good: "Every cap on, locked and tight, gasket in.",
      problems: { missing: "Missing", gasket: "Gasket missing", "ear-broken": "Camlock ear broken" },
    },
    "rear.sight-glasses": {
      label: "Sight glasses",
      good: "Clear, dry, no crack.",
      problems: { cracked: "Cracked", leaks: "Leaks", hazed: "Hazed" },
    },
    "rear.placards": {
      label: "Placards and plate",
      good: "Right for the load on all sides, plate and test marks readable.",
      problems: { wrong: "Wrong for the load", missing: "Missing or unreadable" },
    },
    "rear.hitch": {
      label: "Coupling devices",
      good: "Hitch locked, pin in, chains and lines sound. Without a hitch: nothing loose at the frame's end.",
      problems: { "will-not-lock": "Will not lock", chain: "Chain broken or missing", worn: "Worn" },
    },
    "rear.ladder": {
      label: "Ladder",
      good: "Tight, rungs whole. Not climbed when iced.",
      problems: { loose: "Loose", "rung-bent": "Rung bent" },
    },
    "rear.door-seal": {
      label: "Rear-door seal",
      good: "Soft, no cut, seated all round.",
      problems: { cut: "Cut", dry: "Dry" },
    },
    "driver-side.tires": SIDE.tires,
    "driver-side.wheels": SIDE.wheels,
    "driver-side.lamps": SIDE.lamps,
    "driver-side.brake-hoses": SIDE.brakeHoses,
    "driver-side.fuel": {
      label: "Fuel tank and cap",
      good: "Cap on, straps tight, no drip.",
      problems: { leaks: "Leaks", "cap-missing": "Cap missing", "strap-loose": "Strap loose" },
    },
    "run-up.clear": {
      label: "Clear to run",
      good: "Tank empty and vented, drains shut, guard on, clamps and caps tight, people clear of rear and outlet.",
      problems: { "not-clear": "Not clear to run", loaded: "Loaded: run it at first empty" },
    },
    "run-up.speed": {
      label: "Pump speed",
      good: "Valve at neutral, PTO in, engine to the card's speed.",
      problems: { slow: "Under the plate's band", fast: "Over the plate's band", noise: "Knocks or howls" },
    },
    "run-up.oil-moving": {
      label: "Oil moving",
      good: "Oil moves in every feed line.",
      problems: { "none-moves": "None moves", "one-line": "One line does not move" },
    },
    "run-up.vacuum": {
      label: "Vacuum relief",
      good: "Gauge when steady is inside the band, and you heard it open.",
      problems: { low: "Opens under the band, or does not get there", high: "Over the band or the stop value", "not-heard": "Did not hear it open" },
      steps: ["Valve to vacuum, slowly.", "Watch the gauge to the stop value: at the stop with no relief, neutral, PTO out, red.", "Read it when it is steady and listen for the relief.", "Over a minute at relief: neutral, it heats.", "Neutral, bleed to zero."],
    },
    "run-up.pressure": {
      label: "Pressure relief",
      good: "Gauge when steady is inside the band, and you heard it open.",
      problems: { low: "Opens under the band", high: "Over the band or the stop value", "not-heard": "Did not hear it open" },
      steps: ["Gauge on zero, valve slowly to pressure.", "At the stop with no relief: neutral, PTO out, red.", "Read it when it is steady and listen for the relief.", "Neutral, bleed to zero."],
    },
    "run-up.bled": {
      label: "Bled, PTO out",
      good: "Neutral, bled to zero, PTO out.",
      problems: { "will-not-bleed": "Will not bleed to zero", "pto-stays-in": "PTO stays in" },
    },
    "pull-out.shut": {
      label: "All shut",
      good: "Drains, caps, doors and boxes shut.",
      problems: { "drain-open": "Drain open", "door-open": "Door will not shut", "cap-off": "Cap off" },
    },
    "pull-out.brakes-feel": {
      label: "Chocks up, brakes feel right",
      good: "Chocks aboard; in the first 20 feet it stops straight and firm.",
      problems: { pull: "Pulls to one side", soft: "Soft or late", noise: "Grinds or squeals" },
    },
    "pull-out.service-brakes": {
      label: "Brakes of the towed unit",
      good: "Apply and let go with the truck's, nothing drags, connections tight.",
      problems: { drag: "Drags", dead: "Does not apply" },
    },
    "pull-out.washed-out": {
      label: "Tank washed out",
      good: "Washed as the load asks, or known to stay.",
      problems: { "not-washed": "Not washed out" },
      levels: { washed: "Washed out", "not-washed": "Not washed out" },
    },
    "shop.primary": {
      label: "Primary shutoff",
      good: "Cage whole, ball round and free to its stop, seat clean, groove clean, fasteners whole as a kit.",
      problems: { "ball-missing": "Float ball missing or holed", seat: "Seat damaged", groove: "Deep groove in the gasket: leaks", "build-up": "Ring of build-up holds the ball up: shuts off early", fastener: "Fastener missing" },
      steps: ["Tank vented. No head or arm goes into an opening without a permit.", "Lid off; look at cage, ball and its stop.", "Gasket: a deep groove leaks, change it.", "Scrape the ring of build-up off the seat: it holds the ball up and shuts off early.", "Fasteners are changed as a kit.", "Lid on, snug; snug it again under vacuum, guard on, people clear."],
    },
    "shop.secondary": {
      label: "Secondary shutoff and trap",
      good: "Ball, seat and gasket whole; washed with the drain open, plenty comes out.",
      problems: { "ball-missing": "Float ball missing or holed", seat: "Seat damaged", gasket: "Gasket damaged", "drain-slow": "Drain slow when washed" },
      steps: ["Tank vented, drain open.", "Wash it through: plenty should come out of the open drain.", "Look at ball, seat and gasket.", "Shut the drain, lid snug; snug it again under vacuum."],
    },
    "shop.hose-pump-separator": { label: "Air hose, pump to oil separator", good: "Lining tight, full bore, seen from inside. It fails first.", ...HOSE },
    "shop.hose-inlet-filter": { label: "Air hose, pump inlet to pre-filter", good: "Lining tight, full bore, seen from inside.", ...HOSE },
    "shop.hose-filter-trap": { label: "Air hose, pre-filter to trap", good: "Lining tight, full bore, seen from inside.", ...HOSE },
    "shop.deodorizer": {
      label: "Deodorizer can",
      good: "Screen clean, can whole, about a quart in it.",
      problems: { screen: "Screen dirty", "can-cracked": "Can cracked" },
      steps: ["No flame near; gloves.", "Lid off, screen out and washed.", "About a quart in, lid tight."],
    },
    "shop.sight-glasses": {
      label: "Sight glasses out and cleaned",
      good: "Glass whole and clean, new gasket, evenly tight.",
      problems: { cracked: "Cracked or chipped", gasket: "Gasket damaged" },
      steps: ["Tank vented. Never tighten under pressure.", "Glass out, washed, edges looked at.", "New gasket, tightened evenly."],
    },
    "shop.coupling": {
      label: "Coupling, guard off",
      good: "Insert whole, key and set screws tight.",
      problems: { "insert-gone": "Insert gone", "insert-worn": "Insert worn", "key-loose": "Key or set screw loose" },
      steps: ["Locked out, key in your pocket.", "Guard off, look and feel.", "Guard on and tight before the lock comes off."],
    },
    "shop.check-gauge": {
      label: "Gauge against the check gauge",
      good: "Agrees within the gauge's own accuracy, on zero when vented.",
      problems: { disagrees: "Disagrees", sticks: "Sticks" },
      steps: ["Check gauge on the test port.", "Vacuum first, then pressure, bled between.", "Write both readings."],
    },
    "shop.brakes": {
      label: "Brake lining and stroke",
      good: "Lining and stroke inside the maker's and the law's limits.",
      problems: { lining: "Lining under the limit", stroke: "Stroke over the limit", "near-limit": "Near the limit" },
      steps: ["Chocked and locked out.", "Lining at its thinnest; stroke at 80 to 90 psi, brakes held.", "Compare with the chamber's own marked limit."],
    },
  },
};
