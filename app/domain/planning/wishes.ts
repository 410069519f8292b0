import type { BrokenWish } from "#app/domain/planning/answer.ts";
import type { Problem, Wish } from "#app/domain/planning/problem.ts";

/** A song as it is played: its id, and the open pitches of its neck. */
export type Tuned = { song: string; open: readonly number[] };

/**
 * The level an energy curve has at a position: its values stand at equal distances over the whole set, with straight lines
 * between them.
 *
 * @param position from 0
 * @example curveAt([1, 5], 1, 3) // 3
 */
export function curveAt(curve: readonly number[], position: number, songs: number): number {
  if (curve.length === 1 || songs === 1) return curve[0]!;
  const along = (position / (songs - 1)) * (curve.length - 1);
  const before = Math.min(Math.floor(along), curve.length - 2);
  return curve[before]! + (along - before) * (curve[before + 1]! - curve[before]!);
}

function runsBroken({ most, seconds }: Extract<Wish, { kind: "run" }>, plays: readonly Tuned[]) {
  const tuning = plays.map(({ open }) => open.join());
  return plays.flatMap((_, i) => {
    let first = i;
    while (first > 0 && tuning[first - 1] === tuning[i]) first -= 1;
    return i - first >= most ? [{ songs: plays.slice(first, i + 1).map(({ song }) => song), seconds }] : [];
  });
}

function neighboursBroken({ groups, seconds }: Extract<Wish, { kind: "apart" }>, plays: readonly Tuned[]) {
  return plays.flatMap(({ song }, i) => {
    const before = plays[i - 1]?.song;
    const together =
      before !== undefined && groups.some((group) => group.includes(before) && group.includes(song));
    return together ? [{ songs: [before, song], seconds }] : [];
  });
}

function curveBroken({ levels, curve, seconds }: Extract<Wish, { kind: "energy" }>, plays: readonly Tuned[]) {
  return plays.flatMap(({ song }, i) => {
    if (!Object.hasOwn(levels, song)) return [];
    const steps = Math.abs(levels[song]! - curveAt(curve, i, plays.length));
    return steps * seconds > 0 ? [{ songs: [song], seconds: steps * seconds }] : [];
  });
}

function broken(wish: Wish, plays: readonly Tuned[]): { songs: string[]; seconds: number }[] {
  if (wish.kind === "run") return runsBroken(wish, plays);
  if (wish.kind === "apart") return neighboursBroken(wish, plays);
  return curveBroken(wish, plays);
}

/**
 * The wishes that an order breaks, in the order of the wishes and then of the set, each with the seconds it counts as.
 *
 * @param plays every song in the order it is played, with the neck chosen for it
 * @example brokenWishes({ wishes: [{ kind: "apart", groups: [["a", "b"]], seconds: 30 }] }, plays)
 * // [{ wish: 0, songs: ["b", "a"], seconds: 30 }] for b before a
 */
export function brokenWishes(
  { wishes = [] }: Pick<Problem, "wishes">,
  plays: readonly Tuned[],
): BrokenWish[] {
  return wishes.flatMap((wish, number) => broken(wish, plays).map((one) => ({ wish: number, ...one })));
}

/** Seconds that broken wishes count as together. */
export function wishSeconds(list: readonly BrokenWish[]): number {
  return list.reduce((sum, { seconds }) => sum + seconds, 0);
}
