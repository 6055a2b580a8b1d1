import { execFileSync } from "node:child_process";
import { expect, type Page, test } from "@playwright/test";
import { expectAccessible, openPage } from "./accessible";
import { signIn } from "./people";

const HOST = "tallowcreek.example";
test.describe.configure({ timeout: 300_000 });

/** Each page by its address: as it opens, and what a form says when nothing was filled in. */
async function look(page: Page, screens: readonly [name: string, address: string][]) {
  for (const [name, address] of screens) {
    await page.goto(address);
    await expect(page.getByRole("heading", { level: 1 }).first()).toBeVisible();
    await expectAccessible(page, name);
  }
}

async function firstLink(page: Page, list: string, like: RegExp): Promise<string> {
  await page.goto(list);
  const links = await page.getByRole("link").all();
  for (const link of links) {
    const href = (await link.getAttribute("href")) ?? "";
    if (like.test(href)) return href;
  }
  throw new Error(`no link like ${like} on ${list}`);
}

test("the door: sign-in, its code, a wrong code, an ended invitation, safety, nothing here", async ({
  browser,
}) => {
  const page = await openPage(browser);
  await look(page, [
    ["sign-in", "/sign-in"],
    ["invitation-ended", "/invitation/none-such"],
    ["safety", "/safety"],
    ["not-found", "/no-such-page"],
  ]);
  await page.goto("/sign-in");
  await page.locator('main button[type="submit"]').first().click();
  await expect(page.getByRole("textbox", { name: /e-mail/i })).toHaveAttribute(
    "aria-invalid",
    "true",
  );
  await expectAccessible(page, "sign-in-empty");
  await page.getByRole("textbox", { name: /e-mail/i }).fill("nobody@nowhere.example");
  await page.locator('main button[type="submit"]').first().click();
  await page.getByRole("textbox", { name: /code/i }).fill("000000");
  await page.locator('main button[type="submit"]').first().click();
  await expect(page.getByRole("textbox", { name: /code/i })).toHaveAttribute(
    "aria-invalid",
    "true",
  );
  await expectAccessible(page, "sign-in-wrong-code");
});

test("a driver's screens: trucks, walks of three kinds, gaps, leaving, refusals", async ({
  browser,
}) => {
  const page = await signIn(browser, `bea.lindqvist@${HOST}`);
  await look(page, [
    ["walk-trucks", "/walk"],
    ["walk-before", "/walk/T-203"],
    ["walk-red", "/walk/T-207"],
    ["walk-after", "/walk/T-203?kind=after"],
    ["walk-takeover", "/walk/T-203?kind=takeover"],
    ["walk-towed", "/walk/P-21"],
    ["account", "/account"],
    ["driver-refused", "/bench"],
  ]);
  await page.goto("/walk/T-203");
  const station = page.getByRole("group", { name: "Approach" });
  await station.getByRole("button", { name: "Seen, all good" }).click();
  const steering = page.getByRole("combobox", { name: /^Steering parts/ });
  await steering.selectOption({ index: 2 });
  await page.getByRole("button", { name: "Sign the walk" }).click();
  await expect(page.getByRole("alert")).toContainText("no answer that stands");
  await expectAccessible(page, "walk-gaps");
  await page.getByRole("link", { name: "Your account" }).click();
  await expect(page.getByRole("alertdialog")).toBeVisible();
  await expectAccessible(page, "walk-leave");
  await page.getByRole("button", { name: "Stay on the walk" }).click();
  await expect(steering).not.toHaveValue("");
});

test("a mechanic's screens: bench, rounds, a round, refusals at their fields", async ({
  browser,
}) => {
  const page = await signIn(browser, `nadia.perrin@${HOST}`);
  await look(page, [
    ["bench", "/bench"],
    ["rounds", "/bench/rounds"],
    ["round-weekly", "/bench/rounds/T-203/weekly"],
    ["round-shop", "/bench/rounds/T-203/weekly-shop"],
    ["round-monthly", "/bench/rounds/T-203/monthly"],
  ]);
  await page.goto("/bench/rounds/T-203/monthly");
  await page.getByRole("textbox", { name: "Pump hours" }).fill("many");
  await page.getByRole("button", { name: "The round is done" }).click();
  await expect(page.getByRole("textbox", { name: "Pump hours" })).toHaveAccessibleDescription(
    /Type a number/,
  );
  await expectAccessible(page, "round-refused");
  await page.goto("/bench");
  const tag = page.getByRole("article").first();
  await tag.getByText("Sign off", { exact: true }).first().click();
  await tag.getByRole("button", { name: "Sign off" }).click();
  await expect(tag.getByText("Choose one.")).toBeVisible();
  await expectAccessible(page, "bench-refused");
});

test("a dispatcher's screens: pegboard, a held truck, a form with nothing in it", async ({
  browser,
}) => {
  const page = await signIn(browser, `kip.underwood@${HOST}`);
  await look(page, [
    ["board", "/board"],
    ["board-held", "/board/T-207"],
    ["board-towed", "/board/P-21"],
    ["board-none", "/board/T-999"],
  ]);
  await page.goto("/board/T-207");
  await page.getByRole("button", { name: "Hand over the key" }).click();
  await expect(page.getByText("Name the run.")).toBeVisible();
  await expectAccessible(page, "board-refused");
});

test("the office's screens, as they open and refused", async ({ browser }) => {
  const page = await signIn(browser, `maren.tull@${HOST}`);
  const yard = await firstLink(page, "/office/yards", /^\/office\/yards\/[0-9a-f-]{36}$/);
  const person = await firstLink(page, "/office/people", /^\/office\/people\/[0-9a-f-]{36}$/);
  const fitting = await firstLink(page, "/office/trucks/T-203", /\/fittings\/[0-9a-f-]{36}$/);
  const truck = "/office/trucks/T-203";
  await look(page, [
    ["office", "/office"],
    ["office-yards", "/office/yards"],
    ["office-yard-new", "/office/yards/new"],
    ["office-yard", yard],
    ["office-trucks", "/office/trucks"],
    ["office-truck-new", "/office/trucks/new"],
    ["office-truck", truck],
    ["office-truck-held", "/office/trucks/T-207"],
    ["office-truck-details", `${truck}/details`],
    ["office-truck-move", `${truck}/move`],
    ["office-fitting-kinds", `${truck}/fittings/new`],
    ["office-fitting-new", `${truck}/fittings/new?kind=hose`],
    ["office-fitting", fitting],
    ["office-set-point", `${truck}/set-points/vacuum-relief`],
    ["office-test", `${truck}/tests/annual-inspection`],
    ["office-sheet", `${truck}/sheet`],
    ["office-checks", "/office/checks"],
    ["office-people", "/office/people"],
    ["office-invite", "/office/people/invite"],
    ["office-person", person],
    ["office-policy", "/office/policy"],
    ["office-none", "/office/trucks/T-999"],
  ]);
  for (const [name, address] of [
    ["office-yard-refused", "/office/yards/new"],
    ["office-truck-refused", "/office/trucks/new"],
    ["office-invite-refused", "/office/people/invite"],
    ["office-test-refused", `${truck}/tests/annual-inspection`],
  ] as const) {
    await page.goto(address);
    await page.locator("main form").first().locator('button[type="submit"]').last().click();
    await expect(page.locator('[aria-invalid="true"], [role="alert"]').first()).toBeVisible();
    await expectAccessible(page, name);
  }
});

test("a firm that starts: every list says what would fill it", async ({ browser }) => {
  const email = `first.manager.${Date.now()}@newfirm.example`;
  const options = ["--name", "New Firm", "--manager-name", "First Manager"];
  options.push("--manager-email", email, "--yard", "Only Yard", "--zone", "America/Denver");
  options.push("--elevation-m", "300");
  execFileSync(process.execPath, ["scripts/run.mjs", "scripts/carrier-add.ts", ...options]);
  const page = await signIn(browser, email);
  await look(page, [
    ["empty-board", "/board"],
    ["empty-bench", "/bench"],
    ["empty-rounds", "/bench/rounds"],
    ["empty-trucks", "/office/trucks"],
    ["empty-checks", "/office/checks"],
  ]);
});
