import type { Knex } from "knex";
import { afterAll, beforeAll, expect, inject, test } from "vitest";
import { connect } from "#app/services/db.server.ts";
import { createDatabase } from "#tests/support/database.ts";
import { migrations } from "../../knexfile.ts";

const url = inject("databaseUrl").replace(/\/stillpeg$/, "/stillpeg_migrations");
let db: Knex;

beforeAll(async () => {
  await createDatabase(url);
  db = connect(url, 2);
});

afterAll(async () => {
  await db.raw("drop database stillpeg_migrations");
  await db.destroy();
});

/** How MariaDB itself would make every table again. */
async function schema(): Promise<Record<string, string>> {
  const tables = await db("information_schema.tables")
    .whereRaw("table_schema = database()")
    .whereNot("table_name", "like", "knex%")
    .orderBy("table_name")
    .pluck<string[]>("table_name");
  const made: Record<string, string> = {};
  for (const table of tables) {
    const [[row]] = await db.raw("show create table ??", [table]);
    made[table] = String(row["Create Table"]).replace(/ AUTO_INCREMENT=\d+/, "");
  }
  return made;
}

test("migrations go to the latest, all the way back to nothing, and to the same latest again", async () => {
  await db.migrate.latest(migrations);
  const before = await schema();
  expect(Object.keys(before)).toContain("gigs");

  await db.migrate.rollback(migrations, true);
  expect(await schema()).toEqual({});

  await db.migrate.latest(migrations);
  expect(await schema()).toEqual(before);
});

test("every step back undoes exactly its own step", async () => {
  await db.migrate.rollback(migrations, true);
  const [, pending] = (await db.migrate.list(migrations)) as [unknown[], unknown[]];
  const states = [await schema()];
  for (const _ of pending) {
    await db.migrate.up(migrations);
    states.push(await schema());
  }
  for (const state of states.slice(0, -1).reverse()) {
    await db.migrate.down(migrations);
    expect(await schema()).toEqual(state);
  }
});

test("every table and text column keeps any character there is", async () => {
  await db.migrate.latest(migrations);
  const narrow = await db("information_schema.columns")
    .whereRaw("table_schema = database()")
    .whereNot("table_name", "like", "knex%")
    .whereNotNull("character_set_name")
    .whereNotIn("character_set_name", ["utf8mb4", "ascii"])
    .select("table_name", "column_name");
  expect(narrow).toEqual([]);
});
