import type { z } from "zod";

/**
 * A JSON column through its schema. MariaDB hands JSON over as text.
 * @throws Error that names the column where it holds something else: that is a fault of ours, never of a person
 */
export function readJson<Schema extends z.ZodType>(
  schema: Schema,
  column: string,
  stored: unknown,
): z.output<Schema> {
  const value: unknown = typeof stored === "string" ? JSON.parse(stored) : stored;
  const read = schema.safeParse(value);
  if (!read.success) throw new Error(`Column ${column} holds what it should not: ${read.error.message}`);
  return read.data;
}
