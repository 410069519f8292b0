import type { NumberedPlan } from "#app/domain/planning/answer-of.ts";
import { fixedOrderBound } from "#app/domain/planning/bounds/fixed-order-bound.ts";
import { withoutRetuningKept } from "#app/domain/planning/kept-tunings.ts";
import { type Model, modelOf } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { beam } from "#app/domain/planning/search/beam.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import { type SetSpace, setSpace } from "#app/domain/planning/set-space.ts";

/** Rules that leave nothing but the order that the songs are numbered in. */
function rulesOfOrder(songs: number): OrderRules {
  const places = Int32Array.from({ length: songs }, (_, song) => song);
  return {
    earliest: places,
    latest: places,
    predecessors: Array.from({ length: songs }, () => []),
    next: new Int32Array(songs).fill(-1),
    previous: new Int32Array(songs).fill(-1),
    apart: Array.from({ length: songs }, () => []),
  };
}

/** The space of plans in the model's present order, with the bound that suits it. */
export function fixedOrderSpace(model: Model, rules: OrderRules): SetSpace {
  const plain = setSpace(model, rules, () => () => 0);
  const first = beam(plain, 20);
  const target = first.way?.cost ?? 0;
  return setSpace(model, rules, (layout) => fixedOrderBound(model, layout, target));
}

/**
 * Guitars and necks for an order that is given: the cheapest where `effort` suffices, else good ones.
 *
 * @param songs song numbers of the model in the order wanted
 * @param effort states to look at
 */
export function planInOrder(
  model: Model,
  songs: number[],
  effort: number,
): { plan: NumberedPlan | null; spent: number } {
  const { problem } = model;
  const order = songs.map((song) => problem.order[song]!);
  const fixed = withoutRetuningKept(modelOf({ ...problem, order, maxMoved: 0 }));
  const space = fixedOrderSpace(fixed, rulesOfOrder(model.songs));
  const run = new BestFirst(space, effort);
  run.run(effort);
  const moves = run.found?.moves ?? beam(space, 30).way?.moves;
  if (!moves) return { plan: null, spent: run.reached };
  const { options } = space.planOf(moves);
  const ways = options.map((option, i) => {
    const same = (other: typeof option) => other.guitar === option.guitar && other.choice === option.choice;
    return model.options[songs[i]!]!.find(same)!;
  });
  return { plan: { songs, options: ways }, spent: run.reached };
}
