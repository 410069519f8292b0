import type { Model, Option } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";

/**
 * Songs that ask for the same: same options, same section. As long as one of them is to be played, some guitar must be
 * brought into one of these states once more. `cover` is the greatest of theirs.
 */
export type Need = { songs: number[]; options: Option[]; cover: number };

/** Songs that lead straight into each other, to be served as one. */
export type Chain = { songs: number[] };

/** The needs that bounds count, and the songs that may lie between them without being counted. */
export type Needs = {
  counted: Need[];
  /** All songs but one of each counted need: the one that stands for it, of the greatest cover. */
  passing: number[];
  /** `first[b]` has bit a set where all songs of need a must be played before any of need b. */
  first: Int32Array;
};

type Draft = Need & { key: string };

const MOST_CHAIN_WAYS = 64;

/** Songs that lead straight into each other, as far as there are not too many ways to play a chain. */
export function chainsOf(model: Model, rules: OrderRules): Chain[] {
  return model.options.flatMap((_, song): Chain[] => {
    if (rules.previous[song] !== -1 || rules.next[song] === -1) return [];
    const songs = [song];
    for (let at = rules.next[song]!; at !== -1; at = rules.next[at]!) songs.push(at);
    const ways = songs.reduce((product, one) => product * model.options[one]!.length, 1);
    return ways <= MOST_CHAIN_WAYS ? [{ songs }] : [];
  });
}

function comesFirst(rules: OrderRules, a: number, b: number): boolean {
  return rules.latest[a]! < rules.earliest[b]! || rules.predecessors[b]!.includes(a);
}

/** Whether serving `other` always serves `need` for nothing: each of its options is one of need's, at no higher penalty. */
function comesForFree(need: Need, other: Need): boolean {
  return other.options.every((theirs) =>
    need.options.some(
      (own) => own.guitar === theirs.guitar && own.neck === theirs.neck && own.penalty <= theirs.penalty,
    ),
  );
}

/**
 * Songs by options, section and cover; one with a place of its own, and those in `ordered`, stand alone. What opens the set
 * is no need.
 */
function finest(
  model: Model,
  rules: OrderRules,
  apart: Set<number>,
  ordered: ReadonlySet<number> = new Set(),
): Draft[] {
  const section = new Map(model.problem.songs.map((song) => [song.id, song.section]));
  const groups = new Map<string, Draft>();
  for (let song = 0; song < model.songs; song += 1) {
    if (apart.has(song) || rules.latest[song] === 0) continue;
    const options = model.options[song]!;
    const words = options.map(({ guitar, neck, penalty }) => `${guitar}.${neck}.${penalty}`).sort();
    const fixed = rules.earliest[song] === rules.latest[song] || ordered.has(song) ? song : "";
    const key = `${words.join(" ")}|${section.get(model.problem.order[song]!)}|${fixed}`;
    const cover = model.cover[song]!;
    const known = groups.get(`${key}|${cover}`);
    if (known) known.songs.push(song);
    else groups.set(`${key}|${cover}`, { key, songs: [song], options, cover });
  }
  return [...groups.values()];
}

/**
 * The finest needs; songs of a rule about which comes first stand alone, pair after pair as far as there is room, so that
 * the rule can be seen.
 *
 * @param reserve needs that these may add even where there is no room, at the cost of others
 */
function finestInOrder(
  model: Model,
  rules: OrderRules,
  apart: Set<number>,
  room: number,
  reserve: number,
): Draft[] {
  const ordered = new Set<number>();
  const most = Math.max(room, finest(model, rules, apart).length + reserve);
  for (const [b, before] of rules.predecessors.entries()) {
    for (const a of before) {
      if (rules.latest[a]! < rules.earliest[b]! || (apart.has(a) && apart.has(b))) continue;
      const tried = new Set([...ordered, a, b]);
      if (finest(model, rules, apart, tried).length <= most) ordered.add(a).add(b);
    }
  }
  return finest(model, rules, apart, ordered);
}

/** Makes one need of the two that differ in cover alone, and in that the least; null where there are none. */
function mergeClosest(needs: Draft[]): Draft[] | null {
  let closest: { a: Draft; b: Draft; apart: number } | null = null;
  for (const [i, a] of needs.entries()) {
    for (const b of needs.slice(i + 1)) {
      const apart = Math.abs(a.cover - b.cover);
      if (a.key === b.key && (!closest || apart < closest.apart)) closest = { a, b, apart };
    }
  }
  if (!closest) return null;
  const { a, b } = closest;
  const merged = { ...a, songs: [...a.songs, ...b.songs], cover: Math.max(a.cover, b.cover) };
  return needs.flatMap((need) => (need === a ? [merged] : need === b ? [] : [need]));
}

/** The `most` needs that are worth counting: those that others serve by the way last, those with few options first. */
function worthCounting(needs: Draft[], most: number): Draft[] {
  const free = needs.map((need, i) =>
    needs.some((other, k) => k !== i && comesForFree(need, other) && (!comesForFree(other, need) || k < i)),
  );
  const ranked = needs
    .map((_, i) => i)
    .sort(
      (a, b) =>
        Number(free[a]) - Number(free[b]) || needs[a]!.options.length - needs[b]!.options.length || a - b,
    );
  const chosen = new Set(ranked.slice(0, most));
  return needs.filter((_, i) => chosen.has(i));
}

/** Whether all songs of one are before all of another. Chains are never broken up, so there one pair decides. */
function allBefore(rules: OrderRules, one: { songs: number[] }, other: { songs: number[] }): boolean {
  const inChain = (songs: number[]) =>
    songs.every((song, i) => i === 0 || rules.previous[song] === songs[i - 1]);
  const pairs = one.songs.flatMap((a) => other.songs.map((b) => comesFirst(rules, a, b)));
  return inChain(one.songs) && inChain(other.songs) ? pairs.some(Boolean) : pairs.every(Boolean);
}

/** For each set of songs, the bits of those that must all be played before any of it. */
export function precedence(rules: OrderRules, units: { songs: number[] }[]): Int32Array {
  return Int32Array.from(units, (unit) =>
    units.reduce(
      (bits, other, i) => (other !== unit && allBefore(rules, other, unit) ? bits | (1 << i) : bits),
      0,
    ),
  );
}

/**
 * At most `most` needs that are worth counting: first those that differ in cover alone become one, then some are left out.
 *
 * @param apart songs that are served in some other way: they are in no need, and not passed through
 * @param linked songs of chains that are each a need of their own, counted before all others
 * @param reserve share of the needs that may go to songs of rules about which comes first, though others are left out for it
 */
export function needsOf(
  model: Model,
  rules: OrderRules,
  most: number,
  apart = new Set<number>(),
  linked: ReadonlySet<number> = new Set(),
  reserve = 0,
): Needs {
  const alone = new Set([...apart, ...linked]);
  const links = [...linked].map(
    (song): Need => ({ songs: [song], options: model.options[song]!, cover: model.cover[song]! }),
  );
  const room = Math.max(0, most - links.length);
  let needs = finestInOrder(model, rules, alone, room, Math.floor(room * reserve));
  while (needs.length > room) {
    const fewer = mergeClosest(needs);
    if (!fewer) break;
    needs = fewer;
  }
  const counted: Need[] = [...links, ...worthCounting(needs, room)];
  const standing = new Set(
    counted.map(({ songs, cover }) => songs.find((song) => model.cover[song] === cover)!),
  );
  const passing = model.options
    .map((_, song) => song)
    .filter((song) => !standing.has(song) && !apart.has(song) && rules.latest[song] !== 0);
  return { counted, passing, first: precedence(rules, counted) };
}

/**
 * Whether these needs can be all that is left: not where one of them should have come before one that is served already.
 *
 * @param first see `precedence`
 */
export function canBeLeft(set: number, first: Int32Array): boolean {
  for (let need = 0; need < first.length; need += 1)
    if (((set >> need) & 1) === 0 && (first[need]! & set) !== 0) return false;
  return true;
}
