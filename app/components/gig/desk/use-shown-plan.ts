import { useMemo } from "react";
import type { Drag } from "#app/components/gig/drag/use-row-drag.ts";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { placeEdits } from "#app/domain/gig/order.ts";
import { type GigPlan, planGig } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Naming } from "#app/domain/music/note-names.ts";

/** The gig with the dragged row where it would go; as it is where the row cannot go there. */
function withDrag(gig: Gig, drag: Drag | null): Gig {
  if (!drag || !gig.entries.some((entry) => entry.id === drag.entryId)) return gig;
  const placed = applyEdits(gig, placeEdits(gig, drag.entryId, drag.place));
  return placed.ok ? placed.gig : gig;
}

export type ShownPlan = {
  /** The gig as the page shows it, and what it costs. */
  gig: Gig;
  plan: GigPlan;
  /** What the gig costs as it is kept. The same as `plan` while nothing is dragged. */
  kept: GigPlan;
};

/** Scores the gig as kept, and while a row is dragged the gig as it would be. */
export function useShownPlan(gig: Gig, repertoire: Repertoire, naming: Naming, drag: Drag | null): ShownPlan {
  const kept = useMemo(() => planGig(gig, repertoire, naming), [gig, repertoire, naming]);
  const shown = useMemo(() => withDrag(gig, drag), [gig, drag]);
  const plan = useMemo(
    () => (shown === gig ? kept : planGig(shown, repertoire, naming)),
    [shown, gig, kept, repertoire, naming],
  );
  return { gig: shown, plan, kept };
}
