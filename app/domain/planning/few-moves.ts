import { greatest } from "#app/domain/planning/bounds/greatest.ts";
import { keptOrderBound } from "#app/domain/planning/bounds/kept-order-bound.ts";
import { overLooseCapos } from "#app/domain/planning/bounds/loose-capos.ts";
import { movesLeft } from "#app/domain/planning/bounds/moves-left.ts";
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
const EASY_LOOKS = 10_000;
const CHANGES = 4_000;

/** Whether so few songs may move that plans are best looked for along the present order. */
export function fewMayMove({ problem, model }: Run): boolean {
  const { maxMoved } = problem;
  return maxMoved !== null && maxMoved > 0 && maxMoved <= FEW && maxMoved < model.songs - 1;
}

/** The space of plans of which few songs have moved, with bounds that follow the present order. */
export function fewMovesSpace({ model, rules, problem, best }: Run, rounds: number): SetSpace {
  const target = best?.total ?? null;
  const bound = overLooseCapos(model, (plain, layout) =>
    greatest(
      movesLeft(rules, layout, problem.maxMoved!),
      keptOrderBound(plain, rules, layout, { target, rounds }),
    ),
  );
  return setSpace(model, rules, bound);
}

/** Looks for the best plan of few moves, and proves it where so many looks suffice. */
export function* planFewMoves(run: Run, looks: number): Generator<Progress, void> {
  const easy = fewMovesSpace(run, ROUNDS_AT_FIRST);
  tryBeam(run, easy, looks / 10, 32);
  yield progress(run);
  yield* prove(run, [{ space: () => easy, least: 0 }], Math.min(looks, run.looks + EASY_LOOKS), false);
  if (isProven(run) || run.looks >= looks) return;
  yield* tryChanges(run, Math.min(CHANGES, looks - run.looks));
  const close = fewMovesSpace(run, ROUNDS);
  tryBeam(run, close, (looks - run.looks) / 10, 64);
  yield progress(run);
  yield* prove(run, [{ space: () => close, least: 0 }], looks, true);
}
