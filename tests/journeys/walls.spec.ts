import { type Browser, expect, type Page, test } from "@playwright/test";
import { eq } from "drizzle-orm";
import { type Database, openDatabase } from "../../app/db/client";
import { people } from "../../app/db/schema/people";
import { ROLES, type Role } from "../../app/domain/actor";
import { systemClock } from "../../app/services/clock";
import { makeCarrier, makePerson, type TestCarrier } from "../server/factories";
import { signIn } from "./people";
import { ACTIONS, type Body, type Call } from "./walls/actions";
import { builtRoutes } from "./walls/built-routes";
import { addressesOf, callAction, ownAddress, withField } from "./walls/calls";
import { carrierPrint, stopStandings } from "./walls/carrier-print";
import { addRows, nobodys, type Rows } from "./walls/rows";

/** Who may open what, said here once more and apart from the permission table. */
const OPEN = new Set(["/", "/safety", "/pieces", "/sign-in", "/sign-out", "/invitation/:token"]);
const MAY_OPEN: Record<Role, RegExp> = {
  driver: /^\/(account|walk|api)/,
  mechanic: /^\/(account|bench|board|api\/v1\/photos)/,
  dispatcher: /^\/(account|board|api\/v1\/photos\/[^/]+\/)/,
  manager: /^\/(account|bench(\/rounds)?$|board|office|api\/v1\/photos\/[^/]+\/)/,
};

/** The first answer counts; only a connection that stood idle too long is opened again. */
const ONCE = { maxRedirects: 0, maxRetries: 2 };

interface Person {
  personId: string;
  page: Page;
}

let database: Database;
let ours: TestCarrier;
let theirs: TestCarrier;
let other: Rows;
let persons: Record<Role, Person>;

/** One person of each role, signed in once for all the tests. */
async function signInEach(browser: Browser): Promise<Record<Role, Person>> {
  const { db } = database;
  const signedIn: [Role, Person][] = [];
  for (const role of ROLES) {
    const { personId } = await makePerson(db, ours, [role]);
    const [row] = await db.select().from(people).where(eq(people.id, personId));
    signedIn.push([role, { personId, page: await signIn(browser, row!.email) }]);
  }
  return Object.fromEntries(signedIn) as Record<Role, Person>;
}

test.beforeAll(async ({ browser }) => {
  database = openDatabase(process.env.KEYPEG_DATABASE_URL ?? "", 4);
  ours = await makeCarrier(database.db, systemClock);
  theirs = await makeCarrier(database.db, systemClock);
  persons = await signInEach(browser);
  other = await theirRows();
});

test.afterAll(async () => database.close());

function theirRows(): Promise<Rows> {
  return addRows(database.db, theirs, { actorId: persons.driver.personId });
}

function ownRows({ personId }: Person): Promise<Rows> {
  return addRows(database.db, ours, { actorId: personId, sessionOf: personId });
}

const untouched = new Map<Person, Rows>();

/** Rows for calls that are refused: they are as they were, and serve the next call too. */
async function untouchedRows(person: Person): Promise<Rows> {
  const rows = untouched.get(person) ?? (await ownRows(person));
  untouched.set(person, rows);
  return rows;
}

async function printOf(carrier: TestCarrier) {
  await stopStandings(database.db, carrier.carrierId);
  return carrierPrint(database.db, carrier.carrierId);
}

/** Runs a call that must leave these carriers as they were. */
async function withoutEffect<T>(
  on: TestCarrier[],
  what: string,
  run: () => Promise<T>,
): Promise<T> {
  const before = await Promise.all(on.map(printOf));
  const answer = await run();
  expect(await Promise.all(on.map(printOf)), `${what} changed something`).toEqual(before);
  return answer;
}

/** Every action of the build with every way to call it. */
async function everyCall(): Promise<[address: string, call: Call][]> {
  const built = (await builtRoutes()).filter(({ action }) => action);
  const addresses = built.map(({ address }) => address);
  expect(Object.keys(ACTIONS).sort(), "actions in walls/actions.ts").toEqual(addresses.sort());
  return Object.entries(ACTIONS).flatMap(([address, calls]) =>
    calls.map((call): [string, Call] => [address, call]),
  );
}

test("K7: no loader and no action of the build answers a stranger", async ({
  request,
  baseURL,
}) => {
  const routes = (await builtRoutes()).filter(({ address }) => !OPEN.has(address));
  expect(routes.length).toBeGreaterThan(20);
  for (const { address, loader, action } of routes) {
    expect(loader || action, `${address} has neither loader nor action`).toBe(true);
    const path = ownAddress(address, other);
    const turnedAway = (status: number) => [302, 401, 405].includes(status);
    if (loader) {
      const answer = await request.get(path, ONCE);
      expect(turnedAway(answer.status()), `GET ${path}: ${answer.status()}`).toBe(true);
      const { location = "/sign-in" } = answer.headers();
      expect(location, path).toContain("/sign-in");
    }
    if (action) {
      const method = address.startsWith("/api/v1/photos/") ? "PUT" : "POST";
      const sent = {
        method,
        maxRedirects: 0,
        headers: { Origin: baseURL ?? "" },
        form: { a: "b" },
      };
      const answer = await request.fetch(path, sent);
      expect(turnedAway(answer.status()), `${method} ${path}: ${answer.status()}`).toBe(true);
      const cross = await request.fetch(path, {
        ...sent,
        headers: { Origin: "https://else.example" },
      });
      expect(cross.status(), `cross-site ${path}`).toBe(403);
    }
  }
});

test("K7: a loader answers a person of the right role only", async () => {
  const routes = (await builtRoutes()).filter(
    ({ address, loader }) => loader && !OPEN.has(address),
  );
  for (const role of ROLES) {
    const own = await untouchedRows(persons[role]);
    for (const { address } of routes) {
      const path = ownAddress(address, own);
      const answer = await persons[role].page.request.get(path, ONCE);
      const expected = MAY_OPEN[role].test(address) ? [200, 302] : [403];
      expect(expected, `${role} at ${path}: ${answer.status()}`).toContain(answer.status());
    }
  }
});

test("K7: no action answers a person of the wrong role, and none of them changes anything", async () => {
  test.setTimeout(180_000);
  let refused = 0;
  for (const [address, call] of await everyCall()) {
    for (const role of ROLES.filter((one) => !call.may.includes(one))) {
      const own = await untouchedRows(persons[role]);
      const path = ownAddress(address, own);
      const body = call.body(own);
      const what = `${role}: ${path} ${JSON.stringify(body)}`;
      const answer = await withoutEffect([ours], what, () =>
        callAction(persons[role].page, path, call, body),
      );
      expect(answer.status(), what).toBe(403);
      refused += 1;
    }
  }
  expect(refused).toBeGreaterThan(90);
});

test("K7: another carrier's ids in a path are not found, by loader or action", async () => {
  test.setTimeout(180_000);
  const on = [ours, theirs];
  const withParams = (await builtRoutes()).filter(({ address }) => address.includes(":"));
  const called = new Set<string>();
  for (const { address } of withParams.filter(({ loader }) => loader)) {
    for (const role of ROLES.filter((one) => OPEN.has(address) || MAY_OPEN[one].test(address))) {
      const { page } = persons[role];
      const own = await untouchedRows(persons[role]);
      const mine = await page.request.get(ownAddress(address, own), ONCE);
      expect([200, 302], `${role}: own ${address}: ${mine.status()}`).toContain(mine.status());
      const paths = [other, nobodys(own)].flatMap((rows) => addressesOf(address, own, rows));
      for (const path of paths) {
        const answer = await withoutEffect(on, path, () => page.request.get(path, ONCE));
        expect(answer.status(), `${role}: GET ${path}`).toBe(404);
      }
      called.add(address);
    }
  }
  for (const [address, call] of (await everyCall()).filter(([one]) => one.includes(":"))) {
    for (const role of call.may) {
      const own = await untouchedRows(persons[role]);
      const paths = [other, nobodys(own)].flatMap((rows) => addressesOf(address, own, rows));
      for (const path of paths) {
        const body = call.body(own);
        const answer = await withoutEffect(on, path, () =>
          callAction(persons[role].page, path, call, body),
        );
        expect(answer.status(), `${role}: ${path} ${JSON.stringify(body)}`).toBe(404);
      }
      called.add(address);
    }
  }
  expect([...called].sort()).toEqual(withParams.map(({ address }) => address).sort());
});

function expectTaken(call: Call, status: number, what: string) {
  expect(call.answers ? [call.answers] : [200, 302], `${what}: ${status}`).toContain(status);
}

/** Another carrier's id in one field, beside an id that nobody has. */
async function checkField(
  role: Role,
  address: string,
  call: Call,
  field: string,
  [idOf, fate]: Call["ids"][string],
): Promise<void> {
  const send = async (idFrom: Rows | null, on: TestCarrier[]) => {
    const own = await (fate === "refused" ? untouchedRows : ownRows)(persons[role]);
    const id = idOf(idFrom ?? nobodys(own));
    const body: Body = withField(call.body(own), field, id);
    const path = ownAddress(address, own);
    const what = `${role}: ${path} ${JSON.stringify(body)}`;
    const answer = await withoutEffect(on, what, () =>
      callAction(persons[role].page, path, call, body),
    );
    const faults = (await answer.text()).match(/"errors":\[.*?\]/)?.[0] ?? "";
    return { what, said: { status: answer.status(), faults } };
  };
  const on = fate === "refused" ? [theirs, ours] : [theirs];
  // Once taken here, an id is no longer one that only the other carrier has.
  const theirId = await send(fate === "fresh" ? await theirRows() : other, on);
  const noId = await send(null, on);
  expect(theirId.said, `${theirId.what} tells another's id from none`).toEqual(noId.said);
  const { status } = theirId.said;
  if (fate === "refused") expect([400, 404], `${theirId.what}: ${status}`).toContain(status);
  else if (role === call.may[0]) expectTaken(call, status, theirId.what);
}

test("K7: another carrier's ids in a body do nothing and tell nothing", async () => {
  test.setTimeout(300_000);
  for (const [address, call] of await everyCall()) {
    for (const role of call.may) {
      for (const [field, rule] of Object.entries(call.ids)) {
        await checkField(role, address, call, field, rule);
      }
    }
    // The same body with one's own ids goes through: nothing else in it was refused above.
    const [role] = call.may;
    const own = await ownRows(persons[role]);
    const body = call.body(own);
    const path = ownAddress(address, own);
    const what = `${role}: ${path} ${JSON.stringify(body)}`;
    const answer = await withoutEffect([theirs], what, () =>
      callAction(persons[role].page, path, call, body),
    );
    expectTaken(call, answer.status(), what);
  }
});
