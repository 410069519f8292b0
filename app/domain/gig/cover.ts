import type { Entry, Gig } from "#app/domain/gig/gig.ts";
import { entriesOf } from "#app/domain/gig/order.ts";
import { encoreOpener, straightInto } from "#app/domain/gig/set-rules.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

/**
 * Seconds of talk that count before a song where its entry says nothing of its own: none where the song before leads
 * straight into it, the applause before an encore, else the song's own; null: the gig's.
 * @param entries those of the set that are in the problem
 */
export function coversOf(gig: Gig, entries: readonly Entry[]): (entry: Entry, song: Song) => number | null {
  const opener = encoreOpener(gig, entries);
  const into = straightInto(gig, entries);
  return (entry, song) => {
    if (into.has(entry.id)) return gig.times.intoCover;
    return entry.id === opener?.id ? gig.times.encoreCover : song.cover;
  };
}

/**
 * Seconds of talk before a song that stands in a set, had its entry none of its own.
 * @example usualCover(gig, encoreOpener, song) // 40
 */
export function usualCover(gig: Gig, entry: Entry, song: Song): number {
  return coversOf(gig, entriesOf(gig, entry.setId))(entry, song) ?? gig.times.cover;
}
