import {
  fifthsOf,
  fifthsOfTuning,
  type Letter,
  type Naming,
  noteName,
  pitchClassOfLetter,
  spokenNote,
} from "#app/domain/music/note-names.ts";
import type { Midi } from "#app/domain/music/pitch.ts";
import { readNoteName, wordsToSigns } from "#app/domain/music/read-notes.ts";

/** A key in its parts. `mode` is "" for major and "m" for minor; other modes stand by name ("dorian"). */
type KeyParts = { letter: Letter; alter: number; mode: string };

/** Sharps (+) or flats (−) that a mode has against the major key on the same tonic. */
const modes: Record<string, number> = {
  "": 0,
  m: -3,
  ionian: 0,
  dorian: -2,
  phrygian: -4,
  lydian: 1,
  mixolydian: -1,
  aeolian: -3,
  locrian: -5,
};

const modeWords: Record<string, string> = {
  "": "",
  dur: "",
  maj: "",
  major: "",
  mayor: "",
  maggiore: "",
  majeur: "",
  m: "m",
  "-": "m",
  min: "m",
  minor: "m",
  moll: "m",
  menor: "m",
  minore: "m",
  mineur: "m",
  mixo: "mixolydian",
  ...Object.fromEntries(
    Object.keys(modes)
      .slice(2)
      .map((mode) => [mode, mode]),
  ),
};

export type KeyReading = { ok: true; key: string } | { ok: false; message: string };

/**
 * Reads a key as players write it, to the form in which it is kept: tonic with # or b, "m" for minor ("G", "F#m",
 * "Bb", "D dorian"). Nothing typed is no key (""). In German naming a small letter alone is minor ("h" is "Bm"), and
 * "Dur" or "Moll" makes any reader's key German.
 * @example readKey("Bb minor", "english") // { ok: true, key: "Bbm" }
 * @example readKey("h-Moll", "german") // { ok: true, key: "Bm" }
 * @example readKey("Sib menor", "fixed-do") // { ok: true, key: "Bbm" }
 */
export function readKey(text: string, naming: Naming): KeyReading {
  const typed = wordsToSigns(text.normalize("NFC").trim());
  if (typed === "") return { ok: true, key: "" };
  const refused: KeyReading = {
    ok: false,
    message: `"${typed.slice(0, 40)}" is no key that can be read. Write it like G, F#m or Bb minor.`,
  };
  const german = naming === "german" || /(dur|moll)\s*$/i.test(typed);
  const tonic = readNoteName(typed, german ? "german" : naming);
  if (!tonic || tonic.octave !== null) return refused;
  const alter = tonic.bareB && german ? -1 : tonic.alter;
  const rest = typed.slice(tonic.length);
  const bare = rest.replace(/^[\s-]+|[\s.]+$/g, "");
  if (bare === "M") return { ok: true, key: tonicName(tonic.letter, alter) };
  const mode = modeWords[bare === "" ? rest.trim() : bare.toLowerCase()];
  if (mode === undefined) return refused;
  const small = typed[0] !== typed[0]!.toUpperCase();
  const minor = mode === "" && bare === "" && german && small;
  return { ok: true, key: keyName({ letter: tonic.letter, alter, mode: minor ? "m" : mode }) };
}

function tonicName(letter: Letter, alter: number): string {
  return letter + (alter < 0 ? "b" : "#").repeat(Math.abs(alter));
}

function keyName(parts: KeyParts): string {
  const tonic = tonicName(parts.letter, parts.alter);
  return parts.mode.length > 1 ? `${tonic} ${parts.mode}` : tonic + parts.mode;
}

function keyParts(key: string): KeyParts | null {
  const match = /^([A-G])(#{1,2}|b{1,2})?(?:(m)| ([a-z]+))?$/.exec(key);
  if (!match) return null;
  const mode = match[3] ?? match[4] ?? "";
  if (modes[mode] === undefined) return null;
  const signs = match[2] ?? "";
  return { letter: match[1] as Letter, alter: signs.startsWith("b") ? -signs.length : signs.length, mode };
}

/**
 * Sharps (+) or flats (−) in a key's signature, or null for a key that is unknown or unread. A key beyond seven
 * signs counts as its enharmonic twin (G# major as Ab).
 * Source: C. E. Gardner, Essentials of Music Theory; sign as MusicXML `fifths`.
 * @example keyFifths("Bb") // -2
 * @example keyFifths("F#m") // 3
 */
export function keyFifths(key: string): number | null {
  const parts = keyParts(key);
  if (!parts) return null;
  const fifths = fifthsOf(parts.letter, parts.alter) + modes[parts.mode]!;
  if (fifths > 7) return fifths - 12;
  return fifths < -7 ? fifths + 12 : fifths;
}

/**
 * One text for every spelling of a key, null for a key that is unknown or unread: G# minor is Ab minor, C ionian is C
 * major, and A aeolian A minor. Relative keys (C major, A minor) are two.
 * @example soundOfKey("G#m") === soundOfKey("Abm") // true
 */
export function soundOfKey(key: string): string | null {
  const parts = keyParts(key);
  if (!parts) return null;
  const same: Record<string, string> = { ionian: "", aeolian: "m" };
  return `${pitchClassOfLetter(parts.letter, parts.alter)} ${same[parts.mode] ?? parts.mode}`.trim();
}

/**
 * The signature to spell a tuning in: the song's key where it is known, else the one that suits the tuning itself.
 * @example spellingFifths("Eb", [36, 43, 48, 53, 53, 60]) // -3
 */
export function spellingFifths(key: string, open: readonly Midi[]): number {
  return keyFifths(key) ?? fifthsOfTuning(open);
}

/**
 * A key in the reader's naming; "" for no key.
 * @example nameKey("F#m", "english") // "F♯m"
 * @example nameKey("F#m", "german") // "fis-Moll"
 * @example nameKey("Bb", "fixed-do") // "Si♭"
 */
export function nameKey(key: string, naming: Naming): string {
  const parts = keyParts(key);
  if (!parts) return key;
  const tonic = noteName(parts, naming);
  if (parts.mode.length > 1) return `${tonic} ${parts.mode}`;
  if (naming !== "german") return tonic + parts.mode;
  return parts.mode === "m" ? `${tonic.toLowerCase()}-Moll` : `${tonic}-Dur`;
}

/**
 * A key as a screen reader should say it.
 * @example spokenKey("F#m", "english") // "F sharp minor"
 */
export function spokenKey(key: string, naming: Naming): string {
  const parts = keyParts(key);
  if (!parts) return key;
  if (naming === "german" && parts.mode.length < 2) return nameKey(key, naming).replace("-", " ");
  const mode = parts.mode === "m" ? "minor" : parts.mode || "major";
  return `${spokenNote(parts, naming)} ${mode}`;
}
