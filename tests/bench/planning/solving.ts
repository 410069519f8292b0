import type { Problem } from "#app/domain/planning/problem.ts";
import { search } from "#app/domain/planning/search.ts";

/** Milliseconds of processor time until it was proven, and what was left open where that took more than five seconds. */
export type Solved = { ms: number; proven: boolean; gap: number };

const mostMs = 5_000;

/** Searches until the answer is proven, or for five seconds of processor time: other work on the machine does not count. */
export function solveTimed(problem: Problem): Solved {
  const begun = process.cpuUsage();
  const spent = () => {
    const { user, system } = process.cpuUsage(begun);
    return (user + system) / 1000;
  };
  const steps = search(problem, { effort: Number.MAX_SAFE_INTEGER / 1000 });
  for (;;) {
    const step = steps.next();
    const ms = spent();
    if (step.done) return { ms, proven: true, gap: 0 };
    const { answer, bound } = step.value;
    if (ms < mostMs) continue;
    const gap = answer ? (answer.total - bound) / Math.max(answer.total, 1e-9) : 1;
    return { ms, proven: false, gap };
  }
}
