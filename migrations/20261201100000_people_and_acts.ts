import type { Knex } from "knex";
import { id, timestamps } from "../app/models/columns.server.ts";

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("people", (table) => {
    id(table, "id").primary();
    table.string("email", 254).notNullable().unique();
    table.string("display_name", 80).notNullable();
    table.string("password_hash", 100).notNullable();
    table.enum("naming", ["english", "german", "fixed-do"]).notNullable().defaultTo("english");
    table.enum("paper", ["a4", "letter"]).notNullable().defaultTo("a4");
    table.enum("hand", ["left", "right"]).notNullable().defaultTo("right");
    timestamps(knex, table);
  });
  await knex.schema.createTable("acts", (table) => {
    id(table, "id").primary();
    table.string("name", 80).notNullable();
    timestamps(knex, table);
  });
  await knex.schema.createTable("memberships", (table) => {
    id(table, "act_id").notNullable().references("acts.id").onDelete("CASCADE");
    id(table, "person_id").notNullable().references("people.id").onDelete("CASCADE");
    table.enum("role", ["owner", "performer", "tech", "guest"]).notNullable();
    timestamps(knex, table);
    table.primary(["act_id", "person_id"]);
    table.index(["person_id"]);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable("memberships");
  await knex.schema.dropTable("acts");
  await knex.schema.dropTable("people");
}
