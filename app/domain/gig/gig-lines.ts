import type { Gig } from "#app/domain/gig/gig.ts";
import { dateWords, localTime } from "#app/domain/gig/local-time.ts";

/** A gig as a list shows it, in words and in the gig's own zone. */
export type GigLine = {
  id: string;
  name: string;
  venue: string;
  day: string;
  time: string;
  contents: string;
};

type Listed = Pick<Gig, "id" | "name" | "venue" | "startsAt" | "zone"> & {
  sets: readonly { songs: number }[];
};

/** A gig counts as past this long after its start. */
const longestEvening = 12 * 3600 * 1000;

/**
 * Gigs to come, the next first, and gigs that are over, the last first.
 * @param now milliseconds since 1970
 * @example gigLines([gig], Date.parse("2027-01-01")).coming[0].contents // "2 sets, 21 songs"
 */
export function gigLines(gigs: readonly Listed[], now: number): { coming: GigLine[]; past: GigLine[] } {
  const sorted = gigs.toSorted((a, b) => Date.parse(a.startsAt) - Date.parse(b.startsAt));
  const isPast = (gig: Listed) => Date.parse(gig.startsAt) + longestEvening < now;
  return {
    coming: sorted.filter((gig) => !isPast(gig)).map(gigLine),
    past: sorted.filter(isPast).reverse().map(gigLine),
  };
}

function gigLine(gig: Listed): GigLine {
  const { date, time } = localTime(gig.startsAt, gig.zone);
  const songs = gig.sets.reduce((sum, set) => sum + set.songs, 0);
  const counts = [counted(gig.sets.length, "set"), songs === 0 ? "no songs yet" : counted(songs, "song")];
  const { id, name, venue } = gig;
  return { id, name, venue, day: dateWords(date), time, contents: counts.join(", ") };
}

function counted(count: number, what: string): string {
  return `${count} ${what}${count === 1 ? "" : "s"}`;
}
