import type { Neck } from "#app/domain/music/neck.ts";
import type { BrokenWish, FoundAnswer, GuitarBefore, Totals } from "#app/domain/planning/answer.ts";
import { brokenWishes } from "#app/domain/planning/check/broken-wishes.ts";
import { capoPlaces, type Given } from "#app/domain/planning/check/capo-places.ts";
import { type Counted, countChange } from "#app/domain/planning/check/neck-work.ts";
import { commonLength } from "#app/domain/planning/check/order-faults.ts";
import { timeSpent } from "#app/domain/planning/check/tech-time.ts";
import type { NeckChoice, Problem, ProblemGuitar, ProblemSong } from "#app/domain/planning/problem.ts";

/** A song as played: by position in the answer's order. */
export type Played = { song: ProblemSong; guitar: ProblemGuitar; neck: NeckChoice };

/**
 * A change of a neck that falls into the gap before a position: `seconds` of work, taking capos that others give included.
 * Of a tech's job `byTech` of them are done in time.
 */
export type Change = {
  position: number;
  guitar: string;
  from: Neck;
  to: Neck;
  counted: Counted;
  given: Given[];
  seconds: number;
  resting: boolean;
  byTech: number;
};

export type Recount = {
  changes: Change[];
  before: GuitarBefore[];
  /** Seconds on stage of each gap; of position 0 only where a start is changed. */
  seconds: number[];
  totals: Totals;
  total: number;
  retunedKept: string[];
  broken: BrokenWish[];
};

/** Songs as played, with what stands in the answer replaced by what it names; null where it names nothing. */
export function playedSongs(problem: Problem, answer: FoundAnswer): Played[] | null {
  const played = answer.order.map((id) => {
    const song = problem.songs.find((other) => other.id === id);
    const plays = answer.plays.filter((play) => play.song === id);
    const guitar = problem.guitars.find((other) => other.id === plays[0]?.guitar);
    const neck = song?.necks[plays[0]?.neck ?? -1];
    return song && guitar && neck && plays.length === 1 ? { song, guitar, neck } : null;
  });
  return played.every((one) => one !== null) ? played : null;
}

/** The changes in the order of the set, and the neck each guitar has when it begins. */
function changesOf(problem: Problem, played: Played[]) {
  const { capoOff, capoOn } = problem.times;
  const tech = problem.crew === "tech";
  const playing = [0];
  for (const { song } of played) playing.push(playing.at(-1)! + song.seconds);
  const timed: { change: Change; opens: number; closes: number; waits: number }[] = [];
  const begins = new Map<string, Neck>();
  const places = capoPlaces(problem);
  for (const [position, { guitar, neck }] of played.entries()) {
    const used = played.slice(0, position).findLastIndex((other) => other.guitar.id === guitar.id);
    const { from, given } = places(guitar.id, neck);
    if (used === -1) begins.set(guitar.id, guitar.start ?? from ?? neck);
    if (from === null) continue;
    const counted = countChange(problem.times, from, neck);
    if (counted.strings + counted.moves + counted.ons + counted.offs === 0) continue;
    const resting = tech && (position === 0 || used !== position - 1);
    const inHand = resting ? played[position - 1]?.guitar.id : undefined;
    const waits = given.filter((one) => one.guitar === inHand).length * (capoOff + capoOn);
    const seconds = counted.seconds + given.length * capoOff;
    const change = {
      position,
      guitar: guitar.id,
      from,
      to: neck,
      counted,
      given,
      seconds,
      resting,
      byTech: 0,
    };
    timed.push({ change, opens: playing[used + 1]!, closes: playing[position]!, waits });
  }
  const jobs = timed.filter(({ change }) => change.resting && change.position > 0);
  const spent = timeSpent(
    playing.at(-1)!,
    jobs.map(({ change, opens, closes, waits }) => ({ opens, closes, seconds: change.seconds - waits })),
  );
  for (const [i, { change }] of jobs.entries()) change.byTech = spent[i]!;
  return { all: timed.map(({ change }) => change), begins };
}

/** Everything an answer claims, counted again from the problem, the order and the plays. */
export function recount(problem: Problem, played: Played[]): Recount {
  const { all, begins } = changesOf(problem, played);
  const retunedKept = all
    .filter(({ guitar, counted }) => {
      const { keeps } = problem.guitars.find((other) => other.id === guitar)!;
      return keeps && counted.strings > 0;
    })
    .map(({ position }) => played[position]!.song.id);
  const changes = all.filter(({ position, resting }) => position > 0 || !resting);
  const before = problem.guitars.flatMap((guitar) => {
    const first = begins.get(guitar.id);
    return first ? [{ guitar: guitar.id, open: first.open, capos: first.capos }] : [];
  });

  const penalties = played.reduce((sum, { neck }) => sum + neck.penalty, 0);
  const totals: Totals = {
    exposed: penalties,
    seconds: penalties,
    strings: 0,
    semitones: 0,
    capoActions: 0,
    swaps: 0,
    moved: 0,
  };
  const seconds = played.map(({ song, guitar }, position) => {
    const swap = position > 0 && played[position - 1]!.guitar.id !== guitar.id;
    let onStage = swap ? problem.times.swap : 0;
    for (const change of changes) {
      if (change.position !== position) continue;
      const left = change.seconds - change.byTech;
      if (left > 1e-9 * change.seconds) onStage += left;
      totals.strings += change.counted.strings;
      totals.semitones += change.counted.semitones;
      totals.capoActions += change.counted.moves + change.counted.ons + change.counted.offs;
      totals.capoActions += change.given.length;
    }
    totals.swaps += swap ? 1 : 0;
    totals.seconds += onStage;
    totals.exposed += Math.max(0, onStage - (song.cover ?? problem.times.cover));
    return onStage;
  });
  const order = played.map(({ song }) => song.id);
  totals.moved = order.length - commonLength(problem.order, order);
  const broken = brokenWishes(problem, played);
  const wishes = broken.reduce((sum, one) => sum + one.seconds, 0);
  if (problem.wishes) totals.wishes = wishes;
  const { aim } = problem;
  const total =
    totals.exposed * aim.exposed +
    totals.seconds * aim.seconds +
    totals.strings * aim.strings +
    totals.semitones * aim.semitones +
    totals.capoActions * aim.capoActions +
    totals.swaps * aim.swaps +
    wishes * (aim.exposed + aim.seconds);
  return { broken, changes, before, seconds, totals, total, retunedKept };
}
