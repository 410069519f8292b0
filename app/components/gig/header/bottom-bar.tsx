import { SheetsMenu } from "#app/components/gig/header/sheets-menu.tsx";
import { Button } from "#app/components/ui/button.tsx";

type BottomBarProps = {
  gigId: string;
  paper: "a4" | "letter";
  pending: number;
  onAdd: (() => void) | null;
  onSuggestions: () => void;
  onWhatIf: () => void;
};

/** What the thumb reaches on a phone. */
export function BottomBar({ gigId, paper, pending, onAdd, onSuggestions, onWhatIf }: BottomBarProps) {
  return (
    <div className="fixed right-0 bottom-0 left-0 md:left-[72px] z-30 flex gap-2 border-grey-200 border-t bg-white px-3 pt-3 pb-[max(0.75rem,env(safe-area-inset-bottom))] lg:hidden print:hidden">
      {onAdd ? (
        <Button className="min-h-12 flex-auto px-1.5! text-lg" onClick={onAdd}>
          Add song
        </Button>
      ) : null}
      <Button className="min-h-12 flex-auto px-1.5! text-lg" onClick={onSuggestions}>
        Less retuning
      </Button>
      <Button className="min-h-12 flex-auto px-1.5! text-lg" onClick={onWhatIf}>
        What if
      </Button>
      <SheetsMenu
        gigId={gigId}
        paper={paper}
        pending={pending}
        className="min-h-12 flex-auto px-1.5! text-lg"
      />
    </div>
  );
}
