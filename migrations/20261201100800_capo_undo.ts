import type { Knex } from "knex";

/** A capo can be put back after it was deleted, as songs and guitars can. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable("capos", (table) => {
    table.datetime("deleted_at", { precision: 3 }).nullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable("capos", (table) => {
    table.dropColumn("deleted_at");
  });
}
