import { type ReactNode, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { RibbonThumbnails } from "#app/components/gig/ribbons/ribbon-thumbnails.tsx";
import { ChangeList } from "#app/components/gig/suggestions/change-list.tsx";
import { OutcomeTable } from "#app/components/gig/what-if/outcome-table.tsx";
import type { Outcomes } from "#app/components/gig/what-if/use-outcomes.ts";
import { useUsed } from "#app/components/gig/what-if/used-context.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { actionFor } from "#app/domain/gig/edit.ts";
import type { Needs } from "#app/domain/gig/what-if/needs.ts";
import type { Outcome } from "#app/domain/gig/what-if/outcome.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** So many changes of an answer stand there at once. */
const changesAtOnce = 5;

type AnswersProps = {
  found: Outcomes;
  now: Needs;
  nowName?: string;
  names?: Partial<Record<Outcome["kind"], string>>;
  /** The act's guitars, with those that are only supposed. */
  guitars: (outcome: Outcome) => Guitar[];
  /** What undo calls it; null where it takes more than the gig to have it so. */
  use: ((outcome: Outcome) => string) | null;
  /** What re-planning without it is called, where that is to be told: "Without it". */
  unsupposed?: string;
  /** What the question itself has to say about an answer, above everything else. */
  head?: (outcome: Outcome) => ReactNode;
  /** The next step where it cannot simply be used. */
  next?: ReactNode;
};

/** The answers to a question: what each needs beside the present plan, and all about the one that is chosen. */
export function Answers(props: AnswersProps) {
  const { found, now, nowName, names, guitars, use, unsupposed, head, next } = props;
  const { outcomes, refused, working, failed } = found;
  const [picked, setPicked] = useState<Outcome["kind"] | null>(null);
  const least = outcomes.toSorted((a, b) => a.needs.total - b.needs.total)[0];
  const spare = outcomes.find(({ kind, unplayable }) => kind === "spare" && unplayable.length === 0);
  const chosen = outcomes.find(({ kind }) => kind === picked) ?? spare ?? least ?? null;
  return (
    <div className="flex flex-col gap-3">
      {failed ? <Warning>{failed}</Warning> : null}
      {refused.map((reason) => (
        <Warning key={reason}>{reason}</Warning>
      ))}
      {outcomes.length > 0 ? (
        <OutcomeTable
          now={now}
          nowName={nowName}
          outcomes={outcomes}
          names={names}
          chosen={chosen?.kind ?? null}
          onChoose={setPicked}
        />
      ) : null}
      <p role="status" className="text-grey-600 text-sm empty:hidden">
        {working && !failed ? "Working it out" : ""}
      </p>
      {unsupposed ? <Unsupposed name={unsupposed} found={found} chosen={chosen} /> : null}
      {chosen ? (
        <Chosen outcome={chosen} now={now} guitars={guitars(chosen)} use={use} head={head} next={next} />
      ) : null}
    </div>
  );
}

const inOrder: Partial<Record<Outcome["kind"], string>> = {
  "same-order": "in this order",
  "any-order": "in any order",
};

type UnsupposedProps = { name: string; found: Outcomes; chosen: Outcome | null };

/** What re-planning alone would do, so that nobody takes its gain for that of a guitar or a capo. */
function Unsupposed({ name, found, chosen }: UnsupposedProps) {
  const { unsupposed } = found;
  if (unsupposed.length === 0) return null;
  const told = unsupposed.map(({ kind, needs }) => `${Math.round(needs.exposed)} s ${inOrder[kind]}`);
  const same = unsupposed.find(({ kind }) => kind === chosen?.kind);
  const equal = same && chosen && Math.abs(same.needs.total - chosen.needs.total) < 1e-6;
  return (
    <p className="text-sm leading-snug">
      {name}: {told.join(", ")}.{equal ? " No difference to this answer." : ""}
    </p>
  );
}

type ChosenProps = {
  outcome: Outcome;
  now: Needs;
  guitars: Guitar[];
} & Pick<AnswersProps, "use" | "head" | "next">;

function Chosen({ outcome, now, guitars, use, head, next }: ChosenProps) {
  const { needs, sets, changes, unplayable, strain, certainty, done, kind } = outcome;
  const changed = sets.filter(({ before, after }) => before.rows.length > 0 || after.rows.length > 0);
  return (
    <div className="flex flex-col gap-3">
      {head?.(outcome)}
      {unplayable.length > 0 ? (
        <Warning>No guitar for {unplayable.join(", ")}. Take it out, or borrow one.</Warning>
      ) : null}
      {use ? <UseIt outcome={outcome} label={use(outcome)} /> : null}
      {next}
      {strain ? <Caution /> : null}
      {changed.map(({ before, after }) => (
        <div key={before.set.id} className="flex flex-col gap-1">
          {changed.length > 1 ? <h4 className="font-semibold text-base">{before.set.name}</h4> : null}
          <RibbonThumbnails before={before} after={after} guitars={guitars} />
        </div>
      ))}
      <ChangeList changes={changes} atOnce={changesAtOnce} />
      {now.wishes > 0 || needs.wishes > 0 ? (
        <p className="text-grey-800 text-sm leading-snug">
          Broken wishes count as {Math.round(needs.wishes)} s then, {Math.round(now.wishes)} s now.
        </p>
      ) : null}
      {kind === "as-it-is" || kind === "spare" ? null : (
        <p className="text-grey-600 text-sm">{done ? certainty : "Still looking for less."}</p>
      )}
    </div>
  );
}

function UseIt({ outcome, label }: { outcome: Outcome; label: string }) {
  const { edit, may } = usePageTools();
  const used = useUsed();
  const { edits } = outcome;
  if (edits.length === 0) return null;
  const allowed = edits.every((one) => (actionFor(one) === "plan" ? may.plan : may.prepare));
  if (!allowed) {
    return may.prepare ? (
      <p className="text-grey-600 text-sm">This changes the order or the gig: a performer can use it.</p>
    ) : null;
  }
  return (
    <Button
      look="primary"
      className="self-start max-lg:min-h-12 lg:min-h-9"
      onClick={() => {
        edit(edits, label);
        used(label);
      }}
    >
      Use this
    </Button>
  );
}

/** What to mind where strings are raised, or fitted for another tuning. */
export function Caution({ quiet = false }: { quiet?: boolean }) {
  const words =
    "Wear eye protection while a string is raised or fitted. A qualified repairer decides what the instrument bears.";
  return quiet ? <p className="text-grey-600 text-sm leading-snug">{words}</p> : <Warning>{words}</Warning>;
}
