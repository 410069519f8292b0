export type DurationReading = { ok: true; seconds: number } | { ok: false; message: string };

const secondsPerDay = 86_400;
/** Below this a number alone is as likely minutes as seconds. */
const leastBareSeconds = 20;
const units =
  /^(?:(?<h>\d{1,2}) ?(?:h|hrs?|hours?|std)\.? ?)?(?:(?<m>\d{1,4}(?:[.,]\d{1,2})?) ?(?:m|mins?|minutes?|minuten)\.? ?)?(?:(?<s>\d{1,5}) ?(?<unit>s|secs?|seconds?|sek|sekunden)?\.?)?$/i;

/**
 * Reads a length as players write it: "3:15", "1:02:03", "3'15", "3.15" (minutes and seconds), "3 min", "3m15s",
 * "195" (seconds). A small number alone ("4") and "3.5" can mean two lengths, so they are asked about.
 * @returns whole seconds, or what is wrong and what to write. It never throws.
 * @example readDuration("3:15") // { ok: true, seconds: 195 }
 */
export function readDuration(text: string): DurationReading {
  const typed = text
    .normalize("NFC")
    .replace(/\s+/g, " ")
    .replace(/^[\s([~≈]+|[\s)\]]+$/g, "")
    .replace(/^(?:ca\.?|about|approx\.?) /i, "")
    .trim();
  if (typed === "") return refuse("Write a length, such as 3:15.");
  if (/^\d+$/.test(typed)) return bareNumber(typed);
  const clock = /^(?:(?<h>\d{1,2}):)?(?<m>\d{1,3}):(?<s>\d{2})(?: ?min\.?)?$/i.exec(typed);
  const dotted = /^(?<m>\d{1,3})\.(?<s>\d{2})$/.exec(typed);
  const primes = /^(?<m>\d{1,3}) ?['’′] ?(?:(?<s>\d{1,2}) ?(?:"|”|″|''|’’|′′)?)?$/.exec(typed);
  const parts = (clock ?? dotted ?? primes)?.groups;
  if (parts) return total(typed, parts.h, parts.m, parts.s);
  if (/^\d{1,3}[.,]\d$/.test(typed)) {
    const [minutes, rest] = typed.split(/[.,]/);
    return refuse(
      `"${typed}" could be ${minutes}:0${rest} or ${minutes}:${pad(Number(rest) * 6)}. Write it with a colon.`,
    );
  }
  const named = units.exec(typed)?.groups;
  if (named && (named.h || named.m || named.unit)) {
    const minutes = Number((named.m ?? "0").replace(",", "."));
    const seconds = Math.round(Number(named.h ?? 0) * 3600 + minutes * 60 + Number(named.s ?? 0));
    return withinDay(typed, seconds);
  }
  return refuse(
    `"${typed.slice(0, 40)}" is no length that can be read. Write minutes and seconds, such as 3:15.`,
  );
}

function refuse(message: string): DurationReading {
  return { ok: false, message };
}

function bareNumber(typed: string): DurationReading {
  const seconds = Number(typed);
  if (seconds > 0 && seconds < leastBareSeconds) {
    return refuse(
      `"${typed}" could be seconds or minutes. Write ${seconds}:00 for minutes or ${formatDuration(seconds)} for seconds.`,
    );
  }
  return withinDay(typed, seconds);
}

function total(
  typed: string,
  hours: string | undefined,
  minutes: string | undefined,
  seconds: string | undefined,
) {
  const secondsPart = Number(seconds ?? 0);
  const minutesPart = Number(minutes ?? 0);
  if (secondsPart > 59) return refuse(`"${typed}" has more than 59 seconds. Carry them over to the minutes.`);
  if (hours !== undefined && minutesPart > 59) {
    return refuse(`"${typed}" has more than 59 minutes. Carry them over to the hours.`);
  }
  return withinDay(typed, Number(hours ?? 0) * 3600 + minutesPart * 60 + secondsPart);
}

function withinDay(typed: string, seconds: number): DurationReading {
  return seconds < secondsPerDay
    ? { ok: true, seconds }
    : refuse(`"${typed.slice(0, 40)}" is a day or more. Write minutes and seconds, such as 3:15.`);
}

function pad(value: number): string {
  return String(value).padStart(2, "0");
}

/**
 * A length as minutes and seconds, with hours from the first on. Parts of a second are rounded; a time below zero
 * has a minus sign.
 * @example formatDuration(195) // "3:15"
 * @example formatDuration(3723) // "1:02:03"
 */
export function formatDuration(seconds: number): string {
  const whole = Math.round(Math.abs(seconds));
  const sign = seconds < 0 && whole > 0 ? "−" : "";
  const hours = Math.floor(whole / 3600);
  const minutes = Math.floor((whole % 3600) / 60);
  const upToMinutes = hours > 0 ? `${hours}:${pad(minutes)}` : `${minutes}`;
  return `${sign}${upToMinutes}:${pad(whole % 60)}`;
}
