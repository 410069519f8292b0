import { describe, expect, test } from "vitest";
import type { Answer, FoundAnswer } from "#app/domain/planning/answer.ts";
import { greatest } from "#app/domain/planning/bounds/greatest.ts";
import { keptOrderBound } from "#app/domain/planning/bounds/kept-order-bound.ts";
import { movesLeft } from "#app/domain/planning/bounds/moves-left.ts";
import { check } from "#app/domain/planning/check.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import { type SetSpace, setSpace } from "#app/domain/planning/set-space.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { bruteForce, planCount } from "#tests/support/planning-brute-force.ts";
import { ready } from "#tests/support/planning-prefixes.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

const weights = ["none", "light", "heavy"] as const;

function limitedSet(seed: number, songs: number, maxMoved: number) {
  const random = seededRandom(seed * 31 + maxMoved);
  return randomProblem(random, {
    songs,
    guitars: 1 + (seed % 4),
    necks: 3 + (seed % 5),
    rules: weights[seed % 3]!,
    maxMoved,
    realistic: seed % 2 === 0,
    longSongs: seed % 4 < 2,
  });
}

/** What the rest of a set costs at least from some state on, found without any bound; `Infinity` where it cannot go on. */
function leastRest(space: SetSpace, state: Int32Array, depth: number): number {
  const rest = new BestFirst(
    {
      width: space.width,
      depth: space.depth - depth,
      start: state,
      expand: (from, at, child, emit) => space.expand(from, at + depth, child, emit),
      bound: () => 0,
    },
    400_000,
  );
  rest.run(3_000_000);
  return rest.found ? rest.found.cost : Number.POSITIVE_INFINITY;
}

/** States along a way that is gone at random. */
function wander(space: SetSpace, random: () => number): { state: Int32Array; depth: number }[] {
  const states = [{ state: space.start, depth: 0 }];
  const child = new Int32Array(space.width);
  for (let depth = 0; depth < space.depth; depth += 1) {
    const reached: Int32Array[] = [];
    space.expand(states[depth]!.state, depth, child, () => reached.push(child.slice()));
    const next = reached[Math.floor(random() * reached.length)];
    if (!next) break;
    states.push({ state: next, depth: depth + 1 });
  }
  return states;
}

test("prices are a bound from wherever one may come, not on the best way alone", () => {
  let compared = 0;
  for (let seed = 1; seed <= 160; seed += 1) {
    const most = 1 + (seed % 3);
    const problem = limitedSet(seed, 5 + (seed % 3), most);
    const parts = ready(problem);
    if (!parts) continue;
    const { model, rules } = parts;
    const rounds = [0, 15, 80][Math.floor(seed / 3) % 3]!;
    const space = setSpace(model, rules, (layout) =>
      greatest(
        movesLeft(rules, layout, most),
        keptOrderBound(model, rules, layout, { target: null, rounds }),
      ),
    );
    const random = seededRandom(seed);
    for (let walk = 0; walk < 6; walk += 1)
      for (const { state, depth } of wander(space, random)) {
        const rest = leastRest(space, state, depth);
        const bound = space.bound(state, depth);
        expect(bound, `seed ${seed}, after ${depth} songs`).toBeLessThanOrEqual(
          rest + 1e-6 * Math.max(1, rest),
        );
        if (rest < Number.POSITIVE_INFINITY) compared += 1;
      }
  }
  expect(compared).toBeGreaterThan(1500);
});

describe("against brute force", () => {
  test.each([0, 1, 2, 3])("%i songs may move: same optimum, proven, and clean", (most) => {
    let possible = 0;
    for (let seed = 1; seed <= 150; seed += 1) {
      const problem = limitedSet(seed, 4 + (seed % 3), most);
      if (planCount(problem) > 20_000) continue;
      const least = bruteForce(problem);
      const answer = solve(problem);
      expect(check(problem, answer), `seed ${seed}`).toEqual([]);
      if (least === null || answer.status === "infeasible") {
        expect(answer.status === "infeasible", `seed ${seed}`).toBe(least === null);
        continue;
      }
      possible += 1;
      expect(answer.status, `seed ${seed}`).toBe("optimal");
      expect(Math.abs(answer.total - least), `seed ${seed}`).toBeLessThanOrEqual(1e-6 * Math.max(1, least));
    }
    expect(possible).toBeGreaterThan(30);
  });
});

describe("a plan that is known", () => {
  const ladder = [0, 1, 2, 3, null];

  test("is carried from rung to rung: no rung costs more than the one before", () => {
    for (let seed = 1; seed <= 12; seed += 1) {
      const problem = limitedSet(seed, 14, 0);
      let from: FoundAnswer | null = null;
      for (const maxMoved of ladder) {
        const rung: Problem = { ...problem, maxMoved };
        const answer: Answer = solve(rung, { effort: 300, from });
        if (answer.status === "infeasible") continue;
        expect(check(rung, answer), `seed ${seed}`).toEqual([]);
        if (from) expect(answer.total, `seed ${seed}`).toBeLessThanOrEqual(from.total * (1 + 1e-9));
        from = answer;
      }
    }
  });

  test("changes no proven total", () => {
    for (let seed = 1; seed <= 40; seed += 1) {
      const problem = limitedSet(seed, 8, 2);
      const alone = solve(problem);
      const fewer = solve({ ...problem, maxMoved: 1 });
      if (alone.status === "infeasible" || fewer.status === "infeasible") continue;
      const carried = solve(problem, { from: fewer });
      expect(carried.status).toBe("optimal");
      expect("total" in carried && carried.total, `seed ${seed}`).toBeCloseTo(alone.total, 6);
    }
  });

  test("is overlooked where it does not hold for the problem", () => {
    const problem = { ...limitedSet(4, 8, 1), maxMoved: null };
    const best = solve(problem);
    if (best.status === "infeasible") throw new Error("This set can be played.");
    expect(best.totals.moved).toBeGreaterThan(1);
    const strict = { ...problem, maxMoved: 1 };
    const alone = JSON.stringify(solve(strict));
    const { order, plays } = best;
    const wrong = [
      { order, plays },
      { order: order.slice(1), plays: plays.slice(1) },
      { order: order.map(() => order[0]!), plays },
      { order: strict.order, plays },
      { order: [...order.slice(1), "nobody's"], plays },
      { order: strict.order, plays: strict.order.map((song) => ({ song, guitar: "z", neck: 0 })) },
    ];
    for (const from of wrong) expect(JSON.stringify(solve(strict, { from }))).toBe(alone);
  });
});
