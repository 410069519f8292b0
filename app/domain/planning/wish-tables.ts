import type { Problem } from "#app/domain/planning/problem.ts";
import { curveAt } from "#app/domain/planning/wishes.ts";

/** A wish about runs: from how many songs in a row in one tuning on the next one costs, weighted. */
export type RunWish = { most: number; cost: number };

/** A wish about neighbours: the group of each song (-1: none), and what two of one group side by side cost, weighted. */
export type GroupWish = { groupOf: Int32Array; cost: number };

/** A wish about energy: the level of each song (NaN: none), the curve at each position, and what a step costs, weighted. */
export type EnergyWish = { levels: Float64Array; curve: Float64Array; cost: number };

/** The wishes of a problem as numbers; songs as the model numbers them. */
export type WishTables = {
  songs: number;
  runs: RunWish[];
  groups: GroupWish[];
  energies: EnergyWish[];
  /** Songs in a row in one tuning are counted up to this. */
  longest: number;
  /** The tuning of each neck: necks with the same open pitches have the same number. */
  tuning: Int32Array;
  /** What the energy wishes cost together, at `song × songs + position`. */
  energyAt: Float64Array;
};

/** The wishes as numbers; null where there are none that cost anything. */
export function wishTables(problem: Problem, necks: readonly { open: number[] }[]): WishTables | null {
  const weight = problem.aim.seconds + problem.aim.exposed;
  const wishes = (problem.wishes ?? []).filter(({ seconds }) => seconds * weight > 0);
  if (wishes.length === 0) return null;
  const songs = problem.order.length;
  const runs: RunWish[] = [];
  const groups: GroupWish[] = [];
  const energies: EnergyWish[] = [];
  for (const wish of wishes) {
    const cost = wish.seconds * weight;
    if (wish.kind === "run") runs.push({ most: wish.most, cost });
    if (wish.kind === "apart")
      groups.push({
        groupOf: Int32Array.from(problem.order, (id) => wish.groups.findIndex((group) => group.includes(id))),
        cost,
      });
    if (wish.kind === "energy")
      energies.push({
        levels: Float64Array.from(problem.order, (id) =>
          Object.hasOwn(wish.levels, id) ? wish.levels[id]! : Number.NaN,
        ),
        curve: Float64Array.from(problem.order, (_, position) => curveAt(wish.curve, position, songs)),
        cost,
      });
  }
  const tunings = new Map<string, number>();
  const tuning = Int32Array.from(necks, ({ open }) => {
    const known = tunings.get(open.join()) ?? tunings.size;
    tunings.set(open.join(), known);
    return known;
  });
  const energyAt = new Float64Array(songs * songs);
  for (const { levels, curve, cost } of energies)
    for (let song = 0; song < songs; song += 1)
      for (let position = 0; position < songs; position += 1)
        if (!Number.isNaN(levels[song]!))
          energyAt[song * songs + position]! += cost * Math.abs(levels[song]! - curve[position]!);
  return {
    songs,
    runs,
    groups,
    energies,
    longest: Math.max(0, ...runs.map(({ most }) => most)),
    tuning,
    energyAt,
  };
}

/**
 * What one more song costs in broken wishes, weighted.
 *
 * @param last the song before it, -1 where there is none or where no wish asks for it
 * @param row how many songs before it are in a row in its own tuning, counted up to `longest`
 */
export function wishCost(
  tables: WishTables,
  position: number,
  last: number,
  song: number,
  row: number,
): number {
  let cost = tables.energyAt[song * tables.songs + position]!;
  for (const { most, cost: each } of tables.runs) if (row >= most) cost += each;
  for (const { groupOf, cost: each } of tables.groups)
    if (last >= 0 && groupOf[last]! >= 0 && groupOf[last] === groupOf[song]) cost += each;
  return cost;
}

/** Whether two songs are the same to every wish. */
export function wishesAlike(tables: WishTables | null, a: number, b: number): boolean {
  if (!tables) return true;
  return (
    tables.groups.every(({ groupOf }) => groupOf[a] === groupOf[b]) &&
    tables.energies.every(({ levels }) => Object.is(levels[a], levels[b]))
  );
}

/** Whether a later song can break a wish by following this one. */
export function wishesAbout(tables: WishTables, song: number, isOpen: (song: number) => boolean): boolean {
  return tables.groups.some(({ groupOf }) => {
    if (groupOf[song] === -1) return false;
    for (let other = 0; other < groupOf.length; other += 1)
      if (other !== song && groupOf[other] === groupOf[song] && isOpen(other)) return true;
    return false;
  });
}
