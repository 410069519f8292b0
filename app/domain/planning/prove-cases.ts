import { keptCases } from "#app/domain/planning/kept-cases.ts";
import type { Model } from "#app/domain/planning/model.ts";
import { type Case, isProven, type Progress, prove, type Run } from "#app/domain/planning/run.ts";
import type { SetSpace } from "#app/domain/planning/set-space.ts";

/** What is tried before the tunings that kept guitars may have are told apart. */
const WHOLE_LOOKS = 300_000;

/**
 * Proves a run's best plan in a space of all its plans, and where that takes long with the tunings of kept guitars told
 * apart.
 *
 * @param caseOf the case that one of the models of `keptCases` makes
 */
export function* proveByCases(
  run: Run,
  whole: SetSpace,
  looks: number,
  caseOf: (model: Model) => Case,
): Generator<Progress, void> {
  const found = keptCases(run.model);
  const asOne = found.length > 1 ? Math.min(looks, run.looks + WHOLE_LOOKS) : looks;
  yield* prove(run, [{ space: () => whole, least: 0 }], asOne, found.length === 1);
  if (isProven(run) || run.looks >= looks) return;
  yield* prove(run, found.map(caseOf), looks, true);
}
