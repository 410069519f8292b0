import type { Place } from "#app/components/gig/drag/drop-place.ts";
import type { Gig, Section } from "#app/domain/gig/gig.ts";
import { entriesOf, setsOf } from "#app/domain/gig/order.ts";

/** A section that can hold songs, with the entries in it, in the order of the gig. */
export type Part = { setId: string; setName: string; section: Section; entryIds: string[] };

/**
 * Every section of a gig, first to last: each set's main part, then its encore where it has songs or is in `openEncores`.
 */
export function partsOf(gig: Gig, openEncores: ReadonlySet<string> = new Set()): Part[] {
  return setsOf(gig).flatMap((set) => {
    const entries = entriesOf(gig, set.id);
    const of = (section: Section): Part => ({
      setId: set.id,
      setName: set.name,
      section,
      entryIds: entries.filter((entry) => entry.section === section).map((entry) => entry.id),
    });
    const encore = of(1);
    return encore.entryIds.length > 0 || openEncores.has(set.id) ? [of(0), encore] : [of(0)];
  });
}

/** Where an entry stands now, or null where it is gone. */
export function placeOf(parts: readonly Part[], entryId: string): Place | null {
  for (const part of parts) {
    const index = part.entryIds.indexOf(entryId);
    if (index >= 0) return { setId: part.setId, section: part.section, index };
  }
  return null;
}

/**
 * One place up (-1) or down (1), over the edge of a section into the next one. Null at the very first and last place.
 */
export function placeBeside(parts: readonly Part[], entryId: string, step: -1 | 1): Place | null {
  const at = parts.findIndex((part) => part.entryIds.includes(entryId));
  const part = parts[at];
  if (!part) return null;
  const index = part.entryIds.indexOf(entryId) + step;
  if (index >= 0 && index < part.entryIds.length) return { setId: part.setId, section: part.section, index };
  const next = parts[at + step];
  if (!next) return null;
  return { setId: next.setId, section: next.section, index: step === 1 ? 0 : next.entryIds.length };
}

/** What a section is called among the others of its gig: "Set 2", "Encore of Set 1". */
export function partName(part: Pick<Part, "setName" | "section">): string {
  return part.section === 0 ? part.setName : `Encore of ${part.setName}`;
}

/**
 * Where a section is, for the middle of a sentence.
 * @example toPart({ setName: "Set 1", section: 1 }, 2) // "the encore of Set 1"
 */
export function toPart(part: Pick<Part, "setName" | "section">, sets: number): string {
  if (part.section === 0) return part.setName;
  return sets === 1 ? "the encore" : `the encore of ${part.setName}`;
}
