import type { Knex } from "knex";

/** A revoked link is kept, so that whoever opens it is told what became of it. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable("join_links", (table) => {
    table.datetime("revoked_at", { precision: 3 }).nullable();
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable("join_links", (table) => {
    table.dropColumn("revoked_at");
  });
}
