import { defaultChoice } from "#app/domain/gig/default-choice.ts";
import type { Entry, Gig, Section } from "#app/domain/gig/gig.ts";
import { lastRanks } from "#app/domain/gig/order.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

type NewEntries = {
  gig: Gig;
  repertoire: Repertoire;
  songs: readonly Song[];
  setId: string;
  section: Section;
  newId: () => string;
};

/** Entries that put songs at the end of a section, each on the guitar that then costs least. */
export function newEntries({ gig, repertoire, songs, setId, section, newId }: NewEntries): Entry[] {
  const ranks = lastRanks(gig, setId, section, songs.length);
  const made: Entry[] = [];
  songs.forEach((song, index) => {
    const standing = { ...gig, entries: [...gig.entries, ...made] };
    made.push({
      id: newId(),
      songId: song.id,
      setId,
      section,
      rank: ranks[index]!,
      ...defaultChoice(standing, repertoire, { song, setId, section }),
      pinned: "none",
      cover: null,
      techNote: "",
    });
  });
  return made;
}
