import { freeAfterSong, freeCeiling, takeFree } from "#app/domain/planning/free-time.ts";
import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import { NOBODY, setLayout, startState } from "#app/domain/planning/set-layout.ts";
import { setStep } from "#app/domain/planning/set-step.ts";

/** Total of a plan: songs in order, and for each song number which of its options it takes. */
export type Score = (songs: Int32Array, ways: Int32Array) => number;

/**
 * The total that `evaluate` gives, without the list of gaps, for when very many plans are compared. `Infinity` where a kept
 * guitar is retuned; rules about the order are not looked at.
 *
 * @example scoreOf(model)(songs, ways) // equals evaluate(problem, order, plays).total
 */
export function scoreOf(model: Model): Score {
  if (model.capos || model.wishes) return scoreByStep(model);
  const { changes, cover, problem, tech, keeps } = model;
  const { aim, times } = problem;
  const size = changes.size;
  const most = Math.max(1, ...model.options.map((options) => options.length));
  const guitarOf = new Int32Array(model.songs * most);
  const neckOf = new Int32Array(model.songs * most);
  const penaltyOf = new Float64Array(model.songs * most);
  for (const [song, options] of model.options.entries()) {
    for (const [i, option] of options.entries()) {
      guitarOf[song * most + i] = option.guitar;
      neckOf[song * most + i] = option.neck;
      penaltyOf[song * most + i] = option.penalty;
    }
  }
  const necks = new Int32Array(model.guitars);
  const free = new Float64Array(model.mayBeLate ? model.guitars : 0);
  const ceiling = freeCeiling(model);
  const rests = (guitar: number) => necks[guitar] !== UNUSED;

  return (songs, ways) => {
    necks.set(model.start);
    free.fill(0);
    let total = 0;
    let current = NOBODY;
    for (let position = 0; position < songs.length; position += 1) {
      const song = songs[position]!;
      const way = song * most + ways[song]!;
      const guitar = guitarOf[way]!;
      const to = neckOf[way]!;
      const from = necks[guitar]!;
      const changing = position > 0 && guitar !== current;
      let onStage = changing ? times.swap : 0;
      total += penaltyOf[way]! + (changing ? aim.swaps : 0);
      if (from !== UNUSED && from !== to) {
        const cell = from * size + to;
        if (keeps[guitar]! === 1 && changes.retunes[cell]! === 1) return Number.POSITIVE_INFINITY;
        if (!tech || position > 0) {
          total += changes.counts[cell]!;
          const work = changes.seconds[cell]!;
          if (!tech || !changing) onStage += work;
          else if (model.mayBeLate) {
            if (work > free[guitar]!) onStage += work - free[guitar]!;
            takeFree(free, guitar, work);
          }
        }
      }
      const dead = onStage - cover[song]!;
      total += aim.seconds * onStage + (dead > 0 ? aim.exposed * dead : 0);
      necks[guitar] = to;
      current = guitar;
      if (model.mayBeLate) freeAfterSong(free, guitar, model.seconds[song]!, ceiling, rests);
    }
    return total;
  };
}

/** The same where capos are scarce or something is wished: by the steps that the search itself takes, one song at a time. */
function scoreByStep(model: Model): Score {
  const layout = setLayout(model);
  const step = setStep(model, layout);
  const start = startState(model, layout);
  let state = new Int32Array(layout.width);
  let next = new Int32Array(layout.width);
  return (songs, ways) => {
    state.set(start);
    let total = 0;
    for (let position = 0; position < songs.length; position += 1) {
      const song = songs[position]!;
      total += step(state, position, song, model.options[song]![ways[song]!]!, next);
      if (total === Number.POSITIVE_INFINITY) return total;
      [state, next] = [next, state];
    }
    return total;
  };
}
