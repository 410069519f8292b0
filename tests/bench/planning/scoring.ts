import type { Play } from "#app/domain/planning/answer.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { modelOf } from "#app/domain/planning/model.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { scoreOf } from "#app/domain/planning/score.ts";
import { type BenchRow, median, microseconds } from "../timing.ts";
import { realisticSet } from "./sets.ts";

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
  const problem = realisticSet(1, { songs: [songs], guitars: [3], crew: "tech", cover: 12, plain: true });
  const plays = modelOf(problem).options.map((options, i): Play => {
    const { guitar, choice } = options[i % options.length]!;
    return { song: problem.order[i]!, guitar: problem.guitars[guitar]!.id, neck: choice };
  });
  return { problem, plays };
}

/** Scoring one order, as ratios to evaluating a set of 12 songs. */
export function scoringRows(): BenchRow[] {
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
