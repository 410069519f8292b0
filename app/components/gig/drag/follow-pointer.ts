/** How far the pointer is from where it was pressed, in CSS pixels of the window. */
export type Pull = { x: number; y: number };

/**
 * Tells how far the pointer is from where it was pressed: at each move, which the browser hands out once a frame, and
 * whenever the page scrolls under it. Answers with what ends it.
 */
export function followPointer(press: PointerEvent, moved: (pull: Pull) => void): () => void {
  let pull: Pull = { x: 0, y: 0 };
  const onMove = (event: PointerEvent) => {
    if (event.pointerId !== press.pointerId) return;
    pull = { x: event.clientX - press.clientX, y: event.clientY - press.clientY };
    moved(pull);
  };
  const onScroll = () => moved(pull);
  document.addEventListener("pointermove", onMove);
  document.addEventListener("scroll", onScroll, { capture: true, passive: true });
  return () => {
    document.removeEventListener("pointermove", onMove);
    document.removeEventListener("scroll", onScroll, { capture: true });
  };
}
