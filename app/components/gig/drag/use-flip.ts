import { type RefObject, useLayoutEffect, useRef } from "react";

/** A row that was let go: where its picture was then, where a pointer carried one; and where all rows stood. */
export type Landing = { entryId: string; picture: DOMRect | null; tops: Tops };

const slide = { duration: 180, easing: "ease-out" };
const land = { duration: 150, easing: "ease-out" };

function calm(): boolean {
  return matchMedia("(prefers-reduced-motion: reduce)").matches;
}

type Tops = Map<string, { item: HTMLElement; top: number }>;

/** Where each row's item stands below the top of the list, by the row's entry. */
export function topsOf(list: HTMLElement): Tops {
  const from = list.getBoundingClientRect().top;
  const rows = [...list.querySelectorAll<HTMLElement>("[data-entry]")];
  return new Map(
    rows.map((row) => [
      row.dataset.entry ?? "",
      { item: row.parentElement ?? row, top: row.getBoundingClientRect().top - from },
    ]),
  );
}

/**
 * Shows where rows went: after the order has changed each row slides from where it stood, and one that was let go
 * comes down from under the pointer. Nothing is measured or moves while a row is dragged, nor moves for readers who
 * asked for less motion.
 */
export function useFlip(
  list: RefObject<HTMLElement | null>,
  order: string,
  still: boolean,
  landing: RefObject<Landing | null>,
): void {
  const before = useRef<{ order: string; tops: Tops } | null>(null);
  useLayoutEffect(() => {
    if (!list.current || still) return;
    const tops = topsOf(list.current);
    const past = before.current;
    const landed = landing.current;
    before.current = { order, tops };
    landing.current = null;
    if (calm() || (past?.order === order && !landed)) return;
    const from = landed?.tops ?? past?.tops;
    for (const [entryId, { item, top }] of tops) {
      const by = (from?.get(entryId)?.top ?? top) - top;
      if (Math.abs(by) >= 2)
        item.animate([{ transform: `translateY(${by}px)` }, { transform: "none" }], slide);
    }
    if (landed?.picture) comeDown(tops.get(landed.entryId)?.item, landed.entryId, landed.picture);
  }, [list, order, still, landing]);
}

/** Brings a row from where its picture was let go to where it stands. */
function comeDown(item: HTMLElement | undefined, entryId: string, from: DOMRect): void {
  const to = item?.querySelector(`[data-entry="${CSS.escape(entryId)}"]`)?.getBoundingClientRect();
  if (!item || !to) return;
  item.animate(
    [
      { transform: `translate(${from.left - to.left}px, ${from.top - to.top}px)`, zIndex: 1 },
      { transform: "none", zIndex: 1 },
    ],
    land,
  );
}
