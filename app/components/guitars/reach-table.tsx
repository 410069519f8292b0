import type { ReactNode } from "react";
import { PitchNote } from "#app/components/tuning/string-note.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { fifthsOfTuning, type Naming } from "#app/domain/music/note-names.ts";
import { defaultReach } from "#app/domain/music/range.ts";

/** The inputs for one direction: the name they post under, what they hold now, and what is wrong with each. */
export type ReachInputs = {
  name: string;
  initial: readonly (string | undefined)[];
  typed: readonly (string | undefined)[];
  errors: Record<string, string[]>;
};

type ReachTableProps = { usual: readonly number[]; below: ReachInputs; above: ReachInputs; naming: Naming };

/** Signatures that spell what a string is raised to in sharps, and what it is let down to in flats. */
export const sharps = 5;
export const flats = -5;

/** Each string's usual pitch and how far it may go from it, typed as semitones and told as notes. */
export function ReachTable({ usual, below, above, naming }: ReachTableProps) {
  const fifths = fifthsOfTuning(usual);
  const count = usual.length;
  const note = (midi: number | null, signature = fifths) =>
    midi === null ? null : <PitchNote midi={midi} naming={naming} fifths={signature} />;
  const errors = [...new Set([below, above].flatMap((inputs) => Object.values(inputs.errors).flat()))];
  return (
    <div className="flex flex-col gap-2">
      <div className="overflow-x-auto pb-1">
        <table className="border-collapse text-center font-display tabular">
          <caption className="sr-only">How far each string may be tuned from its usual pitch</caption>
          <thead>
            <tr>
              <Head>String</Head>
              {usual.map((midi, index) => (
                <th
                  // biome-ignore lint/suspicious/noArrayIndexKey: a string is known by its place
                  key={`${index}-${midi}`}
                  scope="col"
                  className="min-w-11 font-medium text-grey-600 text-sm"
                >
                  {count - index}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            <Notes label="Usual" notes={usual.map((midi) => note(midi))} className="text-xl leading-9" />
            <Inputs label="Up by" what="up" count={count} inputs={above} fallback={defaultReach.above} />
            <Notes
              label="Highest"
              notes={usual.map((midi, index) =>
                note(moved(midi, above.typed[index], defaultReach.above, 1), sharps),
              )}
              className="text-grey-800"
            />
            <Inputs label="Down by" what="down" count={count} inputs={below} fallback={defaultReach.below} />
            <Notes
              label="Lowest"
              notes={usual.map((midi, index) =>
                note(moved(midi, below.typed[index], defaultReach.below, -1), flats),
              )}
              className="text-grey-800"
            />
          </tbody>
        </table>
      </div>
      {errors.map((error) => (
        <Warning key={error}>{error}</Warning>
      ))}
    </div>
  );
}

function moved(usual: number, typed: string | undefined, fallback: number, way: 1 | -1): number | null {
  const semitones = typed ? Number(typed) : fallback;
  const midi = usual + way * semitones;
  return Number.isInteger(midi) && midi >= 0 && midi <= 127 ? midi : null;
}

function Head({ children }: { children: ReactNode }) {
  return (
    <th scope="row" className="pr-3 text-left font-medium text-grey-600 text-sm">
      {children}
    </th>
  );
}

function Notes({ label, notes, className }: { label: string; notes: ReactNode[]; className: string }) {
  return (
    <tr>
      <Head>{label}</Head>
      {notes.map((note, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a string is known by its place
        <td key={index} className={`font-semibold ${className}`}>
          {note}
        </td>
      ))}
    </tr>
  );
}

type InputsProps = { label: string; what: string; count: number; inputs: ReachInputs; fallback: number };

function Inputs({ label, what, count, inputs, fallback }: InputsProps) {
  return (
    <tr>
      <Head>{label}</Head>
      {Array.from({ length: count }, (_, index) => {
        const name = `${inputs.name}[${index}]`;
        return (
          <td key={name} className="px-0.5 pt-1.5">
            <input
              name={name}
              defaultValue={inputs.initial[index] ?? String(fallback)}
              inputMode="numeric"
              maxLength={2}
              autoComplete="off"
              aria-label={`String ${count - index}, semitones ${what}`}
              aria-invalid={inputs.errors[name] ? true : undefined}
              className="h-9 w-10 rounded-sm border border-grey-400 bg-white text-center font-semibold aria-[invalid=true]:border-2 aria-[invalid=true]:border-warning"
            />
          </td>
        );
      })}
    </tr>
  );
}
