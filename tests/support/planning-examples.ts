import { existsSync, readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import { type Problem, parseProblem } from "#app/domain/planning/problem.ts";

/** A worked problem: its proven optimum, `null` where it cannot be had, and one answer that reaches it. */
export type PlanExample = { problem: Problem; optimum: number | null; answer: FoundAnswer | null };

const file = fileURLToPath(new URL("../../../shared/data/plan-examples.jsonl", import.meta.url));

/** The worked problems beside the project, or null where that folder is missing. */
export function planExamples(): PlanExample[] | null {
  if (!existsSync(file)) return null;
  const lines = readFileSync(file, "utf8").trim().split("\n");
  return lines.map((line) => {
    const { problem, optimum, answer } = JSON.parse(line);
    const parsed = parseProblem(problem);
    if (!parsed.ok) throw new Error(`A worked problem is refused: ${JSON.stringify(parsed.problems)}`);
    return { problem: parsed.problem, optimum, answer: answer ?? null };
  });
}
