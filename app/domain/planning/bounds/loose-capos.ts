import { wishBound } from "#app/domain/planning/bounds/wish-bound.ts";
import { lessAndLess } from "#app/domain/planning/capo-tables.ts";
import type { ChangeTable } from "#app/domain/planning/change-table.ts";
import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import { type SetLayout, setLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";

type MakeBound = (model: Model, layout: SetLayout) => SetBound;

/** Changes as cheap as they could be if capos were taken off a resting guitar first, by anybody and for nothing. */
function withCaposGone({ changes, capos }: Model): ChangeTable {
  if (!capos) return changes;
  const size = capos.whole;
  const loose: ChangeTable = {
    size,
    seconds: new Float64Array(size * size),
    counts: new Float64Array(size * size),
    retunes: new Uint8Array(size * size),
  };
  for (let x = 0; x < size; x += 1) {
    const left = lessAndLess(capos, x);
    for (let y = 0; y < size; y += 1) {
      const cells = left.map((from) => from * changes.size + y);
      loose.seconds[x * size + y] = Math.min(...cells.map((cell) => changes.seconds[cell]!));
      loose.counts[x * size + y] = Math.min(...cells.map((cell) => changes.counts[cell]!));
      loose.retunes[x * size + y] = changes.retunes[x * changes.size + y]!;
    }
  }
  return loose;
}

/** For each guitar and each neck that it may be found with: one that it was left with, of which this is what remains. */
function leftWith(model: Model, width: number): Int32Array {
  const { capos, options, start } = model;
  const table = Int32Array.from({ length: model.guitars * width }, (_, cell) => cell % width);
  for (let guitar = 0; guitar < model.guitars; guitar += 1) {
    const own = options.flat().flatMap((option) => (option.guitar === guitar ? [option.neck] : []));
    const whole = start[guitar] === UNUSED ? own : [...own, start[guitar]!];
    for (const neck of new Set(whole))
      for (const less of lessAndLess(capos!, neck))
        if (!whole.includes(less)) table[guitar * width + less] = neck;
  }
  return table;
}

/**
 * Makes a bound that knows nothing of scarce capos and of wishes one for a model that has both.
 *
 * Why it bounds: where a guitar is found without a capo that was taken, the change costs at least what it would if any of
 * its capos could be taken off for nothing, which is what the bound is given; taking them costs something on top. A guitar
 * found with fewer capos than it was left with counts as left with all of them, which makes no change dearer, since what
 * can be taken from fewer can be taken from all. Broken wishes cost seconds of their own, so what they cost at least is
 * added.
 */
export function overLooseCapos(model: Model, make: MakeBound): (layout: SetLayout) => SetBound {
  const { capos, wishes } = model;
  if (!capos && !wishes) return (layout) => make(model, layout);
  const plain: Model = { ...model, changes: withCaposGone(model), capos: null, wishes: null };
  const plainLayout = setLayout(plain);
  const bound = make(plain, plainLayout);
  const width = model.necks.length;
  const table = capos ? leftWith(model, width) : null;
  const bare = new Int32Array(plainLayout.width);
  return (layout) => {
    const wished = wishes ? wishBound(model, wishes, layout) : null;
    return (state, depth) => {
      for (let i = 0; i < bare.length; i += 1) bare[i] = state[i]!;
      if (table)
        for (let guitar = 0; guitar < model.guitars; guitar += 1) {
          const neck = bare[plainLayout.necks + guitar]!;
          if (neck !== UNUSED) bare[plainLayout.necks + guitar] = table[guitar * width + neck]!;
        }
      const least = bound(bare, depth);
      return wished ? least + wished(state, depth) : least;
    };
  };
}
