import { type RefObject, useState } from "react";
import type { Latest } from "#app/components/gig/desk/use-page-tools.ts";
import { placeWords } from "#app/components/gig/drag/drag-words.ts";
import { type Drag, useRowDrag } from "#app/components/gig/drag/use-row-drag.ts";
import { partsOf, placeOf } from "#app/components/gig/sets/moves.ts";
import { placeEdits } from "#app/domain/gig/order.ts";

/** Puts the focus back on the handle of a row, where dropping it has taken it away. */
function focusHandle(list: HTMLElement | null, entryId: string): void {
  requestAnimationFrame(() => {
    list
      ?.querySelector<HTMLElement>(`[data-handle="${CSS.escape(entryId)}"]`)
      ?.focus({ preventScroll: true });
  });
}

/** Dragging rows: the edit that a drop makes, and what a screen reader hears on the way. */
export function useRowMoves(list: RefObject<HTMLElement | null>, latest: RefObject<Latest>) {
  const [said, setSaid] = useState("");
  const words = ({ entryId, place }: Pick<Drag, "entryId" | "place">) => {
    const { gig, openEncores, titleOf } = latest.current;
    return placeWords(titleOf(entryId), place, partsOf(gig, openEncores), entryId, titleOf);
  };
  const dragging = useRowDrag({
    list,
    onStart: (started) => setSaid(`Picked up. ${words(started)}`),
    onPlace: (placed) => setSaid(words(placed)),
    onDrop: (dropped) => {
      const { gig, edit, titleOf } = latest.current;
      const edits = placeEdits(gig, dropped.entryId, dropped.place);
      if (edits.length > 0) edit(edits, `Move ${titleOf(dropped.entryId)}`);
      setSaid(`Put down. ${words(dropped)}`);
      focusHandle(list.current, dropped.entryId);
    },
    onCancel: (entryId) => {
      const { gig, openEncores } = latest.current;
      const place = placeOf(partsOf(gig, openEncores), entryId);
      setSaid(place ? `Put back. ${words({ entryId, place })}` : "Put back.");
      focusHandle(list.current, entryId);
    },
  });
  return { ...dragging, said };
}
