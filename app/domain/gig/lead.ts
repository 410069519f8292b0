import type { GigAim } from "#app/domain/gig/gig.ts";
import { mostWork } from "#app/domain/gig/most-work.ts";
import type { Totals } from "#app/domain/planning/answer.ts";
import type { Aim, Problem } from "#app/domain/planning/problem.ts";

/** What a player looks at first, by the aim of the gig. `own`: the total by the player's own weights. */
export type Lead = GigAim["kind"];

/** How much of what leads there is in an order. */
type Measured = { total: number; totals: Totals };

const counts = { "dead-air": "exposed", strings: "strings", capos: "capoActions", guitars: "swaps" } as const;

/**
 * The figure that leads: seconds of dead air, strings, capo changes, guitar changes, or the weighed total.
 * @example leadOf("strings", answer) // 11
 */
export function leadOf(lead: Lead, { total, totals }: Measured): number {
  return lead === "own" ? total : totals[counts[lead]];
}

function mostWishes({ wishes = [], songs }: Problem): number {
  return wishes.reduce(
    (sum, wish) => sum + wish.seconds * songs.length * (wish.kind === "energy" ? 4 : 1),
    0,
  );
}

/** The greatest weighed total that all but what leads can come to. */
function mostBesides(problem: Problem, lead: Exclude<Lead, "own">): number {
  const { aim } = problem;
  const most = mostWork(problem);
  const deadAir = most.seconds + mostWishes(problem);
  const weight = (kind: Exclude<Lead, "own">) => (kind === lead ? 0 : aim[counts[kind]]);
  return (
    weight("dead-air") * deadAir +
    aim.seconds * (most.talk + (lead === "dead-air" ? 0 : deadAir)) +
    weight("strings") * most.strings +
    aim.semitones * most.semitones +
    weight("capos") * most.capoActions +
    weight("guitars") * most.swaps
  );
}

function weightOf(aim: Aim, lead: Exclude<Lead, "own">): number {
  return lead === "dead-air" ? aim.exposed + aim.seconds : aim[counts[lead]];
}

/** Whether every order's seconds are whole, so that a bound between two of them means the next. */
function wholeSeconds({ times, songs, wishes = [] }: Problem): boolean {
  const seconds = [
    ...Object.values(times),
    ...songs.flatMap((song) => [song.seconds, song.cover ?? 0, ...song.necks.map((neck) => neck.penalty)]),
    ...wishes.map((wish) => (wish.kind === "energy" ? 0.5 : wish.seconds)),
  ];
  return seconds.every(Number.isInteger);
}

/**
 * How little of what leads any order has at best, from a bound on the weighed total. Dead air is told together with the
 * seconds of broken wishes. Why: an order's total is the weight of what leads times how much of it there is, and the rest;
 * the rest is at most `mostBesides`; so what leads is at least what is left of the bound, shared out by its weight.
 *
 * @param bound proven lower bound on the weighed total
 * @example leastLead("dead-air", problem, 8114) // 79
 */
export function leastLead(lead: Lead, problem: Problem, bound: number): number {
  if (lead === "own" || bound === Number.POSITIVE_INFINITY) return Math.max(0, bound);
  const weight = weightOf(problem.aim, lead);
  if (weight <= 0) return 0;
  const least = Math.max(0, (bound - mostBesides(problem, lead)) / weight);
  const whole = lead !== "dead-air" || wholeSeconds(problem);
  return whole ? Math.ceil(least - 1e-6) : least;
}
