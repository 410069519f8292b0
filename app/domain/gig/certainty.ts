import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/**
 * Seconds of dead air that no valid plan goes below, from an answer's bound on the weighted total. Whatever a plan needs
 * besides dead air is at most: the talk of every gap, every string and capo of every gap, a guitar change in each.
 */
export function leastDeadAir(problem: Problem, bound: number): number {
  const { aim, songs, guitars, times } = problem;
  const gaps = Math.max(0, songs.length - 1);
  const covered = songs.reduce((sum, song) => sum + (song.cover ?? times.cover), 0);
  const strings = Math.max(0, ...guitars.map((guitar) => guitar.strings));
  const reach = guitars.map(({ lowest, highest }) =>
    highest.reduce((sum, high, index) => sum + high - (lowest[index] ?? high), 0),
  );
  const capos = Math.max(0, ...songs.flatMap((song) => song.necks.map((neck) => neck.capos.length)));
  const besides =
    aim.seconds * covered +
    gaps *
      (aim.strings * strings +
        aim.semitones * Math.max(0, ...reach) +
        aim.capoActions * 2 * capos +
        aim.swaps);
  const weight = aim.exposed + aim.seconds;
  return weight > 0 ? Math.max(0, (bound - besides) / weight) : 0;
}

/**
 * How sure a suggestion is: proven least, or how much less dead air there may still be.
 * @example certaintyWords(problem, answer, "any-order") // "Not proven: at most 14 s less is possible."
 */
export function certaintyWords(
  problem: Problem,
  answer: FoundAnswer,
  rung: "same-order" | "any-order",
): string {
  if (answer.status === "optimal") {
    return rung === "any-order"
      ? "Proven: nothing needs less than this."
      : "Proven: no choice of guitars needs less in this order.";
  }
  const less = Math.ceil(answer.totals.exposed - leastDeadAir(problem, answer.bound) - 1e-6);
  return less > 0
    ? `Not proven: at most ${less} s less is possible.`
    : "Not proven: no less dead air is possible, fewer strings or changes may be.";
}
