import { eq } from "drizzle-orm";
import sharp from "sharp";
import { v7 as uuidv7 } from "uuid";
import { afterAll, beforeAll, beforeEach, expect, test } from "vitest";
import { config } from "~/config";
import { changes } from "~/db/schema/carriers";
import { photos } from "~/db/schema/tags";
import type { Actor } from "~/domain/actor";
import { storePhoto } from "~/domain/photos/store-photo";
import * as photoRoute from "~/routes/api/photo";
import * as viewRoute from "~/routes/api/photo-view";
import { openStorage } from "~/services/storage";
import { problemOf, sendBytes, signedIn } from "./api-requests";
import { testDb } from "./database";
import { makeCarrier, makePerson, type TestCarrier, TestClock, truckRow } from "./factories";
import { drawnPicture } from "./pictures";
import type { TestBrowser } from "./requests";
import { StrictStore } from "./strict-store";
import {
  accepted,
  makeTruckToWalk,
  sendWalk,
  sha256,
  type TruckToWalk,
  tagged,
  walkBody,
} from "./walk-bodies";

const store = new StrictStore(process.env.KEYPEG_S3_ENDPOINT ?? "");
let clock: TestClock;
let carrier: TestCarrier;
let driver: Actor;
let browser: TestBrowser;
let truck: TruckToWalk;

beforeAll(async () => {
  // Pictures are looked at where they lie; the app writes them past the strict store.
  process.env.KEYPEG_S3_PUBLIC_ENDPOINT = process.env.KEYPEG_S3_ENDPOINT;
  process.env.KEYPEG_S3_ENDPOINT = await store.start();
});
afterAll(() => store.stop());

beforeEach(async () => {
  const db = testDb();
  store.mood = "well";
  clock = new TestClock(Date.now());
  carrier = await makeCarrier(db, clock);
  driver = await makePerson(db, carrier, ["driver"]);
  truck = await makeTruckToWalk(db, carrier, clock);
  browser = await signedIn(driver);
});

/** A walk with a tag whose photo these bytes are. */
async function promise(
  bytes: Uint8Array,
  more: Partial<{ id: string; sha256: string; bytes: number }> = {},
): Promise<string> {
  const found = tagged(truck, "rear.lamps", "brake-or-turn");
  const id = uuidv7();
  const manifest = { id, tagId: found.tags[0]!.id, sha256: sha256(bytes), bytes: bytes.length };
  const body = walkBody(truck, { ...found, photos: [{ ...manifest, ...more }] });
  accepted(await sendWalk(testDb(), driver, body, clock));
  return more.id ?? id;
}

const put = (id: string, bytes: Uint8Array, by = browser, headers: Record<string, string> = {}) =>
  sendBytes(by, photoRoute, `/api/v1/photos/${id}`, {
    method: "PUT",
    body: bytes as BodyInit,
    headers,
    params: { id },
  });

const view = (id: string, size: "large" | "thumb" = "large", by = browser) =>
  by.send(viewRoute, `/api/v1/photos/${id}/${size}`, { params: { id, size } });

async function rowOf(id: string) {
  const [row] = await testDb().select().from(photos).where(eq(photos.id, id));
  return row ?? null;
}

/** What lies in the store, by the address the app hands out. */
async function shown(id: string, size: "large" | "thumb" = "large"): Promise<Buffer> {
  const answer = await view(id, size);
  const back = await fetch(answer.headers.get("Location") ?? "");
  expect(back.status).toBe(200);
  expect(back.headers.get("Content-Type")).toBe("image/jpeg");
  return Buffer.from(await back.arrayBuffer());
}

test("a promised JPEG, PNG or WebP is stored as JPEG, large and small, and can be looked at", async () => {
  for (const format of ["jpeg", "png", "webp"] as const) {
    const bytes = await drawnPicture({ width: 2400, height: 1200, format });
    const id = await promise(bytes);
    const answer = await put(id, bytes);
    expect([answer.status, answer.data], format).toEqual([200, { state: "stored", id }]);
    expect(answer.headers.get("Keypeg-Receipt")).toBe(id);
    const large = await sharp(await shown(id)).metadata();
    expect([large.format, large.width, large.height]).toEqual(["jpeg", 1600, 800]);
    const thumb = await sharp(await shown(id, "thumb")).metadata();
    expect([thumb.width, thumb.height]).toEqual([320, 160]);
    expect(await rowOf(id)).toMatchObject({
      width: 1600,
      height: 800,
      objectKey: `${carrier.carrierId}/photos/${id}.jpg`,
    });
  }
});

test("a small picture is not made larger", async () => {
  const bytes = await drawnPicture({ width: 90, height: 40 });
  const id = await promise(bytes);
  await put(id, bytes);
  const { width, height } = await sharp(await shown(id)).metadata();
  expect([width, height]).toEqual([90, 40]);
});

test("place and device do not reach the store, and the picture stands upright", async () => {
  const marked = await sharp(await drawnPicture({ width: 80, height: 40 }))
    .withExif({
      IFD0: { Make: "PHONE-OF-A-DRIVER", Copyright: "HOME-ADDRESS" },
      IFD3: { GPSLatitudeRef: "N", GPSLatitude: "39/1 44/1 0/1", GPSMapDatum: "WGS-84" },
    })
    .withXmp("<x:xmpmeta xmlns:x='adobe:ns:meta/'>WHERE-IT-WAS</x:xmpmeta>")
    .jpeg()
    .toBuffer();
  const bytes = await sharp(marked).keepMetadata().withMetadata({ orientation: 6 }).toBuffer();
  const before = await sharp(bytes).metadata();
  expect([before.width, before.height, before.orientation]).toEqual([80, 40, 6]);
  expect(bytes.includes("HOME-ADDRESS") && bytes.includes("WGS-84")).toBe(true);

  const id = await promise(bytes);
  expect((await put(id, bytes)).status).toBe(200);
  for (const size of ["large", "thumb"] as const) {
    const kept = await shown(id, size);
    const after = await sharp(kept).metadata();
    expect([after.width, after.height, after.orientation]).toEqual([40, 80, undefined]);
    expect([after.exif, after.xmp, after.iptc]).toEqual([undefined, undefined, undefined]);
    for (const word of ["HOME-ADDRESS", "PHONE-OF", "WGS-84", "WHERE-IT-WAS"]) {
      expect(kept.includes(word), word).toBe(false);
    }
  }
});

test("a photo that no record promised is a 404, and so is an id that is none", async () => {
  const bytes = await drawnPicture();
  for (const id of [uuidv7(), "not-a-uuid", "00000000-0000-0000-0000-000000000000"]) {
    const answer = await put(id, bytes);
    expect([answer.status, problemOf(answer).code], id).toEqual([404, "not-found"]);
    expect((await view(id)).status).toBe(404);
  }
});

test("a photo sent before its record is told so, and taken after the record came", async () => {
  const bytes = await drawnPicture();
  const id = uuidv7();
  expect((await put(id, bytes)).status).toBe(404);
  await promise(bytes, { id });
  expect((await put(id, bytes)).status).toBe(200);
});

test("what is no JPEG, PNG or WebP is refused, and can still be sent right", async () => {
  const jpeg = Buffer.from(await drawnPicture());
  const svg = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"/>');
  const heic = Buffer.concat([
    Buffer.from([0, 0, 0, 24]),
    Buffer.from("ftypheic\0\0\0\0mif1heic"),
    Buffer.alloc(64),
  ]);
  const zip = Buffer.concat([Buffer.from("PK\x03\x04"), Buffer.alloc(60)]);
  const cases: [string, Buffer][] = [
    ["text", Buffer.from("This is no picture.")],
    ["a page", Buffer.from("<!doctype html><script>alert(1)</script>")],
    ["zip", zip],
    ["svg", svg],
    ["gif", Buffer.from(await drawnPicture({ format: "gif" }))],
    ["heic", heic],
    ["cut short", jpeg.subarray(0, jpeg.length / 2)],
    ["head alone", jpeg.subarray(0, 20)],
    ["one byte", Buffer.from([0xff])],
  ];
  for (const [name, bytes] of cases) {
    const id = await promise(bytes);
    const answer = await put(id, bytes, browser, { "Content-Type": "image/jpeg" });
    expect([answer.status, problemOf(answer).code], name).toEqual([415, "not-a-picture"]);
    expect(problemOf(answer).title).toMatch(/JPEG, PNG or WebP/);
    expect(await rowOf(id), name).toMatchObject({ storedAt: null, objectKey: null });
    expect((await view(id)).status).toBe(404);
  }
});

test("a picture of a hundred million points is refused before it is opened", async () => {
  const background = { r: 0, g: 0, b: 0 };
  const bytes = await sharp({
    create: { width: 10_000, height: 10_000, channels: 3, background },
    limitInputPixels: false,
  })
    .png({ compressionLevel: 9 })
    .toBuffer();
  expect(bytes.length).toBeLessThan(1_000_000);
  const id = await promise(bytes);
  expect((await put(id, bytes)).status).toBe(415);
  expect((await rowOf(id))?.storedAt).toBeNull();
});

test("other bytes than the record promised are refused: another picture, one byte more, another length", async () => {
  const bytes = await drawnPicture();
  const grown = Buffer.concat([bytes, Buffer.from([0])]);
  const cases: [string, Parameters<typeof promise>[1], Uint8Array][] = [
    ["another picture", {}, await drawnPicture()],
    ["one byte more", {}, grown],
    ["cut short", {}, bytes.subarray(0, bytes.length - 1)],
    ["empty", {}, new Uint8Array()],
    ["another hash", { sha256: sha256("else") }, bytes],
    ["another length", { bytes: bytes.length + 1 }, bytes],
    ["far over what was promised", {}, Buffer.alloc(13 * 1024 * 1024)],
  ];
  for (const [name, more, sent] of cases) {
    const id = await promise(bytes, more);
    const answer = await put(id, sent);
    expect([answer.status, problemOf(answer).code], name).toEqual([422, "other-picture"]);
    expect((await rowOf(id))?.storedAt, name).toBeNull();
  }
});

test("K4: the same photo sent ten times at once is stored once and answered alike", async () => {
  const db = testDb();
  const bytes = await drawnPicture();
  const id = await promise(bytes);
  const answers = await Promise.all(Array.from({ length: 10 }, () => put(id, bytes)));
  expect(new Set(answers.map(({ status, data }) => JSON.stringify([status, data])))).toEqual(
    new Set([JSON.stringify([200, { state: "stored", id }])]),
  );
  const rows = await db.select().from(changes).where(eq(changes.subjectId, id));
  expect(rows.filter((row) => row.kind === "photo")).toHaveLength(1);
});

test("K4: sent again after it was stored it is answered the same, and not written again", async () => {
  const bytes = await drawnPicture();
  const id = await promise(bytes);
  const first = await put(id, bytes);
  const before = await rowOf(id);
  const written = store.put.length;
  const second = await put(id, bytes);
  expect([second.status, second.data]).toEqual([first.status, first.data]);
  expect(store.put).toHaveLength(written);
  expect(await rowOf(id)).toEqual(before);
});

test("K4: other bytes under a stored photo's id are refused, and what lies there stays", async () => {
  const bytes = await drawnPicture();
  const id = await promise(bytes);
  await put(id, bytes);
  const before = await shown(id);
  const answer = await put(id, await drawnPicture());
  expect([answer.status, problemOf(answer).code]).toEqual([422, "other-picture"]);
  expect((await shown(id)).equals(before)).toBe(true);
});

test("another driver's photo is not mine to send, and I may look at it", async () => {
  const bytes = await drawnPicture();
  const id = await promise(bytes);
  const other = await signedIn(await makePerson(testDb(), carrier, ["driver"]));
  const answer = await put(id, bytes, other);
  expect([answer.status, problemOf(answer).title]).toEqual([
    404,
    "No record here promised this picture.",
  ]);
  expect((await rowOf(id))?.storedAt).toBeNull();
  await put(id, bytes);
  expect((await view(id, "thumb", other)).status).toBe(302);
});

test("K7: another carrier neither sends nor sees a photo, and is told what a wrong id is told", async () => {
  const bytes = await drawnPicture();
  const id = await promise(bytes);
  const elsewhere = await makeCarrier(testDb(), clock);
  const stranger = await signedIn(await makePerson(testDb(), elsewhere, ["driver"]));
  const theirs = await put(id, bytes, stranger);
  const unknown = await put(uuidv7(), bytes, stranger);
  expect(theirs.data).toEqual(unknown.data);
  expect(theirs.status).toBe(404);
  await put(id, bytes);
  expect((await view(id, "large", stranger)).status).toBe(404);
});

test("nobody signed out, and nobody whose work it is not, sends a photo", async () => {
  const bytes = await drawnPicture();
  const id = await promise(bytes);
  const dispatcher = await signedIn(await makePerson(testDb(), carrier, ["dispatcher"]));
  expect((await put(id, bytes, dispatcher)).status).toBe(403);
  browser.cookies.clear();
  expect((await put(id, bytes)).status).toBe(401);
  expect((await view(id)).status).toBe(401);
  expect((await rowOf(id))?.storedAt).toBeNull();
});

test("a photo is looked at by an address that ends in a minute and is kept nowhere", async () => {
  const bytes = await drawnPicture();
  const id = await promise(bytes);
  expect((await view(id)).status).toBe(404);
  await put(id, bytes);
  const answer = await view(id);
  expect(answer.status).toBe(302);
  expect(answer.headers.get("Cache-Control")).toBe("no-store");
  const address = new URL(answer.headers.get("Location") ?? "");
  expect(address.searchParams.get("X-Amz-Expires")).toBe("60");
  expect(address.origin).toBe(process.env.KEYPEG_S3_PUBLIC_ENDPOINT);
});

test("K2: photos never decide the gate: missing, stored or refused, the standing stays", async () => {
  const bytes = await drawnPicture();
  const id = await promise(bytes);
  const before = await truckRow(testDb(), truck);
  expect(before.standing).toBe("held");
  await put(id, await drawnPicture());
  store.mood = "away";
  await put(id, bytes);
  store.mood = "well";
  await put(id, bytes);
  expect((await rowOf(id))?.storedAt).not.toBeNull();
  expect(await truckRow(testDb(), truck)).toEqual(before);
});

test("many pictures at once are all stored", async () => {
  const pictures = await Promise.all(
    Array.from({ length: 8 }, () => drawnPicture({ width: 900, height: 700 })),
  );
  const ids = await Promise.all(pictures.map((bytes) => promise(bytes)));
  const answers = await Promise.all(pictures.map((bytes, n) => put(ids[n]!, bytes)));
  expect(answers.map((answer) => answer.status)).toEqual(pictures.map(() => 200));
});

test("with the object store away a photo is told to come again, and is taken when it is back", async () => {
  const bytes = await drawnPicture();
  for (const mood of ["away", "forgets", "garbles", "hangs-up"] as const) {
    const id = await promise(bytes);
    store.mood = mood;
    const answer = await put(id, bytes);
    expect([answer.status, problemOf(answer).code], mood).toEqual([503, "store-away"]);
    expect(Number(answer.headers.get("Retry-After")), mood).toBeGreaterThan(0);
    expect(JSON.stringify(answer.data), mood).not.toMatch(/127\.0\.0\.1|S3|bucket/i);
    expect(await rowOf(id), mood).toMatchObject({ storedAt: null, objectKey: null });
    store.mood = "well";
    expect((await put(id, bytes)).status, mood).toBe(200);
    expect((await sharp(await shown(id)).metadata()).format).toBe("jpeg");
  }
});

test("a store that stalls is not waited for past the deadline", async () => {
  const bytes = await drawnPicture();
  const id = await promise(bytes);
  const soon = openStorage(config().s3, 200);
  store.mood = "stalls";
  const outcome = await storePhoto(testDb(), driver, soon, { id, bytes });
  expect(outcome.state).toBe("store-away");
  store.mood = "well";
  expect((await put(id, bytes)).status).toBe(200);
});
