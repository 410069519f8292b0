import type { Knex } from "knex";
import { afterAll, beforeAll, beforeEach, inject } from "vitest";
import { migrate } from "#app/launch/migrate.ts";
import { closeDb, connect, getDb } from "#app/services/db.server.ts";
import { getEnv } from "#app/services/env.server.ts";

/**
 * The database of this worker, migrated, and empty at the start of every test: call it once at the top of a file. It is
 * the one that `getDb()` answers with, so that the code under test uses it too.
 */
export function useDatabase(): { readonly db: Knex } {
  beforeAll(async () => {
    await createDatabase(getEnv().DATABASE_URL);
    await migrate(getDb());
  });
  beforeEach(() => emptyTables(getDb()));
  afterAll(closeDb);
  return {
    get db() {
      return getDb();
    },
  };
}

/** Makes the database that an address names, where there is none. */
export async function createDatabase(url: string): Promise<void> {
  const name = new URL(url).pathname.slice(1);
  const server = connect(inject("databaseUrl"), 1);
  await server.raw("create database if not exists ?? character set utf8mb4 collate utf8mb4_unicode_ci", [
    name,
  ]);
  await server.destroy();
}

/** Removes every row but what the migrations keep for themselves. */
export async function emptyTables(db: Knex): Promise<void> {
  const tables = await db("information_schema.tables")
    .whereRaw("table_schema = database()")
    .whereNotIn("table_name", ["knex_migrations", "knex_migrations_lock"])
    .pluck<string[]>("table_name");
  await db.transaction(async (trx) => {
    await trx.raw("set session foreign_key_checks = 0");
    for (const table of tables) await trx(table).delete();
    await trx.raw("set session foreign_key_checks = 1");
  });
}
