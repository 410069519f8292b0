/** A day and a time of day as a clock on the wall shows them: "2027-03-12" and "20:30". */
export type LocalTime = { date: string; time: string };

/** "20:30", 24 hours. */
export const clockTime = /^([01]\d|2[0-3]):[0-5]\d$/;

const minute = 60_000;

/**
 * Whether this is the name of a time zone, as the IANA data base lists them.
 * @example isZone("Europe/Dublin") // true
 * @example isZone("Dublin") // false
 */
export function isZone(zone: string): boolean {
  if (!/^[A-Za-z][\w+/-]{0,63}$/.test(zone)) return false;
  try {
    new Intl.DateTimeFormat("en", { timeZone: zone });
    return true;
  } catch {
    return false;
  }
}

/**
 * What the clock on the wall shows in a zone at an instant.
 * @param instant ISO 8601 with Z
 * @example localTime("2027-07-02T19:30:00.000Z", "Europe/Dublin") // { date: "2027-07-02", time: "20:30" }
 * @throws RangeError for an unreadable instant or an unknown zone
 */
export function localTime(instant: string, zone: string): LocalTime {
  const wall = new Date(wallClock(Date.parse(instant), zone)).toISOString();
  return { date: wall.slice(0, 10), time: wall.slice(11, 16) };
}

/**
 * The instant at which the clock on the wall shows this time in a zone, to the minute; null where it never does: the
 * day does not exist, or the clock is put forward over it. Where it shows it twice, the first.
 * @example instantOf({ date: "2027-07-02", time: "20:30" }, "Europe/Dublin") // "2027-07-02T19:30:00.000Z"
 * @example instantOf({ date: "2027-03-28", time: "01:30" }, "Europe/Dublin") // null
 */
export function instantOf({ date, time }: LocalTime, zone: string): string | null {
  if (!/^\d{4}-\d\d-\d\d$/.test(date) || !clockTime.test(time)) return null;
  const wall = Date.parse(`${date}T${time}:00.000Z`);
  if (Number.isNaN(wall) || new Date(wall).toISOString().slice(0, 10) !== date) return null;
  const day = 24 * 60 * minute;
  const offsets = [wall - day, wall + day].map((near) => wallClock(near, zone) - near);
  const instants = offsets.map((offset) => wall - offset).filter((at) => wallClock(at, zone) === wall);
  return instants.length > 0 ? new Date(Math.min(...instants)).toISOString() : null;
}

/**
 * The day some days later.
 * @example addDays("2027-02-26", 7) // "2027-03-05"
 */
export function addDays(date: string, days: number): string {
  return new Date(Date.parse(`${date}T00:00:00.000Z`) + days * 24 * 60 * minute).toISOString().slice(0, 10);
}

/** Formats by zone: making one costs more than a hundred uses of it. */
const formats = new Map<string, Intl.DateTimeFormat>();

function formatFor(zone: string): Intl.DateTimeFormat {
  const known = formats.get(zone);
  if (known) return known;
  const format = new Intl.DateTimeFormat("en-GB", {
    timeZone: zone,
    calendar: "gregory",
    hourCycle: "h23",
    year: "numeric",
    month: "2-digit",
    day: "2-digit",
    hour: "2-digit",
    minute: "2-digit",
    second: "2-digit",
  });
  formats.set(zone, format);
  return format;
}

/** The time on the wall as if it were UTC, in milliseconds. */
function wallClock(instant: number, zone: string): number {
  const format = formatFor(zone);
  const parts = new Map(format.formatToParts(instant).map((part) => [part.type, Number(part.value)]));
  const [year, month, day, hour, minutes, second] = ["year", "month", "day", "hour", "minute", "second"].map(
    (type) => parts.get(type as Intl.DateTimeFormatPartTypes) ?? 0,
  ) as [number, number, number, number, number, number];
  return Date.UTC(year, month - 1, day, hour, minutes, second);
}

const months = ["Jan", "Feb", "March", "April", "May", "June", "July", "Aug", "Sept", "Oct", "Nov", "Dec"];
const weekdays = ["Sun", "Mon", "Tue", "Wed", "Thu", "Fri", "Sat"];

/**
 * A day as people write it. Made here rather than by the browser, so that server and browser write the same.
 * @example dateWords("2027-03-12") // "Fri 12 March 2027"
 */
export function dateWords(date: string): string {
  const day = new Date(`${date}T00:00:00.000Z`);
  return `${weekdays[day.getUTCDay()]} ${day.getUTCDate()} ${months[day.getUTCMonth()]} ${day.getUTCFullYear()}`;
}
