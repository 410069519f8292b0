import {
  type Midi,
  type Octave,
  octaveOf,
  type PitchClass,
  pitchClassOf,
  wrap,
} from "#app/domain/music/pitch.ts";

/** How a reader names notes: B and B♭, H and B, or Si and Si♭. */
export const namings = ["english", "german", "fixed-do"] as const;
export type Naming = (typeof namings)[number];

export type Letter = "C" | "D" | "E" | "F" | "G" | "A" | "B";

/** A spelled note: letter, sharps (+) or flats (−), and the octave of the letter in scientific pitch. */
export type Note = { letter: Letter; alter: number; octave: Octave };

const lineOfFifths: readonly Letter[] = ["F", "C", "G", "D", "A", "E", "B"];
const naturals: Record<Letter, PitchClass> = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 };
const syllables: Record<Letter, string> = { C: "Do", D: "Re", E: "Mi", F: "Fa", G: "Sol", A: "La", B: "Si" };

/**
 * Pitch class of a letter with sharps (+) or flats (−).
 * @example pitchClassOfLetter("E", -1) // 3
 */
export function pitchClassOfLetter(letter: Letter, alter: number): PitchClass {
  return wrap(naturals[letter] + alter, 12);
}

/**
 * MIDI number of a spelled note. B sharp 3 is 60, C flat 4 is 59.
 * @example midiOfNote({ letter: "E", alter: -1, octave: 2 }) // 39
 */
export function midiOfNote(note: Note): Midi {
  return 12 * (note.octave + 1) + naturals[note.letter] + note.alter;
}

/**
 * Place of a note on the line of fifths: F −1, C 0, G 1 … B♭ −2, F♯ 6.
 * @example fifthsOf("E", -1) // -3
 */
export function fifthsOf(letter: Letter, alter: number): number {
  return lineOfFifths.indexOf(letter) - 1 + 7 * alter;
}

function noteAtFifths(midi: Midi, fifths: number): Note {
  const letter = lineOfFifths[wrap(fifths + 1, 7)]!;
  const alter = Math.floor((fifths + 1) / 7);
  return { letter, alter, octave: octaveOf(midi - alter) };
}

/**
 * Spells a pitch within a key: of the names of its pitch class, the one whose place on the line of fifths is from
 * 5 below to 6 above the key's own. `keyFifths` counts sharps (+) or flats (−) of the signature.
 * Source: line of fifths, derived from the order of sharps and flats (C. E. Gardner, Essentials of Music Theory).
 * @example spell(51, 4) // D♯3, in E major
 * @example spell(59, -6) // C♭4, in G♭ major
 */
export function spell(midi: Midi, keyFifths: number): Note {
  const lowest = keyFifths - 5;
  const place = lowest + wrap(7 * pitchClassOf(midi) - lowest, 12);
  return noteAtFifths(midi, place);
}

/**
 * Spells the pitch of an open string: as `spell`, but a note that has a plain letter keeps it, since nobody tunes
 * a string to C♭, F♭, E♯ or B♯.
 * @example spellString(59, -6) // B3
 */
export function spellString(midi: Midi, keyFifths: number): Note {
  const pitchClass = pitchClassOf(midi);
  const plain = lineOfFifths.find((letter) => naturals[letter] === pitchClass);
  return plain ? { letter: plain, alter: 0, octave: octaveOf(midi) } : spell(midi, keyFifths);
}

/**
 * The key signature that spells a tuning best where no key is known: the one in which its notes lie closest together
 * on the line of fifths; of two equal ones the one that calls the lowest string C♯ or F♯ where it is that (common
 * practice, no source), then the one nearest to plain letters. So open E has a G♯, E♭ standard flats, drop C♯ sharps.
 * @example fifthsOfTuning([40, 47, 52, 56, 59, 64]) // a signature with G♯
 */
export function fifthsOfTuning(open: readonly Midi[]): number {
  let best = 0;
  let bestScore = Number.POSITIVE_INFINITY;
  for (const candidate of [0, -1, 1, -2, 2, -3, 3, -4, 4, -5, 5, -6, 6]) {
    const places = open.map((midi) => {
      const note = spellString(midi, candidate);
      return fifthsOf(note.letter, note.alter);
    });
    const spread = places.length === 0 ? 0 : Math.max(...places) - Math.min(...places);
    const lowestIsSharp = places[0] === fifthsOf("C", 1) || places[0] === fifthsOf("F", 1);
    const fromPlain = places.reduce((sum, place) => sum + Math.abs(place), 0);
    const score = spread * 1000 + (lowestIsSharp ? 0 : 500) + fromPlain;
    if (score < bestScore) {
      best = candidate;
      bestScore = score;
    }
  }
  return best;
}

function sign(alter: number): string {
  return (alter < 0 ? "♭" : "♯").repeat(Math.abs(alter));
}

function germanName(letter: Letter, alter: number): string {
  if (letter === "B") {
    if (alter === 0) return "H";
    if (alter === -1) return "B";
    return alter > 0 ? `H${"is".repeat(alter)}` : `H${"es".repeat(-alter)}`;
  }
  if (alter >= 0) return letter + "is".repeat(alter);
  const flats = "es".repeat(-alter);
  return letter === "E" || letter === "A" ? letter + flats.slice(1) : letter + flats;
}

/**
 * A note's name without its octave, in the reader's naming.
 * German: B natural is H, B flat is B, sharps in -is, flats in -es (Music::PitchNum::German 0.03; LilyPond's
 * germanChords). Fixed do stands in its Italian and Spanish form.
 * @example noteName({ letter: "E", alter: -1, octave: 2 }, "english") // "E♭"
 * @example noteName({ letter: "B", alter: 0, octave: 3 }, "german") // "H"
 * @example noteName({ letter: "E", alter: -1, octave: 2 }, "fixed-do") // "Mi♭"
 */
export function noteName(note: Pick<Note, "letter" | "alter">, naming: Naming): string {
  if (naming === "german") return germanName(note.letter, note.alter);
  const letter = naming === "fixed-do" ? syllables[note.letter] : note.letter;
  return letter + sign(note.alter);
}

/**
 * A note's name with its octave of scientific pitch.
 * @example noteNameWithOctave({ letter: "E", alter: -1, octave: 2 }, "english") // "E♭2"
 */
export function noteNameWithOctave(note: Note, naming: Naming): string {
  return `${noteName(note, naming)}${note.octave}`;
}

/**
 * A note's name as a screen reader should say it: words in place of signs.
 * @example spokenNote({ letter: "E", alter: -1 }, "english") // "E flat"
 */
export function spokenNote(note: Pick<Note, "letter" | "alter">, naming: Naming): string {
  if (naming === "german") return germanName(note.letter, note.alter);
  const word = note.alter < 0 ? " flat" : " sharp";
  const letter = naming === "fixed-do" ? syllables[note.letter] : note.letter;
  return letter + (Math.abs(note.alter) > 1 ? " double" : "") + (note.alter === 0 ? "" : word);
}

/**
 * The name of an open string's pitch, in the reader's naming and spelled in a key (0: no sharps or flats).
 * @example stringName(39, "english", -3) // "E♭"
 */
export function stringName(midi: Midi, naming: Naming, keyFifths = 0): string {
  return noteName(spellString(midi, keyFifths), naming);
}

/**
 * As `stringName`, with the octave.
 * @example stringNameWithOctave(35, "english") // "B1"
 */
export function stringNameWithOctave(midi: Midi, naming: Naming, keyFifths = 0): string {
  return noteNameWithOctave(spellString(midi, keyFifths), naming);
}
