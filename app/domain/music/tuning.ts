import {
  fifthsOfTuning,
  midiOfNote,
  type Naming,
  type Note,
  pitchClassOfLetter,
  spellString,
} from "#app/domain/music/note-names.ts";
import { type Midi, octaveOf, type PitchClass, type Semitones, wrap } from "#app/domain/music/pitch.ts";
import { readNoteRow } from "#app/domain/music/read-note-row.ts";
import { type WrittenNote, wordsToSigns } from "#app/domain/music/read-notes.ts";
import { readTuningName } from "#app/domain/music/tuning-names.ts";
import { readTuningShift } from "#app/domain/music/tuning-shift.ts";

/** What was understood of one string. */
export type TunedString = {
  /** String number; 1 is the highest-sounding side. */
  string: number;
  midi: Midi;
  /** The note as it was spelled, or as the tuning itself suggests where a name was typed. */
  note: Note;
  /** Semitones from the string's usual pitch. */
  semitones: Semitones;
  /** The same note in another octave that is as near to the usual pitch (half an octave either way). */
  alternatives: Midi[];
};

/** A string whose letter can mean two notes; `options` are MIDI numbers, the one taken for now first. */
export type AmbiguousString = { string: number; options: Midi[] };

export type TuningReading =
  | { ok: true; open: Midi[]; notes: TunedString[]; ambiguous: AmbiguousString[] }
  | { ok: false; message: string; part: string };

/** Twelve strings of "Sol♯4" with separators are shorter. */
const longestTuning = 100;

export type ReadTuningOptions = {
  /** Usual pitches of the instrument, low side first: they give the number of strings and the octaves. */
  usual: readonly Midi[];
  naming: Naming;
  /** The person's answer where a bare B was ambiguous. */
  bareB?: "natural" | "flat";
};

/**
 * The pitch of a pitch class nearest to a string's usual pitch; of two equally near the slacker (lower).
 * Common practice, no source.
 * @example nearestPitch(5, 59) // 53: F below B3, not F4
 */
export function nearestPitch(pitchClass: PitchClass, usual: Midi): Midi {
  const up = wrap(pitchClass - usual, 12);
  return up < 6 ? usual + up : usual + up - 12;
}

/**
 * Reads a tuning as players type it: letters low side first with or without separators, octaves and signs
 * ("CGCFFC", "D A D G A D", "E2 A2 D3 G3 B3 E4", "C#G#C#F#A#D#"), a name in the trade ("drop D", "open G",
 * "Eb standard"), a move ("half step down", "down 1"), or either with a move ("DADGAD down 1"). A letter without
 * octave stands nearest to the string's usual pitch, the slacker of two. On an instrument in courses a note a course will do.
 * @returns the pitches, what was understood string by string, and the strings whose letter can mean two notes (a
 * bare B to those who write H); or what is wrong, where, and what to do. It never throws.
 * @example readTuning("CGCFFC", { usual: [40, 45, 50, 55, 59, 64], naming: "english" })
 * // { ok: true, open: [36, 43, 48, 53, 53, 60], … }
 */
export function readTuning(text: string, options: ReadTuningOptions): TuningReading {
  const { usual, naming, bareB } = options;
  const typed = cleaned(text);
  if (typed === "")
    return refuse("", "Write a tuning from the lowest string up, such as DADGAD, or a name, such as drop D.");
  if (typed.length > longestTuning) {
    return refuse(`${typed.slice(0, 20)}…`, "This is too long for a tuning. Write one note for each string.");
  }
  const remark = /^([^()[\]]+?)\s*[([]([^()[\]]+)$/u.exec(typed);
  if (remark) return readWithRemark(remark[1]!, remark[2]!, options);
  const { shift, rest } = readTuningShift(typed);
  const move = (open: readonly Midi[]) => open.map((midi) => midi + shift);
  if (rest === "") return understood(options, [move(usual)]);

  const flatB = bareB === "flat" || (bareB === undefined && naming === "german");
  const named = readTuningName(rest, usual, naming, flatB);
  if (named && "wrongCount" in named) {
    const counts = named.wrongCount.join(" or ");
    return refuse(
      rest,
      `${named.name} is a tuning for ${counts} strings; this instrument has ${usual.length}.`,
    );
  }
  if (!named) return readLetters(rest, shift, options);
  const asked = named.bareB && bareB === undefined && naming === "german";
  const other = asked ? readTuningName(rest, usual, naming, !flatB) : null;
  return understood(options, [move(named.open), ...(other && "open" in other ? [move(other.open)] : [])]);
}

function refuse(part: string, message: string): TuningReading {
  return { ok: false, part, message };
}

/** A name with its letters behind it in brackets, or the other way round: "drop D (DADGBE)". */
function readWithRemark(text: string, remark: string, options: ReadTuningOptions): TuningReading {
  const first = readTuning(text, options);
  const second = readTuning(remark, options);
  if (!first.ok || !second.ok) return second.ok ? second : first;
  if (first.open.join() === second.open.join()) return second.ambiguous.length > 0 ? first : second;
  return refuse(remark, `"${text}" and "${remark}" are two tunings. Write one of them.`);
}

function cleaned(text: string): string {
  return wordsToSigns(text.normalize("NFC"))
    .replace(/^[\s"'“”„([{]+|[\s"'“”)\]}.]+$/gu, "")
    .replace(/^(?:tuning|tuned to|tune to)(?!\p{L})\s*:?\s*/iu, "")
    .replace(/\s+tuning$/i, "")
    .replace(/\s+/g, " ");
}

function readLetters(text: string, shift: Semitones, options: ReadTuningOptions): TuningReading {
  const { usual, naming } = options;
  const courses = coursesOf(usual);
  const row = readNoteRow(text, naming, courses ? [usual.length, courses] : [usual.length]);
  if (row.kind === "unreadable") {
    const where = row.before === "" ? "" : ` after ${row.before}`;
    return refuse(
      row.part,
      `"${row.part}"${where} is no note. Write one letter for each string, such as D A D G A D, or a name, such as drop D.`,
    );
  }
  if (row.kind === "count") {
    const needed = courses ? `${usual.length}, or ${courses} with one a course` : `${usual.length}`;
    const read = row.read === 1 ? "1 note was" : `${row.read} notes were`;
    return refuse(
      text,
      `${read} read; this instrument needs ${needed}. Write one for each string, lowest first.`,
    );
  }
  const distance = (notes: readonly Note[]) =>
    notes.reduce((sum, note, index) => sum + Math.abs(midiOfNote(note) - usual[index]!), 0);
  const readings = row.readings
    .flatMap((written) =>
      bareBMeanings(written, options).map((alter, rank) => ({ rank, notes: spelled(written, alter, usual) })),
    )
    .toSorted((one, other) => one.rank - other.rank || distance(one.notes) - distance(other.notes))
    .map(({ notes }) => notes);
  const opens = readings.map((notes) => notes.map((note) => midiOfNote(note) + shift));
  return understood(options, opens, shift === 0 ? readings[0] : undefined);
}

/** Strings to the course where the instrument has two to each, in unison or an octave apart; null where it has not. */
function coursesOf(usual: readonly Midi[]): number | null {
  if (usual.length < 8 || usual.length % 2 === 1) return null;
  const paired = usual.every((midi, index) => index % 2 === 1 || (midi - usual[index + 1]!) % 12 === 0);
  return paired ? usual.length / 2 : null;
}

/** What a bare B is lowered by, likeliest first; two answers where the person must be asked. */
function bareBMeanings(written: readonly WrittenNote[], { naming, bareB }: ReadTuningOptions): number[] {
  const [natural, flat] = [0, -1];
  if (bareB !== undefined) return [bareB === "flat" ? flat : natural];
  if (!written.some((note) => note.bareB)) return [natural];
  if (written.some((note) => note.german && note.letter === "B")) return [flat];
  if (written.some((note) => note.signedB)) return [natural];
  const german = naming === "german" || written.some((note) => note.german);
  return german ? [flat, natural] : [natural];
}

/** The written notes as notes with octaves, one a string; on courses one written note serves both strings. */
function spelled(written: readonly WrittenNote[], bareBAlter: number, usual: readonly Midi[]): Note[] {
  const perNote = usual.length / written.length;
  return usual.map((pitch, index) => {
    const { letter, octave, ...note } = written[Math.floor(index / perNote)]!;
    const alter = note.bareB ? bareBAlter : note.alter;
    if (octave === null) {
      const midi = nearestPitch(pitchClassOfLetter(letter, alter), pitch);
      return { letter, alter, octave: octaveOf(midi - alter) };
    }
    const first = index - (index % perNote);
    const lowest = Math.min(...usual.slice(first, first + perNote));
    return { letter, alter, octave: octave + (perNote > 1 ? (pitch - lowest) / 12 : 0) };
  });
}

/** The reading that is taken (the first), told string by string, beside what the others would make of it. */
function understood(
  { usual }: ReadTuningOptions,
  readings: Midi[][],
  spelling?: readonly Note[],
): TuningReading {
  const open = readings[0]!;
  const impossible = open.findIndex((midi) => midi < 0 || midi > 127);
  if (impossible >= 0) {
    return refuse(
      `string ${open.length - impossible}`,
      `String ${open.length - impossible} would be outside what any string sounds. Check its octave: a guitar's low E is E2.`,
    );
  }
  const fifths = fifthsOfTuning(open);
  const notes = open.map((midi, index) => {
    const semitones = midi - usual[index]!;
    const alternatives = Math.abs(semitones) === 6 ? [midi - 2 * semitones] : [];
    const note = spelling?.[index] ?? spellString(midi, fifths);
    return { string: open.length - index, midi, note, semitones, alternatives };
  });
  const ambiguous = open.flatMap((midi, index) => {
    const options = [...new Set(readings.map((reading) => reading[index]!))];
    return options.length > 1 ? [{ string: open.length - index, options: [midi, ...options.slice(1)] }] : [];
  });
  return { ok: true, open, notes, ambiguous };
}
