import type { Model } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { NOBODY, type SetLayout } from "#app/domain/planning/set-layout.ts";
import { type SetBound, setSpace } from "#app/domain/planning/set-space.ts";

/** Ways of going on that are looked at from one state, at most. */
const MOST_WAYS = 40;

/**
 * A bound that, where the last song leads straight into another, looks ahead to the end of the chain (or as far
 * as there are not too many ways): the least over all ways to play what must come next, of its cost and the bound behind it.
 *
 * Why it bounds: one of these ways is the plan's own, and what follows it costs at least the bound there.
 */
export function throughChains(model: Model, rules: OrderRules, layout: SetLayout, bound: SetBound): SetBound {
  const { expand } = setSpace(model, rules, () => bound);
  const child = new Int32Array(layout.width);

  function ahead(state: Int32Array, depth: number, ways: number): number {
    const last = state[layout.last]!;
    const own = bound(state, depth);
    if (last === NOBODY || rules.next[last] === -1) return own;
    const left = ways / model.options[rules.next[last]!]!.length;
    if (left < 1) return own;
    const children: { cost: number; state: Int32Array }[] = [];
    expand(state, depth, child, (cost) => children.push({ cost, state: child.slice() }));
    const least = children.reduce(
      (value, next) => Math.min(value, next.cost + ahead(next.state, depth + 1, left)),
      Number.POSITIVE_INFINITY,
    );
    return Math.max(own, least);
  }

  return (state, depth) => ahead(state, depth, MOST_WAYS);
}
