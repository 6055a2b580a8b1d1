import { eq } from "drizzle-orm";
import { RouterContextProvider } from "react-router";
import { v7 as uuidv7 } from "uuid";
import { beforeAll, expect, test } from "vitest";
import { askedContext, databaseContext, signedInContext } from "~/context";
import { fittings, ownChecks, setPoints } from "~/db/schema/trucks";
import type { Actor } from "~/domain/actor";
import { addOwnCheck, ownCheckSchema } from "~/domain/own-checks/add-own-check";
import { addTruck, addTruckSchema } from "~/domain/trucks/add-truck";
import { addYard } from "~/domain/yards/add-yard";
import { yardSchema } from "~/domain/yards/yard-input";
import * as checks from "~/routes/office/checks/checks";
import * as start from "~/routes/office/index";
import * as newFitting from "~/routes/office/trucks/add-fitting";
import * as datedTest from "~/routes/office/trucks/dated-test";
import * as details from "~/routes/office/trucks/details";
import * as fitting from "~/routes/office/trucks/fitting";
import * as trucks from "~/routes/office/trucks/list";
import * as move from "~/routes/office/trucks/move";
import * as newTruck from "~/routes/office/trucks/new";
import * as setPoint from "~/routes/office/trucks/set-point";
import * as sheet from "~/routes/office/trucks/sheet";
import * as truck from "~/routes/office/trucks/truck";
import * as yards from "~/routes/office/yards/list";
import * as newYard from "~/routes/office/yards/new";
import * as yard from "~/routes/office/yards/yard";
import { testDatabase, testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";

const clock = new TestClock();
let ours: TestCarrier;
let manager: Actor;
let stranger: Actor;
let driver: Actor;
let unit: { truckId: string; carrierId: string };
let pumpId: string;

const UNIT = "R-1";

beforeAll(async () => {
  ours = await makeCarrier(testDb(), clock);
  manager = await makePerson(testDb(), ours, ["manager"]);
  driver = await makePerson(testDb(), ours, ["driver", "dispatcher", "mechanic"]);
  stranger = await makePerson(testDb(), await makeCarrier(testDb(), clock), ["manager"]);
  const input = addTruckSchema.parse({
    unitNumber: UNIT,
    kind: "powered",
    yardId: ours.yardId,
    start: "vane-3000",
  });
  const added = await addTruck(testDb(), manager, input);
  if (!added.ok) throw new Error("no truck");
  unit = { carrierId: ours.carrierId, truckId: added.value.id };
  const rows = await testDb().select().from(fittings).where(eq(fittings.truckId, unit.truckId));
  pumpId = rows.find((row) => row.kind === "pump")!.id;
});

interface Answer {
  status: number;
  location: string | null;
  body: unknown;
}

type Handler = (args: never) => unknown;

/** What a loader or action answers, however it does: returned, thrown or redirected. */
async function ask(
  handler: Handler,
  who: Actor | null,
  {
    params = {},
    form,
    path = "/office",
  }: { params?: object; form?: Record<string, string>; path?: string },
): Promise<Answer> {
  const context = new RouterContextProvider();
  context.set(databaseContext, testDatabase());
  context.set(askedContext, { path, api: false });
  if (who) context.set(signedInContext, { sessionId: uuidv7(), actor: who, carrierName: "C" });
  const body = new FormData();
  for (const [name, typed] of Object.entries(form ?? {})) body.append(name, typed);
  const request = new Request(`http://127.0.0.1${path}`, form ? { method: "POST", body } : {});
  let answer: unknown;
  try {
    answer = await handler({ context, params, request } as never);
  } catch (thrown) {
    answer = thrown;
  }
  if (answer instanceof Response) {
    return { status: answer.status, location: answer.headers.get("Location"), body: null };
  }
  if (answer instanceof Error) throw answer;
  if (answer !== null && typeof answer === "object" && "init" in answer && "data" in answer) {
    const { init, data } = answer as { init: { status: number } | null; data: unknown };
    return { status: init?.status ?? 200, location: null, body: data };
  }
  return { status: 200, location: null, body: answer };
}

/** Errors by field, and what was typed, as the form gets them back. */
function replied(answer: Answer) {
  const { result } = answer.body as {
    result: { error: Record<string, string[]>; initialValue: Record<string, unknown> };
  };
  return { errors: result.error, typed: result.initialValue };
}

test("a truck that cannot be entered answers 400, names the field, and keeps what was typed", async () => {
  const form = {
    unitNumber: UNIT.toLowerCase(),
    kind: "powered",
    yardId: ours.yardId,
    vin: "1-2",
    start: "",
  };
  const answer = await ask(newTruck.action, manager, { form });
  expect(answer.status).toBe(400);
  const { errors, typed } = replied(answer);
  expect(errors.unitNumber).toEqual(["R-1 is in use already. Give this one another unit number."]);
  expect(typed).toMatchObject({ unitNumber: "r-1", vin: "1-2", yardId: ours.yardId });
  const unparsed = await ask(newTruck.action, manager, { form: { ...form, unitNumber: "T 1!" } });
  expect(unparsed.status).toBe(400);
  expect(replied(unparsed).errors).toEqual({ unitNumber: ["unit-number-form"] });
  expect(replied(unparsed).typed.unitNumber).toBe("T 1!");
});

test("a form sent twice is one truck, one fitting, one check", async () => {
  const id = uuidv7();
  const form = { id, unitNumber: "R-9", kind: "powered", yardId: ours.yardId, start: "" };
  const first = await ask(newTruck.action, manager, { form });
  expect(await ask(newTruck.action, manager, { form })).toEqual(first);
  const params = { unit: "R-9" };
  const hose = {
    id: uuidv7(),
    kind: "hose",
    "attributes.count": "2",
    "attributes.lengthM.value": "50",
    "attributes.lengthM.unit": "ft",
  };
  const send = (more: object) =>
    ask(newFitting.action, manager, { params, form: { ...hose, ...more } });
  const sent = await Promise.all([send({}), send({}), send({})]);
  expect(sent.map((one) => one.location)).toEqual(Array(3).fill("/office/trucks/R-9?done=fitting"));
  // The same form, gone back to and filled in anew, is another hose.
  await send({ "attributes.count": "3" });
  const carried = await testDb().select().from(fittings).where(eq(fittings.truckId, id));
  expect(carried.map((row) => row.attributes.count).sort()).toEqual([2, 3]);
  const check = {
    id: uuidv7(),
    station: "rear",
    cadence: "daily",
    label: "Sent twice",
    good: "Once",
    colour: "white",
  };
  await ask(checks.action, manager, { form: check });
  expect((await ask(checks.action, manager, { form: check })).location).toContain("done=check");
  const kept = await testDb().select().from(ownChecks).where(eq(ownChecks.label, "Sent twice"));
  expect(kept).toHaveLength(1);
});

test("a truck that is entered leads to its own page", async () => {
  const form = {
    unitNumber: "r-2",
    kind: "towed",
    yardId: ours.yardId,
    vin: "",
    start: "towed-5000",
  };
  const answer = await ask(newTruck.action, manager, { form });
  expect(answer).toMatchObject({ status: 302, location: "/office/trucks/R-2?done=truck" });
});

test("a fitting's plate in the wrong unit or over the set point answers 400 at its own field", async () => {
  const params = { unit: UNIT, fittingId: pumpId };
  const plate = {
    "attributes.type": "vane",
    "attributes.maxVacuumPa.value": "27",
    "attributes.maxVacuumPa.unit": "gal",
  };
  const wrong = await ask(fitting.action, manager, { params, form: plate });
  expect(wrong.status).toBe(400);
  expect(replied(wrong).errors["attributes.maxVacuumPa.unit"]?.[0]).toContain("does not measure");
  expect(replied(wrong).typed).toMatchObject({
    attributes: { maxVacuumPa: { value: "27", unit: "gal" } },
  });
  const set = await ask(setPoint.action, manager, {
    params: { unit: UNIT, reading: "vacuum-relief" },
    form: { unit: "inHg", setPoint: "20", low: "19", high: "21", stop: "" },
  });
  expect(set.location).toBe("/office/trucks/R-1?done=set-point#set-points");
  const weak = {
    ...plate,
    "attributes.maxVacuumPa.value": "15",
    "attributes.maxVacuumPa.unit": "inHg",
  };
  const under = await ask(fitting.action, manager, { params, form: weak });
  expect(replied(under).errors["attributes.maxVacuumPa.value"]?.[0]).toContain("20 inHg");
});

test("a set point over the pump's limit, off the gauge's scale or in gallons answers 400 and sets nothing", async () => {
  const before = await testDb().select().from(setPoints).where(eq(setPoints.truckId, unit.truckId));
  const params = { unit: UNIT, reading: "pressure-relief" };
  const fields = { unit: "psi", setPoint: "12", low: "11", high: "13", stop: "" };
  const set = async (more: Record<string, string>) => {
    const answer = await ask(setPoint.action, manager, { params, form: { ...fields, ...more } });
    expect(answer.status).toBe(400);
    return replied(answer).errors;
  };
  expect((await set({ setPoint: "16", high: "17" })).setPoint?.[0]).toContain("15 psi or less");
  expect((await set({ stop: "31" })).stop?.[0]).toContain("15 psi");
  expect((await set({ unit: "gal" })).unit?.[0]).toContain("does not measure");
  expect((await set({ setPoint: "twelve" })).setPoint).toEqual(["not-a-number"]);
  const after = await testDb().select().from(setPoints).where(eq(setPoints.truckId, unit.truckId));
  expect(after).toEqual(before);
});

test("a test passed in the future answers 400 at its date", async () => {
  const params = { unit: UNIT, test: "annual-inspection" };
  const form = { passedOn: "2199-01-01", dueOn: "", note: "On the door" };
  const answer = await ask(datedTest.action, manager, { params, form });
  expect(answer.status).toBe(400);
  expect(replied(answer).errors.passedOn?.[0]).toContain("day to come");
  expect(replied(answer).typed).toMatchObject({ passedOn: "2199-01-01", note: "On the door" });
});

test("a yard with a zone nobody knows answers 400 and keeps what was typed", async () => {
  const form = {
    name: "West Yard",
    zone: "America/Atlantis",
    elevation: "low",
    elevationUnit: "ft",
    phone: "",
    shopOpens: "06:00",
  };
  const answer = await ask(newYard.action, manager, { form });
  expect(answer.status).toBe(400);
  expect(Object.keys(replied(answer).errors).sort()).toEqual(["elevation", "zone"]);
  expect(replied(answer).typed).toMatchObject({ name: "West Yard", elevation: "low" });
});

test("a button's command that makes no sense answers 400 and changes nothing", async () => {
  const before = await truckRow(testDb(), unit);
  const forms: Record<string, string>[] = [
    { intent: "explode" },
    { intent: "remove-fitting", fittingId: "x" },
    {},
  ];
  for (const form of forms) {
    const answer = await ask(truck.action, manager, { params: { unit: UNIT }, form });
    expect(answer.status).toBe(400);
  }
  expect(await truckRow(testDb(), unit)).toEqual(before);
});

test("a fitting is taken off and put back with two buttons", async () => {
  const press = (intent: string) =>
    ask(truck.action, manager, {
      params: { unit: UNIT.toLowerCase() },
      form: { intent, fittingId: pumpId },
    });
  expect((await press("remove-fitting")).location).toBe("/office/trucks/R-1?done=removed");
  expect((await press("remove-fitting")).status).toBe(404);
  expect((await press("restore-fitting")).location).toBe("/office/trucks/R-1?done=restored");
});

test("the sheet says how many checks a plain day has", async () => {
  const answer = await ask(sheet.loader, manager, { params: { unit: UNIT } });
  const { view } = answer.body as { view: { daily: number; stations: { key: string }[] } };
  expect(view.daily).toBeGreaterThan(30);
  expect(view.stations[0]?.key).toBe("approach");
});

/** Every loader and action of the office, with ids of our own truck, yard and check. */
async function everything() {
  const yardId = ours.yardId;
  const added = await addOwnCheck(
    testDb(),
    manager,
    ownCheckSchema.parse({
      station: "rear",
      cadence: "daily",
      label: `Look ${uuidv7()}`,
      good: "Good",
      colour: "white",
    }),
  );
  const checkId = added.ok ? added.value.id : "";
  const truckParams = { unit: UNIT };
  const onFitting = { unit: UNIT, fittingId: pumpId };
  const point = { unit: "inHg", setPoint: "18", low: "", high: "", stop: "" };
  const yardForm = {
    name: `Yard ${uuidv7()}`,
    zone: "UTC",
    elevation: "9",
    elevationUnit: "m",
    shopOpens: "06:00",
  };
  const open: [string, Handler, object][] = [
    ["start", start.loader, {}],
    ["yards", yards.loader, {}],
    ["trucks", trucks.loader, {}],
    ["new truck", newTruck.loader, {}],
    ["new yard", newYard.loader, {}],
    ["checks", checks.loader, {}],
  ];
  const owned: [string, Handler, object][] = [
    ["yard", yard.loader, { params: { yardId } }],
    ["change yard", yard.action, { params: { yardId }, form: yardForm }],
    ["truck", truck.loader, { params: truckParams }],
    ["take off", truck.action, { params: truckParams, form: { intent: "out-of-service" } }],
    ["details", details.loader, { params: truckParams }],
    [
      "change details",
      details.action,
      { params: truckParams, form: { unitNumber: "X", kind: "powered" } },
    ],
    ["move", move.loader, { params: truckParams }],
    ["do move", move.action, { params: truckParams, form: { yardId } }],
    ["new fitting", newFitting.loader, { params: truckParams }],
    ["add fitting", newFitting.action, { params: truckParams, form: { kind: "toolbox" } }],
    ["fitting", fitting.loader, { params: onFitting }],
    ["change fitting", fitting.action, { params: onFitting, form: {} }],
    ["set point", setPoint.loader, { params: { unit: UNIT, reading: "vacuum-relief" } }],
    ["set", setPoint.action, { params: { unit: UNIT, reading: "vacuum-relief" }, form: point }],
    ["test", datedTest.loader, { params: { unit: UNIT, test: "permit" } }],
    [
      "record",
      datedTest.action,
      { params: { unit: UNIT, test: "permit" }, form: { dueOn: "2199-01-01" } },
    ],
    ["sheet", sheet.loader, { params: truckParams }],
    ["remove check", checks.action, { form: { intent: "remove", checkId } }],
  ];
  return { open, owned };
}

test("another firm's manager finds no truck, yard or check of ours, by path or by body", async () => {
  const before = await truckRow(testDb(), unit);
  const { owned } = await everything();
  for (const [name, handler, args] of owned) {
    expect((await ask(handler, stranger, args)).status, name).toBe(404);
  }
  const intoOurYard = { unitNumber: "Z-1", kind: "powered", yardId: ours.yardId, start: "" };
  const added = await ask(newTruck.action, stranger, { form: intoOurYard });
  expect(replied(added).errors.yardId).toEqual(["Choose one of your yards."]);
  const onOurTruck = {
    ...{ station: "rear", cadence: "daily", label: "L", good: "G", colour: "red" },
    truckId: unit.truckId,
  };
  const check = await ask(checks.action, stranger, { form: onOurTruck });
  expect(replied(check).errors.truckId).toEqual(["Choose one of your trucks, or all of them."]);
  expect(await truckRow(testDb(), unit)).toEqual(before);
});

test("ids that are no ids, and unit numbers nobody has, are not found", async () => {
  const nothing: [Handler, object][] = [
    [yard.loader, { params: { yardId: "nope" } }],
    [yard.loader, { params: { yardId: uuidv7() } }],
    [truck.loader, { params: { unit: "NOPE" } }],
    [truck.loader, { params: { unit: "' or 1=1 --" } }],
    [fitting.loader, { params: { unit: UNIT, fittingId: "nope" } }],
    [fitting.loader, { params: { unit: UNIT, fittingId: uuidv7() } }],
    [setPoint.loader, { params: { unit: UNIT, reading: "moon-phase" } }],
    [datedTest.loader, { params: { unit: UNIT, test: "horoscope" } }],
    [checks.action, { form: { intent: "remove", checkId: "nope" } }],
  ];
  for (const [handler, args] of nothing) {
    expect((await ask(handler, manager, args)).status).toBe(404);
  }
});

test("nobody but a manager gets in: signed out leads to sign-in, other roles are refused", async () => {
  const { open, owned } = await everything();
  for (const [name, handler, args] of [...open, ...owned]) {
    expect((await ask(handler, null, args)).status, name).toBe(302);
    expect((await ask(handler, driver, args)).status, name).toBe(403);
  }
  for (const [name, handler, args] of open) {
    expect((await ask(handler, manager, args)).status, name).toBe(200);
  }
});

test("a yard, once changed, leads back to the list", async () => {
  const input = yardSchema.parse({
    name: "Spare Yard",
    zone: "UTC",
    elevation: 10,
    elevationUnit: "m",
    shopOpens: "06:00",
  });
  const added = await addYard(testDb(), manager, input);
  const yardId = added.ok ? added.value.id : "";
  const loaded = await ask(yard.loader, manager, { params: { yardId } });
  expect(loaded.body).toMatchObject({
    yard: { name: "Spare Yard", elevation: 33, shopOpens: "06:00" },
  });
  const form = {
    name: "Spare Yard 2",
    zone: "UTC",
    elevation: "33",
    elevationUnit: "ft",
    shopOpens: "06:30",
    winter: "on",
  };
  const saved = await ask(yard.action, manager, { params: { yardId }, form });
  expect(saved.location).toBe("/office/yards?done=yard");
});
