import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import type { Drag } from "#app/components/gig/drag/use-row-drag.ts";
import { SongItem } from "#app/components/gig/rows/song-item.tsx";
import type { Part } from "#app/components/gig/sets/moves.ts";
import { partName } from "#app/components/gig/sets/moves.ts";
import type { GigSet } from "#app/domain/gig/gig.ts";
import type { Row } from "#app/domain/gig/plan.ts";

const none: readonly string[] = [];

type SetSectionProps = {
  part: Part;
  set: GigSet;
  rows: Row[];
  /** Entries at the ends of the whole set. */
  firstId: string | undefined;
  lastId: string | undefined;
  troubles: ReadonlyMap<string, string[]>;
  /** The row that is on its way. */
  drag: Drag | null;
  /** Where each entry of the gig stands as it is kept. */
  keptPlaces: ReadonlyMap<string, number>;
};

function sortedBy(places: ReadonlyMap<string, number>, rows: readonly Row[]): readonly Row[] {
  const place = (row: Row) => places.get(row.entry.id) ?? 0;
  return rows.toSorted((a, b) => place(a) - place(b));
}

/**
 * The songs of one section in their order, with their gaps. While a row is dragged they keep their order in the document
 * and only look moved: taking a row out and putting it in elsewhere would lay it out from nothing, and take the focus
 * from the number that is held.
 */
export function SetSection(props: SetSectionProps) {
  const { part, set, rows, firstId, lastId, troubles, drag, keptPlaces } = props;
  const { may } = usePageTools();
  const inKeptOrder = drag ? sortedBy(keptPlaces, rows) : rows;
  return (
    <>
      {part.section === 1 ? (
        <h3
          data-box="head"
          data-set={set.id}
          data-section={1}
          className="flex h-8 items-end pb-1 pl-[60px] font-semibold text-base text-grey-800 lg:pl-[66px]"
        >
          Encore
        </h3>
      ) : null}
      {rows.length > 0 ? (
        // biome-ignore lint/a11y/noRedundantRoles: Safari drops the list where its marks are styled away
        <ol role="list" aria-label={partName(part)} className="flex flex-col pt-px">
          {inKeptOrder.map((row) => (
            <SongItem
              key={row.entry.id}
              row={row}
              order={drag ? row.number : null}
              set={set}
              first={row.entry.id === firstId}
              last={row.entry.id === lastId}
              troubles={troubles.get(row.entry.id) ?? none}
              dragged={row.entry.id === drag?.entryId ? (drag.lifted ? "pointer" : "keys") : null}
            />
          ))}
        </ol>
      ) : (
        <p className="flex min-h-10 items-center border-grey-200 border-y border-dashed pl-[60px] text-grey-600 lg:pl-[66px]">
          {may.plan ? "No songs yet. Add some below, or paste a list." : "No songs yet."}
        </p>
      )}
    </>
  );
}
