import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import { type Crew, defaultTimes, type Gig, type GigTimes } from "#app/domain/gig/gig.ts";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Supposed } from "#app/domain/gig/what-if/supposed.ts";

/** A gig's times with those that usually differ between the crews as the other crew has them; the rest is the player's own. */
function timesFor(times: GigTimes, crew: Crew): GigTimes {
  const other = crew === "tech" ? "alone" : "tech";
  const differing = Object.entries(defaultTimes[crew]).filter(
    ([key, value]) => value !== defaultTimes[other][key as keyof GigTimes],
  );
  return { ...times, ...Object.fromEntries(differing) };
}

/**
 * A gig with a tech where there is none, and without one where there is.
 * @example otherCrew(gig, plan, repertoire).gig.crew // "tech"
 */
export function otherCrew(gig: Gig, plan: GigPlan, repertoire: Repertoire): Supposed {
  const crew: Crew = gig.crew === "tech" ? "alone" : "tech";
  const edits: Edit[] = [
    { kind: "gig.set", field: "crew", value: crew },
    { kind: "gig.set", field: "times", value: timesFor(gig.times, crew) },
  ];
  const applied = applyEdits(gig, edits);
  if (!applied.ok) throw new Error(applied.conflict.message);
  return { gig: applied.gig, repertoire, edits, setIds: plan.sets.map((set) => set.set.id) };
}
