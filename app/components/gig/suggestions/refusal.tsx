import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { QuietLine } from "#app/components/gig/suggestions/quiet-line.tsx";
import { rungTitles } from "#app/components/gig/suggestions/rung-words.ts";
import { Button } from "#app/components/ui/button.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { entryTitles } from "#app/domain/gig/entry-titles.ts";
import { mendsOf } from "#app/domain/gig/freeings.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { infeasibleWords } from "#app/domain/gig/infeasible-words.ts";
import type { LadderStep } from "#app/domain/gig/ladder.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";

type RefusalProps = {
  gig: Gig;
  plan: SetPlan;
  repertoire: Repertoire;
  step: Extract<LadderStep, { kind: "refused" }>;
};

/** A rung that has no order at all: too little may move there, or, told once for all rungs, nothing can be had. */
export function Refusal({ gig, plan, repertoire, step }: RefusalProps) {
  const { edit, may } = usePageTools();
  if (step.rung !== "any-order") {
    if (step.answer.why.some(({ code }) => code !== "moved")) return null;
    return <QuietLine>{rungTitles[step.rung]}: the rules ask for more songs to move.</QuietLine>;
  }
  const title = entryTitles(gig, plan.set.id, repertoire);
  const mends = may.plan ? mendsOf(gig, plan, step.answer, title) : [];
  return (
    <li className="flex flex-col gap-2 border-grey-200 border-t py-2">
      {infeasibleWords(gig, plan, step.answer, repertoire).map((reason) => (
        <Warning key={reason}>{reason}</Warning>
      ))}
      {mends.length > 0 ? (
        <ul aria-label="Free one of them" className="flex flex-col items-start gap-1.5">
          {mends.map(({ name, edits }) => (
            <li key={name} className="max-w-full">
              <Button
                className="max-w-full whitespace-normal text-left lg:min-h-8 lg:px-2.5 lg:text-sm"
                onClick={() => edit(edits, `Free ${name}`)}
              >
                Free {name}
              </Button>
            </li>
          ))}
        </ul>
      ) : null}
    </li>
  );
}
