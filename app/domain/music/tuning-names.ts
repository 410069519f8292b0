import {
  guitarTunings,
  type NamedTuning,
  otherTunings,
  standardGuitar,
} from "#app/domain/music/named-tunings.ts";
import { fifthsOfTuning, type Naming, pitchClassOfLetter, stringName } from "#app/domain/music/note-names.ts";
import { type Midi, type PitchClass, pitchClassOf, type Semitones, wrap } from "#app/domain/music/pitch.ts";
import { readNoteName } from "#app/domain/music/read-notes.ts";

/**
 * How many octaves each string of a guitar stands above a six-string guitar's, or null for what is no guitar in
 * courses of E A D G B E. A twelve-string has two strings a course.
 */
function guitarOctaves(usual: readonly Midi[]): Semitones[] | null {
  const strings = usual.length;
  if (strings !== 6 && strings !== 12) return null;
  const octaves = usual.map((midi, index) => {
    const course = standardGuitar[Math.floor((index * 6) / strings)]!;
    return 12 * Math.round((midi - course) / 12);
  });
  return octaves.some((octave) => octave < 0) ? null : octaves;
}

function fromGuitar(six: readonly Midi[], octaves: readonly Semitones[]): Midi[] {
  return octaves.map((octave, index) => six[Math.floor((index * 6) / octaves.length)]! + octave);
}

function shifted(open: readonly Midi[], semitones: Semitones): Midi[] {
  return open.map((midi) => midi + semitones);
}

function sameTuning(one: readonly Midi[], other: readonly Midi[]): boolean {
  return one.length === other.length && one.every((midi, index) => midi === other[index]);
}

/** Semitones from `from` to the nearest `pitchClass` at most `up` above it, else below. */
function moveTo(pitchClass: PitchClass, from: Midi, up: Semitones): Semitones {
  const distance = wrap(pitchClass - from, 12);
  return distance <= up ? distance : distance - 12;
}

/** Standard intervals with the lowest string at a pitch class: from G1 to F sharp 2 on a guitar. */
function standardAt(pitchClass: PitchClass, usual: readonly Midi[]): Midi[] {
  const octaves = guitarOctaves(usual);
  if (octaves) return fromGuitar(shifted(standardGuitar, moveTo(pitchClass, standardGuitar[0]!, 2)), octaves);
  const byLowest = moveTo(pitchClass, usual[0]!, 2);
  const eString = usual.find((midi) => pitchClassOf(midi) === 4);
  const byE = eString === undefined ? byLowest : moveTo(pitchClass, eString, 2);
  return shifted(usual, Math.abs(byE) < Math.abs(byLowest) ? byE : byLowest);
}

/** The lowest string a tone below standard intervals, all of them at the pitch where it becomes the named note. */
function dropped(pitchClass: PitchClass, usual: readonly Midi[], both: boolean): Midi[] | null {
  const octaves = guitarOctaves(usual);
  const base = octaves ? standardGuitar : usual;
  if (base.some((midi) => midi < base[0]!)) return null;
  const move = moveTo(pitchClass, base[0]! - 2, octaves ? 0 : 1);
  const open = base.map(
    (midi, index) => midi + move - (index === 0 || (both && index === base.length - 1) ? 2 : 0),
  );
  return octaves ? fromGuitar(open, octaves) : open;
}

function isBaritone(usual: readonly Midi[]): boolean {
  const move = usual[0]! - standardGuitar[0]!;
  return move < -2 && sameTuning(usual, shifted(standardGuitar, move));
}

function tuningAtPitch(row: NamedTuning, usual: readonly Midi[]): Midi[] | null {
  if (row.ownStrings) return row.open.length === usual.length ? [...row.open] : null;
  const octaves = guitarOctaves(usual);
  return octaves ? fromGuitar(row.open, octaves) : null;
}

/** A tuning named in words; `bareB` where the name turns on a B that may be natural or flat. */
export type NameReading = { open: Midi[]; bareB: boolean } | { wrongCount: number[]; name: string } | null;

function simplified(name: string): string {
  return name.toLowerCase().replace(/\s+/g, " ").trim();
}

/**
 * Reads a tuning by its name in the trade. `flatB` says what a bare B in the name means.
 * @returns the pitches, low side first; the string counts that the name exists for where this instrument has
 * another; null where the text is no name
 * @example readTuningName("drop D", [40, 45, 50, 55, 59, 64], "english", false)
 * // { open: [38, 45, 50, 55, 59, 64], bareB: false }
 */
export function readTuningName(
  text: string,
  usual: readonly Midi[],
  naming: Naming,
  flatB: boolean,
): NameReading {
  const name = simplified(text);
  if (["standard", "usual", "normal", "std", "concert"].includes(name)) {
    const octaves = isBaritone(usual) || name === "usual" ? null : guitarOctaves(usual);
    return { open: octaves ? fromGuitar(standardGuitar, octaves) : [...usual], bareB: false };
  }
  const byRule = readRuleName(name, usual, naming, flatB);
  if (byRule) return byRule;
  const rows = [...guitarTunings, ...otherTunings].filter(
    (row) => simplified(row.name) === name || row.also.includes(name),
  );
  for (const row of rows) {
    const open = tuningAtPitch(row, usual);
    if (open) return { open, bareB: false };
  }
  const counts = [...new Set(rows.map((row) => row.open.length))];
  return rows[0] ? { wrongCount: counts, name: rows[0].name } : null;
}

function readRuleName(name: string, usual: readonly Midi[], naming: Naming, flatB: boolean): NameReading {
  const drop = /^(double )?drop(?:ped)?[ -](.+)$/.exec(name);
  const standard = /^(.+?)[ -]?(?:standard|std)$/.exec(name);
  const written = (drop?.[2] ?? standard?.[1])?.trim();
  if (!written) return null;
  const note = readNoteName(written, naming);
  if (note?.length !== written.length || note.octave !== null) return null;
  const pitchClass = pitchClassOfLetter(note.letter, note.bareB && flatB ? -1 : note.alter);
  const open = drop ? dropped(pitchClass, usual, drop[1] !== undefined) : standardAt(pitchClass, usual);
  return open && { open, bareB: note.bareB };
}

/**
 * The trade's name for a tuning on an instrument with this usual tuning, or null where it has none. The naming
 * counts only in names by rule; `readTuning` in the same naming reads the name back.
 * @example nameTuning([38, 45, 50, 55, 57, 62], [40, 45, 50, 55, 59, 64]) // "DADGAD"
 * @example nameTuning([39, 44, 49, 54, 58, 63], [40, 45, 50, 55, 59, 64], "german") // "Es standard"
 */
export function nameTuning(
  open: readonly Midi[],
  usual: readonly Midi[],
  naming: Naming = "english",
): string | null {
  const lowest = open[0];
  if (lowest === undefined || open.length !== usual.length) return null;
  const row = [...guitarTunings, ...otherTunings].find((named) => {
    const pitches = named.byRule ? null : tuningAtPitch(named, usual);
    return pitches && sameTuning(pitches, open);
  });
  if (row?.standard && sameTuning(open, usual)) return "standard";
  if (row && !(row.name === "standard" && isBaritone(usual))) return row.name;
  const pitchClass = pitchClassOf(lowest);
  const root = stringName(lowest, naming, fifthsOfTuning(open));
  const drop = dropped(pitchClass, usual, false);
  if (drop && sameTuning(drop, open)) return `drop ${root}`;
  const both = dropped(pitchClass, usual, true);
  if (both && sameTuning(both, open)) return `double drop ${root}`;
  const isStandard = open.every((midi) => midi >= lowest) && sameTuning(standardAt(pitchClass, usual), open);
  return isStandard ? `${root} standard` : null;
}
