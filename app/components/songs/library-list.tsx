import { Copy, Trash2 } from "lucide-react";
import { memo } from "react";
import { Link } from "react-router";
import { CapoMark } from "#app/components/capo-mark.tsx";
import { EnergyMark } from "#app/components/energy-mark.tsx";
import { PostButton } from "#app/components/post-button.tsx";
import { TuningCells } from "#app/components/tuning-cells.tsx";
import { formatTuning, spokenTuning } from "#app/domain/music/format-tuning.ts";
import { nameKey, spellingFifths, spokenKey } from "#app/domain/music/key.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { LibraryRow, LibrarySort } from "#app/domain/repertoire/library.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";
import { usualPriority } from "#app/domain/repertoire/song.ts";
import { priorityNames } from "#app/domain/repertoire/song-words.ts";

type LibraryListProps = {
  rows: readonly LibraryRow[];
  naming: Naming;
  mayEdit: boolean;
  sort: LibrarySort;
  descending: boolean;
  /** The address that shows the list in another order. */
  sortUrl: (sort: LibrarySort, descending: boolean) => string;
};

const columns =
  "grid items-center gap-x-4 grid-cols-[minmax(0,1fr)_auto] md:grid-cols-[minmax(0,1fr)_12.5rem_6.5rem_4.5rem_3.5rem_4.5rem] lg:grid-cols-[minmax(0,1fr)_12.5rem_6.5rem_4.5rem_4rem_3.5rem_4.5rem] xl:grid-cols-[minmax(14rem,24rem)_12.5rem_8rem_5rem_4rem_3.5rem_minmax(0,1fr)_4.5rem]";

const heads: { sort: LibrarySort | null; label: string; className?: string }[] = [
  { sort: "title", label: "Title" },
  { sort: "tuning", label: "Tuning" },
  { sort: null, label: "Capo" },
  { sort: "key", label: "Key" },
  { sort: "energy", label: "Energy", className: "max-lg:hidden" },
  { sort: "length", label: "Length", className: "justify-self-end" },
  { sort: null, label: "Credit", className: "max-xl:hidden xl:pl-4" },
];

/** The songs of the library, one row each. On a phone the heads become a line of ways to sort. */
export function LibraryList({ rows, naming, mayEdit, sort, descending, sortUrl }: LibraryListProps) {
  const credits = rows.some((row) => row.credit !== "");
  return (
    <div>
      <div
        className={`${columns} max-md:flex max-md:gap-x-5 border-grey-200 border-b px-4 md:px-6 font-display font-medium text-grey-600 text-sm`}
      >
        {heads
          .filter((head) => head.label !== "Credit" || credits)
          .map((head) =>
            head.sort ? (
              <SortLink
                key={head.label}
                label={head.label}
                className={head.className}
                state={head.sort !== sort ? null : descending ? "down" : "up"}
                to={sortUrl(head.sort, head.sort === sort && !descending)}
              />
            ) : (
              <span key={head.label} className={`max-md:hidden ${head.className ?? ""}`}>
                {head.label}
              </span>
            ),
          )}
      </div>
      <ul>
        {rows.map((row) => (
          <Row key={row.id} row={row} naming={naming} mayEdit={mayEdit} />
        ))}
      </ul>
    </div>
  );
}

type SortLinkProps = {
  label: string;
  to: string;
  state: "up" | "down" | null;
  className?: string;
};

function SortLink({ label, to, state, className = "" }: SortLinkProps) {
  return (
    <Link
      to={to}
      replace
      preventScrollReset
      aria-current={state ? "true" : undefined}
      className={`inline-flex min-h-9 items-center gap-1 hover:text-ink ${state ? "text-ink" : ""} ${className}`}
    >
      <span className="sr-only">Sort by </span>
      {label}
      {state ? (
        <>
          <span className="sr-only">{state === "up" ? ", sorted upwards" : ", sorted downwards"}</span>
          <svg width="8" height="5" viewBox="0 0 8 5" aria-hidden="true">
            <path d={state === "up" ? "M0 5 4 0l4 5Z" : "M0 0h8L4 5Z"} fill="currentColor" />
          </svg>
        </>
      ) : null}
    </Link>
  );
}

type RowProps = { row: LibraryRow; naming: Naming; mayEdit: boolean };

/** Drawn once: a search that leaves a row where it is does not draw it again. */
const Row = memo(function Row({ row, naming, mayEdit }: RowProps) {
  const { neck } = row;
  const fifths = neck ? spellingFifths(row.key, neck.open) : 0;
  return (
    <li className="group border-grey-200 border-b bg-white [contain-intrinsic-size:auto_44px] [content-visibility:auto] hover:bg-ground">
      <div className={`${columns} relative min-h-11 px-4 py-1 max-md:min-h-14 md:px-6`}>
        <p className="min-w-0 truncate max-md:col-start-1">
          <Link
            to={`/songs/${row.id}`}
            className="font-display font-semibold text-lg underline-offset-4 after:absolute after:inset-0 hover:underline"
          >
            {row.title}
          </Link>
          {row.ways > 1 ? <span className="ml-3 text-grey-600 text-sm">{`${row.ways} ways`}</span> : null}
          {row.priority === usualPriority ? null : (
            <span className="ml-3 text-grey-600 text-sm">{priorityNames[row.priority]}</span>
          )}
          {row.credit ? (
            <span className="ml-3 text-grey-600 text-sm max-md:hidden xl:hidden">{row.credit}</span>
          ) : null}
        </p>
        <p className="flex items-baseline gap-2 -ml-2 max-md:col-start-1 max-md:row-start-2">
          {neck ? (
            <TuningCells
              letters={formatTuning(neck.open, naming, fifths)}
              spoken={spokenTuning(neck.open, naming, fifths)}
            />
          ) : null}
        </p>
        <p className="flex flex-wrap items-center gap-1.5 max-md:row-start-2 max-md:justify-self-end">
          {neck?.capos.map((capo) => (
            <CapoMark key={`${capo.fret}-${capo.strings.join()}`} capo={capo} strings={neck.open.length} />
          ))}
        </p>
        <p className="font-display font-semibold text-base max-md:hidden">
          {row.key ? (
            <>
              <span aria-hidden="true">{nameKey(row.key, naming)}</span>
              <span className="sr-only">{spokenKey(row.key, naming)}</span>
            </>
          ) : null}
        </p>
        <p className="max-lg:hidden">{row.energy === null ? null : <EnergyMark energy={row.energy} />}</p>
        <p className="tabular justify-self-end text-grey-800 max-md:col-start-2 max-md:row-start-1">
          {formatDuration(row.seconds)}
        </p>
        <p className="truncate pl-4 text-grey-600 text-sm max-xl:hidden">{row.credit}</p>
        {mayEdit ? (
          <div className="relative z-10 flex justify-end opacity-60 focus-within:opacity-100 group-hover:opacity-100 max-md:hidden">
            <PostButton
              small
              look="quiet"
              action={`/songs/${row.id}/duplicate`}
              aria-label={`Duplicate ${row.title}`}
              title="Duplicate"
            >
              <Copy size={15} aria-hidden="true" />
            </PostButton>
            <PostButton
              small
              look="quiet"
              action={`/songs/${row.id}/delete`}
              aria-label={`Delete ${row.title}`}
              title="Delete"
            >
              <Trash2 size={15} aria-hidden="true" />
            </PostButton>
          </div>
        ) : null}
      </div>
    </li>
  );
});
