import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  folded,
  libraryRow,
  librarySorts,
  searchLibrary,
  sortLibrary,
} from "#app/domain/repertoire/library.ts";
import type { Song } from "#app/domain/repertoire/song.ts";
import { usualChoices } from "#app/domain/repertoire/usual-choices.ts";

const standard = [40, 45, 50, 55, 59, 64];
const choices = usualChoices([]);

function song(title: string, changes: Partial<Song> & { open?: number[]; fret?: number } = {}): Song {
  const { open = standard, fret, ...rest } = changes;
  const capos = fret ? [{ fret, strings: [1, 2, 3, 4, 5, 6] }] : [];
  return {
    id: title.toLowerCase(),
    title,
    credit: "",
    seconds: 200,
    key: "",
    tempo: null,
    energy: null,
    priority: 3,
    notes: "",
    firstLine: "",
    cover: null,
    necks: [{ id: `${title}-1`, open, capos, guitars: null, penalty: 0 }],
    deleted: false,
    ...rest,
  };
}

const songs = [
  song("Slow Water", {
    open: [38, 45, 50, 55, 57, 62],
    key: "D",
    seconds: 310,
    firstLine: "The longest road",
  }),
  song("Élan", { energy: 2, key: "Bb", seconds: 195, credit: "Lune Ferrand" }),
  song("Copper in the Ditch", { key: "A", seconds: 245, fret: 2 }),
  song("10 Miles", { energy: 5, key: "F#m" }),
  song("9 Gates", { energy: 1, open: [38, 45, 50, 55, 59, 64], key: "A" }),
];
const rows = songs.map((one) => libraryRow(one, choices, "english"));
const titles = (found: typeof rows) => found.map((row) => row.title);

describe("searching the library", () => {
  test.each([
    ["slow", ["Slow Water"]],
    ["elan", ["Élan"]],
    ["FERRAND", ["Élan"]],
    ["longest road", ["Slow Water"]],
    ["dadgad", ["Slow Water"]],
    ["drop d", ["9 Gates"]],
    ["capo 2", ["Copper in the Ditch"]],
    ["bb", ["Élan"]],
    ["f#m", ["10 Miles"]],
    ["dadgad slow", ["Slow Water"]],
    ["slow copper", []],
    ["  ", titles(rows)],
  ])("%j finds %j", (query, found) => {
    expect(titles(searchLibrary(rows, query))).toEqual(found);
  });

  test("a tuning is found in the reader's own naming", () => {
    const german = libraryRow(song("Harrow"), choices, "german");
    expect(titles(searchLibrary([german], "eadghe"))).toEqual(["Harrow"]);
  });

  test("every song is found by its own title", () => {
    fc.assert(
      fc.property(fc.string({ minLength: 1, maxLength: 40 }), (title) => {
        const row = libraryRow(song(title), choices, "english");
        return searchLibrary([row], title).length === 1;
      }),
    );
  });

  test("letters are compared without accents, capitals and the shape of signs", () => {
    expect(folded("Ñandú C♯ B♭")).toBe("nandu c# bb");
  });
});

describe("sorting the library", () => {
  test.each([
    ["title", ["9 Gates", "10 Miles", "Copper in the Ditch", "Élan", "Slow Water"]],
    ["tuning", ["10 Miles", "Élan", "Copper in the Ditch", "9 Gates", "Slow Water"]],
    ["key", ["Élan", "Slow Water", "9 Gates", "Copper in the Ditch", "10 Miles"]],
    ["energy", ["9 Gates", "Élan", "10 Miles", "Copper in the Ditch", "Slow Water"]],
    ["length", ["Élan", "9 Gates", "10 Miles", "Copper in the Ditch", "Slow Water"]],
  ] as const)("by %s", (sort, order) => {
    expect(titles(sortLibrary(rows, sort, false))).toEqual(order);
  });

  test("keeps every row, whatever order they come in, and leaves its input alone", () => {
    fc.assert(
      fc.property(
        fc.shuffledSubarray(rows, { minLength: rows.length }),
        fc.constantFrom(...librarySorts),
        fc.boolean(),
        (shuffled, sort, descending) => {
          const before = [...shuffled];
          const sorted = sortLibrary(shuffled, sort, descending);
          expect(shuffled).toEqual(before);
          expect(sorted).toEqual(sortLibrary(rows, sort, descending));
        },
      ),
    );
  });
});
