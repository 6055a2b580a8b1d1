import { v7 as uuidv7 } from "uuid";
import { expect, test } from "vitest";
import { changeTruck } from "~/domain/gate/change-truck";
import { sheetForTruck } from "~/domain/sheets/sheet-for-truck";
import { recordWalk } from "~/domain/walks/record-walk";
import { dueChecks } from "~/trade/sheet/due-checks";
import { goodAnswers } from "../../fixtures/good-answers";
import { testDb } from "./database";
import { makeCarrier, makePerson, makeTruck, TestClock } from "./factories";

test("a truck's first walk does not wait for another truck that is being changed", async () => {
  const db = testDb();
  const clock = new TestClock();
  const carrier = await makeCarrier(db, clock);
  const driver = await makePerson(db, carrier, ["driver"]);
  const { carrierId, truckId: changed } = await makeTruck(db, carrier, clock);
  const { truckId: walked } = await makeTruck(db, carrier, clock);
  const sheet = await sheetForTruck(db, driver, walked, clock);
  if (!sheet.ok) throw new Error("no sheet");
  const body = {
    id: uuidv7(),
    truckId: walked,
    kind: "before" as const,
    baseWalkId: null,
    correctsWalkId: null,
    sheetHash: sheet.value.hash,
    signedAt: clock.now().toISOString(),
    answers: goodAnswers(dueChecks(sheet.value.sheet, { walkKind: "before" })),
    tags: [],
    seenTags: [],
    photos: [],
    acknowledgement: null,
    signature: { name: driver.name, wording: "walk" },
  };
  const sent = { body, bytes: JSON.stringify(body), age: { ageMs: 0, clockJumped: false } };
  const began = performance.now();
  let word: string | null = null;
  await changeTruck(
    db,
    { carrierId, truckId: changed },
    async (change) => {
      // The first truck's columns and clearances are written, its transaction is still open.
      change.after(async () => {
        const receipt = await recordWalk(db, driver, sent, clock);
        word = receipt.ok ? receipt.value.standing : receipt.refusal.code;
      });
    },
    { clock },
  );
  expect(word).toBe("limited");
  // A wait for the other's locks would have lasted five seconds.
  expect(performance.now() - began).toBeLessThan(4000);
});
