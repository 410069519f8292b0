import { describe, expect, test } from "vitest";
import { check } from "#app/domain/planning/check.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { planExamples } from "#tests/support/planning-examples.ts";
import { tamperings } from "#tests/support/planning-tampering.ts";

const examples = planExamples();

const close = (a: number, b: number) => Math.abs(a - b) <= 1e-6 * Math.max(1, Math.abs(b));

describe.skipIf(examples === null)("the worked problems of ../shared/data/plan-examples.jsonl", () => {
  const all = examples ?? [];

  test("there are 112 of them", () => {
    expect(all).toHaveLength(112);
  });

  test("evaluate gives each optimum its total, its gaps and its totals", () => {
    for (const [i, { problem, optimum, answer }] of all.entries()) {
      if (optimum === null || !answer) continue;
      const scored = evaluate(problem, answer.order, answer.plays);
      expect(close(scored.total, optimum), `example ${i}: ${scored.total}, not ${optimum}`).toBe(true);
      expect(scored.totals, `example ${i}`).toEqual(answer.totals);
      expect(scored.before, `example ${i}`).toEqual(answer.before);
      expect(
        scored.gaps.map(({ into, swap, seconds, work }) => ({ into, swap, seconds, work })),
        `example ${i}`,
      ).toEqual(answer.gaps);
      expect(scored.breaches, `example ${i}`).toEqual([]);
    }
  });

  test("check accepts every answer", () => {
    for (const [i, { problem, answer }] of all.entries())
      if (answer) expect(check(problem, answer), `example ${i}`).toEqual([]);
  });

  test("check refuses every answer that has been tampered with", () => {
    const tried = new Map<string, number>();
    for (const [i, { problem, answer }] of all.entries()) {
      if (!answer) continue;
      for (const { name, tamper } of tamperings) {
        const changed = tamper(problem, structuredClone(answer));
        if (!changed) continue;
        tried.set(name, (tried.get(name) ?? 0) + 1);
        expect(check(problem, changed), `example ${i}, ${name}`).not.toEqual([]);
      }
    }
    expect([...tried.keys()].sort()).toEqual(tamperings.map(({ name }) => name).sort());
  });

  test("solve proves the optimum of each, and says which cannot be had", () => {
    for (const [i, { problem, optimum }] of all.entries()) {
      const answer = solve(problem);
      expect(check(problem, answer), `example ${i}`).toEqual([]);
      if (optimum === null) {
        expect(answer.status, `example ${i}`).toBe("infeasible");
        continue;
      }
      if (answer.status === "infeasible") throw new Error(`Example ${i} has a plan of ${optimum}.`);
      expect(answer.status, `example ${i}`).toBe("optimal");
      expect(close(answer.total, optimum), `example ${i}: ${answer.total}, not ${optimum}`).toBe(true);
    }
  });
});
