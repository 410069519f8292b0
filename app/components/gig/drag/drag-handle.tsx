import { memo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { useGrip } from "#app/components/gig/drag/grip.tsx";

type DragHandleProps = {
  entryId: string;
  number: number;
  title: string;
  /** The row is on its way. */
  dragged: boolean;
};

/** A row's number, which the row is dragged by; plain for those who may not plan. */
export const DragHandle = memo(function DragHandle({ entryId, number, title, dragged }: DragHandleProps) {
  const { may } = usePageTools();
  const { press, instructionsId } = useGrip();
  if (!may.plan) return <span className="tabular font-semibold text-lg lg:text-xl">{number}</span>;
  return (
    <button
      type="button"
      onPointerDown={(event) => press(event, entryId)}
      onKeyDown={(event) => press(event, entryId)}
      data-handle={entryId}
      aria-label={`${number}, move ${title}`}
      aria-roledescription="song that can be moved"
      aria-describedby={instructionsId}
      aria-pressed={dragged || undefined}
      className="tabular flex h-full min-h-11 w-full cursor-grab touch-none items-center justify-center font-semibold text-lg hover:bg-grey-100 focus-visible:outline-offset-[-2px] active:cursor-grabbing lg:min-h-8 lg:text-xl"
    >
      {number}
    </button>
  );
});
