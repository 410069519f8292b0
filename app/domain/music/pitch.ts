/** MIDI note number: 69 is A4, 60 is middle C (C4). Whole for a string's target, fractional for a measured pitch. */
export type Midi = number;
/** Distance in equal-tempered semitones; positive is up. */
export type Semitones = number;
/** 0 is C, 1 is C sharp or D flat, 11 is B. */
export type PitchClass = number;
/** Octave of scientific pitch notation: the one that middle C begins is 4. */
export type Octave = number;
export type Hertz = number;

/** Reference pitch of A4, ISO 16:1975. */
const concertPitch: Hertz = 440;

/** Remainder that is never negative: `wrap(-1, 12)` is 11. */
export function wrap(value: number, size: number): number {
  return ((value % size) + size) % size;
}

/**
 * Frequency of a MIDI note in equal temperament, `a4 · 2^((midi − 69) / 12)`.
 * Source: ISO 16:1975 for A4 = 440 Hz; MIDI Tuning Standard for the numbering.
 * @example frequencyOf(40) // 82.4069 (the guitar's low E)
 * @example frequencyOf(69, 442) // 442
 */
export function frequencyOf(midi: Midi, a4: Hertz = concertPitch): Hertz {
  return a4 * 2 ** ((midi - 69) / 12);
}

/**
 * MIDI number of a frequency, fractional where it lies between two notes.
 * @throws RangeError where the frequency is not above 0
 * @example midiOf(440) // 69
 */
export function midiOf(frequency: Hertz, a4: Hertz = concertPitch): Midi {
  if (!(frequency > 0)) throw new RangeError(`A frequency is above 0 Hz; ${frequency} is not`);
  return 69 + 12 * Math.log2(frequency / a4);
}

/**
 * Cents from one frequency up to another, 100 to the semitone.
 * @example centsBetween(440, 442) // 7.8514
 */
export function centsBetween(from: Hertz, to: Hertz): number {
  return 1200 * Math.log2(to / from);
}

/**
 * Pitch class of a MIDI number.
 * @example pitchClassOf(40) // 4 (E)
 */
export function pitchClassOf(midi: Midi): PitchClass {
  return wrap(midi, 12);
}

/**
 * Octave in which a MIDI number stands. It changes at C: 59 is B3, 60 is C4.
 * Source: MusicXML 4.0, `octave`, where 4 is "the octave started by middle C".
 * @example octaveOf(40) // 2
 */
export function octaveOf(midi: Midi): Octave {
  return Math.floor(midi / 12) - 1;
}

/**
 * MIDI number of a pitch class in an octave.
 * @example midiAt(4, 2) // 40 (E2)
 */
export function midiAt(pitchClass: PitchClass, octave: Octave): Midi {
  return 12 * (octave + 1) + pitchClass;
}
