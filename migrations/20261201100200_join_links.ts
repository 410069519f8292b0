import type { Knex } from "knex";
import { id, sha256, timestamps } from "../app/models/columns.server.ts";

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("join_links", (table) => {
    id(table, "id").primary();
    id(table, "act_id").notNullable().references("acts.id").onDelete("CASCADE");
    table.enum("role", ["owner", "performer", "tech", "guest"]).notNullable();
    sha256(table, "token_hash").notNullable().unique();
    id(table, "made_by").nullable().references("people.id").onDelete("SET NULL");
    table.datetime("expires_at", { precision: 3 }).notNullable();
    table.datetime("used_at", { precision: 3 }).nullable();
    id(table, "used_by").nullable().references("people.id").onDelete("SET NULL");
    timestamps(knex, table);
    table.index(["act_id"]);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable("join_links");
}
