import { memo, type RefObject } from "react";
import type { Lifted } from "#app/components/gig/drag/use-row-drag.ts";
import { SongRow } from "#app/components/gig/rows/song-row.tsx";
import type { GigSet } from "#app/domain/gig/gig.ts";
import type { Row } from "#app/domain/gig/plan.ts";

type DraggedRowProps = {
  row: Row;
  set: Pick<GigSet, "id" | "holdFirst" | "holdLast">;
  lifted: Lifted;
  /** What the drag moves under the pointer. */
  picture: RefObject<HTMLDivElement | null>;
};

const none: readonly string[] = [];

/**
 * The row under the pointer while it is dragged, above a pane that covers the window, so that the pointer is over
 * nothing else.
 */
export const DraggedRow = memo(function DraggedRow({ row, set, lifted, picture }: DraggedRowProps) {
  const { left, top, width } = lifted;
  return (
    <div className="fixed inset-0 z-50 cursor-grabbing" aria-hidden="true">
      <div
        ref={picture}
        className="absolute bg-white shadow-drag will-change-transform"
        style={{ left, top, width }}
      >
        <SongRow
          row={row}
          set={set}
          first={false}
          last={false}
          troubles={none}
          plain
          number={<span className="tabular font-semibold text-lg lg:text-xl">{row.number}</span>}
        />
      </div>
    </div>
  );
});
