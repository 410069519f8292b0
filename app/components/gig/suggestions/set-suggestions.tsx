import { useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { RungCard } from "#app/components/gig/suggestions/rung-card.tsx";
import type { RungState } from "#app/components/gig/suggestions/use-suggestions.ts";
import { Warning } from "#app/components/ui/warning.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import { infeasibleWords } from "#app/domain/gig/infeasible-words.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { describeSuggestion, isFound, type Rung, type Suggested } from "#app/domain/gig/suggest.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";

type SetSuggestionsProps = {
  gig: Gig;
  plan: SetPlan;
  /** The gig has no other set, so this one need not be named. */
  alone: boolean;
  repertoire: Repertoire;
  rungs: RungState[];
  begun: boolean;
};

/** A rung with what it would change and gain. */
export type Described = { rung: Rung; answer: FoundAnswer; said: Suggested; done: boolean };

function heldWords({ set, rows }: SetPlan): string {
  const ends = [set.holdFirst ? "first" : null, set.holdLast ? "last" : null].filter(Boolean);
  if (rows.length < 2 || ends.length === 0) return "";
  return ` ${ends.join(" and ").replace(/^./, (letter) => letter.toUpperCase())} song held.`;
}

/** Suggestions for one set. Folded to one line where nothing is gained. */
export function SetSuggestionsBlock({ gig, plan, alone, repertoire, rungs, begun }: SetSuggestionsProps) {
  const { naming } = usePageTools();
  const [opened, setOpened] = useState<Rung | "none" | null>(null);
  const found: Described[] = rungs.flatMap(({ rung, answer, done }) =>
    answer && isFound(answer)
      ? [{ rung, answer, done, said: describeSuggestion(gig, plan, { answer, rung, repertoire, naming }) }]
      : [],
  );
  const refused = rungs.flatMap(({ answer }) => (answer && !isFound(answer) ? [answer] : []));
  const reasons = [...new Set(refused.flatMap((answer) => infeasibleWords(gig, plan, answer, repertoire)))];
  const gaining = found.filter(({ said }) => said.gains);
  const working = rungs.some((rung) => !rung.done);
  const open = opened ?? gaining.at(-1)?.rung ?? "none";
  const now = Math.round(plan.totals.exposed);
  return (
    <section className="flex flex-col">
      {alone ? null : <h3 className="font-semibold text-lg leading-tight">{plan.set.name}</h3>}
      <p className="pb-2 text-grey-600 leading-snug">
        Now {now} s of dead air.{heldWords(plan)}
      </p>
      {reasons.map((reason) => (
        <Warning key={reason}>{reason}</Warning>
      ))}
      {gaining.map((rung) => (
        <RungCard
          key={rung.rung}
          gig={gig}
          plan={plan}
          repertoire={repertoire}
          described={rung}
          open={open === rung.rung}
          onOpen={() => setOpened(open === rung.rung ? "none" : rung.rung)}
        />
      ))}
      {working && begun ? (
        <p className="border-grey-200 border-t py-2 text-grey-600">Looking for less retuning</p>
      ) : null}
      {!working && gaining.length === 0 && reasons.length === 0 ? <NothingLess found={found} /> : null}
    </section>
  );
}

/** That nothing better is known, and how sure that is. */
function NothingLess({ found }: { found: Described[] }) {
  const any = found.find(({ rung }) => rung === "any-order");
  return (
    <p className="border-grey-200 border-t py-2 text-grey-600">
      {any?.said.proven
        ? "Nothing needs less than this order: proven."
        : `Nothing better was found. ${any?.said.certainty ?? ""}`}
    </p>
  );
}
