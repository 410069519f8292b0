import type { SetPlan } from "#app/domain/gig/plan.ts";

/**
 * What must be mended about single rows of a set, in whole sentences: no guitar can play it, a rule is broken, a capo
 * is missing. Keyed by entry. Without any guitar the page says so once, so the rows need not.
 */
export function rowTroubles(plan: SetPlan, guitars: number): Map<string, string[]> {
  const troubles = new Map<string, string[]>();
  const add = (entryId: string | undefined, message: string) => {
    if (entryId) troubles.set(entryId, [...(troubles.get(entryId) ?? []), message]);
  };
  for (const row of plan.rows) if (row.left !== null && guitars > 0) add(row.entry.id, row.left);
  for (const breach of plan.breaches) add(breach.entryIds[0], breach.message);
  for (const shortage of plan.shortages) add(shortage.entryId, shortage.message);
  return troubles;
}
