import type { GigAim } from "#app/domain/gig/gig.ts";
import { defaultAim } from "#app/domain/planning/aim.ts";
import type { Aim } from "#app/domain/planning/problem.ts";

/** One count ahead of everything: less of it is worth more dead air than a set can have. */
const ahead = 100_000;

/** What decides between orders that are level in the count ahead: dead air first, then work. */
const level: Aim = { exposed: 10, seconds: 1, strings: 1, semitones: 0, capoActions: 1, swaps: 1 };

const aims: Record<Exclude<GigAim["kind"], "own">, Aim> = {
  "dead-air": defaultAim,
  strings: { ...level, strings: ahead },
  capos: { ...level, capoActions: ahead },
  guitars: { ...level, swaps: ahead },
};

/**
 * The weights of an aim. The small ones see to it that no pointless work is proposed.
 * @example aimOf({ kind: "dead-air" }) // { exposed: 100, seconds: 1, strings: 1, … }
 */
export function aimOf(aim: GigAim): Aim {
  return aim.kind === "own" ? aim.weights : aims[aim.kind];
}

/** Aims as a player says them, in the order of a list of choices. */
export const aimNames: Readonly<Record<GigAim["kind"], string>> = {
  "dead-air": "Least dead air",
  strings: "Fewest strings retuned",
  capos: "Fewest capo changes",
  guitars: "Fewest guitar changes",
  own: "Own weights",
};
