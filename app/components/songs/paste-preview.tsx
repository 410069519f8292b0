import { CapoMark } from "#app/components/capo-mark.tsx";
import { TuningCells } from "#app/components/tuning-cells.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { formatTuning, spokenTuning } from "#app/domain/music/format-tuning.ts";
import { nameKey, spellingFifths } from "#app/domain/music/key.ts";
import { type Naming, stringNameWithOctave } from "#app/domain/music/note-names.ts";
import { sameTitle } from "#app/domain/repertoire/pasted-list.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";
import type { PastedSong, SongLine } from "#app/domain/repertoire/read-song-lines.ts";
import { usualPriority } from "#app/domain/repertoire/song.ts";
import { energyWords, priorityNames } from "#app/domain/repertoire/song-words.ts";

type PastePreviewProps = {
  lines: readonly SongLine[];
  naming: Naming;
  /** Length shown where a line names none. */
  seconds: number;
  library: readonly { id: string; title: string }[];
  /** True where a title that the library has means that song. */
  reuse: boolean;
};

/** What was understood of each line: a tick to keep it, or why it could not be read. */
export function PastePreview({ lines, naming, seconds, library, reuse }: PastePreviewProps) {
  return (
    <ul className="border-grey-200 border-t">
      {lines.map(({ line, raw, song, problem }) => (
        <li key={`${line}-${raw}`} className="border-grey-200 border-b bg-white">
          {song ? (
            <Understood
              line={line}
              song={song}
              naming={naming}
              seconds={seconds}
              known={sameTitle(song.title, library) !== undefined}
              reuse={reuse}
            />
          ) : (
            <div className="grid grid-cols-[2.75rem_minmax(0,1fr)] items-start gap-x-2 py-2 pr-3">
              <span className="text-center font-display text-grey-600 text-sm leading-6 tabular">{line}</span>
              <div className="flex flex-col gap-0.5">
                <p className="break-words">{raw.trim()}</p>
                <Warning>{problem}</Warning>
              </div>
            </div>
          )}
        </li>
      ))}
    </ul>
  );
}

type UnderstoodProps = {
  line: number;
  song: PastedSong;
  naming: Naming;
  seconds: number;
  known: boolean;
  reuse: boolean;
};

function Understood({ line, song, naming, seconds, known, reuse }: UnderstoodProps) {
  const fifths = spellingFifths(song.key, song.open);
  return (
    <label className="grid min-h-11 cursor-pointer grid-cols-[2.75rem_minmax(0,1fr)_auto] items-center gap-x-2 py-1 pr-3 xl:grid-cols-[2.75rem_minmax(0,1fr)_11rem_7rem_3rem_4rem]">
      <input
        type="checkbox"
        name="line"
        value={line}
        defaultChecked={reuse || !known}
        aria-label={`Keep ${song.title}`}
        className="size-5 justify-self-center accent-ink"
      />
      <span className="min-w-0">
        <span className="font-display font-semibold text-lg">{song.title}</span>
        {song.credit ? <span className="ml-2 text-grey-600 text-sm">{song.credit}</span> : null}
        <Remarks song={song} naming={naming} known={known} reuse={reuse} />
      </span>
      <span className="max-xl:col-start-2 max-xl:-ml-2">
        <TuningCells
          letters={formatTuning(song.open, naming, fifths)}
          spoken={spokenTuning(song.open, naming, fifths)}
        />
      </span>
      <span className="flex flex-wrap gap-1.5 max-xl:justify-self-end">
        {song.capos.map((capo) => (
          <CapoMark key={`${capo.fret}-${capo.strings.join()}`} capo={capo} strings={song.open.length} />
        ))}
      </span>
      <span className="font-display font-semibold max-xl:hidden">{nameKey(song.key, naming)}</span>
      <span
        className={`tabular justify-self-end max-xl:col-start-3 max-xl:row-start-1 ${song.seconds === null ? "text-grey-600 italic" : "text-grey-800"}`}
      >
        {formatDuration(song.seconds ?? seconds)}
      </span>
    </label>
  );
}

function Remarks({
  song,
  naming,
  known,
  reuse,
}: Pick<UnderstoodProps, "song" | "naming" | "known" | "reuse">) {
  const remarks = [
    known ? (reuse ? "in the library: that song is used" : "a song of this title is in the library") : "",
    song.openAssumed ? "no tuning on the line: usual tuning taken" : "",
    song.seconds === null ? "no length on the line" : "",
    song.energy === null ? "" : `energy ${energyWords(song.energy)}`,
    song.priority === usualPriority ? "" : priorityNames[song.priority],
    ...song.ambiguous.map(({ string, options }) => {
      const [taken, ...others] = options.map((midi) => stringNameWithOctave(midi, naming));
      return `string ${string} taken as ${taken}, could be ${others.join(" or ")}`;
    }),
  ].filter(Boolean);
  return remarks.length > 0 ? (
    <span className="block text-grey-600 text-sm">{remarks.join("; ")}</span>
  ) : null;
}
