import type { CautionKey } from "../../trade/sheet/cautions";

/** Shapes of ISO 3864: a triangle warns, a disc says must, a ring says must not. */
export type CautionShape = "warning" | "must" | "must-not";

export interface Caution {
  shape: CautionShape;
  title: string;
  text: string;
}

export const cautions: Readonly<Record<CautionKey, Caution>> = {
  chocks: {
    shape: "must",
    title: "Chocks first",
    text: "Chock the wheels before any brake is released. They come up at pull-out.",
  },
  "stored-vacuum": {
    shape: "warning",
    title: "Stored vacuum or pressure",
    text: "Vent the tank and see the gauge on zero before you open a drain, lid or filter.",
  },
  "stored-pressure": {
    shape: "warning",
    title: "Stored pressure",
    text: "Bleed to zero before a valve, cap or hose is opened. Stand to one side of it.",
  },
  shafts: {
    shape: "must-not",
    title: "Turning shafts",
    text: "Guard on, hands and sleeves out. A tachometer at an open shaft is shop work.",
  },
  "hot-surfaces": {
    shape: "warning",
    title: "Hot",
    text: "Pump, hoses and coolant burn long after the engine stops. Never open a hot cap.",
  },
  "hoses-under-pressure": {
    shape: "warning",
    title: "Hose under pressure",
    text: "It whips when it lets go. Strap it, stand clear, bleed before you uncouple.",
  },
  "clamp-under-pressure": {
    shape: "must-not",
    title: "Never tighten under pressure",
    text: "No clamp, cap or bolt is touched while the tank holds pressure. Bleed to zero first.",
  },
  solvent: {
    shape: "must-not",
    title: "Flush near heat",
    text: "No flame, no smoking, nothing hot near flushing oil. Gloves and goggles on.",
  },
  ears: { shape: "must", title: "Ears", text: "Wear hearing protection near the running pump." },
  upwind: {
    shape: "must",
    title: "Stand upwind",
    text: "What comes out of the outlet can be toxic. Smell is no warning. Keep upwind of it.",
  },
  "at-the-controls": {
    shape: "must",
    title: "Stay at the controls",
    text: "People clear of rear and outlet. Ears on. Do not walk away while the pump turns.",
  },
  fall: {
    shape: "warning",
    title: "Fall from the tank top",
    text: "Three points of contact. Look from the ladder; do not walk the tank.",
  },
  "iced-ladder": {
    shape: "must-not",
    title: "Iced ladder",
    text: "Do not climb it with ice, snow or mud on it. Answer could not check.",
  },
  "tank-air": {
    shape: "must-not",
    title: "Bad air in the tank",
    text: "Toxic, or too little oxygen. Nobody puts a head in an opening without a permit.",
  },
  "waste-oil": {
    shape: "must",
    title: "Waste oil",
    text: "Catch every drop. Into the waste-oil can, never on the ground or into the load.",
  },
  "snug-under-vacuum": {
    shape: "warning",
    title: "Snugging under vacuum",
    text: "Guard on, people clear, PTO locked off first. Fingers out of the lid's edge.",
  },
};
