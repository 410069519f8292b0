import type { FoundAnswer, Play } from "#app/domain/planning/answer.ts";
import type { Problem, ProblemGuitar } from "#app/domain/planning/problem.ts";

/** Whether two guitars can stand for each other in a problem: nothing in it tells them apart. */
function alike(a: ProblemGuitar, b: ProblemGuitar, problem: Problem): boolean {
  const same = ({ id: _, ...rest }: ProblemGuitar) => JSON.stringify(rest);
  return (
    same(a) === same(b) &&
    problem.songs.every((song) =>
      song.necks.every(
        ({ guitars }) => guitars === null || guitars.includes(a.id) === guitars.includes(b.id),
      ),
    )
  );
}

/** More than this many exchanges are never needed for the guitars of one set. */
const mostRounds = 50;

/**
 * The same answer with guitars that are alike exchanged so that as many songs as possible stay on the guitar they are
 * on now: it needs no less of hands on stage, and fewer notes to relearn. Totals do not change.
 * @example leastChange(problem, present, answer).totals === answer.totals // true
 */
export function leastChange(problem: Problem, present: readonly Play[], answer: FoundAnswer): FoundAnswer {
  const now = new Map(present.map((play) => [play.song, play.guitar]));
  const label = new Map(problem.guitars.map((guitar) => [guitar.id, guitar.id]));
  const stays = () => answer.plays.filter((play) => label.get(play.guitar) === now.get(play.song)).length;
  for (let round = 0, better = true; better && round < mostRounds; round += 1) {
    better = false;
    for (const a of problem.guitars) {
      for (const b of problem.guitars) {
        if (a.id >= b.id || !alike(a, b, problem)) continue;
        const before = stays();
        const [toA, toB] = [label.get(a.id)!, label.get(b.id)!];
        label.set(a.id, toB).set(b.id, toA);
        if (stays() > before) better = true;
        else label.set(a.id, toA).set(b.id, toB);
      }
    }
  }
  const named = <Thing extends { guitar: string }>(thing: Thing): Thing => ({
    ...thing,
    guitar: label.get(thing.guitar) ?? thing.guitar,
  });
  return {
    ...answer,
    plays: answer.plays.map(named),
    before: answer.before.map(named),
    gaps: answer.gaps.map((gap) => ({ ...gap, work: gap.work.map(named) })),
  };
}
