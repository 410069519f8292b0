import type { Knex } from "knex";
import { migrations } from "../../knexfile.ts";

/** Brings a database up to the newest migration. Answers with how many were new to it. */
export async function migrate(db: Knex): Promise<number> {
  const [, applied] = (await db.migrate.latest(migrations)) as [number, string[]];
  return applied.length;
}
