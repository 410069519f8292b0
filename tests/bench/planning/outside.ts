import highsLoader from "highs";
import { solve } from "#app/domain/planning/solve.ts";
import { bruteForce } from "#tests/support/planning-brute-force.ts";
import { planningMilp } from "#tests/support/planning-milp.ts";
import { type BenchRow, median, milliseconds } from "../timing.ts";
import { realisticSet } from "./sets.ts";

function time(work: () => unknown): number {
  const start = performance.now();
  work();
  return performance.now() - start;
}

/**
 * The same sets by other means, as ratios to the planner: HiGHS, an open-source solver of mixed-integer programmes
 * (highs.dev), and trying everything.
 */
export async function outsideRows(count: number): Promise<BenchRow[]> {
  const highs = await highsLoader();
  const small = Array.from({ length: count }, (_, i) =>
    realisticSet(i + 1, { songs: [6, 7, 8], guitars: [1, 2], necks: [5], crew: "alone", plain: true }),
  );
  const own = small.map((problem) => time(() => solve(problem)));
  const milp = small.map((problem) => time(() => highs.solve(planningMilp(problem), { time_limit: 60 })));
  const tiny = small.filter(({ songs }) => songs.length < 8);
  const brute = tiny.map((problem) => time(() => bruteForce(problem)));
  const ratios = milp.map((ms, i) => ms / own[i]!);
  const yardstick = median(own);
  return [
    { what: "solve, 6 to 8 songs", figure: `${milliseconds(yardstick)} median`, ratio: 1 },
    {
      what: "HiGHS, the same",
      figure: `${milliseconds(median(milp))} median, ${Math.min(...ratios).toFixed(0)} to ${Math.max(...ratios).toFixed(0)} times as long`,
      ratio: median(milp) / yardstick,
    },
    {
      what: "brute force, those of 6 and 7",
      figure: `${milliseconds(median(brute))} median`,
      ratio: median(brute) / yardstick,
    },
  ];
}
