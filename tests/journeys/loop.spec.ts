import { expect, test } from "@playwright/test";
import sharp from "sharp";
import { expectAccessible } from "./accessible";
import { signIn } from "./people";
import { fillWalk, handOver } from "./walking";

const HOST = "tallowcreek.example";
const UNIT = "T-104";

test("the loop: tagged, refused, signed off, refused, acknowledged, handed over, and not to a stranger", async ({
  browser,
}) => {
  const driverA = await signIn(browser, `lena.marsh@${HOST}`);
  const dispatcher = await signIn(browser, `desmond.achterberg@${HOST}`);
  const mechanic = await signIn(browser, `ruth.okafor@${HOST}`);

  await test.step("driver A walks the truck and tags it red, with a photo", async () => {
    await driverA.goto(`/walk/${UNIT}`);
    const steering = driverA.getByRole("combobox", { name: /^Steering parts/ }).first();
    const red = steering.locator("option", { hasText: "(red tag)" }).first();
    await steering.selectOption((await red.getAttribute("value")) ?? "");
    const picture = sharp({
      create: { width: 640, height: 480, channels: 3, background: "#b01e28" },
    });
    await driverA
      .locator('input[type="file"]')
      .first()
      .setInputFiles({
        name: "steering.jpg",
        mimeType: "image/jpeg",
        buffer: await picture.jpeg().toBuffer(),
      });
    await fillWalk(driverA, "Lena Marsh");
    await driverA.getByRole("button", { name: "Sign the walk" }).click();
    await expect(driverA.getByText("The walk is in. The truck is now: Held.")).toBeVisible();
    await expect(driverA.getByText("A photo did not go through")).toHaveCount(0);
    await expect(driverA.getByRole("region", { name: /The walk is in/ })).not.toContainText(
      "clears nothing",
    );
    await expectAccessible(driverA, "walk-sent");
  });

  await test.step("dispatcher B is refused, with reasons", async () => {
    await handOver(dispatcher, UNIT, "Lena Marsh");
    await expect(dispatcher.getByRole("alert")).toContainText("The key stays on the peg");
    await expect(dispatcher.getByRole("alert")).toContainText("Red tag: Steering parts");
    await expectAccessible(dispatcher, "board-not-clear");
  });

  await test.step("A has no bench, and the server refuses A's sign-off", async () => {
    const answer = await driverA.goto("/bench");
    expect(answer?.status()).toBe(403);
    await mechanic.goto("/bench");
    const tag = mechanic.getByRole("article").filter({ hasText: `${UNIT}: Steering parts` });
    const form = {
      id: crypto.randomUUID(),
      tagId: await tag.locator('input[name="tagId"]').inputValue(),
      kind: "repaired",
      work: "adjusted",
      signature: "Lena Marsh",
    };
    const origin = new URL(mechanic.url()).origin;
    const refused = await driverA.request.post("/bench", { form, headers: { Origin: origin } });
    expect(refused.status()).toBe(403);
    await mechanic.reload();
    await expect(tag).toHaveCount(1);
  });

  await test.step("mechanic C sees the photo and signs off", async () => {
    await mechanic.goto("/bench");
    const tag = mechanic.getByRole("article").filter({ hasText: `${UNIT}: Steering parts` });
    const photo = tag.getByRole("img", { name: "Photo 1" });
    await expect(photo).toBeVisible();
    expect(await photo.evaluate((image) => (image as HTMLImageElement).naturalWidth)).toBe(320);
    await expectAccessible(mechanic, "bench-photo");
    await tag.getByText("Sign off", { exact: true }).first().click();
    await tag.getByRole("radio", { name: "Repaired" }).check();
    await tag.getByRole("combobox", { name: "What was done" }).selectOption("replaced");
    await tag.getByRole("textbox", { name: /name/i }).fill("Ruth Okafor");
    await tag.getByRole("button", { name: "Sign off" }).click();
    await expect(mechanic.getByText("Signed off.")).toBeVisible();
  });

  await test.step("B is refused again: not acknowledged", async () => {
    await handOver(dispatcher, UNIT, "Lena Marsh");
    await expect(dispatcher.getByRole("alert")).toContainText("has not acknowledged one thing");
  });

  await test.step("A acknowledges", async () => {
    await driverA.goto(`/walk/${UNIT}`);
    await driverA.getByLabel(/name/i).first().fill("Lena Marsh");
    await driverA.getByRole("button", { name: "I have seen this" }).click();
    await expect(driverA.getByText("nothing was signed off since your last look")).toBeVisible();
  });

  await test.step("B is refused for driver D, who has neither walked nor taken over", async () => {
    await handOver(dispatcher, UNIT, "Petra Solberg");
    await expect(dispatcher.getByRole("alert")).toContainText("has no walk on this truck");
  });

  await test.step("B hands A the key, and takes it back", async () => {
    await handOver(dispatcher, UNIT, "Lena Marsh");
    await expect(dispatcher.getByText("The key is handed over.")).toBeVisible();
    await expect(dispatcher.getByRole("heading", { name: UNIT })).toBeVisible();
    await dispatcher.getByRole("radio", { name: "Empty" }).check();
    await dispatcher.getByRole("button", { name: "Take the key back" }).click();
    await expect(dispatcher.getByText("The key is back on its peg.")).toBeVisible();
  });
});

test("the other carrier sees none of it", async ({ browser }) => {
  const stranger = await signIn(browser, "una.greer@harrowbend.example");
  const answer = await stranger.goto(`/board/${UNIT}`);
  expect(answer?.status()).toBe(404);
});
