import { and, eq, exists, sql } from "drizzle-orm";
import type { Db } from "../../db/client";
import { inTransaction } from "../../db/retry";
import { yards } from "../../db/schema/carriers";
import { trucks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import type { Actor } from "../actor";
import { writeChanges } from "../feed";
import { deriveGate } from "../gate/change-truck";
import { readPolicy } from "../policy/read-policy";
import { ok, type Result, refuse } from "../refusals";
import { Refused } from "../refused";
import { writeSetupAudit } from "../trucks/setup-audit";
import { holdYardNames, nameIsTaken, readYard, thatYard } from "./read-yards";
import { readElevation, type YardInput } from "./yard-input";

/** Every truck of the yard is written before anything is read; other air means another sheet. */
async function bumpTrucks(tx: Db, carrierId: string, yardId: string, elevationM: number) {
  const here = and(eq(trucks.carrierId, carrierId), eq(trucks.yardId, yardId));
  await tx
    .update(trucks)
    .set({ gateSeq: sql`${trucks.gateSeq} + 1` })
    .where(here);
  const otherAir = tx
    .select({ one: sql`1` })
    .from(yards)
    .where(and(thatYard(carrierId, yardId), sql`abs(${yards.elevationM} - ${elevationM}) > 0.01`));
  await tx
    .update(trucks)
    .set({ setupVersion: sql`${trucks.setupVersion} + 1` })
    .where(and(here, exists(otherAir)));
}

/**
 * Changes a yard and works the standing of every truck in it out again: its clock decides on
 * dates, its height on what a pump can draw.
 */
export async function changeYard(
  db: Db,
  actor: Actor,
  input: YardInput & { yardId: string },
  clock: Clock = systemClock,
): Promise<Result<null>> {
  const { carrierId } = actor;
  const { yardId, name, zone, phone, winter, shopOpens } = input;
  const before = await readYard(db, carrierId, yardId);
  if (!before) return refuse("not-found");
  const elevation = readElevation(input, before.elevationM);
  if (!elevation.ok) return refuse("invalid", { fields: [elevation.fault] });
  const { elevationM } = elevation;
  const row = { name, zone, phone, winter, elevationM, shopOpensMinute: shopOpens };
  try {
    await inTransaction(db, async (tx) => {
      await bumpTrucks(tx, carrierId, yardId, elevationM);
      await holdYardNames(tx, carrierId);
      if (await nameIsTaken(tx, carrierId, name, yardId)) {
        const fields = [{ pointer: "/name", code: "yard-name-taken" }];
        throw new Refused(refuse("invalid", { fields }).refusal);
      }
      await tx.update(yards).set(row).where(thatYard(carrierId, yardId));
      const policy = await readPolicy(tx, carrierId);
      const now = clock.now();
      const here = await tx
        .select({ id: trucks.id })
        .from(trucks)
        .where(and(eq(trucks.carrierId, carrierId), eq(trucks.yardId, yardId)));
      const standings = [];
      for (const { id } of here) {
        const { word } = await deriveGate(tx, { carrierId, truckId: id }, policy, now);
        standings.push({ kind: "standing", truckId: id, data: { standing: word } });
      }
      await writeSetupAudit(tx, actor, now, "yard.change", yardId, { before, after: row });
      await writeChanges(tx, carrierId, now, [{ kind: "yard", subjectId: yardId }, ...standings]);
    });
  } catch (error) {
    if (error instanceof Refused) return { ok: false, refusal: error.refusal };
    throw error;
  }
  return ok(null);
}
