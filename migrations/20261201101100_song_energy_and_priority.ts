import type { Knex } from "knex";

/** How lively a song is, where somebody said so, and how much it is wanted in a set. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable("songs", (table) => {
    table.specificType("energy", "tinyint unsigned").nullable();
    table.specificType("priority", "tinyint unsigned").notNullable().defaultTo(3);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.alterTable("songs", (table) => {
    table.dropColumn("energy");
    table.dropColumn("priority");
  });
}
