import { greatest } from "#app/domain/planning/bounds/greatest.ts";
import { jointKeptOrderBound } from "#app/domain/planning/bounds/joint-kept-order-bound.ts";
import { keptOrderBound } from "#app/domain/planning/bounds/kept-order-bound.ts";
import { overLooseCapos } from "#app/domain/planning/bounds/loose-capos.ts";
import { movesLeft } from "#app/domain/planning/bounds/moves-left.ts";
import { partitionBound } from "#app/domain/planning/bounds/partition-bound.ts";
import type { Model } from "#app/domain/planning/model.ts";
import { proveByCases } from "#app/domain/planning/prove-cases.ts";
import {
  isProven,
  type Progress,
  progress,
  prove,
  type Run,
  tryBeam,
  tryChanges,
} from "#app/domain/planning/run.ts";
import { type SetSpace, setSpace } from "#app/domain/planning/set-space.ts";

/** How many songs may move at most for the present order to be worth following. */
const FEW = 6;

/** How often prices are adjusted for a first plan, and for the proof. */
const ROUNDS_AT_FIRST = 60;
const ROUNDS = 240;

/** What a proof may take before its bound is made as close as it can be. */
const EASY_LOOKS = 100_000;
const CHANGES = 4_000;

/** What following all guitars together may take, and how much of it counts as one look. */
const WALK_STEPS = 600_000_000;
const STEPS_PER_LOOK = 150;

/** Whether so few songs may move that plans are best looked for along the present order. */
export function fewMayMove({ problem, model }: Run): boolean {
  const { maxMoved } = problem;
  return maxMoved !== null && maxMoved > 0 && maxMoved <= FEW && maxMoved < model.songs - 1;
}

/** The space of plans of which few songs have moved, with bounds that follow the present order. */
export function fewMovesSpace({ rules, problem, best }: Run, model: Model, rounds: number): SetSpace {
  const target = best?.total ?? null;
  const bound = overLooseCapos(model, (plain, layout) =>
    greatest(
      movesLeft(rules, layout, problem.maxMoved!),
      keptOrderBound(plain, rules, layout, { target, rounds }),
    ),
  );
  if (problem.maxMoved === 1) return setSpace(model, rules, bound);
  const closeness = rounds > ROUNDS_AT_FIRST ? "dear" : "cheap";
  const work = overLooseCapos(model, (plain, layout) => partitionBound(plain, rules, layout, closeness));
  return setSpace(model, rules, bound, work);
}

/** The same with all guitars followed together, where their joint states are few enough for that; else with dear prices. */
function closeSpace(run: Run, looks: number): SetSpace {
  const { model, rules, problem } = run;
  const target = run.best?.total ?? 0;
  const steps = Math.min(WALK_STEPS, ((looks - run.looks) * STEPS_PER_LOOK) / 2);
  let together = true;
  const bound = overLooseCapos(model, (plain, layout) => {
    const walk = jointKeptOrderBound(plain, rules, layout, { target, steps });
    together = walk !== null;
    if (!walk) return () => 0;
    run.looks += walk.spent / STEPS_PER_LOOK;
    return greatest(movesLeft(rules, layout, problem.maxMoved!), walk.bound);
  });
  const work = overLooseCapos(model, (plain, layout) =>
    together ? partitionBound(plain, rules, layout, "dear") : () => 0,
  );
  const space = setSpace(model, rules, bound, work);
  return together ? space : fewMovesSpace(run, run.model, ROUNDS);
}

/** Looks for the best plan of few moves, and proves it where so many looks suffice. */
export function* planFewMoves(run: Run, looks: number): Generator<Progress, void> {
  const easy = fewMovesSpace(run, run.model, ROUNDS_AT_FIRST);
  tryBeam(run, easy, looks / 10, 32);
  yield progress(run);
  yield* prove(run, [{ space: () => easy, least: 0 }], Math.min(looks, run.looks + EASY_LOOKS), false);
  if (isProven(run) || run.looks >= looks) return;
  yield* tryChanges(run, Math.min(CHANGES, looks - run.looks));
  const close = closeSpace(run, looks);
  tryBeam(run, close, (looks - run.looks) / 10, 64);
  yield progress(run);
  yield* proveByCases(run, close, looks, (one) => {
    const first = fewMovesSpace(run, one, ROUNDS_AT_FIRST);
    return { space: () => fewMovesSpace(run, one, ROUNDS), least: first.bound(first.start, 0) };
  });
}
