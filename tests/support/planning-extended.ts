import type { CapoKind, Problem, Wish } from "#app/domain/planning/problem.ts";

/** A problem with few capos of each kind and some wishes on top, made up from a stream of numbers. */
export function extendedProblem(random: () => number, problem: Problem): Problem {
  const below = (count: number) => Math.floor(random() * count);
  const carried = (necks: { capos: { strings: number[] }[] }[], strings: number[]) =>
    necks.map(({ capos }) => capos.filter((capo) => capo.strings.join() === strings.join()).length);
  const starts = problem.guitars.flatMap(({ start }) => (start ? [start] : []));
  const necks = problem.songs.flatMap((song) => song.necks);
  const kinds = new Map(
    [...starts, ...necks].flatMap(({ capos }) => capos).map(({ strings }) => [strings.join(), strings]),
  );
  const capos = [...kinds.values()].flatMap((strings): CapoKind[] => {
    if (random() < 0.2) return [];
    const onStarts = carried(starts, strings).reduce((sum, count) => sum + count, 0);
    const inOne = random() < 0.9 ? Math.max(0, ...carried(necks, strings)) : 1;
    return [{ strings: strings.toReversed(), count: Math.max(onStarts, inOne + (random() < 0.3 ? 1 : 0)) }];
  });
  const ids = problem.songs.map(({ id }) => id);
  const groups = [0, 1, 2].map((group) => ids.filter((_, i) => (i * 7 + problem.songs.length) % 4 === group));
  const wishes: Wish[] = [];
  if (random() < 0.4) wishes.push({ kind: "run", most: 1 + below(3), seconds: 5 + below(20) });
  if (random() < 0.4) wishes.push({ kind: "apart", groups, seconds: 5 + below(30) });
  if (random() < 0.4) {
    const levels = Object.fromEntries(ids.flatMap((id) => (random() < 0.8 ? [[id, 1 + below(5)]] : [])));
    const curve = Array.from({ length: 1 + below(4) }, () => 1 + below(9) / 2);
    wishes.push({ kind: "energy", levels, curve, seconds: 1 + below(6) });
  }
  return { ...problem, capos, wishes };
}
