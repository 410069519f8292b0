import type { Naming } from "#app/domain/music/note-names.ts";
import { noteReadings, type WrittenNote } from "#app/domain/music/read-notes.ts";

/** A row of notes read from a text, or why it could not be read. */
export type NoteRowReading =
  | { kind: "notes"; readings: WrittenNote[][] }
  | { kind: "count"; read: number }
  | { kind: "unreadable"; part: string; before: string };

/** Rows of equal plainness by their number of notes. */
type Rows = Map<number, { oddity: number; rows: WrittenNote[][] }>;

const separators = /[\s,;|/·–—−_-]+/u;
/** Twelve strings of "Sol♯4" with separators are shorter than this. */
const longestText = 100;
const mostEqualRows = 8;

/**
 * Reads a row of notes, with or without separators and octaves, of which there must be one of `counts` notes. Where
 * small letters leave several readings that are equally plain ("b" may be a flat), all of them come back.
 * @example readNoteRow("DADGAD", "english", [6]) // { kind: "notes", readings: [[six notes]] }
 * @example readNoteRow("DADGAX", "english", [6]) // { kind: "unreadable", part: "X", before: "DADGA" }
 * @example readNoteRow("DADGA", "english", [6]) // { kind: "count", read: 5 }
 */
export function readNoteRow(text: string, naming: Naming, counts: readonly number[]): NoteRowReading {
  const tokens = text.split(separators).filter((token) => token !== "");
  if (text.length > longestText) return { kind: "unreadable", part: `${text.slice(0, 20)}…`, before: "" };
  const capitals = /\p{Lu}/u.test(text);
  if (counts.includes(tokens.length)) {
    const notes = tokens.map((token) => wholeNote(token, naming, capitals, 9));
    if (notes.every((note) => note !== null)) return { kind: "notes", readings: [notes] };
  }

  let rows: Rows = new Map([[0, { oddity: 0, rows: [[]] }]]);
  for (const [index, token] of tokens.entries()) {
    const whole = tokens.length > 1 ? wholeNote(token, naming, capitals, 2) : null;
    const next = whole ? extend(rows, whole) : extendByToken(rows, token, naming, capitals);
    if (typeof next === "number") {
      const before = [...tokens.slice(0, index), token.slice(0, next)].join(" ").trim();
      return { kind: "unreadable", part: token.slice(next), before };
    }
    rows = next;
  }
  const fitting = counts.flatMap((count) => rows.get(count) ?? []);
  const plainest = Math.min(...fitting.map((group) => group.oddity));
  const readings = fitting.filter((group) => group.oddity === plainest).flatMap((group) => group.rows);
  if (readings.length > 0) return { kind: "notes", readings };
  const [read] = [...rows].reduce((best, entry) => (entry[1].oddity < best[1].oddity ? entry : best));
  return { kind: "count", read };
}

/** The one note that a whole token is, the plainest reading first; null where it is none or too odd. */
function wholeNote(token: string, naming: Naming, capitals: boolean, mostOddity: number): WrittenNote | null {
  const whole = noteReadings(token, naming, capitals).filter((note) => note.length === token.length);
  return whole.reduce<WrittenNote | null>(
    (best, note) => (note.oddity > mostOddity || (best && best.oddity <= note.oddity) ? best : note),
    null,
  );
}

function extend(rows: Rows, note: WrittenNote): Rows {
  const longer: Rows = new Map();
  merge(longer, rows, note);
  return longer;
}

function merge(into: Rows, rows: Rows, note: WrittenNote): void {
  for (const [count, group] of rows) {
    const oddity = group.oddity + note.oddity;
    const longer = group.rows.map((row) => [...row, note]);
    const known = into.get(count + 1);
    if (!known || oddity < known.oddity) into.set(count + 1, { oddity, rows: longer });
    else if (oddity === known.oddity) {
      into.set(count + 1, { oddity, rows: [...known.rows, ...longer].slice(0, mostEqualRows) });
    }
  }
}

/** Every way to split a token into notes, added to the rows so far; or the place up to which it could be read. */
function extendByToken(rows: Rows, token: string, naming: Naming, capitals: boolean): Rows | number {
  const at: Rows[] = Array.from({ length: token.length + 1 }, () => new Map());
  at[0] = rows;
  let furthest = 0;
  for (let place = 0; place < token.length; place += 1) {
    const here = at[place]!;
    if (here.size === 0) continue;
    furthest = place;
    for (const note of noteReadings(token.slice(place), naming, capitals)) {
      merge(at[place + note.length]!, here, note);
    }
  }
  const end = at[token.length]!;
  return end.size > 0 ? end : furthest;
}
