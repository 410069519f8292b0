import { type ReactNode, useMemo, useRef } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import type { GigDeskProps, useGigDesk } from "#app/components/gig/desk/use-gig-desk.ts";
import { useShownPlan } from "#app/components/gig/desk/use-shown-plan.ts";
import { DraggedRow } from "#app/components/gig/drag/dragged-row.tsx";
import { RowGrips } from "#app/components/gig/drag/grip.tsx";
import { useFlip } from "#app/components/gig/drag/use-flip.ts";
import { useRowMoves } from "#app/components/gig/drag/use-row-moves.ts";
import { GigHeader } from "#app/components/gig/header/gig-header.tsx";
import { planWarnings } from "#app/components/gig/header/plan-warnings.ts";
import { AddSet } from "#app/components/gig/sets/add-set.tsx";
import { partsOf } from "#app/components/gig/sets/moves.ts";
import { SetBlock } from "#app/components/gig/sets/set-block.tsx";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";

type LiveGigProps = {
  desk: ReturnType<typeof useGigDesk>;
  /** What the gig costs as it is kept. */
  kept: GigPlan;
  repertoire: Repertoire;
  reader: GigDeskProps["reader"];
  /** What stands beside the sets. It stays as it is while a row is dragged. */
  children: ReactNode;
};

/**
 * What follows a row while it is dragged: the header's figures and the sets with their ribbons. Apart from the rest of
 * the desk, so that a move of the pointer draws nothing else again.
 */
export function LiveGig({ desk, kept, repertoire, reader, children }: LiveGigProps) {
  const { edits, latest, setDialog } = desk;
  const { may } = usePageTools();
  const list = useRef<HTMLDivElement>(null);
  const { drag, said, handlers, picture, landing } = useRowMoves(list, latest);
  const shown = useShownPlan({ gig: edits.gig, kept, repertoire, naming: reader.naming }, drag);
  const { gig, plan } = shown;
  const parts = useMemo(() => partsOf(gig, desk.openEncores), [gig, desk.openEncores]);
  const keptPlaces = useMemo(() => {
    const rows = kept.sets.flatMap((set) => set.rows);
    return new Map(rows.map((row, index) => [row.entry.id, index]));
  }, [kept]);
  const order = plan.sets.flatMap((set) => set.rows.map((row) => row.entry.id)).join();
  useFlip(list, order, drag !== null, landing);
  const history = { undoLabel: edits.canUndo, redoLabel: edits.canRedo, undo: edits.undo, redo: edits.redo };
  const draggedSet = plan.sets.find((set) => set.rows.some((row) => row.entry.id === drag?.entryId));
  const draggedRow = draggedSet?.rows.find((row) => row.entry.id === drag?.entryId);
  return (
    <>
      <GigHeader
        gig={gig}
        plan={plan}
        before={drag ? kept.totals : null}
        paper={reader.paper}
        save={{ status: edits.status, pending: edits.pendingCount }}
        history={may.prepare ? history : null}
        onDetails={may.plan ? () => setDialog({ kind: "details" }) : null}
        onSuggestions={() => setDialog({ kind: "suggestions" })}
        onWhatIf={() => setDialog({ kind: "what-if" })}
      />
      <div className="min-[85rem]:grid min-[85rem]:grid-cols-[minmax(0,1fr)_240px] min-[90rem]:grid-cols-[minmax(0,1fr)_264px]">
        <div ref={list} className="min-w-0 pb-28 lg:px-6 lg:pb-10">
          <div role="alert">
            {edits.notice ? <Warning className="px-4 py-2 lg:px-0">{edits.notice}</Warning> : null}
          </div>
          {repertoire.guitars.length === 0 ? <NoGuitars mayAdd={may.prepare} /> : null}
          <PlanWarnings warnings={planWarnings(gig, plan)} />
          <RowGrips handlers={handlers}>
            {plan.sets.map((setPlan, index) => (
              <SetBlock
                key={setPlan.set.id}
                gig={edits.gig}
                plan={setPlan}
                first={index === 0}
                allParts={parts}
                repertoire={repertoire}
                standing={desk.standing}
                drag={drag}
                keptPlaces={keptPlaces}
                onAdd={desk.add}
              />
            ))}
          </RowGrips>
          {may.plan ? <AddSet gig={edits.gig} /> : null}
          {plan.note ? <p className="px-4 pt-3 text-grey-600 lg:px-0">{plan.note}</p> : null}
        </div>
        {children}
      </div>
      {drag?.lifted && draggedSet && draggedRow ? (
        <DraggedRow row={draggedRow} set={draggedSet.set} lifted={drag.lifted} picture={picture} />
      ) : null}
      <p role="status" aria-live="assertive" className="sr-only">
        {said}
      </p>
    </>
  );
}

function PlanWarnings({ warnings }: { warnings: string[] }) {
  if (warnings.length === 0) return null;
  return (
    <div className="flex flex-col gap-1 px-4 py-2 lg:flex-row lg:flex-wrap lg:gap-x-6 lg:px-0">
      {warnings.map((words) => (
        <Warning key={words}>{words}</Warning>
      ))}
    </div>
  );
}

/** Without a guitar nothing can be reckoned: the next step, said once. */
function NoGuitars({ mayAdd }: { mayAdd: boolean }) {
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-2 px-4 py-3 lg:px-0">
      <p>The act has no guitars yet, so no gap can be reckoned.</p>
      {mayAdd ? (
        <ButtonLink to="/guitars/new" small>
          Add a guitar
        </ButtonLink>
      ) : null}
    </div>
  );
}
