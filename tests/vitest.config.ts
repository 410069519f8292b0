import { defineConfig } from "vitest/config";

/** Pure tests run in parallel; those that need MariaDB or Chromium have projects of their own. */
export default defineConfig({
  test: {
    projects: [
      {
        resolve: { tsconfigPaths: true },
        test: { name: "unit", include: ["tests/unit/**/*.test.{ts,tsx}"], environment: "node" },
      },
      {
        resolve: { tsconfigPaths: true },
        test: { name: "reference", include: ["tests/reference/**/*.test.ts"], environment: "node", testTimeout: 120_000 },
      },
      {
        resolve: { tsconfigPaths: true },
        test: {
          name: "integration",
          include: ["tests/integration/**/*.test.ts"],
          environment: "node",
          testTimeout: 30_000,
        },
      },
      {
        resolve: { tsconfigPaths: true },
        test: {
          name: "browser",
          include: ["tests/browser/**/*.test.ts"],
          environment: "node",
          testTimeout: 60_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
