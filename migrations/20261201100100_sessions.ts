import type { Knex } from "knex";
import { id, sha256 } from "../app/models/columns.server.ts";

/** Only the hash of a session's id is kept, so that a copy of the table signs nobody in. */
export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("sessions", (table) => {
    sha256(table, "id_hash").primary();
    id(table, "person_id").nullable().references("people.id").onDelete("CASCADE");
    table.json("data").notNullable();
    table.datetime("expires_at", { precision: 3 }).notNullable().index();
    table.datetime("created_at", { precision: 3 }).notNullable().defaultTo(knex.raw("current_timestamp(3)"));
    table.index(["person_id"]);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable("sessions");
}
