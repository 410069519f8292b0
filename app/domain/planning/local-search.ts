import type { NumberedPlan } from "#app/domain/planning/answer-of.ts";
import type { Model } from "#app/domain/planning/model.ts";
import { changeRun } from "#app/domain/planning/moves/change-run.ts";
import { changeWay, changeWayAndPlace } from "#app/domain/planning/moves/change-way.ts";
import type { Draft, Move } from "#app/domain/planning/moves/draft.ts";
import { moveAnother } from "#app/domain/planning/moves/move-another.ts";
import { moveBlock } from "#app/domain/planning/moves/move-block.ts";
import { swapSongs } from "#app/domain/planning/moves/swap-songs.ts";
import { turnBlock } from "#app/domain/planning/moves/turn-block.ts";
import { orderTest } from "#app/domain/planning/order-holds.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { scoreOf } from "#app/domain/planning/score.ts";
import { anneal, type Neighbourhood } from "#app/domain/planning/search/annealing.ts";
import { below, type Random } from "#app/domain/planning/search/random.ts";

const anyOrder: Move[] = [
  moveBlock,
  moveBlock,
  swapSongs,
  turnBlock,
  changeWay,
  changeRun,
  changeWayAndPlace,
];
const fewMoved: Move[] = [moveBlock, moveAnother, moveAnother, changeWay, changeWay, changeRun];

/** One plan and its neighbours: every change is scored whole, and dropped where it breaks a rule. */
function planNeighbourhood(model: Model, rules: OrderRules, plan: NumberedPlan) {
  const score = scoreOf(model);
  const { maxMoved } = model.problem;
  const holds = orderTest(rules, maxMoved);
  const moves = maxMoved !== null && maxMoved < model.songs - 1 ? fewMoved : anyOrder;
  const ways = new Int32Array(model.songs);
  for (const [i, song] of plan.songs.entries()) ways[song] = model.options[song]!.indexOf(plan.options[i]!);
  const now: Draft = { songs: Int32Array.from(plan.songs), ways, model, rules };
  const trial: Draft = { ...now, songs: now.songs.slice(), ways: now.ways.slice() };
  const best = { songs: now.songs.slice(), ways: now.ways.slice() };
  let proposed = Number.POSITIVE_INFINITY;
  const thing: Neighbourhood = {
    cost: score(now.songs, now.ways),
    propose(random) {
      trial.songs.set(now.songs);
      trial.ways.set(now.ways);
      const changed = moves[below(random, moves.length)]!(trial, random) && holds(trial.songs);
      proposed = changed ? score(trial.songs, trial.ways) : Number.POSITIVE_INFINITY;
      return proposed;
    },
    keep() {
      now.songs.set(trial.songs);
      now.ways.set(trial.ways);
      thing.cost = proposed;
    },
    remember() {
      best.songs.set(now.songs);
      best.ways.set(now.ways);
    },
  };
  const result = (): NumberedPlan => {
    const songs = [...best.songs];
    return { songs, options: songs.map((song) => model.options[song]![best.ways[song]!]!) };
  };
  return { thing, result };
}

/**
 * A plan at least as good as the given one, by trying small changes.
 *
 * @param steps changes to try
 * @param heat how readily changes for the worse are taken at first, as a share of what a gap costs on average
 */
export function improve(
  model: Model,
  rules: OrderRules,
  plan: NumberedPlan,
  { random, steps, heat }: { random: Random; steps: number; heat: number },
): NumberedPlan {
  if (model.songs < 2) return plan;
  const { thing, result } = planNeighbourhood(model, rules, plan);
  const hot = Math.max(1e-6, (thing.cost / model.songs) * heat);
  anneal(thing, { random, steps, hot, cold: hot / 300 });
  return result();
}
