import { type Browser, expect, type Page } from "@playwright/test";
import { like } from "drizzle-orm";
import { openDatabase } from "../../app/db/client";
import { rateLimits } from "../../app/db/schema/people";
import { openPage } from "./accessible";

const MAIL_PAGE = process.env.KEYPEG_TEST_MAIL_PAGE ?? "";

interface Received {
  id: string;
  subject: string;
  text: string;
  to: { address: string }[];
}

async function codeFor(email: string, after: Set<string>): Promise<string> {
  let code = "";
  await expect
    .poll(async () => {
      const mails = (await (await fetch(`${MAIL_PAGE}email`)).json()) as Received[];
      const mail = mails.find(
        (one) => !after.has(one.id) && one.to.some((to) => to.address === email),
      );
      code = mail?.text.match(/\b\d{6}\b/)?.[0] ?? "";
      return code;
    })
    .not.toBe("");
  return code;
}

/** All these people sit at one machine, which alone would soon have asked for too many codes. */
async function forgetClient(): Promise<void> {
  const { db, close } = openDatabase(process.env.KEYPEG_DATABASE_URL ?? "", 1);
  await db.delete(rateLimits).where(like(rateLimits.key, "code-client:%"));
  await close();
}

/** The code mailed to a person once they have asked for it. */
export async function newCode(email: string, ask: () => Promise<void>): Promise<string> {
  await forgetClient();
  const before = (await (await fetch(`${MAIL_PAGE}email`)).json()) as Received[];
  await ask();
  return codeFor(email, new Set(before.map((mail) => mail.id)));
}

/** A person in a browser of their own, signed in by the code in their mail. A console error fails the test. */
export async function signIn(browser: Browser, email: string): Promise<Page> {
  const page = await openPage(browser);
  page.on("console", (message) => {
    // A refusal is an answer with a 4xx status, which the browser also writes to its console.
    const refused = message.text().startsWith("Failed to load resource");
    if (message.type() === "error" && !refused) throw new Error(message.text());
  });
  await page.goto("/sign-in");
  const code = await newCode(email, async () => {
    await page.getByRole("textbox", { name: /e-mail/i }).fill(email);
    await page.locator('main button[type="submit"]').first().click();
  });
  await page.getByRole("textbox", { name: /code/i }).fill(code);
  await page.locator('main button[type="submit"]').first().click();
  await expect(page).not.toHaveURL(/sign-in/);
  return page;
}
