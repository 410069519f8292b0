import { useDraggable } from "@dnd-kit/core";
import { useCallback } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";

type DragHandleProps = { entryId: string; number: number; title: string };

/**
 * A row's number, which the row is dragged by; plain for those who may not plan. It alone listens to the drag, so that
 * the rest of the row is not drawn again while one is going on.
 */
export function DragHandle({ entryId, number, title }: DragHandleProps) {
  const { may } = usePageTools();
  const { attributes, listeners, setNodeRef, setActivatorNodeRef } = useDraggable({
    id: entryId,
    disabled: !may.plan,
    attributes: { roleDescription: "song that can be moved" },
  });
  const hold = useCallback(
    (button: HTMLButtonElement | null) => {
      setActivatorNodeRef(button);
      setNodeRef(button?.closest<HTMLElement>("[data-entry]") ?? null);
    },
    [setActivatorNodeRef, setNodeRef],
  );
  if (!may.plan) return <span className="tabular font-semibold text-lg lg:text-xl">{number}</span>;
  return (
    <button
      type="button"
      ref={hold}
      {...attributes}
      {...listeners}
      data-handle={entryId}
      aria-label={`${number}, move ${title}`}
      className="tabular flex h-full min-h-11 w-full cursor-grab touch-none items-center justify-center font-semibold text-lg hover:bg-grey-100 focus-visible:outline-offset-[-2px] active:cursor-grabbing lg:min-h-8 lg:text-xl"
    >
      {number}
    </button>
  );
}
