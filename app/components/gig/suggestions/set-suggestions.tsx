import { useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { ClosingLine } from "#app/components/gig/suggestions/closing-line.tsx";
import { QuietLine } from "#app/components/gig/suggestions/quiet-line.tsx";
import { Refusal } from "#app/components/gig/suggestions/refusal.tsx";
import { RungCard } from "#app/components/gig/suggestions/rung-card.tsx";
import { closingOf, foldedWords, rungTitles } from "#app/components/gig/suggestions/rung-words.ts";
import { WhyNotLess } from "#app/components/gig/suggestions/why-not-less.tsx";
import { certaintyWords } from "#app/domain/gig/certainty.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { type LadderStep, ladderOf, type RungKnown } from "#app/domain/gig/ladder.ts";
import { type Lead, leadOf } from "#app/domain/gig/lead.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Rung } from "#app/domain/gig/rungs.ts";
import { leadFigure } from "#app/domain/gig/saved-words.ts";
import { describeSuggestion, isFound } from "#app/domain/gig/suggest.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";

type SetSuggestionsProps = {
  gig: Gig;
  plan: SetPlan;
  /** The gig has no other set, so this one need not be named. */
  alone: boolean;
  repertoire: Repertoire;
  lead: Lead;
  rungs: RungKnown[];
  begun: boolean;
};

function nowWords({ set, rows, evaluation }: SetPlan, lead: Lead): string {
  const { value, unit } = leadFigure(lead, evaluation);
  const what = lead === "dead-air" ? "s of dead air" : unit;
  const ends = [set.holdFirst ? "first" : null, set.holdLast ? "last" : null].filter(Boolean);
  if (rows.length < 2 || ends.length === 0) return `Now ${value} ${what}.`;
  return `Now ${value} ${what}. ${ends.join(" and ").replace(/^./, (letter) => letter.toUpperCase())} song held.`;
}

/** The best answer in any order, once nothing better will come. */
function bestOf(rungs: readonly RungKnown[]): FoundAnswer | null {
  const last = rungs.find(({ rung }) => rung === "any-order");
  return last?.done && last.answer && isFound(last.answer) ? last.answer : null;
}

/** Suggestions for one set, cheapest first. Rungs that gain nothing over those before them are folded to a line. */
export function SetSuggestionsBlock(props: SetSuggestionsProps) {
  const { gig, plan, alone, repertoire, lead, rungs, begun } = props;
  const { naming } = usePageTools();
  const [opened, setOpened] = useState<Rung | "none" | null>(null);
  const steps = ladderOf(plan.evaluation, rungs);
  const first = steps.find((step) => step.kind === "gains");
  const open = opened ?? first?.rung ?? "none";
  const running = steps.find((step) => step.kind === "looking" || (step.kind === "gains" && !step.done));
  const best = bestOf(rungs);
  const now = leadOf(lead, plan.evaluation);

  const drawn = (step: LadderStep) => {
    switch (step.kind) {
      case "gains":
        return (
          <RungCard
            key={step.rung}
            gig={gig}
            plan={plan}
            repertoire={repertoire}
            lead={lead}
            described={{
              ...step,
              said: describeSuggestion(gig, plan, { ...step, lead, repertoire, naming }),
            }}
            open={open === step.rung}
            onOpen={() => setOpened(open === step.rung ? "none" : step.rung)}
          />
        );
      case "folded": {
        const last = step.rungs.at(-1)!;
        const nothing = !first && last === "any-order";
        return (
          <QuietLine key={last}>
            {nothing ? "Nothing better than the set as it stands." : foldedWords(step.rungs)}{" "}
            {certaintyWords(plan.problem, step.best, last, lead)}
          </QuietLine>
        );
      }
      case "refused":
        return <Refusal key={step.rung} gig={gig} plan={plan} repertoire={repertoire} step={step} />;
      case "looking":
        if (step !== running || !begun) return null;
        return (
          <QuietLine key={step.rung}>
            {rungTitles[step.rung]}: looking for less.
            {step.best ? <ClosingLine closing={closingOf(lead, plan.problem, step.best)} now={now} /> : null}
          </QuietLine>
        );
    }
  };

  return (
    <section aria-label={`Less retuning in ${plan.set.name}`} className="flex flex-col">
      {alone ? null : <h3 className="font-semibold text-lg leading-tight">{plan.set.name}</h3>}
      <p className="pb-2 text-grey-600 text-sm leading-snug">{nowWords(plan, lead)}</p>
      <ol>{steps.map(drawn)}</ol>
      {best ? <WhyNotLess gig={gig} plan={plan} repertoire={repertoire} lead={lead} best={best} /> : null}
    </section>
  );
}
