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

/** Name, what the order costs, undo, and the sheets. Stays in view while the sets scroll under it. */
export function GigHeader(props: GigHeaderProps) {
  const { gig, plan, before, warnings, paper, save, history, onDetails, onSuggestions } = props;
  const songs = setsOf(gig).map((set) => entriesOf(gig, set.id).length);
  return (
    <>
      <div className="on-ebony flex items-center gap-3 bg-ebony px-4 pt-1 pb-3 text-white lg:hidden">
        <Name gig={gig} songs={songs} onDetails={onDetails} />
        {history ? <HistoryButtons {...history} small /> : null}
      </div>
      <header className="sticky top-0 z-20 flex flex-wrap items-center gap-x-8 gap-y-2 border-grey-200 border-b bg-ground px-4 py-2 lg:px-6 lg:py-2.5">
        <div className="hidden min-w-48 max-w-[24rem] lg:block">
          <Name gig={gig} songs={songs} onDetails={onDetails} />
        </div>
        <div className="min-w-0 flex-1 lg:flex-none">
          <TotalsBar
            totals={plan.totals}
            clock={{
              seconds: plan.clock.seconds,
              slot: gig.slot,
              over: plan.clock.overSlot > 0 || plan.clock.overCurfew > 0,
            }}
            before={before}
          />
        </div>
        <div className="hidden flex-1 items-center justify-end gap-3 lg:flex">
          {history ? (
            <>
              <SaveState status={save.status} pending={save.pending} />
              <HistoryButtons {...history} />
            </>
          ) : null}
          <Button className="min-[1360px]:hidden" onClick={onSuggestions}>
            Less retuning
          </Button>
          <SheetsMenu gigId={gig.id} paper={paper} pending={save.pending} />
        </div>
        {warnings.length > 0 ? (
          <div className="flex w-full flex-wrap gap-x-6 gap-y-1">
            {warnings.map((words) => (
              <Warning key={words}>{words}</Warning>
            ))}
          </div>
        ) : null}
      </header>
    </>
  );
}

function Name({ gig, songs, onDetails }: { gig: Gig; songs: number[]; onDetails: (() => void) | null }) {
  return (
    <div className="flex min-w-0 flex-1 items-start gap-2">
      <div className="min-w-0 flex-1">
        <h1 className="truncate font-semibold text-2xl leading-tight lg:text-[28px]" title={gig.name}>
          {gig.name}
        </h1>
        <p className="text-grey-300 text-sm leading-tight lg:text-grey-600">{subLine(gig, songs)}</p>
      </div>
      {onDetails ? (
        <button
          type="button"
          aria-label="Gig details"
          title="Name, date, slot, curfew, tech and times"
          onClick={onDetails}
          className={`${buttonClass("quiet", true)} size-11 shrink-0 px-0 text-current hover:bg-transparent lg:size-8 lg:min-h-8 lg:hover:bg-grey-100`}
        >
          <Settings2 size={18} aria-hidden="true" />
        </button>
      ) : null}
    </div>
  );
}
