import type { Letter, Naming } from "#app/domain/music/note-names.ts";

/** One note as it was written. `octave` is null where none was given. */
export type WrittenNote = {
  letter: Letter;
  alter: number;
  octave: number | null;
  /** Characters it took. */
  length: number;
  /** A "B" with no sign: B natural to some, B flat to others. */
  bareB: boolean;
  /** Written as only Germans do: H, Es, Fis. */
  german: boolean;
  /** A B with a sign, or Si: so a bare B beside it is B natural. */
  signedB: boolean;
  /** How unlike a note it looks, 0 for plain: of several readings the plainest wins. */
  oddity: number;
};

type NoteStart = Omit<WrittenNote, "octave">;

const syllable = /^(do|dó|ut|ré|re|mi|fa|fá|sol|so|la|lá|si|ti)/i;
const syllableLetters: Record<string, Letter> = {
  do: "C",
  ut: "C",
  re: "D",
  mi: "E",
  fa: "F",
  so: "G",
  sol: "G",
  la: "A",
  si: "B",
  ti: "B",
};

/** Writes sharps and flats that are spelled out ("E flat", "mi bémol") as signs, so that one reader suffices. */
export function wordsToSigns(text: string): string {
  return text
    .replace(/[\s-]*(?<!\p{L})(?:flat|bémol|bemolle|bemol)(?!\p{L})/giu, "♭")
    .replace(/[\s-]*(?<!\p{L})(?:sharp|dièse|diese|diesis|sostenido)(?!\p{L})/giu, "♯")
    .replace(/[\s-]*(?<!\p{L})natural(?!\p{L})/giu, "♮");
}

function signAt(text: string): { alter: number; length: number } | null {
  const signs: Record<string, number> = { "#": 1, "♯": 1, "♭": -1, "♮": 0 };
  const alter = signs[text[0] ?? ""];
  return alter === undefined ? null : { alter, length: 1 };
}

function readSyllable(text: string, naming: Naming): NoteStart[] {
  const match = syllable.exec(text);
  if (!match) return [];
  const plain = match[0].normalize("NFD").replace(/\p{M}/gu, "").toLowerCase();
  const letter = syllableLetters[plain]!;
  const rest = text.slice(match[0].length);
  const sign = signAt(rest) ?? (rest.startsWith("b") ? { alter: -1, length: 1 } : { alter: 0, length: 0 });
  const oddity = naming === "fixed-do" ? 0 : 2;
  const length = match[0].length + sign.length;
  return [
    { letter, alter: sign.alter, length, bareB: false, german: false, signedB: letter === "B", oddity },
  ];
}

function readLetter(text: string, naming: Naming, capitals: boolean): NoteStart[] {
  const first = text[0] ?? "";
  if (!/[A-Ha-h]/.test(first)) return [];
  const h = first === "H" || first === "h";
  const letter = (h ? "B" : first.toUpperCase()) as Letter;
  const rest = text.slice(1);
  const oddity = (capitals && first !== first.toUpperCase() ? 1 : 0) + (naming === "fixed-do" ? 2 : 0);
  const signedB = letter === "B" && !h;
  const note = { letter, bareB: false, german: h, signedB, oddity };

  const sign = signAt(rest);
  if (sign) return [{ ...note, alter: sign.alter, length: 1 + sign.length }];

  const readings: NoteStart[] = [];
  if (/^b/i.test(rest) && !h) {
    readings.push({ ...note, alter: -1, length: 2, oddity: oddity + (rest.startsWith("B") ? 3 : 0) });
  }
  const suffix = (letter === "E" || letter === "A" ? /^(is|es|s)/i : /^(is|es)/i).exec(rest)?.[0];
  if (suffix) {
    const alter = suffix.toLowerCase() === "is" ? 1 : -1;
    const strange = (naming === "german" ? 0 : 1) + (suffix === suffix.toLowerCase() ? 0 : 1);
    readings.push({ ...note, alter, length: 1 + suffix.length, german: true, oddity: oddity + strange });
  }
  readings.push({ ...note, alter: 0, length: 1, bareB: signedB, signedB: false });
  return readings;
}

/** Every way in which a text may begin with a note, each with and without the octave digit that follows it. */
export function noteReadings(text: string, naming: Naming, capitals: boolean): WrittenNote[] {
  return [...readLetter(text, naming, capitals), ...readSyllable(text, naming)].map((note) => {
    const digit = /^[0-9]/.exec(text.slice(note.length));
    return digit ? { ...note, octave: Number(digit[0]), length: note.length + 1 } : { ...note, octave: null };
  });
}

/**
 * The longest note name at the start of a text, or null.
 * @example readNoteName("Bb minor", "english") // { letter: "B", alter: -1, length: 2, … }
 */
export function readNoteName(text: string, naming: Naming): WrittenNote | null {
  const readings = noteReadings(text, naming, false).filter((note) => note.oddity < 3);
  return readings.reduce<WrittenNote | null>(
    (best, note) => (best && best.length >= note.length ? best : note),
    null,
  );
}
