import { type RefObject, useLayoutEffect, useRef } from "react";

const milliseconds = 180;

/**
 * Shows where rows went: after the order has changed each row slides from where it stood. Nothing moves while a row is
 * dragged, nor for readers who asked for less motion.
 */
export function useFlip(list: RefObject<HTMLElement | null>, order: string, still: boolean): void {
  const before = useRef<{ order: string; tops: Map<string, number> } | null>(null);
  useLayoutEffect(() => {
    if (!list.current) return;
    const rows = [...list.current.querySelectorAll<HTMLElement>("[data-entry]")];
    const from = list.current.getBoundingClientRect().top;
    const tops = new Map(
      rows.map((row) => [row.dataset.entry ?? "", row.getBoundingClientRect().top - from]),
    );
    const past = before.current;
    before.current = { order, tops };
    const calm = still || matchMedia("(prefers-reduced-motion: reduce)").matches;
    if (!past || past.order === order || calm) return;
    for (const row of rows) {
      const was = past.tops.get(row.dataset.entry ?? "");
      const now = tops.get(row.dataset.entry ?? "");
      if (was === undefined || now === undefined || Math.abs(was - now) < 2) continue;
      row.animate([{ transform: `translateY(${was - now}px)` }, { transform: "none" }], {
        duration: milliseconds,
        easing: "ease-out",
      });
    }
  }, [list, order, still]);
}
