import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  fifthsOfTuning,
  midiOfNote,
  namings,
  noteName,
  noteNameWithOctave,
  spell,
  spellString,
  spokenNote,
  stringName,
  stringNameWithOctave,
} from "#app/domain/music/note-names.ts";
import { readNoteName } from "#app/domain/music/read-notes.ts";

const chromatic = Array.from({ length: 12 }, (_, pitchClass) => 60 + pitchClass);
const inKey = (fifths: number) => chromatic.map((midi) => stringName(midi, "english", fifths)).join(" ");

describe("spelling in a key", () => {
  // Worked from the line of fifths, whose order of sharps and flats is C. E. Gardner's (Essentials of Music Theory).
  test.each([
    [0, "C D♭ D E♭ E F F♯ G A♭ A B♭ B"],
    [2, "C C♯ D E♭ E F F♯ G G♯ A B♭ B"],
    [4, "C C♯ D D♯ E F F♯ G G♯ A A♯ B"],
    [-3, "C D♭ D E♭ E F G♭ G A♭ A B♭ B"],
  ])("signature %i", (fifths, names) => {
    expect(inKey(fifths)).toBe(names);
  });

  test("an open string is never C♭, F♭, E♯ or B♯; a melody note may be", () => {
    expect(inKey(-7)).toBe("C D♭ D E♭ E F G♭ G A♭ A B♭ B");
    expect(inKey(7)).toBe("C C♯ D D♯ E F F♯ G G♯ A A♯ B");
    expect(noteName(spell(59, -6), "english")).toBe("C♭");
    expect(noteName(spell(65, 7), "english")).toBe("E♯");
  });

  test("the octave belongs to the letter: C♭4 is B3, B♯3 is C4", () => {
    expect(noteNameWithOctave(spell(59, -7), "english")).toBe("C♭4");
    expect(noteNameWithOctave(spell(60, 7), "english")).toBe("B♯3");
  });
});

describe("a tuning without a key", () => {
  const letters = (open: number[]) =>
    open.map((midi) => stringName(midi, "english", fifthsOfTuning(open))).join(" ");

  test("is spelled so that its notes belong together", () => {
    expect(letters([40, 45, 50, 55, 59, 64])).toBe("E A D G B E");
    expect(letters([40, 47, 52, 56, 59, 64])).toBe("E B E G♯ B E");
    expect(letters([40, 45, 52, 57, 61, 64])).toBe("E A E A C♯ E");
    expect(letters([39, 44, 49, 54, 58, 63])).toBe("E♭ A♭ D♭ G♭ B♭ E♭");
    expect(letters([37, 44, 49, 54, 58, 63])).toBe("C♯ G♯ C♯ F♯ A♯ D♯");
    expect(letters([38, 43, 50, 55, 58, 62])).toBe("D G D G B♭ D");
  });

  test("no strings have no accidentals", () => {
    expect(fifthsOfTuning([])).toBe(0);
  });
});

describe("the reader's naming", () => {
  // German: B natural is H, B flat is B, -is and -es (Music::PitchNum::German 0.03: MIDI 71 is h, 70 is b).
  test("German", () => {
    const flats = chromatic.map((midi) => stringName(midi, "german", -5));
    const sharps = chromatic.map((midi) => stringName(midi, "german", 5));
    expect(flats.join(" ")).toBe("C Des D Es E F Ges G As A B H");
    expect(sharps.join(" ")).toBe("C Cis D Dis E F Fis G Gis A Ais H");
    expect(noteName({ letter: "B", alter: -2 }, "german")).toBe("Heses");
    expect(noteName({ letter: "E", alter: -2 }, "german")).toBe("Eses");
    expect(noteName({ letter: "B", alter: 1 }, "german")).toBe("His");
  });

  test("fixed do", () => {
    expect(chromatic.map((midi) => stringName(midi, "fixed-do", -3)).join(" ")).toBe(
      "Do Re♭ Re Mi♭ Mi Fa Sol♭ Sol La♭ La Si♭ Si",
    );
  });

  test("with the octave", () => {
    expect(stringNameWithOctave(35, "english")).toBe("B1");
    expect(stringNameWithOctave(35, "german")).toBe("H1");
    expect(stringNameWithOctave(39, "fixed-do", -3)).toBe("Mi♭2");
  });

  test("spoken, the signs are words", () => {
    expect(spokenNote({ letter: "E", alter: -1 }, "english")).toBe("E flat");
    expect(spokenNote({ letter: "F", alter: 1 }, "english")).toBe("F sharp");
    expect(spokenNote({ letter: "F", alter: 2 }, "english")).toBe("F double sharp");
    expect(spokenNote({ letter: "E", alter: -1 }, "german")).toBe("Es");
    expect(spokenNote({ letter: "B", alter: 0 }, "fixed-do")).toBe("Si");
  });
});

test("every spelling sounds the note it spells, in every key", () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 127 }), fc.integer({ min: -7, max: 7 }), (midi, fifths) => {
      expect(midiOfNote(spell(midi, fifths))).toBe(midi);
      expect(midiOfNote(spellString(midi, fifths))).toBe(midi);
    }),
    { seed: 9 },
  );
});

test("every name reads back in its own naming", () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 12, max: 119 }),
      fc.integer({ min: -7, max: 7 }),
      fc.constantFrom(...namings),
      (midi, fifths, naming) => {
        const note = spellString(midi, fifths);
        const name = noteNameWithOctave(note, naming);
        const read = readNoteName(name, naming);
        expect(read?.length).toBe(name.length);
        expect(read?.letter).toBe(note.letter);
        expect(read?.octave).toBe(note.octave);
        expect(read?.bareB && naming === "german" ? -1 : read?.alter).toBe(note.alter);
      },
    ),
    { seed: 9 },
  );
});
