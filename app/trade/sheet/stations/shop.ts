import { type CheckEntry, look, NO_PRESSURE, NO_VACUUM, red, type StationEntry, white, yellow } from "../catalogue";

const monthly: Partial<CheckEntry> = { cadence: "monthly", who: "shop", steps: true };

/** The monthly round, at the bench. */
export const shop: StationEntry = {
  key: "shop",
  checks: [
    look("shop.primary", [red("ball-missing"), red("seat"), yellow("groove", NO_VACUUM), yellow("build-up", NO_VACUUM), red("fastener")], {
      ...monthly,
      needs: ["primary-shutoff"],
      caution: "tank-air",
    }),
    look("shop.secondary", [red("ball-missing"), red("seat"), yellow("gasket", NO_VACUUM), yellow("drain-slow")], {
      ...monthly,
      needs: ["secondary-trap"],
      caution: "stored-pressure",
    }),
    look("shop.hose-pump-separator", [red("lining-loose"), yellow("lining-swollen", NO_VACUUM), yellow("flaking", NO_VACUUM)], {
      ...monthly,
      needs: ["pump"],
      caution: "hot",
    }),
    look("shop.hose-inlet-filter", [red("lining-loose"), yellow("lining-swollen", NO_VACUUM), yellow("flaking", NO_VACUUM)], {
      ...monthly,
      needs: ["pump"],
      caution: "hot",
    }),
    look("shop.hose-filter-trap", [red("lining-loose"), yellow("lining-swollen", NO_VACUUM), yellow("flaking", NO_VACUUM)], {
      ...monthly,
      needs: ["pump", "secondary-trap"],
      caution: "hot",
    }),
    look("shop.deodorizer", [white("screen"), yellow("can-cracked")], {
      ...monthly,
      needs: ["deodorizer-can"],
      caution: "solvent",
    }),
    look("shop.sight-glasses", [red("cracked"), yellow("gasket", NO_PRESSURE)], {
      ...monthly,
      needs: ["sight-glass"],
      caution: "stored-pressure",
    }),
    look("shop.coupling", [red("insert-gone"), yellow("insert-worn", NO_VACUUM), red("key-loose")], {
      ...monthly,
      cadence: "weekly",
      needs: ["drive"],
      caution: "lockout",
    }),
    look("shop.check-gauge", [yellow("disagrees", NO_PRESSURE), red("sticks")], {
      ...monthly,
      needs: ["compound-gauge"],
      caution: "at-controls",
    }),
    look("shop.brakes", [red("lining"), red("stroke"), yellow("near-limit")], {
      ...monthly,
      part: "service-brakes",
      caution: "lockout",
    }),
  ],
};
