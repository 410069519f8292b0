import { Settings2 } from "lucide-react";
import { subLine } from "#app/components/gig/header/gig-words.ts";
import { HistoryButtons } from "#app/components/gig/header/history-buttons.tsx";
import { SaveState, type SaveStatus } from "#app/components/gig/header/save-state.tsx";
import { SheetsMenu } from "#app/components/gig/header/sheets-menu.tsx";
import { TotalsBar } from "#app/components/gig/header/totals-bar.tsx";
import { Button } from "#app/components/ui/button.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import { entriesOf, setsOf } from "#app/domain/gig/order.ts";
import type { GigPlan, Totals } from "#app/domain/gig/plan.ts";

type GigHeaderProps = {
  gig: Gig;
  plan: GigPlan;
  /** Totals before the drag that is going on; null while nothing is dragged. */
  before: Totals | null;
  paper: "a4" | "letter";
  save: { status: SaveStatus; pending: number };
  /** Undo and redo; null for a reader who may change nothing. */
  history: { undoLabel: string | null; redoLabel: string | null; undo: () => void; redo: () => void } | null;
  onDetails: (() => void) | null;
  onSuggestions: () => void;
  onWhatIf: () => void;
};

/**
 * Name, what the order costs, undo, and the sheets. On a laptop all of it stays in view while the sets scroll under it;
 * on a phone the figures do.
 */
export function GigHeader(props: GigHeaderProps) {
  const { gig, plan, before, paper, save, history, onDetails, onSuggestions, onWhatIf } = props;
  const { clock } = plan;
  const songs = setsOf(gig).map((set) => entriesOf(gig, set.id).length);
  return (
    <div className="contents lg:sticky lg:top-0 lg:z-20 lg:flex lg:flex-wrap lg:items-center lg:gap-x-7 lg:gap-y-2 lg:border-grey-200 lg:border-b lg:bg-ground lg:px-6 lg:py-2 min-[85rem]:min-h-[81px] min-[85rem]:flex-nowrap">
      <div className="on-ebony flex flex-col bg-ebony px-4 pb-2 text-white lg:min-w-0 lg:bg-transparent lg:p-0 lg:text-ink max-[84.99rem]:lg:flex-1">
        <div className="flex min-h-11 items-center gap-1 lg:min-h-0">
          <h1
            className="min-w-0 truncate font-semibold text-2xl leading-tight lg:text-[28px]"
            title={gig.name}
          >
            {gig.name}
          </h1>
          {onDetails ? <DetailsButton onDetails={onDetails} /> : null}
        </div>
        <div className="flex items-center gap-3">
          <div className="min-w-0 flex-1 text-grey-300 text-sm leading-tight lg:text-grey-600">
            <p>{subLine(gig, songs)}</p>
            {history ? (
              <p className="pt-0.5 lg:hidden">
                <SaveState {...save} />
              </p>
            ) : null}
          </div>
          {history ? (
            <div className="lg:hidden">
              <HistoryButtons {...history} small />
            </div>
          ) : null}
        </div>
      </div>
      <div className="sticky top-0 z-20 border-grey-200 border-b bg-ground px-4 py-2 lg:static lg:order-3 lg:w-full lg:border-0 lg:p-0 min-[85rem]:order-2 min-[85rem]:w-auto">
        <TotalsBar
          totals={plan.totals}
          clock={{ seconds: clock.seconds, slot: gig.slot, over: clock.overSlot > 0 || clock.overCurfew > 0 }}
          before={before}
        />
      </div>
      <div className="order-2 hidden items-center justify-end gap-2 lg:ml-auto lg:flex min-[85rem]:order-3">
        {history ? (
          <>
            <span className="text-grey-600">
              <SaveState {...save} />
            </span>
            <HistoryButtons {...history} />
          </>
        ) : null}
        <Button className="min-[85rem]:hidden" onClick={onSuggestions}>
          Less retuning
        </Button>
        <Button className="mr-1 min-[85rem]:hidden" onClick={onWhatIf}>
          What if
        </Button>
        <SheetsMenu gigId={gig.id} paper={paper} pending={save.pending} />
      </div>
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
      className="inline-flex size-11 shrink-0 items-center justify-center rounded-sm text-grey-300 lg:size-8 lg:text-grey-600 lg:hover:bg-grey-100 lg:hover:text-ink"
    >
      <Settings2 size={18} aria-hidden="true" />
    </button>
  );
}
