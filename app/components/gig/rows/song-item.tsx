import { useDraggable } from "@dnd-kit/core";
import { memo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { GapRow } from "#app/components/gig/rows/gap-row.tsx";
import { sameRow, sameWords } from "#app/components/gig/rows/same-row.ts";
import { SongRow, titleOfRow } from "#app/components/gig/rows/song-row.tsx";
import type { GigSet } from "#app/domain/gig/gig.ts";
import type { Row } from "#app/domain/gig/plan.ts";

type SongItemProps = {
  row: Row;
  set: Pick<GigSet, "id" | "holdFirst" | "holdLast">;
  first: boolean;
  last: boolean;
  troubles: readonly string[];
};

/** A song with the gap that leads into it. The number is what it is dragged by. Drawn again only where it changed. */
export const SongItem = memo(
  SongItemOnce,
  (before, after) =>
    sameRow(before.row, after.row) &&
    before.set === after.set &&
    before.first === after.first &&
    before.last === after.last &&
    sameWords(before.troubles, after.troubles),
);

function SongItemOnce({ row, set, first, last, troubles }: SongItemProps) {
  const { may } = usePageTools();
  const { attributes, listeners, setNodeRef, setActivatorNodeRef, isDragging } = useDraggable({
    id: row.entry.id,
    disabled: !may.plan,
    attributes: { roleDescription: "song that can be moved" },
  });
  const number = may.plan ? (
    <button
      type="button"
      ref={setActivatorNodeRef}
      {...attributes}
      {...listeners}
      data-handle={row.entry.id}
      aria-label={`${row.number}, move ${titleOfRow(row)}`}
      className="tabular flex h-full min-h-11 w-full cursor-grab touch-none items-center justify-center font-semibold text-lg hover:bg-grey-100 focus-visible:outline-offset-[-2px] active:cursor-grabbing lg:min-h-8 lg:text-xl"
    >
      {row.number}
    </button>
  ) : (
    <span className="tabular font-semibold text-lg lg:text-xl">{row.number}</span>
  );
  return (
    <li className={isDragging ? "opacity-35" : ""}>
      {row.gap ? <GapRow row={row} gap={row.gap} /> : null}
      <div ref={setNodeRef} data-box="entry" data-entry={row.entry.id} className="-mt-px">
        <SongRow row={row} set={set} first={first} last={last} troubles={troubles} number={number} />
      </div>
    </li>
  );
}
