import type { Gig } from "#app/domain/gig/gig.ts";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Supposed } from "#app/domain/gig/what-if/supposed.ts";

/**
 * A gig with one more capo of a kind that the act has listed. Where none of its kind would be listed it is unlimited, so
 * there is nothing to ask.
 * @example anotherCapo(gig, plan, repertoire, "five").repertoire.capos // [{ id: "five", …, count: 2 }]
 */
export function anotherCapo(gig: Gig, plan: GigPlan, repertoire: Repertoire, capoId: string): Supposed {
  const capos = repertoire.capos.map((capo) =>
    capo.id === capoId ? { ...capo, count: capo.count + 1 } : capo,
  );
  return { gig, repertoire: { ...repertoire, capos }, edits: [], setIds: plan.sets.map((set) => set.set.id) };
}
