import { type GuitarRows, guitarRows } from "#app/domain/planning/bounds/guitar-rows.ts";
import type { Needs } from "#app/domain/planning/bounds/needs.ts";
import type { Model, Option } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { stepCost } from "#app/domain/planning/step-cost.ts";

/**
 * For one guitar, the cheapest way to serve a set of needs from each row (see `guitarRows`): `inHand` where it was used for
 * the song before, `resting` where another guitar was. Looked up at `row × sets + set`, the set as bits of needs.
 */
export type PathTables = {
  rows: GuitarRows;
  sets: number;
  inHand: Float64Array;
  resting: Float64Array;
};

/** A need in one of its ways on this guitar: `row` of its neck, `after` the row it leaves, `song` where it is a linked one. */
type Target = { need: number; song: number; row: number; after: number; penalty: number };

/** Cheapest ways between rows that lead over passing songs only, entered in hand; the diagonal is 0. */
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

/** What one step on a guitar costs, at least, by rows: a tech is never late. */
function stepsOf(model: Model, guitar: number, { necks }: GuitarRows) {
  const step = (from: number, to: number, cover: number, changing: boolean) =>
    stepCost(model, guitar, necks[from]!, necks[to]!, cover, false, changing, Number.POSITIVE_INFINITY);
  /** Another guitar was used for the song before. */
  const returning = (from: number, to: number, cover: number) => step(from, to, cover, true);
  /** This guitar was used for the song before. */
  const staying = (from: number, to: number, cover: number) => step(from, to, cover, false);
  /**
   * The song before may have been on this guitar, or (with a tech, where that can be cheaper) on another in between;
   * without a tech a change of guitar only adds seconds.
   */
  const either = (from: number, to: number, cover: number) => {
    const stays = staying(from, to, cover);
    return model.tech && model.guitars > 1 ? Math.min(stays, returning(from, to, cover)) : stays;
  };
  return { returning, staying, either };
}

/**
 * The tables of one guitar.
 *
 * Why they bound: in any plan, each open need has a song that stands for it from here on: the one of the greatest cover,
 * or, if that has been played, any other. Take those that this guitar plays, in the plan's order. Between two of them lie
 * passing songs only, each at a cover of its own. The tables take the cheapest such chain, each need once, in any order that
 * the rules between whole needs allow; the plan's own chain is one of them, and costs no less.
 *
 * A linked song is a need of its own. If the song that leads straight into it was on this guitar, it comes at once from
 * there, in hand; if not, another guitar was played before it. And after a song that leads straight into another, any other
 * song on this guitar comes back to it from a song elsewhere.
 *
 * @param linked songs of chains, whole ones, that are followed link by link; each is a need of its own
 */
export function pathTables(
  model: Model,
  rules: OrderRules,
  needs: Needs,
  guitar: number,
  linked: ReadonlySet<number>,
): PathTables {
  const rows = guitarRows(model, rules, guitar, linked);
  const { returning, staying, either } = stepsOf(model, guitar, rows);
  const plain = rows.unused + 1;
  const elsewhere = (song: number) => model.options[song]!.some((option) => option.guitar !== guitar);
  const own = (options: readonly Option[]) => options.filter((option) => option.guitar === guitar);

  const passing = needs.passing.flatMap((song) =>
    own(model.options[song]!).map(({ neck, penalty }) => {
      return { row: rows.rowOfNeck.get(neck)!, cover: model.cover[song]!, penalty };
    }),
  );
  const overPassing = (from: number, to: number, step: typeof either) => {
    let least = Number.POSITIVE_INFINITY;
    for (const { row, cover, penalty } of passing)
      if (row === to) least = Math.min(least, step(from, to, cover) + penalty);
    return least;
  };
  const way = closure(plain, (from, to) => overPassing(from, to, either));
  const targets = needs.counted.flatMap(({ options, songs }, need) => {
    const song = linked.has(songs[0]!) ? songs[0]! : -1;
    return own(options).map(({ neck, penalty }): Target => {
      const row = rows.rowOfNeck.get(neck)!;
      return { need, song, row, after: song === -1 ? row : rows.rowAfter(song, neck), penalty };
    });
  });

  /** Cheapest ways from a row to all plain ones before the next need is served. */
  function entries(from: number, hand: boolean): number[] {
    return Array.from({ length: plain }, (_, to) => {
      if (hand) return way[from * plain + to]!;
      let least = Number.POSITIVE_INFINITY;
      for (let first = 0; first < rows.unused; first += 1)
        least = Math.min(least, overPassing(from, first, returning) + way[first * plain + to]!);
      return least;
    });
  }

  function service(from: number, hand: boolean, entry: number[], { need, song, row }: Target): number {
    const { cover } = needs.counted[need]!;
    const next = rows.boundTo[from]!;
    const before = song === -1 ? -1 : rules.previous[song]!;
    if (next !== -1 && next === song) return staying(from, row, cover);
    const impossible = (next !== -1 && !elsewhere(next)) || (before !== -1 && !elsewhere(before));
    if (impossible) return Number.POSITIVE_INFINITY;
    const last = before === -1 ? either : returning;
    let least = hand ? last(from, row, cover) : returning(from, row, cover);
    for (let via = 0; via < rows.unused; via += 1)
      least = Math.min(least, entry[via]! + last(via, row, cover));
    return least;
  }

  /** Cheapest service of each target from each row: straight, or over passing songs first. */
  const serve = (inHand: boolean) => {
    const cost = new Float64Array(rows.necks.length * targets.length);
    for (const [from, next] of rows.boundTo.entries()) {
      const hand = inHand && next === -1;
      const entry = entries(from, hand);
      for (const [t, target] of targets.entries())
        cost[from * targets.length + t] = service(from, hand, entry, target) + target.penalty;
    }
    return cost;
  };
  return { rows, ...fill(rows.necks.length, needs, targets, serve(true), serve(false)) };
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
    for (const [t, { need, after }] of targets.entries()) {
      if (((set >> need) & 1) === 0 || (needs.first[need]! & set) !== 0) continue;
      const rest = inHand[after * sets + (set & ~(1 << need))]!;
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
