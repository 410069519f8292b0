import { type ChildProcess, spawn } from "node:child_process";
import type { Knex } from "knex";
import { afterAll, afterEach, beforeAll, beforeEach, expect, inject } from "vitest";
import { endLeftBehind, startMariaDb } from "#app/launch/mariadb.ts";
import { migrate } from "#app/launch/migrate.ts";
import { buildFolder, projectFolder } from "#app/launch/paths.ts";
import { freePort, untilListening } from "#app/launch/ports.ts";
import { ended } from "#app/launch/processes.ts";
import { closeDb, getDb } from "#app/services/db.server.ts";
import { getEnv } from "#app/services/env.server.ts";
import { createDatabase, emptyTables } from "#tests/support/database.ts";

export type App = {
  /** Where the application is served; the same after it was stopped and started again. */
  readonly url: string;
  /** The database it is served from, empty at the start of every test. */
  readonly db: Knex;
  /** Asks the server to stop as an operator would, and answers with its exit code. */
  stopServer(): Promise<number>;
  startServer(): Promise<void>;
  stopDatabase(): Promise<void>;
  startDatabase(): Promise<void>;
  /** This test makes the server log an error, and means to. */
  expectErrors(): void;
};

/**
 * The built application over a real MariaDB: call it once at the top of a file. A test fails where the server logged an
 * error that it did not expect. What a test stopped runs again for the next.
 */
export function useApp(): App {
  const server = new TestServer();
  let databaseRuns = true;
  let errorsExpected = false;

  const startDatabase = async () => {
    if (databaseRuns) return;
    await startMariaDb(inject("databaseFolder"), { throwaway: true });
    databaseRuns = true;
  };

  beforeAll(async () => {
    await createDatabase(getEnv().DATABASE_URL);
    await migrate(getDb());
    await server.start();
  });
  beforeEach(async () => {
    errorsExpected = false;
    await startDatabase();
    await server.start();
    await emptyTables(getDb());
    server.errors.length = 0;
  });
  afterEach(() => {
    if (!errorsExpected) expect(server.errors, "errors in the server's log").toEqual([]);
  });
  afterAll(async () => {
    await startDatabase();
    await server.stop();
    await closeDb();
  });

  return {
    get url() {
      return server.url;
    },
    get db() {
      return getDb();
    },
    startServer: () => server.start(),
    stopServer: () => server.stop(),
    startDatabase,
    async stopDatabase() {
      await endLeftBehind(inject("databaseFolder"));
      databaseRuns = false;
    },
    expectErrors() {
      errorsExpected = true;
    },
  };
}

class TestServer {
  readonly errors: string[] = [];
  #port = 0;
  #child: ChildProcess | null = null;
  #ended: Promise<number> | null = null;

  get url(): string {
    return `http://127.0.0.1:${this.#port}`;
  }

  async start(): Promise<void> {
    if (this.#child) return;
    if (this.#port === 0) this.#port = await freePort();
    const child = spawn(process.execPath, [`${buildFolder}/server/serve.js`], {
      cwd: projectFolder,
      env: {
        ...process.env,
        NODE_ENV: "production",
        HOST: "127.0.0.1",
        PORT: String(this.#port),
        PUBLIC_URL: this.url,
        LOG_LEVEL: "warn",
      },
      stdio: ["ignore", "pipe", "pipe", "ipc"],
    });
    child.stdout?.on("data", (part: Buffer) => this.#read(part.toString()));
    child.stderr?.on("data", (part: Buffer) => this.#read(part.toString()));
    this.#child = child;
    this.#ended = ended(child);
    const failed = this.#ended.then((code) => {
      throw new Error(`The server ended while it started (exit ${code}): ${this.errors.join("\n")}`);
    });
    failed.catch(() => {});
    await Promise.race([untilListening("127.0.0.1", this.#port, AbortSignal.timeout(20_000)), failed]);
  }

  async stop(): Promise<number> {
    this.#child?.kill("SIGTERM");
    const code = await this.#ended;
    this.#child = null;
    return code ?? 0;
  }

  /** The log is one JSON object a line; 50 is pino's level for an error, and what is no JSON is worse. */
  #read(text: string): void {
    for (const line of text.split("\n").filter(Boolean)) {
      if (/^\{"level":[1-4]0,/.test(line)) continue;
      this.errors.push(line);
    }
  }
}
