import { type Edit, stableJson, writeOf } from "#app/domain/gig/edit.ts";
import type { Entry, Gig, GigSet, Rule } from "#app/domain/gig/gig.ts";

/** How much one gig may hold. The planner takes 100 songs a set. */
export const gigLimits = { sets: 12, entriesPerSet: 100, rules: 500 } as const;

/**
 * Why an edit could not be applied. `gone`: what it changes is no longer there. `changed`: it stands otherwise than the
 * edit supposes. `invalid`: the gig would no longer be one.
 */
export type EditConflict = {
  code: "gone" | "changed" | "invalid";
  key: string;
  message: string;
};

export type Applied = { ok: true; gig: Gig; inverse: Edit[] } | { ok: false; conflict: EditConflict };

/**
 * The gig after an edit, and the edits that take it back. Neither gig nor edit is changed, and the revision stays: it
 * counts what the server has applied. Adding what is there already, and taking away what is not, changes nothing.
 * @example applyEdit(gig, { kind: "gig.set", field: "name", value: "Late set" })
 *   // { ok: true, gig: { ...gig, name: "Late set" }, inverse: [{ kind: "gig.set", field: "name", value: gig.name }] }
 */
export function applyEdit(gig: Gig, edit: Edit): Applied {
  switch (edit.kind) {
    case "gig.set":
      return setField(gig, gig, edit, (next) => next);
    case "set.add":
      return addSet(gig, edit.set);
    case "set.remove":
      return removeSet(gig, edit.setId);
    case "set.set": {
      const set = gig.sets.find((one) => one.id === edit.setId);
      if (!set) return setGone(edit.setId);
      return setField(gig, set, edit, (next) => ({
        ...gig,
        sets: replaced(gig.sets, next),
      }));
    }
    case "entry.add":
      return addEntry(gig, edit.entry);
    case "entry.remove":
      return removeEntry(gig, edit.entryId);
    case "entry.place":
      return placeEntry(gig, edit);
    case "entry.set": {
      const entry = gig.entries.find((one) => one.id === edit.entryId);
      if (!entry) return entryGone(edit.entryId);
      return setField(gig, entry, edit, (next) => ({
        ...gig,
        entries: replaced(gig.entries, next),
      }));
    }
    case "rule.add":
      return addRule(gig, edit.rule);
    case "rule.remove":
      return removeRule(gig, edit.ruleId);
  }
}

/**
 * The gig after several edits in their order, all of them or none. `inverse` is in the order in which it takes them
 * back.
 * @example applyEdits(gig, []) // { ok: true, gig, inverse: [] }
 */
export function applyEdits(gig: Gig, edits: readonly Edit[]): Applied {
  let next = gig;
  const inverses: Edit[][] = [];
  for (const edit of edits) {
    const applied = applyEdit(next, edit);
    if (!applied.ok) return applied;
    next = applied.gig;
    inverses.push(applied.inverse);
  }
  return { ok: true, gig: next, inverse: inverses.reverse().flat() };
}

function done(gig: Gig, ...inverse: Edit[]): Applied {
  return { ok: true, gig, inverse };
}

function refused(code: EditConflict["code"], key: string, message: string): Applied {
  return { ok: false, conflict: { code, key, message } };
}

function entryGone(entryId: string): Applied {
  return refused("gone", `entry:${entryId}`, "This song was taken out of the gig.");
}

function setGone(setId: string): Applied {
  return refused("gone", `set:${setId}`, "This set was taken out of the gig.");
}

function replaced<Item extends { id: string }>(items: readonly Item[], next: Item): Item[] {
  return items.map((item) => (item.id === next.id ? next : item));
}

function setField<Of extends object>(
  gig: Gig,
  holder: Of,
  edit: Extract<Edit, { field: string }>,
  put: (next: Of) => Gig,
): Applied {
  const before = holder[edit.field as keyof Of];
  if (stableJson(before) === stableJson(edit.value)) return done(gig);
  return done(put({ ...holder, [edit.field]: edit.value }), {
    ...edit,
    value: before,
  } as Edit);
}

function addSet(gig: Gig, set: GigSet): Applied {
  const there = gig.sets.find((one) => one.id === set.id);
  if (there) return alreadyThere(gig, { kind: "set.add", set }, there, "This set is in the gig already.");
  if (gig.sets.length >= gigLimits.sets) {
    return refused("invalid", `set:${set.id}`, `A gig has at most ${gigLimits.sets} sets.`);
  }
  return done({ ...gig, sets: [...gig.sets, set] }, { kind: "set.remove", setId: set.id });
}

function removeSet(gig: Gig, setId: string): Applied {
  const set = gig.sets.find((one) => one.id === setId);
  if (!set) return done(gig);
  const key = `set:${setId}`;
  if (gig.entries.some((entry) => entry.setId === setId)) {
    return refused("changed", key, `${set.name} still has songs in it. Move them or take them out first.`);
  }
  if (gig.sets.length === 1) return refused("invalid", key, "A gig keeps at least one set.");
  return done({ ...gig, sets: gig.sets.filter((one) => one.id !== setId) }, { kind: "set.add", set });
}

function addEntry(gig: Gig, entry: Entry): Applied {
  const there = gig.entries.find((one) => one.id === entry.id);
  if (there)
    return alreadyThere(gig, { kind: "entry.add", entry }, there, "This song stands in the gig already.");
  const noRoom = roomFor(gig, entry.id, entry.setId);
  if (noRoom) return noRoom;
  return done({ ...gig, entries: [...gig.entries, entry] }, { kind: "entry.remove", entryId: entry.id });
}

function removeEntry(gig: Gig, entryId: string): Applied {
  const entry = gig.entries.find((one) => one.id === entryId);
  if (!entry) return done(gig);
  return done(
    { ...gig, entries: gig.entries.filter((one) => one.id !== entryId) },
    { kind: "entry.add", entry },
  );
}

function placeEntry(gig: Gig, edit: Extract<Edit, { kind: "entry.place" }>): Applied {
  const entry = gig.entries.find((one) => one.id === edit.entryId);
  if (!entry) return entryGone(edit.entryId);
  const { setId, section, rank } = edit;
  if (entry.setId === setId && entry.section === section && entry.rank === rank) return done(gig);
  const noRoom = entry.setId === setId ? null : roomFor(gig, entry.id, setId);
  if (noRoom) return noRoom;
  return done(
    {
      ...gig,
      entries: replaced(gig.entries, { ...entry, setId, section, rank }),
    },
    {
      kind: "entry.place",
      entryId: entry.id,
      setId: entry.setId,
      section: entry.section,
      rank: entry.rank,
    },
  );
}

/** Why a set takes no further song, or null where it does. */
function roomFor(gig: Gig, entryId: string, setId: string): Applied | null {
  const set = gig.sets.find((one) => one.id === setId);
  if (!set) return setGone(setId);
  if (gig.entries.filter((entry) => entry.setId === setId).length < gigLimits.entriesPerSet) return null;
  return refused(
    "invalid",
    `entry:${entryId}:place`,
    `${set.name} is full: a set has at most ${gigLimits.entriesPerSet} songs.`,
  );
}

function addRule(gig: Gig, rule: Rule): Applied {
  const there = gig.rules.find((one) => one.id === rule.id);
  if (there) {
    if (stableJson(there) === stableJson(rule)) return done(gig);
    return done({ ...gig, rules: replaced(gig.rules, rule) }, { kind: "rule.add", rule: there });
  }
  if (gig.rules.length >= gigLimits.rules) {
    return refused("invalid", `rule:${rule.id}`, `A gig has at most ${gigLimits.rules} rules.`);
  }
  return done({ ...gig, rules: [...gig.rules, rule] }, { kind: "rule.remove", ruleId: rule.id });
}

function removeRule(gig: Gig, ruleId: string): Applied {
  const rule = gig.rules.find((one) => one.id === ruleId);
  if (!rule) return done(gig);
  return done({ ...gig, rules: gig.rules.filter((one) => one.id !== ruleId) }, { kind: "rule.add", rule });
}

function alreadyThere(gig: Gig, edit: Edit, there: GigSet | Entry, message: string): Applied {
  const { key, value } = writeOf(edit);
  return stableJson(there) === value ? done(gig) : refused("changed", key, message);
}
