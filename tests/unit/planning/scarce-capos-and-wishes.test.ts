import { describe, expect, test } from "vitest";
import type { Play } from "#app/domain/planning/answer.ts";
import { check } from "#app/domain/planning/check.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { type Problem, parseProblem } from "#app/domain/planning/problem.ts";
import { solve } from "#app/domain/planning/solve.ts";

/* The examples are worked out by hand from "The planning contract beyond version 1" in DEVELOPERS.md. */

const standard = [40, 45, 50, 55, 59, 64];
const five = [1, 2, 3, 4, 5];

function setOf(
  songs: { fret?: number; on: string; open?: number[] }[],
  more: Partial<Problem> = {},
): { problem: Problem; plays: Play[] } {
  const guitar = (id: string) => ({
    id,
    strings: 6,
    lowest: standard.map((pitch) => pitch - 6),
    highest: standard,
    start: null,
    keeps: false,
  });
  const problem: Problem = {
    version: 1,
    crew: "alone",
    times: { string: 8, semitone: 1, capoMove: 6, capoOn: 5, capoOff: 3, swap: 15, check: 5, cover: 12 },
    aim: { exposed: 1, seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 },
    guitars: ["a", "b", "c"].map(guitar),
    songs: songs.map(({ fret, open = standard }, i) => ({
      id: `s${i + 1}`,
      seconds: 200,
      section: 0,
      cover: null,
      necks: [{ open, capos: fret ? [{ fret, strings: five }] : [], guitars: null, penalty: 0 }],
    })),
    order: songs.map((_, i) => `s${i + 1}`),
    rules: { at: {}, before: [], into: [], apart: [] },
    maxMoved: null,
    capos: [{ strings: five, count: 1 }],
    ...more,
  };
  return { problem, plays: songs.map(({ on }, i) => ({ song: `s${i + 1}`, guitar: on, neck: 0 })) };
}

describe("scarce capos", () => {
  test("a capo that no guitar has to spare is taken with the guitar that is laid aside", () => {
    const { problem, plays } = setOf([
      { fret: 3, on: "a" },
      { fret: 5, on: "b" },
    ]);
    const { before, gaps, totals } = evaluate(problem, problem.order, plays);
    expect(before.map(({ capos }) => capos.length)).toEqual([1, 0]);
    expect(gaps[0]).toMatchObject({ seconds: 28, exposed: 16 });
    expect(gaps[0]!.work).toEqual([
      {
        guitar: "b",
        by: "player",
        strings: [],
        capos: [{ action: "on", strings: five, to: 5, takenFrom: "a" }],
        seconds: 13,
      },
    ]);
    expect(totals.capoActions).toBe(2);
  });

  test("who gave a capo has to have one put on again, and one that lies loose is used first", () => {
    const { problem, plays } = setOf(
      [{ fret: 3, on: "a" }, { fret: 3, on: "b" }, { on: "b" }, { fret: 3, on: "a" }],
      { capos: [{ strings: five.toReversed(), count: 1 }] },
    );
    const { gaps } = evaluate(problem, problem.order, plays);
    expect(gaps.map(({ work }) => work.map(({ capos }) => capos))).toEqual([
      [[{ action: "on", strings: five, to: 3, takenFrom: "a" }]],
      [[{ action: "off", strings: five, from: 3 }]],
      [[{ action: "on", strings: five, to: 3 }]],
    ]);
  });

  test("of two that carry one, the guitar laid aside first gives it", () => {
    const { problem, plays } = setOf(
      [
        { fret: 2, on: "a" },
        { fret: 2, on: "b" },
        { fret: 2, on: "c" },
      ],
      { capos: [{ strings: five, count: 2 }] },
    );
    const { gaps } = evaluate(problem, problem.order, plays);
    expect(gaps[1]!.work[0]!.capos).toEqual([{ action: "on", strings: five, to: 2, takenFrom: "a" }]);
  });

  test("a tech takes it beforehand, but for what the guitar in hand has to give", () => {
    const songs = [{ fret: 2, on: "a" }, { fret: 2, on: "b" }, { on: "c" }, { fret: 2, on: "a" }];
    const { problem, plays } = setOf(songs, { crew: "tech" });
    const { gaps } = evaluate(problem, problem.order, plays);
    // From a, played until the gap: off 3 and on 5 wait for it, the look at the tuner is done before.
    expect(gaps[0]).toMatchObject({ seconds: 15 + 8 });
    expect(gaps[0]!.work.map(({ by, seconds }) => [by, seconds])).toEqual([
      ["tech", 5],
      ["player", 8],
    ]);
    // From b, which rests while c is played: all of it is done in time.
    expect(gaps[2]).toMatchObject({ seconds: 15 });
    expect(gaps[2]!.work.map(({ by, seconds }) => [by, seconds])).toEqual([["tech", 13]]);
  });

  test("a song in want of more capos than there are cannot be played", () => {
    const { problem } = setOf([{ fret: 3, on: "a" }], { capos: [{ strings: five, count: 0 }] });
    const answer = solve(problem);
    expect(answer).toEqual({
      status: "infeasible",
      why: [{ code: "no-guitar", songs: ["s1"], message: 'There are fewer capos than "s1" needs at once.' }],
    });
    expect(check(problem, answer)).toEqual([]);
  });

  test("a guitar that is named wrongly is found out", () => {
    const { problem } = setOf([
      { fret: 3, on: "a" },
      { fret: 5, on: "b" },
    ]);
    const pinned = problem.songs.map((song, i) => ({
      ...song,
      necks: song.necks.map((neck) => ({ ...neck, guitars: [i === 0 ? "a" : "b"] })),
    }));
    const asked = { ...problem, songs: pinned, maxMoved: 0 };
    const answer = solve(asked);
    expect(check(asked, answer)).toEqual([]);
    const other = JSON.parse(JSON.stringify(answer).replace('"takenFrom":"a"', '"takenFrom":"c"'));
    expect(check(asked, other)).toEqual([
      { path: "gaps.0.work.0", message: "capos are taken: 5-4-3-2-1 from a" },
    ]);
  });
});

describe("wishes", () => {
  const dropped = [38, ...standard.slice(1)];
  const wished = (wishes: Problem["wishes"]) => {
    const songs = [{ on: "a" }, { on: "a", fret: 2 }, { on: "b" }, { on: "a", open: dropped }];
    const { problem, plays } = setOf(songs, { wishes });
    const { broken, totals, total } = evaluate(problem, problem.order, plays);
    expect(total).toBe(totals.exposed + totals.wishes!);
    return broken;
  };

  test("no more than so many songs in a row in one tuning, whatever guitar and capo", () => {
    expect(wished([{ kind: "run", most: 2, seconds: 20 }])).toEqual([
      { wish: 0, songs: ["s1", "s2", "s3"], seconds: 20 },
    ]);
    expect(wished([{ kind: "run", most: 3, seconds: 20 }])).toEqual([]);
  });

  test("two of a group not side by side", () => {
    const groups = [
      ["s3", "s2"],
      ["s1", "s4"],
    ];
    expect(wished([{ kind: "apart", groups, seconds: 30 }])).toEqual([
      { wish: 0, songs: ["s2", "s3"], seconds: 30 },
    ]);
  });

  test("an energy curve: each step that a song is away from it", () => {
    // The curve over four songs is 1, 2, 3, 4.
    const levels = { s1: 1, s2: 5, s4: 3.5 };
    expect(wished([{ kind: "energy", levels, curve: [1, 4], seconds: 4 }])).toEqual([
      { wish: 0, songs: ["s2"], seconds: 12 },
      { wish: 0, songs: ["s4"], seconds: 2 },
    ]);
  });

  test("an order that breaks none is found, and proven, where there is one", () => {
    const songs = [{ on: "a" }, { on: "a" }, { on: "a", open: dropped }, { on: "a", open: dropped }];
    const { problem } = setOf(songs, {
      wishes: [{ kind: "apart", groups: [["s1", "s2"]], seconds: 600 }],
    });
    const answer = solve(problem);
    expect(answer).toMatchObject({ status: "optimal", broken: [], totals: { wishes: 0 } });
    expect(check(problem, answer)).toEqual([]);
    const silent = { ...answer, broken: [{ wish: 0, songs: ["s1", "s2"], seconds: 600 }] };
    expect(check(problem, silent)).toEqual([{ path: "broken", message: "no wish is broken" }]);
  });
});

test.each([
  [
    {
      capos: [
        { strings: [1, 2], count: 1 },
        { strings: [2, 1], count: 1 },
      ],
    },
    "repeated-capo",
    "capos[1]",
  ],
  [{ capos: [{ strings: [1, 1], count: 1 }] }, "repeated-string", "capos[0]"],
  [{ capos: [{ strings: [], count: 1 }] }, "empty", "capos[0].strings"],
  [{ capos: [{ strings: [13], count: 1 }] }, "out-of-range", "capos[0].strings[0]"],
  [{ capos: [{ strings: [1], count: 0.5 }] }, "out-of-range", "capos[0].count"],
  [{ capos: [{ strings: [1] }] }, "missing-field", "capos[0].count"],
  [{ wishes: [{ kind: "run", most: 0, seconds: 1 }] }, "out-of-range", "wishes[0].most"],
  [{ wishes: [{ kind: "run", most: 2, seconds: -1 }] }, "negative", "wishes[0].seconds"],
  [{ wishes: [{ kind: "loud", seconds: 1 }] }, "unknown-value", "wishes[0].kind"],
  [
    { wishes: [{ kind: "apart", groups: [["s1", "no"]], seconds: 1 }] },
    "unknown-id",
    "wishes[0].groups[0][1]",
  ],
  [
    { wishes: [{ kind: "apart", groups: [["s1"], ["s1"]], seconds: 1 }] },
    "repeated-song",
    "wishes[0].groups[1][0]",
  ],
  [
    { wishes: [{ kind: "energy", levels: { s1: 6 }, curve: [3], seconds: 1 }] },
    "out-of-range",
    "wishes[0].levels.s1",
  ],
  [{ wishes: [{ kind: "energy", levels: {}, curve: [], seconds: 1 }] }, "empty", "wishes[0].curve"],
  [
    { wishes: [{ kind: "energy", levels: {}, curve: [0], seconds: 1 }] },
    "out-of-range",
    "wishes[0].curve[0]",
  ],
])("refused as a bad problem: %j", (more, code, path) => {
  const { problem } = setOf([{ on: "a" }]);
  const parsed = parseProblem({ ...problem, ...more });
  expect(parsed.ok ? [] : parsed.problems.map((bad) => [bad.code, bad.path])).toEqual([[code, path]]);
});

test("starts that carry more capos than there are are refused", () => {
  const { problem } = setOf([{ on: "a" }]);
  const start = { open: standard, capos: [{ fret: 1, strings: five }] };
  const guitars = problem.guitars.map((guitar) => ({ ...guitar, start }));
  const parsed = parseProblem({ ...problem, guitars });
  expect(parsed.ok ? [] : parsed.problems.map(({ path, message }) => [path, message])).toEqual([
    ["capos[0].count", "Guitars start with 3 of these capos, and there are 1."],
  ]);
});
