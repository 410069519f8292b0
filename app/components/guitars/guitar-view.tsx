import type { ReactNode } from "react";
import { GuitarBadge } from "#app/components/guitar-badge.tsx";
import { dayWords, kindWords } from "#app/components/guitars/kind-words.ts";
import { flats, sharps } from "#app/components/guitars/reach-table.tsx";
import { PitchNote } from "#app/components/tuning/string-note.tsx";
import { fifthsOfTuning, type Naming } from "#app/domain/music/note-names.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

type GuitarViewProps = { guitar: Guitar; spareFor: string | null; naming: Naming };

/** A guitar to be read, for those who do not look after the instruments. */
export function GuitarView({ guitar, spareFor, naming }: GuitarViewProps) {
  return (
    <div className="flex flex-col gap-6 px-4 py-5 md:px-6">
      <div className="overflow-x-auto">
        <Pitches guitar={guitar} naming={naming} />
      </div>
      <dl className="flex max-w-xl flex-col gap-3">
        <Fact label="Badge">
          <GuitarBadge shortName={guitar.shortName} shape={guitar.badge} />
        </Fact>
        <Fact label="Kind">{`${kindWords[guitar.kind]}, ${guitar.strings} strings${guitar.leftHanded ? ", left-handed" : ""}`}</Fact>
        {guitar.keeps ? <Fact label="In the show">Keeps its tuning</Fact> : null}
        {spareFor ? <Fact label="Spare for">{spareFor}</Fact> : null}
        {guitar.channel ? <Fact label="Channel">{guitar.channel}</Fact> : null}
        {guitar.strungOn ? <Fact label="Strings fitted">{dayWords(guitar.strungOn)}</Fact> : null}
        {guitar.notes ? <Fact label="Notes">{guitar.notes}</Fact> : null}
      </dl>
    </div>
  );
}

function Pitches({ guitar, naming }: { guitar: Guitar; naming: Naming }) {
  const fifths = fifthsOfTuning(guitar.usual);
  const rows = [
    { label: "Usual", pitches: guitar.usual, signature: fifths, className: "text-xl leading-9" },
    { label: "Highest", pitches: guitar.highest, signature: sharps, className: "text-grey-800" },
    { label: "Lowest", pitches: guitar.lowest, signature: flats, className: "text-grey-800" },
  ];
  return (
    <table className="border-collapse text-center font-display tabular">
      <caption className="sr-only">Usual, highest and lowest pitch of each string</caption>
      <thead>
        <tr>
          <RowHead>String</RowHead>
          {guitar.usual.map((_, index) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: a string is known by its place
            <th key={index} scope="col" className="w-11 font-medium text-grey-600 text-sm">
              {guitar.strings - index}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map(({ label, pitches, signature, className }) => (
          <tr key={label}>
            <RowHead>{label}</RowHead>
            {pitches.map((midi, index) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: a string is known by its place
              <td key={index} className={`font-semibold ${className}`}>
                <PitchNote midi={midi} naming={naming} fifths={signature} />
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function RowHead({ children }: { children: ReactNode }) {
  return (
    <th scope="row" className="pr-4 text-left font-medium text-grey-600 text-sm">
      {children}
    </th>
  );
}

function Fact({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="grid grid-cols-[7rem_minmax(0,1fr)] gap-3">
      <dt className="font-display font-medium text-grey-600">{label}</dt>
      <dd className="whitespace-pre-line">{children}</dd>
    </div>
  );
}
