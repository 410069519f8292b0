import type { GuitarRows } from "#app/domain/planning/bounds/guitar-rows.ts";
import { needsOf } from "#app/domain/planning/bounds/needs.ts";
import { openNeedsOf } from "#app/domain/planning/bounds/open-needs.ts";
import { pathTables } from "#app/domain/planning/bounds/path-tables.ts";
import { sharing } from "#app/domain/planning/bounds/share-out.ts";
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
  close: [16, 14, 13, 12, 9],
};
/** Share of the needs that may be songs of chains. */
const LINKED = 0.6;

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
  const openNeeds = openNeedsOf(
    needs.counted.map(({ songs }) => songs),
    layout,
  );
  const places = new Int32Array(model.guitars);
  const share = sharing(tables);
  const valueKey = new Int32Array(model.guitars + 2);
  const known = new StateTable(model.guitars + 2);
  let values = new Float64Array(1024);

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
    const value = share(places, current, open);
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
