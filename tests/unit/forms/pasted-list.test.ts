import { describe, expect, test } from "vitest";
import {
  pastedSongFields,
  pasteLimits,
  readPastedList,
  sameTitle,
  withoutLines,
} from "#app/domain/repertoire/pasted-list.ts";

const reader = { usual: [40, 45, 50, 55, 59, 64], naming: "english" as const };

describe("a pasted list as the library keeps it", () => {
  test("a line is a song with one way to play it", () => {
    const [line] = readPastedList("Low Meadow DADGBE capo 2 3:15", reader);
    expect(pastedSongFields(line!.song!, 210)).toEqual({
      title: "Low Meadow",
      credit: "",
      seconds: 195,
      key: "",
      tempo: null,
      energy: null,
      priority: 3,
      notes: "",
      firstLine: "",
      cover: null,
      necks: [
        {
          id: null,
          open: [38, 45, 50, 55, 59, 64],
          capos: [{ fret: 2, strings: [6, 5, 4, 3, 2, 1] }],
          guitars: null,
          penalty: 0,
        },
      ],
    });
  });

  test("a length that no line names is the one given", () => {
    const [line] = readPastedList("Low Meadow", reader);
    expect(pastedSongFields(line!.song!, 210).seconds).toBe(210);
  });

  test.each([
    [`${"x".repeat(121)} 3:15`, "The title is longer than 120 characters. Shorten it."],
    ["Low Meadow 4:00:00", "A song is between 1 second and 3 hours long. Correct the length."],
    ["Low Meadow 3:15 capo 1; capo 2; capo 3; capo 4; capo 5", "A neck carries at most 4 capos here."],
  ])("%j stays unread: %s", (text, problem) => {
    expect(readPastedList(text, reader)).toEqual([{ line: 1, raw: text, song: null, problem }]);
  });

  test("what is beyond the most songs at once stays unread, with what to do", () => {
    const text = Array.from({ length: pasteLimits.songs + 2 }, (_, index) => `Song ${index} in A 3:00`).join(
      "\n",
    );
    const unread = readPastedList(text, reader).filter((line) => line.song === null);
    expect(unread.map(({ line, problem }) => [line, problem])).toEqual([
      [501, "More than 500 songs at once. Keep those above first."],
      [502, "More than 500 songs at once. Keep those above first."],
    ]);
  });

  test("lines that were kept leave the box; the others stay in their order, whatever ends a line", () => {
    expect(withoutLines("A\r\nB\n\nC\rD", new Set([1, 4]))).toBe("B\nD");
    expect(withoutLines("A", new Set([1]))).toBe("");
  });

  test("a title is the library's whatever its capitals and accents, but not a part of another", () => {
    const library = [{ title: "Élan" }, { title: "Low Meadow" }];
    expect(sameTitle(" elan", library)).toBe(library[0]);
    expect(sameTitle("Low", library)).toBeUndefined();
  });
});
