import type { GuitarRows } from "#app/domain/planning/bounds/guitar-rows.ts";
import { needsOf } from "#app/domain/planning/bounds/needs.ts";
import { openNeedsOf } from "#app/domain/planning/bounds/open-needs.ts";
import { pathTables } from "#app/domain/planning/bounds/path-tables.ts";
import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { StateTable } from "#app/domain/planning/search/state-table.ts";
import { NOBODY, type SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";

/**
 * Cheap tables are made in some milliseconds, dear ones in some hundred. Close ones follow chains link by link and count
 * more needs, and take long to look things up in.
 */
export type TableSize = "cheap" | "dear" | "close";

/** How many needs are counted, by the number of guitars: their subsets are gone through for every guitar. */
const COUNTED: Record<TableSize, number[]> = {
  cheap: [12, 11, 9, 8, 7],
  dear: [16, 13, 11, 10, 9],
  close: [16, 14, 12, 11, 9],
};
/** Share of the needs that may be songs of chains. */
const LINKED = 0.6;

const MOST_FOLDED_CELLS = 6_000_000;
const MOST_VALUES = 1_000_000;

/**
 * The needs that are still open are shared out among the guitars, each serves its own by the cheapest way: the least sum
 * over all ways of sharing them out.
 *
 * Why it bounds: every open need is served by some guitar; what the steps of different guitars cost never overlaps, since
 * each gap belongs to the song that it leads into. See `pathTables` for one guitar's part.
 *
 * @param apart songs that come after all others and are left out
 */
export function partitionBound(
  model: Model,
  rules: OrderRules,
  layout: SetLayout,
  size: TableSize,
  apart = new Set<number>(),
): SetBound {
  const most = COUNTED[size][Math.min(model.guitars, COUNTED[size].length) - 1]!;
  const linked = new Set(size === "close" ? linkedSongs(rules, apart, Math.floor(most * LINKED)) : []);
  const needs = needsOf(model, rules, most, apart, linked);
  const tables = Array.from({ length: model.guitars }, (_, guitar) =>
    pathTables(model, rules, needs, guitar, linked),
  );
  const sets = 1 << needs.counted.length;
  const openNeeds = openNeedsOf(
    needs.counted.map(({ songs }) => songs),
    layout,
  );
  const places = new Int32Array(model.guitars);
  const othersKey = new Int32Array(model.guitars + 1);
  const folds = new StateTable(model.guitars + 1);
  let folded: Float64Array[] = [];
  let foldedCells = 0;
  const valueKey = new Int32Array(model.guitars + 2);
  const known = new StateTable(model.guitars + 2);
  let values = new Float64Array(1024);

  /** A resting guitar's row of its table, for the subsets of `open` alone, smallest first. */
  function restingRow(guitar: number, open: number): Float64Array {
    const { resting } = tables[guitar]!;
    const base = places[guitar]! * sets;
    const row = new Float64Array(1 << bitCount(open));
    for (let part = open, i = row.length - 1; i >= 0; part = (part - 1) & open, i -= 1)
      row[i] = resting[base + part]!;
    return row;
  }

  /** Cheapest service of each subset of the open needs by all guitars but one, which all rest. */
  function others(current: number, open: number): Float64Array {
    for (let guitar = 0; guitar < model.guitars; guitar += 1)
      othersKey[guitar] = guitar === current ? -1 : places[guitar]!;
    othersKey[model.guitars] = open;
    const number = folds.find(othersKey);
    if (number !== -1) return folded[number]!;
    let sum: Float64Array = new Float64Array(1 << bitCount(open)).fill(Number.POSITIVE_INFINITY);
    sum[0] = 0;
    let alone = true;
    for (let guitar = 0; guitar < model.guitars; guitar += 1) {
      if (guitar === current) continue;
      const row = restingRow(guitar, open);
      sum = alone ? row : shareOut(sum, row);
      alone = false;
    }
    if (foldedCells + sum.length > MOST_FOLDED_CELLS) {
      folds.clear();
      folded = [];
      foldedCells = 0;
    }
    folds.add(othersKey);
    folded.push(sum);
    foldedCells += sum.length;
    return sum;
  }

  /** The guitar in hand takes some of the open needs, the others take the rest. */
  function leastSum(open: number, hand: Float64Array, base: number, rest: Float64Array): number {
    let least = Number.POSITIVE_INFINITY;
    for (let own = open, left = 0; left < rest.length; own = (own - 1) & open, left += 1) {
      const sum = hand[base + own]! + rest[left]!;
      if (sum < least) least = sum;
    }
    return least;
  }

  return (state, depth) => {
    const current = state[layout.current]!;
    if (depth === 0 || depth === model.songs) return 0;
    const open = openNeeds(state);
    if (open === 0) return 0;
    for (let guitar = 0; guitar < model.guitars; guitar += 1)
      places[guitar] = rowOf(tables[guitar]!.rows, state[layout.necks + guitar]!);
    const last = state[layout.last]!;
    if (last !== NOBODY && linked.has(last))
      places[current] = tables[current]!.rows.rowAfter(last, state[layout.necks + current]!);
    valueKey.set(places);
    valueKey[model.guitars] = current;
    valueKey[model.guitars + 1] = open;
    const number = known.find(valueKey);
    if (number !== -1) return values[number]!;
    const value = leastSum(open, tables[current]!.inHand, places[current]! * sets, others(current, open));
    if (known.count === MOST_VALUES) known.clear();
    if (known.count === values.length) {
      const larger = new Float64Array(values.length * 2);
      larger.set(values);
      values = larger;
    }
    values[known.add(valueKey)] = value;
    return value;
  };
}

/** Songs of whole chains, as many as there is room for. */
function linkedSongs({ next, previous }: OrderRules, apart: Set<number>, room: number): number[] {
  const linked: number[] = [];
  for (const [song, before] of previous.entries()) {
    if (before !== -1 || next[song] === -1) continue;
    const chain: number[] = [];
    for (let at = song; at !== -1; at = next[at]!) chain.push(at);
    if (linked.length + chain.length <= room && !chain.some((one) => apart.has(one))) linked.push(...chain);
  }
  return linked;
}

function rowOf({ unused, rowOfNeck }: GuitarRows, neck: number): number {
  return neck === UNUSED ? unused : rowOfNeck.get(neck)!;
}

function bitCount(bits: number): number {
  let count = 0;
  for (let left = bits; left !== 0; left &= left - 1) count += 1;
  return count;
}

/** Cheapest sum over all ways to split each set in two. */
function shareOut(a: Float64Array, b: Float64Array): Float64Array {
  const made = new Float64Array(a.length);
  for (let set = 0; set < a.length; set += 1) {
    let least = Number.POSITIVE_INFINITY;
    for (let part = set; ; part = (part - 1) & set) {
      const sum = a[part]! + b[set ^ part]!;
      if (sum < least) least = sum;
      if (part === 0) break;
    }
    made[set] = least;
  }
  return made;
}
