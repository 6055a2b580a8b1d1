import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../../app/db/client";
import { handovers, returns } from "../../../app/db/schema/handovers";
import { invitations, sessions } from "../../../app/db/schema/people";
import { acknowledgements, photos, runLimits, signOffs, tags } from "../../../app/db/schema/tags";
import {
  datedTests,
  fittings,
  ownChecks,
  rounds,
  setPoints,
  trucks,
} from "../../../app/db/schema/trucks";
import { walks } from "../../../app/db/schema/walks";
import { sheetForTruck } from "../../../app/domain/sheets/sheet-for-truck";
import { makeToken, tokenHash } from "../../../app/domain/tokens";
import { systemClock } from "../../../app/services/clock";
import { makePerson, makeTruck, type TestCarrier } from "../../server/factories";

const signature = { name: "A Signer", wording: "test" };
const hashOf = (text: string | Buffer) => createHash("sha256").update(text).digest("hex");

/** The bytes that every photo here was promised as. */
export const PICTURE = Buffer.from("a picture");

async function addTags(db: Db, at: { carrierId: string; truckId: string }, by: string) {
  const now = systemClock.now();
  const [tagId, endedTagId, signOffId, runLimitId] = [uuidv7(), uuidv7(), uuidv7(), uuidv7()];
  const limit = { kind: "no-towing" } as const;
  const hung = {
    ...at,
    colour: "yellow" as const,
    limit,
    title: "Hitch: worn",
    roadSafety: false,
    raisedBy: by,
    raisedAt: now,
    receivedAt: now,
  };
  const ended = { ...hung, id: endedTagId, signedOffAt: now };
  await db.insert(tags).values([{ ...hung, id: tagId, signedOffAt: null }, ended]);
  const signed = { ...at, signedBy: by, signedAt: now, signature, hash: hashOf(tagId) };
  await db
    .insert(signOffs)
    .values({ ...signed, id: signOffId, tagId: endedTagId, kind: "repaired", work: "cleaned" });
  await db
    .insert(runLimits)
    .values({ ...signed, id: runLimitId, tagId, limit, untilDay: "2099-12-31" });
  return { tagId, signOffId, runLimitId };
}

async function addWalk(db: Db, at: { carrierId: string; truckId: string }, driverId: string) {
  const now = systemClock.now();
  const made = await sheetForTruck(db, at, at.truckId);
  if (!made.ok) throw new Error("no sheet");
  const { sheetId, hash: sheetHash, setupVersion } = made.value;
  const [walkId, acknowledgementId] = [uuidv7(), uuidv7()];
  await db.insert(walks).values({
    ...at,
    id: walkId,
    driverId,
    kind: "before",
    sheetId,
    setupVersion,
    hash: hashOf(walkId),
    signedAt: now,
    ageMs: 0,
    receivedAt: now,
    countsFrom: now,
    yardDay: now.toISOString().slice(0, 10),
    complete: false,
    clearsNot: "incomplete",
    limits: [],
    missing: [],
    signature,
  });
  await db.insert(acknowledgements).values({
    ...at,
    id: acknowledgementId,
    driverId,
    items: [],
    satisfied: true,
    signedAt: now,
    receivedAt: now,
    signature,
    hash: hashOf(acknowledgementId),
  });
  return { walkId, acknowledgementId, sheetHash };
}

/** One key that is out, and one that came back. */
async function addHandovers(db: Db, at: { carrierId: string; truckId: string }, driverId: string) {
  const decidedAt = systemClock.now();
  const [handoverId, returnedId, returnId] = [uuidv7(), uuidv7(), uuidv7()];
  const handed = { ...at, driverId, handedBy: driverId, decidedAt, gateSeq: 0 };
  const hash = hashOf(handoverId);
  await db.insert(handovers).values([
    { ...handed, id: returnedId, hash, returnedAt: decidedAt },
    { ...handed, id: handoverId, hash, returnedAt: null },
  ]);
  await db.insert(returns).values({
    ...at,
    id: returnId,
    handoverId: returnedId,
    driverId,
    takenBy: driverId,
    returnedAt: decidedAt,
    aboard: "empty",
    endsDay: false,
    hash,
  });
  await db
    .update(trucks)
    .set({ outHandover: handoverId })
    .where(and(eq(trucks.carrierId, at.carrierId), eq(trucks.id, at.truckId)));
  return { handoverId, returnId };
}

async function addSetup(db: Db, at: { carrierId: string; truckId: string }, by: string) {
  const now = systemClock.now();
  const [removedFittingId, ownCheckId, removedCheckId, roundId] = [
    uuidv7(),
    uuidv7(),
    uuidv7(),
    uuidv7(),
  ];
  const ladder = { kind: "ladder" as const, attributes: {}, fittedAt: now, removedAt: now };
  await db.insert(fittings).values({ ...at, ...ladder, id: removedFittingId });
  const [fitting] = await db
    .select({ id: fittings.id })
    .from(fittings)
    .where(and(eq(fittings.truckId, at.truckId), eq(fittings.kind, "hitch")));
  await db.insert(setPoints).values({
    ...at,
    id: uuidv7(),
    reading: "vacuum-relief",
    unit: "inHg",
    entered: { setPoint: 20, low: 19, high: 21, stop: null },
    setPointSi: 67_728,
    setBy: by,
    setAt: now,
  });
  const recorded = { recordedBy: by, recordedAt: now };
  const permit = { ...at, id: uuidv7(), kind: "permit", dueOn: "2099-12-31", ...recorded };
  await db.insert(datedTests).values(permit);
  const check = {
    ...at,
    station: "rear",
    cadence: "daily" as const,
    label: "Flag",
    good: "There",
    colour: "white" as const,
    createdBy: by,
    createdAt: now,
  };
  await db.insert(ownChecks).values([
    { ...check, id: ownCheckId, removedAt: null },
    { ...check, id: removedCheckId, removedAt: now },
  ]);
  const done = { doneOn: "2026-01-05", doneAt: now, doneBy: by };
  await db.insert(rounds).values({ ...at, ...done, id: roundId, kind: "weekly" });
  return { fittingId: fitting?.id ?? "", removedFittingId, ownCheckId, removedCheckId, roundId };
}

/**
 * One row of everything a carrier has, on a truck of its own. `actorId` owns the photo, and with
 * it everything but the carrier speaks for the one who asks; the session is `sessionOf`'s.
 */
export async function addRows(
  db: Db,
  carrier: TestCarrier,
  { actorId, sessionOf = null }: { actorId: string; sessionOf?: string | null },
) {
  const { carrierId, yardId } = carrier;
  const now = systemClock.now();
  const { personId } = await makePerson(db, carrier, ["driver"]);
  const { truckId, unitNumber } = await makeTruck(db, carrier, systemClock);
  const at = { carrierId, truckId };
  const setup = await addSetup(db, at, personId);
  const hung = await addTags(db, at, personId);
  const walked = await addWalk(db, at, personId);
  const handed = await addHandovers(db, at, personId);
  const [photoId, invitationId, sessionId] = [uuidv7(), uuidv7(), uuidv7()];
  const invitationToken = makeToken();
  await db.insert(photos).values({
    ...at,
    id: photoId,
    tagId: hung.tagId,
    ownerId: actorId,
    sha256: hashOf(PICTURE),
    bytes: PICTURE.length,
    promisedAt: now,
    storedAt: now,
    objectKey: `${carrierId}/photos/${photoId}.jpg`,
    thumbKey: `${carrierId}/photos/${photoId}.thumb.jpg`,
  });
  const expiresAt = new Date(now.getTime() + 86_400_000);
  await db.insert(invitations).values({
    carrierId,
    id: invitationId,
    email: `${invitationId}@example.test`,
    name: "Invited Person",
    roles: ["driver"],
    tokenHash: tokenHash(invitationToken),
    invitedBy: personId,
    createdAt: now,
    expiresAt,
  });
  await db.insert(sessions).values({
    id: sessionId,
    tokenHash: hashOf(sessionId),
    personId: sessionOf ?? personId,
    carrierId,
    device: "Somewhere",
    createdAt: now,
    lastSeenAt: now,
    expiresAt,
  });
  const ids = { ...at, yardId, personId, photoId, invitationId, invitationToken, sessionId };
  return { ...ids, unitNumber, ...setup, ...hung, ...walked, ...handed };
}

export type Rows = Awaited<ReturnType<typeof addRows>>;

/** Ids of the right form that nobody has. */
export function nobodys(like: Rows): Rows {
  const entries = Object.keys(like).map((name) => [name, uuidv7()]);
  const unitNumber = `N-${uuidv7().slice(-12).toUpperCase()}`;
  return { ...Object.fromEntries(entries), unitNumber, sheetHash: hashOf(uuidv7()) } as Rows;
}
