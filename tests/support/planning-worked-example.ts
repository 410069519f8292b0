import { type Problem, parseProblem } from "#app/domain/planning/problem.ts";

/** The worked example of the planning contract: two songs on one guitar, one string up 2, one capo moved. */
export const workedExample = {
  version: 1,
  crew: "alone",
  times: { string: 8, semitone: 1, capoMove: 6, capoOn: 5, capoOff: 3, swap: 15, check: 5, cover: 12 },
  aim: { exposed: 1, seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 },
  guitars: [
    {
      id: "a",
      strings: 6,
      lowest: [34, 39, 44, 49, 53, 58],
      highest: [42, 47, 52, 57, 60, 65],
      start: null,
      keeps: false,
    },
  ],
  songs: [
    {
      id: "s1",
      seconds: 215,
      section: 0,
      cover: 30,
      necks: [
        {
          open: [36, 43, 48, 53, 53, 60],
          capos: [{ fret: 3, strings: [1, 2, 3, 4, 5] }],
          guitars: null,
          penalty: 0,
        },
      ],
    },
    {
      id: "s2",
      seconds: 190,
      section: 0,
      necks: [
        {
          open: [38, 43, 48, 53, 53, 60],
          capos: [{ fret: 5, strings: [1, 2, 3, 4, 5] }],
          guitars: null,
          penalty: 0,
        },
      ],
    },
  ],
  order: ["s1", "s2"],
  rules: { at: { s1: 1 }, before: [], into: [], apart: [] },
  maxMoved: null,
};

/** The worked example as the planner reads it, a new one at each call. */
export function workedProblem(): Problem {
  const parsed = parseProblem(structuredClone(workedExample));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problems));
  return parsed.problem;
}
