import { needsOf } from "#app/domain/planning/bounds/needs.ts";
import { openNeedsOf } from "#app/domain/planning/bounds/open-needs.ts";
import { type PathTables, pathTables } from "#app/domain/planning/bounds/path-tables.ts";
import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { StateTable } from "#app/domain/planning/search/state-table.ts";
import type { SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";

/** Cheap tables are made in some milliseconds, dear ones in some hundred. */
export type TableSize = "cheap" | "dear";

/** How many needs are counted: their subsets are gone through for every guitar. */
function countedNeeds(guitars: number, size: TableSize): number {
  const dear = size === "dear";
  if (guitars === 1) return dear ? 16 : 12;
  if (guitars === 2) return dear ? 13 : 11;
  if (guitars === 3) return dear ? 11 : 9;
  if (guitars === 4) return dear ? 10 : 8;
  return dear ? 9 : 7;
}

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
  const needs = needsOf(model, rules, countedNeeds(model.guitars, size), apart);
  const tables = Array.from({ length: model.guitars }, (_, guitar) => pathTables(model, needs, guitar));
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
      places[guitar] = placeOf(tables[guitar]!, state[layout.necks + guitar]!);
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

function placeOf(table: PathTables, neck: number): number {
  return neck === UNUSED ? table.unusedPlace : table.places.get(neck)!;
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
