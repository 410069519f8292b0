import type { Capo } from "#app/domain/music/neck.ts";
import type { Midi } from "#app/domain/music/pitch.ts";
import type { AmbiguousString } from "#app/domain/music/tuning.ts";
import {
  findParts,
  type PartsReading,
  readWholeKey,
  type SongParts,
} from "#app/domain/repertoire/find-song-parts.ts";
import { findTuning, type LineReader } from "#app/domain/repertoire/find-tuning.ts";
import { readDuration } from "#app/domain/repertoire/read-duration.ts";
import { type Energy, type Priority, usualPriority } from "#app/domain/repertoire/song.ts";

/** A song as one pasted line tells it. */
export type PastedSong = {
  title: string;
  /** Who wrote it, where a column says so; else "". */
  credit: string;
  open: Midi[];
  /** True where no tuning stood on the line and the usual one was taken. */
  openAssumed: boolean;
  /** Strings whose letter can mean two notes and must be asked about. */
  ambiguous: AmbiguousString[];
  capos: Capo[];
  /** Length, or null where none stood on the line. */
  seconds: number | null;
  /** Beats a minute, or null. */
  tempo: number | null;
  /** As `readKey` keeps it; "" where none stood on the line. */
  key: string;
  energy: Energy | null;
  priority: Priority;
};

/** One line of a pasted list. `song` is null exactly where `problem` says why. `line` counts from 1. */
export type SongLine = { line: number; raw: string } & (
  | { song: PastedSong; problem?: undefined }
  | { song: null; problem: string }
);

const longestTitle = 200;
const longestLine = 500;
const inQuotes = 'If it belongs to the title, put the title in "quotation marks".';
const headings =
  /^(?:set|set list|songs?|first set|second set|interval|intermission|break|encores?|set (?:\d+|one|two|three))\s*:?$/i;
const columnNames =
  /^(?:#|no\.?|nr\.?|songs?|titles?|names?|tunings?|capos?|lengths?|times?|durations?|keys?|tempo|bpm|energy|wanted|artists?|writers?|credits?|by|notes?)$/i;

/**
 * Reads a pasted list, one song a line: the title, then in any order tuning, capo, key, tempo and length ("Low Meadow
 * DADGBE capo 2 3:15"), divided by spaces, dashes, commas, slashes or columns, with or without a number before the
 * title. Words that merely look like notes stay in the title; a title in quotation marks is taken as it stands.
 * @returns every line that is not blank, in order, as a song or with the reason why it could not be read. Never throws.
 * @example readSongLines("1. Low Meadow DADGBE capo 2 3:15", { usual: [40, 45, 50, 55, 59, 64], naming: "english" })
 * // [{ line: 1, raw: "1. Low …", song: { title: "Low Meadow", open: [38, 45, 50, 55, 59, 64], seconds: 195, … } }]
 */
export function readSongLines(text: string, reader: LineReader): SongLine[] {
  const lines = text
    .normalize("NFC")
    .split(/\r\n|\r|\n/)
    .map((raw, index) => ({ line: index + 1, raw }))
    .filter(({ raw }) => raw.trim() !== "");
  const numbered = haveBareNumbers(lines.map(({ raw }) => raw));
  return lines.map(({ line, raw }) => {
    const reading = readLine(withoutNumber(raw, numbered), reader);
    return typeof reading === "string"
      ? { line, raw, song: null, problem: reading }
      : { line, raw, song: reading };
  });
}

/** Whether every line begins with a number, each one more than the last: then they count, and are in no title. */
function haveBareNumbers(lines: readonly string[]): boolean {
  const numbers = lines.map((raw) => Number(/^\s*(\d{1,3})\s+\S/.exec(raw)?.[1] ?? Number.NaN));
  return lines.length > 1 && numbers.every((number, index) => number === numbers[0]! + index);
}

function withoutNumber(raw: string, numbered: boolean): string {
  const marked = raw.replace(/^\s*(?:\[[ x]?\]\s*|[-*•–—·▪]\s+)/iu, "");
  const counted = marked.replace(
    /^\s*(?:[(#№]?\d{1,3}[.):]+(?:\s+|(?=\p{L}))|[#№]\s?\d{1,3}\s+|0\d{1,2}\s+(?:[-–—]\s+)?)/u,
    "",
  );
  return (numbered ? counted.replace(/^\s*\d{1,3}\s+(?:[-–—]\s+)?/, "") : counted).trim();
}

function readLine(text: string, reader: LineReader): PastedSong | string {
  if (text.length > longestLine)
    return `This line is longer than ${longestLine} characters. Write one song a line.`;
  const quoted = /^["“„«]([^"“”„«»]+)["“”»](.*)$/u.exec(text);
  const columns = text.split(/\t+|\s\|\s|\s{3,}/).map((column) => column.trim());
  const fields = columns.filter((column) => column !== "" && !/^[-–—]+$/.test(column));
  if (!/[\p{L}\p{N}]/u.test(text)) return "There is no title on this line. Write the title first.";
  if (fields.length > 1 && fields.every((field) => columnNames.test(field))) {
    return "These are the headings of columns, not a song. Leave this line out.";
  }
  if (headings.test(text) || /^[^\d"]+:$/.test(text)) {
    return `This is a heading, not a song. Leave this line out. ${inQuotes}`;
  }
  if (quoted) return readQuoted(quoted[1]!.trim(), quoted[2]!.replace(/^[\s,;|/–—-]+/u, ""), reader);
  return fields.length > 1 ? readColumns(fields, reader) : readRunning(text, reader);
}

function readQuoted(title: string, rest: string, reader: LineReader): PastedSong | string {
  const reading = findParts(rest, true, reader);
  if (reading.problem) return reading.problem;
  if (reading.rest !== "") return notUnderstood(reading.rest, "the title");
  return song(title, "", reading.parts, reader);
}

function readRunning(text: string, reader: LineReader): PastedSong | string {
  const reading = findParts(text, false, reader);
  if (reading.problem) return `${reading.problem} ${inQuotes}`;
  return strayPart(reading, reader) ?? song(reading.rest, "", reading.parts, reader);
}

function readColumns(columns: string[], reader: LineReader): PastedSong | string {
  const counted =
    columns.length > 2 && /^\d{1,3}[.)]?$/.test(columns[0]!) && readField(columns[1]!, reader) === null;
  const [title, ...fields] = counted ? columns.slice(1) : columns;
  let parts: SongParts = {};
  let credit = "";
  for (const field of fields) {
    const found = readField(field, reader);
    if (typeof found === "string") return found;
    const twice = found && Object.keys(found).find((kind) => kind in parts);
    if (twice)
      return `"${field}" is a second ${partNames[twice as keyof SongParts]} on this line. Leave one out.`;
    if (!found && credit !== "") return notUnderstood(field, `"${credit}"`);
    if (found) parts = { ...parts, ...found };
    else credit = field;
  }
  return song(title!, credit, parts, reader);
}

const partNames: Record<keyof SongParts, string> = {
  seconds: "length",
  tempo: "tempo",
  key: "key",
  capos: "capo",
  tuning: "tuning",
  energy: "energy",
  wanted: "wanted",
};

/** What one column says: its parts, null for plain words, or what is wrong with it. */
function readField(field: string, reader: LineReader): SongParts | null | string {
  if (/^\d+$/.test(field) && field.length !== reader.usual.length) {
    return `"${field}" could be a capo, a length or a tempo. Write it as "capo 2", "2:00" or "96 bpm".`;
  }
  const key = readWholeKey(field, reader);
  if (key) return { key };
  const reading = findParts(field, true, reader);
  if (reading.problem) return reading.problem;
  return reading.rest === "" ? reading.parts : null;
}

function notUnderstood(part: string, after: string): string {
  return `"${part}" after ${after} was not understood. Write the title, then tuning, capo and length.`;
}

/** A part that stands inside the title with words after it: those words would be lost or wrong, so the line is refused. */
function strayPart({ rest, parts }: PartsReading, reader: LineReader): string | null {
  const words = rest.split(/\s+/);
  const problem = (last: string, after: string) =>
    after === ""
      ? "There is no title on this line. Write the title first."
      : `${notUnderstood(after, last)} ${inQuotes}`;
  const onlyTime = parts.seconds === undefined && readDuration(rest).ok && /[:'′]/.test(rest);
  if (onlyTime || (parts.capos === undefined && /^capo\s*\d+$/i.test(rest))) return problem(rest, "");
  if (parts.seconds === undefined && /^\d{1,2}:[0-5]\d\s/.test(rest)) {
    return `A length stands before the title. Write the title first. ${inQuotes}`;
  }
  const firstTuning =
    parts.tuning === undefined && words.length > 1 ? findTuning(words[0]!, false, reader) : null;
  if (firstTuning && "open" in firstTuning) {
    return `A tuning stands before the title. Write the title first. ${inQuotes}`;
  }
  for (let end = words.length - 1; end > 1; end -= 1) {
    const before = words.slice(0, end).join(" ");
    const after = words.slice(end).join(" ");
    const stray = findParts(before, false, reader);
    const aboutTuning = /\btuning$/i.test(before);
    const kinds = Object.keys(stray.parts).filter(
      (kind) => !(kind in parts) && kind !== "key" && !aboutTuning,
    );
    if (kinds.length > 0) return problem(`the ${partNames[kinds[0] as keyof SongParts]}`, after);
  }
  return null;
}

function song(title: string, credit: string, parts: SongParts, reader: LineReader): PastedSong | string {
  if (title.length > longestTitle) return `The title is longer than ${longestTitle} characters. Shorten it.`;
  return {
    title,
    credit,
    open: parts.tuning?.open ?? [...reader.usual],
    openAssumed: parts.tuning === undefined,
    ambiguous: parts.tuning?.ambiguous ?? [],
    capos: parts.capos ?? [],
    seconds: parts.seconds ?? null,
    tempo: parts.tempo ?? null,
    key: parts.key ?? "",
    energy: parts.energy ?? null,
    priority: parts.wanted ?? usualPriority,
  };
}
