import type { InfeasibleAnswer } from "#app/domain/planning/answer.ts";
import { enoughCapos } from "#app/domain/planning/check/capo-places.ts";
import type { Fault } from "#app/domain/planning/check/fault.ts";
import { orderFaults } from "#app/domain/planning/check/order-faults.ts";
import type { NeckChoice, Problem, ProblemGuitar, ProblemSong } from "#app/domain/planning/problem.ts";

const TRIES = 5_000;

function canPlay(guitar: ProblemGuitar, neck: NeckChoice): boolean {
  if (neck.guitars && !neck.guitars.some((id) => id === guitar.id)) return false;
  if (neck.open.length !== guitar.strings) return false;
  return neck.open.every((pitch, i) => guitar.lowest[i]! <= pitch && pitch <= guitar.highest[i]!);
}

const waysOf = (problem: Problem, song: ProblemSong) =>
  problem.guitars.flatMap((guitar) =>
    song.necks
      .filter((neck) => canPlay(guitar, neck) && enoughCapos(problem, neck))
      .map((neck) => ({ guitar, neck })),
  );

/** Whether guitars that keep their tuning can play the songs in this order, by trying; null where it takes too long. */
function keepsWork(problem: Problem, order: string[]): boolean | null {
  const ways = order.map((id) => waysOf(problem, problem.songs.find((song) => song.id === id)!));
  let tries = 0;
  const kept = new Map(problem.guitars.map((guitar) => [guitar.id, guitar.start?.open.join() ?? null]));
  const from = (position: number): boolean => {
    if (position === ways.length) return true;
    for (const { guitar, neck } of ways[position]!) {
      tries += 1;
      if (tries > TRIES) return false;
      const tuning = kept.get(guitar.id)!;
      const needed = neck.open.join();
      if (guitar.keeps && tuning !== null && tuning !== needed) continue;
      kept.set(guitar.id, needed);
      if (from(position + 1)) return true;
      kept.set(guitar.id, tuning);
    }
    return false;
  };
  const works = from(0);
  return tries > TRIES ? null : works;
}

/** Whether a song may come next after those placed, as far as the rules about it can be judged by then. */
function mayCome(problem: Problem, placed: string[], id: string): boolean {
  const { at, before, into, apart } = problem.rules;
  const position = placed.length;
  const last = placed.at(-1);
  const fixed = Object.entries(at).find(([song]) => song === id)?.[1];
  if (fixed !== undefined && fixed !== position + 1 && fixed !== position - problem.order.length)
    return false;
  const section = new Map(problem.songs.map((song) => [song.id, song.section]));
  const open = problem.order.filter((other) => !placed.includes(other));
  if (open.some((other) => section.get(other)! < section.get(id)!)) return false;
  if (before.some(([a, b]) => b === id && !placed.includes(a))) return false;
  if (into.some(([a, b]) => (b === id && a !== last) || (a === last && b !== id))) return false;
  return !apart.some(([a, b]) => a !== b && ((a === last && b === id) || (b === last && a === id)));
}

/** A plan that holds, looked for by plain trial from the present order on; null where the tries are used up. */
function playableOrder(problem: Problem): string[] | null {
  let tries = 0;
  const placed: string[] = [];
  const complete = (): boolean => {
    if (placed.length === problem.order.length)
      return orderFaults(problem, placed).length === 0 && keepsWork(problem, placed) === true;
    return problem.order.some((id) => {
      tries += 1;
      if (tries > TRIES || placed.includes(id) || !mayCome(problem, placed, id)) return false;
      placed.push(id);
      if (complete()) return true;
      placed.pop();
      return false;
    });
  };
  return complete() ? placed : null;
}

/** Whether the set is said to be impossible for reasons that do not hold. Impossibility itself is not proven here. */
export function infeasibleFaults(problem: Problem, answer: InfeasibleAnswer): Fault[] {
  const faults: Fault[] = [];
  const without = problem.songs.filter((song) => waysOf(problem, song).length === 0).map(({ id }) => id);
  for (const [i, { code, songs }] of answer.why.entries()) {
    const path = `why.${i}`;
    for (const id of songs)
      if (!problem.order.includes(id)) faults.push({ path, message: `there is no song ${id}` });
    if (code === "no-guitar" && (songs.length === 0 || songs.some((id) => !without.includes(id))))
      faults.push({ path, message: "a guitar can play this song" });
    if (code === "keeps" && !problem.guitars.some(({ keeps }) => keeps))
      faults.push({ path, message: "no guitar keeps its tuning" });
    if (code === "moved" && problem.maxMoved === null)
      faults.push({ path, message: "any number of songs may move" });
  }
  if (without.length > 0) return faults;
  const possible = playableOrder(problem);
  if (possible) faults.push({ path: "status", message: `this order can be played: ${possible.join(", ")}` });
  return faults;
}
