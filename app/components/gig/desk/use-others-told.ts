import { useEffect, useRef } from "react";
import type { OthersChange } from "#app/components/gig/edits/edit-queue.ts";
import { useToasts } from "#app/components/ui/toasts.tsx";

/** Tells what others changed in this gig while the page is open, each change once. */
export function useOthersTold(others: readonly OthersChange[]): void {
  const { add } = useToasts();
  const told = useRef<Set<string> | null>(null);
  useEffect(() => {
    const known = told.current ?? new Set(others.map((change) => change.id));
    told.current = known;
    for (const change of others) {
      if (known.has(change.id)) continue;
      known.add(change.id);
      const who = change.own ? "In another window you did this" : change.displayName;
      add({ title: `${who}: ${change.label}` });
    }
  }, [others, add]);
}
