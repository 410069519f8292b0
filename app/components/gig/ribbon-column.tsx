import type { RowBoxes } from "#app/components/gig/use-row-boxes.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

export function RibbonColumn(_: { plan: SetPlan; guitars: Guitar[]; boxes: RowBoxes }) {
  return null;
}
