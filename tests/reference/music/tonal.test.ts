import { Key, Note } from "tonal";
import { describe, expect, test } from "vitest";
import { keyFifths } from "#app/domain/music/key.ts";
import { noteNameWithOctave, spell, spellString } from "#app/domain/music/note-names.ts";
import { frequencyOf } from "#app/domain/music/pitch.ts";
import { readTuning } from "#app/domain/music/tuning.ts";

const ascii = (name: string) => name.replaceAll("♯", "#").replaceAll("♭", "b");

/** tonal (MIT) has its own arithmetic for pitches, frequencies and signatures; nothing here is shared with it. */
describe("tonal agrees", () => {
  test("on the pitch and frequency of every note we spell, in every signature", () => {
    for (let midi = 12; midi <= 119; midi += 1) {
      for (let fifths = -7; fifths <= 7; fifths += 1) {
        for (const note of [spell(midi, fifths), spellString(midi, fifths)]) {
          const theirs = Note.get(ascii(noteNameWithOctave(note, "english")));
          expect(theirs.midi).toBe(midi);
          expect(theirs.freq).toBeCloseTo(frequencyOf(midi), 6);
        }
      }
    }
  });

  test("on the signature of every key of up to seven signs", () => {
    const tonics = ["C", "D", "E", "F", "G", "A", "B"].flatMap((letter) => [
      letter,
      `${letter}#`,
      `${letter}b`,
    ]);
    let compared = 0;
    for (const tonic of tonics) {
      const major = Key.majorKey(tonic).alteration;
      const minor = Key.minorKey(tonic).alteration;
      if (Math.abs(major) <= 7) expect(keyFifths(tonic), tonic).toBe(major);
      if (Math.abs(minor) <= 7) expect(keyFifths(`${tonic}m`), `${tonic}m`).toBe(minor);
      compared += (Math.abs(major) <= 7 ? 1 : 0) + (Math.abs(minor) <= 7 ? 1 : 0);
    }
    expect(compared).toBe(30);
  });

  test("on the notes of a key: each is spelled as in its scale", () => {
    for (const tonic of ["C", "G", "D", "A", "E", "B", "F#", "C#", "F", "Bb", "Eb", "Ab", "Db", "Gb", "Cb"]) {
      for (const name of Key.majorKey(tonic).scale) {
        const midi = Note.midi(`${name}3`)!;
        expect(ascii(noteNameWithOctave(spell(midi, keyFifths(tonic)!), "english")), tonic).toBe(`${name}3`);
      }
    }
  });

  test("on the pitches of tunings typed with octaves", () => {
    const usual = [40, 45, 50, 55, 59, 64];
    for (const text of [
      "E2 A2 D3 G3 B3 E4",
      "C2 G2 C3 F3 F3 C4",
      "Db2 Ab2 Db3 Gb3 Bb3 Eb4",
      "C#2 G#2 C#3 F#3 A#3 D#4",
    ]) {
      const reading = readTuning(text, { usual, naming: "english" });
      expect(reading.ok && reading.open).toEqual(text.split(" ").map((name) => Note.midi(name)));
    }
  });
});
