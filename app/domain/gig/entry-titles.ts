import type { Gig } from "#app/domain/gig/gig.ts";
import { entriesOf } from "#app/domain/gig/order.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";

/**
 * What the songs of a set are called; one that stands twice is told apart by its present place.
 * @example entryTitles(gig, "set1", repertoire)("e7") // "Lamps (song 7)"
 */
export function entryTitles(
  gig: Pick<Gig, "entries">,
  setId: string,
  repertoire: Pick<Repertoire, "songs">,
): (entryId: string) => string {
  const songs = new Map(repertoire.songs.map((song) => [song.id, song.title]));
  const titles = entriesOf(gig, setId).map((entry) => ({
    id: entry.id,
    title: songs.get(entry.songId) ?? "A song",
  }));
  const count = new Map<string, number>();
  for (const { title } of titles) count.set(title, (count.get(title) ?? 0) + 1);
  const named = new Map(
    titles.map(({ id, title }, index) => [
      id,
      count.get(title) === 1 ? title : `${title} (song ${index + 1})`,
    ]),
  );
  return (entryId) => named.get(entryId) ?? "A song";
}
