import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { aimOf } from "#app/domain/gig/aims.ts";
import { certaintyWords, type Standing } from "#app/domain/gig/certainty.ts";
import { type Lead, leadOf, leastLead } from "#app/domain/gig/lead.ts";
import { rungs } from "#app/domain/gig/rungs.ts";
import { leadChange, leadFigure, savedWords, workWords } from "#app/domain/gig/saved-words.ts";
import { isFound } from "#app/domain/gig/suggest.ts";
import type { Totals } from "#app/domain/planning/answer.ts";
import type { Aim, Problem } from "#app/domain/planning/problem.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

const leads = ["dead-air", "strings", "capos", "guitars"] as const;
const nothing: Totals = {
  exposed: 0,
  seconds: 0,
  strings: 0,
  semitones: 0,
  capoActions: 0,
  swaps: 0,
  moved: 0,
};

describe("what leads", () => {
  const now = { total: 500, totals: { ...nothing, exposed: 248, strings: 19, capoActions: 7, swaps: 6 } };
  const then = { total: 210.24, totals: { ...nothing, exposed: 79.4, strings: 1, capoActions: 7, swaps: 8 } };

  test("is told first, what is the same not at all", () => {
    expect(savedWords("dead-air", now, then)).toEqual([
      "169 s less",
      "18 strings fewer",
      "2 guitar changes more",
    ]);
    expect(savedWords("guitars", now, then)[0]).toBe("2 guitar changes more");
    expect(savedWords("strings", then, then)).toEqual([]);
  });

  test("stands large, with what it counts", () => {
    expect(leadFigure("dead-air", then)).toEqual({ value: "79", unit: "s" });
    expect(leadFigure("strings", then)).toEqual({ value: "1", unit: "string" });
    expect(leadFigure("capos", then)).toEqual({ value: "7", unit: "capo changes" });
    expect(leadFigure("own", then)).toEqual({ value: "210.2", unit: "weighed" });
    expect(leadChange("strings", now, then)).toBe("−18");
    expect(leadChange("guitars", now, then)).toBe("+2");
    expect(leadChange("capos", now, then)).toBe("");
  });

  test("is left out of the small print", () => {
    expect(workWords("dead-air", now)).toBe("19 strings, 7 capo, 6 guitar changes");
    expect(workWords("dead-air", { total: 0, totals: { ...nothing, strings: 1, swaps: 1 } })).toBe(
      "1 string, 0 capo, 1 guitar change",
    );
    expect(workWords("strings", then)).toBe("79 s dead air, 7 capo, 8 guitar changes");
    expect(workWords("guitars", then)).toBe("79 s dead air, 1 string, 7 capo changes");
    expect(workWords("capos", { ...then, totals: { ...then.totals, wishes: 40 } })).toBe(
      "79 s dead air, 1 string, 8 guitar changes, wishes 40 s",
    );
  });
});

const problemOf = (aim: Aim, changes: Partial<Problem> = {}): Problem => ({
  version: 1,
  crew: "alone",
  times: { string: 8, semitone: 1, capoMove: 6, capoOn: 5, capoOff: 3, swap: 15, check: 5, cover: 12 },
  aim,
  guitars: [
    { id: "a", strings: 2, lowest: [30, 40], highest: [50, 60], start: null, keeps: false },
    { id: "b", strings: 2, lowest: [30, 40], highest: [50, 60], start: null, keeps: false },
  ],
  songs: ["s1", "s2", "s3"].map((id, i) => ({
    id,
    seconds: 200,
    section: 0,
    cover: null,
    necks: [{ open: [40 + 2 * i, 50], capos: [], guitars: null, penalty: 0 }],
  })),
  order: ["s1", "s2", "s3"],
  rules: { at: { s1: 1 }, before: [], into: [], apart: [] },
  maxMoved: null,
  ...changes,
});

const standing = (total: number, bound: number, changes: Partial<Totals>): Standing => ({
  status: bound >= total ? "optimal" : "feasible",
  total,
  bound,
  totals: { ...nothing, ...changes },
});

describe("how sure", () => {
  // By hand, for problemOf: two gaps, of which each asks for at most one string (only the lower one differs) and one
  // change of guitars; their talk is 12 s each (the first song is held, so its talk is none of them).
  const quiet = problemOf(aimOf({ kind: "dead-air" }));

  test("which total is proven, by what is given up and what is aimed for", () => {
    // 101 × 20 s of dead air, 24 s under the talk, 2 strings, 2 changes of guitar: none has less dead air.
    const best = standing(2048, 2048, { exposed: 20 });
    expect(certaintyWords(quiet, best, "any-order", "dead-air")).toBe(
      "Proven: no order needs less dead air.",
    );
    expect(certaintyWords(quiet, best, "same-order", "dead-air")).toBe(
      "Proven: in this order, no choice of guitars needs less dead air.",
    );
    expect(certaintyWords(quiet, best, "move-two", "dead-air")).toBe(
      "Proven: with two songs moved, nothing needs less dead air.",
    );
    expect(certaintyWords(quiet, standing(2, 2, { strings: 1 }), "any-order", "own")).toBe(
      "Proven: no order needs less by your weights.",
    );
  });

  test("fewer strings, capo changes, guitar changes", () => {
    for (const [kind, words, totals] of [
      ["strings", "fewer strings", { strings: 2 }],
      ["capos", "fewer capo changes", { capoActions: 2 }],
      ["guitars", "fewer guitar changes", { swaps: 2 }],
    ] as const) {
      const best = standing(200_000, 200_000, totals);
      expect(certaintyWords(problemOf(aimOf({ kind })), best, "any-order", kind)).toBe(
        `Proven: no order needs ${words}.`,
      );
    }
  });

  test("where a second of dead air could be had for more work, the total of both is what is proven", () => {
    const coarse = problemOf({ exposed: 1, seconds: 0, strings: 5, semitones: 0, capoActions: 0, swaps: 5 });
    const best = standing(40, 40, { exposed: 30, strings: 1, swaps: 1 });
    expect(certaintyWords(coarse, best, "any-order", "dead-air")).toBe(
      "Proven: no order needs less dead air and work together.",
    );
  });

  test("wishes that cost seconds are weighed with dead air, and told with it", () => {
    const wished = { ...quiet, wishes: [{ kind: "run" as const, most: 1, seconds: 20 }] };
    const best = standing(4000, 4000, { exposed: 20, wishes: 20 });
    expect(certaintyWords(wished, best, "any-order", "dead-air")).toBe(
      "Proven: no order needs less dead air and wishes together.",
    );
  });

  test("not proven: how much less there may be at most", () => {
    // Besides dead air at most 24 s of talk, 2 strings and 2 changes of guitar: (1038 - 28) / 101 = 10 s.
    expect(certaintyWords(quiet, standing(2048, 1038, { exposed: 20 }), "any-order", "dead-air")).toBe(
      "Not proven: at most 10 s less is possible.",
    );
    const strings = problemOf(aimOf({ kind: "strings" }));
    // Besides strings at most a gap of 15 + 8 + 2 + 5 = 30 s and one of 15 + 8 + 4 + 5 = 32 s, so 62 s × 11, 24 s of talk
    // and 2 changes of guitar: 708.
    expect(certaintyWords(strings, standing(400_000, 100_709, { strings: 4 }), "any-order", "strings")).toBe(
      "Not proven: at most 2 strings fewer are possible.",
    );
    expect(certaintyWords(strings, standing(400_000, 300_708, { strings: 4 }), "any-order", "strings")).toBe(
      "Not proven: at most 1 string fewer is possible.",
    );
    expect(certaintyWords(quiet, standing(51, 40.04, {}), "any-order", "own")).toBe(
      "Not proven: at most 11 less by your weights is possible.",
    );
    expect(certaintyWords(quiet, standing(20, 10, { exposed: 0 }), "any-order", "dead-air")).toBe(
      "Not proven: no less dead air is possible, fewer strings or changes may be.",
    );
  });
});

test("always: no order has less of what leads than is said to be possible", () => {
  const wishes = [{ kind: "run" as const, most: 1, seconds: 10 }];
  fc.assert(
    fc.property(
      fc.integer({ min: 1, max: 1_000_000 }),
      fc.integer({ min: 2, max: 6 }),
      fc.constantFrom(...leads),
      fc.constantFrom(...rungs),
      fc.boolean(),
      (seed, songs, lead, rung, wished) => {
        const made = randomProblem(seededRandom(seed), {
          songs,
          guitars: 2,
          necks: 5,
          rules: "none",
          crew: seed % 2 ? "tech" : "alone",
        });
        const problem = {
          ...made,
          aim: aimOf({ kind: lead }),
          maxMoved: rung === "same-order" ? 0 : null,
          ...(wished ? { wishes } : {}),
        };
        const best = solve(problem, { effort: 100_000 });
        if (!isFound(best)) return;
        const only: Record<Lead, Partial<Aim>> = {
          "dead-air": { exposed: 1 },
          strings: { strings: 1 },
          capos: { capoActions: 1 },
          guitars: { swaps: 1 },
          own: {},
        };
        const zero = { exposed: 0, seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 };
        const least = solve({ ...problem, aim: { ...zero, ...only[lead] } }, { effort: 100_000 });
        if (!isFound(least)) throw new Error("This set can be had");
        const count = leadOf(lead, least) + (lead === "dead-air" ? (least.totals.wishes ?? 0) : 0);
        expect(leastLead(lead, problem, best.bound)).toBeLessThanOrEqual(count + 1e-6);
      },
    ),
    { seed: 11, numRuns: 120 },
  );
});
