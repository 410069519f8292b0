import type { Answer, Reason } from "#app/domain/planning/answer.ts";
import { answerOf } from "#app/domain/planning/answer-of.ts";
import { greatest } from "#app/domain/planning/bounds/greatest.ts";
import { jointBound } from "#app/domain/planning/bounds/joint-bound.ts";
import { lastSectionBound } from "#app/domain/planning/bounds/last-section-bound.ts";
import { overLooseCapos } from "#app/domain/planning/bounds/loose-capos.ts";
import { movesLeft } from "#app/domain/planning/bounds/moves-left.ts";
import { partitionBound } from "#app/domain/planning/bounds/partition-bound.ts";
import { fewMayMove, fewMovesSpace, planFewMoves } from "#app/domain/planning/few-moves.ts";
import { fixedOrderSpace, onlyOrder, planInOrder, spaceInOrder } from "#app/domain/planning/fixed-order.ts";
import { withoutRetuningKept } from "#app/domain/planning/kept-tunings.ts";
import { type KnownPlan, knownPlan } from "#app/domain/planning/known-plan.ts";
import { type Model, modelOf } from "#app/domain/planning/model.ts";
import { orderTest } from "#app/domain/planning/order-holds.ts";
import { compileRules } from "#app/domain/planning/order-rules.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { proveByCases } from "#app/domain/planning/prove-cases.ts";
import { orderThatHolds, ruleConflict } from "#app/domain/planning/rule-conflict.ts";
import {
  isProven,
  LOOKS_PER_EFFORT,
  leastAtFirst,
  offer,
  PORTION,
  type Progress,
  progress,
  prove,
  type Run,
  startRun,
  tryBeam,
  tryChanges,
} from "#app/domain/planning/run.ts";
import type { SetLayout } from "#app/domain/planning/set-layout.ts";
import { type SetBound, type SetSpace, setSpace } from "#app/domain/planning/set-space.ts";
import { reasonsAtOnce } from "#app/domain/planning/why-infeasible.ts";

/** Enough for a set of an evening: about a second. One is ten states or small changes looked at. */
export const usualEffort = 200_000;

/** Sets up to this size, and sets whose order stays and that have no tech, are solved to the end at any effort. */
const SMALL_SET = 9;
const TO_THE_END = 500_000_000;

/** What is tried with the cheap bound before the dear one is made. */
const CHEAP_LOOKS = 60_000;

/** Share of the best total so far that the last section must cost by itself to be looked at by itself. */
const WORTHWHILE_ENDING = 0.1;

const ORDER_LOOKS = 200_000;
const CONFLICT_LOOKS = 50_000;

/** The present order if it holds, and what a narrow beam finds. */
function* firstPlans(run: Run, space: SetSpace, looks: number): Generator<Progress, void> {
  const present = Int32Array.from({ length: run.model.songs }, (_, song) => song);
  if (orderTest(run.rules, run.problem.maxMoved)(present)) {
    const { plan, spent } = planInOrder(run.model, [...present], PORTION);
    run.looks += spent;
    if (plan) offer(run, plan);
    yield progress(run);
  }
  tryBeam(run, space, looks / 10, 16);
  yield progress(run);
}

/** A plan in any order that holds, where nothing better turned up; or why there is no such order. */
function anyPlan(run: Run): Reason | null {
  const songs = orderThatHolds(run.problem, ORDER_LOOKS);
  if (songs === null) return ruleConflict(run.problem, CONFLICT_LOOKS);
  if (songs === undefined) return null;
  const { plan, spent } = planInOrder(run.model, songs, PORTION);
  run.looks += spent;
  if (plan) offer(run, plan);
  return null;
}

/** Where the room for states was used up before any order that holds was met, or was ruled out. */
function undecided({ order }: Problem): Reason {
  const message =
    "No order that keeps all rules was found, though none was ruled out: there are too many to try.";
  return { code: "rules", songs: [...order], message };
}

/** The best plan there is; or why there is none. */
function lastWord({ problem, plan, floor }: Run): Answer {
  if (plan) return answerOf(problem, plan, floor);
  const decided = floor === Number.POSITIVE_INFINITY;
  const why = decided ? ruleConflict(problem, CONFLICT_LOOKS) : undecided(problem);
  return { status: "infeasible", why: [why] };
}

/** The space with bounds that are made in no time. */
function cheapSpace({ rules, problem }: Run, model: Model): SetSpace {
  const bound = overLooseCapos(model, (plain, layout) => {
    const shared = partitionBound(plain, rules, layout, "cheap");
    return layout.limited ? greatest(movesLeft(rules, layout, problem.maxMoved!), shared) : shared;
  });
  return setSpace(model, rules, bound);
}

/** Bounds for a set in any order. */
function anyOrderBound(run: Run, model: Model, layout: SetLayout): SetBound {
  const worth = (run.best?.total ?? 0) * WORTHWHILE_ENDING;
  const bounds = [
    partitionBound(model, run.rules, layout, "dear"),
    lastSectionBound(model, run.rules, layout, worth),
    jointBound(model, run.rules, layout),
  ];
  return greatest(...bounds.filter((bound) => bound !== null));
}

/** The space with all that is known about bounds. */
function dearSpace(run: Run, whole: Model): SetSpace {
  const bound = overLooseCapos(whole, (model, layout) =>
    layout.limited
      ? greatest(movesLeft(run.rules, layout, run.problem.maxMoved!), anyOrderBound(run, model, layout))
      : anyOrderBound(run, model, layout),
  );
  const closer = overLooseCapos(whole, (model, layout) => partitionBound(model, run.rules, layout, "close"));
  return setSpace(whole, run.rules, bound, closer);
}

/**
 * Searches for the plan with the least total, and yields what it knows from time to time. Whenever it is left, the last
 * answer is valid and the last bound true; what it returns is the last word. The same problem and effort always go the
 * same way.
 *
 * @param effort how much to do, see `usualEffort`
 * @param from a plan that is known already, taken for a first answer where it is one: see `knownPlan`
 */
export function* search(
  problem: Problem,
  { effort = usualEffort, from = null }: { effort?: number; from?: KnownPlan | null } = {},
): Generator<Progress, Answer> {
  if (problem.songs.length === 0) return answerOf(problem, { songs: [], options: [] }, 0);
  const everyWay = modelOf(problem);
  const compiled = compileRules(problem);
  const why = reasonsAtOnce(everyWay, compiled);
  if (why.length > 0 || !compiled.ok) return { status: "infeasible", why };

  const model = withoutRetuningKept(everyWay);
  const { rules } = compiled;
  const run = startRun(problem, model, rules);
  const known = from && knownPlan(model, rules, from);
  if (known) offer(run, known);
  const only = onlyOrder(rules);
  if (only && !orderTest(rules, problem.maxMoved)(Int32Array.from(only)))
    return { status: "infeasible", why: [ruleConflict(problem, CONFLICT_LOOKS)] };
  const fixed = only !== null || problem.maxMoved === 0;
  const small = model.songs <= SMALL_SET;
  const looks = Math.max(effort * LOOKS_PER_EFFORT, small || (fixed && !model.tech) ? TO_THE_END : 0);
  const space = only
    ? spaceInOrder(model, only)
    : fixed
      ? fixedOrderSpace(model, rules)
      : fewMayMove(run)
        ? fewMovesSpace(run, model, 0)
        : cheapSpace(run, model);

  yield* firstPlans(run, space, looks);
  if (!run.plan) {
    const conflict = anyPlan(run);
    if (conflict) return { status: "infeasible", why: [conflict] };
  }
  if (!fixed && fewMayMove(run)) {
    yield* planFewMoves(run, looks);
    return lastWord(run);
  }
  const inOneGo = small || fixed;
  yield* prove(
    run,
    [{ space: () => space, least: 0 }],
    inOneGo ? looks : Math.min(looks, run.looks + CHEAP_LOOKS),
    inOneGo,
  );
  if (!inOneGo && !isProven(run) && run.looks < looks) {
    yield* tryChanges(run, PORTION);
    const dear = dearSpace(run, model);
    tryBeam(run, dear, (looks - run.looks) / 10, 64);
    yield progress(run);
    yield* proveByCases(run, dear, looks, (one) => {
      return { space: () => dearSpace(run, one), least: leastAtFirst(cheapSpace(run, one)) };
    });
  }
  return lastWord(run);
}
