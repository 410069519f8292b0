import { expect, test } from "vitest";
import { check } from "#app/domain/planning/check.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { workedProblem } from "#tests/support/planning-worked-example.ts";

/*
 * By hand, from the planning contract: string 6 goes from 36 to 38, 8 + 2 × 1 = 10 s; the capo over strings 1 to 5 moves
 * from fret 3 to 5, 6 s; one check, 5 s: 21 s. The gap into s2 is covered for 12 s, which leaves 9 s of dead air.
 */
const answer = {
  status: "optimal",
  total: 9,
  bound: 9,
  totals: { exposed: 9, seconds: 21, strings: 1, semitones: 2, capoActions: 1, swaps: 0, moved: 0 },
  order: ["s1", "s2"],
  plays: [
    { song: "s1", guitar: "a", neck: 0 },
    { song: "s2", guitar: "a", neck: 0 },
  ],
  before: [{ guitar: "a", open: [36, 43, 48, 53, 53, 60], capos: [{ fret: 3, strings: [1, 2, 3, 4, 5] }] }],
  gaps: [
    {
      into: "s2",
      swap: false,
      seconds: 21,
      work: [
        {
          guitar: "a",
          by: "player",
          strings: [{ string: 6, from: 36, to: 38 }],
          capos: [{ action: "move", strings: [1, 2, 3, 4, 5], from: 3, to: 5 }],
          seconds: 21,
        },
      ],
    },
  ],
};

test("the worked example comes out as by hand", () => {
  expect(solve(workedProblem())).toEqual(answer);
});

test("check accepts the worked example", () => {
  expect(check(workedProblem(), answer)).toEqual([]);
});

test("no songs is a fine problem with total 0", () => {
  const empty = {
    ...workedProblem(),
    songs: [],
    order: [],
    rules: { at: {}, before: [], into: [], apart: [] },
  };
  const solved = solve(empty);
  expect(solved).toMatchObject({
    status: "optimal",
    total: 0,
    bound: 0,
    order: [],
    plays: [],
    before: [],
    gaps: [],
  });
  expect(check(empty, solved)).toEqual([]);
});

test("songs without guitars are infeasible", () => {
  const none = { ...workedProblem(), guitars: [] };
  const solved = solve(none);
  expect(solved).toMatchObject({ status: "infeasible", why: [{ code: "no-guitar" }, { code: "no-guitar" }] });
  expect(check(none, solved)).toEqual([]);
});
