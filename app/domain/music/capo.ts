import type { Capo, Neck } from "#app/domain/music/neck.ts";
import type { Midi } from "#app/domain/music/pitch.ts";

/** The highest fret a capo may be put on. */
export const highestCapoFret = 24;

/**
 * Fret at which each string is stopped by the capos, low side first; 0 where none covers it. Of several capos on one
 * string only the highest counts: nothing behind it sounds.
 * Source: Wikipedia, "Partial capo": only the open strings are affected.
 * @example stops([{ fret: 3, strings: [1, 2, 3, 4, 5] }], 6) // [0, 3, 3, 3, 3, 3]
 */
export function stops(capos: readonly Capo[], strings: number): number[] {
  return Array.from({ length: strings }, (_, index) => {
    const string = strings - index;
    return capos.reduce(
      (fret, capo) => (capo.strings.includes(string) ? Math.max(fret, capo.fret) : fret),
      0,
    );
  });
}

/**
 * Pitches of the unfretted strings with the capos on, MIDI numbers, low side first.
 * @example sounding({ open: [36, 43, 48, 53, 53, 60], capos: [{ fret: 3, strings: [1, 2, 3, 4, 5] }] })
 * // [36, 46, 51, 56, 56, 63]
 */
export function sounding(neck: Neck): Midi[] {
  const stopped = stops(neck.capos, neck.open.length);
  return neck.open.map((midi, index) => midi + stopped[index]!);
}

/**
 * Pitch of a string fretted at a fret counted from the nut (0: open), or null where it cannot be fretted there
 * because a capo stops it further up. Strings that a partial capo leaves free can be fretted behind it.
 * @throws RangeError where the neck has no such string
 * @example frettedPitch({ open: [36, 43, 48, 53, 53, 60], capos: [{ fret: 3, strings: [1, 2, 3, 4, 5] }] }, 5, 2) // null
 */
export function frettedPitch(neck: Neck, string: number, fret: number): Midi | null {
  const index = neck.open.length - string;
  const open = neck.open[index];
  if (open === undefined) throw new RangeError(`There is no string ${string} on ${neck.open.length} strings`);
  const stop = stops(neck.capos, neck.open.length)[index]!;
  if (fret > 0 && fret < stop) return null;
  return open + Math.max(fret, stop);
}

/** Whether a capo covers every string. */
export function isFullCapo(capo: Capo, strings: number): boolean {
  return new Set(capo.strings).size === strings;
}

/** Whether two capos stand at the same fret over the same strings, in whatever order these are listed. */
export function sameCapo(one: Capo, other: Capo): boolean {
  const covered = new Set(one.strings);
  return (
    one.fret === other.fret &&
    covered.size === new Set(other.strings).size &&
    other.strings.every((string) => covered.has(string))
  );
}

/** Whether two lists hold the same capos, in whatever order. */
export function sameCapos(one: readonly Capo[], other: readonly Capo[]): boolean {
  return one.length === other.length && one.every((capo) => other.some((match) => sameCapo(capo, match)));
}

/** All string numbers of an instrument, lowest string first. */
export function allStrings(strings: number): number[] {
  return Array.from({ length: strings }, (_, index) => strings - index);
}

/**
 * String numbers in words, lowest string first; three or more in a row become a range.
 * @example stringsInWords([1, 2, 6]) // "6, 2 and 1"
 * @example stringsInWords([3, 4, 5]) // "5-3"
 */
export function stringsInWords(strings: readonly number[]): string {
  const parts = runs(strings);
  return parts.length < 2 ? parts.join("") : `${parts.slice(0, -1).join(", ")} and ${parts.at(-1)}`;
}

function runs(strings: readonly number[]): string[] {
  const falling = [...new Set(strings)].sort((a, b) => b - a);
  const parts: string[] = [];
  for (let start = 0; start < falling.length; ) {
    let end = start;
    while (falling[end + 1] === falling[end]! - 1) end += 1;
    if (end - start >= 2) {
      parts.push(`${falling[start]}-${falling[end]}`);
      start = end + 1;
    } else {
      parts.push(`${falling[start]}`);
      start += 1;
    }
  }
  return parts;
}

function numbersWritten(strings: readonly number[]): number {
  return runs(strings).reduce((count, part) => count + part.split("-").length, 0);
}

/**
 * A capo in words. A partial capo is told by the strings it leaves free or by those it covers, whichever needs fewer
 * numbers.
 * @example capoWords({ fret: 3, strings: [1, 2, 3, 4, 5] }, 6) // "capo 3, leave 6"
 * @example capoWords({ fret: 2, strings: [3, 4, 5] }, 6) // "capo 2 on 5-3"
 */
export function capoWords(capo: Capo, strings: number): string {
  const free = allStrings(strings).filter((string) => !capo.strings.includes(string));
  if (free.length === 0) return `capo ${capo.fret}`;
  return numbersWritten(free) <= numbersWritten(capo.strings)
    ? `capo ${capo.fret}, leave ${stringsInWords(free)}`
    : `capo ${capo.fret} on ${stringsInWords(capo.strings)}`;
}

/**
 * All capos of a neck in words, nearest to the nut first; "no capo" where there is none.
 * @example caposWords([{ fret: 5, strings: [3, 4, 5] }, { fret: 3, strings: [1, 2, 3, 4, 5, 6] }], 6)
 * // "capo 3; capo 5 on 5-3"
 */
export function caposWords(capos: readonly Capo[], strings: number): string {
  if (capos.length === 0) return "no capo";
  return [...capos]
    .sort((a, b) => a.fret - b.fret)
    .map((capo) => capoWords(capo, strings))
    .join("; ");
}

/** A capo that does nothing on some of its strings because another stops them further up. */
export type ShadowedCapo = {
  capo: Capo;
  /** The strings on which it does nothing, lowest string first. */
  strings: number[];
  /** True where that is all of them: the capo may as well be left off. */
  useless: boolean;
};

/**
 * The capos that stand behind another on shared strings. Of two alike the second is the useless one.
 * @example shadowedCapos([{ fret: 2, strings: [3, 4, 5] }, { fret: 3, strings: [1, 2, 3, 4, 5, 6] }])
 * // [{ capo: { fret: 2, … }, strings: [5, 4, 3], useless: true }]
 */
export function shadowedCapos(capos: readonly Capo[]): ShadowedCapo[] {
  return capos.flatMap((capo, index) => {
    const covered = [...new Set(capo.strings)].sort((a, b) => b - a);
    const strings = covered.filter((string) =>
      capos.some(
        (other, place) =>
          place !== index &&
          other.strings.includes(string) &&
          (other.fret > capo.fret || (other.fret === capo.fret && place < index)),
      ),
    );
    return strings.length === 0 ? [] : [{ capo, strings, useless: strings.length === covered.length }];
  });
}
