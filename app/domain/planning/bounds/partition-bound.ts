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
  if (guitars <= 4) return dear ? 11 : 9;
  return dear ? 9 : 7;
}

const MOST_FOLDS_MEMORY = 4_000_000;

/**
 * The needs that are still open are shared out among the guitars, each serves its own by the cheapest way: the least sum
 * over all ways of sharing them out.
 *
 * Why it bounds: every open need is served by some guitar; what the steps of different guitars cost never overlaps, since
 * each gap belongs to the song that it leads into. See `pathTables` for one guitar's part.
 */
export function partitionBound(
  model: Model,
  rules: OrderRules,
  layout: SetLayout,
  size: TableSize,
): SetBound {
  const needs = needsOf(model, rules, countedNeeds(model.guitars, size));
  const tables = Array.from({ length: model.guitars }, (_, guitar) => pathTables(model, needs, guitar));
  const sets = 1 << needs.counted.length;
  const openNeeds = openNeedsOf(
    needs.counted.map(({ songs }) => songs),
    layout,
  );
  const places = new Int32Array(model.guitars);
  const othersKey = new Int32Array(model.guitars);
  const folds = new StateTable(model.guitars);
  let folded: Float64Array[] = [];
  const valueKey = new Int32Array(model.guitars + 2);
  const known = new StateTable(model.guitars + 2);
  let values = new Float64Array(1024);

  /** Cheapest service of every set of needs by all guitars but one, which all rest. */
  function others(current: number): Float64Array {
    for (let guitar = 0; guitar < model.guitars; guitar += 1)
      othersKey[guitar] = guitar === current ? -1 : places[guitar]!;
    const number = folds.find(othersKey);
    if (number !== -1) return folded[number]!;
    let sum: Float64Array | null = null;
    for (let guitar = 0; guitar < model.guitars; guitar += 1) {
      if (guitar === current) continue;
      const table = tables[guitar]!;
      const own = table.resting.subarray(places[guitar]! * sets, (places[guitar]! + 1) * sets);
      sum = sum ? shareOut(sum, own) : own;
    }
    const made = sum ?? new Float64Array(sets).fill(Number.POSITIVE_INFINITY);
    if (!sum) made[0] = 0;
    if ((folded.length + 1) * sets > MOST_FOLDS_MEMORY) {
      folds.clear();
      folded = [];
    }
    folds.add(othersKey);
    folded.push(made);
    return made;
  }

  function leastSum(open: number, hand: Float64Array, base: number, rest: Float64Array): number {
    let least = Number.POSITIVE_INFINITY;
    for (let own = open; ; own = (own - 1) & open) {
      const sum = hand[base + own]! + rest[open ^ own]!;
      if (sum < least) least = sum;
      if (own === 0) return least;
    }
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
    const value = leastSum(open, tables[current]!.inHand, places[current]! * sets, others(current));
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
