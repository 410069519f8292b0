import type { Neck } from "#app/domain/music/neck.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/**
 * The name of a kind of capo: the strings it covers, in whatever order they were written.
 *
 * @example kindOf([3, 1, 2]) // "1,2,3"
 */
export function kindOf(strings: readonly number[]): string {
  return [...strings].sort((a, b) => a - b).join();
}

/** Capos of each kind on a neck; a kind that is not on it is left out. */
export function caposOn(neck: Neck): Map<string, number> {
  const counts = new Map<string, number>();
  for (const { strings } of neck.capos) counts.set(kindOf(strings), (counts.get(kindOf(strings)) ?? 0) + 1);
  return counts;
}

/** Whether there are enough capos for a neck, were all of them loose. */
export function caposSuffice({ capos = [] }: Pick<Problem, "capos">, neck: Neck): boolean {
  if (capos.length === 0 || neck.capos.length === 0) return true;
  const needed = caposOn(neck);
  return capos.every(({ strings, count }) => (needed.get(kindOf(strings)) ?? 0) <= count);
}

/**
 * A neck after one capo of a kind was taken from it: of two, the one at the higher fret. The same neck where it has none.
 *
 * @example withoutCapo({ open, capos: [{ fret: 3, strings: [1, 2, 3] }] }, "1,2,3").capos // []
 */
export function withoutCapo(neck: Neck, kind: string): Neck {
  let taken = -1;
  for (const [i, { fret, strings }] of neck.capos.entries())
    if (kindOf(strings) === kind && (taken === -1 || fret > neck.capos[taken]!.fret)) taken = i;
  if (taken === -1) return neck;
  return { open: neck.open, capos: neck.capos.filter((_, i) => i !== taken) };
}

/** The kinds of capo that can run short in a problem: not one for each that all guitars could carry at once. */
export function scarceKinds({ capos = [], guitars, songs }: Problem): { kind: string; count: number }[] {
  if (capos.length === 0) return [];
  const most = new Map<string, number>();
  const starts = guitars.flatMap(({ start }) => (start ? [start] : []));
  for (const neck of [...starts, ...songs.flatMap((song) => song.necks)])
    for (const [kind, count] of caposOn(neck)) most.set(kind, Math.max(count, most.get(kind) ?? 0));
  return capos
    .map(({ strings, count }) => ({ kind: kindOf(strings), count }))
    .filter(({ kind, count }) => count < guitars.length * (most.get(kind) ?? 0));
}
