import { expect, test } from "vitest";
import { readableSheet } from "./readable-sheet";
import { FIVE_TRUCKS, sheetOf } from "./trucks";

for (const [name, truck] of Object.entries(FIVE_TRUCKS)) {
  test(`the ${name} truck's sheet reads as it was read through`, async () => {
    await expect(readableSheet(name, sheetOf(truck))).toMatchFileSnapshot(`sheets/${name}.txt`);
  });
}
