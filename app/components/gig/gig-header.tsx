import { Settings2 } from "lucide-react";
import { subLine } from "#app/components/gig/gig-words.ts";
import { HistoryButtons } from "#app/components/gig/history-buttons.tsx";
import { SaveState, type SaveStatus } from "#app/components/gig/save-state.tsx";
import { SheetsMenu } from "#app/components/gig/sheets-menu.tsx";
import { TotalsBar } from "#app/components/gig/totals-bar.tsx";
import { Button, buttonClass } from "#app/components/ui/button.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import { entriesOf, setsOf } from "#app/domain/gig/order.ts";
import type { GigPlan, Totals } from "#app/domain/gig/plan.ts";

type GigHeaderProps = {
  gig: Gig;
  plan: GigPlan;
  /** Totals before the drag that is going on; null while nothing is dragged. */
  before: Totals | null;
  warnings: string[];
  paper: "a4" | "letter";
  save: { status: SaveStatus; pending: number };
  /** Undo and redo; null for a reader who may change nothing. */
  history: { undoLabel: string | null; redoLabel: string | null; undo: () => void; redo: () => void } | null;
  onDetails: (() => void) | null;
  onSuggestions: () => void;
};

/**
 * Name, what the order costs, undo, and the sheets. On a laptop all of it stays in view while the sets scroll under it;
 * on a phone the figures do.
 */
export function GigHeader(props: GigHeaderProps) {
  const { gig, plan, before, warnings, paper, save, history, onDetails, onSuggestions } = props;
  const { clock } = plan;
  return (
    <div className="contents lg:sticky lg:top-0 lg:z-20 lg:flex lg:flex-wrap lg:items-center lg:gap-x-7 lg:gap-y-2 lg:border-grey-200 lg:border-b lg:bg-ground lg:px-6 lg:py-2 min-[1360px]:flex-nowrap">
      <div className="max-lg:on-ebony flex items-start gap-1 bg-ebony px-4 pt-1 pb-3 text-white lg:w-full lg:min-w-0 lg:bg-transparent lg:p-0 lg:text-ink min-[1360px]:w-auto min-[1360px]:flex-1">
        <Name gig={gig} save={history ? save : null} />
        <div className="flex text-current lg:hidden">
          {history ? <HistoryButtons {...history} small /> : null}
        </div>
        {onDetails ? <DetailsButton onDetails={onDetails} /> : null}
      </div>
      <div className="sticky top-0 z-20 border-grey-200 border-b bg-ground px-4 py-2 lg:static lg:border-0 lg:p-0">
        <TotalsBar
          totals={plan.totals}
          clock={{ seconds: clock.seconds, slot: gig.slot, over: clock.overSlot > 0 || clock.overCurfew > 0 }}
          before={before}
        />
      </div>
      <div className="hidden items-center justify-end gap-2 lg:ml-auto lg:flex">
        {history ? (
          <>
            <SaveState {...save} />
            <HistoryButtons {...history} />
          </>
        ) : null}
        <Button className="mr-1 min-[1360px]:hidden" onClick={onSuggestions}>
          Less retuning
        </Button>
        <SheetsMenu gigId={gig.id} paper={paper} pending={save.pending} />
      </div>
      {warnings.length > 0 ? (
        <div className="flex flex-col gap-1 px-4 py-2 lg:w-full lg:flex-row lg:flex-wrap lg:gap-x-6 lg:p-0">
          {warnings.map((words) => (
            <Warning key={words}>{words}</Warning>
          ))}
        </div>
      ) : null}
    </div>
  );
}

function Name({ gig, save }: { gig: Gig; save: GigHeaderProps["save"] | null }) {
  const songs = setsOf(gig).map((set) => entriesOf(gig, set.id).length);
  return (
    <div className="min-w-0 flex-1">
      <h1 className="truncate font-semibold text-2xl leading-tight lg:text-[28px]" title={gig.name}>
        {gig.name}
      </h1>
      <p className="text-grey-300 text-sm leading-tight lg:text-grey-600">{subLine(gig, songs)}</p>
      {save ? (
        <p className="pt-0.5 text-grey-300 text-sm lg:hidden">
          <SaveState {...save} />
        </p>
      ) : null}
    </div>
  );
}

function DetailsButton({ onDetails }: { onDetails: () => void }) {
  return (
    <button
      type="button"
      aria-label="Gig details"
      title="Name, date, slot, curfew, tech and times"
      onClick={onDetails}
      className={`${buttonClass("quiet", true)} size-11 shrink-0 px-0 text-current hover:bg-transparent lg:size-9 lg:hover:bg-grey-100`}
    >
      <Settings2 size={18} aria-hidden="true" />
    </button>
  );
}
