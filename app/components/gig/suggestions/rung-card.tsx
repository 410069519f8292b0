import { useMemo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { RibbonThumbnails } from "#app/components/gig/ribbons/ribbon-thumbnails.tsx";
import type { Described } from "#app/components/gig/suggestions/set-suggestions.tsx";
import { workWords } from "#app/components/gig/suggestions/suggestion-words.ts";
import { Button } from "#app/components/ui/button.tsx";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { planGig, type SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { type Rung, suggestionEdits } from "#app/domain/gig/suggest.ts";

const titles: Record<Rung, string> = {
  "same-order": "Same order, other guitars",
  "any-order": "Any order",
};

const uses: Record<Rung, string> = {
  "same-order": "Use these guitars",
  "any-order": "Use this order",
};

type RungCardProps = {
  gig: Gig;
  plan: SetPlan;
  repertoire: Repertoire;
  described: Described;
  open: boolean;
  onOpen: () => void;
};

/** One suggestion: what it needs against now; opened, what changes, how it looks, and the button that uses it. */
export function RungCard({ gig, plan, repertoire, described, open, onOpen }: RungCardProps) {
  const { rung, said, done } = described;
  return (
    <div className={`border-grey-200 border-t py-3 ${open ? "-ml-5 border-l-4 border-l-ink pl-4" : ""}`}>
      <button
        type="button"
        aria-expanded={open}
        onClick={onOpen}
        className="flex w-full items-baseline gap-3 text-left"
      >
        <span className="min-w-0 flex-1 font-semibold text-lg leading-tight">{titles[rung]}</span>
        <span className="tabular shrink-0 font-semibold text-xl">{Math.round(said.totals.exposed)} s</span>
      </button>
      <p className="font-display text-[15px] text-grey-600">
        {Math.round(said.saved) > 0 ? `${Math.round(said.saved)} s less. ` : ""}
        {workWords(said.totals)}
      </p>
      {open ? <Opened gig={gig} plan={plan} repertoire={repertoire} described={described} /> : null}
      <p className="pt-1 text-grey-600 text-sm">{done ? said.certainty : "Still looking for less."}</p>
    </div>
  );
}

function Opened({ gig, plan, repertoire, described }: Omit<RungCardProps, "open" | "onOpen">) {
  const { edit, may, naming } = usePageTools();
  const { rung, answer, said } = described;
  const edits = useMemo(() => suggestionEdits(gig, plan, answer), [gig, plan, answer]);
  const after = useMemo(() => {
    const applied = applyEdits(gig, edits);
    if (!applied.ok) return null;
    return planGig(applied.gig, repertoire, naming).sets.find((one) => one.set.id === plan.set.id) ?? null;
  }, [gig, edits, repertoire, naming, plan.set.id]);
  const mayUse = rung === "same-order" ? may.prepare : may.plan;
  return (
    <div className="flex flex-col gap-3 py-2">
      {mayUse ? (
        <Button
          look="primary"
          className="self-start lg:min-h-9"
          onClick={() => edit(edits, `${titles[rung]} in ${plan.set.name}`)}
        >
          {uses[rung]}
        </Button>
      ) : null}
      {after ? <RibbonThumbnails before={plan} after={after} guitars={repertoire.guitars} /> : null}
      <Changes changes={[...said.moves, ...said.changes]} />
    </div>
  );
}

/** So many changes stand there at once; the rest is asked for. */
const shownAtOnce = 5;

function Changes({ changes }: { changes: string[] }) {
  const more = changes.slice(shownAtOnce);
  return (
    <div className="text-grey-800 text-sm leading-snug">
      <ul className="flex flex-col gap-0.5">
        {changes.slice(0, shownAtOnce).map((words) => (
          <li key={words} className="pl-3 -indent-3">
            {words}
          </li>
        ))}
      </ul>
      {more.length > 0 ? (
        <details className="pt-0.5">
          <summary className="w-fit underline underline-offset-2">
            {more.length === 1 ? "1 more change" : `${more.length} more changes`}
          </summary>
          <ul className="flex flex-col gap-0.5 pt-0.5">
            {more.map((words) => (
              <li key={words} className="pl-3 -indent-3">
                {words}
              </li>
            ))}
          </ul>
        </details>
      ) : null}
    </div>
  );
}
