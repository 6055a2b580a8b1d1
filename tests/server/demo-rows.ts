import { and, asc, eq, inArray } from "drizzle-orm";
import type { Db } from "~/db/client";
import { handovers } from "~/db/schema/handovers";
import { tags } from "~/db/schema/tags";
import { answers, readings, walks } from "~/db/schema/walks";
import { readTests, testsFor } from "~/domain/trucks/dated-tests";
import { readFittings } from "~/domain/trucks/read-setup";
import { answersSchema } from "~/trade/sheet/answers";
import { judgeAnswers } from "~/trade/sheet/judge-answers";
import type { DemoTruck } from "../../fixtures/demo/events";

/** A reading of one check of one truck, oldest first. */
export async function readingsOf(db: Db, truckId: string, checkKey: string) {
  return db
    .select()
    .from(readings)
    .where(and(eq(readings.truckId, truckId), eq(readings.checkKey, checkKey)))
    .orderBy(asc(readings.countsFrom));
}

/** Between the means of the first and the last dozen readings, and the widest scatter in either. */
export async function changeOver(db: Db, truckId: string, checkKey: string) {
  const read = (await readingsOf(db, truckId, checkKey)).map((one) => one.entered);
  const mean = (some: number[]) => some.reduce((sum, one) => sum + one, 0) / some.length;
  const far = (some: number[]) => Math.max(...some.map((one) => Math.abs(one - mean(some))));
  const [first, last] = [read.slice(0, 12), read.slice(-12)];
  return { by: mean(last) - mean(first), scatter: Math.max(far(first), far(last)) };
}

function byWalk<T extends { walkId: string | null }>(rows: readonly T[]): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const row of rows) {
    if (row.walkId === null) continue;
    const group = groups.get(row.walkId);
    if (group) group.push(row);
    else groups.set(row.walkId, [row]);
  }
  return groups;
}

/** Every stored walk judged anew from its answers: ids of those whose readings or limits differ. */
export async function judgedAgain(db: Db, trucks: readonly DemoTruck[]) {
  const ids = trucks.map((truck) => truck.key.truckId);
  const made = await db.select().from(walks).where(inArray(walks.truckId, ids));
  const stored = byWalk(await db.select().from(readings).where(inArray(readings.truckId, ids)));
  const { carrierId } = trucks[0]!.key;
  const said = byWalk(await db.select().from(answers).where(eq(answers.carrierId, carrierId)));
  const line = (one: { checkKey: string; si: number; verdict: string | null }) =>
    `${one.checkKey} ${one.si} ${one.verdict}`;
  const wrong = made.filter(({ id, truckId, kind, limits }) => {
    const { sheet } = trucks.find((truck) => truck.key.truckId === truckId)!;
    const given = answersSchema.parse(
      Object.fromEntries((said.get(id) ?? []).map((row) => [row.checkKey, row.body])),
    );
    const judged = judgeAnswers(sheet, [], given, { walkKind: kind });
    const was = (stored.get(id) ?? []).map(line).sort();
    const is = judged.readings.map(line).sort();
    return JSON.stringify([was, limits]) !== JSON.stringify([is, judged.limits]);
  });
  return { judged: made.length, wrong: wrong.map((walk) => walk.id) };
}

/** Handovers of one truck that overlap another, or that began under a red tag; and how many are open. */
export async function keysOf(db: Db, truckId: string, now: Date) {
  const out = await db
    .select()
    .from(handovers)
    .where(eq(handovers.truckId, truckId))
    .orderBy(asc(handovers.decidedAt));
  const reds = await db
    .select()
    .from(tags)
    .where(and(eq(tags.truckId, truckId), eq(tags.colour, "red")));
  return {
    twice: out.filter((one, index) => {
      const next = out[index + 1];
      return next !== undefined && (one.returnedAt ?? now) > next.decidedAt;
    }),
    underRed: out.filter(({ decidedAt }) =>
      reds.some((tag) => tag.receivedAt < decidedAt && (tag.signedOffAt ?? now) > decidedAt),
    ),
    open: out.filter((one) => one.returnedAt === null).length,
  };
}

/** The last day of every paper this truck needs; "never" where there is none on file. */
export async function papersOf(db: Db, { key, sheet }: DemoTruck): Promise<string[]> {
  const recorded = new Map((await readTests(db, key)).map((one) => [one.kind, one.dueOn]));
  const needed = testsFor(sheet.kind, await readFittings(db, key));
  return needed.map(({ test }) => recorded.get(test) ?? "never");
}
