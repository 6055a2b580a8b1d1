/** A caution before a check: its safety shape (ISO 3864) and one or two lines. */
export interface CautionText {
  shape: "warning" | "must" | "never";
  text: string;
}

export const cautions: Record<string, CautionText> = {
  chocks: { shape: "must", text: "Chocks in before brakes are released. Nobody in front, behind or under." },
  "chocks-up": { shape: "must", text: "Chocks aboard, look round once more, then roll slowly." },
  hot: { shape: "warning", text: "Hot surfaces. Let it cool; never open a hot cap." },
  "moving-parts": { shape: "never", text: "Never reach past a guard. An open shaft or coupling is shop work." },
  "stored-pressure": { shape: "warning", text: "Stored vacuum or pressure. Gauge on zero and vent open before you open anything." },
  "waste-oil": { shape: "must", text: "Waste oil: gloves on, into the pan, never on the ground." },
  solvent: { shape: "never", text: "Solvent: no flame, no hot surface, no smoking." },
  upwind: { shape: "must", text: "Stand upwind of the outlet. What comes out can be toxic." },
  hoses: { shape: "warning", text: "A hose under pressure can whip. Bleed it before you touch a coupling." },
  "rear-door": { shape: "never", text: "Never tighten or open a clamp under pressure. Stand to the side of the door." },
  fall: { shape: "warning", text: "Fall from the tank top. Three points of contact; an iced ladder is not climbed." },
  ignition: { shape: "never", text: "No flame, no smoking at the fuel tank." },
  "people-clear": { shape: "must", text: "People clear of rear and outlet before the PTO goes in." },
  "at-controls": { shape: "must", text: "Stay at the controls while the pump runs." },
  ears: { shape: "must", text: "Ear protection on. The relief opens loud." },
  "tank-air": { shape: "never", text: "Toxic or oxygen-poor air in the tank. Nobody puts a head in an opening without a permit." },
  lockout: { shape: "must", text: "Locked out and tagged, key in your pocket." },
};
