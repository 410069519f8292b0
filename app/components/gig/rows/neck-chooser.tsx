import { Popover } from "@base-ui/react/popover";
import { memo } from "react";
import { CapoMark } from "#app/components/capo-mark.tsx";
import { type EntryPayload, usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { NeckCells } from "#app/components/gig/rows/neck-cells.tsx";
import { GuitarBadge } from "#app/components/guitar-badge.tsx";
import { CheckField } from "#app/components/ui/field.tsx";
import { PopoverPopup } from "#app/components/ui/popover.tsx";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Entry, Gig, Pinned } from "#app/domain/gig/gig.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import { playableOn } from "#app/domain/repertoire/playable-on.ts";
import type { Song, SongNeck } from "#app/domain/repertoire/song.ts";

type NeckChooserProps = { gig: Gig; repertoire: Repertoire };

/** Guitar and way to play one song in this set: every way of the song, and the guitars that can play it so. */
export const NeckChooser = memo(function NeckChooser({ gig, repertoire }: NeckChooserProps) {
  const { chooser } = usePageTools();
  return (
    <Popover.Root handle={chooser}>
      {({ payload }: { payload: EntryPayload | undefined }) => {
        const entry = gig.entries.find((candidate) => candidate.id === payload?.entryId);
        const song = repertoire.songs.find((candidate) => candidate.id === entry?.songId);
        return (
          <PopoverPopup title={song ? `${song.title}: guitar and tuning` : "Guitar and tuning"}>
            {entry && song ? <Ways entry={entry} song={song} guitars={repertoire.guitars} /> : null}
          </PopoverPopup>
        );
      }}
    </Popover.Root>
  );
});

/** What a choice writes, leaving alone what already stands so. */
function choiceEdits(entry: Entry, guitarId: string, neckId: string): Edit[] {
  const edits: Edit[] = [];
  if (entry.guitarId !== guitarId)
    edits.push({ kind: "entry.set", entryId: entry.id, field: "guitarId", value: guitarId });
  if (entry.neckId !== neckId)
    edits.push({ kind: "entry.set", entryId: entry.id, field: "neckId", value: neckId });
  return edits;
}

function Ways({ entry, song, guitars }: { entry: Entry; song: Song; guitars: Guitar[] }) {
  return (
    <div className="flex flex-col">
      {song.necks.length === 0 ? <p>This song has no tuning yet. Open the song and add one.</p> : null}
      {song.necks.map((neck) => (
        <Way key={neck.id} neck={neck} entry={entry} song={song} guitars={guitars} />
      ))}
      <PinChecks entry={entry} title={song.title} />
    </div>
  );
}

type WayProps = { neck: SongNeck; entry: Entry; song: Song; guitars: Guitar[] };

function Way({ neck, entry, song, guitars }: WayProps) {
  const { naming, edit } = usePageTools();
  const { can, cannot } = playableOn(neck, guitars, naming);
  return (
    <div className="flex flex-col gap-1 border-grey-200 border-t py-2">
      <div className="flex flex-wrap items-center gap-3">
        <NeckCells neck={neck} songKey={song.key} naming={naming} changed={[]} />
        {neck.capos.map((capo) => (
          <CapoMark key={`${capo.fret}/${capo.strings.join()}`} capo={capo} strings={neck.open.length} />
        ))}
        {neck.penalty > 0 ? (
          <span className="text-grey-600 text-sm">second choice, counts {neck.penalty} s</span>
        ) : null}
      </div>
      <div className="flex flex-wrap gap-2">
        {can.map((guitar) => {
          const chosen = entry.guitarId === guitar.id && entry.neckId === neck.id;
          return (
            <button
              key={guitar.id}
              type="button"
              aria-pressed={chosen}
              aria-label={`Play it on ${guitar.name} this way`}
              className={`inline-flex min-h-11 items-center gap-2 rounded-sm border px-2 lg:min-h-9 ${chosen ? "border-ink bg-ink text-white" : "border-grey-300 hover:border-ink"}`}
              onClick={() =>
                edit(choiceEdits(entry, guitar.id, neck.id), `Play ${song.title} on ${guitar.shortName}`)
              }
            >
              <span className={chosen ? "text-ink" : ""}>
                <GuitarBadge shortName={guitar.shortName} shape={guitar.badge} title={guitar.name} />
              </span>
              {chosen ? <span className="text-sm">chosen</span> : null}
            </button>
          );
        })}
      </div>
      {can.length === 0 ? (
        <ul className="text-grey-600 text-sm">
          {cannot.map(({ guitar, reason }) => (
            <li key={guitar.id}>
              {guitar.name}: {reason}
            </li>
          ))}
        </ul>
      ) : null}
    </div>
  );
}

const pinOf = (guitar: boolean, neck: boolean): Pinned =>
  guitar && neck ? "both" : guitar ? "guitar" : neck ? "neck" : "none";

function PinChecks({ entry, title }: { entry: Entry; title: string }) {
  const { edit } = usePageTools();
  const guitar = entry.pinned === "guitar" || entry.pinned === "both";
  const neck = entry.pinned === "neck" || entry.pinned === "both";
  const pin = (value: Pinned) =>
    edit(
      [{ kind: "entry.set", entryId: entry.id, field: "pinned", value }],
      value === "none" ? `Unpin ${title}` : `Pin ${title}`,
    );
  return (
    <div className="border-grey-200 border-t pt-2">
      <CheckField
        id={`pin-guitar-${entry.id}`}
        label="Pin this guitar"
        checked={guitar}
        disabled={!entry.guitarId && !guitar}
        onChange={(event) => pin(pinOf(event.currentTarget.checked, neck))}
      />
      <CheckField
        id={`pin-neck-${entry.id}`}
        label="Pin this tuning and capo"
        checked={neck}
        disabled={!entry.neckId && !neck}
        onChange={(event) => pin(pinOf(guitar, event.currentTarget.checked))}
      />
      <p className="text-grey-600 text-sm">Less retuning leaves what is pinned as it is.</p>
    </div>
  );
}
