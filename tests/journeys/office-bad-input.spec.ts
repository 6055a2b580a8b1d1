import { randomUUID } from "node:crypto";
import { type APIResponse, expect, type Page, test } from "@playwright/test";
import { and, eq } from "drizzle-orm";
import type { MySqlColumn, MySqlTable } from "drizzle-orm/mysql-core";
import { v7 as uuidv7 } from "uuid";
import { SESSION_COOKIE, setToken } from "../../app/auth/cookies";
import { startSession } from "../../app/auth/sessions/start-session";
import { type Database, openDatabase } from "../../app/db/client";
import { yards } from "../../app/db/schema/carriers";
import { invitations, memberships, people, signInCodes } from "../../app/db/schema/people";
import {
  datedTests,
  fittings,
  ownChecks,
  rounds,
  setPoints,
  trucks,
} from "../../app/db/schema/trucks";
import type { Actor } from "../../app/domain/actor";
import { DEFAULT_POLICY } from "../../app/domain/policy/settings";
import { makeToken, tokenHash } from "../../app/domain/tokens";
import { systemClock } from "../../app/services/clock";
import { makeCarrier, makePerson, makeTruck, type TestCarrier } from "../server/factories";
import { newCode } from "./people";

type Form = Record<string, string>;

const ORIGIN = process.env.KEYPEG_ORIGIN ?? "";
const LONG = "n".repeat(10_000);

let database: Database;
let ours: TestCarrier;
let manager: Actor;
let mechanic: Actor;
let page: Page;
let bench: Page;
let unit: string;
let pumpId: string;

/** A person in a browser without scripts: what the server sends is what is read. */
async function signedIn(from: Page, actor: Actor): Promise<void> {
  const { db } = database;
  const [person] = await db.select().from(people).where(eq(people.id, actor.personId));
  const who = { email: person!.email, device: "Firefox, Linux", previousToken: null };
  const started = await startSession(db, who, new Date());
  const [, name = "", value = ""] =
    /^([^=]+)=([^;]*)/.exec(await setToken(SESSION_COOKIE, started!.token)) ?? [];
  await from.context().addCookies([{ name, value, url: ORIGIN }]);
}

test.beforeAll(async ({ browser }) => {
  database = openDatabase(process.env.KEYPEG_DATABASE_URL ?? "", 4);
  const { db } = database;
  ours = await makeCarrier(db, systemClock);
  manager = await makePerson(db, ours, ["manager"]);
  mechanic = await makePerson(db, ours, ["mechanic"]);
  page = await (await browser.newContext({ javaScriptEnabled: false })).newPage();
  bench = await (await browser.newContext({ javaScriptEnabled: false })).newPage();
  await signedIn(page, manager);
  await signedIn(bench, mechanic);
  const truck = await makeTruck(db, ours, systemClock);
  unit = truck.unitNumber;
  const fitted = await db.select().from(fittings).where(eq(fittings.truckId, truck.truckId));
  pumpId = fitted.find((one) => one.kind === "pump")!.id;
});

test.afterAll(async () => {
  await page.context().close();
  await bench.context().close();
  await database.close();
});

function post(path: string, form: Form, from = page): Promise<APIResponse> {
  const headers = { Origin: ORIGIN };
  return from.request.post(path, { form, headers, maxRedirects: 0 });
}

interface Reply {
  status: number;
  location: string | undefined;
  /** What is said at each field; "" is what is said over the form. */
  faults: Record<string, string>;
  /** What each control of the form holds now. */
  typed: Form;
}

/** The answer as its reader sees it: each fault beside the control it describes. */
async function read(answer: APIResponse, form: Form = {}, from = page): Promise<Reply> {
  const { location } = answer.headers();
  if (!answer.headers()["content-type"]?.includes("html")) {
    return { status: answer.status(), location, faults: {}, typed: {} };
  }
  await from.setContent(await answer.text(), { waitUntil: "domcontentloaded" });
  const shown = await from.evaluate((sent) => {
    const faults: Record<string, string> = {};
    const typed: Record<string, string> = {};
    for (const fault of document.querySelectorAll("main [id$='-error']")) {
      const control = document.querySelector(`[aria-describedby~="${CSS.escape(fault.id)}"]`);
      const named = control?.matches("[name]") ? control : control?.querySelector("[name]");
      faults[named?.getAttribute("name") ?? ""] = fault.textContent?.trim() ?? "";
    }
    for (const [name, value] of Object.entries(sent)) {
      const controls = document.querySelectorAll<HTMLInputElement | HTMLSelectElement>(
        `main form [name="${CSS.escape(name)}"]:not([type="hidden"])`,
      );
      for (const control of controls) {
        // A list holds what it offers and nothing else.
        if (control instanceof HTMLSelectElement) {
          const offered = [...control.options].some((option) => option.value === value);
          if (offered) typed[name] = control.value;
        } else if (!/radio|checkbox/.test(control.type) || control.checked) {
          // A day that is none stands in the page; the browser's own picker leaves it out.
          typed[name] = control.getAttribute("value") ?? control.value;
        }
      }
    }
    return { faults, typed };
  }, form);
  return { status: answer.status(), location, ...shown };
}

const send = async (path: string, form: Form, from = page) =>
  read(await post(path, form, from), form, from);

const paths = () => ({
  truck: `/office/trucks/${unit}`,
  fitting: `/office/trucks/${unit}/fittings/${pumpId}`,
  newFitting: `/office/trucks/${unit}/fittings/new`,
  setPoint: (reading: string) => `/office/trucks/${unit}/set-points/${reading}`,
  dated: (test: string) => `/office/trucks/${unit}/tests/${test}`,
  round: `/bench/rounds/${unit}/weekly`,
  person: `/office/people/${mechanic.personId}`,
});

const newTruck = (): Form => ({
  id: uuidv7(),
  unitNumber: `B-${randomUUID().slice(0, 8)}`,
  kind: "powered",
  vin: "",
  yardId: ours.yardId,
  start: "",
});
const newYard = (): Form => ({
  name: `Yard ${randomUUID()}`,
  zone: "America/Denver",
  elevation: "800",
  elevationUnit: "ft",
  shopOpens: "06:00",
  phone: "555-0142",
});
const newCheck = (): Form => ({
  id: uuidv7(),
  truckId: "",
  station: "rear",
  cadence: "daily",
  label: `Flag ${randomUUID()}`,
  good: "There",
  colour: "white",
});
const newInvitation = (): Form => ({
  id: uuidv7(),
  name: "New Hand",
  email: `${uuidv7()}@example.test`,
  roles: "driver",
  yardId: "",
});
const hose = (): Form => ({
  id: uuidv7(),
  kind: "hose",
  "attributes.count": "2",
  "attributes.lengthM.value": "50",
  "attributes.lengthM.unit": "ft",
});
const pump: Form = {
  kind: "pump",
  "attributes.type": "vane",
  "attributes.maxVacuumPa.value": "27",
  "attributes.maxVacuumPa.unit": "inHg",
  "attributes.maxPressurePa.value": "15",
  "attributes.maxPressurePa.unit": "psi",
};
const vacuum: Form = { unit: "inHg", setPoint: "20", low: "18", high: "22", stop: "24" };
const pressure: Form = { unit: "psi", setPoint: "12", low: "11", high: "13", stop: "14" };
const policy = (): Form => {
  const numbers = Object.entries(DEFAULT_POLICY).filter(([, value]) => typeof value === "number");
  return {
    ...Object.fromEntries(numbers.map(([name, value]) => [name, String(value)])),
    monthlyEveryHours: "",
    limitsBlock: "block",
  };
};
const round = (): Form => ({ id: uuidv7(), doneOn: "2026-01-06", pumpHours: "1200" });

/** Words for a person: no key of a table, no words of the library that parses. */
function isWords(text: string): boolean {
  return /^\S+ .*[.!]$/s.test(text) && !/Invalid|expected|received|Too (big|small)/.test(text);
}

/** One thing typed wrong: 400, said at its field alone and in words, and everything typed kept. */
async function isRefused(
  path: string,
  good: Form,
  wrong: Form,
  faults: Record<string, RegExp>,
  from = page,
): Promise<void> {
  const form = { ...good, ...wrong };
  const what = `${path} ${JSON.stringify(wrong).slice(0, 120)}`;
  const reply = await send(path, form, from);
  expect(reply.status, what).toBe(400);
  const { "": over = "", ...atFields } = reply.faults;
  expect(Object.keys(atFields).sort(), what).toEqual(Object.keys(faults).sort());
  for (const [name, words] of Object.entries(faults)) {
    expect(atFields[name], what).toMatch(words);
    expect(isWords(atFields[name] ?? ""), `${what}: ${atFields[name]}`).toBe(true);
  }
  if (over) expect(isWords(over), over).toBe(true);
  for (const [name, value] of Object.entries(reply.typed)) {
    if (!form[name]?.match(/[\p{Cc}]/u)) expect(value, `${what} keeps ${name}`).toBe(form[name]);
  }
  expect(Object.keys(reply.typed).length, what).toBeGreaterThan(0);
}

test("a unit number nobody has is not found, on every page of a truck, to read or to write", async () => {
  const pages: [path: string, form: Form][] = [
    ["", { intent: "out-of-service" }],
    ["/details", { unitNumber: "Z-9", kind: "powered", vin: "" }],
    ["/move", { yardId: ours.yardId }],
    ["/fittings/new", hose()],
    [`/fittings/${pumpId}`, pump],
    ["/set-points/vacuum-relief", vacuum],
    ["/tests/annual-inspection", { passedOn: "2026-01-06", dueOn: "", note: "" }],
  ];
  for (const nobodys of ["NO-9", "x".repeat(300), "%00", "%27%20or%201%3D1"]) {
    for (const [path, form] of pages) {
      const there = `/office/trucks/${nobodys}${path}`;
      expect((await page.request.get(there)).status(), `GET ${there}`).toBe(404);
      expect((await send(there, form)).status, `POST ${there}`).toBe(404);
    }
    expect((await post(`/bench/rounds/${nobodys}/weekly`, round(), bench)).status()).toBe(404);
  }
});

test("a value in a unit that measures something else is said at the unit", async () => {
  const { fitting, setPoint } = paths();
  const unitField = "attributes.maxVacuumPa.unit";
  for (const wrong of ["gal", "psig", "furlongs-and-more", ""]) {
    // A plate typed without a unit is in the first one its form offers.
    if (wrong) {
      await isRefused(fitting, pump, { [unitField]: wrong }, { [unitField]: /unit|measure/i });
    }
    await isRefused(setPoint("vacuum-relief"), vacuum, { unit: wrong }, { unit: /unit|measure/i });
    const elevationUnit = { elevationUnit: /unit|measure/i };
    await isRefused("/office/yards/new", newYard(), { elevationUnit: wrong }, elevationUnit);
  }
});

test("a set point over the pump, the tank or the gauge, a band reversed or a stop above it is said at its field", async () => {
  const at = paths().setPoint;
  const [deep, hard] = [at("vacuum-relief"), at("pressure-relief")];
  const wrong: [path: string, good: Form, wrong: Form, faults: Record<string, RegExp>][] = [
    [deep, vacuum, { setPoint: "28", low: "", high: "", stop: "" }, { setPoint: /pump.*27 inHg/ }],
    [deep, vacuum, { stop: "27.5" }, { stop: /27 inHg or less/ }],
    [deep, vacuum, { low: "21" }, { low: /20 inHg or less/ }],
    [deep, vacuum, { high: "19" }, { high: /20 inHg or more/ }],
    [deep, vacuum, { low: "23", high: "17" }, { low: /or less/, high: /or more/ }],
    [deep, vacuum, { stop: "21" }, { stop: /inside the band.*22 inHg/ }],
    [deep, vacuum, { setPoint: "-20", low: "", high: "" }, { setPoint: /above zero/ }],
    [deep, vacuum, { setPoint: "" }, { setPoint: /number/ }],
    [deep, vacuum, { setPoint: "1e3" }, { setPoint: /number/ }],
    [deep, vacuum, { setPoint: "Infinity", low: "0x10" }, { setPoint: /number/, low: /number/ }],
    [deep, vacuum, { setPoint: "9".repeat(400), low: "", high: "" }, { setPoint: /./ }],
    [hard, pressure, { setPoint: "16", high: "", low: "", stop: "" }, { setPoint: /15 psi/ }],
    [hard, pressure, { stop: "40" }, { stop: /15 psi/ }],
  ];
  for (const [path, good, typed, faults] of wrong) await isRefused(path, good, typed, faults);
  const kept = await database.db
    .select()
    .from(setPoints)
    .where(eq(setPoints.carrierId, ours.carrierId));
  expect(kept).toEqual([]);
});

test("a tank or a gauge that ends sooner than the pump is the one named", async () => {
  const { db } = database;
  for (const [lowest, words] of [
    ["tank", /tank's plate, 10 inHg/],
    ["compound-gauge", /gauge's scale, 10 inHg/],
  ] as const) {
    const truck = await makeTruck(db, ours, systemClock);
    const [fitted] = await db
      .select()
      .from(fittings)
      .where(and(eq(fittings.truckId, truck.truckId), eq(fittings.kind, lowest)));
    const attributes = { ...fitted!.attributes, maxVacuumPa: 33_863.9 };
    await db.update(fittings).set({ attributes }).where(eq(fittings.id, fitted!.id));
    const path = `/office/trucks/${truck.unitNumber}/set-points/vacuum-relief`;
    const typed = { setPoint: "12", low: "", high: "", stop: "" };
    await isRefused(path, vacuum, typed, { setPoint: words });
  }
});

test("a day to come and a day there is not are said at the date", async () => {
  const { dated, round: weekly } = paths();
  const before = [await rowsOf(datedTests), await rowsOf(rounds)];
  const good = { passedOn: "2026-01-06", dueOn: "", note: "On the door" };
  const annual = dated("annual-inspection");
  await isRefused(annual, good, { passedOn: "2199-01-01" }, { passedOn: /day to come/ });
  for (const day of ["2026-02-31", "2026-13-01", "31/01/2026", "yesterday", "0", "2026-1-6"]) {
    await isRefused(annual, good, { passedOn: day }, { passedOn: /year-month-day/ });
    await isRefused(weekly, round(), { doneOn: day }, { doneOn: /day|date/i }, bench);
  }
  await isRefused(annual, good, { passedOn: "" }, { passedOn: /Type the date/ });
  await isRefused(annual, good, { dueOn: "2025-12-31" }, { dueOn: /before the day/ });
  await isRefused(annual, good, { dueOn: "2031-12-31" }, { dueOn: /2027-01-06/ });
  await isRefused(
    weekly,
    round(),
    { doneOn: "2199-01-01" },
    { doneOn: /today or an earlier/ },
    bench,
  );
  await isRefused(weekly, round(), { pumpHours: "many" }, { pumpHours: /number|hours/i }, bench);
  expect([await rowsOf(datedTests), await rowsOf(rounds)]).toEqual(before);
});

test("ten thousand characters, and characters that cannot be printed, are said at their field", async () => {
  const { dated } = paths();
  const tested = { passedOn: "2026-01-06", dueOn: "", note: "" };
  const texts: [path: string, good: Form, field: string][] = [
    ["/office/trucks/new", newTruck(), "unitNumber"],
    ["/office/trucks/new", newTruck(), "vin"],
    [
      `/office/trucks/${unit}/details`,
      { unitNumber: unit, kind: "powered", vin: "" },
      "unitNumber",
    ],
    ["/office/yards/new", newYard(), "name"],
    ["/office/yards/new", newYard(), "phone"],
    ["/office/yards/new", newYard(), "shopOpens"],
    ["/office/checks", newCheck(), "label"],
    ["/office/checks", newCheck(), "good"],
    ["/office/people/invite", newInvitation(), "name"],
    ["/office/people/invite", newInvitation(), "email"],
    [dated("permit"), { ...tested, dueOn: "2027-01-06" }, "note"],
    ["/account", { intent: "phone", phone: "" }, "phone"],
  ];
  for (const [path, good, field] of texts) {
    await isRefused(path, good, { [field]: LONG }, { [field]: /./ });
    for (const unprintable of [
      "A\u0000b",
      "A\u0007b",
      "A\u001b[31mb",
      "Ab\u202ec",
      "A\r\nBcc: x",
    ]) {
      await isRefused(path, good, { [field]: unprintable }, { [field]: /./ });
    }
  }
});

test("choices that are none of ours, no role and numbers out of their range are said at their field", async () => {
  const wrong: [path: string, good: Form, wrong: Form, faults: Record<string, RegExp>][] = [
    ["/office/trucks/new", newTruck(), { kind: "flying" }, { kind: /drives itself/ }],
    ["/office/trucks/new", newTruck(), { start: "submarine" }, { start: /usual trucks/ }],
    ["/office/trucks/new", newTruck(), { yardId: uuidv7() }, { yardId: /your yards/ }],
    ["/office/trucks/new", newTruck(), { unitNumber: unit }, { unitNumber: /in use already/ }],
    ["/office/yards/new", newYard(), { zone: "America/Atlantis" }, { zone: /time zone/ }],
    ["/office/yards/new", newYard(), { elevation: "99999" }, { elevation: /from -1,?41\d to/ }],
    ["/office/yards/new", newYard(), { shopOpens: "25:61" }, { shopOpens: /06:00/ }],
    ["/office/checks", newCheck(), { station: "roof" }, { station: /station/ }],
    ["/office/checks", newCheck(), { cadence: "hourly" }, { cadence: /often/ }],
    ["/office/checks", newCheck(), { colour: "mauve" }, { colour: /color/ }],
    ["/office/people/invite", newInvitation(), { roles: "king" }, { roles: /role/ }],
    [
      "/office/policy",
      policy(),
      { walkHours: "0", reviewDays: "1.5" },
      { walkHours: /1 to 24/, reviewDays: /1 to 90/ },
    ],
    [
      paths().person,
      { intent: "change", roles: "mechanic", yardId: "" },
      { onCall: "-1" },
      { onCall: /place/ },
    ],
  ];
  for (const [path, good, typed, faults] of wrong) {
    const reply = await send(path, { ...good, ...typed });
    const what = `${path} ${JSON.stringify(typed)}`;
    expect(reply.status, what).toBe(400);
    const { "": _, ...atFields } = reply.faults;
    expect(Object.keys(atFields).sort(), what).toEqual(Object.keys(faults).sort());
    for (const [name, words] of Object.entries(faults)) {
      expect(atFields[name], what).toMatch(words);
      expect(isWords(atFields[name] ?? ""), `${what}: ${atFields[name]}`).toBe(true);
    }
  }
  const { roles: _, ...noRoles } = newInvitation();
  const none = await send("/office/people/invite", noRoles);
  expect([none.status, none.faults.roles]).toEqual([400, "Choose at least one role."]);
  expect(none.typed).toMatchObject({ name: noRoles.name, email: noRoles.email });
});

test("the last manager is neither demoted nor deactivated, by nobody's and by their own hand", async () => {
  const self = `/office/people/${manager.personId}`;
  const forms: Form[] = [
    { intent: "deactivate" },
    { intent: "change", roles: "driver", yardId: "" },
  ];
  for (const form of forms) {
    const answer = await post(self, form);
    expect(answer.status()).toBe(409);
    expect(await answer.text()).toContain("Somebody must stay manager here.");
  }
  const [still] = await database.db
    .select()
    .from(memberships)
    .where(
      and(eq(memberships.carrierId, ours.carrierId), eq(memberships.personId, manager.personId)),
    );
  expect(still).toMatchObject({ roles: ["manager"], deactivatedAt: null });
});

/** Rows of a table that are this carrier's. */
async function rowsOf(table: MySqlTable & { carrierId: MySqlColumn }) {
  return database.db.select().from(table).where(eq(table.carrierId, ours.carrierId));
}

test("each form pressed twice at once is entered once, and both presses are told so kindly", async () => {
  const { newFitting, setPoint, dated, round: weekly } = paths();
  const forms: [path: string, form: Form, table: Parameters<typeof rowsOf>[0], from?: Page][] = [
    ["/office/trucks/new", { ...newTruck(), start: "vane-3000" }, trucks],
    ["/office/yards/new", newYard(), yards],
    [newFitting, hose(), fittings],
    [setPoint("vacuum-relief"), vacuum, setPoints],
    [dated("annual-inspection"), { passedOn: "2026-01-06", dueOn: "", note: "" }, datedTests],
    ["/office/checks", newCheck(), ownChecks],
    ["/office/people/invite", newInvitation(), invitations],
    [weekly, round(), rounds, bench],
  ];
  for (const [path, form, table, from = page] of forms) {
    const before = (await rowsOf(table)).length;
    const answers = await Promise.all([1, 2, 3].map(() => post(path, form, from)));
    const told = answers.map((answer) => answer.headers().location ?? "");
    expect(
      answers.map((answer) => answer.status()),
      path,
    ).toEqual([302, 302, 302]);
    expect(new Set(told.map((location) => location.split("?")[0])).size, path).toBe(1);
    for (const location of told) expect(location, path).toContain("done=");
    // Going back and pressing once more is no other thing either.
    const late = await post(path, form, from);
    expect(late.status(), `${path} later`).toBe(302);
    expect((await rowsOf(table)).length, path).toBe(before + 1);
  }
});

test("an invitation that was used, taken back or is too old, and a link nobody made, say so", async ({
  request,
}) => {
  const now = Date.now();
  const link = async (more: Partial<typeof invitations.$inferInsert>) => {
    const token = makeToken();
    await database.db.insert(invitations).values({
      carrierId: ours.carrierId,
      id: uuidv7(),
      email: `${uuidv7()}@example.test`,
      name: "Somebody",
      roles: ["driver"],
      tokenHash: tokenHash(token),
      invitedBy: manager.personId,
      createdAt: new Date(now),
      expiresAt: new Date(now + 60_000),
      ...more,
    });
    return `/invitation/${token}`;
  };
  const ended: [path: string, status: number][] = [
    [await link({ expiresAt: new Date(now - 1000) }), 410],
    [await link({ revokedAt: new Date(now) }), 410],
    [`/invitation/${makeToken()}`, 404],
    [`/invitation/${LONG}`, 404],
    ["/invitation/%00", 404],
  ];
  const members = (await rowsOf(memberships)).length;
  for (const [path, status] of ended) {
    const shown = await request.get(path);
    expect(shown.status(), path).toBe(status);
    const sent = await request.post(path, {
      form: {},
      headers: { Origin: ORIGIN },
      maxRedirects: 0,
    });
    expect(sent.status(), path).toBe(status);
    expect((await sent.text()).length).toBeGreaterThan(500);
  }
  expect((await rowsOf(memberships)).length).toBe(members);
  const once = await link({});
  const join = () =>
    request.post(once, {
      form: {},
      headers: { Origin: ORIGIN, "X-Forwarded-For": "x" },
      maxRedirects: 0,
    });
  const told = [(await join()).status(), (await join()).status()];
  expect(told).toEqual([302, 302]);
  expect((await rowsOf(memberships)).length).toBe(members + 1);
});

test("a code that is too old or was used is said at its field, and opens nothing", async ({
  playwright,
}) => {
  const browser = await playwright.request.newContext({ baseURL: ORIGIN });
  const [person] = await database.db.select().from(people).where(eq(people.id, mechanic.personId));
  const step = (form: Form) =>
    browser.post("/sign-in", { form, headers: { Origin: ORIGIN }, maxRedirects: 0 });
  const email = person!.email;
  const code = await newCode(email, async () => {
    expect((await step({ step: "send", email })).status()).toBe(302);
  });
  const ends = { expiresAt: new Date(Date.now() - 1000) };
  await database.db.update(signInCodes).set(ends).where(eq(signInCodes.email, email));
  const old = await read(await step({ step: "code", code }), { code });
  expect([old.status, old.faults.code]).toEqual([
    400,
    expect.stringContaining("older than ten minutes"),
  ]);
  const fresh = await newCode(email, async () => {
    expect((await step({ step: "again" })).status()).toBe(302);
  });
  const { cookies } = await browser.storageState();
  expect((await step({ step: "code", code: fresh })).status()).toBe(302);
  const marked = cookies.find((cookie) => cookie.name.endsWith("keypeg-browser"));
  const again = await playwright.request.newContext({
    baseURL: ORIGIN,
    extraHTTPHeaders: { Cookie: `${marked?.name}=${marked?.value}` },
  });
  const used = await again.post("/sign-in", {
    form: { step: "code", code: fresh },
    headers: { Origin: ORIGIN },
    maxRedirects: 0,
  });
  expect(used.status()).toBe(400);
  await page.setContent(await used.text(), { waitUntil: "domcontentloaded" });
  await expect(page.getByRole("alert")).toHaveText(/This code was used or replaced/);
  await again.dispose();
  await browser.dispose();
});

test("whatever stands in whichever field of the office, no answer is a fault of ours", async () => {
  test.setTimeout(240_000);
  const { truck, fitting, newFitting, setPoint, dated, person, round: weekly } = paths();
  const forms: [path: string, form: () => Form, from?: Page][] = [
    ["/office/trucks/new", newTruck],
    [`${truck}/details`, () => ({ unitNumber: unit, kind: "powered", vin: "" })],
    [`${truck}/move`, () => ({ yardId: ours.yardId })],
    [truck, () => ({ intent: "remove-fitting", fittingId: uuidv7() })],
    [newFitting, hose],
    [fitting, () => pump],
    [setPoint("pressure-relief"), () => pressure],
    [dated("permit"), () => ({ passedOn: "", dueOn: "2027-01-06", note: "" })],
    ["/office/yards/new", newYard],
    [`/office/yards/${ours.yardId}`, newYard],
    ["/office/checks", newCheck],
    ["/office/people", () => ({ intent: "take-back", invitationId: uuidv7() })],
    ["/office/people/invite", newInvitation],
    [person, () => ({ intent: "change", roles: "mechanic", yardId: "", onCall: "" })],
    ["/office/policy", policy],
    ["/account", () => ({ intent: "phone", phone: "" })],
    [weekly, round, bench],
  ];
  const nasty = [
    "",
    " ",
    LONG,
    "\u0000",
    "a\u0000\ud83d\ude9b\u202e",
    "-1",
    "9".repeat(400),
    "null",
  ];
  const multipart = { name: "x.txt", mimeType: "text/plain", buffer: Buffer.from("x") };
  let asked = 0;
  for (const [path, good, from = page] of forms) {
    const answers: [what: string, answer: APIResponse][] = [];
    const headers = { Origin: ORIGIN };
    for (const field of Object.keys(good())) {
      for (const value of nasty) {
        const what = `${field}=${value.slice(0, 20)}`;
        answers.push([what, await post(path, { ...good(), [field]: value }, from)]);
      }
      const encoded = new URLSearchParams(good());
      encoded.append(field, "again");
      encoded.append(`${field}[0].x`, "y");
      for (const [what, sent] of [
        [
          "twice",
          {
            data: encoded.toString(),
            headers: { ...headers, "Content-Type": "application/x-www-form-urlencoded" },
          },
        ],
        ["a file", { multipart: { ...good(), [field]: multipart }, headers }],
        [
          "nothing",
          {
            form: Object.fromEntries(Object.entries(good()).filter(([one]) => one !== field)),
            headers,
          },
        ],
      ] as const) {
        answers.push([
          `${field}: ${what}`,
          await from.request.post(path, { ...sent, maxRedirects: 0 }),
        ]);
      }
    }
    for (const [type, data] of [
      ["text/plain", "unitNumber=X"],
      ["application/json", '{"unitNumber":"X"}'],
      ["multipart/form-data", "no boundary"],
      ["multipart/form-data; boundary=b", "--b\r\nnothing"],
      [
        "application/x-www-form-urlencoded",
        "%E0%A4%A=%&&&=&__proto__[x]=1&constructor.prototype.y=2",
      ],
    ]) {
      const sent = { data, headers: { ...headers, "Content-Type": type ?? "" }, maxRedirects: 0 };
      answers.push([`${type}: ${data}`, await from.request.post(path, sent)]);
    }
    for (const [what, answer] of answers) {
      expect([302, 400, 404, 409], `${path} ${what}: ${answer.status()}`).toContain(
        answer.status(),
      );
      asked += 1;
    }
  }
  expect(asked).toBeGreaterThan(600);
});
