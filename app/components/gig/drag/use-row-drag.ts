import {
  type DragEndEvent,
  type DragMoveEvent,
  type DragStartEvent,
  KeyboardCode,
  type KeyboardCoordinateGetter,
  KeyboardSensor,
  PointerSensor,
  useSensor,
  useSensors,
} from "@dnd-kit/core";
import { type RefObject, useCallback, useRef, useState } from "react";
import {
  type Box,
  nearestSlot,
  type Place,
  placeOfSlot,
  slotCount,
  slotOf,
  slotTop,
} from "#app/components/gig/drag/drop-place.ts";
import type { Section } from "#app/domain/gig/gig.ts";

/** A row on its way: the entry, and where it would go if it were let go now. */
export type Drag = { entryId: string; place: Place };

/** Height of a gap line, which stands between two rows. */
const gapHeight = 24;

/** The heads of sections and the rows as they stand on the page now, top to bottom. */
function measure(list: HTMLElement): Box[] {
  return [...list.querySelectorAll<HTMLElement>("[data-box]")].map((element) => {
    const { top, bottom } = element.getBoundingClientRect();
    const { entry, set, section } = element.dataset;
    if (entry) return { kind: "entry", entryId: entry, top, bottom };
    return { kind: "head", setId: set ?? "", section: Number(section) as Section, top, bottom };
  });
}

function samePlace(a: Place, b: Place): boolean {
  return a.setId === b.setId && a.section === b.section && a.index === b.index;
}

type RowDragOptions = {
  list: RefObject<HTMLElement | null>;
  onStart: (drag: Drag) => void;
  onPlace: (drag: Drag) => void;
  onDrop: (drag: Drag) => void;
  onCancel: (entryId: string) => void;
};

/**
 * Dragging rows by mouse, touch and keyboard. While a row is on its way the page shows the order as it would be, so
 * the place is worked out from where the other rows stand, not from what lies under the pointer.
 */
export function useRowDrag({ list, onStart, onPlace, onDrop, onCancel }: RowDragOptions) {
  const [drag, setDrag] = useState<Drag | null>(null);
  const current = useRef<Drag | null>(null);

  const coordinateGetter: KeyboardCoordinateGetter = useCallback(
    (event, { active, currentCoordinates }) => {
      const step = event.code === KeyboardCode.Down ? 1 : event.code === KeyboardCode.Up ? -1 : 0;
      if (step === 0 || !list.current) return undefined;
      event.preventDefault();
      const entryId = String(active);
      const boxes = measure(list.current);
      const slot = slotOf(boxes, entryId) + step;
      if (slot < 1 || slot > slotCount(boxes)) return undefined;
      return { x: currentCoordinates.x, y: slotTop(boxes, entryId, slot, gapHeight) };
    },
    [list],
  );

  const sensors = useSensors(
    useSensor(PointerSensor, { activationConstraint: { distance: 4 } }),
    useSensor(KeyboardSensor, { coordinateGetter, scrollBehavior: "auto" }),
  );

  const keep = (next: Drag | null) => {
    current.current = next;
    setDrag(next);
  };

  const onDragStart = ({ active }: DragStartEvent) => {
    if (!list.current) return;
    const entryId = String(active.id);
    const boxes = measure(list.current);
    const next = { entryId, place: placeOfSlot(boxes, entryId, slotOf(boxes, entryId)) };
    keep(next);
    onStart(next);
  };

  const onDragMove = ({ active }: DragMoveEvent) => {
    const rect = active.rect.current.translated;
    if (!current.current || !rect || !list.current) return;
    const entryId = String(active.id);
    const boxes = measure(list.current);
    const slot = nearestSlot(boxes, entryId, rect.top + rect.height / 2, gapHeight);
    const place = placeOfSlot(boxes, entryId, slot);
    if (samePlace(place, current.current.place)) return;
    keep({ entryId, place });
    onPlace({ entryId, place });
  };

  const onDragEnd = (_: DragEndEvent) => {
    const last = current.current;
    keep(null);
    if (last) onDrop(last);
  };

  const onDragCancel = () => {
    const last = current.current;
    keep(null);
    if (last) onCancel(last.entryId);
  };

  return { drag, sensors, handlers: { onDragStart, onDragMove, onDragEnd, onDragCancel } };
}
