import type { SheetText } from "../../trade/sheet/sheet-text";
import { approach } from "./sheet/approach";
import { cab } from "./sheet/cab";
import { hood } from "./sheet/hood";
import { pullOut } from "./sheet/pull-out";
import { pumpSide } from "./sheet/pump-side";
import { rear } from "./sheet/rear";
import { runUp } from "./sheet/run-up";
import { shop } from "./sheet/shop";
import { sides } from "./sheet/sides";

/** The words of the check sheet. Checks are looked up by key, without a fitting's number. */
export const sheetText: SheetText = {
  stations: {
    approach: {
      label: "Approach",
      engine: ({ towed }) => (towed ? "Parked, chocked" : "Engine off, wheels chocked"),
    },
    hood: { label: "Hood", engine: "Engine off" },
    "pump-side": { label: "Pump side", engine: "Engine off, PTO out" },
    cab: { label: "Cab", engine: "Engine off, then on, off for a minute, on again" },
    "curb-side": {
      label: "Curb side",
      engine: ({ towed }) => (towed ? "Plugged in, lights on" : "Engine on, lights on"),
    },
    rear: {
      label: "Rear",
      engine: ({ towed }) => (towed ? "Plugged in, lights on" : "Engine on, lights on"),
    },
    "driver-side": {
      label: "Driver side",
      engine: ({ towed }) => (towed ? "Plugged in, lights on" : "Engine on, lights on"),
    },
    "run-up": { label: "Run-up", engine: "Engine on, you at the controls" },
    "pull-out": {
      label: "Pull-out",
      engine: ({ towed }) => (towed ? "Coupled, ready to roll" : "Engine on, ready to roll"),
    },
    shop: { label: "Shop", engine: "Engine off and locked off, tank vented" },
  },
  checks: {
    ...approach,
    ...hood,
    ...pumpSide,
    ...cab,
    ...sides,
    ...rear,
    ...runUp,
    ...pullOut,
    ...shop,
  },
  couldNotCheck: "could not check",
  notFitted: "not fitted on this truck",
  notRight: "not right",
};
