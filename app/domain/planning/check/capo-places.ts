import type { Capo, Neck } from "#app/domain/music/neck.ts";
import { nameOf } from "#app/domain/planning/check/neck-work.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** A capo that a guitar has to give: over which strings, and the guitar's id. */
export type Given = { strings: string; guitar: string };

/** How a guitar is found before a song (`null`: prepared as the song needs it), and what others give for it. */
export type Found = { from: Neck | null; given: Given[] };

const overStrings = (strings: string, neck: Neck | null | undefined): Capo[] =>
  (neck?.capos ?? []).filter((capo) => nameOf(capo.strings) === strings).sort((a, b) => a.fret - b.fret);

/**
 * Keeps account of the counted capos through a set, song by song: how many have never been touched, and the necks of all
 * guitars with what was taken from them gone.
 */
export function capoPlaces(problem: Problem): (guitar: string, needs: Neck) => Found {
  const necks = new Map<string, Neck | null>(problem.guitars.map(({ id, start }) => [id, start]));
  const resting: string[] = problem.guitars.map(({ id }) => id);
  const stock = (problem.capos ?? []).map(({ strings, count }) => ({ strings: nameOf(strings), count }));
  const onGuitars = (strings: string) =>
    [...necks.values()].reduce((sum, neck) => sum + overStrings(strings, neck).length, 0);
  const usedAtOnce = new Map(stock.map(({ strings }) => [strings, onGuitars(strings)]));

  return (guitar, needs) => {
    const given: Given[] = [];
    let from = necks.get(guitar) ?? null;
    const free = from === null;
    for (const { strings, count } of stock) {
      const wanted = overStrings(strings, needs);
      let mine = overStrings(strings, from).length;
      let touched = usedAtOnce.get(strings)!;
      if (free) {
        mine = Math.min(wanted.length, count - touched);
        touched += mine;
        const missing = wanted.slice(mine);
        if (missing.length > 0)
          from = { open: needs.open, capos: (from ?? needs).capos.filter((capo) => !missing.includes(capo)) };
      }
      const elsewhere = problem.guitars
        .filter(({ id }) => id !== guitar)
        .reduce((sum, { id }) => sum + overStrings(strings, necks.get(id)).length, 0);
      let short = Math.max(0, elsewhere + Math.max(mine, wanted.length) - count);
      touched = Math.max(touched, elsewhere + Math.max(mine, wanted.length) - short);
      usedAtOnce.set(strings, touched);
      for (const id of resting) {
        while (short > 0 && id !== guitar && overStrings(strings, necks.get(id)).length > 0) {
          const neck = necks.get(id)!;
          const gone = overStrings(strings, neck).at(-1)!;
          necks.set(id, { open: neck.open, capos: neck.capos.filter((capo) => capo !== gone) });
          given.push({ strings, guitar: id });
          short -= 1;
        }
      }
    }
    resting.splice(resting.indexOf(guitar), 1);
    resting.push(guitar);
    necks.set(guitar, { open: needs.open, capos: needs.capos });
    return { from, given };
  };
}

/** Whether a neck needs no more capos of any kind than there are. */
export function enoughCapos(problem: Problem, neck: Neck): boolean {
  return (problem.capos ?? []).every(
    ({ strings, count }) => overStrings(nameOf(strings), neck).length <= count,
  );
}
