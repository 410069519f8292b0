import { type Naming, type Note, noteName, spellString, spokenNote } from "#app/domain/music/note-names.ts";

/** A string's note with its octave small beside it, in the reader's naming. */
export function StringNote({ note, naming }: { note: Note; naming: Naming }) {
  return (
    <>
      <span className="sr-only">{`${spokenNote(note, naming)} ${note.octave}`}</span>
      <span aria-hidden="true" className="whitespace-nowrap">
        {noteName(note, naming)}
        <span className="font-medium text-[0.65em] text-grey-600">{note.octave}</span>
      </span>
    </>
  );
}

/** As `StringNote`, for a pitch that is spelled in a signature. */
export function PitchNote({ midi, naming, fifths }: { midi: number; naming: Naming; fifths: number }) {
  return <StringNote note={spellString(midi, fifths)} naming={naming} />;
}
