import { nanoid } from "nanoid";
import { memo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { Button } from "#app/components/ui/button.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import { newSet } from "#app/domain/gig/new-gig.ts";
import { rankBetween, setsOf } from "#app/domain/gig/order.ts";

/** Seconds of interval that a new set begins with; common practice, no source. */
const usualInterval = 1200;

/** Adds another set after the last one. */
export const AddSet = memo(function AddSet({ gig }: { gig: Gig }) {
  const { edit } = usePageTools();
  const add = () => {
    const last = setsOf(gig).at(-1);
    const set = newSet({
      id: nanoid(16),
      rank: rankBetween(last?.rank ?? null, null),
      index: gig.sets.length,
      interval: usualInterval,
    });
    edit([{ kind: "set.add", set }], `Add ${set.name}`);
  };
  return (
    <div className="border-grey-200 border-t px-4 py-3 lg:px-0">
      <Button small onClick={add}>
        Add a set
      </Button>
    </div>
  );
});
