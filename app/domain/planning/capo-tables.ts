import type { Neck } from "#app/domain/music/neck.ts";
import { caposOn, scarceKinds, withoutCapo } from "#app/domain/planning/capo-kinds.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/**
 * The scarce kinds of capo as numbers: how many there are of each, how many a neck carries and what neck it is with one
 * fewer (both looked up at `neck × kinds + kind`).
 */
export type CapoTables = {
  kinds: number;
  counts: Int32Array;
  carried: Int32Array;
  without: Int32Array;
  /** The necks that songs and starts ask for are the first so many; those that follow lack capos that were taken. */
  whole: number;
  /** Whether it can matter which guitar was laid aside first: there may be several to take a capo from. */
  ordered: boolean;
};

/**
 * Tables for the scarce kinds of a problem; null where no kind is scarce.
 *
 * @param necks the necks that songs and starts ask for
 * @param numberOf gives a neck's number, and adds it to `necks` where it is new
 */
export function capoTables(
  problem: Problem,
  necks: readonly Neck[],
  numberOf: (neck: Neck) => number,
): CapoTables | null {
  const kinds = scarceKinds(problem);
  if (kinds.length === 0) return null;
  const whole = necks.length;
  const carried: number[] = [];
  const without: number[] = [];
  for (let number = 0; number < necks.length; number += 1) {
    const neck = necks[number]!;
    const on = caposOn(neck);
    for (const { kind } of kinds) {
      carried.push(on.get(kind) ?? 0);
      without.push(on.has(kind) ? numberOf(withoutCapo(neck, kind)) : number);
    }
  }
  return {
    kinds: kinds.length,
    counts: Int32Array.from(kinds, ({ count }) => count),
    carried: Int32Array.from(carried),
    without: Int32Array.from(without),
    whole,
    ordered: problem.guitars.length > 2 && kinds.some(({ count }) => count > 1),
  };
}

/** A neck and all that it becomes as capos are taken from it, as numbers. */
export function lessAndLess({ kinds, without }: CapoTables, neck: number): number[] {
  const found = [neck];
  for (let i = 0; i < found.length; i += 1)
    for (let kind = 0; kind < kinds; kind += 1) {
      const next = without[found[i]! * kinds + kind]!;
      if (!found.includes(next)) found.push(next);
    }
  return found;
}

/** Scarce capos that a neck needs: no more can ever have to be taken for it. */
export function mostTaken({ kinds, carried }: CapoTables, neck: number): number {
  let sum = 0;
  for (let kind = 0; kind < kinds; kind += 1) sum += carried[neck * kinds + kind]!;
  return sum;
}
