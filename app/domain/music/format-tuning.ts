import {
  fifthsOfTuning,
  type Naming,
  spellString,
  spokenNote,
  stringName,
  stringNameWithOctave,
} from "#app/domain/music/note-names.ts";
import type { Midi } from "#app/domain/music/pitch.ts";

/**
 * Letters of a tuning, one a string, low side first: set each in a cell of fixed width, so that the same string stands
 * in the same column from row to row. `keyFifths` is the song's key signature; without it the tuning's own is taken.
 * @example formatTuning([39, 44, 49, 54, 58, 63], "english") // ["E♭", "A♭", "D♭", "G♭", "B♭", "E♭"]
 */
export function formatTuning(
  open: readonly Midi[],
  naming: Naming,
  keyFifths = fifthsOfTuning(open),
): string[] {
  return open.map((midi) => stringName(midi, naming, keyFifths));
}

/**
 * As `formatTuning`, with octaves: `readTuning` in the same naming gives back exactly these pitches.
 * @example formatTuningWithOctaves([36, 43, 48, 53, 53, 60], "english") // ["C2", "G2", "C3", "F3", "F3", "C4"]
 */
export function formatTuningWithOctaves(
  open: readonly Midi[],
  naming: Naming,
  keyFifths = fifthsOfTuning(open),
): string[] {
  return open.map((midi) => stringNameWithOctave(midi, naming, keyFifths));
}

/**
 * A tuning as one word where each string takes one letter, else with spaces.
 * @example compactTuning([36, 43, 48, 53, 53, 60], "english") // "CGCFFC"
 * @example compactTuning([39, 44, 49, 54, 58, 63], "german") // "Es As Des Ges B Es"
 */
export function compactTuning(
  open: readonly Midi[],
  naming: Naming,
  keyFifths = fifthsOfTuning(open),
): string {
  const letters = formatTuning(open, naming, keyFifths);
  return letters.join(letters.every((letter) => letter.length === 1) ? "" : " ");
}

/**
 * A tuning as a screen reader should say it, low side first.
 * @example spokenTuning([39, 44], "english") // "E flat, A flat"
 */
export function spokenTuning(
  open: readonly Midi[],
  naming: Naming,
  keyFifths = fifthsOfTuning(open),
): string {
  return open.map((midi) => spokenNote(spellString(midi, keyFifths), naming)).join(", ");
}
