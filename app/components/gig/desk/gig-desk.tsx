import { useMemo } from "react";
import { LiveGig } from "#app/components/gig/desk/live-gig.tsx";
import { PageToolsProvider } from "#app/components/gig/desk/page-context.tsx";
import { SidePanel } from "#app/components/gig/desk/side-panel.tsx";
import { type GigDeskProps, useGigDesk } from "#app/components/gig/desk/use-gig-desk.ts";
import { ConflictDialog } from "#app/components/gig/dialogs/conflict-dialog.tsx";
import { GigDialogs } from "#app/components/gig/dialogs/gig-dialogs.tsx";
import { BottomBar } from "#app/components/gig/header/bottom-bar.tsx";
import { useHistoryKeys } from "#app/components/gig/header/history-buttons.tsx";
import { LiveTotals } from "#app/components/gig/header/live-totals.tsx";
import { LiveSaveState } from "#app/components/gig/header/save-state.tsx";
import { NeckChooser } from "#app/components/gig/rows/neck-chooser.tsx";
import { RowMenu } from "#app/components/gig/rows/row-menu.tsx";
import { partsOf } from "#app/components/gig/sets/moves.ts";
import { SuggestionsDialog } from "#app/components/gig/suggestions/suggestions-panel.tsx";
import { useSuggestions } from "#app/components/gig/suggestions/use-suggestions.ts";
import { WhatIfDialog } from "#app/components/gig/what-if/what-if-section.tsx";
import { planGig } from "#app/domain/gig/plan.ts";

/** The gig on the desk: header, sets with their ribbons, suggestions, and what opens above them. */
export function GigDesk(props: GigDeskProps) {
  const { repertoire, reader } = props;
  const desk = useGigDesk(props);
  const { edits, tools, setDialog } = desk;
  const { gig } = edits;
  const kept = useMemo(() => planGig(gig, repertoire, reader.naming), [gig, repertoire, reader.naming]);
  const parts = partsOf(gig, desk.openEncores);
  useHistoryKeys(edits.undo, edits.redo);
  const suggestions = useSuggestions(kept);
  const save = { status: edits.status, pending: edits.pendingCount };
  const panel = { gig, plan: kept, repertoire, suggestions };

  return (
    <PageToolsProvider value={tools}>
      <LiveGig desk={desk} kept={kept} repertoire={repertoire} reader={reader}>
        <SidePanel {...panel} />
      </LiveGig>
      <BottomBar
        gigId={gig.id}
        paper={reader.paper}
        pending={edits.pendingCount}
        onAdd={tools.may.plan ? () => setDialog({ kind: "add", setId: kept.sets[0]!.set.id }) : null}
        onSuggestions={() => setDialog({ kind: "suggestions" })}
        onWhatIf={() => setDialog({ kind: "what-if" })}
      />
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
      {desk.dialog?.kind === "what-if" ? (
        <WhatIfDialog gig={gig} plan={kept} repertoire={repertoire} onClose={() => setDialog(null)} />
      ) : null}
      <ConflictDialog troubles={edits.conflicts} keepMine={edits.keepMine} keepTheirs={edits.keepTheirs} />
      <LiveTotals totals={kept.totals} />
      <LiveSaveState {...save} />
    </PageToolsProvider>
  );
}
