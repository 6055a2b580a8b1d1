import { expect, test } from "@playwright/test";
import { signIn } from "./people";
import { fillWalk, handOver } from "./walking";

const HOST = "tallowcreek.example";
const UNIT = "T-118";
test.describe.configure({ timeout: 180_000 });

test("a yellow on a road-safety part: held, let run until a day, seen, taken over, and the day ended", async ({
  browser,
}) => {
  const driver = await signIn(browser, `ines.calder@${HOST}`);
  const next = await signIn(browser, `tobias.keene@${HOST}`);
  const mechanic = await signIn(browser, `gil.santoro@${HOST}`);
  const dispatcher = await signIn(browser, `joy.halloran@${HOST}`);
  const steering = (page: typeof driver) =>
    page.getByRole("combobox", { name: /^Steering parts/ }).first();

  await test.step("the driver finds steering fluid low: the truck is held", async () => {
    await driver.goto(`/walk/${UNIT}`);
    await fillWalk(driver, "Ines Calder");
    await steering(driver).selectOption({ label: "steering fluid low (yellow tag)" });
    await driver.getByRole("button", { name: "Sign the walk" }).click();
    await expect(driver.getByText("The walk is in. The truck is now: Held.")).toBeVisible();
  });

  await test.step("a mechanic lets it run until a day", async () => {
    await mechanic.goto("/bench");
    const tag = mechanic.getByRole("article").filter({ hasText: `${UNIT}: Steering parts` });
    await tag.getByText("Let it run under a limit", { exact: true }).first().click();
    const form = tag.getByRole("form", { name: /^Let it run/ });
    await form.getByRole("combobox", { name: "Limit" }).selectOption({ label: "No limit" });
    await form.getByLabel("Last day it may run").fill("2020-01-01");
    await form.getByRole("textbox", { name: /name/i }).fill("Gil Santoro");
    await form.getByRole("button", { name: "Let it run under a limit" }).click();
    await expect(form.getByText("Choose today or a later day.")).toBeVisible();
    const day = new Date(Date.now() + 5 * 86_400_000).toISOString().slice(0, 10);
    await form.getByLabel("Last day it may run").fill(day);
    await expect(form.getByRole("textbox", { name: /name/i })).toHaveValue("Gil Santoro");
    await form.getByRole("button", { name: "Let it run under a limit" }).click();
    await expect(mechanic.getByText("It may run under its limit.")).toBeVisible();
    await expect(tag).toContainText(`May run until ${day}`);
  });

  await test.step("the driver must see it before the key goes", async () => {
    await handOver(dispatcher, UNIT, "Ines Calder");
    await expect(dispatcher.getByRole("alert")).toContainText("has not acknowledged");
    await driver.goto(`/walk/${UNIT}`);
    await driver.getByLabel(/name/i).first().fill("Ines Calder");
    await driver.getByRole("button", { name: "I have seen this" }).click();
    await expect(driver.getByRole("button", { name: "I have seen this" })).toHaveCount(0);
    await handOver(dispatcher, UNIT, "Ines Calder");
    await expect(dispatcher.getByText("The key is handed over.")).toBeVisible();
    await dispatcher.getByRole("radio", { name: "Empty" }).check();
    await dispatcher.getByRole("button", { name: "Take the key back" }).click();
    await expect(dispatcher.getByText("The key is back on its peg.")).toBeVisible();
  });

  await test.step("another driver takes over: sees it, finds it the same, gets the key", async () => {
    await next.goto(`/walk/${UNIT}?kind=takeover`);
    await expect(next.getByText(/^Rests on .* walk of/)).toBeVisible();
    await next.getByLabel(/name/i).first().fill("Tobias Keene");
    await next.getByRole("button", { name: "I have seen this" }).click();
    await expect(next.getByRole("button", { name: "I have seen this" })).toHaveCount(0);
    await steering(next).selectOption({ label: "Same as tagged" });
    await fillWalk(next, "Tobias Keene");
    await next.getByRole("button", { name: "Sign the walk" }).click();
    await expect(next.getByRole("heading", { name: /^The walk is in/ })).toBeVisible();
    await handOver(dispatcher, UNIT, "Tobias Keene");
    await expect(dispatcher.getByText("The key is handed over.")).toBeVisible();
    await dispatcher.getByRole("radio", { name: "Empty" }).check();
    await dispatcher.getByRole("button", { name: "Take the key back" }).click();
    await expect(dispatcher.getByText("The key is back on its peg.")).toBeVisible();
  });

  await test.step("the walk after work ends that driver's day", async () => {
    await next.goto(`/walk/${UNIT}?kind=after`);
    await fillWalk(next, "Tobias Keene");
    await next.getByRole("button", { name: "Sign the walk" }).click();
    await expect(next.getByRole("heading", { name: /^The walk is in/ })).toBeVisible();
    await handOver(dispatcher, UNIT, "Tobias Keene");
    await expect(dispatcher.getByRole("alert")).toContainText("has no walk on this truck");
  });
});

test("a round done at the bench is off the list of what is due", async ({ browser }) => {
  const mechanic = await signIn(browser, `ruth.okafor@${HOST}`);
  await mechanic.goto("/bench/rounds/T-104/monthly");
  await mechanic.getByRole("button", { name: "The round is done" }).click();
  await expect(mechanic.getByText("Monthly round: done.")).toBeVisible();
  await mechanic.goto("/bench/rounds");
  await mechanic
    .getByText(/rounds? ahead$/)
    .first()
    .click();
  await expect(mechanic.getByRole("link", { name: "Do it: Monthly round of T-104" })).toBeVisible();
});
