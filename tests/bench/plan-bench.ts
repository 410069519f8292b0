import highsLoader from "highs";
import type { Play } from "#app/domain/planning/answer.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { modelOf } from "#app/domain/planning/model.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { scoreOf } from "#app/domain/planning/score.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { bruteForce } from "#tests/support/planning-brute-force.ts";
import { planningMilp } from "#tests/support/planning-milp.ts";
import { type RandomSize, randomProblem, seededRandom } from "#tests/support/planning-random.ts";
import { type BenchRow, median, microseconds, milliseconds, table } from "./timing.ts";

const rules = ["none", "light", "heavy"] as const;

function realistic(seed: number, size: Partial<RandomSize> & { songs: number }): Problem {
  return randomProblem(seededRandom(seed), {
    guitars: 1 + (seed % 3),
    necks: 5 + (seed % 8),
    rules: rules[seed % 3]!,
    realistic: true,
    longSongs: true,
    crew: seed % 2 ? "tech" : "alone",
    maxMoved: null,
    ...size,
  });
}

function time(work: () => void): number {
  const start = performance.now();
  work();
  return performance.now() - start;
}

/** Microseconds of one call, the median of many rounds of calls. */
function each(calls: number, work: () => void): number {
  const rounds = Array.from({ length: 15 }, () => time(() => Array.from({ length: calls }, work)));
  return (median(rounds) / calls) * 1000;
}

/** A problem that some guitar can play throughout, and a plan in its present order. */
function presentPlan(songs: number): { problem: Problem; plays: Play[] } {
  const problem = realistic(1, { songs, guitars: 3, crew: "tech", rules: "light", kept: false });
  const plays = modelOf(problem).options.map((options, i): Play => {
    const { guitar, choice } = options[i % options.length]!;
    return { song: problem.order[i]!, guitar: problem.guitars[guitar]!.id, neck: choice };
  });
  return { problem, plays };
}

function evaluateRows(): BenchRow[] {
  const figures = [12, 30, 60].flatMap((songs) => {
    const { problem, plays } = presentPlan(songs);
    const model = modelOf(problem);
    const score = scoreOf(model);
    const order = Int32Array.from({ length: songs }, (_, i) => i);
    const ways = Int32Array.from(order, (song) => song % model.options[song]!.length);
    return [
      { what: `evaluate, ${songs} songs`, us: each(300, () => evaluate(problem, problem.order, plays)) },
      { what: `score, ${songs} songs`, us: each(20_000, () => score(order, ways)) },
    ];
  });
  const yardstick = figures[0]!.us;
  return figures.map(({ what, us }) => ({ what, figure: microseconds(us), ratio: us / yardstick }));
}

/** The same small sets by all three: brute force is the yardstick. */
async function outsideRows(): Promise<BenchRow[]> {
  const highs = await highsLoader();
  const problems = Array.from({ length: 12 }, (_, i) =>
    realistic(i + 1, { songs: 6 + (i % 2), guitars: 1 + (i % 2), crew: "alone", necks: 5 }),
  );
  const brute = median(problems.map((problem) => time(() => bruteForce(problem))));
  const milp = median(problems.map((problem) => time(() => highs.solve(planningMilp(problem)))));
  const own = median(problems.map((problem) => time(() => solve(problem))));
  return [
    { what: "brute force, 6 and 7 songs, no tech", figure: milliseconds(brute), ratio: 1 },
    { what: "HiGHS, the same", figure: milliseconds(milp), ratio: milp / brute },
    { what: "solve, the same", figure: milliseconds(own), ratio: own / brute },
  ];
}

function solveRow(what: string, problems: Problem[]): { what: string; ms: number; figure: string } {
  const times: number[] = [];
  let proven = 0;
  const gaps: number[] = [];
  for (const problem of problems) {
    times.push(
      time(() => {
        const answer = solve(problem);
        if (answer.status === "feasible") gaps.push((answer.total - answer.bound) / answer.total);
        else proven += 1;
      }),
    );
  }
  const share = Math.round((proven / problems.length) * 100);
  const gap = gaps.length > 0 ? `, gap of the rest ${Math.round(median(gaps) * 100)} %` : "";
  const ms = median(times);
  return { what, ms, figure: `${milliseconds(ms)} median, ${share} % proven${gap}` };
}

function solveRows(): BenchRow[] {
  const seeds = Array.from({ length: 12 }, (_, i) => i + 1);
  const figures = [
    ...[8, 12, 16, 20, 30].map((songs) =>
      solveRow(
        `any order, ${songs} songs`,
        seeds.map((seed) => realistic(seed, { songs })),
      ),
    ),
    ...[12, 30].flatMap((songs) =>
      [0, 1, 2].map((maxMoved) =>
        solveRow(
          `${maxMoved} moved, ${songs} songs`,
          seeds.map((seed) => realistic(seed, { songs, maxMoved })),
        ),
      ),
    ),
  ];
  const yardstick = figures[0]!.ms;
  return figures.map(({ what, ms, figure }) => ({ what, figure, ratio: ms / yardstick }));
}

/** Tables for the planner: scoring, the same sets by other means, and solving by size at the usual effort. */
export async function planBench(): Promise<{ title: string; rows: BenchRow[] }[]> {
  return [
    { title: "Scoring one order", rows: evaluateRows() },
    { title: "Small sets by three means", rows: await outsideRows() },
    { title: "Planning at the usual effort", rows: solveRows() },
  ];
}

if (process.argv[1]?.endsWith("plan-bench.ts"))
  for (const { title, rows } of await planBench()) console.log(table(`\n${title}`, rows));
