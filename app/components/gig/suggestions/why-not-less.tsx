import { useMemo, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { usePlannerAnswers } from "#app/components/gig/planner/use-planner-answers.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { Lead } from "#app/domain/gig/lead.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { type Holding, type WhyNotLess as Why, whyNotLess } from "#app/domain/gig/why-not-less.ts";
import { liftsOf } from "#app/domain/gig/why-not-less-lifts.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";

type WhyNotLessProps = {
  gig: Gig;
  plan: SetPlan;
  repertoire: Repertoire;
  lead: Lead;
  /** The best answer in any order. */
  best: FoundAnswer;
};

/** How much the search may do for each thing that is lifted. */
const effort = 100_000;

/** So many things that hold it up stand there at once; the others are asked for. */
const shownAtOnce = 5;

/** What holds the best answer up, asked for by a press: each single thing is lifted in turn, and the set planned anew. */
export function WhyNotLess(props: WhyNotLessProps) {
  const [open, setOpen] = useState(false);
  return (
    <div className="border-grey-200 border-t py-2">
      <button
        type="button"
        aria-expanded={open}
        onClick={() => setOpen(!open)}
        className="min-h-8 font-semibold text-base underline underline-offset-2"
      >
        Why not less?
      </button>
      {open ? <WhatHolds {...props} /> : null}
    </div>
  );
}

function WhatHolds({ gig, plan, repertoire, lead, best }: WhyNotLessProps) {
  const { naming } = usePageTools();
  const [all, setAll] = useState(false);
  const lifts = useMemo(
    () =>
      liftsOf(gig, plan, best, { repertoire, naming }).map((lift) => ({
        lift,
        problem: lift.problem,
        key: JSON.stringify(lift.problem),
        from: { order: best.order, plays: best.plays },
      })),
    [gig, plan, best, repertoire, naming],
  );
  const { known, failed } = usePlannerAnswers(lifts, { effort });
  const tried = lifts.flatMap(({ lift, key }) => {
    const told = known.get(key);
    return told?.done && told.answer ? [{ lift, answer: told.answer }] : [];
  });
  const why = whyNotLess(lead, best, tried);
  const more = why.holding.length - shownAtOnce;
  return (
    <div className="flex flex-col gap-1.5 pt-1 text-sm leading-snug">
      {why.holding.length > 0 ? (
        <ul aria-label="What holds it up" className="flex flex-col gap-1.5">
          {(all ? why.holding : why.holding.slice(0, shownAtOnce)).map((holding) => (
            <HoldingLine key={holding.name} holding={holding} />
          ))}
        </ul>
      ) : null}
      {more > 0 && !all ? (
        <button type="button" onClick={() => setAll(true)} className="w-fit underline underline-offset-2">
          {more} more
        </button>
      ) : null}
      <p role="status" className="text-grey-600">
        {failed ?? endWords(why, lifts.length, best)}
      </p>
    </div>
  );
}

function HoldingLine({ holding: { name, saves, instead, proven } }: { holding: Holding }) {
  const [first, ...others] = saves;
  const more = [...(instead ? [instead] : []), ...others];
  return (
    <li>
      <p className="flex items-baseline gap-3">
        <span className="min-w-0 flex-1">{name}</span>{" "}
        <span className="tabular shrink-0 font-display font-semibold text-base">
          {proven ? "" : "at least "}
          {first}
        </span>
      </p>
      {more.length > 0 ? <p className="text-grey-600">{more.join(", ")}</p> : null}
    </li>
  );
}

/** What is to be said below the list: how far it is, that there is nothing, or what is not known. */
function endWords({ holding, undecided, tried }: Why, lifts: number, best: FoundAnswer): string {
  if (tried < lifts) return `Lifting one thing after another: ${tried} of ${lifts} tried.`;
  const unsure =
    best.status === "optimal" ? [] : ["The best order is not proven, so part of this may be had as it is."];
  if (undecided.length > 0) return [`Not decided: ${undecided.join("; ")}.`, ...unsure].join(" ");
  if (holding.length > 0)
    return ["Each by itself. Nothing else saves anything when lifted alone.", ...unsure].join(" ");
  return ["Nothing single holds it up.", ...unsure].join(" ");
}
