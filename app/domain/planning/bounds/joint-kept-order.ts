import {
  type Joint,
  jointOf,
  stepOf,
  type Target,
  targetOf,
} from "#app/domain/planning/bounds/joint-states.ts";
import { type Model, type Option, UNUSED } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import type { Priced } from "#app/domain/planning/search/raise-prices.ts";
import { stepCost } from "#app/domain/planning/step-cost.ts";

/** One way to play a song, with the target it shares with all that bring about the same under the same cover. */
type Way = { song: number; option: Option; target: number };

/** Where a walk through the present order stands, `joint` being the necks and the guitar in hand. */
type Stand = { followed: number; inserted: number; skipped: number; joint: number };

/**
 * A walk through the present order with all guitars followed together: at each point the next song is kept, or skipped at
 * its price, or some other song is inserted, which earns its price. At most `most` songs are skipped and as many inserted;
 * nothing sees to it that what is inserted is what was skipped but the prices.
 */
export type KeptOrderWalk = {
  /** Least cost from each point on, at `cell(…) + joint state`. */
  least: Float64Array;
  cell(followed: number, inserted: number, skipped: number): number;
  /** Fills `least` for some prices. */
  sweep(prices: Float64Array): void;
  /** The least cost of the whole walk, and of each song how much more often it was skipped than inserted. */
  relax(prices: Float64Array): Priced;
};

/** The targets that songs have together, and for each song its ways. */
function targetsOf(model: Model, joint: Joint): { targets: Target[]; ways: Way[][] } {
  const targets: Target[] = [];
  const numbers = new Map<string, number>();
  const ways = model.options.map((options, song) =>
    options.map((option): Way => {
      const key = `${option.guitar} ${option.neck} ${model.cover[song]}`;
      const target = numbers.get(key) ?? targets.length;
      if (target === targets.length) {
        numbers.set(key, target);
        targets.push(targetOf(model, joint, [{ ...stepOf(model, song, option), penalty: 0 }]));
      }
      return { song, option, target };
    }),
  );
  return { targets, ways };
}

/** Cells that a walk keeps, and the steps that one sweep takes. */
export function walkSize(model: Model, joint: Joint, most: number): { cells: number; steps: number } {
  const cells = (model.songs + 1) * (most + 1) ** 2 * joint.count;
  const targets = new Set(
    model.options.flatMap((options, song) =>
      options.map(({ guitar, neck }) => `${guitar} ${neck} ${model.cover[song]}`),
    ),
  ).size;
  return { cells, steps: cells * (targets + 3) };
}

export function keptOrderWalk(model: Model, rules: OrderRules, joint: Joint, most: number): KeptOrderWalk {
  const { songs } = model;
  const counts = most + 1;
  const { targets, ways } = targetsOf(model, joint);
  const byTarget = targets.map((_, target) => ways.flat().filter((way) => way.target === target));
  const least = new Float64Array(walkSize(model, joint, most).cells);
  const cell = (followed: number, inserted: number, skipped: number) =>
    ((followed * counts + inserted) * counts + skipped) * joint.count;
  const fits = (song: number, place: number) =>
    place >= rules.earliest[song]! && place <= rules.latest[song]!;

  /** For each place and target the song that is cheapest to insert, and its penalty less its price. */
  const cheapest = new Float64Array(songs * targets.length);
  const cheapestSong = new Int32Array(songs * targets.length);
  function priceInsertions(prices: Float64Array): void {
    cheapest.fill(Number.POSITIVE_INFINITY);
    for (let place = 0; place < songs; place += 1)
      for (const [t, list] of byTarget.entries())
        for (const { song, option } of list) {
          const cost = option.penalty - prices[song]!;
          const at = place * targets.length + t;
          if (cost >= cheapest[at]! || !fits(song, place)) continue;
          cheapest[at] = cost;
          cheapestSong[at] = song;
        }
  }

  function offer(here: number, there: number, { costs, next }: Target, more: number): void {
    for (let j = 0; j < joint.count; j += 1) {
      const cost = costs[j]! + more + least[there + next[j]!]!;
      if (cost < least[here + j]!) least[here + j] = cost;
    }
  }

  function fill(prices: Float64Array, followed: number, inserted: number, skipped: number): void {
    const here = cell(followed, inserted, skipped);
    const place = followed - skipped + inserted;
    least.fill(followed === songs ? 0 : Number.POSITIVE_INFINITY, here, here + joint.count);
    if (place < 1 || place > songs) return;
    if (followed < songs && skipped < most) {
      const there = cell(followed + 1, inserted, skipped + 1);
      for (let j = 0; j < joint.count; j += 1) least[here + j] = prices[followed]! + least[there + j]!;
    }
    if (followed < songs && fits(followed, place))
      for (const { target, option } of ways[followed]!)
        offer(here, cell(followed + 1, inserted, skipped), targets[target]!, option.penalty);
    if (inserted < most && place < songs)
      for (const [t, target] of targets.entries()) {
        const more = cheapest[place * targets.length + t]!;
        if (more < Number.POSITIVE_INFINITY) offer(here, cell(followed, inserted + 1, skipped), target, more);
      }
  }

  function sweep(prices: Float64Array): void {
    priceInsertions(prices);
    for (let followed = songs; followed >= 0; followed -= 1)
      for (let inserted = most; inserted >= 0; inserted -= 1)
        for (let skipped = most; skipped >= 0; skipped -= 1) fill(prices, followed, inserted, skipped);
  }

  /** The least cost of all from before the first song, what is skipped before it, and where the walk then stands. */
  function begin(prices: Float64Array, lack: Float64Array): { value: number; stand: Stand } | null {
    let best: { value: number; stand: Stand; song: number } | null = null;
    let before = 0;
    for (let skipped = 0; skipped <= Math.min(most, songs - 1); skipped += 1) {
      for (const { song, option } of ways.flat()) {
        const inserted = song === skipped ? 0 : 1;
        if (!fits(song, 0) || inserted > most) continue;
        const { guitar, neck, penalty } = option;
        const from = model.start[guitar]!;
        const first = stepCost(
          model,
          guitar,
          from,
          neck,
          model.cover[song]!,
          true,
          true,
          Number.POSITIVE_INFINITY,
        );
        const necks = (other: number) => (other === guitar ? neck : (model.start[other] ?? UNUSED));
        const stand = {
          followed: skipped + 1 - inserted,
          inserted,
          skipped,
          joint: jointOf(joint, necks, guitar),
        };
        const after = least[cell(stand.followed, inserted, skipped) + stand.joint]!;
        const value = before + first + penalty - inserted * prices[song]! + after;
        if (!best || value < best.value) best = { value, stand, song };
      }
      before += prices[skipped]!;
    }
    if (!best || best.value === Number.POSITIVE_INFINITY) return null;
    for (let song = 0; song < best.stand.skipped; song += 1) lack[song]! += 1;
    if (best.stand.inserted === 1) lack[best.song]! -= 1;
    return best;
  }

  /** The next stand of the cheapest walk; null at its end. */
  function goOn(prices: Float64Array, lack: Float64Array, stand: Stand): Stand | null {
    const { followed, inserted, skipped, joint: at } = stand;
    const value = least[cell(followed, inserted, skipped) + at]!;
    const place = followed - skipped + inserted;
    if (followed < songs && skipped < most) {
      const passed = least[cell(followed + 1, inserted, skipped + 1) + at]! + prices[followed]!;
      if (passed === value) {
        lack[followed]! += 1;
        return { followed: followed + 1, inserted, skipped: skipped + 1, joint: at };
      }
    }
    if (followed < songs && fits(followed, place))
      for (const { target, option } of ways[followed]!) {
        const { costs, next } = targets[target]!;
        const there = cell(followed + 1, inserted, skipped) + next[at]!;
        if (costs[at]! + option.penalty + least[there]! === value)
          return { followed: followed + 1, inserted, skipped, joint: next[at]! };
      }
    if (inserted < most && place < songs)
      for (const [t, { costs, next }] of targets.entries()) {
        const more = cheapest[place * targets.length + t]!;
        if (costs[at]! + more + least[cell(followed, inserted + 1, skipped) + next[at]!]! !== value) continue;
        lack[cheapestSong[place * targets.length + t]!]! -= 1;
        return { followed, inserted: inserted + 1, skipped, joint: next[at]! };
      }
    return null;
  }

  function relax(prices: Float64Array): Priced {
    sweep(prices);
    const lack = new Float64Array(songs);
    const begun = begin(prices, lack);
    if (!begun) return { value: Number.POSITIVE_INFINITY, lack };
    for (let stand: Stand | null = begun.stand; stand; ) stand = goOn(prices, lack, stand);
    return { value: begun.value, lack };
  }

  return { least, cell, sweep, relax };
}
