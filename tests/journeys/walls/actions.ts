import { v7 as uuidv7 } from "uuid";
import type { Role } from "../../../app/domain/actor";
import { DEFAULT_POLICY } from "../../../app/domain/policy/settings";
import { PICTURE, type Rows } from "./rows";
import { walkCalls } from "./walk-calls";

type Form = Record<string, string>;
export type Body = { form: Form } | { json: unknown } | { bytes: Buffer };

/**
 * What becomes of another carrier's id in a field.
 * refused: 400 or 404, and nothing is written anywhere.
 * unheeded: it names nothing here, as an id nobody has; what else was sent is taken.
 * fresh: an id the sender makes; that another carrier has one like it changes nothing.
 */
export type Fate = "refused" | "unheeded" | "fresh";

/** One way to call an action. */
export interface Call {
  /** Everyone who may make it; the first is the one who is shown to succeed with ids of their own. */
  may: [Role, ...Role[]];
  body: (own: Rows) => Body;
  /** Every field of the body that carries an id, and whose row it can name. Empty: it takes none. */
  ids: Record<string, [idOf: (rows: Rows) => string, fate: Fate]>;
  method?: "PUT";
  /** The answer to one's own ids where that is neither success nor on. */
  answers?: number;
}

const ALL: Call["may"] = ["driver", "mechanic", "dispatcher", "manager"];
const MANAGER: Call["may"] = ["manager"];
const fresh = () => uuidv7();

function office(form: (own: Rows) => Form, ids: Call["ids"] = {}, more: Partial<Call> = {}): Call {
  return { may: MANAGER, body: (own) => ({ form: form(own) }), ids, ...more };
}

function account(form: (own: Rows) => Form, ids: Call["ids"] = {}): Call {
  return { may: ALL, body: (own) => ({ form: form(own) }), ids };
}

const yard = () => ({
  name: `Yard ${uuidv7()}`,
  zone: "America/Denver",
  elevation: "800",
  elevationUnit: "ft",
  shopOpens: "06:00",
});

const policy = () => {
  const numbers = Object.entries(DEFAULT_POLICY).filter(([, value]) => typeof value === "number");
  const form = Object.fromEntries(numbers.map(([name, value]) => [name, String(value)]));
  return { ...form, limitsBlock: "block" };
};

const place = (own: Rows) => ({ roles: "driver", yardId: own.yardId });
const signed = { signature: "A Signer" };

const truckCommand = (intent: string, more: (own: Rows) => Form = () => ({})) =>
  office((own) => ({ intent, ...more(own) }));

/** Every action of the app by its address. An action that is not here fails the test. */
export const ACTIONS: Record<string, [Call, ...Call[]]> = {
  "/account": [
    account(() => ({ intent: "phone", phone: "555-0177" })),
    account((own) => ({ intent: "end", sessionId: own.sessionId }), {
      sessionId: [(rows) => rows.sessionId, "refused"],
    }),
    account(() => ({ intent: "end-others" })),
    account((own) => ({ intent: "switch", carrierId: own.carrierId }), {
      carrierId: [(rows) => rows.carrierId, "refused"],
    }),
  ],
  "/walk/:unit": [
    {
      may: ["driver"],
      body: (own) => ({ form: { id: fresh(), item: own.signOffId, ...signed } }),
      ids: {
        id: [(rows) => rows.acknowledgementId, "fresh"],
        item: [(rows) => rows.signOffId, "unheeded"],
      },
    },
    {
      may: ["driver"],
      body: (own) => ({
        form: { intent: "not-satisfied", id: fresh(), disputes: own.signOffId, ...signed },
      }),
      ids: { disputes: [(rows) => rows.signOffId, "refused"] },
    },
  ],
  "/api/v1/walks": walkCalls,
  "/api/v1/photos/:id": [
    { may: ["driver", "mechanic"], method: "PUT", body: () => ({ bytes: PICTURE }), ids: {} },
  ],
  "/bench": [
    {
      may: ["mechanic", "manager", "driver"],
      body: (own) => ({
        form: { id: fresh(), tagId: own.tagId, kind: "repaired", work: "adjusted", ...signed },
      }),
      ids: {
        id: [(rows) => rows.signOffId, "fresh"],
        tagId: [(rows) => rows.tagId, "refused"],
      },
    },
    {
      may: ["mechanic", "manager"],
      body: (own) => ({
        form: {
          intent: "allow-run",
          id: fresh(),
          tagId: own.tagId,
          limit: "as-tagged",
          untilDay: "2099-12-31",
          ...signed,
        },
      }),
      ids: {
        id: [(rows) => rows.runLimitId, "fresh"],
        tagId: [(rows) => rows.tagId, "refused"],
      },
    },
  ],
  "/bench/rounds/:unit/:round": [
    {
      may: ["mechanic"],
      body: () => ({ form: { id: fresh(), doneOn: "2026-01-06", pumpHours: "1200" } }),
      ids: { id: [(rows) => rows.roundId, "fresh"] },
    },
  ],
  "/board/:unit": [
    {
      may: ["dispatcher"],
      body: (own) => ({
        form: {
          id: fresh(),
          truckId: own.truckId,
          driverId: own.personId,
          runName: "Run 7",
          pressure: "no",
          towing: "no",
          hazmat: "no",
          vacuum: "18",
          fill: "1000",
          hose: "100",
        },
      }),
      ids: {
        id: [(rows) => rows.handoverId, "fresh"],
        truckId: [(rows) => rows.truckId, "refused"],
        driverId: [(rows) => rows.personId, "refused"],
      },
      // The key is out already: the gate's own refusal, after every id was found.
      answers: 409,
    },
    {
      may: ["dispatcher"],
      body: (own) => ({
        form: { intent: "take-back", id: fresh(), handoverId: own.handoverId, aboard: "empty" },
      }),
      ids: {
        id: [(rows) => rows.returnId, "fresh"],
        handoverId: [(rows) => rows.handoverId, "refused"],
      },
    },
  ],
  "/office/yards/new": [office(yard)],
  "/office/yards/:yardId": [office(yard)],
  "/office/trucks/new": [
    office(
      (own) => ({
        id: fresh(),
        unitNumber: `W-${uuidv7().slice(-12)}`,
        kind: "powered",
        yardId: own.yardId,
        start: "vane-3000",
      }),
      {
        id: [(rows) => rows.truckId, "fresh"],
        yardId: [(rows) => rows.yardId, "refused"],
      },
    ),
  ],
  "/office/trucks/:unit": [
    office((own) => ({ intent: "remove-fitting", fittingId: own.fittingId }), {
      fittingId: [(rows) => rows.fittingId, "refused"],
    }),
    office((own) => ({ intent: "restore-fitting", fittingId: own.removedFittingId }), {
      fittingId: [(rows) => rows.removedFittingId, "refused"],
    }),
    truckCommand("remove-set-point", () => ({ reading: "vacuum-relief" })),
    truckCommand("end-test", () => ({ kind: "permit" })),
    truckCommand("clear-fault"),
    truckCommand("out-of-service"),
    truckCommand("in-service"),
  ],
  "/office/trucks/:unit/details": [
    office((own) => ({ unitNumber: own.unitNumber, kind: "towed", vin: "" })),
  ],
  "/office/trucks/:unit/move": [
    office((own) => ({ yardId: own.yardId }), { yardId: [(rows) => rows.yardId, "refused"] }),
  ],
  "/office/trucks/:unit/fittings/new": [
    office(() => ({ id: fresh(), kind: "spill-kit" }), {
      id: [(rows) => rows.fittingId, "fresh"],
    }),
  ],
  "/office/trucks/:unit/fittings/:fittingId": [office(() => ({ kind: "hitch" }))],
  "/office/trucks/:unit/set-points/:reading": [
    office(() => ({ unit: "inHg", setPoint: "19", low: "18", high: "20", stop: "" })),
  ],
  "/office/trucks/:unit/tests/:test": [office(() => ({ passedOn: "2026-01-06" }))],
  "/office/checks": [
    office(
      (own) => ({
        id: fresh(),
        truckId: own.truckId,
        station: "rear",
        cadence: "daily",
        label: "Flag",
        good: "There",
        colour: "white",
      }),
      {
        id: [(rows) => rows.ownCheckId, "fresh"],
        truckId: [(rows) => rows.truckId, "refused"],
      },
    ),
    office((own) => ({ intent: "remove", checkId: own.ownCheckId }), {
      checkId: [(rows) => rows.ownCheckId, "refused"],
    }),
    office((own) => ({ intent: "restore", checkId: own.removedCheckId }), {
      checkId: [(rows) => rows.removedCheckId, "refused"],
    }),
  ],
  "/office/people": [
    office((own) => ({ intent: "take-back", invitationId: own.invitationId }), {
      invitationId: [(rows) => rows.invitationId, "refused"],
    }),
  ],
  "/office/people/invite": [
    office(
      (own) => ({
        id: fresh(),
        name: "New Hand",
        email: `${uuidv7()}@example.test`,
        ...place(own),
      }),
      {
        id: [(rows) => rows.invitationId, "fresh"],
        yardId: [(rows) => rows.yardId, "refused"],
      },
    ),
  ],
  "/office/people/:personId": [
    office((own) => ({ intent: "change", personId: own.personId, ...place(own) }), {
      personId: [(rows) => rows.personId, "unheeded"],
      yardId: [(rows) => rows.yardId, "refused"],
    }),
    office(() => ({ intent: "deactivate" })),
    office(() => ({ intent: "reactivate" })),
    office(() => ({ intent: "end-sessions" })),
  ],
  "/office/policy": [office(policy)],
  "/invitation/:token": [{ may: ALL, body: () => ({ form: {} }), ids: {} }],
  "/sign-in": [
    // No code is waiting for a browser that is signed in.
    { ...account(() => ({ step: "code", code: "000000" })), answers: 400 },
  ],
  // Ends the caller's own session and reads no field. The last one, so that the others still have theirs.
  "/sign-out": [
    account((own) => ({ sessionId: own.sessionId }), {
      sessionId: [(rows) => rows.sessionId, "unheeded"],
    }),
  ],
};
