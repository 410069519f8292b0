import { timeAfter } from "#app/components/gig/header/gig-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";

/**
 * What the clock warns about.
 * @example planWarnings(gig, plan) // ["3:12 longer than the slot. Cut a song, or shorten an interval."]
 */
export function planWarnings(gig: Gig, { clock }: GigPlan): string[] {
  const warnings: string[] = [];
  if (clock.overSlot > 0) {
    warnings.push(
      `${formatDuration(clock.overSlot)} longer than the slot. Cut a song, or shorten an interval.`,
    );
  }
  if (clock.overCurfew > 0) {
    const ends = timeAfter(gig.startsAt, clock.seconds, gig.zone);
    warnings.push(`Ends at ${ends}, ${formatDuration(clock.overCurfew)} after the curfew at ${gig.curfew}.`);
  }
  return warnings;
}
