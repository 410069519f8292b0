import { useMemo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { RibbonThumbnails } from "#app/components/gig/ribbons/ribbon-thumbnails.tsx";
import { ChangeList } from "#app/components/gig/suggestions/change-list.tsx";
import type { Described } from "#app/components/gig/suggestions/described.ts";
import { rungTitles } from "#app/components/gig/suggestions/rung-words.ts";
import { Button } from "#app/components/ui/button.tsx";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { planGig, type SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { suggestionEdits } from "#app/domain/gig/suggest.ts";
import { wishBreaches } from "#app/domain/gig/wish-words.ts";
import type { Totals } from "#app/domain/planning/answer.ts";

type RungDetailsProps = { gig: Gig; plan: SetPlan; repertoire: Repertoire; described: Described };

/** What a suggestion changes, how it looks before and after, and the button that uses it. */
export function RungDetails({ gig, plan, repertoire, described }: RungDetailsProps) {
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
    <div className="flex flex-col gap-2 py-1.5">
      <Against now={plan.evaluation.totals} then={answer.totals} />
      {mayUse ? (
        <Button
          look="primary"
          className="self-start lg:min-h-9"
          onClick={() => edit(edits, `${rungTitles[rung]} in ${plan.set.name}`)}
        >
          {rung === "same-order" ? "Use these guitars" : "Use this order"}
        </Button>
      ) : null}
      {after ? <RibbonThumbnails before={plan} after={after} guitars={repertoire.guitars} /> : null}
      <Changes changes={[...said.moves, ...said.changes]} />
      {after ? <BrokenWishes gig={gig} after={after} /> : null}
    </div>
  );
}

/** The wishes that this order breaks, with the song that each is told about. */
function BrokenWishes({ gig, after }: { gig: Gig; after: SetPlan }) {
  const { naming } = usePageTools();
  const played = after.rows.filter((row) => row.left === null);
  const breaches = wishBreaches(after.evaluation.broken ?? [], gig.wishes, played, naming);
  if (breaches.length === 0) return null;
  const title = (id: string) => played.find((row) => row.entry.id === id)?.song?.title ?? "A song";
  return (
    <div className="text-grey-800 text-sm leading-snug">
      <p>Wishes broken</p>
      <ul className="flex flex-col gap-0.5">
        {breaches.map(({ entryId, message }) => (
          <li key={`${entryId} ${message}`} className="pl-3 -indent-3">
            {title(entryId)}: {message.replace(/^./, (letter) => letter.toLowerCase())}
          </li>
        ))}
      </ul>
    </div>
  );
}

const figures = [
  ["exposed", "s dead air"],
  ["strings", "strings"],
  ["capoActions", "capo"],
  ["swaps", "guitars"],
] as const;

function signed(change: number): string {
  return change > 0 ? `+${change}` : change < 0 ? `−${-change}` : "±0";
}

/** Dead air and counts, each with how much it differs from now. */
function Against({ now, then }: { now: Totals; then: Totals }) {
  return (
    <dl className="grid grid-cols-4 gap-x-2">
      {figures.map(([key, label]) => (
        <div key={key} className="flex flex-col-reverse justify-end">
          <dt className="truncate font-display font-medium text-grey-600 text-sm leading-tight">{label}</dt>
          <dd className="tabular font-display font-semibold leading-tight">
            {Math.round(then[key])}{" "}
            <span className="font-medium text-grey-600 text-sm">
              {signed(Math.round(then[key]) - Math.round(now[key]))}
            </span>
          </dd>
        </div>
      ))}
    </dl>
  );
}

/** So many letters of changes stand there at once; the rest is asked for. */
const mostLetters = 150;
function Changes({ changes }: { changes: string[] }) {
  let letters = 0;
  const fitting = changes.filter((words, index) => {
    letters += words.length;
    return index === 0 || letters <= mostLetters;
  });
  return <ChangeList changes={changes} atOnce={fitting.length} />;
}
