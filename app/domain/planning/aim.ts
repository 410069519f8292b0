import type { Totals } from "#app/domain/planning/answer.ts";
import type { Aim } from "#app/domain/planning/problem.ts";

/** Least dead air first; the small weights see to it that nothing pointless is proposed. */
export const defaultAim: Aim = {
  exposed: 100,
  seconds: 1,
  strings: 1,
  semitones: 0,
  capoActions: 1,
  swaps: 1,
};

/**
 * The weighted total that is kept low.
 *
 * @example weigh({ exposed: 100, seconds: 1, … }, { exposed: 9, seconds: 21, … }) // 100 × 9 + 21 + …
 */
export function weigh(aim: Aim, totals: Totals): number {
  return (
    aim.exposed * totals.exposed +
    aim.seconds * totals.seconds +
    aim.strings * totals.strings +
    aim.semitones * totals.semitones +
    aim.capoActions * totals.capoActions +
    aim.swaps * totals.swaps +
    (aim.seconds + aim.exposed) * (totals.wishes ?? 0)
  );
}
