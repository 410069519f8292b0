import { Redo2, Undo2 } from "lucide-react";
import { useEffect } from "react";
import { Button } from "#app/components/ui/button.tsx";

type HistoryButtonsProps = {
  /** What undo and redo would take back or do again; null where there is nothing. */
  undoLabel: string | null;
  redoLabel: string | null;
  undo: () => void;
  redo: () => void;
};

/** Whether keys typed there are text, so that undo belongs to the field. */
function typesText(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || target.matches("textarea, select, input:not([type=checkbox], [type=radio])"))
  );
}

/** Undo and redo of one's own edits, by button and by Ctrl or Command with Z. */
export function HistoryButtons({ undoLabel, redoLabel, undo, redo }: HistoryButtonsProps) {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || typesText(event.target)) return;
      const key = event.key.toLowerCase();
      if (key !== "z" && key !== "y") return;
      event.preventDefault();
      if (key === "y" || event.shiftKey) redo();
      else undo();
    };
    document.addEventListener("keydown", onKey);
    return () => document.removeEventListener("keydown", onKey);
  }, [undo, redo]);
  return (
    <div className="flex">
      <Button
        look="quiet"
        className="px-2.5 lg:min-h-9"
        disabled={undoLabel === null}
        onClick={undo}
        title={undoLabel === null ? undefined : `Undo: ${undoLabel}`}
      >
        <Undo2 size={18} aria-hidden="true" />
        Undo
      </Button>
      <Button
        look="quiet"
        className="px-2.5 lg:min-h-9"
        disabled={redoLabel === null}
        onClick={redo}
        title={redoLabel === null ? undefined : `Redo: ${redoLabel}`}
      >
        <Redo2 size={18} aria-hidden="true" />
        Redo
      </Button>
    </div>
  );
}
