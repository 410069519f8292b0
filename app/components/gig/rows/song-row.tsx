import { Menu } from "@base-ui/react/menu";
import { Popover } from "@base-ui/react/popover";
import { Ellipsis, Pin } from "lucide-react";
import { memo, type ReactNode } from "react";
import { CapoMark } from "#app/components/capo-mark.tsx";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { NeckCells } from "#app/components/gig/rows/neck-cells.tsx";
import { chooserTriggerId, menuTriggerId } from "#app/components/gig/rows/row-menu.tsx";
import { RowTags } from "#app/components/gig/rows/row-tags.tsx";
import { RowTroubles, RowWarnings } from "#app/components/gig/rows/row-warnings.tsx";
import { sameBody, sameWords } from "#app/components/gig/rows/same-row.ts";
import { GuitarBadge } from "#app/components/guitar-badge.tsx";
import type { Entry, GigSet } from "#app/domain/gig/gig.ts";
import type { Row } from "#app/domain/gig/plan.ts";
import { nameKey, spokenKey } from "#app/domain/music/key.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";

/** Title of a row's song; an entry whose song is nowhere in the repertoire keeps its place under this name. */
export function titleOfRow(row: Pick<Row, "song">): string {
  return row.song?.title ?? "Song that is gone";
}

type RowBodyProps = {
  row: Row;
  set: Pick<GigSet, "id" | "holdFirst" | "holdLast">;
  first: boolean;
  last: boolean;
  /** What must be mended about it. */
  troubles: readonly string[];
  /** Without anything to press: the picture of a row that is being dragged. */
  plain?: boolean;
};

type SongRowProps = RowBodyProps & {
  /** The number, as a handle to drag the row by, or plain. */
  number: ReactNode;
};

const areas =
  "grid grid-cols-[48px_minmax(0,1fr)_auto_auto_44px] [grid-template-areas:'num_title_capo_badge_menu'_'num_cells_capo_badge_menu'_'num_warn_warn_warn_warn'] lg:grid-cols-[52px_minmax(0,1fr)_82px_auto_72px_44px_44px_36px] lg:[grid-template-areas:'num_title_badge_cells_capo_key_len_menu'_'num_warn_warn_warn_warn_warn_warn_warn']";

/** One song of a set. */
export function SongRow({ number, ...body }: SongRowProps) {
  return (
    <div className={`${areas} items-center border-grey-200 border-y bg-white lg:min-h-10 lg:border-l-0`}>
      <div className="flex h-full items-center justify-center self-stretch border-grey-200 border-r [grid-area:num]">
        {number}
      </div>
      <RowBody {...body} />
    </div>
  );
}

/** All of a row but its number. */
const RowBody = memo(
  RowBodyOnce,
  (before, after) =>
    sameBody(before.row, after.row) &&
    before.set === after.set &&
    before.first === after.first &&
    before.last === after.last &&
    before.plain === after.plain &&
    sameWords(before.troubles, after.troubles),
);

function RowBodyOnce({ row, set, first, last, troubles, plain = false }: RowBodyProps) {
  const { naming, may } = usePageTools();
  const { entry, song, neck } = row;
  const title = titleOfRow(row);
  const shown = neck ?? song?.necks[0] ?? null;
  return (
    <>
      <div className="flex min-w-0 items-baseline gap-x-2 self-end pt-1.5 pr-2 pl-3 [grid-area:title] lg:self-center lg:pt-0 lg:pl-3.5">
        <span
          className="min-w-16 truncate font-display font-semibold text-lg leading-6 lg:text-xl"
          title={title}
        >
          {title}
        </span>
        {plain ? null : (
          <RowTags
            title={title}
            entryId={entry.id}
            setId={set.id}
            rules={row.rules}
            first={first}
            last={last}
            holdFirst={set.holdFirst}
            holdLast={set.holdLast}
          />
        )}
        {plain || row.gap ? null : <RowWarnings entryId={entry.id} warnings={row.warnings} />}
      </div>
      <div className="flex justify-end pr-1 [grid-area:badge] lg:justify-start">
        <ChooserButton
          entry={entry}
          guitar={row.guitar}
          title={title}
          plain={plain || !may.prepare || !song}
        />
      </div>
      <div className="-ml-1 min-h-5 self-start pb-1.5 pl-3 [grid-area:cells] lg:ml-0 lg:min-w-36 lg:self-center lg:p-0">
        {shown ? (
          <span className={neck ? "" : "text-grey-600"}>
            <NeckCells neck={shown} songKey={song?.key ?? ""} naming={naming} changed={row.retuned} />
          </span>
        ) : null}
      </div>
      <div className="flex items-center gap-1.5 pr-2 [grid-area:capo] lg:pr-0 lg:pl-3">
        {shown?.capos.map((capo) => (
          <CapoMark key={`${capo.fret}/${capo.strings.join()}`} capo={capo} strings={shown.open.length} />
        ))}
      </div>
      <KeyAndLength songKey={song?.key ?? ""} seconds={song?.seconds ?? null} naming={naming} />
      <div className="flex justify-end [grid-area:menu]">
        {may.prepare && !plain ? <MenuButton entryId={entry.id} title={title} /> : null}
      </div>
      <RowTroubles troubles={troubles} wishes={row.wishes} plain={plain} />
    </>
  );
}

function KeyAndLength({
  songKey,
  seconds,
  naming,
}: {
  songKey: string;
  seconds: number | null;
  naming: Naming;
}) {
  const shown = nameKey(songKey, naming);
  return (
    <>
      <div
        className={`hidden whitespace-nowrap font-display font-medium [grid-area:key] lg:block ${shown.length > 3 ? "text-base" : "text-lg"}`}
      >
        {songKey ? (
          <>
            <span aria-hidden="true">{shown}</span>
            <span className="sr-only">Key {spokenKey(songKey, naming)}</span>
          </>
        ) : null}
      </div>
      <div className="tabular hidden text-right font-medium text-lg text-grey-800 [grid-area:len] lg:block">
        {seconds === null ? "" : formatDuration(seconds)}
      </div>
    </>
  );
}

type ChooserButtonProps = { entry: Entry; guitar: Guitar | null; title: string; plain: boolean };

const ChooserButton = memo(function ChooserButton({ entry, guitar, title, plain }: ChooserButtonProps) {
  const { chooser } = usePageTools();
  const pinned = entry.pinned !== "none";
  const face = (
    <>
      {guitar ? (
        <GuitarBadge shortName={guitar.shortName} shape={guitar.badge} title={guitar.name} />
      ) : (
        <span className="border border-grey-400 border-dashed px-2 font-display text-grey-600 text-sm">
          none
        </span>
      )}
      {pinned ? <Pin size={13} aria-hidden="true" className="shrink-0" fill="currentColor" /> : null}
      {pinned ? <span className="sr-only">, pinned</span> : null}
    </>
  );
  if (plain) return <span className="inline-flex items-center gap-0.5">{face}</span>;
  return (
    <Popover.Trigger
      id={chooserTriggerId(entry.id)}
      handle={chooser}
      payload={{ entryId: entry.id }}
      aria-label={`${guitar?.name ?? "No guitar"}${pinned ? ", pinned" : ""}: choose guitar and tuning for ${title}`}
      className="inline-flex min-h-11 items-center gap-0.5 rounded-sm hover:bg-grey-100 lg:min-h-8"
    >
      {face}
    </Popover.Trigger>
  );
});

const MenuButton = memo(function MenuButton({ entryId, title }: { entryId: string; title: string }) {
  const { rowMenu } = usePageTools();
  return (
    <Menu.Trigger
      id={menuTriggerId(entryId)}
      handle={rowMenu}
      payload={{ entryId }}
      aria-label={`${title}: more`}
      className="inline-flex size-11 items-center justify-center rounded-sm text-grey-600 hover:bg-grey-100 hover:text-ink lg:size-8"
    >
      <Ellipsis size={18} aria-hidden="true" />
    </Menu.Trigger>
  );
});
