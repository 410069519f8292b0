import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Play } from "#app/domain/planning/answer.ts";
import { type Model, modelOf } from "#app/domain/planning/model.ts";
import type { Aim, Problem } from "#app/domain/planning/problem.ts";
import { scoreOf } from "#app/domain/planning/score.ts";

/** All songs of some sets as one problem, so that any of them can be scored in any set. */
export type SongScores = {
  /** Ways to play each song, as numbers. */
  options: Model["options"];
  numberOf: (entryId: string) => number;
  /** The weighted total of songs in this order, each played the way that stands in `ways` for it. */
  score: (songs: readonly number[], ways: Int32Array) => number;
  /** How every song is played now. */
  ways: Int32Array;
};

/**
 * Scores the songs of some sets in any order and any set, very many times. Rules are not looked at, nor what is wished of a
 * whole set.
 * @param aim what is to be weighed; the sets' own where left out
 * @throws RangeError where there are no sets
 */
export function songScores(sets: readonly SetPlan[], aim?: Aim): SongScores {
  const first = sets[0];
  if (!first) throw new RangeError("There is nothing to score without a set.");
  const songs = sets.flatMap((set) => set.problem.songs);
  const { wishes: _, ...rest } = first.problem;
  const problem: Problem = {
    ...rest,
    aim: aim ?? first.problem.aim,
    songs: songs.map((song) => ({ ...song, section: 0 })),
    order: sets.flatMap((set) => set.problem.order),
    rules: { at: {}, before: [], into: [], apart: [] },
    maxMoved: null,
  };
  const model = modelOf(problem);
  const numbers = new Map(problem.order.map((id, number) => [id, number]));
  const guitars = new Map(problem.guitars.map(({ id }, number) => [id, number]));
  const scored = scoreOf(model);
  return {
    options: model.options,
    numberOf: (id) => numbers.get(id)!,
    score: (order, ways) => scored(Int32Array.from(order), ways),
    ways: waysOf(
      model,
      sets.flatMap((set) => set.plays),
      numbers,
      guitars,
    ),
  };
}

function waysOf(
  { options, necks, problem }: Model,
  plays: readonly Play[],
  numbers: ReadonlyMap<string, number>,
  guitars: ReadonlyMap<string, number>,
): Int32Array {
  const ways = new Int32Array(options.length);
  const known = new Map(problem.songs.map((song) => [song.id, song]));
  for (const { song, guitar, neck } of plays) {
    const own = options[numbers.get(song)!]!;
    const exact = own.findIndex((option) => option.guitar === guitars.get(guitar) && option.choice === neck);
    const open = JSON.stringify(bare(known.get(song)!.necks[neck]!));
    const alike = own.findIndex(
      (option) => option.guitar === guitars.get(guitar) && JSON.stringify(bare(necks[option.neck]!)) === open,
    );
    ways[numbers.get(song)!] = Math.max(0, exact >= 0 ? exact : alike);
  }
  return ways;
}

const bare = ({ open, capos }: { open: number[]; capos: unknown[] }) => ({ open, capos });
