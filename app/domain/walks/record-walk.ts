import { and, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { photos } from "../../db/schema/tags";
import { walks } from "../../db/schema/walks";
import { type Clock, systemClock } from "../../services/clock";
import { dueChecks } from "../../trade/sheet/due-checks";
import { type AnswerFault, type Judgement, judgeAnswers } from "../../trade/sheet/judge-answers";
import type { StandingWord } from "../../trade/standing/standing";
import { writeAcknowledgement } from "../acknowledgements/acknowledge";
import type { Actor } from "../actor";
import { changeTruck, type GateChange } from "../gate/change-truck";
import { once, sha256Hex } from "../receipts/once";
import { ok, type Result, refuse } from "../refusals";
import { weeklyDone, weeklyDueOn, writeWeeklyRound } from "../rounds/weekly-round";
import { queueRedTags } from "../tags/red-tag-mail";
import { yardOfTruck } from "../tags/yard-of-truck";
import { yardDay } from "../yard-day";
import { type ClearsNot, countsFrom, type SendAge } from "./counts-from";
import { findSheet, keepUnknownSheet, type WalkSheet } from "./find-sheet";
import { absorbedTags, comparableTags, hangTags, writeSeenTags } from "./hang-tags";
import type { WalkBody } from "./walk-schema";
import { pumpHoursOf, writeAnswers } from "./write-answers";

export interface WalkReceipt {
  id: string;
  hash: string;
  receivedAt: string;
  standing: StandingWord;
  clearsNot: ClearsNot | null;
  missing: string[];
  /** Answers that cannot stand, and why: each counts as missing. */
  faults: AnswerFault[];
  tags: { id: string; checkKey: string; colour: string }[];
  photosMissing: string[];
}

interface SentWalk {
  body: WalkBody;
  /** As it came over the wire: the hash is over these. */
  bytes: string;
  age: SendAge;
}

interface Read {
  found: WalkSheet;
  zone: string;
  elevationM: number;
  age: ReturnType<typeof countsFrom>;
  day: string;
  judged: Judgement;
  /** Sent tags that hang already, by the id they came with. */
  absorbed: Map<string, string>;
  clearsNot: ClearsNot | null;
}

/** Judges the walk against its sheet and the truck as it stands, inside the transaction. */
async function readWalk(
  change: GateChange,
  actor: Actor,
  sent: SentWalk,
  found: WalkSheet,
): Promise<Read> {
  const { body } = sent;
  const { tx, now, policy } = change;
  const key = { carrierId: actor.carrierId, truckId: body.truckId };
  const { zone, elevationM } = await yardOfTruck(tx, actor.carrierId, body.truckId);
  const age = countsFrom(now, sent.age);
  const { day } = yardDay(age.countsFrom, zone);
  const weeklyDue = await weeklyDueOn(tx, key, day, zone, policy);
  const due = dueChecks(found.sheet, { walkKind: body.kind, weeklyDue });
  const openTags = await comparableTags(tx, key);
  const context = { walkKind: body.kind, openTags };
  const judged = judgeAnswers(found.sheet, due, body.answers, context);
  let { clearsNot } = age;
  if (found.outdated) clearsNot ??= "setup-changed";
  if (!found.madeHere) clearsNot = "sheet-unknown";
  else if (!judged.complete) clearsNot = "incomplete";
  const absorbed = absorbedTags(body, judged, openTags);
  return { found, zone, elevationM, age, day, judged, absorbed, clearsNot };
}

/** A walk it rests on or corrects is one of this truck's. */
async function refuseUnknownWalks(change: GateChange, actor: Actor, body: WalkBody) {
  for (const [pointer, id] of [
    ["/baseWalkId", body.baseWalkId],
    ["/correctsWalkId", body.correctsWalkId],
  ] as const) {
    if (id === null) continue;
    const [known] = await change.tx
      .select({ id: walks.id })
      .from(walks)
      .where(
        and(
          eq(walks.carrierId, actor.carrierId),
          eq(walks.id, id),
          eq(walks.truckId, body.truckId),
        ),
      );
    if (!known) change.deny("invalid", { fields: [{ pointer, code: "unknown-walk" }] });
  }
}

async function writeWalk(
  change: GateChange,
  actor: Actor,
  body: WalkBody,
  hash: string,
  read: Read,
): Promise<void> {
  const { found, age, day, judged, clearsNot } = read;
  await change.tx.insert(walks).values({
    carrierId: actor.carrierId,
    truckId: body.truckId,
    id: body.id,
    driverId: actor.personId,
    kind: body.kind,
    baseWalkId: body.baseWalkId,
    correctsWalkId: body.correctsWalkId,
    sheetId: found.id,
    setupVersion: found.setupVersion,
    hash,
    signedAt: new Date(body.signedAt),
    ageMs: age.ageMs,
    receivedAt: change.now,
    countsFrom: age.countsFrom,
    yardDay: day,
    complete: judged.complete,
    clearsNot,
    limits: judged.limits,
    missing: judged.missing,
    signature: body.signature,
  });
}

/** The photos a walk promises; each comes by itself, later. */
async function promisePhotos(
  change: GateChange,
  actor: Actor,
  body: WalkBody,
  absorbed: ReadonlyMap<string, string>,
): Promise<void> {
  if (body.photos.length === 0) return;
  const { carrierId, personId } = actor;
  await change.tx.insert(photos).values(
    body.photos.map((photo) => ({
      ...photo,
      tagId: photo.tagId === null ? null : (absorbed.get(photo.tagId) ?? photo.tagId),
      carrierId,
      truckId: body.truckId,
      walkId: body.id,
      ownerId: personId,
      promisedAt: change.now,
    })),
  );
}

/**
 * K2, K4, K6, K8: stores a signed walk with its answers, readings, tags and photo manifest in
 * one transaction and answers with a receipt. Readings are judged again here; the server's
 * verdict counts. The number of statements does not grow with the number of answers.
 */
export async function recordWalk(
  db: Db,
  actor: Actor,
  sent: SentWalk,
  clock: Clock = systemClock,
): Promise<Result<WalkReceipt>> {
  const { carrierId, personId } = actor;
  const { body } = sent;
  const hash = sha256Hex(sent.bytes);
  const submission = { id: body.id, kind: "walk", hash, body };
  return once(db, actor, submission, clock, async () => {
    const found = await findSheet(db, actor, body);
    if (!found) return refuse("not-found");
    const key = { carrierId, truckId: body.truckId };
    const changed = await changeTruck(
      db,
      key,
      async (change) => {
        const read = await readWalk(change, actor, sent, found);
        const { judged, absorbed, age, clearsNot } = read;
        await refuseUnknownWalks(change, actor, body);
        await keepUnknownSheet(change, key, found, body.sheetHash);
        await writeWalk(change, actor, body, hash, read);
        await writeAnswers(change, actor, body, judged, age.countsFrom, read.elevationM);
        const hung = await hangTags(
          change,
          actor,
          body,
          found.sheet,
          judged,
          age.countsFrom,
          absorbed,
        );
        await writeSeenTags(change, actor, body);
        await promisePhotos(change, actor, body, absorbed);
        const believed = clearsNot === null || clearsNot === "incomplete";
        const weekly = believed && weeklyDone(found.sheet, body.answers, judged);
        if (body.kind === "before" && weekly) {
          const pumpHours = pumpHoursOf(judged);
          const at = age.countsFrom;
          const done = { walkId: body.id, by: personId, at, day: read.day, pumpHours };
          await writeWeeklyRound(change, key, done);
        }
        if (body.acknowledgement) {
          const { truckId, signature } = body;
          const acknowledgement = { ...body.acknowledgement, truckId, signature };
          await writeAcknowledgement(change, actor, acknowledgement, { hash }, body.id);
        }
        await queueRedTags(change, key, hung);
        change.note("walk", body.id, { kind: body.kind, clearsNot });
        const receipt = (standing: StandingWord): WalkReceipt => ({
          id: body.id,
          hash,
          receivedAt: change.now.toISOString(),
          standing,
          clearsNot,
          missing: judged.missing,
          faults: judged.faults,
          tags: hung.map(({ id, checkKey, colour }) => ({ id, checkKey, colour })),
          photosMissing: body.photos.map((photo) => photo.id),
        });
        change.receipt = { ...submission, personId, body: (after) => receipt(after.word) };
        return receipt;
      },
      { clock },
    );
    if (!changed.ok) return changed;
    return ok(changed.value.value(changed.value.standing.word));
  });
}
