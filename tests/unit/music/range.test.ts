import { describe, expect, test } from "vitest";
import { defaultRange, playable, raisedStrings } from "#app/domain/music/range.ts";

const standard = [40, 45, 50, 55, 59, 64];

test("a new instrument goes from 6 below to 2 above its usual pitch", () => {
  expect(defaultRange(standard)).toEqual({
    lowest: [34, 39, 44, 49, 53, 58],
    highest: [42, 47, 52, 57, 61, 66],
  });
});

describe("whether a neck can be had", () => {
  const range = { lowest: [36, 39, 44, 49, 53, 58], highest: [42, 47, 52, 57, 61, 66] };

  test("inside every string's range, the limits included", () => {
    expect(playable({ open: [36, 47, 50, 55, 59, 64], capos: [] }, range)).toEqual({ ok: true });
  });

  test("every string outside is named with its limit", () => {
    expect(playable({ open: [35, 45, 50, 55, 59, 67], capos: [] }, range)).toEqual({
      ok: false,
      reasons: [
        { string: 6, message: "string 6 would have to go to B1; lowest is C2" },
        { string: 1, message: "string 1 would have to go to G4; highest is F♯4" },
      ],
    });
  });

  test("in the reader's naming", () => {
    expect(playable({ open: [35, 45, 50, 55, 59, 64], capos: [] }, range, "german")).toMatchObject({
      reasons: [{ message: "string 6 would have to go to H1; lowest is C2" }],
    });
  });

  test("another number of strings is the one reason", () => {
    expect(playable({ open: [67, 60, 64, 69], capos: [] }, range)).toEqual({
      ok: false,
      reasons: [{ string: null, message: "the tuning has 4 strings; the instrument has 6" }],
    });
  });
});

test("strings above their usual pitch are warned about", () => {
  expect(raisedStrings([38, 45, 52, 55, 60, 64], standard)).toEqual([
    { string: 4, semitones: 2, message: "string 4 is 2 above its usual D3; it may break" },
    { string: 2, semitones: 1, message: "string 2 is 1 above its usual B3; it may break" },
  ]);
  expect(raisedStrings([38, 45], standard)).toEqual([]);
});
