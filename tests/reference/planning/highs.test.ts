import highsLoader from "highs";
import { expect, test } from "vitest";
import { solve } from "#app/domain/planning/solve.ts";
import { planningMilp } from "#tests/support/planning-milp.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

/*
 * HiGHS, an open-source solver of mixed-integer programmes (highs.dev), gets the same problems in a form that knows
 * nothing of guitars.
 */

const rules = ["none", "light", "heavy"] as const;

function problemOf(seed: number) {
  return randomProblem(seededRandom(seed * 17), {
    songs: 6 + (seed % 3),
    guitars: 1 + (seed % 3),
    necks: 5,
    rules: rules[seed % 3]!,
    crew: "alone",
    maxMoved: seed % 4 === 0 ? 0 : null,
    realistic: seed % 5 !== 0,
  });
}

test("HiGHS and the planner agree on forty sets of 6 to 8 songs without a tech", async () => {
  const highs = await highsLoader();
  let feasible = 0;
  for (let seed = 1; feasible < 40; seed += 1) {
    const problem = problemOf(seed);
    const theirs = highs.solve(planningMilp(problem));
    const ours = solve(problem);
    if (theirs.Status === "Infeasible") {
      expect(ours.status, `problem ${seed}`).toBe("infeasible");
      continue;
    }
    expect(theirs.Status, `problem ${seed}`).toBe("Optimal");
    if (ours.status === "infeasible")
      throw new Error(`Problem ${seed} has a plan of ${theirs.ObjectiveValue}.`);
    feasible += 1;
    expect(ours.status, `problem ${seed}`).toBe("optimal");
    const apart = Math.abs(ours.total - theirs.ObjectiveValue);
    expect(apart, `problem ${seed}`).toBeLessThanOrEqual(1e-6 * Math.max(1, ours.total));
  }
});
