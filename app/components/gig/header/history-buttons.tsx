import { Redo2, Undo2 } from "lucide-react";
import { useEffect } from "react";
import { buttonClass } from "#app/components/ui/button.tsx";

type HistoryButtonsProps = {
  /** What undo and redo would take back or do again; null where there is nothing. */
  undoLabel: string | null;
  redoLabel: string | null;
  undo: () => void;
  redo: () => void;
  /** Only the signs, where there is little room. */
  small?: boolean;
};

/** Undo by Ctrl or Command with Z, redo with Shift as well or with Y. Inside a field the keys belong to the field. */
export function useHistoryKeys(undo: () => void, redo: () => void): void {
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
}

/** Whether keys typed there are text, so that undo belongs to the field. */
function typesText(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || target.matches("textarea, select, input:not([type=checkbox], [type=radio])"))
  );
}

/** Undo and redo of one's own edits. */
export function HistoryButtons({ undoLabel, redoLabel, undo, redo, small = false }: HistoryButtonsProps) {
  return (
    <div className="flex">
      <Step words="Undo" what={undoLabel} act={undo} small={small} />
      <Step words="Redo" what={redoLabel} act={redo} small={small} />
    </div>
  );
}

const smallStep =
  "inline-flex size-11 items-center justify-center rounded-sm text-white disabled:text-grey-600";

type StepProps = { words: "Undo" | "Redo"; what: string | null; act: () => void; small: boolean };

function Step({ words, what, act, small }: StepProps) {
  const Icon = words === "Undo" ? Undo2 : Redo2;
  const said = what === null ? words : `${words}: ${what}`;
  return (
    <button
      type="button"
      className={small ? smallStep : `${buttonClass("quiet")} px-2.5 lg:min-h-9`}
      disabled={what === null}
      onClick={act}
      aria-label={said}
      title={said}
    >
      <Icon size={18} aria-hidden="true" />
      {small ? null : words}
    </button>
  );
}
