import { type CheckEntry, look, red, type StationEntry, white, yellow } from "../catalogue";

/** What both sides of a truck have alike. */
function side(key: "curb-side" | "driver-side"): CheckEntry[] {
  return [
    look(`${key}.tires`, [red("flat"), red("cord"), red("tread"), yellow("low-air", { fix: true }), yellow("cut")], {
      part: "tires",
      walks: ["before", "takeover"],
    }),
    look(`${key}.wheels`, [red("nut-loose"), red("cracked"), yellow("seal-leaks")], { part: "wheels" }),
    look(`${key}.lamps`, [yellow("lamp-out", { fix: true, remote: true }), yellow("reflector", { remote: true }), red("none-works")], {
      part: "lighting",
    }),
    look(`${key}.brake-hoses`, [red("leaks"), red("chafed-through"), yellow("chafed")], { part: "service-brakes" }),
  ];
}

export const curbSide: StationEntry = {
  key: "curb-side",
  checks: [
    ...side("curb-side"),
    look("curb-side.hoses", [yellow("tray-open", { fix: true }), yellow("hose-split", { limit: { kind: "no-pressure-off-load" } }), white("hose-worn", { remote: true })], {
      needs: ["hose", "hose-tray"],
      caution: "hoses",
    }),
    look("curb-side.boxes", [yellow("will-not-lock", { fix: true }), white("latch-worn", { fix: true, remote: true })], {
      needs: ["toolbox"],
    }),
    look("curb-side.tread", [red("under-limit"), yellow("uneven")], { cadence: "weekly", part: "tires", steps: true }),
    look("curb-side.tire-pressure", [red("flat"), yellow("low", { fix: true })], { cadence: "weekly", part: "tires" }),
  ],
};

export const driverSide: StationEntry = {
  key: "driver-side",
  checks: [
    ...side("driver-side"),
    look("driver-side.fuel", [red("leaks"), yellow("cap-missing", { fix: true, remote: true }), yellow("strap-loose")], {
      unit: "powered",
      caution: "ignition",
    }),
  ],
};
