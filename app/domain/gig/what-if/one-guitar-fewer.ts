import type { Gig } from "#app/domain/gig/gig.ts";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Supposed } from "#app/domain/gig/what-if/supposed.ts";

/**
 * A gig without one of the act's guitars; the sets in which it is played are planned anew. What was pinned to it is free
 * to go to another.
 * @example oneGuitarFewer(gig, plan, repertoire, "tin").setIds // ["set2"]
 */
export function oneGuitarFewer(gig: Gig, plan: GigPlan, repertoire: Repertoire, guitarId: string): Supposed {
  const guitars = repertoire.guitars.filter((guitar) => guitar.id !== guitarId);
  const uses = plan.sets.filter((set) => set.rows.some((row) => row.guitar?.id === guitarId));
  return { gig, repertoire: { ...repertoire, guitars }, edits: [], setIds: uses.map((set) => set.set.id) };
}
