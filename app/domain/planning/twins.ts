import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import type { SetLayout } from "#app/domain/planning/set-layout.ts";
import { wishesAlike } from "#app/domain/planning/wish-tables.ts";

const optionsKey = (model: Model, song: number) =>
  model.options[song]!.map(({ guitar, neck, penalty }) => `${guitar}.${neck}.${penalty}`)
    .sort()
    .join(" ");

/**
 * Songs that can change places in any order without changing its cost: same options, cover, section, and (where a tech
 * may be late) length, alike to every wish, and no rule names them. Each is listed with the twin that may as well be played before it.
 * Only where any number of songs may move: else their places in the present order tell them apart.
 *
 * @returns for each song the twin to be played first, or -1
 */
export function elderTwins(model: Model, rules: OrderRules): Int32Array {
  const elder = new Int32Array(model.songs).fill(-1);
  const named = new Set<number>();
  for (let song = 0; song < model.songs; song += 1) {
    for (const other of rules.predecessors[song]!) named.add(other).add(song);
    if (rules.apart[song]!.length > 0 || rules.earliest[song] === rules.latest[song]) named.add(song);
  }
  const latest = new Map<string, number[]>();
  for (let song = 0; song < model.songs; song += 1) {
    if (named.has(song)) continue;
    const window = `${rules.earliest[song]}-${rules.latest[song]}`;
    const length = model.mayBeLate ? model.seconds[song] : "";
    const key = `${window}|${model.cover[song]}|${length}|${optionsKey(model, song)}`;
    const alike = latest.get(key)?.findLast((other) => wishesAlike(model.wishes, song, other));
    elder[song] = alike ?? -1;
    latest.set(key, [...(latest.get(key) ?? []), song]);
  }
  return elder;
}

/**
 * Guitars that can change places in any plan without changing its cost: every song may be played on both in the same
 * ways, both are prepared freely, and both keep their tuning or neither does. Not where it matters which of them was laid
 * aside first: that tells them apart.
 *
 * @returns groups of two or more guitars
 */
export function twinGuitars(model: Model): number[][] {
  const groups = new Map<string, number[]>();
  if (model.capos?.ordered) return [];
  for (let guitar = 0; guitar < model.guitars; guitar += 1) {
    if (model.start[guitar] !== UNUSED) continue;
    const ways = model.options.map((options) =>
      options
        .filter((option) => option.guitar === guitar)
        .map(({ neck, penalty }) => `${neck}.${penalty}`)
        .sort()
        .join(" "),
    );
    const key = `${model.keeps[guitar]}|${ways.join("|")}`;
    groups.set(key, [...(groups.get(key) ?? []), guitar]);
  }
  return [...groups.values()].filter((group) => group.length > 1);
}

/** Whether slot `a` of a state should stand after slot `b`: by neck, then by free seconds, the guitar in hand last. */
function standsAfter(state: Int32Array, layout: SetLayout, a: number, b: number): boolean {
  const byNeck = state[layout.necks + a]! - state[layout.necks + b]!;
  if (byNeck !== 0) return byNeck > 0;
  for (let word = 0; word < 2 && layout.freeCount > 0; word += 1) {
    const byFree = state[layout.free + a * 2 + word]! - state[layout.free + b * 2 + word]!;
    if (byFree !== 0) return byFree > 0;
  }
  return state[layout.current] === a;
}

function swapWords(state: Int32Array, a: number, b: number): void {
  const kept = state[a]!;
  state[a] = state[b]!;
  state[b] = kept;
}

/**
 * Puts twin guitars into one fixed order of slots, so that states that differ only in which twin is which become equal.
 *
 * @param owner if given, follows which guitar stands in which slot
 */
export function sortTwins(state: Int32Array, layout: SetLayout, group: number[], owner?: Int32Array): void {
  for (let i = 1; i < group.length; i += 1) {
    for (let k = i; k > 0 && standsAfter(state, layout, group[k - 1]!, group[k]!); k -= 1) {
      const a = group[k - 1]!;
      const b = group[k]!;
      swapWords(state, layout.necks + a, layout.necks + b);
      for (let word = 0; word < 2 && layout.freeCount > 0; word += 1)
        swapWords(state, layout.free + a * 2 + word, layout.free + b * 2 + word);
      if (state[layout.current] === a) state[layout.current] = b;
      else if (state[layout.current] === b) state[layout.current] = a;
      if (owner) swapWords(owner, a, b);
    }
  }
}
