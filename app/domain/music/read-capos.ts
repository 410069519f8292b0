import { allStrings, highestCapoFret, sameCapo } from "#app/domain/music/capo.ts";
import type { Capo } from "#app/domain/music/neck.ts";

export type CaposReading = { ok: true; capos: Capo[] } | { ok: false; message: string; part: string };

const romans = ["i", "ii", "iii", "iv", "v", "vi", "vii", "viii", "ix", "x", "xi", "xii"];
const numberWords = [
  "one",
  "two",
  "three",
  "four",
  "five",
  "six",
  "seven",
  "eight",
  "nine",
  "ten",
  "eleven",
  "twelve",
];
const none = /^(?:no capos?|none|0|capo 0|without(?: capo)?|open|-)?$/i;
const fretPart = `(?:(?:on|at) )?(?:the )?(?:fret )?(?<fret>\\d{1,2}|[ivx]{1,4}|${numberWords.join("|")})(?:st|nd|rd|th)?(?: fret)?`;
const coverPart = "(?<cover>(?:on|over|across|covers?|covering|strings?)[ :]*)";
const leavePart = "(?<leave>(?:leaves?|leaving|without|except|but|not|free|minus)[ :]*)";
const onePattern = new RegExp(
  `^(?:(?:partial )?(?:capo|cap|c)\\.?:? ?)?${fretPart}(?: (?:${leavePart}|${coverPart})?(?:the )?(?:strings? )?(?<list>.*))?$`,
  "i",
);
const betweenCapos =
  / ?[;+&] ?(?:and )?|(?:,|,? and|,? then|(?<!partial)) (?=(?:partial )?(?:capo[ .:\d]|c\d))/i;
const how = 'Write it like "capo 2", "capo 3, leave 6" or "capo 2 on 5-3".';

/**
 * Reads the capos of a neck as players write them: "capo 2", "c2", "capo 3, leave 6", "capo 3 5-1", "partial capo 2
 * on 543", several with ";" or "and capo" between them, or one fret a string from the lowest up ("022200").
 * Nothing, "0" and "no capo" are none.
 * Source of the digits: H. Reid, partialcapo.com/notation.htm.
 * @returns the capos in the order written, strings of each lowest first; or what is wrong and where. It never throws.
 * @example readCapos("capo 3, leave 6", 6) // { ok: true, capos: [{ fret: 3, strings: [5, 4, 3, 2, 1] }] }
 */
export function readCapos(text: string, strings: number): CaposReading {
  const typed = text
    .normalize("NFC")
    .replace(/[‐-―−]/g, "-")
    .replace(/[()[\]"]/g, " ")
    .replace(/\s+/g, " ")
    .trim();
  if (none.test(typed)) return { ok: true, capos: [] };
  if (typed.length > 200)
    return { ok: false, part: `${typed.slice(0, 20)}…`, message: `This is too long for capos. ${how}` };
  const configured = readConfiguration(typed, strings);
  if (configured) return configured;
  const capos: Capo[] = [];
  for (const part of typed.split(betweenCapos)) {
    if (part.trim() === "") continue;
    const reading = readCapo(part.trim(), strings);
    if (!reading.ok) return reading;
    const [capo] = reading.capos;
    if (capo && capos.some((other) => sameCapo(other, capo))) {
      return { ok: false, part, message: `"${part}" stands twice. Keep one of the two.` };
    }
    capos.push(...reading.capos);
  }
  return { ok: true, capos };
}

/** One fret a string, low side first. A lower capo is taken to cover the strings of those above it as well. */
function readConfiguration(typed: string, strings: number): CaposReading | null {
  const bare = typed.replace(/^(?:partial )?(?:capo|capos|c):? ?/i, "");
  const digits = /^\d+$/.test(bare) ? [...bare] : bare.split(/[ ,-]+/);
  if (digits.length !== strings || !digits.every((digit) => /^\d{1,2}$/.test(digit))) return null;
  const frets = digits.map(Number);
  if (strings < 4 || (!frets.includes(0) && new Set(frets).size > 2)) return null;
  const levels = [...new Set(frets.filter((fret) => fret > 0))].sort((a, b) => a - b);
  const tooHigh = levels.find((fret) => fret > highestCapoFret);
  if (tooHigh !== undefined) return beyond(String(tooHigh));
  return {
    ok: true,
    capos: levels.map((fret) => ({
      fret,
      strings: allStrings(strings).filter((_, index) => frets[index]! >= fret),
    })),
  };
}

function beyond(part: string): CaposReading {
  return {
    ok: false,
    part,
    message: `Fret ${part} is outside 1 to ${highestCapoFret}, where a capo can go.`,
  };
}

function readCapo(part: string, strings: number): CaposReading {
  const tidy = part.replace(/,/g, " ").replace(/ +/g, " ").trim();
  const match = onePattern.exec(tidy);
  const groups = match?.groups;
  if (!groups?.fret) return { ok: false, part, message: `"${part}" is no capo that can be read. ${how}` };
  const fretWord = groups.fret.toLowerCase();
  const fret = Math.max(romans.indexOf(fretWord), numberWords.indexOf(fretWord)) + 1 || Number(groups.fret);
  if (!(fret >= 1 && fret <= highestCapoFret)) return beyond(groups.fret);
  const list = (groups.list ?? "").trim();
  const all = allStrings(strings);
  if (list === "" && !groups.leave && !groups.cover) return { ok: true, capos: [{ fret, strings: all }] };
  if (/^(?:all|full)(?: strings)?$/i.test(list) && !groups.leave)
    return { ok: true, capos: [{ fret, strings: all }] };
  if (!groups.leave && !groups.cover && /^(?:and .*|\d)$/i.test(list)) {
    return { ok: false, part, message: `"${list}" in "${part}" could be a string or a second capo. ${how}` };
  }
  if (list === "") return { ok: false, part, message: `"${part}" names no strings. ${how}` };
  const named = readStringList(list, strings);
  if (typeof named === "string") {
    return {
      ok: false,
      part: named,
      message: `"${named}" in "${part}" is no string of 1 to ${strings}. ${how}`,
    };
  }
  const covered = all.filter((string) => named.includes(string) === !groups.leave);
  if (covered.length === 0)
    return { ok: false, part, message: `"${part}" leaves no string for the capo to cover. ${how}` };
  return { ok: true, capos: [{ fret, strings: covered }] };
}

/** String numbers of a list such as "5-3", "543", "6, 2 and 1"; or the piece that is none. */
function readStringList(list: string, strings: number): number[] | string {
  const pieces = list
    .replace(/ ?(?:-|to|\.\.) ?/gi, "-")
    .split(/[ ,/]+|(?:^| )and(?: |$)/i)
    .filter((piece) => piece && !/^(?:and|strings?)$/i.test(piece));
  const named: number[] = [];
  for (const piece of pieces) {
    const range = /^(\d{1,2})-(\d{1,2})$/.exec(piece);
    const numbers = range
      ? spanned(Number(range[1]), Number(range[2]))
      : /^\d+$/.test(piece)
        ? strings > 9
          ? [Number(piece)]
          : [...piece].map(Number)
        : [];
    if (numbers.length === 0 || numbers.some((string) => string < 1 || string > strings)) return piece;
    named.push(...numbers);
  }
  return named.length === 0 ? list : named;
}

function spanned(from: number, to: number): number[] {
  const low = Math.min(from, to);
  return Array.from({ length: Math.abs(from - to) + 1 }, (_, index) => low + index);
}
