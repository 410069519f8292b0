import { connect } from "../services/db.server.ts";
import { type MariaDb, startMariaDb } from "./mariadb.ts";
import { migrate } from "./migrate.ts";
import { dataFolder } from "./paths.ts";
import { PlainError } from "./plain-error.ts";

/** Where the data live; `server` is null where the environment names a database that somebody else looks after. */
export type Database = { url: string; server: MariaDb | null };

export async function openDatabase(env: NodeJS.ProcessEnv): Promise<Database> {
  if (env.DATABASE_URL) return { url: env.DATABASE_URL, server: null };
  const server = await startMariaDb(`${dataFolder}/mariadb`);
  return { url: server.url, server };
}

/** @throws PlainError where the database cannot be reached or refuses a migration */
export async function migrateDatabase(url: string): Promise<number> {
  const db = connect(url, 2);
  try {
    await db.raw("select 1");
  } catch (error) {
    await db.destroy();
    throw new PlainError(`The database at ${withoutPassword(url)} does not answer: ${reason(error)}`);
  }
  try {
    return await migrate(db);
  } catch (error) {
    throw new PlainError(`The database could not be migrated: ${reason(error)}`);
  } finally {
    await db.destroy();
  }
}

function reason(error: unknown): string {
  const deepest = error instanceof Response && "cause" in error ? error.cause : error;
  return deepest instanceof Error ? deepest.message : String(deepest);
}

function withoutPassword(url: string): string {
  const { hostname, port, pathname } = new URL(url);
  return `${hostname}:${port || 3306}${pathname}`;
}
