import { keptOrderPart } from "#app/domain/planning/bounds/kept-order-part.ts";
import type { Model } from "#app/domain/planning/model.ts";
import { raisePrices } from "#app/domain/planning/search/raise-prices.ts";
import { isPlayed, type SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";

/**
 * For a set of which only some songs may leave the present order: each guitar goes through the present order for itself
 * and chooses which songs to play at their places, which to insert elsewhere and which to pass over, at a price that
 * every song pays to whoever plays it and one that every insertion costs.
 *
 * Why it bounds: in a real plan each song is played by exactly one guitar, so the song prices cancel. A song that moved is
 * inserted by one guitar, so there are at most as many insertions as songs may still move, and the insertion prices paid
 * are no more than what is taken off for them. What one guitar does in the plan is one of its choices: songs of others
 * are left to them (then it is no longer in hand), songs that moved are passed over, no more than may move. What a gap
 * costs depends on the guitar of the song that it leads into alone, and staying in hand never costs more than what the
 * plan pays.
 *
 * @param target total of a known plan
 * @param rounds how often the prices are adjusted
 */
export function keptOrderBound(
  model: Model,
  layout: SetLayout,
  { target, rounds }: { target: number; rounds: number },
): SetBound {
  const most = model.problem.maxMoved!;
  const { songs } = model;
  const parts = Array.from({ length: model.guitars }, (_, guitar) => keptOrderPart(model, guitar, most));
  const priced = raisePrices(
    new Float64Array(songs + 1),
    (tried) => {
      const prices = tried.subarray(0, songs);
      const insertionPrice = tried[songs]!;
      const lack = new Float64Array(songs + 1).fill(1);
      lack[songs] = -most;
      let value = prices.reduce((sum, price) => sum + price, 0) - most * insertionPrice;
      for (const [guitar, part] of parts.entries()) {
        part.sweep(prices, insertionPrice);
        value += part.least[part.stateOf(0, 0, 0, part.places.get(model.start[guitar]!)!, 0)]!;
        part.trace(prices, insertionPrice, lack);
      }
      if (insertionPrice === 0 && lack[songs]! < 0) lack[songs] = 0;
      return { value, lack };
    },
    { target, rounds, free: songs },
  );
  const prices = priced.subarray(0, songs);
  const insertionPrice = priced[songs]!;
  for (const part of parts) part.sweep(prices, insertionPrice);

  return (state, depth) => {
    if (depth === songs) return 0;
    const followed = state[layout.kept]!;
    const mayMove = most - state[layout.moved]!;
    let value = 0;
    let toInsert = mayMove;
    let toPass = mayMove;
    for (let song = 0; song < songs; song += 1) {
      const played = isPlayed(layout, state, song);
      if (!played) value += prices[song]!;
      if (song < followed && !played) toInsert += 1;
      if (song >= followed && played) toPass += 1;
    }
    value -= insertionPrice * toInsert;
    const current = state[layout.current]!;
    for (let guitar = 0; guitar < parts.length; guitar += 1) {
      const part = parts[guitar]!;
      const place = part.places.get(state[layout.necks + guitar]!)!;
      const hand = guitar === current ? 1 : 0;
      value += part.least[part.stateOf(followed, most - toInsert, most - toPass, place, hand)]!;
    }
    return value;
  };
}
