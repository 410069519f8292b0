import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

export function RibbonThumbnails(_: { before: SetPlan; after: SetPlan; guitars: Guitar[] }) {
  return null;
}
