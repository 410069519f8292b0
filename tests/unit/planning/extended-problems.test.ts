import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Play } from "#app/domain/planning/answer.ts";
import { greatest } from "#app/domain/planning/bounds/greatest.ts";
import { jointBound } from "#app/domain/planning/bounds/joint-bound.ts";
import { keptOrderBound } from "#app/domain/planning/bounds/kept-order-bound.ts";
import { overLooseCapos } from "#app/domain/planning/bounds/loose-capos.ts";
import { partitionBound } from "#app/domain/planning/bounds/partition-bound.ts";
import { check } from "#app/domain/planning/check.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { fixedOrderSpace } from "#app/domain/planning/fixed-order.ts";
import { modelOf } from "#app/domain/planning/model.ts";
import { type Problem, parseProblem } from "#app/domain/planning/problem.ts";
import { scoreOf } from "#app/domain/planning/score.ts";
import { setSpace } from "#app/domain/planning/set-space.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { bruteForce, planCount, scorePlan } from "#tests/support/planning-brute-force.ts";
import { extendedProblem } from "#tests/support/planning-extended.ts";
import { expectBelow, ready } from "#tests/support/planning-prefixes.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

const close = (a: number, b: number) => Math.abs(a - b) <= 1e-6 * Math.max(1, Math.abs(b));
const weights = ["none", "light", "heavy"] as const;

function smallProblem(seed: number): Problem {
  const random = seededRandom(seed);
  const below = (count: number) => Math.floor(random() * count);
  const problem = randomProblem(random, {
    songs: 1 + below(6),
    guitars: 1 + below(4),
    necks: 2 + below(5),
    rules: weights[below(3)]!,
  });
  const extended = extendedProblem(random, problem);
  return seed % 2 ? extended : eachOnItsGuitar(extended);
}

/** The same with a guitar for each song in turn, all in want of one kind of capo: it cannot but be taken now and then. */
function eachOnItsGuitar(problem: Problem): Problem {
  const strings = [1, 2, 3, 4, 5];
  const songs = problem.songs.map((song, i) => {
    const own = problem.guitars[i % problem.guitars.length]!.id;
    const capos = i % 4 === 3 ? [] : [{ fret: 1 + ((i * 5) % 7), strings }];
    return { ...song, necks: song.necks.map((neck) => ({ ...neck, capos, guitars: [own] })) };
  });
  const guitars = problem.guitars.map((guitar) => ({ ...guitar, start: null }));
  const count = 1 + (problem.songs.length % 2);
  return { ...problem, songs, guitars, capos: [{ strings, count }] };
}

describe("against brute force, written straight from the contract", () => {
  test("300 random problems with scarce capos and wishes: same optimum, proven, and clean", () => {
    let compared = 0;
    let takes = 0;
    let wished = 0;
    for (let seed = 1; compared < 300; seed += 1) {
      const problem = smallProblem(seed);
      if (planCount(problem) > 50_000) continue;
      compared += 1;
      const parsed = parseProblem(problem);
      expect(parsed.ok ? [] : parsed.problems, `seed ${seed}`).toEqual([]);
      const least = bruteForce(problem);
      const answer = solve(problem);
      expect(check(problem, answer), `seed ${seed}`).toEqual([]);
      if (answer.status === "infeasible" || least === null) {
        expect(answer.status === "infeasible" ? null : answer.total, `seed ${seed}`).toBe(least);
        continue;
      }
      expect(answer.status, `seed ${seed}`).toBe("optimal");
      expect(close(answer.total, least), `seed ${seed}: ${answer.total}, not ${least}`).toBe(true);
      if (JSON.stringify(answer.gaps).includes("takenFrom")) takes += 1;
      if ((answer.totals.wishes ?? 0) > 0) wished += 1;
    }
    expect(takes).toBeGreaterThan(30);
    expect(wished).toBeGreaterThan(50);
  });
});

test("evaluate, the fast score and the letter of the contract agree on any plan", () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 1_000_000 }), (seed) => {
      const random = seededRandom(seed);
      const below = (count: number) => Math.floor(random() * count);
      const base = randomProblem(random, {
        songs: 1 + below(12),
        guitars: 1 + below(4),
        necks: 2 + below(6),
        rules: "none",
        maxMoved: null,
      });
      const problem = extendedProblem(random, base);
      const model = modelOf(problem);
      if (model.options.some((options) => options.length === 0)) return;
      const songs = Int32Array.from(model.options.keys());
      for (let i = songs.length - 1; i > 0; i -= 1) {
        const k = below(i + 1);
        [songs[i], songs[k]] = [songs[k]!, songs[i]!];
      }
      const ways = Int32Array.from(model.options, (options) => below(options.length));
      const order = [...songs].map((number) => problem.order[number]!);
      const plays = [...songs].map((number): Play => {
        const { guitar, choice } = model.options[number]![ways[number]!]!;
        return { song: problem.order[number]!, guitar: problem.guitars[guitar]!.id, neck: choice };
      });
      const evaluation = evaluate(problem, order, plays);
      const byLetter = scorePlan(
        problem,
        plays.map(({ song: id, guitar: name, neck }) => {
          const played = problem.songs.find((one) => one.id === id)!;
          const guitar = problem.guitars.find((one) => one.id === name)!;
          return { song: played, guitar, neck: played.necks[neck]! };
        }),
      );
      const fast = scoreOf(model)(songs, ways);
      if (byLetter === null) {
        expect(fast).toBe(Number.POSITIVE_INFINITY);
        return;
      }
      expect(close(fast, byLetter)).toBe(true);
      expect(close(evaluation.total, byLetter)).toBe(true);
    }),
    { numRuns: 500 },
  );
});

test("other names, another list of guitars and all pitches higher change no proven total", () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 100_000 }), (seed) => {
      const small = smallProblem(seed);
      // Starts that carry capos give them in the order of the list, so this needs guitars that are prepared freely.
      const problem = { ...small, guitars: small.guitars.map((guitar) => ({ ...guitar, start: null })) };
      const renamed: Problem = JSON.parse(JSON.stringify(problem).replaceAll(/"s(\d+)"/g, '"song $1"'));
      const up = (pitches: number[]) => pitches.map((pitch) => pitch + 3);
      const other: Problem = {
        ...renamed,
        guitars: renamed.guitars.toReversed().map((guitar) => ({
          ...guitar,
          lowest: up(guitar.lowest),
          highest: up(guitar.highest),
        })),
        songs: renamed.songs
          .toReversed()
          .map((song) => ({ ...song, necks: song.necks.map((neck) => ({ ...neck, open: up(neck.open) })) })),
      };
      const mine = solve(problem);
      const theirs = solve(other);
      expect(theirs.status).toBe(mine.status);
      if (mine.status === "infeasible" || theirs.status === "infeasible") return;
      expect(close(theirs.total, mine.total)).toBe(true);
    }),
    { numRuns: 100 },
  );
});

test("along every prefix of a plan proven optimal, the bound is at most what remains", () => {
  let prefixes = 0;
  for (let seed = 1; seed <= 240; seed += 1) {
    const random = seededRandom(seed);
    const base = randomProblem(random, {
      songs: 3 + Math.floor(random() * 6),
      guitars: 1 + Math.floor(random() * 4),
      necks: 3 + Math.floor(random() * 4),
      rules: weights[seed % 3]!,
      maxMoved: seed % 4 === 0 ? 2 : seed % 5 === 0 ? 0 : null,
    });
    const extended = extendedProblem(random, base);
    const problem = seed % 2 ? extended : eachOnItsGuitar(extended);
    const parts = ready(problem);
    if (!parts) continue;
    const { model, rules } = parts;
    const all = overLooseCapos(model, (plain, layout) => {
      const bounds = [partitionBound(plain, rules, layout, "dear")];
      const joint = jointBound(plain, rules, layout);
      if (joint) bounds.push(joint);
      if (layout.limited) bounds.push(keptOrderBound(plain, rules, layout, { target: null, rounds: 20 }));
      return greatest(...bounds);
    });
    prefixes += expectBelow(setSpace(model, rules, all), `seed ${seed}`);
    if (problem.maxMoved === 0)
      prefixes += expectBelow(fixedOrderSpace(model, rules), `seed ${seed}, order kept`);
  }
  expect(prefixes).toBeGreaterThan(500);
});
