import { defineConfig } from "vitest/config";

const secret = "only-for-tests-and-known-to-everybody";

const fixedSeed = "tests/support/fixed-seed.ts";
const resolve = { tsconfigPaths: true };

const base = {
  environment: "node",
  setupFiles: [fixedSeed],
  env: {
    NODE_ENV: "test",
    SESSION_SECRET: secret,
    PASSWORD_PEPPER: secret,
    PASSWORD_COST: "4",
    LOG_LEVEL: "silent",
    // As nobody has set them, whatever this machine's environment says.
    HOST: "",
    PORT: "",
    PUBLIC_URL: "",
    TRUST_PROXY: "",
    DATABASE_CONNECTIONS: "",
    PLANNER_THREADS: "",
  },
};

const withDatabase = {
  // Knex reads migrations by itself, past Vitest.
  execArgv: ["--import", "tsx"],
  globalSetup: ["tests/support/start-database.ts"],
  setupFiles: [fixedSeed, "tests/support/worker-environment.ts"],
};

/** Pure tests run in parallel; those that need MariaDB or Chromium have projects of their own. */
export default defineConfig({
  root: new URL("..", import.meta.url).pathname,
  test: {
    projects: [
      {
        resolve,
        test: { ...base, name: "unit", include: ["tests/unit/**/*.test.{ts,tsx}"], testTimeout: 60_000 },
      },
      {
        resolve,
        test: { ...base, name: "reference", include: ["tests/reference/**/*.test.ts"], testTimeout: 120_000 },
      },
      {
        resolve,
        test: {
          ...base,
          ...withDatabase,
          name: "integration",
          include: ["tests/integration/**/*.test.ts"],
          testTimeout: 30_000,
        },
      },
      {
        resolve,
        test: {
          ...base,
          ...withDatabase,
          globalSetup: ["tests/support/start-build.ts", ...withDatabase.globalSetup],
          name: "browser",
          expect: { poll: { timeout: 10_000 } },
          include: ["tests/browser/**/*.test.ts"],
          testTimeout: 60_000,
          hookTimeout: 60_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
