import { and, desc, eq, inArray } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { photos, tagChanges, tags } from "../../db/schema/tags";
import { rounds, sheetVersions } from "../../db/schema/trucks";
import { answers, readings, walks } from "../../db/schema/walks";
import { type Clock, systemClock } from "../../services/clock";
import { colourRank } from "../../trade/limits";
import type { Check, Sheet } from "../../trade/sheet/check";
import { dueChecks } from "../../trade/sheet/due-checks";
import { type Judgement, judgeAnswers } from "../../trade/sheet/judge-answers";
import { sheetSchema } from "../../trade/sheet/sheet-schema";
import type { StandingWord } from "../../trade/standing/standing";
import { writeAcknowledgement } from "../acknowledgements/acknowledge";
import type { Actor } from "../actor";
import { changeTruck, type GateChange } from "../gate/change-truck";
import { readOpenTags } from "../gate/read-facts";
import { once, sha256Hex } from "../receipts/once";
import { ok, type Result, refuse } from "../refusals";
import { sheetForTruck } from "../sheets/sheet-for-truck";
import { yardOfTruck } from "../tags/yard-of-truck";
import { yardDay } from "../yard-day";
import { type ClearsNot, countsFrom, type SendAge } from "./counts-from";
import { queueRedTags } from "./red-tag-mail";
import type { WalkBody } from "./walk-schema";

export interface WalkReceipt {
  id: string;
  hash: string;
  receivedAt: string;
  standing: StandingWord;
  clearsNot: ClearsNot | null;
  missing: string[];
  tags: { id: string; checkKey: string; colour: string }[];
  photosMissing: string[];
}

interface WalkSheet {
  id: string;
  setupVersion: number;
  sheet: Sheet;
  madeHere: boolean;
}

/** The sheet a walk was made on: today's, an older one by its hash, or one nobody here made. */
async function findSheet(db: Db, actor: Actor, body: WalkBody): Promise<WalkSheet | null> {
  const { carrierId } = actor;
  const today = await sheetForTruck(db, actor, body.truckId);
  if (!today.ok) return null;
  const { sheetId, hash, sheet, setupVersion } = today.value;
  if (hash === body.sheetHash) return { id: sheetId, setupVersion, sheet, madeHere: true };
  const [older] = await db
    .select()
    .from(sheetVersions)
    .where(
      and(
        eq(sheetVersions.carrierId, carrierId),
        eq(sheetVersions.truckId, body.truckId),
        eq(sheetVersions.hash, body.sheetHash),
      ),
    )
    .orderBy(desc(sheetVersions.setupVersion))
    .limit(1);
  if (older) return { ...older, sheet: older.body as Sheet };
  const sent = sheetSchema.safeParse(body.sheet);
  return {
    id: uuidv7(),
    setupVersion: 0,
    sheet: sent.success ? sent.data : sheet,
    madeHere: false,
  };
}

function checksByKey(sheet: Sheet): Map<string, Check> {
  return new Map(sheet.stations.flatMap((s) => s.checks).map((check) => [check.key, check]));
}

/** Tag rows of a walk: one per problem answer, and any the driver hung beside. The driver's colour may only raise. */
function tagRows(body: WalkBody, judged: Judgement, byKey: Map<string, Check>) {
  const proposed = judged.tags.map((proposal) => {
    const sent = body.tags.find(
      (tag) => tag.checkKey === proposal.checkKey && tag.problemKey === proposal.problemKey,
    );
    const raised = sent && colourRank(sent.colour) > colourRank(proposal.colour);
    const colour = raised ? sent.colour : proposal.colour;
    const limit = colour === "yellow" ? proposal.limit : null;
    return {
      ...proposal,
      id: sent?.id ?? uuidv7(),
      colour,
      limit,
      note: sent?.note ?? proposal.note,
    };
  });
  const used = new Set(proposed.map((tag) => tag.id));
  const beside = body.tags
    .filter((tag) => !used.has(tag.id))
    .map((tag) => {
      const check = byKey.get(tag.checkKey);
      const problem = check?.problems.find((known) => known.key === tag.problemKey);
      return {
        ...tag,
        limit: tag.colour === "yellow" ? (problem?.limit ?? null) : null,
        title: check ? `${check.label}: ${problem?.label ?? tag.problemKey}` : tag.problemKey,
        part: check?.part ?? null,
        fittingId: check?.fittingId ?? null,
        roadSafety: check?.roadSafety ?? true,
        driverFix: problem?.driverFix ?? false,
        remote: problem?.remote ?? false,
      };
    });
  return [...proposed, ...beside];
}

/** Open tags as a new finding is compared with them. */
async function comparableTags(tx: Db, key: { carrierId: string; truckId: string }) {
  const facts = await readOpenTags(tx, key, { zone: "UTC", shopOpensMinute: 0 });
  if (facts.length === 0) return [];
  const rows = await tx
    .select({ id: tags.id, checkKey: tags.checkKey, problemKey: tags.problemKey })
    .from(tags)
    .where(
      and(
        eq(tags.carrierId, key.carrierId),
        inArray(
          tags.id,
          facts.map((fact) => fact.id),
        ),
      ),
    );
  return facts.flatMap(({ id, colour, limit }) => {
    const row = rows.find((known) => known.id === id);
    if (!row?.checkKey || !row.problemKey) return [];
    return [{ checkKey: row.checkKey, problemKey: row.problemKey, colour, limit }];
  });
}

/** What the walk says of tags that hung before it: `worse` may raise a colour, nothing lowers one. */
async function writeSeenTags(change: GateChange, actor: Actor, body: WalkBody): Promise<void> {
  if (body.seenTags.length === 0) return;
  const key = { carrierId: actor.carrierId, truckId: body.truckId };
  const open = await readOpenTags(change.tx, key, { zone: "UTC", shopOpensMinute: 0 });
  const rows = body.seenTags.flatMap((seen) => {
    const tag = open.find((known) => known.id === seen.tagId);
    if (!tag) return [];
    const asked = seen.seen === "worse" ? (seen.colour ?? tag.colour) : tag.colour;
    const colour = colourRank(asked) > colourRank(tag.colour) ? asked : tag.colour;
    const limit = colour === "yellow" ? tag.limit : null;
    const { id, tagId, seen: word, note } = seen;
    return [{ ...key, id, tagId, walkId: body.id, seen: word, colour, limit, note }];
  });
  if (rows.length === 0) return;
  await change.tx
    .insert(tagChanges)
    .values(rows.map((row) => ({ ...row, changedBy: actor.personId, changedAt: change.now })));
  if (rows.some((row) => row.seen === "worse")) change.moveTags();
}

function weeklyDone(sheet: Sheet, body: WalkBody): boolean {
  const weekly = sheet.stations
    .flatMap((station) => station.checks)
    .filter((check) => check.cadence === "weekly" && check.who === "driver");
  return weekly.length > 0 && weekly.every((check) => body.answers[check.key] !== undefined);
}

async function writeAnswers(
  change: GateChange,
  actor: Actor,
  body: WalkBody,
  judged: Judgement,
  from: Date,
  elevationM: number,
): Promise<void> {
  const { carrierId } = actor;
  const given = Object.entries(body.answers);
  if (given.length > 0) {
    await change.tx
      .insert(answers)
      .values(
        given.map(([checkKey, answer]) => ({ carrierId, walkId: body.id, checkKey, body: answer })),
      );
  }
  if (judged.readings.length === 0) return;
  const pumpHours =
    judged.readings.find((reading) => reading.quantity === "pump-hours")?.si ?? null;
  await change.tx.insert(readings).values(
    judged.readings.map((reading) => ({
      carrierId,
      truckId: body.truckId,
      walkId: body.id,
      id: uuidv7(),
      countsFrom: from,
      elevationM,
      pumpHours,
      ...reading,
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
  sent: { body: WalkBody; bytes: string; age: SendAge },
  clock: Clock = systemClock,
): Promise<Result<WalkReceipt>> {
  const { carrierId, personId } = actor;
  const { body } = sent;
  const hash = sha256Hex(sent.bytes);
  const submission = { id: body.id, kind: "walk", hash, body };
  return once(db, actor, submission, clock, async () => {
    const found = await findSheet(db, actor, body);
    if (!found) return refuse("not-found");
    const due = dueChecks(found.sheet, { walkKind: body.kind });
    const byKey = checksByKey(found.sheet);
    const key = { carrierId, truckId: body.truckId };
    const changed = await changeTruck(
      db,
      key,
      async (change) => {
        const { tx, now } = change;
        const { zone, elevationM } = await yardOfTruck(tx, carrierId, body.truckId);
        const age = countsFrom(now, sent.age);
        const openTags = await comparableTags(tx, key);
        const judged = judgeAnswers(found.sheet, due, body.answers, {
          walkKind: body.kind,
          openTags,
        });
        let clearsNot: ClearsNot | null = age.clearsNot;
        if (!found.madeHere) clearsNot = "sheet-unknown";
        else if (!judged.complete) clearsNot = "incomplete";
        if (!found.madeHere) {
          await tx.insert(sheetVersions).values({
            ...key,
            id: found.id,
            hash: body.sheetHash,
            setupVersion: 0,
            body: found.sheet,
            madeHere: false,
            createdAt: now,
          });
        }
        for (const [pointer, id] of [
          ["/baseWalkId", body.baseWalkId],
          ["/correctsWalkId", body.correctsWalkId],
        ] as const) {
          if (id === null) continue;
          const [known] = await tx
            .select({ id: walks.id })
            .from(walks)
            .where(
              and(
                eq(walks.carrierId, carrierId),
                eq(walks.id, id),
                eq(walks.truckId, body.truckId),
              ),
            );
          if (!known) change.deny("invalid", { fields: [{ pointer, code: "unknown-walk" }] });
        }
        await tx.insert(walks).values({
          ...key,
          id: body.id,
          driverId: personId,
          kind: body.kind,
          baseWalkId: body.baseWalkId,
          correctsWalkId: body.correctsWalkId,
          sheetId: found.id,
          setupVersion: found.setupVersion,
          hash,
          signedAt: new Date(body.signedAt),
          ageMs: age.ageMs,
          receivedAt: now,
          countsFrom: age.countsFrom,
          yardDay: yardDay(age.countsFrom, zone).day,
          complete: judged.complete,
          clearsNot,
          limits: judged.limits,
          missing: judged.missing,
          signature: body.signature,
        });
        await writeAnswers(change, actor, body, judged, age.countsFrom, elevationM);
        const hung = tagRows(body, judged, byKey);
        if (hung.length > 0) {
          await tx.insert(tags).values(
            hung.map((tag) => ({
              ...key,
              id: tag.id,
              walkId: body.id,
              checkKey: tag.checkKey,
              problemKey: tag.problemKey,
              fittingId: tag.fittingId,
              part: tag.part,
              colour: tag.colour,
              limit: tag.limit,
              title: tag.title.slice(0, 160),
              note: tag.note,
              roadSafety: tag.roadSafety,
              driverFix: tag.driverFix,
              remote: tag.remote,
              raisedBy: personId,
              raisedAt: age.countsFrom,
              receivedAt: now,
            })),
          );
          change.moveTags();
          for (const tag of hung) change.note("tag", tag.id, { colour: tag.colour });
        }
        await writeSeenTags(change, actor, body);
        if (body.photos.length > 0) {
          await tx.insert(photos).values(
            body.photos.map((photo) => ({
              ...key,
              ...photo,
              walkId: body.id,
              ownerId: personId,
              promisedAt: now,
            })),
          );
        }
        if (body.kind === "before" && judged.complete && weeklyDone(found.sheet, body)) {
          await tx.insert(rounds).values({
            ...key,
            id: uuidv7(),
            kind: "weekly",
            doneOn: yardDay(age.countsFrom, zone).day,
            doneAt: age.countsFrom,
            doneBy: personId,
            walkId: body.id,
            pumpHours: judged.readings.find((r) => r.quantity === "pump-hours")?.si ?? null,
          });
        }
        if (body.acknowledgement) {
          const acknowledgement = {
            ...body.acknowledgement,
            truckId: body.truckId,
            signature: body.signature,
          };
          await writeAcknowledgement(change, actor, acknowledgement, { hash }, body.id);
        }
        await queueRedTags(change, key, hung);
        change.note("walk", body.id, { kind: body.kind, clearsNot });
        const receipt = (standing: StandingWord): WalkReceipt => ({
          id: body.id,
          hash,
          receivedAt: now.toISOString(),
          standing,
          clearsNot,
          missing: judged.missing,
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
