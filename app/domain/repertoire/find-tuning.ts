import { guitarTunings, otherTunings } from "#app/domain/music/named-tunings.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Midi } from "#app/domain/music/pitch.ts";
import { wordsToSigns } from "#app/domain/music/read-notes.ts";
import { type AmbiguousString, readTuning } from "#app/domain/music/tuning.ts";
import { readTuningName } from "#app/domain/music/tuning-names.ts";
import { readTuningShift } from "#app/domain/music/tuning-shift.ts";

/** The instrument and the reader that a pasted line is read for. */
export type LineReader = { usual: readonly Midi[]; naming: Naming };

/** A tuning found at the end of a text; `rest` is what stands before it. */
export type TuningFound =
  | { rest: string; open: Midi[]; ambiguous: AmbiguousString[] }
  | { rest: string; problem: string };

/** Words and names that are spelled with the letters A to G alone: in running text they are words before they are notes. */
const noteWords = new Set(
  `abba abed aced adage added aged babe bade badge baggage bagged bead beaded bedded beef beefed begged cabbage cabbed
  cabbaged cadge cafe caged cage cede ceded accede acceded dabbed dada dead deaf debagged decade deed deeded deface
  defaced edda edge edged efface effaced egged facade face faced fade faded feed feedbag gabbed gabe gaffe gaga gage gagged
  bebe cece dede fagged badged beebee deedee`.split(/\s+/),
);
const tradeNames = [...guitarTunings, ...otherTunings];
const namesOf = (plain: boolean) =>
  tradeNames
    .filter((row) => (row.plainWord === true) === plain)
    .flatMap((row) => [row.name.toLowerCase(), ...row.also]);
const plainWords = new Set(["standard", "usual", "normal", "std", "concert", ...namesOf(true)]);
for (const name of namesOf(false)) plainWords.delete(name);
const separatorsAtEnd = /[\s,;|/·–—:-]+$/u;
const mostWords = 14;

/** Whether the end of a text is set off from what follows by a dash, comma, slash, colon or column. */
export function endsApart(text: string): boolean {
  return /(?:\s[-–—]+|[,;|/·:\t])\s*$/u.test(text);
}

/** A text without the separators at its end. */
export function trimmedEnd(text: string): string {
  return text.replace(separatorsAtEnd, "");
}

function note(naming: Naming): string {
  if (naming === "fixed-do") return "(?:do|ut|r[eé]|mi|fa|sol?|la|si|[a-g])[#♯b♭]?\\d?";
  return naming === "german" ? "[a-h](?:is|es|s|[#♯b♭])?\\d?" : "[a-h][#♯b♭]?\\d?";
}

type Style = "single" | "capitals" | "small" | "other";

/** How a row of notes is written: note by note, as one word in capitals or small letters, or as a word might be. */
function styleOf(text: string, naming: Naming): Style {
  const single = new RegExp(`^${note(naming)}(?:[\\s,/–—-]+${note(naming)}){3,}$`, "iu");
  if (single.test(text)) return "single";
  if (/\s/.test(text)) return "other";
  if (
    naming !== "english" &&
    new RegExp(`^(?:${note(naming)}){4,}$`, "u").test(
      text.replace(/\p{Lu}\p{Ll}*/gu, (part) => part.toLowerCase()),
    )
  ) {
    const starts = text.match(/\p{Lu}/gu)?.length ?? 0;
    if (starts >= 4) return "capitals";
  }
  if (/^(?:[A-H](?:[#♯b♭]|is|es)?\d?){3,}[A-Ha-h][#♯b♭]?\d?$/u.test(text)) return "capitals";
  return /^[a-h#♯♭\d]{4,}$/u.test(text) ? "small" : "other";
}

/** Number of notes where a text is written note by note, else 0. */
function notesWritten(text: string, naming: Naming): number {
  return styleOf(text, naming) === "single" ? text.split(/[\s,/–—-]+/u).length : 0;
}

function isAlphabet(text: string): boolean {
  const letters = text.toLowerCase().replace(/[^a-h]/g, "");
  return letters.length >= 4 && "abcdefgh".includes(letters);
}

/** Whether letters that could be a tuning are meant as one, given what stands before them. */
function meantAsNotes(text: string, before: string, apart: boolean, naming: Naming): boolean {
  const style = styleOf(text, naming);
  if (style === "other" || isAlphabet(text)) return false;
  if (apart && (style !== "small" || !noteWords.has(text))) return true;
  if (style === "single" || /[#♯♭\d]/u.test(text)) return true;
  const word = noteWords.has(text.toLowerCase()) && text !== "BEAD";
  if (word) return false;
  if (style === "small") return text.length >= 6 && before.trim() !== "";
  const stands = /\p{Ll}/u.test(before);
  return stands || (text.length >= 6 && before.trim() !== "");
}

/**
 * Whether a name of a tuning, and a move of `shift` semitones with it, is meant as one, given what stands before it.
 * `name` is "" where only the move stands there.
 */
function meantAsName(words: string, name: string, before: string, apart: boolean, naming: Naming): boolean {
  const root = /^(?:double )?drop(?:ped)?[ -](.+)$|^(.+?)[ -]?(?:standard|std)$/i.exec(name);
  const rootName = root?.[1] ?? root?.[2];
  if (rootName && !new RegExp(`^${note(naming)}$`, "iu").test(rootName)) return false;
  if (apart || (/\stuning$/i.test(words) && before.trim() !== "")) return true;
  const setOff = words === words.toLowerCase() && /\p{Lu}/u.test(before);
  if (name === "" || /^a[ -]?standard$/i.test(name)) return setOff && !/^[+−-]/.test(words);
  return !plainWords.has(name.toLowerCase());
}

/**
 * Finds a tuning at the end of a line, after which `before` may be a title. A tuning is taken only where it cannot
 * well be part of the title: a name in the trade, or as many notes as there are strings that stand in capitals, note
 * by note, or apart. `apart` says that the whole text stands in a field of its own.
 * @returns what was found; a problem where it is meant as a tuning but does not fit the instrument; null for none
 * @example findTuning("Low Meadow DADGBE", false, { usual: [40, 45, 50, 55, 59, 64], naming: "english" })
 * // { rest: "Low Meadow", open: [38, 45, 50, 55, 59, 64], ambiguous: [] }
 * @example findTuning("A Dead Bee", false, { usual: [40, 45, 50, 55, 59, 64], naming: "english" }) // null
 */
export function findTuning(text: string, apart: boolean, reader: LineReader): TuningFound | null {
  const starts = [...text.matchAll(/(?:^|(?<=[\s,;|/·:(–—-]))[^\s,;|/·:(–—-]/gu)].map((match) => match.index);
  for (const start of starts.slice(-mostWords)) {
    const tail = text.slice(start);
    const before = text.slice(0, start);
    const stands = start === 0 ? apart : endsApart(before);
    if (notesWritten(tail, reader.naming) > reader.usual.length) continue;
    const reading = readTail(tail, before, stands, reader);
    if (reading) return { ...reading, rest: trimmedEnd(before) };
  }
  return null;
}

function readTail(words: string, before: string, apart: boolean, reader: LineReader) {
  const tail = wordsToSigns(words);
  const { shift, rest } = readTuningShift(tail.replace(/\s+tuning$/i, ""));
  const named = rest === "" ? null : readTuningName(rest, reader.usual, reader.naming, false);
  if (named || (rest === "" && shift !== 0)) {
    if (!meantAsName(tail, rest, before, apart, reader.naming)) return null;
  } else if (!meantAsNotes(rest, before, apart, reader.naming)) return null;
  const reading = readTuning(tail, reader);
  if (!reading.ok) return { problem: reading.message };
  const ofAnotherInstrument = named && reading.notes.some(({ semitones }) => Math.abs(semitones) > 12);
  return ofAnotherInstrument ? null : { open: reading.open, ambiguous: reading.ambiguous };
}
