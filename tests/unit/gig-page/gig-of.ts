import { defaultTimes, type Entry, type Gig, type GigSet } from "#app/domain/gig/gig.ts";

/** A gig from the ids of its entries: per set (its name is its id) the main section and the encore. */
export function gigOf(sets: Record<string, [string[], string[]]>): Gig {
  const names = Object.keys(sets);
  return {
    id: "gig",
    revision: 0,
    name: "The Slipway",
    venue: "",
    startsAt: "2027-03-12T20:30:00.000Z",
    zone: "Europe/Dublin",
    slot: null,
    curfew: null,
    crew: "alone",
    times: defaultTimes.alone,
    notes: "",
    sets: names.map(
      (name, index): GigSet => ({
        id: name,
        name,
        rank: `a${index}`,
        interval: 0,
        holdFirst: true,
        holdLast: true,
      }),
    ),
    entries: names.flatMap((name) =>
      sets[name]!.flatMap((ids, section) =>
        ids.map(
          (id, index): Entry => ({
            id,
            songId: `song-${id}`,
            setId: name,
            section: section === 1 ? 1 : 0,
            rank: `a${index}`,
            guitarId: null,
            neckId: null,
            pinned: "none",
            cover: null,
            techNote: "",
          }),
        ),
      ),
    ),
    rules: [],
  };
}
