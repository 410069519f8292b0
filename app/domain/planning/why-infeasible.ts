import type { Reason } from "#app/domain/planning/answer.ts";
import { keptConflict } from "#app/domain/planning/kept-tunings.ts";
import type { Model } from "#app/domain/planning/model.ts";
import type { CompiledRules } from "#app/domain/planning/order-rules.ts";

/** One reason for every song that no guitar can play in any of its ways. */
function songsWithoutGuitar({ problem, options }: Model): Reason[] {
  return problem.order.flatMap((id, song): Reason[] => {
    if (options[song]!.length > 0) return [];
    const message = `No guitar of this set can be tuned for ${JSON.stringify(id)}.`;
    return [{ code: "no-guitar", songs: [id], message }];
  });
}

/** Everything that can be seen to be impossible without trying orders. */
export function reasonsAtOnce(model: Model, compiled: CompiledRules): Reason[] {
  const without = songsWithoutGuitar(model);
  const kept = without.length > 0 ? null : keptConflict(model);
  return [...without, ...(kept ? [kept] : []), ...(compiled.ok ? [] : compiled.why)];
}
