import { ClosingLine } from "#app/components/gig/suggestions/closing-line.tsx";
import type { Described } from "#app/components/gig/suggestions/described.ts";
import { RungDetails } from "#app/components/gig/suggestions/rung-details.tsx";
import { closingOf, rungTitles } from "#app/components/gig/suggestions/rung-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { type Lead, leadOf } from "#app/domain/gig/lead.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { leadChange, leadFigure, workWords } from "#app/domain/gig/saved-words.ts";

type RungCardProps = {
  gig: Gig;
  plan: SetPlan;
  repertoire: Repertoire;
  lead: Lead;
  described: Described;
  open: boolean;
  onOpen: () => void;
};

/** One suggestion: what it needs against now; opened, what changes, how it looks, and the button that uses it. */
export function RungCard({ gig, plan, repertoire, lead, described, open, onOpen }: RungCardProps) {
  const { rung, answer, said, done } = described;
  const { value, unit } = leadFigure(lead, answer);
  const change = leadChange(lead, plan.evaluation, answer);
  const [first, ...others] = [...said.moves, ...said.changes];
  return (
    <li className={`border-grey-200 border-t py-2 ${open ? "-ml-5 border-l-4 border-l-ink pl-4" : ""}`}>
      <button
        type="button"
        aria-expanded={open}
        onClick={onOpen}
        className="flex w-full items-baseline gap-2 text-left"
      >
        <span className="min-w-0 flex-1 font-semibold text-lg leading-tight">{rungTitles[rung]}</span>
        {change ? (
          <span className="tabular font-display text-[15px] text-grey-600">
            <span aria-hidden="true">{change}</span>
            <span className="sr-only">, {said.saved[0]},</span>
          </span>
        ) : null}
        <span className="tabular shrink-0 font-semibold text-xl leading-tight">
          {value} <span className={lead === "dead-air" ? "" : "font-medium text-base"}>{unit}</span>
        </span>
      </button>
      {open ? (
        <RungDetails gig={gig} plan={plan} repertoire={repertoire} described={described} />
      ) : (
        <>
          <p className="font-display text-[15px] text-grey-600 leading-snug">{workWords(lead, answer)}</p>
          <p className="flex items-baseline gap-2 text-sm">
            <span className="min-w-0 flex-1 truncate text-grey-800">
              {first}
              {others.length > 0 ? `, ${others.length} more` : ""}
            </span>
            {done ? (
              <span className="text-grey-600">{answer.status === "optimal" ? "proven" : "not proven"}</span>
            ) : null}
          </p>
        </>
      )}
      {done ? null : (
        <ClosingLine closing={closingOf(lead, plan.problem, answer)} now={leadOf(lead, plan.evaluation)} />
      )}
      {done && open ? <p className="text-grey-600 text-sm leading-snug">{said.certainty}</p> : null}
    </li>
  );
}
