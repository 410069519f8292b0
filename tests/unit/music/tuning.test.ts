import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  compactTuning,
  formatTuning,
  formatTuningWithOctaves,
  spokenTuning,
} from "#app/domain/music/format-tuning.ts";
import { type Naming, namings, noteName } from "#app/domain/music/note-names.ts";
import { nearestPitch, readTuning } from "#app/domain/music/tuning.ts";

const standard = [40, 45, 50, 55, 59, 64];
const twelve = [40, 52, 45, 57, 50, 62, 55, 67, 59, 59, 64, 64];
const ukulele = [67, 60, 64, 69];

function open(text: string, usual: number[] = standard, naming: Naming = "english"): string {
  const reading = readTuning(text, { usual, naming });
  return reading.ok ? reading.open.join(" ") : reading.message;
}

describe("letters", () => {
  // The octave rule and its check value: common practice, no source.
  test("C G C F F C stands at C2 G2 C3 F3 F3 C4, the F of string 2 at the slacker of two octaves", () => {
    const reading = readTuning("CGCFFC", { usual: standard, naming: "english" });
    expect(reading).toMatchObject({ ok: true, open: [36, 43, 48, 53, 53, 60], ambiguous: [] });
    expect(reading.ok && reading.notes.map((note) => note.semitones)).toEqual([-4, -2, -2, -2, -6, -4]);
    expect(reading.ok && reading.notes[4]).toMatchObject({ string: 2, midi: 53, alternatives: [65] });
    expect(reading.ok && reading.notes[0]).toMatchObject({ string: 6, alternatives: [] });
  });

  test.each([
    ["D A D G A D", "38 45 50 55 57 62"],
    ["d a d g a d", "38 45 50 55 57 62"],
    ["dadgad", "38 45 50 55 57 62"],
    ["D,A,D,G,A,D", "38 45 50 55 57 62"],
    ["D-A-D-G-A-D", "38 45 50 55 57 62"],
    ["D – A – D – G – A – D", "38 45 50 55 57 62"],
    ["DAD GAD", "38 45 50 55 57 62"],
    ["(DADGAD)", "38 45 50 55 57 62"],
    ["DADGAD tuning", "38 45 50 55 57 62"],
    ["DADGBE (drop D)", "38 45 50 55 59 64"],
    ["EADGBe", "40 45 50 55 59 64"],
    ["E2 A2 D3 G3 B3 E4", "40 45 50 55 59 64"],
    ["E2A2D3G3B3E4", "40 45 50 55 59 64"],
    ["C#G#C#F#A#D#", "37 44 49 54 58 63"],
    ["C♯ G♯ C♯ F♯ A♯ D♯", "37 44 49 54 58 63"],
    ["EbAbDbGbBbEb", "39 44 49 54 58 63"],
    ["E♭ A♭ D♭ G♭ B♭ E♭", "39 44 49 54 58 63"],
    ["E flat, A flat, D flat, G flat, B flat, E flat", "39 44 49 54 58 63"],
    ["EB AB DB GB BB EB", "39 44 49 54 58 63"],
    ["ebabdbgbbbeb", "39 44 49 54 58 63"],
    ["eadgbe", "40 45 50 55 59 64"],
    ["E A D G H E", "40 45 50 55 59 64"],
  ])("%j is %s", (text, pitches) => {
    expect(open(text)).toBe(pitches);
  });

  test("a note keeps the spelling that was typed", () => {
    const reading = readTuning("C#GCFAD", { usual: standard, naming: "english" });
    expect(reading.ok && noteName(reading.notes[0]!.note, "english")).toBe("C♯");
  });

  test("each string of a re-entrant instrument has its own octave", () => {
    expect(open("GCEA", ukulele)).toBe("67 60 64 69");
    expect(open("gCEA", ukulele)).toBe("67 60 64 69");
    expect(open("ADF#B", ukulele)).toBe("69 62 66 71");
  });

  test("one letter a course will do on twelve strings, each string in its octave", () => {
    const dadgad = "38 50 45 57 50 62 55 67 57 57 62 62";
    expect(open("DADGAD", twelve)).toBe(dadgad);
    expect(open("D2 A2 D3 G3 A3 D4", twelve)).toBe(dadgad);
    expect(open("DDAADDGGAADD", twelve)).toBe(dadgad);
    expect(open("drop D", twelve)).toBe("38 50 45 57 50 62 55 67 59 59 64 64");
  });
});

describe("the reader's naming", () => {
  test("German H, -is and -es", () => {
    expect(open("EADGHE", standard, "german")).toBe("40 45 50 55 59 64");
    expect(open("Cis Gis Cis Fis Ais Dis", standard, "german")).toBe("37 44 49 54 58 63");
    expect(open("DesAsDesGesHEs", standard, "german")).toBe("37 44 49 54 59 63");
  });

  test("fixed do, apart or in one word, with accents and words", () => {
    expect(open("Mi La Re Sol Si Mi", standard, "fixed-do")).toBe("40 45 50 55 59 64");
    expect(open("DoSolDoFaFaDo", standard, "fixed-do")).toBe("36 43 48 53 53 60");
    expect(open("mi bémol la♭ ré♭ solb sib mib", standard, "fixed-do")).toBe("39 44 49 54 58 63");
    expect(open("DADGAD", standard, "fixed-do")).toBe("38 45 50 55 57 62");
  });

  test("a bare B in German is asked about, once answered it is not", () => {
    const reading = readTuning("EADGBE", { usual: standard, naming: "german" });
    expect(reading).toMatchObject({ ok: true, open: [40, 45, 50, 55, 58, 64] });
    expect(reading.ok && reading.ambiguous).toEqual([{ string: 2, options: [58, 59] }]);
    const natural = readTuning("EADGBE", { usual: standard, naming: "german", bareB: "natural" });
    expect(natural).toMatchObject({ ok: true, open: standard, ambiguous: [] });
    const flat = readTuning("EADGBE", { usual: standard, naming: "german", bareB: "flat" });
    expect(flat).toMatchObject({ ok: true, open: [40, 45, 50, 55, 58, 64], ambiguous: [] });
  });

  test("who writes H or B♭ beside it has said what B is", () => {
    expect(readTuning("H E A D B H", { usual: standard, naming: "german" })).toMatchObject({ ambiguous: [] });
    const english = readTuning("Bb E A D B E", { usual: standard, naming: "german" });
    expect(english).toMatchObject({ ok: true, open: [34, 40, 45, 50, 59, 64], ambiguous: [] });
  });

  test("in English a bare B is B natural, unless the rest is German", () => {
    expect(readTuning("EADGBE", { usual: standard, naming: "english" })).toMatchObject({ ambiguous: [] });
    const mixed = readTuning("Es As Des Ges B Es", { usual: standard, naming: "english" });
    expect(mixed.ok && mixed.ambiguous).toEqual([{ string: 2, options: [58, 59] }]);
  });
});

describe("moves of all strings", () => {
  test.each([
    ["half step down", "39 44 49 54 58 63"],
    ["half-step down", "39 44 49 54 58 63"],
    ["down a half step", "39 44 49 54 58 63"],
    ["tuned down 1/2 step", "39 44 49 54 58 63"],
    ["down 1", "39 44 49 54 58 63"],
    ["-1", "39 44 49 54 58 63"],
    ["1 semitone down", "39 44 49 54 58 63"],
    ["whole step down", "38 43 48 53 57 62"],
    ["down 2 frets", "38 43 48 53 57 62"],
    ["one and a half steps down", "37 42 47 52 56 61"],
    ["two steps down", "36 41 46 51 55 60"],
    ["up 1", "41 46 51 56 60 65"],
    ["DADGAD down 1", "37 44 49 54 56 61"],
    ["drop D, half step down", "37 44 49 54 58 63"],
    ["down 1 CGCFFC", "35 42 47 52 52 59"],
  ])("%j is %s", (text, pitches) => {
    expect(open(text)).toBe(pitches);
  });

  test("are from the instrument's own usual tuning", () => {
    expect(open("half step down", ukulele)).toBe("66 59 63 68");
  });
});

describe("what cannot be read", () => {
  const read = (text: string, usual = standard) => readTuning(text, { usual, naming: "english" });

  test.each([
    [
      "DADGAX",
      "X",
      '"X" after DADGA is no note. Write one letter for each string, such as D A D G A D, or a name, such as drop D.',
    ],
    [
      "D A Q G A D",
      "Q",
      '"Q" after D A is no note. Write one letter for each string, such as D A D G A D, or a name, such as drop D.',
    ],
    [
      "wide open",
      "wide",
      '"wide" is no note. Write one letter for each string, such as D A D G A D, or a name, such as drop D.',
    ],
    [
      "DADGA",
      "DADGA",
      "5 notes were read; this instrument needs 6. Write one for each string, lowest first.",
    ],
    [
      "D A D G A D A",
      "D A D G A D A",
      "7 notes were read; this instrument needs 6. Write one for each string, lowest first.",
    ],
    ["A", "A", "1 note was read; this instrument needs 6. Write one for each string, lowest first."],
    ["Eb Ab Db", "E♭ A♭ D♭", ""],
    ["drop D (open G)", "open G", '"drop D" and "open G" are two tunings. Write one of them.'],
    ["mandolin", "mandolin", "mandolin is a tuning for 8 strings; this instrument has 6."],
    [
      "E2 A2 D3 G3 B3 B9",
      "string 1",
      "String 1 would be outside what any string sounds. Check its octave: a guitar's low E is E2.",
    ],
    ["", "", "Write a tuning from the lowest string up, such as DADGAD, or a name, such as drop D."],
  ])("%j names its part", (text, part, message) => {
    const reading = read(text);
    if (text === "Eb Ab Db")
      expect(reading).toMatchObject({ ok: false, message: expect.stringMatching(/^3 notes/) });
    else expect(reading).toEqual({ ok: false, part, message });
  });

  test("on courses both counts are told", () => {
    expect(read("DADG", twelve)).toMatchObject({
      message:
        "4 notes were read; this instrument needs 12, or 6 with one a course. Write one for each string, lowest first.",
    });
  });
});

const usualTunings = [
  standard,
  twelve,
  ukulele,
  [28, 33, 38, 43],
  [23, 28, 33, 38, 43],
  [67, 50, 55, 59, 62],
  [35, 40, 45, 50, 55, 59, 64],
  [55, 55, 62, 62, 69, 69, 76, 76],
  [30, 35, 40, 45, 50, 55, 59, 64],
];
const naming = fc.constantFrom(...namings);
const fifths = fc.integer({ min: -7, max: 7 });
const usualAndOpen = fc.constantFrom(...usualTunings).chain((usual) =>
  fc.record({
    usual: fc.constant(usual),
    open: fc.tuple(...usual.map((midi) => fc.integer({ min: midi - 6, max: midi + 5 }))),
  }),
);

describe("always", () => {
  test("a tuning written with octaves reads back, in every naming and key", () => {
    fc.assert(
      fc.property(
        usualAndOpen,
        fc.integer({ min: -5, max: 12 }),
        naming,
        fifths,
        ({ usual, open }, move, naming, key) => {
          const moved = open.map((midi) => midi + move);
          const text = formatTuningWithOctaves(moved, naming, key).join(" ");
          const reading = readTuning(text, {
            usual,
            naming,
            bareB: naming === "german" ? "flat" : "natural",
          });
          expect(reading.ok && reading.open, text).toEqual(moved);
        },
      ),
      { seed: 10 },
    );
  });

  test("a tuning written without octaves reads back where no string is half an octave up or more", () => {
    fc.assert(
      fc.property(usualAndOpen, naming, fifths, ({ usual, open }, naming, key) => {
        const bareB = naming === "german" ? "flat" : "natural";
        for (const text of [formatTuning(open, naming, key).join(" "), compactTuning(open, naming, key)]) {
          const reading = readTuning(text, { usual, naming, bareB });
          expect(reading.ok && reading.open, text).toEqual(open);
        }
      }),
      { seed: 10 },
    );
  });

  test("the nearest pitch is within half an octave, and of two the lower", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 11 }), fc.integer({ min: 12, max: 110 }), (pitchClass, usual) => {
        const midi = nearestPitch(pitchClass, usual);
        expect(midi % 12).toBe(pitchClass);
        expect(midi - usual).toBeGreaterThanOrEqual(-6);
        expect(midi - usual).toBeLessThan(6);
      }),
      { seed: 10 },
    );
  });

  test("no text makes it throw; what it reads has a sound pitch for every string; what it refuses it explains", () => {
    const pieces = fc.constantFrom(
      "D",
      "a",
      "b",
      "Bb",
      "♭",
      "#",
      "es",
      "is",
      "H",
      "Sol",
      "fa",
      "2",
      "9",
      " ",
      "-",
      ",",
      "drop",
      "open",
      "standard",
      "down 1",
      "(",
      ")",
      "double ",
      "/",
      "G",
      "E",
      "mi",
      "up",
      "tuning",
      "12",
    );
    const texts = fc.oneof(
      fc.string({ unit: "grapheme" }),
      fc.array(pieces, { maxLength: 16 }).map((list) => list.join("")),
      fc.array(pieces, { maxLength: 10 }).map((list) => list.join(" ")),
    );
    fc.assert(
      fc.property(texts, fc.constantFrom(...usualTunings), naming, (text, usual, naming) => {
        const reading = readTuning(text, { usual, naming });
        if (!reading.ok) {
          expect(reading.message).toMatch(/[.]$/);
          return;
        }
        expect(reading.open).toHaveLength(usual.length);
        expect(reading.notes.map((note) => note.midi)).toEqual(reading.open);
        for (const midi of reading.open)
          expect(Number.isInteger(midi) && midi >= 0 && midi <= 127).toBe(true);
        for (const { string, options } of reading.ambiguous) {
          expect(options[0]).toBe(reading.open[usual.length - string]);
          expect(options.length).toBeGreaterThan(1);
        }
      }),
      { seed: 10, numRuns: 3000 },
    );
  });
});

test("written for the eye in cells, in one word, and for the ear", () => {
  const flats = [39, 44, 49, 54, 58, 63];
  expect(formatTuning(flats, "english")).toEqual(["E♭", "A♭", "D♭", "G♭", "B♭", "E♭"]);
  expect(compactTuning(flats, "german")).toBe("Es As Des Ges B Es");
  expect(compactTuning([36, 43, 48, 53, 53, 60], "english")).toBe("CGCFFC");
  expect(spokenTuning([39, 44, 50], "english", -3)).toBe("E flat, A flat, D");
  expect(formatTuning([37, 44], "english", 4)).toEqual(["C♯", "G♯"]);
});
