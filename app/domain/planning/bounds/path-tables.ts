import type { Needs } from "#app/domain/planning/bounds/needs.ts";
import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import { stepCost } from "#app/domain/planning/step-cost.ts";

/**
 * For one guitar, the cheapest way to serve a set of needs from each neck: `inHand` where it was used for the song before,
 * `resting` where another guitar was. Looked up at `place × sets + set`, the set as bits of needs.
 */
export type PathTables = {
  /** Row of a neck in the tables, by neck number; `unusedPlace` where the guitar is still prepared freely. */
  places: Map<number, number>;
  unusedPlace: number;
  sets: number;
  inHand: Float64Array;
  resting: Float64Array;
};

type Target = { need: number; place: number; penalty: number };

/** Free seconds that leave nothing to do on stage. */
const ENOUGH = Number.POSITIVE_INFINITY;

/**
 * Cost of a step on one guitar, at least. In hand: the song before may have been on this guitar, or (with a tech, where
 * that can be cheaper) on another in between; without a tech a change of guitar only adds seconds. A tech is never late.
 */
function leastStep(
  model: Model,
  guitar: number,
  from: number,
  to: number,
  cover: number,
  inHand: boolean,
): number {
  const returning = stepCost(model, guitar, from, to, cover, false, true, ENOUGH);
  if (!inHand) return returning;
  const staying = stepCost(model, guitar, from, to, cover, false, false, ENOUGH);
  return model.tech && model.guitars > 1 ? Math.min(staying, returning) : staying;
}

/** Cheapest ways between necks that lead over passing songs only, entered in hand; the diagonal is 0. */
function closure(count: number, step: (from: number, to: number) => number): Float64Array {
  const way = new Float64Array(count * count);
  for (let x = 0; x < count; x += 1)
    for (let y = 0; y < count; y += 1) way[x * count + y] = x === y ? 0 : step(x, y);
  for (let via = 0; via < count; via += 1)
    for (let x = 0; x < count; x += 1)
      for (let y = 0; y < count; y += 1) {
        const length = way[x * count + via]! + way[via * count + y]!;
        if (length < way[x * count + y]!) way[x * count + y] = length;
      }
  return way;
}

/**
 * The tables of one guitar.
 *
 * Why they bound: in any plan, each open need has a song that stands for it from here on: the one of the greatest cover,
 * or, if that has been played, any other. Take those that this guitar plays, in the plan's order. Between two of them lie
 * passing songs only, each at a cover of its own. The tables take the cheapest such chain, each need once, in any order that
 * the rules between whole needs allow; the plan's own chain is one of them, and costs no less.
 */
export function pathTables(model: Model, needs: Needs, guitar: number): PathTables {
  const necks = [
    ...new Set(
      model.options.flatMap((options) => options.filter((o) => o.guitar === guitar).map(({ neck }) => neck)),
    ),
  ];
  const start = model.start[guitar]!;
  if (start !== UNUSED && !necks.includes(start)) necks.push(start);
  const places = new Map(necks.map((neck, place) => [neck, place]));
  const unusedPlace = necks.length;
  const rows = necks.length + 1;
  const neckAt = (place: number) => (place === unusedPlace ? UNUSED : necks[place]!);

  const passing = needs.passing.flatMap((song) =>
    model.options[song]!.filter((o) => o.guitar === guitar).map((o) => ({
      place: places.get(o.neck)!,
      cover: model.cover[song]!,
      penalty: o.penalty,
    })),
  );
  const overPassing = (from: number, to: number, inHand: boolean) =>
    Math.min(
      Number.POSITIVE_INFINITY,
      ...passing
        .filter(({ place }) => place === to)
        .map(
          ({ cover, penalty }) => leastStep(model, guitar, neckAt(from), neckAt(to), cover, inHand) + penalty,
        ),
    );
  const way = closure(rows, (from, to) => (to === unusedPlace ? ENOUGH : overPassing(from, to, true)));

  const targets = needs.counted.flatMap(({ options }, need) =>
    options
      .filter((o) => o.guitar === guitar)
      .map((o): Target => ({ need, place: places.get(o.neck)!, penalty: o.penalty })),
  );
  /** Cheapest service of a target from each place: straight, or over passing songs first. */
  const serve = (inHand: boolean) => {
    const cost = new Float64Array(rows * targets.length);
    for (let from = 0; from < rows; from += 1) {
      const entry = Array.from({ length: rows }, (_, via) => {
        if (inHand) return way[from * rows + via]!;
        let best = Number.POSITIVE_INFINITY;
        for (let z = 0; z < unusedPlace; z += 1)
          best = Math.min(best, overPassing(from, z, false) + way[z * rows + via]!);
        return best;
      });
      for (const [t, { need, place, penalty }] of targets.entries()) {
        const { cover } = needs.counted[need]!;
        let best = leastStep(model, guitar, neckAt(from), neckAt(place), cover, inHand);
        for (let via = 0; via < unusedPlace; via += 1)
          best = Math.min(
            best,
            entry[via]! + leastStep(model, guitar, neckAt(via), neckAt(place), cover, true),
          );
        cost[from * targets.length + t] = best + penalty;
      }
    }
    return cost;
  };
  return { places, unusedPlace, ...fill(rows, needs, targets, serve(true), serve(false)) };
}

/** Held and Karp's recursion, from small sets to large ones. */
function fill(
  rows: number,
  needs: Needs,
  targets: Target[],
  handCost: Float64Array,
  restCost: Float64Array,
): { sets: number; inHand: Float64Array; resting: Float64Array } {
  const sets = 1 << needs.counted.length;
  const inHand = new Float64Array(rows * sets).fill(Number.POSITIVE_INFINITY);
  const resting = new Float64Array(rows * sets).fill(Number.POSITIVE_INFINITY);
  for (let row = 0; row < rows; row += 1) {
    inHand[row * sets] = 0;
    resting[row * sets] = 0;
  }
  for (let set = 1; set < sets; set += 1) {
    for (const [t, { need, place }] of targets.entries()) {
      if (((set >> need) & 1) === 0 || (needs.first[need]! & set) !== 0) continue;
      const rest = inHand[place * sets + (set & ~(1 << need))]!;
      if (rest === Number.POSITIVE_INFINITY) continue;
      for (let row = 0; row < rows; row += 1) {
        const at = row * sets + set;
        const hand = handCost[row * targets.length + t]! + rest;
        if (hand < inHand[at]!) inHand[at] = hand;
        const fromRest = restCost[row * targets.length + t]! + rest;
        if (fromRest < resting[at]!) resting[at] = fromRest;
      }
    }
  }
  return { sets, inHand, resting };
}
