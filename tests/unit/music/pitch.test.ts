import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  centsBetween,
  frequencyOf,
  midiAt,
  midiOf,
  octaveOf,
  pitchClassOf,
} from "#app/domain/music/pitch.ts";

describe("frequency of a note", () => {
  test("the reference pitch is A4 = 440 Hz (ISO 16:1975)", () => {
    expect(frequencyOf(69)).toBe(440);
  });

  // Published: Denyer 1992, pp. 68–69, as quoted in Wikipedia, "Guitar tunings".
  test.each([
    [40, 82.41],
    [45, 110],
    [50, 146.83],
    [55, 196],
    [59, 246.94],
    [64, 329.63],
  ])("open guitar string %i sounds %f Hz as published", (midi, hertz) => {
    expect(frequencyOf(midi)).toBeCloseTo(hertz, 2);
  });

  // Middle C as the MIDI Tuning Standard gives it; the others derived from f = 440 · 2^((n − 69) / 12).
  test.each([
    [60, 261.626],
    [23, 30.8677],
    [28, 41.2034],
    [36, 65.4064],
    [38, 73.4162],
    [67, 391.9954],
    [21, 27.5],
    [108, 4186.009],
  ])("MIDI %i sounds %f Hz", (midi, hertz) => {
    expect(frequencyOf(midi)).toBeCloseTo(hertz, 3);
  });

  test("another reference pitch moves every note in proportion", () => {
    expect(frequencyOf(69, 442)).toBe(442);
    expect(frequencyOf(40, 432)).toBeCloseTo(80.9086, 4);
  });

  test("a frequency that is not above 0 has no note", () => {
    expect(() => midiOf(0)).toThrow(RangeError);
    expect(() => midiOf(Number.NaN)).toThrow(RangeError);
  });
});

// Derived from cents = 1200 · log2(f2 / f1); 3/2 and 5/4 are the just fifth and third.
test.each([
  [440, 442, 7.8514],
  [2, 3, 701.955],
  [4, 5, 386.314],
  [440, 440.5, 1.966],
])("from %f to %f Hz are %f cents", (from, to, cents) => {
  expect(centsBetween(from, to)).toBeCloseTo(cents, 3);
});

test("the octave number changes at C (MusicXML 4.0: 4 is the octave started by middle C)", () => {
  expect([octaveOf(59), octaveOf(60), octaveOf(40)]).toEqual([3, 4, 2]);
  expect(midiAt(4, 2)).toBe(40);
});

test("pitch class and octave give the note back, as its frequency does", () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 127 }), fc.integer({ min: 4320, max: 4460 }), (midi, tenths) => {
      expect(midiAt(pitchClassOf(midi), octaveOf(midi))).toBe(midi);
      expect(midiOf(frequencyOf(midi, tenths / 10), tenths / 10)).toBeCloseTo(midi, 9);
    }),
    { seed: 16 },
  );
});
