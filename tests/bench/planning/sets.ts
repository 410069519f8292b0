import type { Problem } from "#app/domain/planning/problem.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

const rules = ["none", "light", "heavy"] as const;

/** What a row of the bench fixes; the rest goes round from one problem to the next. */
export type Shape = {
  songs: readonly number[];
  guitars?: readonly number[];
  necks?: readonly number[];
  crew?: "alone" | "tech";
  maxMoved?: readonly (number | null)[];
  /** Seconds of talk before a song that has none of its own; 0 takes away those too. */
  cover?: 0 | 12;
  /** Rules and kept guitars left out, for solvers that do not know them well. */
  plain?: boolean;
};

const pick = <T>(list: readonly T[], at: number): T => list[at % list.length]!;

/**
 * Realistic sets: usual times and the default aim, songs of 150 to 300 seconds, rules none, light and heavy in turn, kept
 * guitars, an encore, an order from which a few songs have strayed. The same number gives the same set.
 */
export function realisticSet(number: number, shape: Shape): Problem {
  const round = Math.floor(number / 3);
  const songs = pick(shape.songs, number);
  const problem = randomProblem(seededRandom(number * 7919 + songs), {
    songs,
    guitars: pick(shape.guitars ?? [1, 2, 3, 4], round),
    necks: pick(shape.necks ?? [5, 8, 11, 6, 9, 14, 7, 10, 13], number),
    rules: shape.plain ? "none" : pick(rules, number),
    realistic: true,
    longSongs: true,
    kept: !shape.plain,
    crew: shape.crew ?? pick(["alone", "tech"] as const, number),
    maxMoved: pick(shape.maxMoved ?? [null], round),
  });
  const cover = shape.cover ?? pick([12, 0] as const, Math.floor(round / 2));
  if (cover === 12) return problem;
  return {
    ...problem,
    times: { ...problem.times, cover: 0 },
    songs: problem.songs.map((song) => ({ ...song, cover: null })),
  };
}

const mixed = [20, 25, 30] as const;

/** The rows of the bench: name, shape, and problems in the short and the whole run. */
export const rows: { name: string; shape: Shape; quick: number; whole: number }[] = [
  ...[10, 13, 16].map((songs) => ({
    name: `${songs} songs, 1-3 guitars`,
    shape: { songs: [songs], guitars: [1, 2, 3] },
    quick: 12,
    whole: 90,
  })),
  ...mixed.map((songs) => ({ name: `${songs} songs`, shape: { songs: [songs] }, quick: 12, whole: 96 })),
  ...mixed.flatMap((songs) =>
    (["alone", "tech"] as const).map((crew) => ({
      name: `${songs} songs, ${crew}`,
      shape: { songs: [songs], crew },
      quick: 0,
      whole: 48,
    })),
  ),
  ...([0, 12] as const).map((cover) => ({
    name: `20-30 songs, cover ${cover}`,
    shape: { songs: mixed, cover },
    quick: 9,
    whole: 72,
  })),
  ...[1, 2, 3, 4].map((guitars) => ({
    name: `20-30 songs, ${guitars} ${guitars === 1 ? "guitar" : "guitars"}`,
    shape: { songs: mixed, guitars: [guitars] },
    quick: 6,
    whole: 48,
  })),
  ...(["alone", "tech"] as const).map((crew) => ({
    name: `20-30 songs, 4 guitars, ${crew}`,
    shape: { songs: mixed, guitars: [4], crew },
    quick: 0,
    whole: 36,
  })),
  {
    name: "20-30 songs, 14 necks and 4 guitars",
    shape: { songs: mixed, guitars: [4], necks: [14] },
    quick: 6,
    whole: 36,
  },
  ...[0, 1, 2, 3, null].map((maxMoved) => ({
    name: `20-30 songs, ${maxMoved ?? "any number"} moved`,
    shape: { songs: mixed, maxMoved: [maxMoved] },
    quick: 9,
    whole: 72,
  })),
];
