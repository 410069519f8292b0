import { expect, test } from "vitest";
import { keptCases } from "#app/domain/planning/kept-cases.ts";
import { tuningOf } from "#app/domain/planning/kept-tunings.ts";
import type { Model } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import { setSpace } from "#app/domain/planning/set-space.ts";
import { ready } from "#tests/support/planning-prefixes.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

/** What the cheapest plan costs, found without any bound; `Infinity` where there is none. */
function leastCost(model: Model, rules: OrderRules): number {
  const search = new BestFirst(
    setSpace(model, rules, () => () => 0),
    500_000,
  );
  search.run(5_000_000);
  return search.found?.cost ?? search.floor();
}

test("the cheapest plan of all is the cheapest of the cases, and in each a kept guitar has one tuning", () => {
  let told = 0;
  for (let seed = 1; seed <= 150; seed += 1) {
    const random = seededRandom(seed);
    const problem = randomProblem(random, {
      songs: 3 + (seed % 5),
      guitars: 2 + (seed % 2),
      necks: 4 + (seed % 3),
      rules: (["none", "light", "heavy"] as const)[seed % 3]!,
      maxMoved: null,
    });
    problem.guitars = problem.guitars.map((guitar, i) => ({ ...guitar, keeps: i > 0, start: null }));
    const parts = ready(problem);
    if (!parts) continue;
    const { model, rules } = parts;
    const cases = keptCases(model);
    if (cases.length > 1) told += 1;
    const least = Math.min(...cases.map((one) => leastCost(one, rules)), Number.POSITIVE_INFINITY);
    expect(least, `seed ${seed}`).toBeCloseTo(leastCost(model, rules), 6);
    if (cases.length < 2) continue;
    for (const one of cases)
      for (let guitar = 1; guitar < model.guitars; guitar += 1) {
        const own = one.options.flat().filter((option) => option.guitar === guitar);
        const tunings = new Set(own.map(({ neck }) => tuningOf(model, neck)));
        if (model.guitars === 2) expect(tunings.size, `seed ${seed}`).toBeLessThanOrEqual(1);
      }
  }
  expect(told).toBeGreaterThan(40);
});
