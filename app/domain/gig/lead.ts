import type { GigAim } from "#app/domain/gig/gig.ts";
import type { Neck } from "#app/domain/music/neck.ts";
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

/** The most that one gap can ask for, whatever stands beside whatever: an upper bound on each count. */
function mostInAGap({ songs, guitars, times, capos: scarce }: Problem) {
  const starts = guitars.flatMap(({ start }) => (start ? [start] : []));
  const necks: Neck[] = [...songs.flatMap((song) => song.necks), ...starts];
  let strings = 0;
  let semitones = 0;
  for (const count of new Set(necks.map((neck) => neck.open.length))) {
    const opens = necks.filter((neck) => neck.open.length === count).map((neck) => neck.open);
    const spans = Array.from({ length: count }, (_, index) => {
      const pitches = opens.map((open) => open[index]!);
      return Math.max(...pitches) - Math.min(...pitches);
    });
    strings = Math.max(strings, spans.filter((span) => span > 0).length);
    semitones = Math.max(
      semitones,
      spans.reduce((sum, span) => sum + span, 0),
    );
  }
  const capos = Math.max(0, ...necks.map((neck) => neck.capos.length));
  const taking = scarce ? times.capoOff : 0;
  const swaps = guitars.length > 1 ? 1 : 0;
  const seconds =
    swaps * times.swap +
    strings * times.string +
    semitones * times.semitone +
    capos * Math.max(times.capoMove, times.capoOff + times.capoOn + taking) +
    times.check;
  return { exposed: seconds, strings, semitones, capoActions: capos * (scarce ? 3 : 2), swaps };
}

function mostWishes({ wishes = [], songs }: Problem): number {
  return wishes.reduce(
    (sum, wish) => sum + wish.seconds * songs.length * (wish.kind === "energy" ? 4 : 1),
    0,
  );
}

/** The greatest weighed total that all but what leads can come to. Talk counts in full: it covers work on stage. */
function mostBesides(problem: Problem, lead: Exclude<Lead, "own">): number {
  const { aim, songs, times, rules } = problem;
  const begun = problem.guitars.some(({ start }) => start !== null);
  const gaps = Math.max(0, begun ? songs.length : songs.length - 1);
  const talked = songs.filter((song) => begun || rules.at[song.id] !== 1);
  const talk = talked.reduce((sum, song) => sum + (song.cover ?? times.cover), 0);
  const most = mostInAGap(problem);
  const penalties = songs.reduce(
    (sum, song) => sum + Math.max(0, ...song.necks.map((neck) => neck.penalty)),
    0,
  );
  const weight = (key: keyof Aim, leads: boolean) => (leads ? 0 : aim[key]);
  const deadAir = gaps * most.exposed + penalties + mostWishes(problem);
  return (
    weight("exposed", lead === "dead-air") * deadAir +
    aim.seconds * (talk + (lead === "dead-air" ? 0 : deadAir)) +
    gaps *
      (weight("strings", lead === "strings") * most.strings +
        aim.semitones * most.semitones +
        weight("capoActions", lead === "capos") * most.capoActions +
        weight("swaps", lead === "guitars") * most.swaps)
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
