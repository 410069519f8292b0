import type { RibbonFrame } from "#app/domain/gig/ribbon.ts";
import type { GuitarStory } from "#app/domain/gig/ribbon-story.ts";
import { sameCapo } from "#app/domain/music/capo.ts";
import type { Capo } from "#app/domain/music/neck.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** A capo on a ribbon: a bar across each run of covered strings, and how far down it stays on. */
export type CapoBar = {
  fret: number;
  runs: { x1: number; x2: number }[];
  y1: number;
  y2: number;
  /** Foot of the last song for which it stays on; null where that is the song it was put on for. */
  endY: number | null;
};

/** Share of a row's height that a bar takes; of the lowest row, since some have more to say. */
const barShare = 0.42;

/** Neighbouring covered strings as runs from edge to edge, half a string's distance wider on either side. */
function runsOf(
  capo: Capo,
  places: readonly number[],
  distance: number,
  count: number,
): { x1: number; x2: number }[] {
  const covered = [...capo.strings].sort((a, b) => b - a).map((string) => count - string);
  const groups: number[][] = [];
  for (const index of covered) {
    const group = groups.at(-1);
    if (group && group.at(-1) === index - 1) group.push(index);
    else groups.push([index]);
  }
  return groups.map((group) => {
    const xs = group.map((index) => places[index] ?? 0);
    return { x1: Math.min(...xs) - distance * 0.42, x2: Math.max(...xs) + distance * 0.42 };
  });
}

const kindOf = (capo: { strings: readonly number[] }) => capo.strings.toSorted((a, b) => a - b).join();

/** The row for which a capo is taken off after a use, before the next; null where it is not. Of two alike the higher goes first. */
function takenAfter(story: GuitarStory, use: number, capo: Capo): number | null {
  const { row, capos } = story.uses[use]!;
  const next = story.uses[use + 1]?.row ?? Number.POSITIVE_INFINITY;
  const takes = story.taken.filter((one) => one.row > row && one.row < next && kindOf(one) === kindOf(capo));
  const higher = capos.filter((one) => kindOf(one) === kindOf(capo) && one.fret > capo.fret).length;
  return takes[higher]?.row ?? null;
}

/** Every capo of one guitar down the set, from the song it is put on for to the last it stays on for, or until another guitar takes it. */
export function capoBars(
  story: GuitarStory,
  places: readonly number[],
  distance: number,
  guitar: Guitar,
  { tops, heights }: RibbonFrame,
): CapoBar[] {
  const bars: CapoBar[] = [];
  const usual = Math.min(...heights);
  story.uses.forEach(({ row, capos }, use) => {
    const earlier = story.uses[use - 1]?.capos ?? [];
    capos.forEach((capo, place) => {
      const stayed = use > 0 && takenAfter(story, use - 1, capo) === null;
      if (stayed && earlier.some((one) => sameCapo(one, capo))) return;
      let last = use;
      const staysOn = () =>
        takenAfter(story, last, capo) === null &&
        story.uses[last + 1]?.capos.some((one) => sameCapo(one, capo));
      while (staysOn()) last += 1;
      const top = tops[row] ?? 0;
      const height = heights[row] ?? 0;
      const thick = usual * barShare * (capos.length > 1 ? 0.8 : 1);
      const middle = top + (height * (place + 1)) / (capos.length + 1);
      const used = story.uses[last]?.row ?? row;
      const lastRow = (takenAfter(story, last, capo) ?? used + 1) - 1;
      bars.push({
        fret: capo.fret,
        runs: runsOf(capo, places, distance, guitar.strings),
        y1: middle - thick / 2,
        y2: middle + thick / 2,
        endY: lastRow > row ? (tops[lastRow] ?? 0) + (heights[lastRow] ?? 0) - 2 : null,
      });
    });
  });
  return bars;
}
