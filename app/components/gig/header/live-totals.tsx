import { useEffect, useRef, useState } from "react";
import type { Totals } from "#app/domain/gig/plan.ts";

/** How long the figures must have stood still before they are said. */
const quietMilliseconds = 900;

/** The totals as one sentence. @example totalsWords(totals) // "Dead air 251 s, longest gap 50 s, 19 strings retuned" */
export function totalsWords(totals: Totals): string {
  const strings = totals.strings === 1 ? "1 string retuned" : `${totals.strings} strings retuned`;
  const wishes = totals.wishes > 0 ? `, broken wishes ${Math.round(totals.wishes)} s` : "";
  return `Dead air ${Math.round(totals.exposed)} s, longest gap ${Math.round(totals.longestGap)} s, ${strings}, ${totals.capoActions} capo changes, ${totals.swaps} guitar changes${wishes}`;
}

/** Says the totals to a screen reader after they have changed and settled. */
export function LiveTotals({ totals }: { totals: Totals }) {
  const words = totalsWords(totals);
  const said = useRef(words);
  const [shown, setShown] = useState("");
  useEffect(() => {
    if (words === said.current) return;
    const timer = setTimeout(() => {
      said.current = words;
      setShown(words);
    }, quietMilliseconds);
    return () => clearTimeout(timer);
  }, [words]);
  return (
    <p role="status" className="sr-only">
      {shown}
    </p>
  );
}
