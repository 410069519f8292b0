import type { Gig } from "#app/domain/gig/gig.ts";
import { addDays, instantOf, localTime } from "#app/domain/gig/local-time.ts";

/** When a gig ends, against its slot and its curfew. Instants are ISO 8601 with Z; seconds else. */
export type Clock = {
  startsAt: string;
  endsAt: string;
  seconds: number;
  slot: number | null;
  /** Seconds past the slot; 0 where it fits or there is none. */
  overSlot: number;
  curfewAt: string | null;
  /** Seconds past the curfew; 0 where it is kept or there is none. */
  overCurfew: number;
};

/** No clock is put forward by more than this, in minutes. */
const longestSkip = 180;

/** When the wall clock first shows a time or, where it is put forward over that, what comes next. */
function instantFrom(date: string, time: string, zone: string): string | null {
  const wall = Date.parse(`${date}T${time}:00.000Z`);
  for (let minutes = 0; minutes <= longestSkip; minutes += 1) {
    const shown = new Date(wall + minutes * 60_000).toISOString();
    const instant = instantOf({ date: shown.slice(0, 10), time: shown.slice(11, 16) }, zone);
    if (instant !== null) return instant;
  }
  return null;
}

/** The curfew's instant: the first time after the start that the wall clock shows it. */
function curfewAfter({ curfew, startsAt, zone }: Pick<Gig, "curfew" | "startsAt" | "zone">): string | null {
  if (curfew === null) return null;
  const { date } = localTime(startsAt, zone);
  const today = instantFrom(date, curfew, zone);
  if (today !== null && Date.parse(today) > Date.parse(startsAt)) return today;
  return instantFrom(addDays(date, 1), curfew, zone);
}

/**
 * The clock of a gig that takes so many seconds from its first song on.
 * @example clockOf({ startsAt: "2027-03-12T20:30:00.000Z", zone: "Europe/Dublin", slot: 3600, curfew: "21:20" }, 3413)
 *   // { overSlot: 0, overCurfew: 413, … }
 */
export function clockOf(gig: Pick<Gig, "startsAt" | "zone" | "slot" | "curfew">, seconds: number): Clock {
  const starts = Date.parse(gig.startsAt);
  const ends = starts + Math.round(seconds) * 1000;
  const curfewAt = curfewAfter(gig);
  return {
    startsAt: gig.startsAt,
    endsAt: new Date(ends).toISOString(),
    seconds,
    slot: gig.slot,
    overSlot: gig.slot === null ? 0 : Math.max(0, seconds - gig.slot),
    curfewAt,
    overCurfew: curfewAt === null ? 0 : Math.max(0, (ends - Date.parse(curfewAt)) / 1000),
  };
}
