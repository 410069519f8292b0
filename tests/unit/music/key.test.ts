import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { keyFifths, nameKey, readKey, spellingFifths, spokenKey } from "#app/domain/music/key.ts";
import { namings } from "#app/domain/music/note-names.ts";

const read = (text: string, naming: (typeof namings)[number] = "english") => {
  const reading = readKey(text, naming);
  return reading.ok ? reading.key : reading.message;
};

describe("reading a key", () => {
  test.each([
    ["G", "G"],
    ["g", "G"],
    ["F#m", "F#m"],
    ["f♯ minor", "F#m"],
    ["Bb minor", "Bbm"],
    ["B flat", "Bb"],
    ["Am", "Am"],
    ["A-", "Am"],
    ["GM", "G"],
    ["Gmaj", "G"],
    ["D dorian", "D dorian"],
    ["A mixo", "A mixolydian"],
    ["h-Moll", "Bm"],
    ["B-Dur", "Bb"],
    ["", ""],
  ])("%j is %j", (text, key) => {
    expect(read(text)).toBe(key);
  });

  test.each([
    ["h-Moll", "Bm"],
    ["h", "Bm"],
    ["H", "B"],
    ["B", "Bb"],
    ["fis-moll", "F#m"],
    ["Es", "Eb"],
    ["As-Dur", "Ab"],
    ["as-Moll", "Abm"],
  ])("German %j is %j", (text, key) => {
    expect(read(text, "german")).toBe(key);
  });

  test.each([
    ["Sol", "G"],
    ["Sib menor", "Bbm"],
    ["Fa# m", "F#m"],
    ["ré mineur", "Dm"],
    ["mi bémol majeur", "Eb"],
  ])("fixed do %j is %j", (text, key) => {
    expect(read(text, "fixed-do")).toBe(key);
  });

  test.each(["X", "C2", "Reprise", "G and D", "Gxm"])(
    "%j is no key, and the message says how to write one",
    (text) => {
      expect(read(text)).toBe(`"${text}" is no key that can be read. Write it like G, F#m or Bb minor.`);
    },
  );
});

// C. E. Gardner, Essentials of Music Theory: signatures of the major keys; relative minors three fifths lower.
test.each([
  ["C", 0],
  ["G", 1],
  ["D", 2],
  ["A", 3],
  ["E", 4],
  ["B", 5],
  ["F#", 6],
  ["C#", 7],
  ["F", -1],
  ["Bb", -2],
  ["Eb", -3],
  ["Ab", -4],
  ["Db", -5],
  ["Gb", -6],
  ["Cb", -7],
  ["Am", 0],
  ["Em", 1],
  ["Bm", 2],
  ["F#m", 3],
  ["Dm", -1],
  ["Bbm", -5],
  ["Ebm", -6],
  ["D dorian", 0],
])("%s has signature %i", (key, fifths) => {
  expect(keyFifths(key)).toBe(fifths);
});

test("a key beyond seven signs counts as its twin; no key has none", () => {
  expect(keyFifths("G#")).toBe(keyFifths("Ab"));
  expect(keyFifths("")).toBeNull();
  expect(keyFifths("Wide")).toBeNull();
});

test("a tuning is spelled in the song's key, or in its own where that is unknown", () => {
  expect(spellingFifths("Eb", [40])).toBe(-3);
  expect(spellingFifths("", [40, 47, 52, 56, 59, 64])).toBe(2);
});

test("named for the reader", () => {
  expect(nameKey("F#m", "english")).toBe("F♯m");
  expect(nameKey("F#m", "german")).toBe("fis-Moll");
  expect(nameKey("Bb", "german")).toBe("B-Dur");
  expect(nameKey("Bb", "fixed-do")).toBe("Si♭");
  expect(nameKey("", "english")).toBe("");
  expect(spokenKey("F#m", "english")).toBe("F sharp minor");
  expect(spokenKey("Eb", "german")).toBe("Es Dur");
});

test("a key's name reads back in every naming", () => {
  const tonics = ["C", "D", "E", "F", "G", "A", "B"].flatMap((letter) => [
    letter,
    `${letter}#`,
    `${letter}b`,
  ]);
  const keys = tonics.flatMap((tonic) => [tonic, `${tonic}m`, `${tonic} dorian`, `${tonic} mixolydian`]);
  for (const key of keys) {
    for (const naming of namings) expect(read(nameKey(key, naming), naming), `${key} ${naming}`).toBe(key);
  }
});

test("no text makes it throw, and what it keeps it understands", () => {
  fc.assert(
    fc.property(fc.string({ unit: "grapheme" }), fc.constantFrom(...namings), (text, naming) => {
      const reading = readKey(text, naming);
      if (reading.ok && reading.key !== "") expect(keyFifths(reading.key)).not.toBeNull();
    }),
    { seed: 9, numRuns: 500 },
  );
});
