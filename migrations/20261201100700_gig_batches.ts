import type { Knex } from "knex";
import { id } from "../app/models/columns.server.ts";

/**
 * Every batch of edits that was applied to a gig, with what undoes it. The batch's id is made by the browser, so
 * that sending it twice applies it once. `undoes` names the batch that an undo or redo takes back.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("gig_batches", (table) => {
    id(table, "gig_id").notNullable().references("gigs.id").onDelete("CASCADE");
    table.integer("revision").unsigned().notNullable();
    id(table, "id").notNullable();
    id(table, "client").notNullable();
    id(table, "person_id").nullable().references("people.id").onDelete("SET NULL");
    id(table, "undoes").nullable();
    table.string("label", 160).notNullable().defaultTo("");
    table.json("edits").notNullable();
    table.json("inverse").notNullable();
    table.datetime("created_at", { precision: 3 }).notNullable().defaultTo(knex.raw("current_timestamp(3)"));
    table.primary(["gig_id", "revision"]);
    table.unique(["gig_id", "id"]);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable("gig_batches");
}
