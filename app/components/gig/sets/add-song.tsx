import { Combobox } from "@base-ui/react/combobox";
import { Plus } from "lucide-react";
import { useMemo, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import { spellingFifths } from "#app/domain/music/key.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { folded } from "#app/domain/repertoire/library.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

type AddSongProps = {
  /** Songs that can be added, deleted ones left out. */
  songs: Song[];
  /** Songs that stand in the gig already: still offered, last and said so. */
  standing: ReadonlySet<string>;
  /** Where it goes, in words: "Set 1". */
  where: string;
  onAdd: (song: Song) => void;
  /** Takes the focus when it appears. */
  autoFocus?: boolean;
};

/** Tuning and capo of a song's first choice. @example neckWords(song, "english") // "DADGBE, capo 2" */
function neckWords(song: Song, naming: Naming): string {
  const neck = song.necks[0];
  if (!neck) return "no tuning yet";
  const tuning = compactTuning(neck.open, naming, spellingFifths(song.key, neck.open));
  return [tuning, ...neck.capos.map((capo) => `capo ${capo.fret}`)].join(", ");
}

function matches(song: Song, query: string): boolean {
  const words = folded(`${song.title} ${song.firstLine} ${song.credit}`);
  return folded(query)
    .split(/\s+/)
    .every((part) => words.includes(part));
}

/** A line to type in: each choice adds a song to the end of the section, and the line is ready for the next. */
export function AddSong({ songs, standing, where, onAdd, autoFocus }: AddSongProps) {
  const { naming } = usePageTools();
  const [query, setQuery] = useState("");
  const [added, setAdded] = useState("");
  const items = useMemo(
    () =>
      songs
        .filter((song) => !song.deleted)
        .toSorted(
          (a, b) => Number(standing.has(a.id)) - Number(standing.has(b.id)) || a.title.localeCompare(b.title),
        ),
    [songs, standing],
  );
  return (
    <Combobox.Root<Song>
      items={items}
      value={null}
      inputValue={query}
      onInputValueChange={setQuery}
      onValueChange={(song) => {
        if (!song) return;
        onAdd(song);
        setAdded(`${song.title} added to ${where}`);
        setQuery("");
      }}
      filter={matches}
      itemToStringLabel={(song) => song.title}
      autoHighlight
    >
      <div className="flex min-h-11 items-center gap-2 lg:min-h-9">
        <Plus size={16} aria-hidden="true" className="shrink-0 text-grey-600" />
        <Combobox.Input
          aria-label={`Add a song to ${where}`}
          placeholder={`Add a song to ${where}`}
          autoFocus={autoFocus}
          className="min-h-9 w-full min-w-0 bg-transparent px-1.5 focus-visible:-outline-offset-2 font-display font-medium text-base text-ink placeholder:text-grey-600"
        />
      </div>
      <span role="status" className="sr-only">
        {added}
      </span>
      <Combobox.Portal>
        <Combobox.Positioner className="z-[60]" sideOffset={2} align="start" collisionPadding={8}>
          <Combobox.Popup className="w-[max(var(--anchor-width),20rem)] max-w-[var(--available-width)] rounded-sm border border-ink bg-white">
            <Combobox.Empty>
              <p className="p-3 text-grey-600 empty:hidden">
                No song of yours matches. Paste a list, or write the song under Songs first.
              </p>
            </Combobox.Empty>
            <Combobox.List className="max-h-[min(20rem,var(--available-height))] overflow-y-auto overscroll-contain data-[empty]:hidden">
              {(song: Song) => (
                <Combobox.Item
                  key={song.id}
                  value={song}
                  className="grid min-h-11 cursor-default select-none grid-cols-[minmax(0,1fr)_auto] items-baseline gap-x-3 px-3 py-2 data-[highlighted]:bg-grey-100 sm:grid-cols-[minmax(0,1fr)_auto_auto] lg:min-h-9"
                >
                  <span className="min-w-0 truncate font-display font-semibold text-lg leading-tight">
                    {song.title}
                  </span>
                  <span className="font-display text-base text-grey-600 max-sm:order-last">
                    {standing.has(song.id) ? "in this gig, " : ""}
                    {neckWords(song, naming)}
                  </span>
                  <span className="tabular w-10 shrink-0 text-right text-base">
                    {formatDuration(song.seconds)}
                  </span>
                </Combobox.Item>
              )}
            </Combobox.List>
          </Combobox.Popup>
        </Combobox.Positioner>
      </Combobox.Portal>
    </Combobox.Root>
  );
}
