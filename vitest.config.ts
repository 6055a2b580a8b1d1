import { defineConfig } from "vitest/config";

const alias = { "~": new URL("./app", import.meta.url).pathname };

export default defineConfig({
  test: {
    projects: [
      {
        resolve: { alias },
        test: { name: "trade", include: ["tests/trade/**/*.test.ts"], environment: "node" },
      },
      {
        resolve: { alias },
        test: {
          name: "server",
          include: ["tests/server/**/*.test.{ts,tsx}"],
          environment: "node",
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
