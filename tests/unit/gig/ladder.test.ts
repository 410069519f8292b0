import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { ladderOf, type RungKnown } from "#app/domain/gig/ladder.ts";
import { type Rung, rungProblem, rungs } from "#app/domain/gig/rungs.ts";
import type { FoundAnswer, InfeasibleAnswer, Totals } from "#app/domain/planning/answer.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

const totals: Totals = {
  exposed: 0,
  seconds: 0,
  strings: 0,
  semitones: 0,
  capoActions: 0,
  swaps: 0,
  moved: 0,
};

function found(total: number, bound = total): FoundAnswer {
  const status = bound >= total ? "optimal" : "feasible";
  return { status, total, bound, totals, order: [], plays: [], before: [], gaps: [] };
}

const refusal: InfeasibleAnswer = {
  status: "infeasible",
  why: [{ code: "moved", songs: ["a"], message: "no song may move" }],
};

const now = { total: 100, totals, breaches: [] };

/** Rungs by their totals and bounds; null: nothing known yet. */
function known(...told: (readonly [total: number, bound: number, done?: boolean] | null)[]): RungKnown[] {
  return rungs.map((rung, index) => {
    const one = told[index];
    return one
      ? { rung, answer: found(one[0], one[1]), bound: one[1], done: one[2] ?? true }
      : { rung, answer: null, bound: 0, done: false };
  });
}

const shape = (steps: ReturnType<typeof ladderOf>) =>
  steps.map((step) => (step.kind === "folded" ? ["folded", ...step.rungs] : [step.kind, step.rung]));

describe("a ladder", () => {
  test("every rung that gains over the one before it is there", () => {
    const steps = ladderOf(now, known([90, 90], [80, 80], [70, 70], [60, 60], [50, 50]));
    expect(shape(steps)).toEqual(rungs.map((rung) => ["gains", rung]));
  });

  test("rungs that gain nothing over the one before are folded, neighbours together", () => {
    const steps = ladderOf(now, known([100, 100], [80, 80], [80, 80], [80, 80], [70, 70]));
    expect(shape(steps)).toEqual([
      ["folded", "same-order"],
      ["gains", "move-one"],
      ["folded", "move-two", "move-three"],
      ["gains", "any-order"],
    ]);
  });

  test("a rung that found less good an order than the one before gains nothing: that order is allowed to it too", () => {
    const steps = ladderOf(now, known([90, 90], [80, 60], [85, 60], [78, 60], [78, 60]));
    expect(shape(steps)).toEqual([
      ["gains", "same-order"],
      ["gains", "move-one"],
      ["folded", "move-two"],
      ["gains", "move-three"],
      ["folded", "any-order"],
    ]);
  });

  test("what is proven for any order is proven for those before it", () => {
    const steps = ladderOf(now, known([90, 20], [80, 20], [80, 20], [80, 20], [80, 80]));
    expect(steps[1]).toMatchObject({ kind: "gains", answer: { status: "optimal", bound: 80 } });
    expect(steps[0]).toMatchObject({ kind: "gains", answer: { status: "feasible", bound: 80 } });
  });

  test("while it runs: what gained already is there, one after another is looked at", () => {
    const steps = ladderOf(now, known([90, 90], [85, 40, false]));
    expect(steps[1]).toMatchObject({ kind: "gains", done: false });
    expect(steps[2]).toMatchObject({ kind: "looking", best: { total: 85, status: "feasible" } });
    expect(shape(ladderOf(now, known()))).toEqual(rungs.map((rung) => ["looking", rung]));
  });

  test("what is proven with one song moved is not proven with two, while that is looked at", () => {
    const steps = ladderOf(now, known([90, 90], [80, 80], [80, 30, false]));
    expect(steps[1]).toMatchObject({ kind: "gains", done: true, answer: { status: "optimal" } });
    expect(steps[2]).toMatchObject({ kind: "looking", best: { total: 80, status: "feasible", bound: 30 } });
    const ended = ladderOf(now, known([90, 90], [80, 80], [80, 30], [80, 30], [80, 30]));
    expect(ended[2]).toMatchObject({ kind: "folded", best: { status: "feasible", bound: 30 } });
  });

  test("a rung is done before its search ends where nothing less can be", () => {
    const steps = ladderOf(now, known([90, 90], [80, 40, false], null, null, [80, 80, false]));
    expect(steps[1]).toMatchObject({ kind: "gains", done: true });
    expect(shape(steps)[2]).toEqual(["folded", "move-two", "move-three", "any-order"]);
  });

  test("an order that breaks rules is no answer: the first that keeps them gains, whatever it needs", () => {
    const broken = { ...now, breaches: [{ code: "before" as const, songs: ["a", "b"], message: "" }] };
    const told = known([0, 0], [150, 150], [140, 140], [140, 140], [140, 140]);
    const steps = ladderOf(broken, [
      { rung: "same-order", answer: refusal, bound: Number.POSITIVE_INFINITY, done: true },
      ...told.slice(1),
    ]);
    expect(shape(steps)).toEqual([
      ["refused", "same-order"],
      ["gains", "move-one"],
      ["gains", "move-two"],
      ["folded", "move-three", "any-order"],
    ]);
    expect(steps[1]).toMatchObject({ answer: { bound: 150 } });
  });
});

test("always: totals fall from rung to rung, no bound exceeds a total, and no rung is lost", () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 1_000_000 }), fc.integer({ min: 4, max: 8 }), (seed, songs) => {
      const problem = randomProblem(seededRandom(seed), {
        songs,
        guitars: 2,
        necks: 5,
        rules: "light",
        realistic: true,
      });
      const answers = rungs.map((rung): RungKnown => {
        const answer = solve(rungProblem(problem, rung), { effort: 20_000 });
        const bound = answer.status === "infeasible" ? Number.POSITIVE_INFINITY : answer.bound;
        return { rung, answer, bound, done: true };
      });
      const steps = ladderOf({ ...now, total: Number.MAX_VALUE }, answers);
      const shown = steps.flatMap((step): Rung[] => (step.kind === "folded" ? step.rungs : [step.rung]));
      expect(shown).toEqual([...rungs]);
      let before = Number.POSITIVE_INFINITY;
      for (const step of steps) {
        if (step.kind !== "gains") continue;
        expect(step.answer.total).toBeLessThan(before);
        expect(step.answer.bound).toBeLessThanOrEqual(step.answer.total);
        before = step.answer.total;
      }
    }),
    { seed: 7, numRuns: 40 },
  );
});
