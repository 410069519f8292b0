import type { Neck } from "#app/domain/music/neck.ts";
import type { NeckChoice, Problem, ProblemGuitar, ProblemSong } from "#app/domain/planning/problem.ts";
import { capoLedger } from "#tests/support/planning-capo-ledger.ts";
import { wishesBroken } from "#tests/support/planning-wish-count.ts";

/*
 * Every plan of a small problem, scored by the letter of the contract. It shares no code with the planner (types only)
 * and is written to be compared with the contract line by line, not to be fast.
 */

type Played = { song: ProblemSong; guitar: ProblemGuitar; neck: NeckChoice };

function orders<T>(items: T[]): T[][] {
  if (items.length === 0) return [[]];
  return items.flatMap((item, i) => orders(items.filter((_, k) => k !== i)).map((rest) => [item, ...rest]));
}

function longestCommon(a: string[], b: string[]): number {
  if (a.length === 0 || b.length === 0) return 0;
  const longest = Array.from({ length: a.length + 1 }, () => new Array<number>(b.length + 1).fill(0));
  for (let i = a.length - 1; i >= 0; i--)
    for (let j = b.length - 1; j >= 0; j--)
      longest[i]![j] =
        a[i] === b[j] ? 1 + longest[i + 1]![j + 1]! : Math.max(longest[i + 1]![j]!, longest[i]![j + 1]!);
  return longest[0]![0]!;
}

export function keepsOrderRules(problem: Problem, order: string[]): boolean {
  const section = (id: string) => problem.songs.find((song) => song.id === id)!.section;
  for (let i = 1; i < order.length; i++) if (section(order[i - 1]!) > section(order[i]!)) return false;
  for (const [id, at] of Object.entries(problem.rules.at)) {
    const index = at < 0 ? order.length + at : at - 1;
    if (order[index] !== id) return false;
  }
  const { before, into, apart } = problem.rules;
  if (before.some(([a, b]) => !(order.indexOf(a) < order.indexOf(b)))) return false;
  if (into.some(([a, b]) => order.indexOf(b) !== order.indexOf(a) + 1)) return false;
  if (apart.some(([a, b]) => a !== b && Math.abs(order.indexOf(a) - order.indexOf(b)) === 1)) return false;
  const moved = order.length - longestCommon(problem.order, order);
  return problem.maxMoved === null || moved <= problem.maxMoved;
}

function ways(problem: Problem, song: ProblemSong): Played[] {
  const found: Played[] = [];
  for (const neck of song.necks) {
    for (const guitar of problem.guitars) {
      if (neck.guitars !== null && !neck.guitars.includes(guitar.id)) continue;
      if (neck.open.length !== guitar.strings) continue;
      let inside = true;
      for (let i = 0; i < guitar.strings; i++)
        if (neck.open[i]! < guitar.lowest[i]! || neck.open[i]! > guitar.highest[i]!) inside = false;
      const sorted = (list: number[]) => [...list].sort((x, y) => x - y).join();
      for (const { strings, count } of problem.capos ?? [])
        if (neck.capos.filter((capo) => sorted(capo.strings) === sorted(strings)).length > count)
          inside = false;
      if (inside) found.push({ song, guitar, neck });
    }
  }
  return found;
}

type Change = { strings: number; semitones: number; actions: number; seconds: number };

function change(problem: Problem, a: Neck, b: Neck): Change {
  const { times } = problem;
  let strings = 0;
  let semitones = 0;
  for (let i = 0; i < a.open.length; i++) {
    if (a.open[i] === b.open[i]) continue;
    strings++;
    semitones += Math.abs(a.open[i]! - b.open[i]!);
  }
  const cover = (list: number[]) => [...list].sort((x, y) => x - y).join();
  const stays = (fret: number, list: number[], other: Neck) =>
    other.capos.some((capo) => capo.fret === fret && cover(capo.strings) === cover(list));
  const off = a.capos.filter((capo) => !stays(capo.fret, capo.strings, b)).map((capo) => cover(capo.strings));
  const on = b.capos.filter((capo) => !stays(capo.fret, capo.strings, a)).map((capo) => cover(capo.strings));
  let moves = 0;
  for (let i = off.length - 1; i >= 0; i--) {
    const k = on.indexOf(off[i]!);
    if (k < 0) continue;
    off.splice(i, 1);
    on.splice(k, 1);
    moves++;
  }
  let seconds =
    strings * times.string +
    semitones * times.semitone +
    moves * times.capoMove +
    on.length * times.capoOn +
    off.length * times.capoOff;
  if (strings > 0 || moves > 0 || on.length > 0) seconds += times.check;
  return { strings, semitones, actions: moves + on.length + off.length, seconds };
}

/** The total of one plan, or null where a kept guitar would be retuned. */
export function scorePlan(problem: Problem, played: Played[]): number | null {
  const { aim, times } = problem;
  const tech = problem.crew === "tech";
  const ledger = capoLedger(problem);
  const lastUse = new Map<string, number>();
  let strings = 0;
  let semitones = 0;
  let actions = 0;
  let swaps = 0;
  const onStage = played.map(() => 0);
  const jobs: { due: number; release: number; left: number }[] = [];

  for (let i = 0; i < played.length; i++) {
    const { guitar, neck } = played[i]!;
    const inHand = i > 0 ? played[i - 1]!.guitar.id : null;
    const { had, taken, takenFromHand } = ledger.hand(i, guitar, neck, inHand);
    const last = lastUse.get(guitar.id);
    lastUse.set(guitar.id, i);
    const swap = i > 0 && played[i - 1]!.guitar.id !== guitar.id;
    if (swap) {
      swaps++;
      onStage[i]! += times.swap;
    }
    if (had === null) continue;
    const done = change(problem, had, neck);
    if (guitar.keeps && done.strings > 0) return null;
    if (tech && i === 0) continue;
    strings += done.strings;
    semitones += done.semitones;
    actions += done.actions + taken;
    const all = done.seconds + taken * times.capoOff;
    const waits = takenFromHand * (times.capoOff + times.capoOn);
    if (tech && swap) {
      onStage[i]! += waits;
      jobs.push({ due: i, release: last === undefined ? 0 : last + 1, left: all - waits });
    } else onStage[i]! += all;
  }

  for (let i = 0; i < played.length; i++) {
    for (const job of jobs) {
      if (job.due !== i) continue;
      onStage[i]! += job.left;
      job.left = 0;
    }
    let seconds = played[i]!.song.seconds;
    while (seconds > 1e-9) {
      const open = jobs.filter((job) => job.release <= i && job.left > 1e-9);
      if (open.length === 0) break;
      const next = open.reduce((a, b) => (b.due < a.due ? b : a));
      const spent = Math.min(next.left, seconds);
      next.left -= spent;
      seconds -= spent;
    }
  }

  let seconds = 0;
  let exposed = 0;
  for (let i = 0; i < played.length; i++) {
    const { song, neck } = played[i]!;
    seconds += onStage[i]! + neck.penalty;
    exposed += Math.max(0, onStage[i]! - (song.cover ?? times.cover)) + neck.penalty;
  }
  return (
    aim.exposed * exposed +
    aim.seconds * seconds +
    aim.strings * strings +
    aim.semitones * semitones +
    aim.capoActions * actions +
    aim.swaps * swaps +
    (aim.exposed + aim.seconds) * wishesBroken(problem, played)
  );
}

/** How many plans there are to try, rules left aside. */
export function planCount(problem: Problem): number {
  let count = 1;
  for (const [i, song] of problem.songs.entries()) count *= (i + 1) * ways(problem, song).length;
  return count;
}

/** The least total of all valid plans, or null where there is none. */
export function bruteForce(problem: Problem): number | null {
  let least: number | null = null;
  for (const order of orders(problem.order)) {
    if (!keepsOrderRules(problem, order)) continue;
    const choices = order.map((id) => ways(problem, problem.songs.find((song) => song.id === id)!));
    const played: Played[] = [];
    const choose = (i: number) => {
      if (i === order.length) {
        const total = scorePlan(problem, played);
        if (total !== null && (least === null || total < least)) least = total;
        return;
      }
      for (const way of choices[i]!) {
        played[i] = way;
        choose(i + 1);
      }
    };
    choose(0);
  }
  return least;
}
