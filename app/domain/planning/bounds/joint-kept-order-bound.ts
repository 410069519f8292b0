import { keptOrderWalk, walkSize } from "#app/domain/planning/bounds/joint-kept-order.ts";
import { jointOf, jointStates } from "#app/domain/planning/bounds/joint-states.ts";
import type { Model } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { raisePrices } from "#app/domain/planning/search/raise-prices.ts";
import { isPlayed, type SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";

const MOST_ROUNDS = 40;
const FEWEST_ROUNDS = 4;
const MOST_CELLS = 8_000_000;
/** More than the fewest rounds only within this many steps. */
const EASY_STEPS = 120_000_000;

/**
 * For a set of which only some songs may leave the present order: the present order is followed with all guitars together,
 * songs are skipped and others inserted, each song at a price for being skipped that it gets back for being inserted.
 *
 * Why it bounds: in a real plan every song that is skipped is inserted somewhere, so the prices cancel, whatever they are.
 * At a half-built set, songs that were passed over and are still to come only get theirs back, and songs that were played
 * ahead only pay, which is made up for. What is left of the plan is one of the walks: as many songs skipped and inserted as
 * may be at most, each in a place that the rules leave it, the same necks, the same guitar in hand, the same cover, and
 * a tech never late.
 *
 * @param target total of a known plan
 * @param steps what may be spent on it at most
 * @returns the bound and the steps spent; null where there are too many joint states for that
 */
export function jointKeptOrderBound(
  model: Model,
  rules: OrderRules,
  layout: SetLayout,
  { target, steps }: { target: number; steps: number },
): { bound: SetBound; spent: number } | null {
  const most = model.problem.maxMoved!;
  const { songs } = model;
  const joint = jointStates(model);
  if (!joint) return null;
  const size = walkSize(model, joint, most);
  if ((FEWEST_ROUNDS + 1) * size.steps > steps || size.cells > MOST_CELLS) return null;
  const affordable = Math.floor(Math.min(steps, EASY_STEPS) / size.steps) - 1;
  const rounds = Math.max(FEWEST_ROUNDS, Math.min(MOST_ROUNDS, affordable));
  const { least, cell, sweep, relax } = keptOrderWalk(model, rules, joint, most);
  const prices = raisePrices(new Float64Array(songs), relax, { target, rounds, free: songs });
  sweep(prices);

  const bound: SetBound = (state, depth) => {
    if (depth === 0 || depth === songs) return 0;
    const followed = state[layout.kept]!;
    const mayMove = most - state[layout.moved]!;
    let value = 0;
    let toInsert = mayMove;
    let toSkip = mayMove;
    for (let song = 0; song < songs; song += 1) {
      const played = isPlayed(layout, state, song);
      if (song < followed && !played) {
        toInsert += 1;
        value += prices[song]!;
      }
      if (song >= followed && played) {
        toSkip += 1;
        value -= prices[song]!;
      }
    }
    const at = jointOf(joint, (guitar) => state[layout.necks + guitar]!, state[layout.current]!);
    return Math.max(0, value + least[cell(followed, most - toInsert, most - toSkip) + at]!);
  };
  return { bound, spent: (rounds + 1) * size.steps };
}
