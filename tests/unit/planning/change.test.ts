import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { changeSeconds, neckChange, semitonesOf } from "#app/domain/planning/change.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";
import { workedProblem } from "#tests/support/planning-worked-example.ts";

const { times } = workedProblem();
const open = [40, 45, 50, 55, 59, 64];

describe("capos", () => {
  test("two over the same strings pair up with two, whatever their frets", () => {
    const from = {
      open,
      capos: [
        { fret: 2, strings: [1, 2, 3] },
        { fret: 4, strings: [3, 2, 1] },
      ],
    };
    const to = {
      open,
      capos: [
        { fret: 5, strings: [2, 1, 3] },
        { fret: 3, strings: [1, 2, 3] },
      ],
    };
    const change = neckChange(from, to);
    expect(change.capos.map(({ action }) => action)).toEqual(["move", "move"]);
    expect(changeSeconds(times, change)).toBe(6 + 6 + 5);
  });

  test("over other strings one comes off and one goes on", () => {
    const change = neckChange(
      { open, capos: [{ fret: 2, strings: [1, 2, 3] }] },
      { open, capos: [{ fret: 2, strings: [1, 2, 3, 4] }] },
    );
    expect(change.capos).toEqual([
      { action: "off", strings: [1, 2, 3], from: 2 },
      { action: "on", strings: [1, 2, 3, 4], to: 2 },
    ]);
    expect(changeSeconds(times, change)).toBe(3 + 5 + 5);
  });

  test("taking one off needs no check", () => {
    const change = neckChange({ open, capos: [{ fret: 2, strings: [1] }] }, { open, capos: [] });
    expect(changeSeconds(times, change)).toBe(3);
  });

  test("the same fret and strings stay, in whatever order the strings are written", () => {
    const change = neckChange(
      { open, capos: [{ fret: 2, strings: [1, 2] }] },
      { open, capos: [{ fret: 2, strings: [2, 1] }] },
    );
    expect(change).toEqual({ strings: [], capos: [] });
    expect(changeSeconds(times, change)).toBe(0);
  });
});

test("there and back retunes as many strings by as many semitones, with as many capo actions", () => {
  fc.assert(
    fc.property(fc.integer(), (seed) => {
      const problem = randomProblem(seededRandom(seed), { songs: 2, guitars: 1, necks: 6, rules: "none" });
      const [a, b] = problem.songs.map(({ necks }) => necks[0]!);
      const there = neckChange(a!, b!);
      const back = neckChange(b!, a!);
      expect(back.strings.length).toBe(there.strings.length);
      expect(semitonesOf(back)).toBe(semitonesOf(there));
      expect(back.capos.length).toBe(there.capos.length);
    }),
    { numRuns: 500 },
  );
});
