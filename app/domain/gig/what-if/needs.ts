import type { SetPlan } from "#app/domain/gig/plan.ts";

/** What some sets ask of hands and of the room together. Seconds and counts; `length` runs from first songs to last. */
export type Needs = {
  exposed: number;
  strings: number;
  capoActions: number;
  swaps: number;
  length: number;
  /** Seconds that broken wishes count as. */
  wishes: number;
  /** The weighted total that the planner keeps low. */
  total: number;
};

/**
 * What some sets need together.
 * @example needsOf(plan.sets).exposed // 251
 */
export function needsOf(sets: readonly SetPlan[]): Needs {
  const sum = (value: (set: SetPlan) => number) => sets.reduce((all, set) => all + value(set), 0);
  return {
    exposed: sum((set) => set.totals.exposed),
    strings: sum((set) => set.totals.strings),
    capoActions: sum((set) => set.totals.capoActions),
    swaps: sum((set) => set.totals.swaps),
    length: sum((set) => set.seconds),
    wishes: sum((set) => set.totals.wishes),
    total: sum((set) => set.evaluation.total),
  };
}
