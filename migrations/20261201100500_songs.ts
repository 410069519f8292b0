import type { Knex } from "knex";
import { id, timestamps } from "../app/models/columns.server.ts";

/** A song's ways to be played are read and written with it, so they are one JSON column. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("songs", (table) => {
    id(table, "id").primary();
    id(table, "act_id").notNullable().references("acts.id").onDelete("CASCADE");
    table.string("title", 120).notNullable();
    table.string("credit", 120).notNullable().defaultTo("");
    table.specificType("seconds", "smallint unsigned").notNullable();
    table.string("key", 8).notNullable().defaultTo("");
    table.specificType("tempo", "smallint unsigned").nullable();
    table.text("notes").notNullable().defaultTo("");
    table.string("first_line", 200).notNullable().defaultTo("");
    table.specificType("cover", "smallint unsigned").nullable();
    table.json("necks").notNullable();
    table.integer("version").unsigned().notNullable().defaultTo(1);
    table.datetime("deleted_at", { precision: 3 }).nullable();
    timestamps(knex, table);
    table.index(["act_id", "deleted_at"]);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable("songs");
}
