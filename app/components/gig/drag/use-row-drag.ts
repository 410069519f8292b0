import { type RefObject, useEffect, useLayoutEffect, useRef, useState } from "react";
import { flushSync } from "react-dom";
import {
  type Box,
  nearestSlot,
  type Place,
  placeOfSlot,
  slotCount,
  slotOf,
} from "#app/components/gig/drag/drop-place.ts";
import { followPointer } from "#app/components/gig/drag/follow-pointer.ts";
import type { DragHandlers } from "#app/components/gig/drag/grip.tsx";
import { type Landing, topsOf } from "#app/components/gig/drag/use-flip.ts";
import type { Section } from "#app/domain/gig/gig.ts";

/** Where a row's picture begins its way under the pointer, in CSS pixels of the window. */
export type Lifted = { left: number; top: number; width: number; height: number };

/** A row on its way: the entry, and where it would go if it were let go now. By keyboard nothing is lifted. */
export type Drag = { entryId: string; place: Place; lifted: Lifted | null };

/** Height of a gap line, which stands between two rows. */
const gapHeight = 24;

/** The heads of sections and the rows as they stand on the page now, top to bottom, in CSS pixels of the document. */
function measure(list: HTMLElement): Box[] {
  const boxes = [...list.querySelectorAll<HTMLElement>("[data-box]")].map((element): Box => {
    const rect = element.getBoundingClientRect();
    const edges = { top: rect.top + scrollY, bottom: rect.bottom + scrollY };
    const { entry, set, section } = element.dataset;
    if (entry) return { kind: "entry", entryId: entry, ...edges };
    return { kind: "head", setId: set ?? "", section: Number(section) as Section, ...edges };
  });
  return boxes.sort((a, b) => a.top - b.top);
}

function samePlace(a: Place, b: Place): boolean {
  return a.setId === b.setId && a.section === b.section && a.index === b.index;
}

function rowOf(list: HTMLElement | null, entryId: string): HTMLElement | null {
  return list?.querySelector<HTMLElement>(`[data-entry="${CSS.escape(entryId)}"]`) ?? null;
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
 * the place is worked out from where the other rows stand, not from what lies under the pointer. A move of the pointer
 * is shown before the browser paints the frame that it came with.
 */
export function useRowDrag({ list, onStart, onPlace, onDrop, onCancel }: RowDragOptions) {
  const [drag, setDrag] = useState<Drag | null>(null);
  const current = useRef<Drag | null>(null);
  const picture = useRef<HTMLDivElement>(null);
  const landing = useRef<Landing | null>(null);
  const boxes = useRef<Box[] | null>(null);
  const stop = useRef(() => {});
  useLayoutEffect(() => {
    boxes.current = null;
  });
  useEffect(() => () => stop.current(), []);

  const standing = (on: HTMLElement): Box[] => {
    boxes.current ??= measure(on);
    return boxes.current;
  };

  const put = (next: Drag) => {
    current.current = next;
    flushSync(() => {
      setDrag(next);
      onPlace(next);
    });
  };

  const pull = (from: Lifted, x: number, y: number) => {
    const now = current.current;
    if (!now || !list.current) return;
    const on = standing(list.current);
    const slot = nearestSlot(on, now.entryId, from.top + from.height / 2 + y + scrollY, gapHeight);
    const place = placeOfSlot(on, now.entryId, slot);
    picture.current?.style.setProperty("transform", `translate(${x}px, ${y}px)`);
    if (!samePlace(place, now.place)) put({ ...now, place });
  };

  const finish = () => {
    stop.current();
    const last = current.current;
    if (last && list.current) {
      const from = picture.current?.getBoundingClientRect() ?? null;
      landing.current = { entryId: last.entryId, picture: from, tops: topsOf(list.current) };
    }
    current.current = null;
    setDrag(null);
    return last;
  };

  const handlers: DragHandlers = {
    start(entryId, press) {
      const row = rowOf(list.current, entryId);
      if (!list.current || !row) return;
      const on = standing(list.current);
      const place = placeOfSlot(on, entryId, slotOf(on, entryId));
      const { left, top, width, height } = row.getBoundingClientRect();
      const lifted = press instanceof PointerEvent ? { left, top, width, height } : null;
      const started = { entryId, place, lifted };
      current.current = started;
      if (press instanceof PointerEvent && lifted)
        stop.current = followPointer(press, ({ x, y }) => pull(lifted, x, y));
      setDrag(started);
      onStart(started);
    },
    step(by) {
      const now = current.current;
      if (!now || !list.current) return;
      const on = standing(list.current);
      const slot = slotOf(on, now.entryId) + by;
      if (slot < 1 || slot > slotCount(on)) return;
      put({ ...now, place: placeOfSlot(on, now.entryId, slot) });
      const row = rowOf(list.current, now.entryId);
      row?.scrollIntoView({ block: "nearest" });
      // A row that goes into another section is made anew there.
      row?.querySelector<HTMLElement>("[data-handle]")?.focus({ preventScroll: true });
    },
    end() {
      const last = finish();
      if (last) onDrop(last);
    },
    cancel() {
      const last = finish();
      if (last) onCancel(last.entryId);
    },
  };
  return { drag, handlers, picture, landing };
}
