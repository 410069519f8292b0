import type { ReactNode } from "react";
import { FromUsual } from "#app/components/tuning/from-usual.tsx";
import { StringNote } from "#app/components/tuning/string-note.tsx";
import { stops } from "#app/domain/music/capo.ts";
import type { Capo } from "#app/domain/music/neck.ts";
import { type Naming, type Note, spellString } from "#app/domain/music/note-names.ts";

/** A string of the table: its note, and how far that is from usual (null: not told). */
export type NeckString = { note: Note; midi: number; semitones: number };

type NeckTableProps = {
  strings: readonly NeckString[];
  capos: readonly Capo[];
  naming: Naming;
  /** The signature that what sounds is spelled in. */
  fifths: number;
  /** Read out before the table. */
  caption: string;
};

const leastFrets = 4;

/** Strings to the gauge they are drawn with, low strings thicker. */
function gauge(index: number, count: number): number {
  return 3 - (2 * index) / Math.max(1, count - 1);
}

/**
 * One neck string by string, low side first: what each is tuned to, how far that is from usual, the capos on a small
 * fingerboard that stands under the letters, and what the open strings then sound.
 */
export function NeckTable({ strings, capos, naming, fifths, caption }: NeckTableProps) {
  const count = strings.length;
  const stopped = stops(capos, count);
  const frets = Math.max(leastFrets, ...capos.map((capo) => capo.fret + 1));
  const cell = count > 8 ? "w-7" : "w-11";
  const head = (label: ReactNode) => (
    <th scope="row" className="w-20 pr-3 text-left font-medium text-grey-600 text-sm">
      {label}
    </th>
  );
  return (
    <table className="table-fixed border-collapse text-center font-display tabular">
      <caption className="sr-only">{caption}</caption>
      <thead>
        <tr>
          {head("String")}
          {strings.map(({ midi }, index) => (
            <th
              // biome-ignore lint/suspicious/noArrayIndexKey: a string is known by its place
              key={`${index}-${midi}`}
              scope="col"
              className={`${cell} py-0.5 font-medium text-grey-600 text-sm`}
            >
              {count - index}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        <Row
          head={head("Tuned to")}
          strings={strings}
          className="font-semibold text-xl leading-8"
          cell={({ note }) => <StringNote note={note} naming={naming} />}
        />
        <Row
          head={head("From usual")}
          strings={strings}
          className="font-semibold text-sm"
          cell={({ semitones }) => <FromUsual semitones={semitones} />}
        />
        {capos.length > 0 ? (
          <>
            <tr className="h-2" />
            {Array.from({ length: frets }, (_, index) => index + 1).map((fret) => (
              <FretRow key={fret} fret={fret} capos={capos} stopped={stopped} />
            ))}
            <Row
              head={head("Sounds")}
              strings={strings}
              className="font-semibold text-xl leading-9"
              cell={({ midi }, index) => (
                <StringNote note={spellString(midi + stopped[index]!, fifths)} naming={naming} />
              )}
            />
          </>
        ) : null}
      </tbody>
    </table>
  );
}

type RowProps = {
  head: ReactNode;
  strings: readonly NeckString[];
  className: string;
  cell: (string: NeckString, index: number) => ReactNode;
};

function Row({ head, strings, className, cell }: RowProps) {
  return (
    <tr>
      {head}
      {strings.map((string, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a string is known by its place
        <td key={index} className={className}>
          {cell(string, index)}
        </td>
      ))}
    </tr>
  );
}

type FretRowProps = {
  fret: number;
  capos: readonly Capo[];
  stopped: readonly number[];
};

/** One fret of the fingerboard. The picture repeats what the rows and the capo field say, so readers skip it. */
function FretRow({ fret, capos, stopped }: FretRowProps) {
  const count = stopped.length;
  const covers = (string: number) =>
    capos.some((capo) => capo.fret === fret && capo.strings.includes(string));
  const any = capos.some((capo) => capo.fret === fret);
  return (
    // biome-ignore lint/a11y/noAriaHiddenOnFocusable: a table row takes no focus
    <tr aria-hidden="true" className="h-4">
      <td className="pr-3 text-left font-medium text-grey-800 text-sm leading-4">
        {any ? `Capo ${fret}` : ""}
      </td>
      {stopped.map((stop, index) => {
        const string = count - index;
        const first = covers(string) && !covers(string + 1);
        const last = covers(string) && !covers(string - 1);
        return (
          <td
            // biome-ignore lint/suspicious/noArrayIndexKey: a string is known by its place
            key={index}
            className={`relative border-grey-300 p-0 ${fret === 1 ? "border-t-2 border-t-ink" : ""} border-b`}
          >
            <span
              style={{ width: gauge(index, count) }}
              className={`absolute inset-y-0 left-1/2 -translate-x-1/2 ${fret > stop ? "bg-ink" : "bg-grey-300"}`}
            />
            {covers(string) ? (
              <span
                className={`absolute bottom-0.5 h-2.5 bg-brass ${first ? "left-1.5 rounded-l-sm" : "-left-px"} ${last ? "right-1.5 rounded-r-sm" : "-right-px"}`}
              />
            ) : null}
          </td>
        );
      })}
    </tr>
  );
}
