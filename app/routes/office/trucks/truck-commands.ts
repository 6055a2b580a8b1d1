import { z } from "zod";
import type { Db } from "~/db/client";
import type { Actor } from "~/domain/actor";
import { clearGateFault } from "~/domain/gate/clear-fault";
import type { Result } from "~/domain/refusals";
import { endDatedTest } from "~/domain/trucks/record-dated-test";
import { removeFitting, restoreFitting } from "~/domain/trucks/remove-fitting";
import { setInService } from "~/domain/trucks/set-in-service";
import { removeSetPoint } from "~/domain/trucks/set-set-point";
import type { SavedNote } from "~/text/en/office";

/** What the buttons on a truck's page ask for. */
export const truckCommandSchema = z.discriminatedUnion("intent", [
  z.object({ intent: z.literal("remove-fitting"), fittingId: z.uuid() }),
  z.object({ intent: z.literal("restore-fitting"), fittingId: z.uuid() }),
  z.object({ intent: z.literal("remove-set-point"), reading: z.string().max(40) }),
  z.object({ intent: z.literal("end-test"), kind: z.string().max(40) }),
  z.object({ intent: z.literal("clear-fault") }),
  z.object({ intent: z.literal("out-of-service") }),
  z.object({ intent: z.literal("in-service") }),
]);
export type TruckCommand = z.infer<typeof truckCommandSchema>;

const DONE: Record<TruckCommand["intent"], SavedNote> = {
  "remove-fitting": "removed",
  "restore-fitting": "restored",
  "remove-set-point": "set-point",
  "end-test": "test",
  "clear-fault": "worked-out",
  "out-of-service": "service",
  "in-service": "service",
};

export function doneNote(command: TruckCommand): SavedNote {
  return DONE[command.intent];
}

export function runTruckCommand(
  db: Db,
  actor: Actor,
  truckId: string,
  command: TruckCommand,
): Promise<Result<unknown>> {
  switch (command.intent) {
    case "remove-fitting":
      return removeFitting(db, actor, { truckId, fittingId: command.fittingId });
    case "restore-fitting":
      return restoreFitting(db, actor, { truckId, fittingId: command.fittingId });
    case "remove-set-point":
      return removeSetPoint(db, actor, { truckId, reading: command.reading });
    case "end-test":
      return endDatedTest(db, actor, { truckId, kind: command.kind });
    case "clear-fault":
      return clearGateFault(db, actor, { truckId });
    case "out-of-service":
      return setInService(db, actor, { truckId, inService: false });
    case "in-service":
      return setInService(db, actor, { truckId, inService: true });
  }
}
