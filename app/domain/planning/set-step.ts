import { capoStep } from "#app/domain/planning/capo-step.ts";
import { freeAfterSong, freeCeiling, takeFree } from "#app/domain/planning/free-time.ts";
import { type Model, type Option, UNUSED } from "#app/domain/planning/model.ts";
import { markPlayed, NOBODY, readFree, type SetLayout, writeFree } from "#app/domain/planning/set-layout.ts";
import { stepCost } from "#app/domain/planning/step-cost.ts";
import { wishCost } from "#app/domain/planning/wish-tables.ts";

/**
 * Plays one more song in one of its ways: what that costs of the total. `child` becomes the state after it, but for what the
 * order alone decides. `Infinity` where a kept guitar would be retuned; `child` then holds nothing of use.
 */
export type SetStep = (
  state: Int32Array,
  depth: number,
  song: number,
  option: Option,
  child: Int32Array,
) => number;

/** The step that a model's sets are made of. */
export function setStep(model: Model, layout: SetLayout): SetStep {
  const { changes, wishes } = model;
  const ceiling = freeCeiling(model);
  const free = new Float64Array(layout.freeCount);
  const handOut = capoStep(model, layout);
  const { capoOff, capoOn } = model.problem.times;

  /** Songs in a row in the tuning of `neck` when the next song comes. */
  function rowBefore(state: Int32Array, neck: number): number {
    const current = state[layout.current]!;
    if (current === NOBODY) return 0;
    const tuning = wishes!.tuning;
    return tuning[state[layout.necks + current]!] === tuning[neck] ? state[layout.row]! : 0;
  }

  return (state, depth, song, option, child) => {
    const { guitar, neck } = option;
    const changing = state[layout.current] !== guitar;
    child.set(state);
    let from = state[layout.necks + guitar]!;
    let taken = 0;
    let fromHand = 0;
    if (handOut) ({ from, taken, fromHand } = handOut(child, guitar, neck));
    if (layout.freeCount > 0) readFree(layout, state, free);
    const idle = layout.freeCount > 0 ? free[guitar]! : Number.POSITIVE_INFINITY;
    let cost = stepCost(
      model,
      guitar,
      from,
      neck,
      model.cover[song]!,
      depth === 0,
      changing,
      idle,
      taken,
      fromHand,
    );
    if (cost === Number.POSITIVE_INFINITY) return cost;
    markPlayed(layout, child, song);
    child[layout.necks + guitar] = neck;
    child[layout.current] = guitar;
    if (wishes) {
      const row = layout.rowCount > 0 ? rowBefore(state, neck) : 0;
      cost += wishCost(wishes, depth, state[layout.last]!, song, row);
      if (layout.rowCount > 0) child[layout.row] = Math.min(row + 1, wishes.longest);
    }
    child[layout.last] = song;
    if (layout.freeCount > 0) {
      if (from !== UNUSED && depth > 0 && changing) {
        const job = changes.seconds[from * changes.size + neck]! + taken * capoOff;
        takeFree(free, guitar, job - fromHand * (capoOff + capoOn));
      }
      const rests = (other: number) => handOut !== null || child[layout.necks + other] !== UNUSED;
      freeAfterSong(free, guitar, model.seconds[song]!, ceiling, rests);
      writeFree(layout, child, free);
    }
    return cost + option.penalty;
  };
}
