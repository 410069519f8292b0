import type { PathTables } from "#app/domain/planning/bounds/path-tables.ts";
import { StateTable } from "#app/domain/planning/search/state-table.ts";

const MOST_CELLS = 6_000_000;

/** Cheapest sum over all ways to split each set in two. */
function splitting(a: Float64Array, b: Float64Array): Float64Array {
  const made = new Float64Array(a.length);
  for (let set = 0; set < a.length; set += 1) {
    let least = a[0]! + b[set]!;
    for (let part = set; part !== 0; part = (part - 1) & set) {
      const sum = a[part]! + b[set ^ part]!;
      if (sum < least) least = sum;
    }
    made[set] = least;
  }
  return made;
}

/**
 * Shares needs out among guitars: the least sum over all ways to do so, each guitar serving its own by the cheapest way in
 * its table. Guitars are put together in two groups, whose sums for all sets of needs are kept by where the guitars stand.
 *
 * @returns for the row of each guitar, the guitar in hand and a set of needs as bits: the least sum
 */
export function sharing(
  tables: readonly PathTables[],
): (places: Int32Array, current: number, open: number) => number {
  const guitars = tables.length;
  const rows = tables.map(({ sets, inHand, resting, rows: { necks } }) =>
    [resting, inHand].map((table) => necks.map((_, row) => table.subarray(row * sets, (row + 1) * sets))),
  );
  const groups = tables.map((_, current) => {
    const others = tables.flatMap((_, guitar) => (guitar === current ? [] : [guitar]));
    const half = Math.ceil(guitars / 2) - 1;
    return { own: [current, ...others.slice(0, half)], rest: others.slice(half) };
  });
  const key = new Int32Array(guitars + 1);
  const known = new StateTable(guitars + 1);
  let made: Float64Array[] = [];
  let cells = 0;

  function keyFor(group: readonly number[], places: Int32Array, current: number): void {
    key.fill(-1);
    for (const guitar of group) key[guitar] = places[guitar]!;
    if (group[0] === current) key[guitars] = current;
  }

  /** What each set of needs costs a group at least. */
  function sums(group: readonly number[], places: Int32Array, current: number): Float64Array {
    if (group.length === 1) return rows[group[0]!]![group[0] === current ? 1 : 0]![places[group[0]!]!]!;
    keyFor(group, places, current);
    const number = known.find(key);
    if (number !== -1) return made[number]!;
    const half = Math.ceil(group.length / 2);
    const sum = splitting(
      sums(group.slice(0, half), places, current),
      sums(group.slice(half), places, current),
    );
    if (cells + sum.length > MOST_CELLS) {
      known.clear();
      made = [];
      cells = 0;
    }
    keyFor(group, places, current);
    known.add(key);
    made.push(sum);
    cells += sum.length;
    return sum;
  }

  return (places, current, open) => {
    const { own, rest } = groups[current]!;
    const mine = sums(own, places, current);
    if (rest.length === 0) return mine[open]!;
    const theirs = sums(rest, places, current);
    let least = mine[0]! + theirs[open]!;
    for (let part = open; part !== 0; part = (part - 1) & open) {
      const sum = mine[part]! + theirs[open ^ part]!;
      if (sum < least) least = sum;
    }
    return least;
  };
}
