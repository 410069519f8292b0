import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { caposWords } from "#app/domain/music/capo.ts";
import { readCapos } from "#app/domain/music/read-capos.ts";

const read = (text: string, strings = 6) => {
  const reading = readCapos(text, strings);
  return reading.ok ? caposWords(reading.capos, strings) : reading;
};

test.each([
  ["capo 2", "capo 2"],
  ["Capo: 2", "capo 2"],
  ["c2", "capo 2"],
  ["2", "capo 2"],
  ["capo IV", "capo 4"],
  ["capo two", "capo 2"],
  ["capo at fret 3", "capo 3"],
  ["2nd fret", "capo 2"],
  ["capo 3 leave 6", "capo 3, leave 6"],
  ["capo 3 5-1", "capo 3, leave 6"],
  ["capo 3 on 5 to 1", "capo 3, leave 6"],
  ["capo 3 without 6 and 1", "capo 3, leave 6 and 1"],
  ["partial capo 2 on 543", "capo 2 on 5-3"],
  ["capo 2 (5–3)", "capo 2 on 5-3"],
  ["capo 2 on strings 5, 4 and 3", "capo 2 on 5-3"],
  ["022200", "capo 2 on 5-3"],
  ["0 2 2 2 0 0", "capo 2 on 5-3"],
  ["capo 022222", "capo 2, leave 6"],
  ["355533", "capo 3; capo 5 on 5-3"],
  ["capo 2 and capo 4 on 5-3", "capo 2; capo 4 on 5-3"],
  ["capo 2 and partial capo 4 on 543", "capo 2; capo 4 on 5-3"],
  ["c2 c4 543", "capo 2; capo 4 on 5-3"],
  ["capo 3, leave 6; capo 5", "capo 3, leave 6; capo 5"],
  ["no capo", "no capo"],
  ["000000", "no capo"],
  ["0", "no capo"],
  ["  ", "no capo"],
])("%j is %j", (text, words) => {
  expect(read(text)).toBe(words);
});

test("on twelve strings numbers of two digits are strings", () => {
  expect(read("capo 2 on 12-10", 12)).toBe("capo 2, leave 9-1");
  expect(read("capo 2 on 12", 12)).toBe("capo 2 on 12");
  expect(read("capo 2, leave 12 and 11", 12)).toBe("capo 2, leave 12 and 11");
});

describe("what cannot be read is named", () => {
  test.each([
    ["capo", "capo", /is no capo that can be read/],
    ["capo 30", "30", /Fret 30 is outside 1 to 24/],
    ["capo 2 on 7", "7", /no string of 1 to 6/],
    ["capo 2 leave", "capo 2 leave", /names no strings/],
    ["capo 3 leave 6-1", "capo 3 leave 6-1", /leaves no string for the capo to cover/],
    ["capo 2 and 4", "capo 2 and 4", /could be a string or a second capo/],
    ["capo 2, capo 2", "capo 2", /stands twice/],
    ["somewhere", "somewhere", /is no capo that can be read/],
  ])("%j", (text, part, message) => {
    expect(read(text)).toMatchObject({ ok: false, part, message: expect.stringMatching(message) });
  });
});

test("no text makes it throw, and every capo it reads fits the instrument", () => {
  const words = fc.constantFrom(
    "capo",
    "2",
    "leave",
    "on",
    "5-3",
    "and",
    ";",
    ",",
    "partial",
    "9-1",
    "c4",
    "022200",
    "x",
  );
  const texts = fc.oneof(
    fc.string({ unit: "grapheme" }),
    fc.array(words, { maxLength: 8 }).map((list) => list.join(" ")),
  );
  fc.assert(
    fc.property(texts, fc.integer({ min: 4, max: 12 }), (text, strings) => {
      const reading = readCapos(text, strings);
      if (!reading.ok) expect(reading.message).not.toBe("");
      else
        for (const capo of reading.capos) {
          expect(capo.fret).toBeGreaterThanOrEqual(1);
          expect(capo.fret).toBeLessThanOrEqual(24);
          expect(capo.strings.length).toBeGreaterThan(0);
          expect(new Set(capo.strings).size).toBe(capo.strings.length);
          for (const string of capo.strings) expect(string >= 1 && string <= strings).toBe(true);
        }
    }),
    { seed: 8, numRuns: 2000 },
  );
});
