/** A field of a form that stands differently in what is saved and in what was typed. */
export type Difference = { label: string; saved: string; typed: string };

function asText(value: unknown): string {
  if (value === undefined || value === null || value === false) return "";
  if (value === true || value === "on") return "yes";
  if (Array.isArray(value)) return value.map(asText).filter(Boolean).join("\n");
  return String(value).replace(/\r\n/g, "\n").trim();
}

/**
 * The fields in which two states of one form differ, by their labels in the order of `labels`.
 * @example differences({ title: "Title" }, { title: "Low Meadow" }, { title: "High Meadow" })
 * // [{ label: "Title", saved: "Low Meadow", typed: "High Meadow" }]
 */
export function differences(
  labels: Readonly<Record<string, string>>,
  saved: Readonly<Record<string, unknown>>,
  typed: Readonly<Record<string, unknown>>,
): Difference[] {
  return Object.entries(labels).flatMap(([field, label]) => {
    const difference = {
      label,
      saved: asText(saved[field]),
      typed: asText(typed[field]),
    };
    return difference.saved === difference.typed ? [] : [difference];
  });
}
