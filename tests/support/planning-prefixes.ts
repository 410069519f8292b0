import { expect } from "vitest";
import { withoutRetuningKept } from "#app/domain/planning/kept-tunings.ts";
import { type Model, modelOf } from "#app/domain/planning/model.ts";
import { compileRules, type OrderRules } from "#app/domain/planning/order-rules.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import type { SetSpace } from "#app/domain/planning/set-space.ts";

/** A problem ready for the search; null where it is impossible at once. */
export function ready(problem: Problem): { model: Model; rules: OrderRules } | null {
  const compiled = compileRules(problem);
  const model = withoutRetuningKept(modelOf(problem));
  if (!compiled.ok || model.options.some((options) => options.length === 0)) return null;
  return { model, rules: compiled.rules };
}

/** Cheapest way, found without any bound, with each state on it and what it costs from there to the end. */
export function optimalStates(space: SetSpace): { state: Int32Array; depth: number; rest: number }[] | null {
  const run = new BestFirst({ ...space, bound: () => 0 }, 400_000);
  run.run(3_000_000);
  if (!run.found) return null;
  const states: { state: Int32Array; depth: number; rest: number }[] = [];
  const child = new Int32Array(space.width);
  let state = space.start;
  let rest = run.found.cost;
  for (const [depth, move] of run.found.moves.entries()) {
    states.push({ state, depth, rest });
    let least = Number.POSITIVE_INFINITY;
    let next = state;
    space.expand(state, depth, child, (cost, number) => {
      if (number !== move || cost >= least) return;
      least = cost;
      next = child.slice();
    });
    state = next;
    rest -= least;
  }
  states.push({ state, depth: space.depth, rest });
  return states;
}

/** Expects the space's bound to be at most what remains, along its cheapest way; says how many states that were. */
export function expectBelow(space: SetSpace, name: string): number {
  const states = optimalStates(space);
  if (!states) return 0;
  for (const { state, depth, rest } of states) {
    const bound = space.bound(state, depth);
    expect(bound, `${name}, after ${depth} songs`).toBeLessThanOrEqual(rest + 1e-6 * Math.max(1, rest));
  }
  return states.length;
}
