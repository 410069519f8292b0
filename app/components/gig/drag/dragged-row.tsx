import { DragOverlay } from "@dnd-kit/core";
import { useReducedMotion } from "#app/components/gig/drag/use-reduced-motion.ts";
import { SongRow } from "#app/components/gig/rows/song-row.tsx";
import type { GigSet } from "#app/domain/gig/gig.ts";
import type { Row } from "#app/domain/gig/plan.ts";

type DraggedRowProps = { row: Row | null; set: Pick<GigSet, "id" | "holdFirst" | "holdLast"> | null };

/** The row under the pointer while it is dragged. */
export function DraggedRow({ row, set }: DraggedRowProps) {
  const still = useReducedMotion();
  return (
    <DragOverlay dropAnimation={still ? null : { duration: 150, easing: "ease-out" }}>
      {row && set ? (
        <div className="cursor-grabbing bg-white shadow-drag" aria-hidden="true">
          <SongRow
            row={row}
            set={set}
            first={false}
            last={false}
            troubles={[]}
            plain
            number={<span className="tabular font-semibold text-lg lg:text-xl">{row.number}</span>}
          />
        </div>
      ) : null}
    </DragOverlay>
  );
}
