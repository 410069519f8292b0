const dayTime = new Intl.DateTimeFormat("en-GB", {
  day: "numeric",
  month: "long",
  year: "numeric",
  hour: "2-digit",
  minute: "2-digit",
  timeZone: "UTC",
});

/**
 * A moment in words, in UTC, so that server and browser write the same.
 * @example dayAndTime(new Date(Date.UTC(2026, 11, 3, 14, 5))) // "3 December 2026 at 14:05 UTC"
 */
export function dayAndTime(moment: Date): string {
  return `${dayTime.format(moment)} UTC`;
}
