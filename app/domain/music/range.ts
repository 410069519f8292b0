import type { Neck } from "#app/domain/music/neck.ts";
import { type Naming, stringNameWithOctave } from "#app/domain/music/note-names.ts";
import type { Midi, Semitones } from "#app/domain/music/pitch.ts";

/** What each string of an instrument can be tuned to, MIDI numbers, low side first. */
export type StringRange = { lowest: Midi[]; highest: Midi[] };

/** How far a string may go from its usual pitch where nothing else is known. Common practice, no source. */
export const defaultReach: { below: Semitones; above: Semitones } = { below: 6, above: 2 };

/**
 * The range that a new instrument begins with: 6 below to 2 above the usual pitch.
 * @example defaultRange([40, 45]) // { lowest: [34, 39], highest: [42, 47] }
 */
export function defaultRange(usual: readonly Midi[]): StringRange {
  return {
    lowest: usual.map((midi) => Math.max(0, midi - defaultReach.below)),
    highest: usual.map((midi) => Math.min(127, midi + defaultReach.above)),
  };
}

/** Why a neck cannot be had on an instrument. `string` is null where the number of strings is what differs. */
type OutOfRange = { string: number | null; message: string };

export type Playability = { ok: true } | { ok: false; reasons: OutOfRange[] };

/**
 * Whether a neck can be had on an instrument: as many strings, and every open pitch inside its string's range.
 * Capos need no check. Reasons come lowest string first.
 * @example playable({ open: [35], capos: [] }, { lowest: [36], highest: [42] })
 * // { ok: false, reasons: [{ string: 1, message: "string 1 would have to go to B1; lowest is C2" }] }
 */
export function playable(neck: Neck, range: StringRange, naming: Naming = "english"): Playability {
  const strings = neck.open.length;
  if (strings !== range.lowest.length) {
    const message = `the tuning has ${strings} strings; the instrument has ${range.lowest.length}`;
    return { ok: false, reasons: [{ string: null, message }] };
  }
  const name = (midi: Midi) => stringNameWithOctave(midi, naming);
  const reasons = neck.open.flatMap((midi, index) => {
    const lowest = range.lowest[index]!;
    const highest = range.highest[index]!;
    if (midi >= lowest && midi <= highest) return [];
    const limit = midi < lowest ? `lowest is ${name(lowest)}` : `highest is ${name(highest)}`;
    const string = strings - index;
    return [{ string, message: `string ${string} would have to go to ${name(midi)}; ${limit}` }];
  });
  return reasons.length === 0 ? { ok: true } : { ok: false, reasons };
}

/** A string that a tuning takes above its usual pitch. */
export type RaisedString = { string: number; semitones: Semitones; message: string };

/**
 * The strings that a tuning raises above their usual pitch, lowest first. Raising strains a string, plain ones most:
 * they may break, so this is warned about rather than refused.
 * Source: H. Reid, woodpecker.com (raised perhaps one fret without breaking).
 * @example raisedStrings([40, 45, 50, 55, 60, 64], [40, 45, 50, 55, 59, 64])
 * // [{ string: 2, semitones: 1, message: "string 2 is 1 above its usual B3; it may break" }]
 */
export function raisedStrings(
  open: readonly Midi[],
  usual: readonly Midi[],
  naming: Naming = "english",
): RaisedString[] {
  if (open.length !== usual.length) return [];
  return open.flatMap((midi, index) => {
    const semitones = midi - usual[index]!;
    if (semitones <= 0) return [];
    const string = open.length - index;
    const name = stringNameWithOctave(usual[index]!, naming);
    return [
      {
        string,
        semitones,
        message: `string ${string} is ${semitones} above its usual ${name}; it may break`,
      },
    ];
  });
}
