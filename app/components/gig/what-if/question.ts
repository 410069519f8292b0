import { useMemo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { type Asked, askedOf } from "#app/domain/gig/what-if/outcome.ts";
import type { Supposed } from "#app/domain/gig/what-if/supposed.ts";

/** What every question is asked of. */
export type QuestionProps = { gig: Gig; plan: GigPlan; repertoire: Repertoire };

/** Nothing supposed: the same sets, for what re-planning alone does. */
export function useUnsupposed(props: QuestionProps, setIds: readonly string[]): Asked {
  const { gig, repertoire } = props;
  const ids = setIds.join();
  const supposed = useMemo(
    (): Supposed => ({ gig, repertoire, edits: [], setIds: ids === "" ? [] : ids.split(",") }),
    [gig, repertoire, ids],
  );
  return useAsked(props, supposed);
}

/** A question made ready, anew only where what it is asked of changed. */
export function useAsked({ gig, plan }: QuestionProps, supposed: Supposed): Asked {
  const { naming } = usePageTools();
  return useMemo(() => askedOf(gig, plan, supposed, naming), [gig, plan, supposed, naming]);
}
