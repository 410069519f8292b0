import type { Model, Option } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";

/**
 * Songs that ask for the same: same options, same cover, same windows of positions. As long as one of them is to be
 * played, some guitar must be brought into one of these states at least once more.
 */
export type Need = { songs: number[]; options: Option[]; cover: number };

/** The needs that bounds count, and the songs that may lie between them without being counted. */
export type Needs = {
  counted: Need[];
  /** Songs that may be passed through: those of uncounted needs, and of counted needs of two songs or more. */
  passing: number[];
  /** `first[b]` has bit a set where all songs of need a must be played before any of need b. */
  first: Int32Array;
};

function keyOf(model: Model, rules: OrderRules, song: number): string {
  const options = model.options[song]!.map(
    ({ guitar, neck, penalty }) => `${guitar}.${neck}.${penalty}`,
  ).sort();
  return `${options.join(" ")}|${model.cover[song]}|${rules.earliest[song]}-${rules.latest[song]}`;
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
 * Groups the songs into needs and picks those that are worth counting: at most `most`, those that others serve by the way
 * last, then those with the fewest options first.
 */
export function needsOf(model: Model, rules: OrderRules, most: number): Needs {
  const groups = new Map<string, number[]>();
  for (let song = 0; song < model.songs; song += 1) {
    const key = keyOf(model, rules, song);
    groups.set(key, [...(groups.get(key) ?? []), song]);
  }
  const needs = [...groups.values()].map(
    (songs): Need => ({ songs, options: model.options[songs[0]!]!, cover: model.cover[songs[0]!]! }),
  );
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
  const counted = needs.filter((_, i) => chosen.has(i));
  const passing = needs.flatMap((need, i) => (chosen.has(i) && need.songs.length === 1 ? [] : need.songs));
  const first = Int32Array.from(counted, (need) =>
    counted.reduce(
      (bits, other, i) =>
        other !== need && other.songs.every((a) => need.songs.every((b) => comesFirst(rules, a, b)))
          ? bits | (1 << i)
          : bits,
      0,
    ),
  );
  return { counted, passing, first };
}
