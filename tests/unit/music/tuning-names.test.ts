import { describe, expect, test } from "vitest";
import { guitarTunings, otherTunings, standardGuitar } from "#app/domain/music/named-tunings.ts";
import { namings, stringNameWithOctave } from "#app/domain/music/note-names.ts";
import { readTuning } from "#app/domain/music/tuning.ts";
import { nameTuning } from "#app/domain/music/tuning-names.ts";
import { usualStringsFor, usualTuningFor } from "#app/domain/music/usual-tuning.ts";
import { instrumentKinds } from "#app/domain/repertoire/guitar.ts";

const standard = [...standardGuitar];

function pitches(name: string, usual: readonly number[] = standard): string {
  const reading = readTuning(name, { usual, naming: "english" });
  return reading.ok
    ? reading.open.map((midi) => stringNameWithOctave(midi, "english")).join(" ")
    : reading.message;
}

// Letters and octaves as published: h2g2 A87856825; daviddarling.info; LilyPond regression test 71e; Guitar Player;
// musicradar.com; guitarplayer.com 2007-01-22; indiepanda.net; Taylor, Ask Bob; Wikipedia (regular and standard
// tunings); stringsdirect.co.uk. DADGAD's octaves, open G minor and the drop tunings below D: common practice, no source.
test.each([
  ["standard", "E2 A2 D3 G3 B3 E4"],
  ["drop D", "D2 A2 D3 G3 B3 E4"],
  ["double drop D", "D2 A2 D3 G3 B3 D4"],
  ["DADGAD", "D2 A2 D3 G3 A3 D4"],
  ["open D", "D2 A2 D3 F♯3 A3 D4"],
  ["open D minor", "D2 A2 D3 F3 A3 D4"],
  ["cross-note D", "D2 A2 D3 F3 A3 D4"],
  ["open G", "D2 G2 D3 G3 B3 D4"],
  ["open G minor", "D2 G2 D3 G3 B♭3 D4"],
  ["open C", "C2 G2 C3 G3 C4 E4"],
  ["C6", "C2 A2 C3 G3 C4 E4"],
  ["Orkney", "C2 G2 D3 G3 C4 D4"],
  ["open E", "E2 B2 E3 A♭3 B3 E4"],
  ["open A", "E2 A2 E3 A3 D♭4 E4"],
  ["all fourths", "E2 A2 D3 G3 C4 F4"],
  ["Eb standard", "E♭2 A♭2 D♭3 F♯3 B♭3 E♭4"],
  ["E♭ Standard tuning", "E♭2 A♭2 D♭3 F♯3 B♭3 E♭4"],
  ["D standard", "D2 G2 C3 F3 A3 D4"],
  ["drop C", "C2 G2 C3 F3 A3 D4"],
  ["B standard", "B1 E2 A2 D3 F♯3 B3"],
  ["A standard", "A1 D2 G2 C3 E3 A3"],
  ["Nashville", "E3 A3 D4 G4 B3 E4"],
  ["drop E", "E1 B1 E2 A2 D♭3 F♯3"],
  ["drop Eb", "E♭1 B♭1 E♭2 A♭2 C3 F3"],
  ["high strung", "E3 A3 D4 G3 B3 E4"],
])("%s is %s", (name, notes) => {
  expect(pitches(name)).toBe(notes);
});

describe("other instruments", () => {
  // h2g2; Wikipedia, Standard tuning; everything2 (banjo); prgomez.com (baritone ukulele); MasterClass (ukulele).
  test.each([
    ["bass", 4, "E1 A1 D2 G2"],
    ["bass", 5, "B0 E1 A1 D2 G2"],
    ["bass", 6, "B0 E1 A1 D2 G2 C3"],
    ["ukulele", 4, "G4 C4 E4 A4"],
    ["mandolin", 8, "G3 G3 D4 D4 A4 A4 E5 E5"],
    ["banjo", 5, "G4 D3 G3 B3 D4"],
    ["acoustic", 6, "E2 A2 D3 G3 B3 E4"],
    ["electric", 7, "B1 E2 A2 D3 G3 B3 E4"],
    ["twelve-string", 12, "E2 E3 A2 A3 D3 D4 G3 G4 B3 B3 E4 E4"],
    ["baritone", 6, "B1 E2 A2 D3 F♯3 B3"],
  ] as const)("a %s with %i strings begins at %s", (kind, strings, notes) => {
    const usual = usualTuningFor(kind, strings);
    expect(usual.map((midi) => stringNameWithOctave(midi, "english")).join(" ")).toBe(notes);
  });

  test("every kind has a tuning for 4 to 12 strings and no others", () => {
    for (const kind of instrumentKinds) {
      for (let strings = 4; strings <= 12; strings += 1)
        expect(usualTuningFor(kind, strings)).toHaveLength(strings);
      expect(() => usualTuningFor(kind, 3)).toThrow(RangeError);
      expect(() => usualTuningFor(kind, 13)).toThrow(RangeError);
      expect(usualTuningFor(kind, usualStringsFor(kind))).toHaveLength(usualStringsFor(kind));
    }
  });

  test("a name means what it means on that instrument", () => {
    expect(pitches("open G", usualTuningFor("banjo", 5))).toBe("G4 D3 G3 B3 D4");
    expect(pitches("open G", usualTuningFor("ukulele", 4))).toBe(
      "open G is a tuning for 6 or 5 strings; this instrument has 4.",
    );
    expect(pitches("low G", usualTuningFor("ukulele", 4))).toBe("G3 C4 E4 A4");
    expect(pitches("drop A", usualTuningFor("electric", 7))).toBe("A1 E2 A2 D3 G3 B3 E4");
    expect(pitches("drop A", [34, 39, 44, 49, 54, 58, 63])).toBe("A1 E2 A2 D3 G3 B3 E4");
    expect(pitches("Eb standard", usualTuningFor("electric", 7))).toBe("B♭1 E♭2 A♭2 D♭3 F♯3 B♭3 E♭4");
    expect(pitches("drop D", usualTuningFor("bass", 4))).toBe("D1 A1 D2 G2");
  });

  test("standard on a baritone is its own, on a guitar kept in DADGAD it is a guitar's", () => {
    expect(pitches("standard", usualTuningFor("baritone", 6))).toBe("B1 E2 A2 D3 F♯3 B3");
    expect(pitches("standard", [38, 45, 50, 55, 57, 62])).toBe("E2 A2 D3 G3 B3 E4");
    expect(pitches("usual", [38, 45, 50, 55, 57, 62])).toBe("D2 A2 D3 G3 A3 D4");
  });

  test("a high-strung guitar keeps its octaves under a name", () => {
    expect(pitches("DADGAD", [52, 57, 62, 67, 59, 64])).toBe("D3 A3 D4 G4 A3 D4");
  });
});

describe("naming a tuning", () => {
  test.each([
    [[38, 45, 50, 55, 57, 62], "DADGAD"],
    [[38, 45, 50, 55, 59, 64], "drop D"],
    [[39, 44, 49, 54, 58, 63], "E♭ standard"],
    [[36, 43, 48, 53, 57, 62], "drop C"],
    [[37, 44, 49, 54, 58, 63], "drop C♯"],
    [[40, 45, 50, 55, 59, 64], "standard"],
    [[36, 43, 48, 53, 53, 60], null],
    [[38, 45, 50], null],
  ])("%j is %j", (open, name) => {
    expect(nameTuning(open, standard)).toBe(name);
  });

  test("in the reader's naming, and by courses", () => {
    expect(nameTuning([39, 44, 49, 54, 58, 63], standard, "german")).toBe("Es standard");
    expect(nameTuning([35, 40, 45, 50, 54, 59], standard, "german")).toBe("H standard");
    expect(
      nameTuning([38, 50, 45, 57, 50, 62, 55, 67, 57, 57, 62, 62], usualTuningFor("twelve-string", 12)),
    ).toBe("DADGAD");
    expect(
      nameTuning([38, 50, 45, 57, 50, 62, 55, 67, 57, 58, 62, 62], usualTuningFor("twelve-string", 12)),
    ).toBeNull();
  });

  test("every name that is given reads back as the tuning, in every naming", () => {
    const named = [...guitarTunings, ...otherTunings].map((row) => [...row.open]);
    const moved = named.flatMap((open) =>
      [-7, -4, -3, -2, -1, 1, 2].map((move) => open.map((midi) => midi + move)),
    );
    let names = 0;
    for (const open of [...named, ...moved]) {
      const usuals = instrumentKinds.map((kind) => usualTuningFor(kind, open.length));
      for (const usual of usuals) {
        for (const naming of namings) {
          const name = nameTuning(open, usual, naming);
          if (name === null) continue;
          names += 1;
          const bareB = naming === "german" ? "flat" : "natural";
          const reading = readTuning(name, { usual, naming, bareB });
          expect(reading.ok && reading.open, `${name} for ${open.join(" ")} on ${usual.join(" ")}`).toEqual(
            open,
          );
        }
      }
    }
    expect(names).toBeGreaterThan(1000);
  });
});

test("every row of the table names its source and has a pitch for every string", () => {
  for (const row of [...guitarTunings, ...otherTunings]) {
    expect(row.source.length, row.name).toBeGreaterThan(0);
    expect(
      row.open.every((midi) => Number.isInteger(midi) && midi > 20 && midi < 90),
      row.name,
    ).toBe(true);
  }
});
