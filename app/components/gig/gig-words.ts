import { TZDate } from "@date-fns/tz";
import { format } from "date-fns";
import type { Gig } from "#app/domain/gig/gig.ts";

/**
 * A gig's day and start in its own zone.
 * @example dayWords("2027-03-12T20:30:00Z", "Europe/Dublin") // "Fri 12 March, 20:30"
 */
export function dayWords(startsAt: string, zone: string): string {
  return format(new TZDate(startsAt, zone), "EEE d MMMM, HH:mm");
}

/** A wall time in the gig's zone. @example timeWords("2027-03-12T20:30:00Z", "Europe/Dublin") // "20:30" */
export function timeWords(instant: string, zone: string): string {
  return format(new TZDate(instant, zone), "HH:mm");
}

/**
 * What a gig is, in one line under its name.
 * @example subLine(gig, [12, 9]) // "Fri 12 March, 20:30, sets of 12 and 9, slot 125 min, curfew 23:00, no tech"
 */
export function subLine(gig: Gig, songs: readonly number[]): string {
  const counts =
    songs.length === 1
      ? `one set of ${songs[0]}`
      : `${songs.length} sets of ${songs.slice(0, -1).join(", ")} and ${songs.at(-1)}`;
  return [
    dayWords(gig.startsAt, gig.zone),
    counts,
    gig.slot === null ? null : `slot ${Math.round(gig.slot / 60)} min`,
    gig.curfew === null ? null : `curfew ${gig.curfew}`,
    gig.crew === "tech" ? "with a tech" : "no tech",
  ]
    .filter((part) => part !== null)
    .join(", ");
}
