import { generateNKeysBetween } from "fractional-indexing";
import type { Entry, Gig, GigSet, Rule } from "#app/domain/gig/gig.ts";
import type { GigFields } from "#app/domain/gig/gig-form.ts";
import { idOfRule } from "#app/domain/gig/order.ts";

/**
 * A gig without songs or wishes that is planned for least dead air, with as many sets as asked for and the same interval before each but the first.
 * @param interval seconds
 * @param newId makes an id that nothing else has
 * @example newGig(fields, { sets: 2, interval: 1200, newId }).sets.map((set) => set.interval) // [0, 1200]
 */
export function newGig(
  fields: GigFields,
  { sets, interval, newId }: { sets: number; interval: number; newId: () => string },
): Gig {
  const ranks = generateNKeysBetween(null, null, sets);
  return {
    ...fields,
    id: newId(),
    revision: 0,
    aim: { kind: "dead-air" },
    wishes: [],
    sets: ranks.map((rank, index) => newSet({ id: newId(), rank, index, interval })),
    entries: [],
    rules: [],
  };
}

/**
 * A set without songs. `index` counts from 0 and names it.
 * @example newSet({ id: "s1", rank: "a0", index: 0, interval: 1200 }) // { name: "Set 1", interval: 0, … }
 */
export function newSet(given: { id: string; rank: string; index: number; interval: number }): GigSet {
  const { id, rank, index, interval } = given;
  return {
    id,
    rank,
    name: `Set ${index + 1}`,
    interval: index === 0 ? 0 : interval,
    holdFirst: true,
    holdLast: true,
  };
}

/**
 * A gig as the start of the next: the same sets, songs, guitars, rules, wishes and times at another date, with ids of its own.
 * Rules that sleep, because a song of theirs is gone or stands in another set, are left behind.
 * @param newId makes an id that nothing else has
 */
export function copyGig(
  gig: Gig,
  { name, startsAt, newId }: { name: string; startsAt: string; newId: () => string },
): Gig {
  const setIds = new Map(gig.sets.map((set) => [set.id, newId()]));
  const entries = gig.entries.filter((entry) => setIds.has(entry.setId));
  const entryIds = new Map(entries.map((entry) => [entry.id, newId()]));
  return {
    ...gig,
    id: newId(),
    revision: 0,
    name,
    startsAt,
    sets: gig.sets.map((set) => ({ ...set, id: setIds.get(set.id)! })),
    entries: entries.map((entry) => ({
      ...entry,
      id: entryIds.get(entry.id)!,
      setId: setIds.get(entry.setId)!,
    })),
    rules: gig.rules.filter((rule) => isAwake(rule, gig.entries)).map((rule) => renamed(rule, entryIds)),
  };
}

/**
 * Whether a rule can say anything: its songs are there, and stand in one set.
 * @example isAwake({ id: "into.e1.e2", kind: "into", a: "e1", b: "e2" }, []) // false
 */
export function isAwake(rule: Rule, entries: readonly Entry[]): boolean {
  const names = rule.kind === "at" ? [rule.entry] : [rule.a, rule.b];
  const sets = names.map((id) => entries.find((entry) => entry.id === id)?.setId);
  return sets[0] !== undefined && sets.every((set) => set === sets[0]);
}

function renamed(rule: Rule, ids: ReadonlyMap<string, string>): Rule {
  const next: Rule =
    rule.kind === "at"
      ? { ...rule, entry: ids.get(rule.entry)! }
      : { ...rule, a: ids.get(rule.a)!, b: ids.get(rule.b)! };
  return { ...next, id: idOfRule(next) };
}
