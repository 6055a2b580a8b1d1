import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { yards } from "~/db/schema/carriers";
import { changeTruck } from "~/domain/gate/change-truck";
import { clearGateFault } from "~/domain/gate/clear-fault";
import { testDb } from "./database";
import { makeCarrier, makePerson, makeTruck, TestClock, truckRow } from "./factories";

const clock = new TestClock();

test("K9: a standing that cannot be worked out holds the key, says so, and stays until a manager has it worked out anew", async () => {
  const db = testDb();
  const carrier = await makeCarrier(db, clock);
  const manager = await makePerson(db, carrier, ["manager"]);
  const { carrierId, truckId } = await makeTruck(db, carrier, clock, { bare: true });
  const key = { carrierId, truckId };
  const setZone = (zone: string) =>
    db
      .update(yards)
      .set({ zone })
      .where(and(eq(yards.carrierId, carrierId), eq(yards.id, carrier.yardId)));
  await setZone("America/Nowhere");
  const changed = await changeTruck(db, key, async () => "kept", { clock });
  expect(changed.ok && changed.value.value).toBe("kept");
  const held = await truckRow(db, key);
  expect(held.standing).toBe("held");
  expect(held.gateFault).toContain("RangeError");
  expect(held.standingDetail?.reasons[0]?.code).toBe("gate-fault");

  await setZone("America/Denver");
  await changeTruck(db, key, async () => undefined, { clock });
  expect((await truckRow(db, key)).standing).toBe("held");
  const cleared = await clearGateFault(db, manager, { truckId }, clock);
  expect(cleared.ok && cleared.value.standing).toBe("walk-due");
  expect((await truckRow(db, key)).gateFault).toBeNull();
});
