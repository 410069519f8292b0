import { DndContext } from "@dnd-kit/core";
import { useId, useRef } from "react";
import { PageToolsProvider } from "#app/components/gig/desk/page-context.tsx";
import { type GigDeskProps, useGigDesk } from "#app/components/gig/desk/use-gig-desk.ts";
import { useShownPlan } from "#app/components/gig/desk/use-shown-plan.ts";
import { ConflictDialog } from "#app/components/gig/dialogs/conflict-dialog.tsx";
import { GigDialogs } from "#app/components/gig/dialogs/gig-dialogs.tsx";
import { dragInstructions } from "#app/components/gig/drag/drag-words.ts";
import { DraggedRow } from "#app/components/gig/drag/dragged-row.tsx";
import { useFlip } from "#app/components/gig/drag/use-flip.ts";
import { useRowMoves } from "#app/components/gig/drag/use-row-moves.ts";
import { BottomBar } from "#app/components/gig/header/bottom-bar.tsx";
import { GigHeader } from "#app/components/gig/header/gig-header.tsx";
import { useHistoryKeys } from "#app/components/gig/header/history-buttons.tsx";
import { LiveTotals } from "#app/components/gig/header/live-totals.tsx";
import { planWarnings } from "#app/components/gig/header/plan-warnings.ts";
import { LiveSaveState } from "#app/components/gig/header/save-state.tsx";
import { NeckChooser } from "#app/components/gig/rows/neck-chooser.tsx";
import { RowMenu } from "#app/components/gig/rows/row-menu.tsx";
import { AddSet } from "#app/components/gig/sets/add-set.tsx";
import { partsOf } from "#app/components/gig/sets/moves.ts";
import { SetBlock } from "#app/components/gig/sets/set-block.tsx";
import { SuggestionsDialog, SuggestionsPanel } from "#app/components/gig/suggestions/suggestions-panel.tsx";
import { useSuggestions } from "#app/components/gig/suggestions/use-suggestions.ts";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { Warning } from "#app/components/ui/warning.tsx";

/** Silences dnd-kit's own announcements: what happens is said in our words below. */
const unsaid = {
  onDragStart: () => undefined,
  onDragOver: () => undefined,
  onDragEnd: () => undefined,
  onDragCancel: () => undefined,
};

/** The gig on the desk: header, sets with their ribbons, suggestions, and what opens above them. */
export function GigDesk(props: GigDeskProps) {
  const { repertoire, reader } = props;
  const desk = useGigDesk(props);
  const { edits, tools, latest, setDialog } = desk;
  const asideId = useId();
  const list = useRef<HTMLDivElement>(null);
  const { drag, said, sensors, handlers } = useRowMoves(list, latest);
  const { gig, plan, kept } = useShownPlan(edits.gig, repertoire, reader.naming, drag);
  const parts = partsOf(gig, desk.openEncores);
  const order = plan.sets.flatMap((set) => set.rows.map((row) => row.entry.id)).join();
  useFlip(list, order, drag !== null);
  useHistoryKeys(edits.undo, edits.redo);
  const suggestions = useSuggestions(kept);
  const draggedSet = plan.sets.find((set) => set.rows.some((row) => row.entry.id === drag?.entryId));
  const draggedRow = draggedSet?.rows.find((row) => row.entry.id === drag?.entryId);
  const save = { status: edits.status, pending: edits.pendingCount };
  const history = { undoLabel: edits.canUndo, redoLabel: edits.canRedo, undo: edits.undo, redo: edits.redo };
  const panel = { gig: edits.gig, plan: kept, repertoire, suggestions };

  return (
    <PageToolsProvider value={tools}>
      <DndContext
        id={useId()}
        sensors={sensors}
        {...handlers}
        accessibility={{
          announcements: unsaid,
          screenReaderInstructions: { draggable: dragInstructions },
          restoreFocus: false,
        }}
      >
        <GigHeader
          gig={gig}
          plan={plan}
          before={drag ? kept.totals : null}
          paper={reader.paper}
          save={save}
          history={tools.may.prepare ? history : null}
          onDetails={tools.may.plan ? () => setDialog({ kind: "details" }) : null}
          onSuggestions={() => setDialog({ kind: "suggestions" })}
        />
        <div className="min-[85rem]:grid min-[85rem]:grid-cols-[minmax(0,1fr)_240px] min-[90rem]:grid-cols-[minmax(0,1fr)_264px]">
          <div ref={list} className="min-w-0 pb-28 lg:px-6 lg:pb-10">
            <div role="alert">
              {edits.notice ? <Warning className="px-4 py-2 lg:px-0">{edits.notice}</Warning> : null}
            </div>
            {repertoire.guitars.length === 0 ? <NoGuitars mayAdd={tools.may.prepare} /> : null}
            <PlanWarnings warnings={planWarnings(gig, plan)} />
            {plan.sets.map((setPlan, index) => (
              <SetBlock
                key={setPlan.set.id}
                gig={gig}
                plan={setPlan}
                first={index === 0}
                parts={parts.filter((part) => part.setId === setPlan.set.id)}
                repertoire={repertoire}
                standing={desk.standing}
                draggedId={drag?.entryId ?? null}
                onAdd={desk.add}
              />
            ))}
            {tools.may.plan ? <AddSet gig={gig} /> : null}
            {plan.note ? <p className="px-4 pt-3 text-grey-600 lg:px-0">{plan.note}</p> : null}
          </div>
          <aside
            aria-labelledby={asideId}
            className="sticky top-[81px] hidden h-[calc(100dvh-81px)] overflow-y-auto border-grey-200 border-l bg-white py-5 pr-4 pl-5 min-[85rem]:block"
          >
            <h2 id={asideId} className="pb-1 font-semibold text-xl leading-tight">
              Less retuning
            </h2>
            <SuggestionsPanel {...panel} />
          </aside>
        </div>
        <BottomBar
          gigId={gig.id}
          paper={reader.paper}
          pending={edits.pendingCount}
          onAdd={tools.may.plan ? () => setDialog({ kind: "add", setId: plan.sets[0]!.set.id }) : null}
          onSuggestions={() => setDialog({ kind: "suggestions" })}
        />
        <DraggedRow row={draggedRow ?? null} set={draggedSet?.set ?? null} />
      </DndContext>
      <RowMenu gig={edits.gig} parts={parts} titleOf={desk.titleOf} />
      <NeckChooser gig={edits.gig} repertoire={repertoire} />
      <GigDialogs
        open={desk.dialog}
        gig={edits.gig}
        repertoire={repertoire}
        parts={parts}
        standing={desk.standing}
        titleOf={desk.titleOf}
        edit={edits.edit}
        onAdd={desk.add}
        onClose={() => setDialog(null)}
      />
      {desk.dialog?.kind === "suggestions" ? (
        <SuggestionsDialog {...panel} onClose={() => setDialog(null)} />
      ) : null}
      <ConflictDialog troubles={edits.conflicts} keepMine={edits.keepMine} keepTheirs={edits.keepTheirs} />
      <LiveTotals totals={kept.totals} />
      <LiveSaveState {...save} />
      <p role="status" aria-live="assertive" className="sr-only">
        {said}
      </p>
    </PageToolsProvider>
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
