import type { Knex } from "knex";

/** An id column: up to 24 characters of nanoid's alphabet, compared byte by byte. */
export function id(table: Knex.CreateTableBuilder, name: string): Knex.ColumnBuilder {
  return table.specificType(name, "varchar(24) character set ascii collate ascii_bin");
}

/** A column for a SHA-256 in hex. */
export function sha256(table: Knex.CreateTableBuilder, name: string): Knex.ColumnBuilder {
  return table.specificType(name, "char(64) character set ascii collate ascii_bin");
}

export function timestamps(knex: Knex, table: Knex.CreateTableBuilder): void {
  table.datetime("created_at", { precision: 3 }).notNullable().defaultTo(knex.raw("current_timestamp(3)"));
  table
    .datetime("updated_at", { precision: 3 })
    .notNullable()
    .defaultTo(knex.raw("current_timestamp(3) on update current_timestamp(3)"));
}
