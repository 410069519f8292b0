import type { Gig } from "#app/domain/gig/gig.ts";
import { entriesOf, setsOf } from "#app/domain/gig/order.ts";
import { encoreOpener } from "#app/domain/gig/set-rules.ts";

/**
 * Entries whose place somebody has said something about: held first and last songs, the one that opens an encore, and
 * all that a rule names.
 */
export function heldEntries(gig: Gig): Set<string> {
  const held = new Set(gig.rules.flatMap((rule) => (rule.kind === "at" ? [rule.entry] : [rule.a, rule.b])));
  for (const set of setsOf(gig)) {
    const entries = entriesOf(gig, set.id);
    const ends = [set.holdFirst ? entries[0] : null, set.holdLast ? entries.at(-1) : null];
    for (const entry of [...ends, encoreOpener(gig, entries)]) if (entry) held.add(entry.id);
  }
  return held;
}
