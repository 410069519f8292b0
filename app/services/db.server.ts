import knex, { type Knex } from "knex";
import MySql2Client from "knex/lib/dialects/mysql2/index.js";
import { DatabaseUnavailable, isDatabaseAway } from "./database-unavailable.server.ts";
import { getEnv } from "./env.server.ts";
import { log } from "./log.server.ts";

const acquireMilliseconds = 4_000;
const lockWaitSeconds = 5;
const tries = 5;

/** The driver's client, which says "the database is away" in one way whatever the driver calls it. */
class Client extends MySql2Client {
  override async acquireConnection() {
    return sayWhenAway(() => super.acquireConnection());
  }

  override async query(connection: unknown, query: unknown) {
    return sayWhenAway(() => super.query(connection, query));
  }
}

async function sayWhenAway<T>(run: () => Promise<T>): Promise<T> {
  try {
    return await run();
  } catch (error) {
    if (!isDatabaseAway(error)) throw error;
    log.warn({ err: error }, "database unavailable");
    throw new DatabaseUnavailable(error);
  }
}

/**
 * How Knex reaches a MariaDB address. No connection is kept idle for ever, so that a restarted database is found again;
 * sessions run in UTC, and a wait for a lock ends before a person gives up.
 */
export function knexConfig(url: string, max: number): Knex.Config {
  const { hostname, port, username, password, pathname } = new URL(url);
  return {
    client: Client as typeof Knex.Client,
    connection: {
      host: hostname,
      port: port ? Number(port) : 3306,
      user: decodeURIComponent(username),
      password: decodeURIComponent(password),
      database: decodeURIComponent(pathname.slice(1)),
      charset: "utf8mb4",
      timezone: "Z",
      connectTimeout: 3_000,
    },
    acquireConnectionTimeout: acquireMilliseconds,
    pool: {
      min: 0,
      max,
      idleTimeoutMillis: 30_000,
      afterCreate(connection: { query(sql: string, done: (error: Error | null) => void): void }, done: Done) {
        connection.query(
          `set session time_zone = '+00:00', innodb_lock_wait_timeout = ${lockWaitSeconds}`,
          (error) => done(error, connection),
        );
      },
    },
    log: { warn: (line: unknown) => log.debug(line), error: (line: unknown) => log.error(line) },
  };
}

export function connect(url: string, max = 10): Knex {
  return knex(knexConfig(url, max));
}

type Done = (error: Error | null, connection: unknown) => void;

let shared: Knex | null = null;

/** The process's one connection pool. */
export function getDb(): Knex {
  shared ??= connect(getEnv().DATABASE_URL, getEnv().DATABASE_CONNECTIONS);
  return shared;
}

/** Ends the pool; the next {@link getDb} opens another. */
export async function closeDb(): Promise<void> {
  const open = shared;
  shared = null;
  await open?.destroy();
}

/**
 * Runs `work` in a transaction: committed where it resolves, rolled back where it throws. Where MariaDB breaks a
 * deadlock by giving up this transaction, the whole of it is run again, up to five times, so `work` must keep its
 * effects in the database. Inside a transaction it joins that one.
 * @throws whatever `work` throws; DatabaseUnavailable where the database is away, or deadlocks do not end
 */
export async function transact<T>(db: Knex, work: (trx: Knex.Transaction) => Promise<T>): Promise<T> {
  if (isTransaction(db)) return work(db);
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await db.transaction(work);
    } catch (error) {
      if (!isDeadlock(error)) throw error;
      if (attempt === tries) {
        log.warn({ err: error }, "deadlocks did not end");
        throw new DatabaseUnavailable(error);
      }
      await new Promise((resolve) => setTimeout(resolve, attempt * 15 * (0.5 + Math.random())));
    }
  }
}

function isTransaction(db: Knex): db is Knex.Transaction {
  return db.isTransaction === true;
}

function isDeadlock(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  return ("errno" in error && error.errno === 1213) || ("sqlState" in error && error.sqlState === "40001");
}
