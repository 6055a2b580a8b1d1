import { v7 as uuidv7 } from "uuid";
import { answers, readings } from "../../db/schema/walks";
import type { Judgement } from "../../trade/sheet/judge-answers";
import type { Actor } from "../actor";
import type { GateChange } from "../gate/change-truck";
import type { WalkBody } from "./walk-schema";

/** The pump's hours as this walk read them. */
export function pumpHoursOf(judged: Judgement): number | null {
  return judged.readings.find((reading) => reading.quantity === "pump-hours")?.si ?? null;
}

/** Answers as given, and every number in them as entered and in SI: two statements at most. */
export async function writeAnswers(
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
  const pumpHours = pumpHoursOf(judged);
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
