import type { Reason } from "#app/domain/planning/answer.ts";
import { caposSuffice } from "#app/domain/planning/capo-kinds.ts";
import { keptConflict } from "#app/domain/planning/kept-tunings.ts";
import type { Model } from "#app/domain/planning/model.ts";
import type { CompiledRules } from "#app/domain/planning/order-rules.ts";

/** One reason for every song that no guitar can play in any of its ways. */
function songsWithoutGuitar({ problem, options }: Model): Reason[] {
  return problem.order.flatMap((id, song): Reason[] => {
    if (options[song]!.length > 0) return [];
    const ways = problem.songs.find((one) => one.id === id)!.necks;
    const lacksCapos = ways.length > 0 && ways.every((neck) => !caposSuffice(problem, neck));
    const name = JSON.stringify(id);
    const message = lacksCapos
      ? `There are fewer capos than ${name} needs at once.`
      : `No guitar of this set can be tuned for ${name}.`;
    return [{ code: "no-guitar", songs: [id], message }];
  });
}

/** Everything that can be seen to be impossible without trying orders. */
export function reasonsAtOnce(model: Model, compiled: CompiledRules): Reason[] {
  const without = songsWithoutGuitar(model);
  const kept = without.length > 0 ? null : keptConflict(model);
  return [...without, ...(kept ? [kept] : []), ...(compiled.ok ? [] : compiled.why)];
}
