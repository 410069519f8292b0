import { readKey } from "#app/domain/music/key.ts";
import type { Capo } from "#app/domain/music/neck.ts";
import type { Midi } from "#app/domain/music/pitch.ts";
import { readCapos } from "#app/domain/music/read-capos.ts";
import type { AmbiguousString } from "#app/domain/music/tuning.ts";
import {
  endsApart,
  findTuning,
  type LineReader,
  type TuningFound,
  trimmedEnd,
} from "#app/domain/repertoire/find-tuning.ts";
import { readDuration } from "#app/domain/repertoire/read-duration.ts";
import type { Energy, Priority } from "#app/domain/repertoire/song.ts";

/** What may follow a title on a pasted line; each at most once. */
export type SongParts = {
  seconds?: number;
  tempo?: number;
  key?: string;
  capos?: Capo[];
  tuning?: { open: Midi[]; ambiguous: AmbiguousString[] };
  energy?: Energy;
  wanted?: Priority;
};

type Found = { rest: string; parts: SongParts } | { rest: string; problem: string };

/** What a line's end was found to say, and the text before it. */
export type PartsReading = { rest: string; parts: SongParts; problem?: string };

const clockLike = /(?:\d ?[:′'’] ?\d{2}|\d ?['′’]|\d ?(?:h|m|min|s|sec)\b\.?)/;

function findDuration(text: string, apart: boolean): Found | null {
  const words = [...text.matchAll(/(?:^|(?<=[\s,;|/(–—-]))[~\d]/gu)].map((match) => match.index).slice(-6);
  for (const start of words) {
    const tail = text.slice(start);
    const before = text.slice(0, start);
    const stands = start === 0 ? apart : endsApart(before);
    if (/^\d+$/.test(tail) || !(stands || (clockLike.test(tail) && !/\d\.\d/.test(tail)))) continue;
    const reading = readDuration(tail.replace(/\.$/, ""));
    if (reading.ok) return { rest: trimmedEnd(before), parts: { seconds: reading.seconds } };
  }
  return null;
}

function findTempo(text: string): Found | null {
  const match = /(?:^|[\s,;|/(–—-])(?:[♩q] ?= ?)?(\d{2,3})(?: ?bpm)$/iu.exec(text);
  if (!match) return null;
  const tempo = Number(match[1]);
  return tempo >= 20 && tempo <= 400
    ? { rest: trimmedEnd(text.slice(0, match.index)), parts: { tempo } }
    : null;
}

/** "energy 4", "wanted 5": steps of five that say what they are. */
function findStep(text: string, kind: "energy" | "wanted"): Found | null {
  const match = new RegExp(`(?:^|[\\s,;|/(–—-])${kind}[ :=]{0,2}([1-5])(?:/5)?$`, "iu").exec(text);
  return match ? { rest: trimmedEnd(text.slice(0, match.index)), parts: { [kind]: Number(match[1]) } } : null;
}

function findCapos(text: string, reader: LineReader): Found | null {
  const strings = reader.usual.length;
  const digits = /(?:^|[\s,;|/–—-])(\d{4,12})$/u.exec(text);
  if (digits?.[1]?.length === strings && /^0.*[1-9]/.test(digits[1]) && strings >= 5) {
    const reading = readCapos(digits[1], strings);
    if (reading.ok) return { rest: trimmedEnd(text.slice(0, digits.index)), parts: { capos: reading.capos } };
  }
  for (const { start, before } of capoStarts(text)) {
    const reading = readCapos(text.slice(start), strings);
    if (reading.ok && (reading.capos.length > 0 || /^no capo$/i.test(text.slice(start)))) {
      return { rest: trimmedEnd(before), parts: { capos: reading.capos } };
    }
  }
  return null;
}

/** Places at which capos may begin: not the "capo" of "da capo", nor a note C2. */
function capoStarts(text: string): { start: number; before: string }[] {
  return [...text.matchAll(/(?<![\p{L}\d])(?:partial capo|no capo|capos?(?!\p{L})|c\d)/giu)]
    .filter((match) => !/^C\d/.test(match[0]))
    .map((match) => ({ start: match.index, before: text.slice(0, match.index) }))
    .filter(({ before }) => !/(?:\bda\s|partial\s)$/i.test(before));
}

/** Words that are meant as capos, with a fret behind them, and cannot be read. */
function findCapoProblem(text: string, apart: boolean, reader: LineReader): Found | null {
  for (const { start, before } of capoStarts(text)) {
    const tail = text.slice(start);
    const stands = start === 0 ? apart : endsApart(before);
    const reading = readCapos(tail, reader.usual.length);
    if (!reading.ok && (stands || /^(?:partial )?capo ?\d/i.test(tail))) {
      return { rest: trimmedEnd(before), problem: reading.message };
    }
  }
  return null;
}

/** Whether a text is a key and nothing that a word might be ("Do", "Mi" to those who write letters). */
export function readWholeKey(text: string, reader: LineReader): string | null {
  if (text.length > 20 || (reader.naming !== "fixed-do" && /^(?:do|re|mi|fa|so|la|si|ti|ut)/i.test(text)))
    return null;
  const reading = readKey(text.replace(/^(?:in )?(?:the )?key(?: of)?:? ?/i, ""), reader.naming);
  return reading.ok && reading.key !== "" ? reading.key : null;
}

/** A key that says that it is one: "key of G", "in the key of F#m". */
function findNamedKey(text: string, reader: LineReader): Found | null {
  const named =
    /(?:^|[\s,;|/–—-])((?:in (?:the )?)?key(?: of|:)? ?\S+(?: ?(?:major|minor|maj|min|m|dur|moll))?)$/iu.exec(
      text,
    );
  const key = named?.[1] ? readWholeKey(named[1], reader) : null;
  return named && key ? { rest: trimmedEnd(text.slice(0, named.index)), parts: { key } } : null;
}

/**
 * A bare key: taken only behind another part, or set off between the title and another part where it has more than
 * one letter, since "Vitamin C", "Plan - B" and "Where I Am" are titles.
 */
function findKey(text: string, apart: boolean, hasParts: boolean, reader: LineReader): Found | null {
  const last = /(?:^|[\s,;|/–—-])(\S+(?: (?:major|minor|maj|min|dur|moll))?)$/iu.exec(text);
  const words = last?.[1] ?? "";
  const key = /^\p{Lu}/u.test(words) ? readWholeKey(words, reader) : null;
  if (!last || !key) return null;
  const before = trimmedEnd(text.slice(0, last.index));
  const behindPart = before === "" ? apart : findOne(before, false, reader, ["key"]) !== null;
  const setOff = hasParts && words.length > 1 && endsApart(text.slice(0, -words.length));
  return behindPart || setOff ? { rest: before, parts: { key } } : null;
}

function findInBrackets(text: string, reader: LineReader): Found | null {
  const match = /[([{]([^()[\]{}]+)[)\]}]$/u.exec(text);
  if (!match?.[1]) return null;
  const inner = match[1].trim();
  const rest = trimmedEnd(text.slice(0, match.index));
  if (rest === "") return null;
  const key = readWholeKey(inner, reader);
  if (key) return { rest, parts: { key } };
  const reading = findParts(inner, true, reader);
  if (reading.problem) return { rest, problem: reading.problem };
  return reading.rest === "" ? { rest, parts: reading.parts } : null;
}

type Kind = keyof SongParts;

function findOne(text: string, apart: boolean, reader: LineReader, without: readonly Kind[]): Found | null {
  const bracketed = findInBrackets(text, reader);
  if (bracketed) return bracketed;
  const wanted = (kind: Kind) => !without.includes(kind);
  return (
    (wanted("seconds") ? findDuration(text, apart) : null) ??
    (wanted("tempo") ? findTempo(text) : null) ??
    (wanted("energy") ? findStep(text, "energy") : null) ??
    (wanted("wanted") ? findStep(text, "wanted") : null) ??
    (wanted("key") ? findNamedKey(text, reader) : null) ??
    (wanted("capos") ? findCapos(text, reader) : null) ??
    (wanted("tuning") ? tuningPart(findTuning(text, apart, reader)) : null) ??
    (wanted("key") ? findKey(text, apart, without.length > 0, reader) : null) ??
    (wanted("capos") ? findCapoProblem(text, apart, reader) : null)
  );
}

function tuningPart(found: TuningFound | null): Found | null {
  if (!found || "problem" in found) return found;
  return { rest: found.rest, parts: { tuning: { open: found.open, ambiguous: found.ambiguous } } };
}

/** A title without a tuning at its end that says again what was found: "drop D (DADGBE)". */
function withoutRepeatedTuning(rest: string, parts: SongParts, reader: LineReader): string {
  const again = parts.tuning ? findTuning(rest, false, reader) : null;
  const same = again && "open" in again && again.open.join() === parts.tuning?.open.join();
  return same && again.rest !== "" ? again.rest : rest;
}

/**
 * Takes length, tempo, key, capos, tuning, energy and how wanted it is off the end of a text, in whatever order they stand, each once. What is
 * no such part stays in `rest`: the title. `whole` says that the text is a field of its own that may be used up; else
 * the last words stay as the title.
 * @example findParts("Low Meadow DADGBE capo 2 3:15", false, reader)
 * // { rest: "Low Meadow", parts: { seconds: 195, capos: […], tuning: … } }
 */
export function findParts(text: string, whole: boolean, reader: LineReader): PartsReading {
  let rest = text.trim();
  let parts: SongParts = {};
  while (rest !== "") {
    const found = findOne(rest, whole, reader, Object.keys(parts) as Kind[]);
    if (!found || (found.rest === "" && !whole)) break;
    if ("problem" in found) return { rest: found.rest, parts, problem: found.problem };
    if (Object.keys(found.parts).some((kind) => kind in parts)) break;
    parts = { ...parts, ...found.parts };
    rest = found.rest;
  }
  return { rest: withoutRepeatedTuning(rest, parts, reader), parts };
}
