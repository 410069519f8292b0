import type { Knex } from "knex";
import { id, timestamps } from "../app/models/columns.server.ts";

/**
 * A gig is one document that edits apply to: what lists need are columns, its sets, entries and rules are JSON.
 * `revision` counts the batches of edits applied.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("gigs", (table) => {
    id(table, "id").primary();
    id(table, "act_id").notNullable().references("acts.id").onDelete("CASCADE");
    table.integer("revision").unsigned().notNullable().defaultTo(0);
    table.string("name", 120).notNullable();
    table.string("venue", 120).notNullable().defaultTo("");
    table.datetime("starts_at", { precision: 0 }).notNullable();
    table.string("zone", 64).notNullable();
    table.integer("slot").unsigned().nullable();
    table.string("curfew", 5).nullable();
    table.enum("crew", ["alone", "tech"]).notNullable().defaultTo("alone");
    table.json("times").notNullable();
    table.text("notes").notNullable().defaultTo("");
    table.json("sets").notNullable();
    table.json("entries").notNullable();
    table.json("rules").notNullable();
    table.datetime("deleted_at", { precision: 3 }).nullable();
    timestamps(knex, table);
    table.index(["act_id", "deleted_at", "starts_at"]);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable("gigs");
}
