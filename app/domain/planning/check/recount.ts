import type { Neck } from "#app/domain/music/neck.ts";
import type { FoundAnswer, GuitarBefore, Totals } from "#app/domain/planning/answer.ts";
import { type Counted, countChange } from "#app/domain/planning/check/neck-work.ts";
import { commonLength } from "#app/domain/planning/check/order-faults.ts";
import { timeSpent } from "#app/domain/planning/check/tech-time.ts";
import type { NeckChoice, Problem, ProblemGuitar, ProblemSong } from "#app/domain/planning/problem.ts";

/** A song as played: by position in the answer's order. */
export type Played = { song: ProblemSong; guitar: ProblemGuitar; neck: NeckChoice };

/** A change of a neck that falls into the gap before a position; of a tech's job `byTech` seconds are done in time. */
export type Change = {
  position: number;
  guitar: string;
  from: Neck;
  to: Neck;
  counted: Counted;
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

function changesOf(problem: Problem, played: Played[]): Change[] {
  const tech = problem.crew === "tech";
  const playing = [0];
  for (const { song } of played) playing.push(playing.at(-1)! + song.seconds);
  const timed: { change: Change; opens: number; closes: number }[] = [];
  for (const [position, { guitar, neck }] of played.entries()) {
    const used = played.slice(0, position).findLastIndex((other) => other.guitar.id === guitar.id);
    const from = used === -1 ? guitar.start : played[used]!.neck;
    if (from === null) continue;
    const counted = countChange(problem.times, from, neck);
    if (counted.strings + counted.moves + counted.ons + counted.offs === 0) continue;
    const resting = tech && (position === 0 || used !== position - 1);
    const change = { position, guitar: guitar.id, from, to: neck, counted, resting, byTech: 0 };
    timed.push({ change, opens: playing[used + 1]!, closes: playing[position]! });
  }
  const jobs = timed.filter(({ change }) => change.resting && change.position > 0);
  const spent = timeSpent(
    playing.at(-1)!,
    jobs.map(({ change, opens, closes }) => ({ opens, closes, seconds: change.counted.seconds })),
  );
  for (const [i, { change }] of jobs.entries()) change.byTech = spent[i]!;
  return timed.map(({ change }) => change);
}

/** Everything an answer claims, counted again from the problem, the order and the plays. */
export function recount(problem: Problem, played: Played[]): Recount {
  const all = changesOf(problem, played);
  const retunedKept = all
    .filter(({ guitar, counted }) => {
      const { keeps } = problem.guitars.find((other) => other.id === guitar)!;
      return keeps && counted.strings > 0;
    })
    .map(({ position }) => played[position]!.song.id);
  const changes = all.filter(({ position, resting }) => position > 0 || !resting);
  const before = problem.guitars.flatMap((guitar) => {
    const first = played.find((other) => other.guitar.id === guitar.id);
    if (!first) return [];
    const { open, capos } = guitar.start ?? first.neck;
    return [{ guitar: guitar.id, open, capos }];
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
      const left = change.counted.seconds - change.byTech;
      if (left > 1e-9 * change.counted.seconds) onStage += left;
      totals.strings += change.counted.strings;
      totals.semitones += change.counted.semitones;
      totals.capoActions += change.counted.moves + change.counted.ons + change.counted.offs;
    }
    totals.swaps += swap ? 1 : 0;
    totals.seconds += onStage;
    totals.exposed += Math.max(0, onStage - (song.cover ?? problem.times.cover));
    return onStage;
  });
  const order = played.map(({ song }) => song.id);
  totals.moved = order.length - commonLength(problem.order, order);
  const { aim } = problem;
  const total =
    totals.exposed * aim.exposed +
    totals.seconds * aim.seconds +
    totals.strings * aim.strings +
    totals.semitones * aim.semitones +
    totals.capoActions * aim.capoActions +
    totals.swaps * aim.swaps;
  return { changes, before, seconds, totals, total, retunedKept };
}
