import { describe, expect, test } from "vitest";
import { greatest } from "#app/domain/planning/bounds/greatest.ts";
import { jointBound } from "#app/domain/planning/bounds/joint-bound.ts";
import { jointKeptOrderBound } from "#app/domain/planning/bounds/joint-kept-order-bound.ts";
import { keptOrderBound } from "#app/domain/planning/bounds/kept-order-bound.ts";
import { lastSectionBound } from "#app/domain/planning/bounds/last-section-bound.ts";
import { movesLeft } from "#app/domain/planning/bounds/moves-left.ts";
import { partitionBound } from "#app/domain/planning/bounds/partition-bound.ts";
import { fixedOrderSpace } from "#app/domain/planning/fixed-order.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import { setSpace } from "#app/domain/planning/set-space.ts";
import { planExamples } from "#tests/support/planning-examples.ts";
import { expectBelow, optimalStates, ready } from "#tests/support/planning-prefixes.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

/*
 * A bound that is too high may go unnoticed where the optimum is compared alone. Along every prefix of a proven optimal
 * plan it must not exceed what remains of that plan's cost. The plan is found without any bound.
 */

const weights = ["none", "light", "heavy"] as const;

function randomSet(seed: number, maxMoved: number | null): Problem {
  const random = seededRandom(seed);
  return randomProblem(random, {
    songs: 3 + Math.floor(random() * 7),
    guitars: 1 + Math.floor(random() * 3),
    necks: 3 + Math.floor(random() * 5),
    rules: weights[seed % 3]!,
    maxMoved,
    realistic: seed % 2 === 0,
    longSongs: seed % 4 === 0,
  });
}

describe("along every prefix of a plan proven optimal, the bound is at most what remains", () => {
  test("needs shared out among the guitars", () => {
    let prefixes = 0;
    for (let seed = 1; seed <= 220; seed += 1) {
      const problem = randomSet(seed, seed % 3 === 0 ? 2 : null);
      const parts = ready(problem);
      if (!parts) continue;
      const { model, rules } = parts;
      const space = setSpace(model, rules, (layout) => partitionBound(model, rules, layout, "dear"));
      prefixes += expectBelow(space, `seed ${seed}`);
    }
    expect(prefixes).toBeGreaterThan(500);
  });

  test("needs shared out among the guitars, chains followed link by link", () => {
    let prefixes = 0;
    for (let seed = 1; seed <= 300; seed += 1) {
      const problem = randomSet(seed, seed % 3 === 0 ? 2 : null);
      const ids = problem.order;
      const chain = (from: number) => [ids[from]!, ids[from + 1]!] as [string, string];
      if (seed % 4 === 1 && ids.length > 4) problem.rules.into.push(chain(0), chain(1), chain(3));
      const parts = ready(problem);
      if (!parts) continue;
      const { model, rules } = parts;
      const space = setSpace(model, rules, (layout) => partitionBound(model, rules, layout, "close"));
      prefixes += expectBelow(space, `seed ${seed}`);
    }
    expect(prefixes).toBeGreaterThan(500);
  });

  test("all guitars followed together", () => {
    let prefixes = 0;
    for (let seed = 1; seed <= 220; seed += 1) {
      const parts = ready(randomSet(seed, seed % 3 === 0 ? 2 : null));
      if (!parts) continue;
      const { model, rules } = parts;
      const space = setSpace(model, rules, (layout) => {
        return jointBound(model, rules, layout) ?? (() => 0);
      });
      prefixes += expectBelow(space, `seed ${seed}`);
    }
    expect(prefixes).toBeGreaterThan(500);
  });

  test("the last section by itself", () => {
    let prefixes = 0;
    for (let seed = 1; seed <= 220; seed += 1) {
      const parts = ready(randomSet(seed, seed % 3 === 0 ? 2 : null));
      if (!parts) continue;
      const { model, rules } = parts;
      const made = setSpace(model, rules, (layout) => lastSectionBound(model, rules, layout, 0) ?? (() => 0));
      prefixes += expectBelow(made, `seed ${seed}`);
    }
    expect(prefixes).toBeGreaterThan(500);
  });

  test("prices for a set of which some songs may move", () => {
    let prefixes = 0;
    for (let seed = 1; seed <= 600; seed += 1) {
      const problem = randomSet(seed, 1 + (seed % 3));
      const parts = ready(problem);
      if (!parts || problem.maxMoved! >= problem.songs.length - 1) continue;
      const { model, rules } = parts;
      const plain = optimalStates(setSpace(model, rules, () => () => 0));
      const target = plain?.[0]?.rest ?? 0;
      const space = setSpace(model, rules, (layout) =>
        greatest(
          movesLeft(rules, layout, problem.maxMoved!),
          keptOrderBound(model, rules, layout, { target, rounds: [0, 20, 90][seed % 3]! }),
        ),
      );
      prefixes += expectBelow(space, `seed ${seed}`);
    }
    expect(prefixes).toBeGreaterThan(300);
  });

  test("the present order followed with all guitars together", () => {
    let prefixes = 0;
    for (let seed = 1; seed <= 300; seed += 1) {
      const problem = randomSet(seed, 1 + (seed % 3));
      const parts = ready(problem);
      if (!parts || problem.maxMoved! >= problem.songs.length - 1) continue;
      const { model, rules } = parts;
      const plain = optimalStates(setSpace(model, rules, () => () => 0));
      const target = plain?.[0]?.rest ?? 0;
      const space = setSpace(model, rules, (layout) => {
        const made = jointKeptOrderBound(model, rules, layout, { target, steps: 20_000_000 });
        return made?.bound ?? (() => 0);
      });
      prefixes += expectBelow(space, `seed ${seed}`);
    }
    expect(prefixes).toBeGreaterThan(300);
  });

  test("prices for a set whose order stays", () => {
    let prefixes = 0;
    for (let seed = 1; seed <= 220; seed += 1) {
      const parts = ready(randomSet(seed, 0));
      if (parts) prefixes += expectBelow(fixedOrderSpace(parts.model, parts.rules), `seed ${seed}`);
    }
    expect(prefixes).toBeGreaterThan(200);
  });

  const examples = planExamples();
  test.skipIf(examples === null)("the worked problems", () => {
    let prefixes = 0;
    for (const [i, { problem }] of (examples ?? []).entries()) {
      const parts = ready(problem);
      if (!parts || problem.songs.length > 12) continue;
      const { model, rules } = parts;
      const space =
        problem.maxMoved === 0
          ? fixedOrderSpace(model, rules)
          : setSpace(model, rules, (layout) => partitionBound(model, rules, layout, "dear"));
      prefixes += expectBelow(space, `example ${i}`);
    }
    expect(prefixes).toBeGreaterThan(400);
  });
});

test("sets of 9 and 10 songs have the same optimum without a bound and with all of them", () => {
  let compared = 0;
  for (let seed = 1; compared < 24; seed += 1) {
    const random = seededRandom(seed * 7);
    const problem = randomProblem(random, {
      songs: 9 + (seed % 2),
      guitars: 1 + (seed % 3),
      necks: 4 + (seed % 4),
      rules: weights[seed % 3]!,
      maxMoved: [null, 1, 2, 3][seed % 4]!,
      realistic: seed % 2 === 0,
    });
    const parts = ready(problem);
    if (!parts) continue;
    const { model, rules } = parts;
    const plain = new BestFirst(
      setSpace(model, rules, () => () => 0),
      400_000,
    );
    plain.run(2_000_000);
    if (!plain.found) continue;
    compared += 1;
    const target = plain.found.cost * 1.1;
    const space = setSpace(model, rules, (layout) => {
      const bounds = [
        partitionBound(model, rules, layout, "dear"),
        jointBound(model, rules, layout) ?? (() => 0),
      ];
      if (layout.limited) {
        bounds.push(movesLeft(rules, layout, problem.maxMoved!));
        bounds.push(keptOrderBound(model, rules, layout, { target, rounds: 15 }));
      }
      return greatest(...bounds);
    });
    const bounded = new BestFirst(space, 400_000);
    bounded.run(2_000_000);
    expect(bounded.found?.cost, `seed ${seed}`).toBeCloseTo(plain.found.cost, 6);
    expect(bounded.reached).toBeLessThanOrEqual(plain.reached);
  }
});
