import { describe, expect, test } from "vitest";
import type { Reason } from "#app/domain/planning/answer.ts";
import { check } from "#app/domain/planning/check.ts";
import type { Problem, ProblemSong, Rules } from "#app/domain/planning/problem.ts";
import { solve } from "#app/domain/planning/solve.ts";

const song = (id: string, pitch = 40, more: Partial<ProblemSong> = {}): ProblemSong => ({
  id,
  seconds: 200,
  section: 0,
  cover: null,
  necks: [{ open: [pitch], capos: [], guitars: null, penalty: 0 }],
  ...more,
});

function setOf(songs: ProblemSong[], rules: Partial<Rules>, more: Partial<Problem> = {}): Problem {
  return {
    version: 1,
    crew: "alone",
    times: { string: 10, semitone: 1, capoMove: 0, capoOn: 0, capoOff: 0, swap: 15, check: 5, cover: 12 },
    aim: { exposed: 1, seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 },
    guitars: [{ id: "g", strings: 1, lowest: [30], highest: [50], start: null, keeps: false }],
    songs,
    order: songs.map(({ id }) => id),
    rules: { at: {}, before: [], into: [], apart: [], ...rules },
    maxMoved: null,
    ...more,
  };
}

function whyNot(problem: Problem): Reason[] {
  const answer = solve(problem);
  expect(check(problem, answer)).toEqual([]);
  if (answer.status !== "infeasible") throw new Error("This set can be had.");
  return answer.why;
}

const five = ["ferry", "lamps", "mill", "tide", "wren"].map((id) => song(id));

describe("rules that contradict each other are named, and no others", () => {
  const cases: [string, Partial<Rules>, string[], string?][] = [
    [
      "straight into and before",
      {
        into: [["ferry", "lamps"]],
        before: [
          ["lamps", "ferry"],
          ["mill", "tide"],
        ],
      },
      ["ferry", "lamps"],
      '"ferry" straight into "lamps", "lamps" before "ferry": these contradict each other.',
    ],
    [
      "a circle",
      {
        before: [
          ["mill", "tide"],
          ["tide", "wren"],
          ["wren", "mill"],
        ],
      },
      ["mill", "tide", "wren"],
    ],
    ["before itself", { before: [["mill", "mill"]] }, ["mill"]],
    ["into itself", { into: [["mill", "mill"]] }, ["mill"]],
    ["two at one place", { at: { mill: 2, tide: -4 } }, ["mill", "tide"]],
    ["a place that does not exist", { at: { mill: 6 } }, ["mill"]],
    ["place nought", { at: { mill: 0 } }, ["mill"]],
    [
      "two that follow",
      {
        into: [
          ["mill", "tide"],
          ["mill", "wren"],
        ],
      },
      ["tide", "mill", "wren"],
    ],
    [
      "two right before",
      {
        into: [
          ["tide", "mill"],
          ["wren", "mill"],
        ],
      },
      ["tide", "mill", "wren"],
    ],
    ["neighbours kept apart", { into: [["tide", "mill"]], apart: [["mill", "tide"]] }, ["tide", "mill"]],
    [
      "a place and a song before it",
      { at: { mill: 1 }, before: [["tide", "mill"]], apart: [["ferry", "lamps"]] },
      ["tide", "mill"],
    ],
    [
      "a chain that does not fit between two places",
      {
        at: { ferry: 2, lamps: 4 },
        into: [
          ["mill", "tide"],
          ["tide", "lamps"],
        ],
      },
      ["mill", "tide", "lamps", "ferry"],
    ],
  ];

  test.each(cases)("%s", (_, rules, songs, message) => {
    const [reason, ...more] = whyNot(setOf(five, rules));
    expect(more).toEqual([]);
    expect(reason!.code).toBe("rules");
    expect([...reason!.songs].sort()).toEqual([...songs].sort());
    if (message) expect(reason!.message).toBe(message);
  });

  test("a song of a later section before one of an earlier", () => {
    const songs = [song("ferry"), song("lamps", 40, { section: 1 }), song("mill")];
    const [reason] = whyNot(setOf(songs, { before: [["lamps", "mill"]] }));
    expect(reason).toMatchObject({ code: "rules", songs: ["lamps", "mill"] });
  });

  test("apart from itself says nothing", () => {
    expect(solve(setOf(five, { apart: [["mill", "mill"]] })).status).toBe("optimal");
  });
});

describe("songs that may not move", () => {
  test("are named with the rule that moves them", () => {
    const [reason] = whyNot(setOf(five, { before: [["wren", "ferry"]] }, { maxMoved: 0 }));
    expect(reason).toMatchObject({ code: "moved", songs: ["wren", "ferry"] });
  });

  test("one move for two rules is not enough", () => {
    const rules = { at: { wren: 1, ferry: -1 } };
    expect(whyNot(setOf(five, rules, { maxMoved: 1 }))[0]).toMatchObject({ code: "moved" });
    expect(solve(setOf(five, rules, { maxMoved: 2 })).status).toBe("optimal");
  });

  test("more neighbours to part than moves can part are seen at once", () => {
    const many = Array.from({ length: 30 }, (_, i) => song(`s${i}`));
    const apart = many.slice(1).map((one, i): [string, string] => [many[i]!.id, one.id]);
    const [reason] = whyNot(setOf(many, { apart }, { maxMoved: 5 }));
    expect(reason).toMatchObject({ code: "moved" });
    expect(reason!.songs.length).toBeLessThan(30);
  });

  test("sections out of order are named too", () => {
    const songs = [song("ferry"), song("lamps", 40, { section: 1 }), song("mill")];
    const [reason] = whyNot(setOf(songs, {}, { maxMoved: 0 }));
    expect(reason).toMatchObject({ code: "moved", songs: ["lamps", "mill"] });
  });
});

describe("guitars", () => {
  test("each song that none can play is named", () => {
    const songs = [song("ferry"), song("lamps", 60), song("mill", 20)];
    expect(whyNot(setOf(songs, {}))).toMatchObject([
      { code: "no-guitar", songs: ["lamps"] },
      { code: "no-guitar", songs: ["mill"] },
    ]);
  });

  test("a song without ways to play it has no guitar", () => {
    expect(whyNot(setOf([song("ferry", 40, { necks: [] })], {}))[0]).toMatchObject({ code: "no-guitar" });
  });

  test("a kept guitar in two tunings: the two songs that need them", () => {
    const kept = [{ id: "g", strings: 1, lowest: [30], highest: [50], start: null, keeps: true }];
    const songs = [song("ferry"), song("lamps"), song("mill", 41), song("tide")];
    const [reason] = whyNot(setOf(songs, {}, { guitars: kept }));
    expect(reason).toMatchObject({ code: "keeps" });
    expect(reason!.songs).toHaveLength(2);
    expect(reason!.songs).toContain("mill");
  });

  test("a kept guitar's start counts, for the first song under a tech too", () => {
    const start = { open: [41], capos: [] };
    const kept = [{ id: "g", strings: 1, lowest: [30], highest: [50], start, keeps: true }];
    for (const crew of ["alone", "tech"] as const) {
      const [reason] = whyNot(setOf([song("ferry")], {}, { guitars: kept, crew }));
      expect(reason).toMatchObject({ code: "keeps", songs: ["ferry"] });
    }
  });
});
