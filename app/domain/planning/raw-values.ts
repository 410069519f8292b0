/*
 * For checks that read a raw value, so that they also run where its shape is wrong elsewhere: all that is wrong is listed at
 * once. What has the wrong type is passed over, since the shape's own check names it.
 */
export const record = (value: unknown): Record<string, unknown> =>
  typeof value === "object" && value !== null && !Array.isArray(value)
    ? (value as Record<string, unknown>)
    : {};
export const list = (value: unknown): unknown[] => (Array.isArray(value) ? value : []);
export const field = (value: unknown, name: string): unknown =>
  Object.hasOwn(record(value), name) ? record(value)[name] : undefined;
export const idsOf = (values: unknown[]): string[] =>
  values.map((value) => field(value, "id")).filter((id) => typeof id === "string");
