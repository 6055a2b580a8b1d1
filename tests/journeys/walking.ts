import type { Page } from "@playwright/test";

/** Answers every check of the sheet as a driver would who finds nothing wrong. */
export async function fillWalk(page: Page, name: string) {
  for (const station of await page.getByRole("group").all()) {
    const good = station.getByRole("button", { name: "Seen, all good" });
    if ((await good.count()) > 0) await good.click();
  }
  for (const drain of await page.locator("select[data-alone]").all()) {
    await drain.selectOption({ label: "Cracked it: dry" });
  }
  for (const shut of await page.getByRole("checkbox", { name: /: shut again$/ }).all()) {
    await shut.check();
  }
  const numbers: [RegExp, string][] = [
    [/^air lost.*psi/i, "1"],
    [/^tread/i, "9"],
    [/^low-air warning/i, "65"],
    [/^spring brake/i, "30"],
    [/^pressure relief.*psi/i, "12"],
    [/^load aboard/i, "0"],
    [/hours.*, h$/i, "1300"],
    [/odometer.*, mi$/i, "120500"],
    [/speed.*, rpm$/i, "1050"],
    [/, inHg$/i, "21"],
  ];
  for (const [label, value] of numbers) {
    for (const box of await page.getByRole("textbox", { name: label }).all()) await box.fill(value);
  }
  for (const box of await page.getByRole("textbox", { name: /^(caps|sight)/i }).all()) {
    const hint = (await box.getAttribute("aria-describedby")) ?? "";
    const words = (await page.locator(`[id="${hint.split(" ").at(-1)}"]`).textContent()) ?? "";
    await box.fill(words.match(/\d+/)?.[0] ?? "0");
  }
  for (const heard of await page.getByRole("group", { name: /heard it open/ }).all()) {
    await heard.getByRole("radio", { name: "Yes" }).check();
  }
  await page.getByLabel(/name/i).last().fill(name);
}

/** Asks for the key of a unit for a driver and a plain vacuum run. */
export async function handOver(page: Page, unit: string, driver: string) {
  await page.goto(`/board/${unit}`);
  const form = page.getByRole("form", { name: "Hand over the key" });
  await form.getByRole("combobox", { name: "Driver" }).selectOption({ label: driver });
  await form.getByRole("textbox", { name: "Run" }).fill("Run 31, grease traps");
  for (const need of ["Off-load by pressure", "Towing", "Hazmat"]) {
    await form.getByRole("group", { name: need }).getByRole("radio", { name: "No" }).check();
  }
  await form.getByRole("textbox", { name: /vacuum/i }).fill("18");
  await form.getByRole("textbox", { name: /load/i }).fill("2000");
  await form.getByRole("textbox", { name: /hose/i }).fill("100");
  await form.getByRole("button", { name: "Hand over the key" }).click();
}
