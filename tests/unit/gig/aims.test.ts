import { describe, expect, test } from "vitest";
import { aimNames, aimOf } from "#app/domain/gig/aims.ts";
import type { GigAim } from "#app/domain/gig/gig.ts";
import { setProblem } from "#app/domain/gig/set-problem.ts";
import { defaultAim } from "#app/domain/planning/aim.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { gigOf, guitar, repertoireOf, song } from "./build-gig.ts";

const alder = guitar("alder");
const birch = guitar("birch");
// A set in which each count can be had for more of another.
const ways = ["EADGBE", "DADGBE capo 2", "DADGAD", "EADGBE capo 2", "DADGAD capo 2", "DADGBE", "EADGBE"];
const songs = ways.map((way, index) => song(`s${index}`, way));

function answerFor(aim: GigAim): FoundAnswer {
  const gig = gigOf([songs.map(({ id }) => ({ song: id, guitar: "alder" }))], { aim });
  const { problem } = setProblem(gig, "set1", repertoireOf(songs, [alder, birch]));
  const answer = solve({ ...problem, maxMoved: 0 }, { effort: 1e6 });
  if (answer.status !== "optimal") throw new Error(answer.status);
  return answer;
}

describe("what suggestions keep low", () => {
  const answers = (["dead-air", "strings", "capos", "guitars"] as const).map((kind) => answerFor({ kind }));
  const [air, strings, capos, guitars] = answers.map((answer) => answer.totals) as [
    FoundAnswer["totals"],
    FoundAnswer["totals"],
    FoundAnswer["totals"],
    FoundAnswer["totals"],
  ];

  test("each aim has the least of its own count, whatever else that takes", () => {
    expect(air.exposed).toBe(Math.min(...answers.map((one) => one.totals.exposed)));
    expect(strings.strings).toBe(Math.min(...answers.map((one) => one.totals.strings)));
    expect(capos.capoActions).toBe(Math.min(...answers.map((one) => one.totals.capoActions)));
    expect(guitars.swaps).toBe(Math.min(...answers.map((one) => one.totals.swaps)));
    // One guitar all night: nothing is changed, but for that many more strings are turned.
    expect(guitars.swaps).toBe(0);
    expect(guitars.strings).toBeGreaterThan(strings.strings);
  });

  test("least dead air is the planner's own aim, and own weights are taken as they are", () => {
    expect(aimOf({ kind: "dead-air" })).toBe(defaultAim);
    const weights = { exposed: 3, seconds: 0, strings: 2.5, semitones: 1, capoActions: 0, swaps: 9 };
    expect(aimOf({ kind: "own", weights })).toBe(weights);
  });

  test("each has a name of its own", () => {
    expect(new Set(Object.values(aimNames)).size).toBe(5);
  });
});
