import { useMemo } from "react";
import type { Place } from "#app/components/gig/drag/drop-place.ts";
import type { Drag } from "#app/components/gig/drag/use-row-drag.ts";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { placeEdits } from "#app/domain/gig/order.ts";
import { type GigPlan, planGig } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Naming } from "#app/domain/music/note-names.ts";

/** The gig with the dragged row where it would go; as it is where the row cannot go there. */
function withDrag(gig: Gig, entryId: string, place: Place): Gig {
  if (!gig.entries.some((entry) => entry.id === entryId)) return gig;
  const placed = applyEdits(gig, placeEdits(gig, entryId, place));
  return placed.ok ? placed.gig : gig;
}

type Shown = {
  /** The gig as it is kept, and what it costs so. */
  gig: Gig;
  kept: GigPlan;
  repertoire: Repertoire;
  naming: Naming;
};

/** The gig as the page shows it, and what it costs: as it is kept, and while a row is dragged as it would be. */
export function useShownPlan({ gig, kept, repertoire, naming }: Shown, drag: Drag | null) {
  const entryId = drag?.entryId;
  const place = drag?.place;
  const shown = useMemo(
    () => (entryId === undefined || !place ? gig : withDrag(gig, entryId, place)),
    [gig, entryId, place],
  );
  const plan = useMemo(
    () => (shown === gig ? kept : planGig(shown, repertoire, naming)),
    [shown, gig, kept, repertoire, naming],
  );
  return { gig: shown, plan };
}
