import { defineConfig } from "@playwright/test";

export default defineConfig({
  testDir: "tests/journeys",
  outputDir: ".data/test/journeys",
  workers: 1,
  timeout: 90_000,
  expect: { timeout: 15_000 },
  use: {
    baseURL: process.env.KEYPEG_ORIGIN,
    launchOptions: {
      executablePath: process.env.KEYPEG_CHROMIUM,
      args: [
        "--no-sandbox",
        "--disable-gpu",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
        "--no-first-run",
      ],
    },
  },
});
