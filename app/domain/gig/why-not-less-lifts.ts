import { entryTitles } from "#app/domain/gig/entry-titles.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { gearLifts } from "#app/domain/gig/why-not-less-guitars.ts";
import { type Lift, nothingInstead } from "#app/domain/gig/why-not-less-lift.ts";
import { ruleLifts } from "#app/domain/gig/why-not-less-rules.ts";
import { onlyWayLifts, pinLifts } from "#app/domain/gig/why-not-less-songs.ts";
import { wishWords } from "#app/domain/gig/wish-words.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** Each wish for the set. */
function wishLifts(gig: Gig, problem: Problem): Lift[] {
  const { wishes = [] } = problem;
  return wishes.flatMap((_, index) => {
    const wish = gig.wishes[index];
    const without = { ...problem, wishes: wishes.toSpliced(index, 1) };
    return wish ? [{ name: `Wish: ${wishWords(wish)}`, problem: without, instead: nothingInstead }] : [];
  });
}

/**
 * Every single thing that may hold a set's best answer up, those that are quickest to try first: rules, pins, wishes, kept
 * tunings, ranges, counted capos, and songs with one way only. What cannot matter is left out.
 * @param best the best answer in any order
 * @example liftsOf(gig, plan, best, { repertoire, naming }).map((lift) => lift.name)
 * // ["Harrow Weather held first", "Tin keeps its tuning", "Slow Water only in DADGAD"]
 */
export function liftsOf(
  gig: Gig,
  plan: SetPlan,
  best: FoundAnswer,
  { repertoire, naming }: { repertoire: Repertoire; naming: Naming },
): Lift[] {
  const title = entryTitles(gig, plan.set.id, repertoire);
  const words = { title, naming };
  const { problem } = plan;
  const pinned = plan.rows.flatMap(({ entry }) =>
    entry.pinned === "neck" || entry.pinned === "both" ? [entry.id] : [],
  );
  return [
    ...ruleLifts(gig, plan, repertoire, title),
    ...pinLifts(gig, plan, repertoire, words),
    ...wishLifts(gig, problem),
    ...gearLifts(problem, repertoire.guitars, naming),
    ...onlyWayLifts(problem, new Set(pinned), best, words),
  ];
}
