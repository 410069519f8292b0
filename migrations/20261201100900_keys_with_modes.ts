import type { Knex } from "knex";

/** "Bb mixolydian" is longer than a key in major or minor. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.alterTable("songs", (table) => {
    table.string("key", 16).notNullable().defaultTo("").alter();
  });
}

/** Keys too long for the shorter column go back to unknown: there is no shorter way to write them. */
export async function down(knex: Knex): Promise<void> {
  await knex("songs").whereRaw("char_length(`key`) > 8").update({ key: "" });
  await knex.schema.alterTable("songs", (table) => {
    table.string("key", 8).notNullable().defaultTo("").alter();
  });
}
