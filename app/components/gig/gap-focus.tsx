import { Tooltip } from "@base-ui/react/tooltip";
import { createContext, type ReactNode, use, useMemo, useState } from "react";

/** The gap that is pointed at: the entry it leads into, what says it in one sentence, and where to say it. */
export type PointedGap = { entryId: string; sentence: string; anchor: Element };

type PointAt = { show: (gap: PointedGap) => void; hide: (entryId: string) => void };

const PointedContext = createContext<PointedGap | null>(null);
const PointAtContext = createContext<PointAt>({ show: () => {}, hide: () => {} });

/** The gap pointed at now, in the list or in a ribbon; null for none. */
export function usePointedGap(): PointedGap | null {
  return use(PointedContext);
}

export function usePointAt(): PointAt {
  return use(PointAtContext);
}

/** Ties list and ribbons together: whichever of them is pointed at, both show it, and one bubble says it. */
export function GapFocus({ children }: { children: ReactNode }) {
  const [pointed, setPointed] = useState<PointedGap | null>(null);
  const pointAt = useMemo<PointAt>(
    () => ({
      show: setPointed,
      hide: (entryId) => setPointed((now) => (now?.entryId === entryId ? null : now)),
    }),
    [],
  );
  return (
    <PointAtContext value={pointAt}>
      <PointedContext value={pointed}>
        {children}
        <Tooltip.Root open={pointed !== null} onOpenChange={(open) => (open ? null : setPointed(null))}>
          <Tooltip.Portal>
            <Tooltip.Positioner
              anchor={pointed?.anchor}
              side="bottom"
              align="start"
              sideOffset={4}
              className="z-40"
            >
              <Tooltip.Popup className="pointer-events-none max-w-[min(26rem,92vw)] rounded-sm bg-ink px-3 py-2 text-base text-white">
                {pointed?.sentence}
              </Tooltip.Popup>
            </Tooltip.Positioner>
          </Tooltip.Portal>
        </Tooltip.Root>
      </PointedContext>
    </PointAtContext>
  );
}
