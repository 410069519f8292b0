import { inject } from "vitest";

/** Every test worker has a database of its own on the tests' server; the code under test finds it in its settings. */
process.env.DATABASE_URL = inject("databaseUrl").replace(
  /\/stillpeg$/,
  `/stillpeg_test_${process.env.VITEST_POOL_ID ?? "1"}`,
);
