import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { formatDuration, readDuration } from "#app/domain/repertoire/read-duration.ts";

test.each([
  ["3:15", 195],
  ["03:15", 195],
  ["3.15", 195],
  ["3'15", 195],
  ["3′15″", 195],
  ["3'", 180],
  ["195", 195],
  ["195 s", 195],
  ["3 min", 180],
  ["3 min 15 s", 195],
  ["3m15", 195],
  ["3m15s", 195],
  ["3.5 min", 210],
  ["1:02:03", 3723],
  ["1h02m", 3720],
  ["90:00", 5400],
  ["~3:15", 195],
  ["(3:15)", 195],
  ["ca. 3:15", 195],
  ["3 Minuten", 180],
  ["0:00", 0],
])("%j is %i seconds", (text, seconds) => {
  expect(readDuration(text)).toEqual({ ok: true, seconds });
});

describe("what can mean two lengths, or none, is refused with what to write", () => {
  test.each([
    ["4", '"4" could be seconds or minutes. Write 4:00 for minutes or 0:04 for seconds.'],
    ["3.5", '"3.5" could be 3:05 or 3:30. Write it with a colon.'],
    ["0:75", '"0:75" has more than 59 seconds. Carry them over to the minutes.'],
    ["1:75:00", '"1:75:00" has more than 59 minutes. Carry them over to the hours.'],
    ["99999", '"99999" is a day or more. Write minutes and seconds, such as 3:15.'],
    ["long", '"long" is no length that can be read. Write minutes and seconds, such as 3:15.'],
    ["-3:15", '"-3:15" is no length that can be read. Write minutes and seconds, such as 3:15.'],
    ["3:5", '"3:5" is no length that can be read. Write minutes and seconds, such as 3:15.'],
    ["", "Write a length, such as 3:15."],
  ])("%j", (text, message) => {
    expect(readDuration(text)).toEqual({ ok: false, message });
  });
});

test("written as minutes and seconds, with hours from the first on", () => {
  expect([0, 5, 59.6, 195, 3600, 3723].map(formatDuration)).toEqual([
    "0:00",
    "0:05",
    "1:00",
    "3:15",
    "1:00:00",
    "1:02:03",
  ]);
  expect([-65, -0.2].map(formatDuration)).toEqual(["−1:05", "0:00"]);
});

test("every length of less than a day reads back", () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 86_399 }), (seconds) => {
      expect(readDuration(formatDuration(seconds))).toEqual({ ok: true, seconds });
    }),
    { seed: 3 },
  );
});

test("no text makes it throw, and a length is whole seconds below a day", () => {
  const pieces = fc.constantFrom("3", "15", ":", ".", "'", " ", "min", "s", "h", ",", "½", "-", "99999");
  const texts = fc.oneof(
    fc.string({ unit: "grapheme" }),
    fc.array(pieces, { maxLength: 8 }).map((list) => list.join("")),
  );
  fc.assert(
    fc.property(texts, (text) => {
      const reading = readDuration(text);
      if (!reading.ok) expect(reading.message).toMatch(/\.$/);
      else
        expect(Number.isInteger(reading.seconds) && reading.seconds >= 0 && reading.seconds < 86_400).toBe(
          true,
        );
    }),
    { seed: 3, numRuns: 2000 },
  );
});
