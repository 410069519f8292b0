import { QuietLine } from "#app/components/gig/suggestions/quiet-line.tsx";
import { rungTitles } from "#app/components/gig/suggestions/rung-words.ts";
import { Warning } from "#app/components/ui/warning.tsx";
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
  if (step.rung !== "any-order") {
    if (step.answer.why.some(({ code }) => code !== "moved")) return null;
    return <QuietLine>{rungTitles[step.rung]}: the rules ask for more songs to move.</QuietLine>;
  }
  return (
    <li className="flex flex-col gap-1 border-grey-200 border-t py-2">
      {infeasibleWords(gig, plan, step.answer, repertoire).map((reason) => (
        <Warning key={reason}>{reason}</Warning>
      ))}
    </li>
  );
}
