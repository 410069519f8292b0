import { memo } from "react";
import { DragHandle } from "#app/components/gig/drag/drag-handle.tsx";
import { GapRow } from "#app/components/gig/rows/gap-row.tsx";
import { sameRow, sameWords } from "#app/components/gig/rows/same-row.ts";
import { SongRow, titleOfRow } from "#app/components/gig/rows/song-row.tsx";
import type { GigSet } from "#app/domain/gig/gig.ts";
import type { Row } from "#app/domain/gig/plan.ts";

type SongItemProps = {
  row: Row;
  /** Where it is drawn among its neighbours, if not where it stands in the document. */
  order: number | null;
  set: Pick<GigSet, "id" | "holdFirst" | "holdLast">;
  first: boolean;
  last: boolean;
  troubles: readonly string[];
  /** What it is on its way by. Under a pointer is its picture, and this is where it would go. */
  dragged: "pointer" | "keys" | null;
};

/** A song with the gap that leads into it. Drawn again only where it changed. */
export const SongItem = memo(
  SongItemOnce,
  (before, after) =>
    sameRow(before.row, after.row) &&
    before.order === after.order &&
    before.set === after.set &&
    before.first === after.first &&
    before.last === after.last &&
    before.dragged === after.dragged &&
    sameWords(before.troubles, after.troubles),
);

function SongItemOnce({ row, order, set, first, last, troubles, dragged }: SongItemProps) {
  return (
    <li
      style={order === null ? undefined : { order }}
      className={`relative contain-layout contain-style ${dragged === "pointer" ? "opacity-35" : ""} ${dragged === "keys" ? "z-10" : ""}`}
    >
      {row.gap ? <GapRow row={row} gap={row.gap} /> : null}
      <div
        data-box="entry"
        data-entry={row.entry.id}
        className={`-mt-px scroll-my-24 ${dragged === "keys" ? "shadow-drag" : ""}`}
      >
        <SongRow
          row={row}
          set={set}
          first={first}
          last={last}
          troubles={troubles}
          number={
            <DragHandle
              entryId={row.entry.id}
              number={row.number}
              title={titleOfRow(row)}
              dragged={dragged !== null}
            />
          }
        />
      </div>
    </li>
  );
}
