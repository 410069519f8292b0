import type { Knex } from "knex";

/** What a gig's suggestions keep low, and what its sets should rather be like. Gigs so far: least dead air, no wishes. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable("gigs", (table) => {
    table.json("aim").notNullable().defaultTo('{"kind":"dead-air"}');
    table.json("wishes").notNullable().defaultTo("[]");
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable("gigs", (table) => {
    table.dropColumn("aim");
    table.dropColumn("wishes");
  });
}
