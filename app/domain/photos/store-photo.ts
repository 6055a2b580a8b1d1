import { and, eq, isNull } from "drizzle-orm";
import sharp from "sharp";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { photos } from "../../db/schema/tags";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { writeChanges } from "../feed";
import { sha256Hex } from "../receipts/once";

/** Where picture bytes go: put verifies what it wrote before it answers. */
export interface PhotoStore {
  put(key: string, bytes: Uint8Array, type: string): Promise<void>;
}

export type PhotoOutcome =
  | { state: "stored"; id: string }
  | { state: "not-found" | "not-yours" | "other-picture" | "not-a-picture" }
  /** The object store did not take it: nothing is marked, and the same bytes may come again. */
  | { state: "store-away"; cause: unknown };

const LONG_EDGE = 1600;
const THUMB_EDGE = 320;
const TYPES = new Set(["jpeg", "png", "webp"]);

/** At most two pictures are decoded at once: one can take 200 MB while it is open. */
let decoding = 0;
const waiting: (() => void)[] = [];
async function decode<T>(work: () => Promise<T>): Promise<T> {
  if (decoding >= 2) await new Promise<void>((go) => waiting.push(go));
  decoding += 1;
  try {
    return await work();
  } finally {
    decoding -= 1;
    waiting.shift()?.();
  }
}

/** Re-encodes a picture upright, without its metadata (place and device go with it). Null when it is none. */
async function reencode(bytes: Uint8Array) {
  return decode(async () => {
    try {
      const options = { limitInputPixels: 50_000_000, failOn: "error" as const };
      const { format } = await sharp(bytes, options).metadata();
      if (!format || !TYPES.has(format)) return null;
      const upright = sharp(bytes, options).autoOrient();
      const scaled = (edge: number) =>
        upright
          .clone()
          .resize({ width: edge, height: edge, fit: "inside", withoutEnlargement: true })
          .jpeg({ quality: 82 })
          .toBuffer({ resolveWithObject: true });
      return { large: await scaled(LONG_EDGE), thumb: await scaled(THUMB_EDGE) };
    } catch {
      return null;
    }
  });
}

type Promised = typeof photos.$inferSelect;

/** Stores a picture that is the promised one, and marks it. */
async function storePicture(
  db: Db,
  store: PhotoStore,
  promised: Promised,
  bytes: Uint8Array,
  clock: Clock,
): Promise<PhotoOutcome> {
  const { carrierId, id } = promised;
  const picture = await reencode(bytes);
  if (!picture) return { state: "not-a-picture" };
  const objectKey = `${carrierId}/photos/${id}.jpg`;
  const thumbKey = `${carrierId}/photos/${id}.thumb.jpg`;
  try {
    await store.put(objectKey, picture.large.data, "image/jpeg");
    await store.put(thumbKey, picture.thumb.data, "image/jpeg");
  } catch (cause) {
    return { state: "store-away", cause };
  }
  await inTransaction(db, async (tx) => {
    const { width, height } = picture.large.info;
    const now = clock.now();
    const [marked] = await tx
      .update(photos)
      .set({ storedAt: now, objectKey, thumbKey, width, height })
      .where(and(thatPhoto(carrierId, id), isNull(photos.storedAt)));
    if (marked.affectedRows !== 1) return;
    await writeChanges(tx, carrierId, now, [
      { kind: "photo", truckId: promised.truckId, subjectId: id },
    ]);
  });
  return { state: "stored", id };
}

function thatPhoto(carrierId: string, id: string) {
  return and(eq(photos.carrierId, carrierId), eq(photos.id, id));
}

/** Pictures being stored: one sent again meanwhile waits for the first, and is not written beside it. */
const underWay = new Map<string, Promise<PhotoOutcome>>();

/**
 * Takes the bytes of a photo that a record promised: owner, size and SHA-256 are checked
 * against the manifest, the picture is re-encoded, stored, verified and marked. Sent again, it
 * answers the same. Photos never decide the gate (K2).
 */
export async function storePhoto(
  db: Db,
  actor: Actor,
  store: PhotoStore,
  input: { id: string; bytes: Uint8Array },
  clock: Clock = systemClock,
): Promise<PhotoOutcome> {
  const { carrierId, personId } = actor;
  const [promised] = await db.select().from(photos).where(thatPhoto(carrierId, input.id));
  if (!promised) return { state: "not-found" };
  if (promised.ownerId !== personId) return { state: "not-yours" };
  const same = promised.bytes === input.bytes.length && promised.sha256 === sha256Hex(input.bytes);
  if (!same) return { state: "other-picture" };
  if (promised.storedAt !== null) return { state: "stored", id: promised.id };
  const key = `${carrierId}/${promised.id}`;
  const running = underWay.get(key);
  if (running) return running;
  const storing = storePicture(db, store, promised, input.bytes, clock);
  underWay.set(key, storing);
  try {
    return await storing;
  } finally {
    underWay.delete(key);
  }
}

/** Where a stored photo lies, scoped to the carrier; null when there is none to show. */
export async function photoObject(
  db: Db,
  actor: Actor,
  input: { id: string; size: "large" | "thumb" },
): Promise<string | null> {
  const [row] = await db
    .select({ objectKey: photos.objectKey, thumbKey: photos.thumbKey })
    .from(photos)
    .where(thatPhoto(actor.carrierId, input.id));
  return (input.size === "large" ? row?.objectKey : row?.thumbKey) ?? null;
}
