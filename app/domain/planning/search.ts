import type { Answer, FoundAnswer, Reason } from "#app/domain/planning/answer.ts";
import { answerOf, type NumberedPlan } from "#app/domain/planning/answer-of.ts";
import { greatest } from "#app/domain/planning/bounds/greatest.ts";
import { keptOrderBound } from "#app/domain/planning/bounds/kept-order-bound.ts";
import { partitionBound } from "#app/domain/planning/bounds/partition-bound.ts";
import { fixedOrderSpace, planInOrder } from "#app/domain/planning/fixed-order.ts";
import { withoutRetuningKept } from "#app/domain/planning/kept-tunings.ts";
import { improve } from "#app/domain/planning/local-search.ts";
import { type Model, modelOf } from "#app/domain/planning/model.ts";
import { orderTest } from "#app/domain/planning/order-holds.ts";
import { compileRules, type OrderRules } from "#app/domain/planning/order-rules.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { orderThatHolds, ruleConflict } from "#app/domain/planning/rule-conflict.ts";
import { beam } from "#app/domain/planning/search/beam.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import { seededRandom } from "#app/domain/planning/search/random.ts";
import { type SetSpace, setSpace } from "#app/domain/planning/set-space.ts";
import { reasonsAtOnce } from "#app/domain/planning/why-infeasible.ts";

/** The best answer so far (`null`: none yet), what no plan can undercut, and the effort spent. */
export type Progress = { answer: FoundAnswer | null; bound: number; effort: number };

/** Enough for a set of an evening: about a second. One is ten states or ten small changes looked at. */
export const usualEffort = 200_000;

/** Sets up to this size, and sets whose order stays and that have no tech, are solved to the end at any effort. */
const SMALL_SET = 9;
const TO_THE_END = 50_000_000;

const LOOKS_PER_EFFORT = 10;
const PORTION = 20_000;
const STATE_MEMORY = 180_000_000;
const ORDER_LOOKS = 200_000;
const CONFLICT_LOOKS = 50_000;

type Run = {
  problem: Problem;
  model: Model;
  rules: OrderRules;
  space: SetSpace;
  best: FoundAnswer | null;
  plan: NumberedPlan | null;
  floor: number;
  looks: number;
};

/** Takes a plan where it is better than what is known. */
function offer(run: Run, plan: NumberedPlan): void {
  const answer = answerOf(run.problem, plan, run.floor);
  if (run.best && run.best.total <= answer.total) return;
  run.best = answer;
  run.plan = plan;
}

function progress(run: Run): Progress {
  const answer = run.plan ? answerOf(run.problem, run.plan, run.floor) : null;
  return { answer, bound: answer ? answer.bound : run.floor, effort: run.looks / LOOKS_PER_EFFORT };
}

/** As wide as a tenth of the effort allows, if every state had a child for each way of half the songs. */
function beamWidth(model: Model, effort: number): number {
  const ways = model.options.reduce((sum, options) => sum + options.length, 0);
  const width = Math.floor((effort * LOOKS_PER_EFFORT) / (5 * model.songs * ways));
  return Math.max(2, Math.min(16, width));
}

/** The present order if it holds, and what a narrow beam finds. */
function* firstPlans(run: Run, effort: number): Generator<Progress, void> {
  const { model, rules, problem, space } = run;
  const present = Int32Array.from({ length: model.songs }, (_, song) => song);
  if (orderTest(rules, problem.maxMoved)(present)) {
    const { plan, spent } = planInOrder(model, [...present], PORTION);
    run.looks += spent;
    if (plan) offer(run, plan);
    yield progress(run);
  }
  const narrow = beam(space, beamWidth(model, effort));
  run.looks += narrow.reached;
  if (narrow.way) offer(run, space.planOf(narrow.way.moves));
  yield progress(run);
}

/** A plan in any order that holds, where nothing better turned up; or why there is no such order. */
function anyPlan(run: Run): Reason[] | null {
  const songs = orderThatHolds(run.problem, ORDER_LOOKS);
  if (songs === null) return [ruleConflict(run.problem, CONFLICT_LOOKS)];
  if (songs === undefined) return null;
  const { plan, spent } = planInOrder(run.model, songs, PORTION);
  run.looks += spent;
  if (plan) offer(run, plan);
  return null;
}

function* prove(run: Run, effort: number): Generator<Progress, void> {
  const { space, model, rules } = run;
  const proof = new BestFirst(space, Math.floor(STATE_MEMORY / (60 + 6 * space.width)));
  const random = seededRandom(1);
  const before = run.looks;
  let changes = 0;
  let nextChanges = 40_000;
  for (let first = true; !proof.exhausted; first = false) {
    if (!first && run.plan && run.looks >= effort * LOOKS_PER_EFFORT) break;
    if (run.best) proof.setLimit(run.best.total * (1 - 5e-10));
    proof.run(PORTION);
    if (proof.found) offer(run, space.planOf(proof.found.moves));
    run.looks = before + proof.reached + changes;
    run.floor = Math.max(run.floor, proof.floor());
    if (!proof.exhausted && run.plan && proof.reached >= nextChanges && model.songs > SMALL_SET) {
      const steps = 10_000;
      offer(run, improve(model, rules, run.plan, { random, steps }));
      changes += steps;
      nextChanges *= 2;
    }
    yield progress(run);
  }
  run.floor = Math.max(run.floor, proof.floor());
}

/**
 * Searches for the plan with the least total, and yields what it knows from time to time. Whenever it is left, the last
 * answer is valid and the last bound true; what it returns is the last word. The same problem and effort always go the
 * same way.
 *
 * @param effort how much to do, see `usualEffort`
 */
export function* search(
  problem: Problem,
  { effort = usualEffort }: { effort?: number } = {},
): Generator<Progress, Answer> {
  if (problem.songs.length === 0) return answerOf(problem, { songs: [], options: [] }, 0);
  const everyWay = modelOf(problem);
  const compiled = compileRules(problem);
  const why = reasonsAtOnce(everyWay, compiled);
  if (why.length > 0 || !compiled.ok) return { status: "infeasible", why };

  const model = withoutRetuningKept(everyWay);
  const { rules } = compiled;
  const fixed = problem.maxMoved === 0;
  const space = fixed
    ? fixedOrderSpace(model, rules)
    : setSpace(model, rules, (layout) => partitionBound(model, rules, layout));
  const run: Run = { problem, model, rules, space, best: null, plan: null, floor: 0, looks: 0 };
  yield* firstPlans(run, effort);
  if (!run.plan) {
    const conflict = anyPlan(run);
    if (conflict) return { status: "infeasible", why: conflict };
  }
  const toTheEnd = model.songs <= SMALL_SET || (fixed && !model.tech);
  if (!fixed && run.space.layout.limited && run.best) {
    const target = run.best.total;
    const rounds = Number((globalThis as any).ROUNDS ?? 60);
    run.space = setSpace(model, rules, (layout) =>
      greatest(partitionBound(model, rules, layout), keptOrderBound(model, layout, { target, rounds })),
    );
  }
  yield* prove(run, toTheEnd ? Math.max(effort, TO_THE_END) : effort);
  if (run.plan) return answerOf(problem, run.plan, run.floor);
  return { status: "infeasible", why: [ruleConflict(problem, CONFLICT_LOOKS)] };
}
