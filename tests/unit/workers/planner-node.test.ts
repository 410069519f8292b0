import { describe, expect, test } from "vitest";
import { solve } from "#app/domain/planning/solve.ts";
import { planInSteps } from "#app/workers/plan-in-steps.ts";
import plan from "#app/workers/planner.node.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";
import { workedProblem } from "#tests/support/planning-worked-example.ts";

const large = randomProblem(seededRandom(11), {
  songs: 60,
  guitars: 4,
  necks: 12,
  rules: "light",
  realistic: true,
  maxMoved: null,
});

describe("a plan on the server", () => {
  test("is that of solve, and says that nothing better is possible", () => {
    const { answer, ended } = plan({ problem: workedProblem(), effort: 1000, milliseconds: 60_000 });
    expect(answer).toEqual(solve(workedProblem(), { effort: 1000 }));
    expect(ended).toBe("settled");
  });

  test("ends with its effort", () => {
    const { answer, ended } = plan({ problem: large, effort: 50, milliseconds: 60_000 });
    expect(answer).toEqual(solve(large, { effort: 50 }));
    expect(ended).toBe("effort");
  });

  test("ends with its time, with an answer and a bound that hold", () => {
    const began = performance.now();
    const { answer, ended } = plan({ problem: large, effort: 100_000_000, milliseconds: 1 });
    expect(ended).toBe("time");
    expect(performance.now() - began).toBeLessThan(20_000);
    if (answer.status === "infeasible") throw new Error("This set can be had");
    expect(answer.order.toSorted()).toEqual(large.order.toSorted());
    expect(answer.bound).toBeLessThanOrEqual(answer.total);
  });

  test("says so where there is none", () => {
    const { answer, ended } = plan({ problem: { ...large, guitars: [] }, effort: 50, milliseconds: 1 });
    expect(answer.status).toBe("infeasible");
    expect(ended).toBe("settled");
  });
});

test("steps never get worse: answers only better, bounds only higher, the last one done", () => {
  let total = Number.POSITIVE_INFINITY;
  let bound = 0;
  let last = false;
  for (const step of planInSteps(large, { effort: 20_000 })) {
    if (step.answer && step.answer.status !== "infeasible") {
      expect(step.answer.total).toBeLessThanOrEqual(total);
      total = step.answer.total;
    }
    expect(step.bound).toBeGreaterThanOrEqual(bound - 1e-6);
    bound = step.bound;
    expect(last).toBe(false);
    last = step.done;
  }
  expect(last).toBe(true);
});
