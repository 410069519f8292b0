import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  allStrings,
  caposWords,
  capoWords,
  frettedPitch,
  isFullCapo,
  sameCapo,
  sameCapos,
  shadowedCapos,
  sounding,
  stops,
} from "#app/domain/music/capo.ts";
import type { Capo } from "#app/domain/music/neck.ts";
import { stringNameWithOctave } from "#app/domain/music/note-names.ts";
import { readCapos } from "#app/domain/music/read-capos.ts";

const standard = [40, 45, 50, 55, 59, 64];
const fivesOnly = [1, 2, 3, 4, 5];

function capos(text: string): Capo[] {
  const reading = readCapos(text, 6);
  if (!reading.ok) throw new Error(reading.message);
  return reading.capos;
}

describe("what sounds with capos on", () => {
  // Configurations and their open notes: H. Reid, partialcapo.com/notation.htm, and makingmusicmag.com ("EBEABE").
  test.each([
    ["022200", "E2 B2 E3 A3 B3 E4"],
    ["022222", "E2 B2 E3 A3 C♯4 F♯4"],
    ["002220", "E2 A2 E3 A3 C♯4 E4"],
    ["355533", "G2 D3 G3 C4 D4 G4"],
    ["222222", "F♯2 B2 E3 A3 C♯4 F♯4"],
  ])("%s on standard tuning", (digits, notes) => {
    const pitches = sounding({ open: standard, capos: capos(digits) });
    expect(pitches.map((midi) => stringNameWithOctave(midi, "english", 2)).join(" ")).toBe(notes);
  });

  // Common practice, no source: C G C F F C with a capo at fret 3 that leaves string 6.
  const neck = { open: [36, 43, 48, 53, 53, 60], capos: [{ fret: 3, strings: fivesOnly }] };

  test("a free string keeps its pitch", () => {
    const names = sounding(neck).map((midi) => stringNameWithOctave(midi, "english", -3));
    expect(names.join(" ")).toBe("C2 B♭2 E♭3 A♭3 A♭3 E♭4");
  });

  test("frets count from the nut; only free strings can be fretted behind the capo", () => {
    expect(frettedPitch(neck, 6, 5)).toBe(41);
    expect(frettedPitch(neck, 4, 5)).toBe(53);
    expect(frettedPitch(neck, 6, 3)).toBe(39);
    expect(frettedPitch(neck, 5, 2)).toBeNull();
    expect(frettedPitch(neck, 5, 0)).toBe(46);
    expect(frettedPitch(neck, 5, 3)).toBe(46);
    expect(() => frettedPitch(neck, 7, 0)).toThrow(RangeError);
  });

  test("of two capos on a string the one further up counts", () => {
    expect(
      stops(
        [
          { fret: 2, strings: [1, 2] },
          { fret: 4, strings: [2, 3] },
        ],
        4,
      ),
    ).toEqual([0, 4, 4, 2]);
  });
});

describe("capos in words", () => {
  test.each<[Capo, number, string]>([
    [{ fret: 3, strings: [6, 5, 4, 3, 2, 1] }, 6, "capo 3"],
    [{ fret: 3, strings: fivesOnly }, 6, "capo 3, leave 6"],
    [{ fret: 2, strings: [3, 4, 5] }, 6, "capo 2 on 5-3"],
    [{ fret: 2, strings: [5, 4, 3, 2] }, 6, "capo 2, leave 6 and 1"],
    [{ fret: 2, strings: [4, 3, 2, 1] }, 6, "capo 2, leave 6 and 5"],
    [{ fret: 5, strings: [1] }, 6, "capo 5 on 1"],
    [{ fret: 1, strings: [5, 3, 1] }, 6, "capo 1, leave 6, 4 and 2"],
    [{ fret: 7, strings: [4, 3, 2, 1] }, 4, "capo 7"],
  ])("%j on %i strings is %j", (capo, strings, words) => {
    expect(capoWords(capo, strings)).toBe(words);
  });

  test("several, nearest to the nut first; none", () => {
    expect(caposWords(capos("capo 5 on 543; capo 3"), 6)).toBe("capo 3; capo 5 on 5-3");
    expect(caposWords([], 6)).toBe("no capo");
  });
});

test("the order in which strings and capos are listed makes no difference", () => {
  expect(sameCapo({ fret: 2, strings: [1, 2] }, { fret: 2, strings: [2, 1] })).toBe(true);
  expect(sameCapo({ fret: 2, strings: [1, 2] }, { fret: 2, strings: [2, 1, 3] })).toBe(false);
  expect(sameCapo({ fret: 2, strings: [1, 2] }, { fret: 3, strings: [1, 2] })).toBe(false);
  expect(sameCapos(capos("capo 2; capo 4 on 543"), capos("capo 4 on 543; capo 2"))).toBe(true);
  expect(sameCapos(capos("capo 2"), [])).toBe(false);
  expect(isFullCapo({ fret: 2, strings: [1, 2, 3, 4] }, 4)).toBe(true);
});

describe("a capo behind another", () => {
  test("is useless where all its strings are stopped further up", () => {
    const [found, ...others] = shadowedCapos(capos("capo 2 on 5-3; capo 3"));
    expect(found).toEqual({ capo: { fret: 2, strings: [5, 4, 3] }, strings: [5, 4, 3], useless: true });
    expect(others).toEqual([]);
  });

  test("does nothing on the shared strings only where it covers more", () => {
    expect(shadowedCapos(capos("capo 2; capo 4 on 5-3"))).toEqual([
      { capo: { fret: 2, strings: [6, 5, 4, 3, 2, 1] }, strings: [5, 4, 3], useless: false },
    ]);
  });

  test("of two alike the second is useless", () => {
    const first = { fret: 2, strings: [6, 5] };
    const second = { fret: 2, strings: [5, 6] };
    const found = shadowedCapos([first, second]);
    expect(found).toHaveLength(1);
    expect(found[0]?.capo).toBe(second);
  });

  test("on other strings does no harm", () => {
    expect(shadowedCapos(capos("capo 2 on 6; capo 4 on 5-1"))).toEqual([]);
  });
});

const capoOn = (strings: number) =>
  fc.record({
    fret: fc.integer({ min: 1, max: 24 }),
    strings: fc.subarray(allStrings(strings), { minLength: 1 }),
  });

test("capos in words read back as the same capos, on any instrument", () => {
  const necks = fc.integer({ min: 4, max: 12 }).chain((strings) =>
    fc.record({
      strings: fc.constant(strings),
      capos: fc.uniqueArray(capoOn(strings), { maxLength: 3, comparator: sameCapo }),
    }),
  );
  fc.assert(
    fc.property(necks, ({ strings, capos }) => {
      const reading = readCapos(caposWords(capos, strings), strings);
      expect(reading.ok && sameCapos(reading.capos, capos), caposWords(capos, strings)).toBe(true);
    }),
    { seed: 8, numRuns: 500 },
  );
});

test("taking a useless capo off changes no sound", () => {
  fc.assert(
    fc.property(fc.array(capoOn(6), { maxLength: 4 }), (list) => {
      for (const { capo, useless } of shadowedCapos(list)) {
        const rest = list.filter((other) => other !== capo);
        const same =
          sounding({ open: standard, capos: rest }).join() ===
          sounding({ open: standard, capos: list }).join();
        if (useless) expect(same).toBe(true);
      }
    }),
    { seed: 8 },
  );
});
