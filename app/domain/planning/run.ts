import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import { answerOf, type NumberedPlan } from "#app/domain/planning/answer-of.ts";
import { improve } from "#app/domain/planning/local-search.ts";
import type { Model } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { beam } from "#app/domain/planning/search/beam.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import { type Random, seededRandom } from "#app/domain/planning/search/random.ts";
import type { SetSpace } from "#app/domain/planning/set-space.ts";

/** The best answer so far (`null`: none yet), what no plan can undercut, and the effort spent. */
export type Progress = { answer: FoundAnswer | null; bound: number; effort: number };

/** What is known of one problem while it is searched. `looks` counts the states and changes looked at. */
export type Run = {
  problem: Problem;
  model: Model;
  rules: OrderRules;
  best: FoundAnswer | null;
  plan: NumberedPlan | null;
  floor: number;
  looks: number;
  random: Random;
};

/** States or small changes looked at for one of effort. */
export const LOOKS_PER_EFFORT = 10;

/** Looks between two moments at which a search may be stopped: some milliseconds. */
export const PORTION = 20_000;

/** States kept for a first look at a case. */
const ROOM_AT_FIRST = 10_000;
const PATIENCE = 6_000_000;
const STATE_MEMORY = 180_000_000;
const FIRST_IMPROVEMENT = 200_000;
const IMPROVEMENT = 20_000;
const HEATS = [3, 1, 0.3];

export function startRun(problem: Problem, model: Model, rules: OrderRules): Run {
  return { problem, model, rules, best: null, plan: null, floor: 0, looks: 0, random: seededRandom(1) };
}

/** Takes a plan where it is better than what is known. */
export function offer(run: Run, plan: NumberedPlan): void {
  const answer = answerOf(run.problem, plan, run.floor);
  if (run.best && run.best.total <= answer.total) return;
  run.best = answer;
  run.plan = plan;
}

export function progress(run: Run): Progress {
  const answer = run.plan ? answerOf(run.problem, run.plan, run.floor) : null;
  return { answer, bound: answer ? answer.bound : run.floor, effort: run.looks / LOOKS_PER_EFFORT };
}

export function isProven(run: Run): boolean {
  return run.best !== null && progress(run).answer?.status === "optimal";
}

/** Looks for a good plan with a beam as wide as `looks` allows, if every state had a child for each way of half the songs. */
export function tryBeam(run: Run, space: SetSpace, looks: number, widest: number): void {
  const { model } = run;
  const ways = model.options.reduce((sum, options) => sum + options.length, 0);
  const width = Math.max(2, Math.min(widest, Math.floor((2 * looks) / (model.songs * ways))));
  const found = beam(space, width);
  run.looks += found.reached;
  if (found.way) offer(run, space.planOf(found.way.moves));
}

/** Small changes, taken ever less readily, from hot to cool and from hot again. */
export function* tryChanges(run: Run, steps: number): Generator<Progress, void> {
  for (const heat of HEATS) {
    if (!run.plan) return;
    offer(run, improve(run.model, run.rules, run.plan, { random: run.random, steps, heat }));
    run.looks += steps;
    yield progress(run);
  }
}

/** One of several cases that every plan belongs to: its space, made when it is needed, and a bound known before. */
export type Case = { space: () => SetSpace; least: number };

type OpenCase = Case & { made: SetSpace | null; proof: BestFirst | null };

const floorOf = ({ proof, least }: OpenCase) => (proof ? Math.max(least, proof.floor()) : least);

/**
 * Goes through all cases best first, always the one of which least is known, until the cheapest way of all is proven, or so
 * many looks are spent in all. Where that takes long, a better plan is looked for in between: what costs more than a known
 * plan need not be kept.
 *
 * @param patient whether to go on beyond `looks`, within reason, while there is no plan at all
 */
export function* prove(
  run: Run,
  cases: readonly Case[],
  looks: number,
  patient: boolean,
): Generator<Progress, void> {
  const open = cases.map((one): OpenCase => ({ ...one, made: null, proof: null }));
  const floor = () => open.reduce((least, one) => Math.min(least, floorOf(one)), Number.POSITIVE_INFINITY);
  let nextChanges = FIRST_IMPROVEMENT;
  let reached = 0;
  for (let first = true; ; first = false) {
    const limit = run.best ? run.best.total * (1 - 5e-10) : Number.POSITIVE_INFINITY;
    const left = open.filter((one) => floorOf(one) < limit && !one.proof?.exhausted);
    if (left.length === 0) break;
    const enough = run.plan || !patient ? looks : Math.max(looks, PATIENCE);
    if (!first && run.looks >= enough) break;
    const one = left.reduce((a, b) => (floorOf(b) < floorOf(a) ? b : a));
    one.made ??= one.space();
    const room = STATE_MEMORY / (60 + 6 * one.made.width) / Math.min(4, left.length);
    one.proof ??= new BestFirst(one.made, Math.floor(room));
    one.proof.setLimit(limit);
    const before = one.proof.reached;
    one.proof.run(PORTION);
    run.looks += one.proof.reached - before;
    reached += one.proof.reached - before;
    if (one.proof.found) offer(run, one.made.planOf(one.proof.found.moves));
    run.floor = Math.max(run.floor, floor());
    yield progress(run);
    if (!one.proof.exhausted && reached >= nextChanges) {
      nextChanges *= 2;
      yield* tryChanges(run, IMPROVEMENT);
    }
  }
  run.floor = Math.max(run.floor, floor());
}

/** What a case costs at least, from a look at its first songs. */
export function leastAtFirst(space: SetSpace): number {
  const proof = new BestFirst(space, ROOM_AT_FIRST);
  proof.run(1);
  return proof.floor();
}
