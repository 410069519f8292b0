import type { RibbonFrame, RibbonRow } from "#app/domain/gig/ribbon.ts";
import type { Capo } from "#app/domain/music/neck.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** One piece of work on a guitar: where it stands, and which strings go where. `index` counts from the low side. */
export type StoryWork = {
  entryId: string;
  y1: number;
  y2: number;
  atSide: boolean;
  strings: { index: number; from: number; to: number }[];
};

/** What happens to one guitar down the set. */
export type GuitarStory = {
  /** Pitches of the strings before anything is turned, low side first. */
  first: number[];
  works: StoryWork[];
  /** Stretches in which it is in the player's hands. */
  played: { y1: number; y2: number }[];
  /** The capos on it for each song it plays. */
  uses: { row: number; capos: Capo[] }[];
  /** Capos that another guitar takes off it, for the song of that row. */
  taken: { row: number; strings: number[] }[];
};

/**
 * Follows one guitar down the rows. The player's work stands in the gap before the song; a tech's beside the song
 * during which the guitar first rests.
 */
export function guitarStory(
  guitar: Guitar,
  rows: readonly RibbonRow[],
  { tops, heights }: RibbonFrame,
): GuitarStory {
  const story: GuitarStory = { first: [], works: [], played: [], uses: [], taken: [] };
  const bottomOf = (row: number) => (tops[row] ?? 0) + (heights[row] ?? 0);
  let last = -1;
  rows.forEach((row, index) => {
    for (const capo of row.gap?.work[0]?.capos ?? []) {
      if (capo.action === "on" && capo.takenFrom === guitar.id)
        story.taken.push({ row: index, strings: capo.strings });
    }
    if (row.guitar?.id !== guitar.id || !row.neck) return;
    const before = previousPlayed(rows, index);
    const keepsPlaying = last >= 0 && before === last;
    if (last < 0) story.first = row.neck.open;
    const works = row.gap?.work.filter((work) => work.guitar === guitar.id) ?? [];
    const work = works[0];
    if (work) {
      const atSide = works.some((one) => one.by === "tech") && last + 1 < index;
      const from = atSide ? (tops[last + 1] ?? 0) : bottomOf(Math.max(0, index - 1));
      const to = atSide ? bottomOf(last + 1) : (tops[index] ?? 0);
      const room = (to - from) * 0.12;
      story.works.push({
        entryId: row.entry.id,
        y1: from + room,
        y2: to - room,
        atSide,
        strings: work.strings.map((one) => ({
          index: guitar.strings - one.string,
          from: one.from,
          to: one.to,
        })),
      });
    }
    const y2 = bottomOf(index);
    const stretch = story.played.at(-1);
    if (keepsPlaying && stretch) stretch.y2 = y2;
    else story.played.push({ y1: tops[index] ?? 0, y2 });
    story.uses.push({ row: index, capos: row.neck.capos });
    last = index;
  });
  return story;
}

/** The row before this one that some guitar plays. */
function previousPlayed(rows: readonly RibbonRow[], index: number): number {
  for (let row = index - 1; row >= 0; row -= 1) if (rows[row]?.guitar) return row;
  return -1;
}
