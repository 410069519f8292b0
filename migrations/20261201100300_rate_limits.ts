import type { Knex } from "knex";

/** The table that rate-limiter-flexible's MySQL store expects. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("rate_limits", (table) => {
    table.specificType("key", "varchar(255) character set utf8mb4 collate utf8mb4_bin").primary();
    table.integer("points").notNullable().defaultTo(0);
    table.bigInteger("expire").unsigned().nullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable("rate_limits");
}
