import type { Problem, Rules, Wish } from "#app/domain/planning/problem.ts";
import { curveAt } from "#app/domain/planning/wishes.ts";

/** Which songs of a set are still to come: `order` with the song just played at its head, places of the whole set. */
export type StillToCome = { order: readonly string[]; justPlayed: string | null };

/**
 * The rules that still say something about the rest of a set. Places count from the song just played, which is held; a
 * place moves up for each song that can no longer be played.
 * @param whole the problem of the whole set
 */
export function restRules(whole: Problem, { order, justPlayed }: StillToCome): Rules {
  const ids = new Set(order);
  const pairs = (list: readonly [string, string][]) => list.filter(([a, b]) => ids.has(a) && ids.has(b));
  const at: Record<string, number> = {};
  for (const [id, place] of Object.entries(whole.rules.at)) {
    if (!ids.has(id)) continue;
    const asked = place < 0 ? whole.order.length + 1 + place : place;
    at[id] = whole.order.slice(0, asked - 1).filter((other) => ids.has(other)).length + 1;
  }
  if (justPlayed !== null) at[justPlayed] = 1;
  return {
    at,
    before: pairs(whole.rules.before),
    into: pairs(whole.rules.into),
    apart: pairs(whole.rules.apart),
  };
}

/** What is wished of the rest of a set: an energy curve goes on from where it is. */
export function restWishes(whole: Problem, { order }: StillToCome): Wish[] | undefined {
  if (!whole.wishes) return undefined;
  const ids = new Set(order);
  const songs = whole.order.length;
  const first = songs - order.length;
  return whole.wishes.map((wish): Wish => {
    if (wish.kind === "run") return wish;
    if (wish.kind === "apart")
      return { ...wish, groups: wish.groups.map((group) => group.filter((id) => ids.has(id))) };
    return {
      ...wish,
      levels: Object.fromEntries(Object.entries(wish.levels).filter(([id]) => ids.has(id))),
      curve: order.map((_, place) => curveAt(wish.curve, first + place, songs)),
    };
  });
}
