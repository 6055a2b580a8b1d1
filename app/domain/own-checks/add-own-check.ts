import { and, eq } from "drizzle-orm";
import { v7 as uuidv7 } from "uuid";
import { z } from "zod";
import type { Db } from "../../db/client";
import { DUPLICATE_KEY, errnoOf, FOREIGN_KEY } from "../../db/errors";
import { inTransaction } from "../../db/retry";
import { ownChecks } from "../../db/schema/trucks";
import { type Clock, systemClock } from "../../services/clock";
import { COLOURS } from "../../trade/limits";
import { CADENCES, STATIONS } from "../../trade/sheet/check";
import type { Actor } from "../actor";
import { writeChanges } from "../feed";
import { ok, type Result, refuse } from "../refusals";
import { writeSetupAudit } from "../trucks/setup-audit";
import { typedLine } from "../typed-line";

export const ownCheckSchema = z.object({
  /** Made with the form, so that a form sent twice is one check. */
  id: z.uuid().optional(),
  /** Null: on every truck. */
  truckId: z.uuid("truck-unknown").nullable().default(null),
  station: z.enum(STATIONS, { error: "station-unknown" }),
  cadence: z.enum(CADENCES, { error: "cadence-unknown" }),
  label: typedLine("own-check-label", 1, 80),
  good: typedLine("own-check-good", 1, 160),
  colour: z.enum(COLOURS, { error: "colour-unknown" }),
});
export type OwnCheckInput = z.infer<typeof ownCheckSchema>;

/** The same form once more, or filled in anew? */
async function isSame(db: Db, carrierId: string, { id = "", ...input }: OwnCheckInput) {
  const [known] = await db
    .select({ label: ownChecks.label, good: ownChecks.good, station: ownChecks.station })
    .from(ownChecks)
    .where(and(eq(ownChecks.carrierId, carrierId), eq(ownChecks.id, id)));
  const { label, good, station } = input;
  return known?.label === label && known.good === good && known.station === station;
}

/** A check of the carrier's own, from the next walk on: a walk already made stays good. */
export async function addOwnCheck(
  db: Db,
  actor: Actor,
  input: OwnCheckInput,
  clock: Clock = systemClock,
): Promise<Result<{ id: string }>> {
  const { carrierId, personId } = actor;
  const id = input.id ?? uuidv7();
  const now = clock.now();
  try {
    await inTransaction(db, async (tx) => {
      await tx
        .insert(ownChecks)
        .values({ ...input, carrierId, id, createdBy: personId, createdAt: now });
      await writeSetupAudit(tx, actor, now, "own-check.add", id, input);
      await writeChanges(tx, carrierId, now, [{ kind: "own-check", subjectId: id }]);
    });
  } catch (error) {
    if (errnoOf(error) === DUPLICATE_KEY && input.id) {
      return (await isSame(db, carrierId, input))
        ? ok({ id })
        : addOwnCheck(db, actor, { ...input, id: undefined }, clock);
    }
    if (errnoOf(error) !== FOREIGN_KEY) throw error;
    return refuse("invalid", { fields: [{ pointer: "/truckId", code: "truck-unknown" }] });
  }
  return ok({ id });
}
