import { mkdirSync } from "node:fs";
import { join } from "node:path";
import { type Browser, expect, type Page } from "@playwright/test";

const AXE = "node_modules/axe-core/axe.min.js";
const PICTURES = ".data/test/screens";
const SIZES = {
  phone: { width: 412, height: 915 },
  desk: { width: 1280, height: 860 },
} as const;

interface AxeWindow {
  axe: { run(): Promise<{ violations: { id: string; nodes: { html: string }[] }[] }> };
}

/** A page in a browser of its own that has axe at hand: put in from outside, so that the page's policy stays as it is. */
export async function openPage(browser: Browser): Promise<Page> {
  const context = await browser.newContext({ viewport: SIZES.phone });
  await context.addInitScript({ path: AXE });
  return context.newPage();
}

async function violations(page: Page): Promise<string[]> {
  return page.evaluate(async () => {
    const { axe } = window as unknown as AxeWindow;
    const found = await axe.run();
    return found.violations.map(({ id, nodes }) => `${id}: ${nodes.map((n) => n.html).join(" ")}`);
  });
}

/** Axe finds nothing, by day and by night, on a phone and on a desk; nothing runs out of 320 px. */
export async function expectAccessible(page: Page, name: string): Promise<void> {
  mkdirSync(PICTURES, { recursive: true });
  for (const [size, viewport] of Object.entries(SIZES)) {
    await page.setViewportSize(viewport);
    for (const colorScheme of ["light", "dark"] as const) {
      await page.emulateMedia({ colorScheme });
      expect(await violations(page), `${name}, ${size}, ${colorScheme}`).toEqual([]);
      const path = join(PICTURES, `${name}-${size}-${colorScheme}.png`);
      await page.screenshot({ path, fullPage: true });
    }
  }
  await page.emulateMedia({ colorScheme: null });
  await page.setViewportSize({ width: 320, height: 640 });
  const width = await page.evaluate(() => document.documentElement.scrollWidth);
  expect(width, `${name} at 320 px`).toBeLessThanOrEqual(320);
  await page.setViewportSize(SIZES.phone);
}
