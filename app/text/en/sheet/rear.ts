import type { CheckText } from "../../../trade/sheet/sheet-text";

export const rear = {
  "rear.lamps": {
    label: "Rear lamps and reflectors",
    good: "Brake, tail, turn, marker and plate lamps lit; reflectors and tape clean",
    problems: {
      "brake-or-turn": "brake lamp or turn signal out",
      tail: "tail lamp out",
      "marker-or-plate": "marker or plate lamp out",
      reflector: "reflector or tape missing",
    },
  },
  "rear.door": {
    label: "Rear door and clamps",
    good: "Every clamp on and tight, hinge and prop sound, seal dry all round",
    problems: {
      "clamp-loose": "clamp loose",
      "clamp-gone": "clamp missing or broken",
      "hinge-or-prop": "hinge, hoist or prop damaged",
      leaks: "door leaks",
      "seal-weeps": "seal weeps",
    },
  },
  "rear.manway": {
    label: "Manway lid and clamps",
    good: ({ winter }) =>
      winter
        ? "Lid down, every clamp tight. Do not climb an iced ladder: answer could not check"
        : "Lid down, every clamp tight, gasket in place; three points of contact on the ladder",
    problems: {
      "clamp-loose": "clamp loose",
      "clamp-gone": "clamp missing or broken",
      gasket: "gasket cut or out of place",
      ladder: "ladder or step damaged",
    },
  },
  "rear.valves": {
    label: "Valves shut",
    good: "Every valve shut, handle locked, not a drop",
    problems: {
      leaks: "leaks",
      "will-not-shut": "will not shut",
      drips: "drips",
      handle: "handle or linkage damaged",
    },
  },
  "rear.caps": {
    label: "Caps",
    good: ({ count }) => `Count them: ${count} of ${count} on, ears locked, tight`,
    problems: {
      missing: "cap missing",
      "will-not-lock": "will not lock",
      "gasket-weeps": "gasket weeps",
      "ear-bent": "ear bent, still locks",
    },
  },
  "rear.sight-glass": {
    label: ({ nth }) => (nth ? `Sight glass ${nth}` : "Sight glasses"),
    good: "No crack, dry round the edge, and you can read a level through it",
    problems: {
      cracked: "cracked",
      leaks: "leaks",
      "cannot-read": "too dirty or hazed to read",
      hazed: "hazed",
    },
  },
  "rear.placards": {
    label: "Placards, name and plate",
    good: "Right placards or none, name, number and plate readable",
    problems: {
      placard: "placard wrong or missing",
      plate: "license plate missing",
      "name-or-number": "name or number unreadable",
    },
  },
  "rear.coupling": {
    label: "Rear guard and tow hooks",
    good: "Rear guard straight and tight, hooks sound; no hitch on this truck",
    problems: {
      "rear-guard": "rear guard bent, cracked or loose",
      "tow-hook": "tow hook loose or cracked",
      "hitch-found": "a hitch is fitted that is not on this sheet",
    },
  },
  "rear.hitch": {
    label: "Hitch and rear guard",
    good: "Tight on the frame, jaw or ball not worn, pin, latch, chains and plugs sound",
    problems: {
      "loose-on-frame": "loose or cracked at the frame",
      "rear-guard": "rear guard bent, cracked or loose",
      worn: "jaw, ball or eye worn",
      "pin-or-latch": "pin or latch will not lock",
      "chain-or-lines": "chain, air line or plug damaged",
    },
  },
  "rear.washed-out": {
    label: "Tank washed out",
    good: ({ has }) =>
      has("primary-shutoff")
        ? "Empty and washed; the shutoff shut when it should; no leak while loaded"
        : "Empty and washed; no leak while loaded",
    problems: {
      "tank-leaks": "tank leaked while loaded",
      "solids-left": "solids left that will not wash out",
      "shutoff-trips-early": "shutoff trips before the tank is full",
      "not-washed": "not washed",
    },
    steps: ({ has }) => [
      "Wash from the outside. Nobody puts a head in an opening without a permit.",
      ...(has("secondary-trap")
        ? ["Rinse the trap with its drain open: plenty should come out."]
        : []),
    ],
  },
  "rear.glasses-out": {
    label: "Sight glasses out and cleaned",
    good: "Glass out, washed, no crack or etching; new gasket, evenly tightened",
    problems: {
      cracked: "cracked or etched",
      gasket: "gasket hard or cut",
      "frame-bent": "frame bent",
    },
    steps: [
      "Tank empty, vented, gauge on zero, pump locked off.",
      "Glass out; wash it and its seat. Look along it for cracks.",
      "New gasket. Tighten crosswise, a little at a time.",
      "Hold vacuum and look; then pressure and look.",
    ],
  },
} as const satisfies Record<string, CheckText>;
