import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { isPlayed, type SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";

/** A moved song leaves two neighbours and stands between two others: it can part three pairs. */
const PARTED_BY_A_MOVE = 3;

/** Pairs that stand in the present order the wrong way round: earlier number first. */
function reversedPairs(rules: OrderRules): [number, number][] {
  const pairs: [number, number][] = [];
  const count = rules.next.length;
  for (let early = 0; early < count; early += 1)
    for (let late = early + 1; late < count; late += 1)
      if (rules.predecessors[early]!.includes(late) || rules.latest[late]! < rules.earliest[early]!)
        pairs.push([early, late]);
  return pairs;
}

/**
 * Where only some songs may leave the present order: `Infinity` where more would have to than still may, else 0.
 *
 * Why it bounds: of two songs that stand the wrong way round, one must move, and pairs without a song in common need a
 * move each. Of two neighbours that are kept apart, one must move or another song come between: each further move parts
 * three pairs at most, and each song that has been passed over and is still to come, one.
 */
export function movesLeft(rules: OrderRules, layout: SetLayout, maxMoved: number): SetBound {
  const reversed = reversedPairs(rules);
  const count = rules.next.length;
  const neighbours: number[] = [];
  for (let song = 0; song + 1 < count; song += 1)
    if (rules.apart[song]!.includes(song + 1)) neighbours.push(song);
  if (reversed.length === 0 && neighbours.length === 0) return () => 0;
  const taken = new Uint8Array(count);

  return (state) => {
    const followed = state[layout.kept]!;
    const mayMove = maxMoved - state[layout.moved]!;
    let needed = 0;
    taken.fill(0);
    for (const [early, late] of reversed) {
      if (early < followed || taken[early] || taken[late]) continue;
      if (isPlayed(layout, state, early) || isPlayed(layout, state, late)) continue;
      taken[early] = 1;
      taken[late] = 1;
      needed += 1;
    }
    if (needed > mayMove) return Number.POSITIVE_INFINITY;
    let touching = 0;
    for (const song of neighbours)
      if (song >= followed && !isPlayed(layout, state, song) && !isPlayed(layout, state, song + 1))
        touching += 1;
    if (touching <= PARTED_BY_A_MOVE * mayMove) return 0;
    let passed = 0;
    for (let song = 0; song < followed; song += 1) if (!isPlayed(layout, state, song)) passed += 1;
    return touching > PARTED_BY_A_MOVE * mayMove + passed ? Number.POSITIVE_INFINITY : 0;
  };
}
