import { and, desc, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { sheetVersions } from "../../db/schema/trucks";
import { canonicalSheet } from "../../trade/sheet/canonical-sheet";
import type { Sheet } from "../../trade/sheet/check";
import { sheetSchema } from "../../trade/sheet/sheet-schema";
import type { Actor } from "../actor";
import type { GateChange } from "../gate/change-truck";
import type { TruckKey } from "../gate/read-facts";
import { sha256Hex } from "../receipts/once";
import { sheetForTruck } from "../sheets/sheet-for-truck";
import type { WalkBody } from "./walk-schema";

export interface WalkSheet {
  id: string;
  setupVersion: number;
  /** What the walk is judged by. */
  sheet: Sheet;
  madeHere: boolean;
  /** Fittings or set points have changed since it was made. */
  outdated: boolean;
  /** The sheet to be stored with the walk; null when it is stored already. */
  toKeep: Sheet | null;
}

/** K10: a sheet nobody here made says what was found, never who may end it. */
function withoutLeave(sheet: Sheet): Sheet {
  const stations = sheet.stations.map((station) => ({
    ...station,
    checks: station.checks.map((check) => ({
      ...check,
      problems: check.problems.map((one) => ({ ...one, driverFix: false, remote: false })),
    })),
  }));
  return { ...sheet, stations };
}

/** The sheet a walk was made on: today's, an older one by its hash, or one nobody here made. */
export async function findSheet(db: Db, actor: Actor, body: WalkBody): Promise<WalkSheet | null> {
  const { carrierId } = actor;
  const today = await sheetForTruck(db, actor, body.truckId);
  if (!today.ok) return null;
  const { sheetId, hash, sheet, setupVersion } = today.value;
  if (hash === body.sheetHash) {
    return { id: sheetId, setupVersion, sheet, madeHere: true, outdated: false, toKeep: null };
  }
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
  if (older) {
    const known = older.body as Sheet;
    const judgedBy = older.madeHere ? known : withoutLeave(known);
    const outdated = older.setupVersion !== setupVersion;
    return { ...older, sheet: judgedBy, outdated, toKeep: null };
  }
  const sent = sheetSchema.safeParse(body.sheet);
  const unknown = { setupVersion: 0, madeHere: false, outdated: false };
  // No sheet, or another one than its hash says: the walk is judged by today's, and clears nothing.
  if (!sent.success || sha256Hex(canonicalSheet(body.sheet as Sheet)) !== body.sheetHash) {
    return { ...unknown, id: sheetId, sheet: withoutLeave(sheet), toKeep: null };
  }
  return { ...unknown, id: uuidv7(), sheet: withoutLeave(sent.data), toKeep: sent.data };
}

/** A sheet nobody here made is kept beside the first walk on it. None of its walks clears anything. */
export async function keepUnknownSheet(
  change: GateChange,
  key: TruckKey,
  found: WalkSheet,
  hash: string,
): Promise<void> {
  if (found.toKeep === null) return;
  await change.tx.insert(sheetVersions).values({
    ...key,
    id: found.id,
    hash,
    setupVersion: found.setupVersion,
    body: found.toKeep,
    madeHere: false,
    createdAt: change.now,
  });
}
