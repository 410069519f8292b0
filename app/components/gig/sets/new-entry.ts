import type { Entry, Gig, Section } from "#app/domain/gig/gig.ts";
import { entriesOf, lastRanks } from "#app/domain/gig/order.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { playable } from "#app/domain/music/range.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

export type Choice = { guitarId: string | null; neckId: string | null };

/**
 * Guitar and way to begin with: the first way in the player's order of preference that some guitar can play; of these
 * guitars the one in hand, else the first that is nobody's spare. Nothing where no guitar can play the song.
 * @example firstChoice(lowMeadow, [cedar, blonde], "blonde") // { guitarId: "blonde", neckId: "n1" }
 */
export function firstChoice(song: Song, guitars: readonly Guitar[], inHand: string | null): Choice {
  for (const neck of song.necks) {
    const can = guitars.filter(
      (guitar) => (neck.guitars === null || neck.guitars.includes(guitar.id)) && playable(neck, guitar).ok,
    );
    const guitar = can.find((one) => one.id === inHand) ?? can.find((one) => one.spareFor === null) ?? can[0];
    if (guitar) return { guitarId: guitar.id, neckId: neck.id };
  }
  return { guitarId: null, neckId: null };
}

type NewEntries = {
  gig: Gig;
  repertoire: Repertoire;
  songs: readonly Song[];
  setId: string;
  section: Section;
  newId: () => string;
};

/** Entries that put songs at the end of a section, each on the guitar in hand where that can play it. */
export function newEntries({ gig, repertoire, songs, setId, section, newId }: NewEntries): Entry[] {
  const ranks = lastRanks(gig, setId, section, songs.length);
  let inHand = entriesOf(gig, setId).findLast((entry) => entry.section <= section)?.guitarId ?? null;
  return songs.map((song, index) => {
    const choice = firstChoice(song, repertoire.guitars, inHand);
    inHand = choice.guitarId ?? inHand;
    return {
      id: newId(),
      songId: song.id,
      setId,
      section,
      rank: ranks[index]!,
      ...choice,
      pinned: "none",
      cover: null,
      techNote: "",
    };
  });
}
