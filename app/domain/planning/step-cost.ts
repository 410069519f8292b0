import { type Model, UNUSED } from "#app/domain/planning/model.ts";

/**
 * What a gap costs of the total: its seconds, and what of them is longer than its cover.
 *
 * @example gapCost(model, 21, 12) // aim.seconds × 21 + aim.exposed × 9
 */
export function gapCost({ problem: { aim } }: Model, seconds: number, cover: number): number {
  return aim.seconds * seconds + (seconds > cover ? aim.exposed * (seconds - cover) : 0);
}

/**
 * Weighted cost of one step of a set: the gap into a song and the change of its guitar's neck, without the penalty of the
 * choice. `Infinity` where a kept guitar would be retuned.
 *
 * @param first whether the song opens the set
 * @param changing whether the song before was on another guitar
 * @param from neck of the guitar so far, `UNUSED` where it is prepared freely
 * @param free seconds a tech has free for this guitar since it was laid aside (nothing counts them otherwise)
 * @param taken capos that other guitars give for this change
 * @param fromHand how many of them the guitar in hand gives: nobody can take those before the gap
 */
export function stepCost(
  model: Model,
  guitar: number,
  from: number,
  to: number,
  cover: number,
  first: boolean,
  changing: boolean,
  free: number,
  taken = 0,
  fromHand = 0,
): number {
  const { changes, problem, tech } = model;
  let work = 0;
  let counts = 0;
  if (from !== UNUSED && from !== to) {
    const cell = from * changes.size + to;
    if (model.keeps[guitar] && changes.retunes[cell]) return Number.POSITIVE_INFINITY;
    if (first && tech) return 0;
    counts = changes.counts[cell]!;
    work = changes.seconds[cell]!;
    if (taken > 0) {
      counts += taken * problem.aim.capoActions;
      work += taken * problem.times.capoOff;
    }
    if (tech && changing) {
      const waits = fromHand > 0 ? fromHand * (problem.times.capoOff + problem.times.capoOn) : 0;
      work = waits + (work - waits > free ? work - waits - free : 0);
    }
  }
  if (first) return gapCost(model, work, cover) + counts;
  if (!changing) return gapCost(model, work, cover) + counts;
  return gapCost(model, problem.times.swap + work, cover) + counts + problem.aim.swaps;
}
