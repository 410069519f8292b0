import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { namings } from "#app/domain/music/note-names.ts";
import { readTuning } from "#app/domain/music/tuning.ts";
import { differences } from "#app/domain/repertoire/form-differences.ts";
import { readVersion } from "#app/domain/repertoire/form-fields.ts";
import { playableOn } from "#app/domain/repertoire/playable-on.ts";
import { reachOf, reachWords } from "#app/domain/repertoire/reach.ts";
import { tuningText } from "#app/domain/repertoire/tuning-text.ts";
import { readUsualCode, usualChoices, usualCode, usualFor } from "#app/domain/repertoire/usual-choices.ts";

const standard = [40, 45, 50, 55, 59, 64];
const openG = [38, 43, 50, 55, 59, 62];
const baritone = [28, 33, 38, 43, 47, 52];
const guitar = (id: string, usual: number[]) => ({
  id,
  name: id,
  usual,
  lowest: usual.map((midi) => midi - 6),
  highest: usual.map((midi) => midi + 2),
});
const cedar = guitar("Cedar", standard);
const blonde = guitar("Blonde", standard);
const tin = guitar("Tin", openG);

describe("what a tuning is told against", () => {
  test("the tuning that most guitars have comes first; standard is always among them", () => {
    expect(usualChoices([tin, cedar, blonde]).map(({ usual, guitars }) => [usual, guitars.length])).toEqual([
      [standard, 2],
      [openG, 1],
    ]);
    expect(usualChoices([tin]).map(({ usual }) => usual)).toEqual([openG, standard]);
  });

  // CGCFFC from standard is -4 -2 -2 -2 -6 -4: ../shared/facts.md §10 (common practice, no source).
  test("a song is retuned from the usual tuning of most guitars, although another is nearer", () => {
    const choices = usualChoices([tin, cedar, blonde]);
    expect(usualFor([36, 43, 48, 53, 53, 60], choices)).toEqual(standard);
    expect(usualFor([36, 43, 48, 53, 53, 60], choices, ["Tin"])).toEqual(openG);
  });

  test("beyond half an octave it is another instrument's, and with other strings one of as many", () => {
    const choices = usualChoices([cedar, blonde, guitar("Low", baritone)]);
    expect(usualFor([28, 33, 38, 43, 47, 52], choices)).toEqual(baritone);
    expect(usualFor([67, 60, 64, 69], choices)).toHaveLength(4);
  });

  test("its code is read back, and nothing else is", () => {
    expect(readUsualCode(usualCode(standard))).toEqual(standard);
    for (const code of ["", "40-45-50", "40-45-50-x", "40-45-50-128", "1-".repeat(13)]) {
      expect(readUsualCode(code)).toBeNull();
    }
  });
});

describe("a tuning as its field shows it", () => {
  const usual = fc.constantFrom(standard, openG, baritone, [67, 60, 64, 69], [28, 33, 38, 43]);

  test("is read back to the same pitches, however far it is from usual", () => {
    fc.assert(
      fc.property(
        usual,
        fc.array(fc.integer({ min: -12, max: 12 }), { minLength: 6, maxLength: 6 }),
        fc.constantFrom(...namings),
        (base, moves, naming) => {
          const open = base.map((midi, index) => midi + moves[index]!);
          const { text, bareB } = tuningText(open, base, naming);
          const reading = readTuning(text, { usual: base, naming, ...(bareB ? { bareB } : {}) });
          expect(reading.ok && reading.open).toEqual(open);
        },
      ),
      { numRuns: 120 },
    );
  });

  test("has octaves only where it needs them", () => {
    expect(tuningText([36, 43, 48, 53, 53, 60], standard, "english").text).toBe("CGCFFC");
    expect(tuningText([36, 43, 48, 53, 65, 60], standard, "english").text).toBe("C2 G2 C3 F3 F4 C4");
  });
});

describe("where a song can be played", () => {
  test("on guitars that reach it and that it is kept to; the others say why", () => {
    const way = { open: [36, 43, 48, 53, 53, 60], capos: [], guitars: ["Cedar", "Tin"] };
    const { can, cannot } = playableOn(way, [cedar, blonde, tin, guitar("Uke", [67, 60, 64, 69])], "english");
    expect(can).toEqual([cedar, tin]);
    expect(cannot.map(({ guitar: other, reason }) => [other.id, reason])).toEqual([
      ["Blonde", "not ticked for this choice"],
      ["Uke", "not ticked for this choice"],
    ]);
    const high = playableOn(
      { open: standard.map((midi) => midi + 3), capos: [], guitars: null },
      [cedar],
      "english",
    );
    expect(high.cannot[0]!.reason).toContain("string 6 would have to go to G2; highest is F♯2");
  });

  test("a reach is told in a few words", () => {
    expect(reachWords(reachOf(cedar))).toBe("6 down, 2 up");
    expect(reachWords({ below: [6, 2], above: [0, 2] })).toBe("2 to 6 down, 0 to 2 up");
  });
});

test("two states of a form differ where they read differently", () => {
  const labels = { title: "Title", notes: "Notes", keeps: "Keeps", strings: "Strings" };
  const saved = { title: "Low Meadow", notes: "One\r\nTwo", keeps: true, strings: ["5", "4"] };
  const typed = { title: "High Meadow", notes: "One\nTwo ", keeps: undefined, strings: ["5"] };
  expect(differences(labels, saved, typed)).toEqual([
    { label: "Title", saved: "Low Meadow", typed: "High Meadow" },
    { label: "Keeps", saved: "yes", typed: "" },
    { label: "Strings", saved: "5\n4", typed: "5" },
  ]);
});

test.each([
  ["3", 3],
  ["", 0],
  ["1.5", 0],
  ["-1", 0],
  ["NaN", 0],
  ["9999999999", 0],
  [null, 0],
])("the version %j is %d", (sent, version) => {
  expect(readVersion(sent)).toBe(version);
});
