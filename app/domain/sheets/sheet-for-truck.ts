import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { yards } from "../../db/schema/carriers";
import { sheetVersions, trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import { sheetText } from "../../text/en/sheet";
import { canonicalSheet } from "../../trade/sheet/canonical-sheet";
import type { Sheet } from "../../trade/sheet/check";
import { makeSheet } from "../../trade/sheet/make-sheet";
import type { Actor } from "../actor";
import type { TruckKey } from "../gate/read-facts";
import { ownChecksOfTruck } from "../own-checks/read-own-checks";
import { sha256Hex } from "../receipts/once";
import { ok, type Result, refuse } from "../refusals";
import { asSetPoints, readFittings, readSetPointRows, thatTruck } from "../trucks/read-setup";

export interface TruckSheet {
  sheetId: string;
  /** SHA-256 of the sheet's canonical text, hex. */
  hash: string;
  sheet: Sheet;
  setupVersion: number;
}

/** Read first of all, so that a sheet made while the truck is changed carries the older version. */
async function readUnit(db: Db, key: TruckKey) {
  const [row] = await db
    .select({
      kind: trucks.kind,
      setupVersion: trucks.setupVersion,
      elevationM: yards.elevationM,
      winter: yards.winter,
    })
    .from(trucks)
    .innerJoin(yards, and(eq(yards.carrierId, trucks.carrierId), eq(yards.id, trucks.yardId)))
    .where(thatTruck(key));
  return row ?? null;
}

async function storedId(db: Db, key: TruckKey, hash: string, setupVersion: number) {
  const [row] = await db
    .select({ id: sheetVersions.id })
    .from(sheetVersions)
    .where(
      and(
        eq(sheetVersions.carrierId, key.carrierId),
        eq(sheetVersions.truckId, key.truckId),
        eq(sheetVersions.hash, hash),
        eq(sheetVersions.setupVersion, setupVersion),
      ),
    );
  return row?.id ?? null;
}

/** Several may ask for a new sheet at once: one row is kept, and all get its id. */
async function keep(db: Db, key: TruckKey, made: Omit<TruckSheet, "sheetId">, clock: Clock) {
  const { hash, sheet, setupVersion } = made;
  const known = await storedId(db, key, hash, setupVersion);
  if (known) return known;
  await db
    .insert(sheetVersions)
    .ignore()
    .values({
      ...key,
      id: uuidv7(),
      hash,
      setupVersion,
      body: sheet,
      createdAt: clock.now(),
    });
  const id = await storedId(db, key, hash, setupVersion);
  if (!id) throw new Error("sheet was not stored");
  return id;
}

/**
 * The check sheet of a truck as it stands, stored once per content and setup. At most seven
 * statements, whatever the truck carries.
 */
export async function sheetForTruck(
  db: Db,
  actor: Pick<Actor, "carrierId">,
  truckId: string,
  clock: Clock = systemClock,
): Promise<Result<TruckSheet>> {
  const key = { carrierId: actor.carrierId, truckId };
  const unit = await readUnit(db, key);
  if (!unit) return refuse("not-found");
  const { kind, setupVersion, ...yard } = unit;
  const sheet = makeSheet({
    kind,
    fittings: await readFittings(db, key),
    setPoints: asSetPoints(await readSetPointRows(db, key)),
    ownChecks: await ownChecksOfTruck(db, key),
    yard,
    text: sheetText,
  });
  const made = { hash: sha256Hex(canonicalSheet(sheet)), sheet, setupVersion };
  return ok({ ...made, sheetId: await keep(db, key, made, clock) });
}
