import type { Knex } from "knex";
import { id, timestamps } from "../app/models/columns.server.ts";

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable("guitars", (table) => {
    id(table, "id").primary();
    id(table, "act_id").notNullable().references("acts.id").onDelete("CASCADE");
    table.string("name", 80).notNullable();
    table.string("short_name", 6).notNullable();
    table.string("badge", 12).notNullable();
    table.string("kind", 20).notNullable();
    table.specificType("strings", "tinyint unsigned").notNullable();
    table.json("usual").notNullable();
    table.json("lowest").notNullable();
    table.json("highest").notNullable();
    table.boolean("keeps").notNullable().defaultTo(false);
    table.boolean("left_handed").notNullable().defaultTo(false);
    id(table, "spare_for").nullable().references("guitars.id").onDelete("SET NULL");
    table.string("channel", 40).notNullable().defaultTo("");
    table.date("strung_on").nullable();
    table.text("notes").notNullable().defaultTo("");
    table.integer("version").unsigned().notNullable().defaultTo(1);
    table.datetime("deleted_at", { precision: 3 }).nullable();
    timestamps(knex, table);
    table.index(["act_id", "deleted_at"]);
  });
  await knex.schema.createTable("capos", (table) => {
    id(table, "id").primary();
    id(table, "act_id").notNullable().references("acts.id").onDelete("CASCADE");
    table.string("name", 80).notNullable();
    table.json("strings").nullable();
    table.specificType("count", "tinyint unsigned").notNullable().defaultTo(1);
    table.integer("version").unsigned().notNullable().defaultTo(1);
    timestamps(knex, table);
    table.index(["act_id"]);
  });
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable("capos");
  await knex.schema.dropTable("guitars");
}
