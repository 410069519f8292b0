import type { NumberedPlan } from "#app/domain/planning/answer-of.ts";
import { fixedOrderBound } from "#app/domain/planning/bounds/fixed-order-bound.ts";
import { overLooseCapos } from "#app/domain/planning/bounds/loose-capos.ts";
import { withoutRetuningKept } from "#app/domain/planning/kept-tunings.ts";
import { type Model, modelOf, type Option } from "#app/domain/planning/model.ts";
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
  return setSpace(
    model,
    rules,
    overLooseCapos(model, (plain, layout) => fixedOrderBound(plain, layout, target)),
  );
}

/**
 * The space of plans in some other order. It has a model of its own, in which that order is the present one; its plans are
 * told in the numbers of the model given.
 *
 * @param songs song numbers of the model in the order wanted
 */
export function spaceInOrder(model: Model, songs: number[]): SetSpace {
  const { problem } = model;
  const order = songs.map((song) => problem.order[song]!);
  const fixed = withoutRetuningKept(modelOf({ ...problem, order, maxMoved: 0 }));
  const space = fixedOrderSpace(fixed, rulesOfOrder(model.songs));
  const planOf = (moves: number[]): NumberedPlan => {
    const options = space.planOf(moves).options.map((option, i) => {
      const same = (other: Option) => other.guitar === option.guitar && other.choice === option.choice;
      return model.options[songs[i]!]!.find(same)!;
    });
    return { songs, options };
  };
  return { ...space, planOf };
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
  const space = spaceInOrder(model, songs);
  const run = new BestFirst(space, effort);
  run.run(effort);
  const moves = run.found?.moves ?? beam(space, 30).way?.moves;
  return { plan: moves ? space.planOf(moves) : null, spent: run.reached };
}

/** The one order that the windows of the rules leave, in song numbers; null where they leave more. */
export function onlyOrder({ earliest, latest }: OrderRules): number[] | null {
  const songs = new Array<number>(earliest.length).fill(-1);
  for (const [song, position] of earliest.entries()) {
    if (position !== latest[song] || songs[position] !== -1) return null;
    songs[position] = song;
  }
  return songs;
}
