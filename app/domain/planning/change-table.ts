import type { Neck } from "#app/domain/music/neck.ts";
import { changeSeconds, neckChange, semitonesOf } from "#app/domain/planning/change.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/**
 * Every change between two necks, looked up at `from × size + to`: seconds of work, the weighted total of its strings,
 * semitones and capo actions (`counts`), and whether a string is retuned.
 */
export type ChangeTable = {
  size: number;
  seconds: Float64Array;
  counts: Float64Array;
  retunes: Uint8Array;
};

/** Necks with different numbers of strings never meet on one guitar; their cells stay 0. */
export function changeTable({ times, aim }: Problem, necks: Neck[]): ChangeTable {
  const size = necks.length;
  const table: ChangeTable = {
    size,
    seconds: new Float64Array(size * size),
    counts: new Float64Array(size * size),
    retunes: new Uint8Array(size * size),
  };
  for (const [x, from] of necks.entries()) {
    for (const [y, to] of necks.entries()) {
      if (x === y || from.open.length !== to.open.length) continue;
      const cell = x * size + y;
      const change = neckChange(from, to);
      table.seconds[cell] = changeSeconds(times, change);
      table.counts[cell] =
        aim.strings * change.strings.length +
        aim.semitones * semitonesOf(change) +
        aim.capoActions * change.capos.length;
      table.retunes[cell] = change.strings.length > 0 ? 1 : 0;
    }
  }
  return table;
}
