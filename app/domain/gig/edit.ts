import type { Entry, Gig, GigSet, Rule } from "#app/domain/gig/gig.ts";
import type { Action } from "#app/domain/permissions.ts";

/** What of a gig itself can be changed. "times" and "wishes" write all of them at once. */
export type GigField =
  | "name"
  | "venue"
  | "startsAt"
  | "zone"
  | "slot"
  | "curfew"
  | "crew"
  | "times"
  | "aim"
  | "wishes"
  | "notes";
export type SetField = "name" | "interval" | "holdFirst" | "holdLast" | "rank";
export type EntryField = "guitarId" | "neckId" | "pinned" | "cover" | "techNote";

/** One field of `Of` with a value that fits it. */
type FieldValue<Of, Field extends keyof Of> = {
  [F in Field]: { field: F; value: Of[F] };
}[Field];

/**
 * Everything that can happen to a gig, as a closed list of values. The browser applies them at once, the server in a
 * transaction, both with `applyEdit`. Where an entry stands is a field of it, so moves of different songs commute.
 */
export type Edit =
  | ({ kind: "gig.set" } & FieldValue<Gig, GigField>)
  | { kind: "set.add"; set: GigSet }
  | { kind: "set.remove"; setId: string }
  | ({ kind: "set.set"; setId: string } & FieldValue<GigSet, SetField>)
  | { kind: "entry.add"; entry: Entry }
  | { kind: "entry.remove"; entryId: string }
  | ({ kind: "entry.place"; entryId: string } & Pick<Entry, "setId" | "section" | "rank">)
  | ({ kind: "entry.set"; entryId: string } & FieldValue<Entry, EntryField>)
  | { kind: "rule.add"; rule: Rule }
  | { kind: "rule.remove"; ruleId: string };

/**
 * Edits that one person made with one action: all of them are applied, or none. `id` is made by the window that made
 * it, so that sending it twice applies it once. `undoes` names the batch that this one takes back (an undo names an
 * edit or a redo, a redo names an undo).
 */
export type Batch = {
  id: string;
  /** The window it was made in. */
  client: string;
  /** The revision of the gig it was made on. */
  on: number;
  /** What was done, in words: "Move Quarry Song". */
  label: string;
  undoes: string | null;
  edits: Edit[];
};

/** A batch that was applied: the gig's revision after it, who made it, and the edits that take it back. */
export type LoggedBatch = Omit<Batch, "on"> & {
  revision: number;
  personId: string | null;
  displayName: string;
  inverse: Edit[];
};

/** One thing that an edit writes. `value` is JSON, so that two writes compare as text; null: it is taken away. */
export type Write = { key: string; value: string | null };

/**
 * What an edit writes: one key, which names the thing and its field.
 * @example writeOf({ kind: "entry.set", entryId: "e1", field: "pinned", value: "neck" })
 *   // { key: "entry:e1:pinned", value: '"neck"' }
 */
export function writeOf(edit: Edit): Write {
  switch (edit.kind) {
    case "gig.set":
      return { key: `gig:${edit.field}`, value: stableJson(edit.value) };
    case "set.add":
      return { key: `set:${edit.set.id}`, value: stableJson(edit.set) };
    case "set.remove":
      return { key: `set:${edit.setId}`, value: null };
    case "set.set":
      return {
        key: `set:${edit.setId}:${edit.field}`,
        value: stableJson(edit.value),
      };
    case "entry.add":
      return { key: `entry:${edit.entry.id}`, value: stableJson(edit.entry) };
    case "entry.remove":
      return { key: `entry:${edit.entryId}`, value: null };
    case "entry.place":
      return {
        key: `entry:${edit.entryId}:place`,
        value: stableJson([edit.setId, edit.section, edit.rank]),
      };
    case "entry.set":
      return {
        key: `entry:${edit.entryId}:${edit.field}`,
        value: stableJson(edit.value),
      };
    case "rule.add":
      return { key: `rule:${edit.rule.id}`, value: stableJson(edit.rule) };
    case "rule.remove":
      return { key: `rule:${edit.ruleId}`, value: null };
  }
}

/**
 * The keys an edit touches.
 * @example touches({ kind: "entry.remove", entryId: "e1" }) // ["entry:e1"]
 */
export function touches(edit: Edit): string[] {
  return [writeOf(edit).key];
}

const preparing: readonly EntryField[] = ["guitarId", "neckId", "pinned", "techNote"];

/**
 * What a person must be allowed to do in order to make this edit: a tech prepares (guitar, tuning and capo, whether
 * they are pinned, tech notes), everything else is planning.
 * @example actionFor({ kind: "entry.set", entryId: "e1", field: "techNote", value: "Spare strap" }) // "prepare"
 */
export function actionFor(edit: Edit): Extract<Action, "plan" | "prepare"> {
  return edit.kind === "entry.set" && preparing.includes(edit.field) ? "prepare" : "plan";
}

/**
 * JSON in which the members of an object stand in the order of their names, so that equal values are equal text.
 * @example stableJson({ b: 1, a: [2] }) // '{"a":[2],"b":1}'
 */
export function stableJson(value: unknown): string {
  return JSON.stringify(value, (_, part: unknown) => {
    if (typeof part !== "object" || part === null || Array.isArray(part)) return part;
    return Object.fromEntries(Object.entries(part).toSorted(([a], [b]) => (a < b ? -1 : 1)));
  });
}
