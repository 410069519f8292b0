import type { Midi } from "#app/domain/music/pitch.ts";
import type { InstrumentKind } from "#app/domain/repertoire/guitar.ts";

/** Usual tunings by kind and number of strings, low side first. Sources: see named-tunings.ts, where each is named. */
const byKind: Partial<Record<InstrumentKind, Record<number, readonly Midi[]>>> = {
  bass: {
    4: [28, 33, 38, 43],
    5: [23, 28, 33, 38, 43],
    6: [23, 28, 33, 38, 43, 48],
  },
  baritone: { 6: [35, 40, 45, 50, 54, 59] },
  ukulele: { 4: [67, 60, 64, 69] },
  // Single strings and five-string mandolins: common practice, no source.
  mandolin: {
    4: [55, 62, 69, 76],
    5: [48, 55, 62, 69, 76],
    8: [55, 55, 62, 62, 69, 69, 76, 76],
    10: [48, 48, 55, 55, 62, 62, 69, 69, 76, 76],
  },
  // Tenor banjo (4): common practice, no source.
  banjo: { 4: [48, 55, 62, 69], 5: [67, 50, 55, 59, 62] },
};

/**
 * Guitars by number of strings. Six, seven and twelve as in named-tunings.ts; the others are places to begin from,
 * common practice, no source: eight and nine go on down by fourths, ten and eleven stand in courses.
 */
const guitars: Record<number, readonly Midi[]> = {
  4: [50, 55, 59, 64],
  5: [45, 50, 55, 59, 64],
  6: [40, 45, 50, 55, 59, 64],
  7: [35, 40, 45, 50, 55, 59, 64],
  8: [30, 35, 40, 45, 50, 55, 59, 64],
  9: [25, 30, 35, 40, 45, 50, 55, 59, 64],
  10: [45, 57, 50, 62, 55, 67, 59, 59, 64, 64],
  11: [40, 45, 57, 50, 62, 55, 67, 59, 59, 64, 64],
  12: [40, 52, 45, 57, 50, 62, 55, 67, 59, 59, 64, 64],
};

/**
 * The tuning that a new instrument begins with, MIDI numbers, low side first. A kind that is not made with that many
 * strings begins as a guitar with as many.
 * @throws RangeError outside 4 to 12 strings
 * @example usualTuningFor("bass", 4) // [28, 33, 38, 43]
 * @example usualTuningFor("twelve-string", 12) // [40, 52, 45, 57, 50, 62, 55, 67, 59, 59, 64, 64]
 */
export function usualTuningFor(kind: InstrumentKind, strings: number): Midi[] {
  const usual = byKind[kind]?.[strings] ?? guitars[strings];
  if (!usual) throw new RangeError(`An instrument has 4 to 12 strings; ${strings} is outside`);
  return [...usual];
}

/** The number of strings that a kind of instrument usually has. */
export function usualStringsFor(kind: InstrumentKind): number {
  const strings: Partial<Record<InstrumentKind, number>> = {
    "twelve-string": 12,
    bass: 4,
    ukulele: 4,
    mandolin: 8,
    banjo: 5,
  };
  return strings[kind] ?? 6;
}
