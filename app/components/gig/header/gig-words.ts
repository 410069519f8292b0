import type { Gig } from "#app/domain/gig/gig.ts";
import { dateWords, localTime } from "#app/domain/gig/local-time.ts";

/**
 * The wall time some seconds after an instant, in the gig's zone.
 * @example timeAfter("2027-03-12T20:30:00.000Z", 600, "Europe/Dublin") // "20:40"
 */
export function timeAfter(startsAt: string, seconds: number, zone: string): string {
  return localTime(new Date(Date.parse(startsAt) + Math.round(seconds) * 1000).toISOString(), zone).time;
}

/**
 * What a gig is, in one line under its name. `songs` counts those of each set.
 * @example subLine(gig, [12, 9])
 * // "Fri 12 March 2027, 20:30; 2 sets of 12 and 9, slot 125 min, curfew 23:00, no tech"
 */
export function subLine(gig: Gig, songs: readonly number[]): string {
  const { date, time } = localTime(gig.startsAt, gig.zone);
  const total = songs.reduce((sum, count) => sum + count, 0);
  const sets = songs.length === 1 ? "one set" : `${songs.length} sets`;
  const of = songs.length === 1 ? `${total}` : `${songs.slice(0, -1).join(", ")} and ${songs.at(-1)}`;
  const counts = total === 0 ? `${sets}, no songs yet` : `${sets} of ${of}`;
  const facts = [
    counts,
    gig.slot === null ? null : `slot ${Math.round(gig.slot / 60)} min`,
    gig.curfew === null ? null : `curfew ${gig.curfew}`,
    gig.crew === "tech" ? "with a tech" : "no tech",
  ].filter((fact) => fact !== null);
  return `${dateWords(date)}, ${time}; ${facts.join(", ")}`;
}
