import type { Entry, Gig, GigSet } from "#app/domain/gig/gig.ts";
import type { Rules } from "#app/domain/planning/problem.ts";

/** Places of one section among the songs that are in the problem. */
type Span = { offset: number; count: number };

function spanOf(entries: readonly Entry[], section: number): Span {
  const offset = entries.filter((entry) => entry.section < section).length;
  return { offset, count: entries.filter((entry) => entry.section === section).length };
}

/** The place in the whole set, 1-based, that a place inside a section means; one past the end where there is none. */
function placeInSet(place: number, span: Span, songs: number): number {
  const inside = place > 0 ? place : span.count + 1 + place;
  return inside >= 1 && inside <= span.count ? span.offset + inside : songs + 1;
}

/**
 * The song that opens the encore: the one that rules put first there, else the first in the present order that no rule
 * keeps from it. The applause before an encore belongs to the gap, the planner's cover to a song; so this song is always
 * held, and the two are the same.
 */
export function encoreOpener(gig: Pick<Gig, "rules">, entries: readonly Entry[]): Entry | null {
  const encore = entries.filter((entry) => entry.section === 1);
  if (encore.length === 0 || encore.length === entries.length) return null;
  const main = new Set(entries.flatMap((entry) => (entry.section === 1 ? [] : [entry.id])));
  const later = new Set(encore.map((entry) => entry.id));
  const opens = (place: number) => place === 1 || place === -encore.length;
  const must = encore.find(({ id }) =>
    gig.rules.some((rule) =>
      rule.kind === "at"
        ? rule.entry === id && opens(rule.place)
        : rule.kind === "into" && rule.b === id && main.has(rule.a),
    ),
  );
  const may = encore.find(({ id }) =>
    gig.rules.every((rule) =>
      rule.kind === "at"
        ? rule.entry !== id || opens(rule.place)
        : rule.kind === "apart" || rule.b !== id || !later.has(rule.a),
    ),
  );
  return must ?? may ?? encore[0] ?? null;
}

/** The songs that others go straight into, among those in the problem. */
export function straightInto(gig: Pick<Gig, "rules">, entries: readonly Entry[]): Set<string> {
  const ids = new Set(entries.map((entry) => entry.id));
  return new Set(
    gig.rules.flatMap((rule) => (rule.kind === "into" && ids.has(rule.a) && ids.has(rule.b) ? [rule.b] : [])),
  );
}

/**
 * The rules of one set as the planner knows them. Rules about entries that are not in the problem sleep. The first
 * and last song of the set are held where the set says so and no rule speaks of that song or that place.
 * @param entries those in the problem, in their present order
 * @param all every entry of the set, in order: only its real first and last are held
 */
export function rulesOf(
  gig: Pick<Gig, "rules">,
  set: GigSet,
  entries: readonly Entry[],
  all: readonly Entry[],
): Rules {
  const ids = new Map(entries.map((entry) => [entry.id, entry]));
  const rules: Rules = { at: {}, before: [], into: [], apart: [] };
  for (const rule of gig.rules) {
    if (rule.kind === "at") {
      const entry = ids.get(rule.entry);
      if (entry) rules.at[entry.id] = placeInSet(rule.place, spanOf(entries, entry.section), entries.length);
    } else if (ids.has(rule.a) && ids.has(rule.b)) rules[rule.kind].push([rule.a, rule.b]);
  }
  const taken = new Set(Object.values(rules.at));
  const hold = (entry: Entry | null | undefined, place: number) => {
    if (!entry || !ids.has(entry.id) || entry.id in rules.at || taken.has(place)) return;
    rules.at[entry.id] = place;
    taken.add(place);
  };
  if (set.holdFirst) hold(all[0], 1);
  hold(encoreOpener(gig, entries), spanOf(entries, 1).offset + 1);
  if (set.holdLast) hold(all.at(-1), entries.length);
  return rules;
}
