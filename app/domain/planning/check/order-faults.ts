import type { Fault } from "#app/domain/planning/check/fault.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** Length of a longest common subsequence, by the table that everybody learns. */
export function commonLength(a: string[], b: string[]): number {
  let row = new Array<number>(b.length + 1).fill(0);
  for (const left of a) {
    const next = [0];
    for (const [j, right] of b.entries())
      next.push(left === right ? row[j]! + 1 : Math.max(row[j + 1]!, next[j]!));
    row = next;
  }
  return row[b.length]!;
}

/** Every rule, section and limit that an order of songs breaks. */
export function orderFaults(problem: Problem, order: string[]): Fault[] {
  const faults: Fault[] = [];
  const wrong = (message: string) => faults.push({ path: "order", message });
  const songs = new Map(problem.songs.map((song) => [song.id, song]));
  let highest = Number.NEGATIVE_INFINITY;
  for (const id of order) {
    const { section } = songs.get(id)!;
    if (section < highest) wrong(`${id} comes after a song of a later section`);
    highest = Math.max(highest, section);
  }
  for (const [id, place] of Object.entries(problem.rules.at)) {
    const there = place > 0 ? order[place - 1] : order[order.length + place];
    if (place === 0 || there !== id) wrong(`${id} does not stand at ${place}`);
  }
  for (const [a, b] of problem.rules.before)
    if (!order.slice(0, order.indexOf(b)).includes(a)) wrong(`${a} does not come before ${b}`);
  for (const [a, b] of problem.rules.into)
    if (a === b || order[order.indexOf(a) + 1] !== b) wrong(`${a} does not lead into ${b}`);
  for (const [a, b] of problem.rules.apart) {
    if (a === b) continue;
    if (order[order.indexOf(a) + 1] === b || order[order.indexOf(b) + 1] === a) wrong(`${a} and ${b} touch`);
  }
  const moved = order.length - commonLength(problem.order, order);
  if (problem.maxMoved !== null && moved > problem.maxMoved) wrong(`${moved} songs moved`);
  return faults;
}
