import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Answer } from "#app/domain/planning/answer.ts";
import { check } from "#app/domain/planning/check.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { type Problem, parseProblem } from "#app/domain/planning/problem.ts";
import { search } from "#app/domain/planning/search.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { bruteForce, planCount } from "#tests/support/planning-brute-force.ts";
import { type RandomSize, randomProblem, seededRandom } from "#tests/support/planning-random.ts";

const weights = ["none", "light", "heavy"] as const;
const close = (a: number, b: number) => Math.abs(a - b) <= 1e-6 * Math.max(1, Math.abs(b));
const totalOf = (answer: Answer) => (answer.status === "infeasible" ? null : answer.total);

function smallProblem(seed: number): Problem {
  const random = seededRandom(seed);
  const below = (count: number) => Math.floor(random() * count);
  return randomProblem(random, {
    songs: 1 + below(6),
    guitars: 1 + below(3),
    necks: 2 + below(5),
    rules: weights[below(3)]!,
  });
}

function longProblem(seed: number, songs: number, more: Partial<RandomSize> = {}): Problem {
  const random = seededRandom(seed);
  return randomProblem(random, {
    songs,
    guitars: 1 + (seed % 4),
    necks: 5 + (seed % 6),
    rules: weights[seed % 3]!,
    realistic: true,
    ...more,
  });
}

describe("against brute force, written straight from the contract", () => {
  test("500 random problems of up to 6 songs and 50,000 plans: same optimum, proven, and clean", () => {
    let compared = 0;
    let possible = 0;
    for (let seed = 1; compared < 500; seed += 1) {
      const problem = smallProblem(seed);
      if (planCount(problem) > 50_000) continue;
      compared += 1;
      const least = bruteForce(problem);
      const answer = solve(problem);
      expect(parseProblem(problem).ok, `seed ${seed}`).toBe(true);
      expect(check(problem, answer), `seed ${seed}`).toEqual([]);
      if (least === null) {
        expect(answer.status, `seed ${seed}`).toBe("infeasible");
        continue;
      }
      possible += 1;
      expect(answer.status, `seed ${seed}`).toBe("optimal");
      expect(close(totalOf(answer)!, least), `seed ${seed}: ${totalOf(answer)}, not ${least}`).toBe(true);
    }
    expect(possible).toBeGreaterThan(200);
  });
});

describe("always", () => {
  test("the answer is clean, no better than its bound, and no worse than the present order", () => {
    for (let seed = 1; seed <= 24; seed += 1) {
      const problem = longProblem(seed, 10 + seed, { maxMoved: [null, 0, 1, 2, 3][seed % 5]! });
      const answer = solve(problem, { effort: 500 });
      expect(check(problem, answer), `seed ${seed}`).toEqual([]);
      const kept = solve({ ...problem, maxMoved: 0 });
      if (kept.status === "infeasible") continue;
      if (answer.status === "infeasible") throw new Error(`The present order of ${seed} is a plan.`);
      expect(answer.total, `seed ${seed}`).toBeLessThanOrEqual(kept.total * (1 + 1e-9));
      expect(answer.bound).toBeLessThanOrEqual(answer.total);
    }
  });

  test("what is said on the way is true: bounds never exceed the optimum, and answers are valid", () => {
    for (let seed = 1; seed <= 12; seed += 1) {
      const problem = longProblem(seed, 10 + (seed % 4), {
        maxMoved: seed % 2 ? null : 2,
        longSongs: seed % 3 > 0,
      });
      const optimum = totalOf(solve(problem, { effort: 5_000_000 }));
      if (optimum === null) continue;
      let bound = 0;
      let total = Number.POSITIVE_INFINITY;
      for (const step of search(problem, { effort: 20_000 })) {
        expect(step.bound).toBeGreaterThanOrEqual(bound);
        expect(step.bound).toBeLessThanOrEqual(optimum * (1 + 1e-9));
        bound = step.bound;
        if (!step.answer) continue;
        expect(check(problem, step.answer)).toEqual([]);
        expect(step.answer.total).toBeLessThanOrEqual(total);
        total = step.answer.total;
      }
    }
  });

  test("the same problem with the same effort gives the same answer", () => {
    for (const seed of [3, 8, 13]) {
      const problem = longProblem(seed, 20);
      const again = structuredClone(problem);
      const answers = [problem, again].map((one) => JSON.stringify(solve(one, { effort: 3_000 })));
      expect(answers[0]).toBe(answers[1]);
    }
  });

  test("other names for guitars and songs, and all pitches higher, change no proven total", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 100_000 }), (seed) => {
        const problem = smallProblem(seed);
        const up = (neck: { open: number[]; capos: { fret: number; strings: number[] }[] }) => ({
          ...neck,
          open: neck.open.map((pitch) => pitch + 3),
        });
        const name = (id: string) => `${id}'`;
        const pair = (ids: [string, string]): [string, string] => [name(ids[0]), name(ids[1])];
        const other: Problem = {
          ...problem,
          guitars: problem.guitars
            .map((guitar) => ({
              ...guitar,
              id: name(guitar.id),
              lowest: guitar.lowest.map((pitch) => pitch + 3),
              highest: guitar.highest.map((pitch) => pitch + 3),
              start: guitar.start && up(guitar.start),
            }))
            .reverse(),
          songs: problem.songs.map((song) => ({
            ...song,
            id: name(song.id),
            necks: song.necks.map((neck) => ({
              ...neck,
              ...up(neck),
              guitars: neck.guitars?.map(name) ?? null,
            })),
          })),
          order: problem.order.map(name),
          rules: {
            at: Object.fromEntries(Object.entries(problem.rules.at).map(([id, place]) => [name(id), place])),
            before: problem.rules.before.map(pair),
            into: problem.rules.into.map(pair),
            apart: problem.rules.apart.map(pair),
          },
        };
        const mine = totalOf(solve(problem));
        const theirs = totalOf(solve(other));
        expect(theirs === null).toBe(mine === null);
        if (mine !== null) expect(close(theirs!, mine)).toBe(true);
      }),
      { numRuns: 100 },
    );
  });
});

test("a stop is obeyed with a valid answer and a true bound", () => {
  const problem = longProblem(3, 30);
  let asked = 0;
  const answer = solve(problem, {
    stop: () => {
      asked += 1;
      return asked > 2;
    },
  });
  expect(asked).toBe(3);
  expect(check(problem, answer)).toEqual([]);
});

test("a hundred songs on twelve guitars get a valid plan and a true bound", () => {
  const problem = randomProblem(seededRandom(7), {
    songs: 100,
    guitars: 12,
    necks: 40,
    rules: "heavy",
    realistic: true,
    maxMoved: null,
  });
  const answer = solve(problem, { effort: 40_000 });
  if (answer.status === "infeasible") throw new Error(answer.why[0]!.message);
  expect(check(problem, answer)).toEqual([]);
  expect(answer.bound).toBeGreaterThan(0);
  const { total } = evaluate(problem, answer.order, answer.plays);
  expect(close(total, answer.total)).toBe(true);
}, 60_000);
