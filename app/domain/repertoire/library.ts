import { compactTuning } from "#app/domain/music/format-tuning.ts";
import { keyFifths, nameKey, spellingFifths } from "#app/domain/music/key.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { nameTuning } from "#app/domain/music/tuning-names.ts";
import type { Song } from "#app/domain/repertoire/song.ts";
import { type UsualChoice, usualFor } from "#app/domain/repertoire/usual-choices.ts";

/** A song as the library lists it, with its first choice of tuning and capo. */
export type LibraryRow = Pick<Song, "id" | "title" | "credit" | "seconds" | "key" | "energy" | "priority"> & {
  neck: Neck | null;
  /** How many ways there are to play it. */
  ways: number;
  /** Semitones between its tuning and the usual one, all strings together. */
  distance: number;
  /** What a search looks in, folded. */
  words: string;
};

export const librarySorts = ["title", "tuning", "key", "energy", "length"] as const;
export type LibrarySort = (typeof librarySorts)[number];

/**
 * Text as a search compares it: small letters without accents, signs of notes as # and b.
 * @example folded("Señor B♭") // "senor bb"
 */
export function folded(text: string): string {
  return text
    .normalize("NFD")
    .replace(/\p{Mn}/gu, "")
    .replaceAll("♯", "#")
    .replaceAll("♭", "b")
    .toLowerCase();
}

/**
 * A song as a row of the library. It can be found by title, credit, first line, tuning (letters or name) and key.
 * @example libraryRow({ title: "Low Meadow", … }, usualChoices([]), "english").distance // 2, in drop D
 */
export function libraryRow(song: Song, choices: readonly UsualChoice[], naming: Naming): LibraryRow {
  const [first] = song.necks;
  const usual = first ? usualFor(first.open, choices, first.guitars) : [];
  const tunings = song.necks.flatMap(({ open, guitars }) => [
    compactTuning(open, naming, spellingFifths(song.key, open)),
    nameTuning(open, usualFor(open, choices, guitars), naming) ?? "",
  ]);
  const capos = song.necks.flatMap((neck) => neck.capos.map((capo) => `capo ${capo.fret}`));
  const words = [song.title, song.credit, song.firstLine, nameKey(song.key, naming), ...tunings, ...capos];
  return {
    id: song.id,
    title: song.title,
    credit: song.credit,
    seconds: song.seconds,
    key: song.key,
    energy: song.energy,
    priority: song.priority,
    neck: first ? { open: first.open, capos: first.capos } : null,
    ways: song.necks.length,
    distance: first ? first.open.reduce((sum, midi, index) => sum + Math.abs(midi - usual[index]!), 0) : 0,
    words: folded(words.join(" ")),
  };
}

/**
 * The rows in which every word of the query is found, anywhere in a word.
 * @example searchLibrary(rows, "dadgad mead") // the songs in DADGAD with "mead" in them
 */
export function searchLibrary(rows: readonly LibraryRow[], query: string): LibraryRow[] {
  const parts = folded(query)
    .split(/\s+/)
    .filter((part) => part !== "");
  return rows.filter((row) => parts.every((part) => row.words.includes(part)));
}

const titles = new Intl.Collator("en", { sensitivity: "base", numeric: true });

function byTitle(one: LibraryRow, other: LibraryRow): number {
  return titles.compare(one.title, other.title) || (one.id < other.id ? -1 : 1);
}

/** Same tunings stand together, the usual one first, then ever further from it; inside one tuning by capo. */
function byTuning(one: LibraryRow, other: LibraryRow): number {
  const open = (row: LibraryRow) => row.neck?.open.join() ?? "";
  const fret = (row: LibraryRow) => Math.max(0, ...(row.neck?.capos.map((capo) => capo.fret) ?? []));
  return (
    (one.neck?.open.length ?? 0) - (other.neck?.open.length ?? 0) ||
    one.distance - other.distance ||
    open(one).localeCompare(open(other)) ||
    fret(one) - fret(other)
  );
}

/** Keys by their signature, flats before sharps, major before minor; songs without a key last. */
function byKey(one: LibraryRow, other: LibraryRow): number {
  const fifths = (row: LibraryRow) => keyFifths(row.key) ?? Number.POSITIVE_INFINITY;
  if (fifths(one) !== fifths(other)) return fifths(one) < fifths(other) ? -1 : 1;
  return one.key.length - other.key.length || one.key.localeCompare(other.key);
}

/** Calm before full; songs of which nobody has said it last. */
function byEnergy(one: LibraryRow, other: LibraryRow): number {
  return (one.energy ?? 6) - (other.energy ?? 6);
}

const orders: Record<LibrarySort, (one: LibraryRow, other: LibraryRow) => number> = {
  title: byTitle,
  tuning: byTuning,
  key: byKey,
  energy: byEnergy,
  length: (one, other) => one.seconds - other.seconds,
};

/**
 * The rows in the order asked for; equals stand by title.
 * @example sortLibrary(rows, "tuning", false)[0] // a song in the usual tuning
 */
export function sortLibrary(
  rows: readonly LibraryRow[],
  sort: LibrarySort,
  descending: boolean,
): LibraryRow[] {
  const order = orders[sort];
  return rows.toSorted((one, other) => {
    const compared = order(one, other);
    return (descending ? -compared : compared) || byTitle(one, other);
  });
}
