import type { Model } from "#app/domain/planning/model.ts";
import { raisePrices } from "#app/domain/planning/search/raise-prices.ts";
import type { SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";
import { stepCost } from "#app/domain/planning/step-cost.ts";

/** A tech is never late in a bound. */
const ENOUGH = Number.POSITIVE_INFINITY;
const MOST_ROUNDS = 160;
const ROUNDS_A_SONG = 4;

type Way = { place: number; penalty: number };

/** One guitar alone: what it costs least to play some of the songs from a position on, each earning its price. */
type GuitarPart = {
  places: Map<number, number>;
  rows: number;
  /** Ways of each song on this guitar. */
  ways: Way[][];
  /** Least cost at `(position × rows + place) × 2`, plus 1 where this guitar played the song before. */
  least: Float64Array;
  /** Step costs at `((position × rows + from) × 2 + in hand) × most + way`. */
  steps: Float64Array;
  most: number;
};

function guitarPart(model: Model, guitar: number): GuitarPart {
  const own = model.options.map((options) => options.filter((option) => option.guitar === guitar));
  const necks = [...new Set(own.flat().map(({ neck }) => neck))];
  const start = model.start[guitar]!;
  if (!necks.includes(start)) necks.push(start);
  const places = new Map(necks.map((neck, place) => [neck, place]));
  const rows = necks.length;
  const most = Math.max(1, ...own.map((options) => options.length));
  const steps = new Float64Array(model.songs * rows * 2 * most);
  for (const [song, options] of own.entries()) {
    for (const [place, from] of necks.entries()) {
      for (let hand = 0; hand < 2; hand += 1) {
        for (const [w, option] of options.entries()) {
          const cover = model.cover[song]!;
          const cost = stepCost(model, guitar, from, option.neck, cover, song === 0, hand === 0, ENOUGH);
          steps[((song * rows + place) * 2 + hand) * most + w] = cost + option.penalty;
        }
      }
    }
  }
  return {
    places,
    rows,
    ways: own.map((options) => options.map(({ neck, penalty }) => ({ place: places.get(neck)!, penalty }))),
    least: new Float64Array((model.songs + 1) * rows * 2),
    steps,
    most,
  };
}

/** Fills `least` from the last song back: leave the song at a position to others, or play it and earn its price. */
function sweep(part: GuitarPart, prices: Float64Array): void {
  const { rows, ways, least, steps, most } = part;
  for (let song = prices.length - 1; song >= 0; song -= 1) {
    const price = prices[song]!;
    const after = (song + 1) * rows;
    for (let place = 0; place < rows; place += 1) {
      const leave = least[(after + place) * 2]!;
      for (let hand = 0; hand < 2; hand += 1) {
        let best = leave;
        const from = ((song * rows + place) * 2 + hand) * most;
        const list = ways[song]!;
        for (let w = 0; w < list.length; w += 1) {
          const cost = steps[from + w]! - price + least[(after + list[w]!.place) * 2 + 1]!;
          if (cost < best) best = cost;
        }
        least[(song * rows + place) * 2 + hand] = best;
      }
    }
  }
}

/** Follows this guitar's cheapest way, and takes off what each song lacks of being played. */
function trace(part: GuitarPart, prices: Float64Array, start: number, lack: Float64Array): void {
  const { rows, ways, least, steps, most } = part;
  let place = part.places.get(start)!;
  let hand = 0;
  for (let song = 0; song < prices.length; song += 1) {
    const after = (song + 1) * rows;
    const value = least[(song * rows + place) * 2 + hand]!;
    if (value === least[(after + place) * 2]!) {
      hand = 0;
      continue;
    }
    const from = ((song * rows + place) * 2 + hand) * most;
    const w = ways[song]!.findIndex(
      (way, i) => value === steps[from + i]! - prices[song]! + least[(after + way.place) * 2 + 1]!,
    );
    lack[song]! -= 1;
    place = ways[song]![w]!.place;
    hand = 1;
  }
}

/**
 * For a set whose order stays: each guitar chooses for itself which songs to play, at a price that every song pays to
 * whoever plays it. The bound is all prices together and what each guitar then loses least.
 *
 * Why it bounds: in a real plan each song is played by exactly one guitar, so the prices paid and earned cancel, and the
 * plan's cost is the prices plus the guitars' own sums. Each guitar's own sum is one of those it could choose from, since
 * what a gap costs depends only on the guitar of the song that it leads into: on its neck, and on whether it was in hand.
 * (A late tech would only add to that.) This holds for any prices; they are raised where nobody plays a song and lowered
 * where several do, which brings the bound up.
 *
 * @param target total of some plan in this order, to judge how far the prices are to be moved
 */
export function fixedOrderBound(model: Model, layout: SetLayout, target: number): SetBound {
  const parts = Array.from({ length: model.guitars }, (_, guitar) => guitarPart(model, guitar));
  const prices = raisePrices(
    new Float64Array(model.songs),
    (tried) => {
      const lack = new Float64Array(model.songs).fill(1);
      let value = tried.reduce((sum, price) => sum + price, 0);
      for (const [guitar, part] of parts.entries()) {
        sweep(part, tried);
        value += part.least[part.places.get(model.start[guitar]!)! * 2]!;
        trace(part, tried, model.start[guitar]!, lack);
      }
      return { value, lack };
    },
    { target, rounds: Math.min(MOST_ROUNDS, ROUNDS_A_SONG * model.songs), free: model.songs },
  );
  for (const part of parts) sweep(part, prices);
  const rest = new Float64Array(model.songs + 1);
  for (let song = model.songs - 1; song >= 0; song -= 1) rest[song] = rest[song + 1]! + prices[song]!;

  return (state, depth) => {
    if (depth === model.songs) return 0;
    let value = rest[depth]!;
    const current = state[layout.current]!;
    for (let guitar = 0; guitar < parts.length; guitar += 1) {
      const part = parts[guitar]!;
      const place = part.places.get(state[layout.necks + guitar]!)!;
      value += part.least[(depth * part.rows + place) * 2 + (guitar === current ? 1 : 0)]!;
    }
    return value;
  };
}
