import type { Random } from "#app/domain/planning/search/random.ts";

/** Something that can be changed a little at a time. */
export type Neighbourhood = {
  /** Cost as it stands. */
  cost: number;
  /** Changes something and returns the cost it would have; `Infinity` where that is not allowed. */
  propose(random: Random): number;
  /** Takes the change. A proposal that is not taken is as if it had not been made. */
  keep(): void;
  /** Called after `keep` whenever the cost is the least so far. */
  remember(): void;
};

/**
 * Simulated annealing: takes every change for the better, and one for the worse with a chance that shrinks as it cools
 * from `hot` to `cold` (both in units of cost). The number of steps is all that decides how long it takes.
 */
export function anneal(
  thing: Neighbourhood,
  { random, steps, hot, cold }: { random: Random; steps: number; hot: number; cold: number },
): void {
  let least = thing.cost;
  let heat = hot;
  const cooling = (cold / hot) ** (1 / Math.max(1, steps));
  for (let step = 0; step < steps; step += 1, heat *= cooling) {
    const worse = thing.propose(random) - thing.cost;
    if (worse === Number.POSITIVE_INFINITY) continue;
    if (worse > 0 && random() >= Math.exp(-worse / heat)) continue;
    thing.keep();
    if (thing.cost < least) {
      least = thing.cost;
      thing.remember();
    }
  }
}
