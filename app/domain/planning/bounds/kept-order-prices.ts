import {
  type KeptOrderPart,
  keptOrderPart,
  type PartPrices,
} from "#app/domain/planning/bounds/kept-order-part.ts";
import { moveSlots } from "#app/domain/planning/bounds/move-slots.ts";
import type { Model } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { raisePrices } from "#app/domain/planning/search/raise-prices.ts";
import { gapCost } from "#app/domain/planning/step-cost.ts";

/** Rounding of sums: a song is only held in its place where moving it costs clearly more than a known plan. */
const CLEARLY = 1e-9;

/** Seconds of a gap in a set of which nothing is known. */
const LONG_GAP = 30;

/** Things of which at most so many are chosen: what each takes off, and from each number on what is taken off at most. */
type Chosen = {
  costs: Float64Array;
  /** Those that take something off, the most first. */
  order: number[];
  /** At `number × (most + 1) + count`. */
  least: Float64Array;
};

type Prices = {
  kept: Float64Array;
  moved: Float64Array;
  inserted: Float64Array;
  hold: Float64Array;
  parts: PartPrices[];
  /** Sums over all guitars. */
  passAll: Float64Array;
  openAll: Float64Array;
};

export type KeptOrderPrices = {
  parts: KeptOrderPart[];
  prices: Prices;
  /** Prices of all songs from each on. */
  staying: Float64Array;
  /** Prices of holding across all slots from each on. */
  holding: Float64Array;
  leaving: Chosen;
  opening: Chosen;
};

/** Where each kind of price stands in one list; those that are never less than 0, of insertions and of holding, last. */
function pricesIn(list: Float64Array, songs: number, guitars: number): Prices {
  const slots = songs + 1;
  let at = 0;
  const next = (length: number) => {
    at += length;
    return list.subarray(at - length, at);
  };
  const kept = next(songs);
  const moved = next(songs);
  const own = Array.from({ length: guitars }, () => ({ pass: next(songs), open: next(slots) }));
  const inserted = next(slots);
  const hold = next(slots);
  const parts = own.map((prices): PartPrices => ({ kept, moved, inserted, hold, ...prices }));
  const passAll = new Float64Array(songs);
  const openAll = new Float64Array(slots);
  for (const { pass, open } of parts) {
    for (let song = 0; song < songs; song += 1) passAll[song]! += pass[song]!;
    for (let slot = 0; slot < slots; slot += 1) openAll[slot]! += open[slot]!;
  }
  return { kept, moved, inserted, hold, parts, passAll, openAll };
}

const freePrices = (songs: number, guitars: number) => songs * 2 + guitars * (songs * 2 + 1);

/** The sum of all numbers from each on; one more number than given, the last 0. */
function sumsFrom(list: Float64Array): Float64Array {
  const sums = new Float64Array(list.length + 1);
  for (let i = list.length - 1; i >= 0; i -= 1) sums[i] = sums[i + 1]! + list[i]!;
  return sums;
}

function chosen(costs: Float64Array, most: number): Chosen {
  const order = [...costs.keys()].filter((i) => costs[i]! < 0).sort((a, b) => costs[a]! - costs[b]!);
  const least = new Float64Array((costs.length + 1) * (most + 1));
  for (let i = 0; i <= costs.length; i += 1) {
    const open = order.filter((number) => number >= i);
    for (let count = 1; count <= most; count += 1) {
      const last = open[count - 1];
      least[i * (most + 1) + count] =
        least[i * (most + 1) + count - 1]! + (last === undefined ? 0 : costs[last]!);
    }
  }
  return { costs, order, least };
}

/** The numbers of at most `most` things that take off most. */
function mostTaken(costs: Float64Array, most: number): number[] {
  const taken: number[] = [];
  for (let count = 0; count < most; count += 1) {
    let best = -1;
    for (let i = 0; i < costs.length; i += 1)
      if (costs[i]! < 0 && !taken.includes(i) && (best === -1 || costs[i]! < costs[best]!)) best = i;
    if (best === -1) break;
    taken.push(best);
  }
  return taken;
}

const sum = (list: ArrayLike<number>) =>
  Array.prototype.reduce.call(list, (a, b) => (a as number) + (b as number), 0) as number;

/** What leaving costs for each song, `Infinity` where it may not; what opening costs for each slot. */
function chosenCosts(prices: Prices, allows: Uint8Array) {
  const { kept, moved, inserted, hold, passAll, openAll } = prices;
  const songs = kept.length;
  const leave = Float64Array.from(kept, (price, song) => {
    for (let slot = 0; slot <= songs; slot += 1)
      if (allows[slot * songs + song] === 1) return moved[song]! - price - passAll[song]!;
    return Number.POSITIVE_INFINITY;
  });
  return { leave, open: Float64Array.from(inserted, (price, slot) => price + hold[slot]! - openAll[slot]!) };
}

/** Exactly one guitar plays the first song: the one for which that makes the sum least. */
function firstGuitar(starts: { first: number; later: number }[]): { guitar: number; value: number } {
  let best = { guitar: 0, value: Number.POSITIVE_INFINITY };
  for (const [guitar, { first }] of starts.entries()) {
    const value = starts.reduce((total, { later }, other) => total + (other === guitar ? first : later), 0);
    if (value < best.value) best = { guitar, value };
  }
  return best;
}

/** The bound before the first song, with what it is made of. */
function relax(
  parts: KeptOrderPart[],
  list: Float64Array,
  songs: number,
  most: number,
  allows: Uint8Array,
): { value: number; lack: Float64Array; leave: Float64Array; left: number[] } {
  const prices = pricesIn(list, songs, parts.length);
  const { guitar: first, value: played } = firstGuitar(
    parts.map((part, guitar) => part.sweep(prices.parts[guitar]!)),
  );
  const { leave, open } = chosenCosts(prices, allows);
  const left = mostTaken(leave, most);
  const opened = mostTaken(open, most);
  let value = played + sum(prices.kept) - sum(prices.hold);
  for (const song of left) value += leave[song]!;
  for (const slot of opened) value += open[slot]!;

  const did = new Float64Array(list.length);
  const counts = pricesIn(did, songs, parts.length);
  for (const [guitar, part] of parts.entries())
    part.trace(prices.parts[guitar]!, guitar === first ? "first" : "later", counts.parts[guitar]!);
  const lack = did;
  for (let song = 0; song < songs; song += 1) {
    counts.kept[song] = 1 - counts.kept[song]!;
    counts.moved[song] = -counts.moved[song]!;
  }
  for (const song of left) {
    counts.kept[song]! -= 1;
    counts.moved[song]! += 1;
    for (const { pass } of counts.parts) pass[song]! -= 1;
  }
  for (let slot = 0; slot <= songs; slot += 1) {
    counts.inserted[slot] = -counts.inserted[slot]!;
    counts.hold[slot]! -= 1;
  }
  for (const slot of opened) {
    counts.inserted[slot]! += 1;
    counts.hold[slot]! += 1;
    for (const { open: openedBy } of counts.parts) openedBy[slot]! -= 1;
  }
  for (let i = freePrices(songs, parts.length); i < lack.length; i += 1)
    if (list[i] === 0 && lack[i]! < 0) lack[i] = 0;
  return { value, lack, leave, left };
}

/** Holds songs in their places that no plan cheaper than `target` moves, as the prices tell; whether there are any. */
function holdInPlace(
  { value, leave, left }: { value: number; leave: Float64Array; left: number[] },
  { target, most, allows }: { target: number; most: number; allows: Uint8Array },
): boolean {
  const songs = leave.length;
  const dropped = left.length === most ? leave[left[most - 1]!]! : 0;
  let held = false;
  for (let song = 0; song < songs; song += 1) {
    if (leave[song] === Number.POSITIVE_INFINITY || left.includes(song)) continue;
    if (value - dropped + leave[song]! <= target * (1 + CLEARLY)) continue;
    for (let slot = 0; slot <= songs; slot += 1) allows[slot * songs + song] = 0;
    held = true;
  }
  return held;
}

export function keptOrderPrices(
  model: Model,
  rules: OrderRules,
  { target, rounds }: { target: number | null; rounds: number },
): KeptOrderPrices {
  const { songs, guitars } = model;
  const most = model.problem.maxMoved!;
  const allows = moveSlots(rules, most);
  const parts = Array.from({ length: guitars }, (_, guitar) => keptOrderPart(model, guitar, most, allows));
  const list = raisePrices(
    new Float64Array(freePrices(songs, guitars) + (songs + 1) * 2),
    (tried) => {
      const found = relax(parts, tried, songs, most, allows);
      if (target !== null) holdInPlace(found, { target, most, allows });
      return found;
    },
    { target: target ?? songs * gapCost(model, LONG_GAP, 0), rounds, free: freePrices(songs, guitars) },
  );
  const prices = pricesIn(list, songs, guitars);
  for (const [guitar, part] of parts.entries()) part.sweep(prices.parts[guitar]!);
  const { leave, open } = chosenCosts(prices, allows);
  return {
    parts,
    prices,
    staying: sumsFrom(prices.kept),
    holding: sumsFrom(prices.hold),
    leaving: chosen(leave, most),
    opening: chosen(open, most),
  };
}

/** The bound before the first song. */
export function startingValue(
  model: Model,
  { parts, prices, staying, holding, leaving, opening }: KeptOrderPrices,
): number {
  const starts = parts.map((part, guitar) => part.sweep(prices.parts[guitar]!));
  const most = model.problem.maxMoved!;
  return firstGuitar(starts).value + staying[0]! - holding[0]! + leaving.least[most]! + opening.least[most]!;
}
