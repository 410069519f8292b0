import type { Model } from "#app/domain/planning/model.ts";
import { stepCost } from "#app/domain/planning/step-cost.ts";

/** A tech is never late in a bound. */
const ENOUGH = Number.POSITIVE_INFINITY;

type Way = { song: number; place: number; penalty: number };
/** Ways that bring the guitar to the same neck under the same cover: they differ in price and penalty alone. */
type Insertion = { place: number; cover: number; ways: Way[] };

/**
 * One guitar in a set of which at most `most` songs may leave the present order. A state says how far the present order
 * has been followed, how many songs have been inserted by this guitar and how many skipped, the guitar's neck, and
 * whether it played the song before.
 */
export type KeptOrderPart = {
  places: Map<number, number>;
  most: number;
  /** Least cost from each state on, see `stateOf`. */
  least: Float64Array;
  stateOf(followed: number, inserted: number, skipped: number, place: number, hand: number): number;
  /** Fills `least` for prices that each song pays when it is played, and one that each insertion costs. */
  sweep(prices: Float64Array, insertionPrice: number): void;
  /** Follows the cheapest way from the beginning: takes off what songs lack, adds to what insertions lack of being few. */
  trace(prices: Float64Array, insertionPrice: number, lack: Float64Array): void;
};

/**
 * Steps that one sweep over all guitars takes, about: what a bound made of these parts costs for each round.
 */
export function sweepSteps(model: Model, most: number): number {
  let steps = 0;
  for (let guitar = 0; guitar < model.guitars; guitar += 1) {
    const own = model.options.flatMap((options, song) =>
      options.filter((option) => option.guitar === guitar).map(({ neck }) => ({ neck, song })),
    );
    const necks = new Set(own.map(({ neck }) => neck)).size + 1;
    const insertions = new Set(own.map(({ neck, song }) => `${neck} ${model.cover[song]}`)).size;
    steps += (model.songs + 1) * (most + 1) ** 2 * necks * (insertions * 2 + 4);
  }
  return steps;
}

export function keptOrderPart(model: Model, guitar: number, most: number): KeptOrderPart {
  const { songs } = model;
  const ways = model.options.map((options, song) =>
    options
      .filter((option) => option.guitar === guitar)
      .map(({ neck, penalty }) => ({ song, neck, penalty })),
  );
  const necks = [...new Set([...ways.flat().map(({ neck }) => neck), model.start[guitar]!])];
  const places = new Map(necks.map((neck, place) => [neck, place]));
  const rows = necks.length;
  const counts = most + 1;
  const kept = ways.map((list) =>
    list.map(({ song, neck, penalty }): Way => ({ song, place: places.get(neck)!, penalty })),
  );
  const insertions: Insertion[] = [];
  for (const way of kept.flat()) {
    const cover = model.cover[way.song]!;
    const known = insertions.find((other) => other.place === way.place && other.cover === cover);
    if (known) known.ways.push(way);
    else insertions.push({ place: way.place, cover, ways: [way] });
  }

  const step = (from: number, to: number, cover: number, hand: number, first: boolean) =>
    stepCost(model, guitar, necks[from]!, necks[to]!, cover, first, hand === 0, ENOUGH);
  const insertionStep = new Float64Array(rows * 2 * insertions.length);
  for (let place = 0; place < rows; place += 1)
    for (let hand = 0; hand < 2; hand += 1)
      for (const [i, { place: to, cover }] of insertions.entries())
        insertionStep[(place * 2 + hand) * insertions.length + i] = step(place, to, cover, hand, false);
  const mostWays = Math.max(1, ...kept.map((list) => list.length));
  const keptStep = new Float64Array(songs * rows * 2 * mostWays);
  for (const [song, list] of kept.entries())
    for (let place = 0; place < rows; place += 1)
      for (let hand = 0; hand < 2; hand += 1)
        for (const [w, way] of list.entries())
          keptStep[((song * rows + place) * 2 + hand) * mostWays + w] =
            step(place, way.place, model.cover[song]!, hand, false) + way.penalty;

  const stateOf = (followed: number, inserted: number, skipped: number, place: number, hand: number) =>
    (((followed * counts + inserted) * counts + skipped) * rows + place) * 2 + hand;
  const least = new Float64Array((songs + 1) * counts * counts * rows * 2);
  const insertionPlace = Int32Array.from(insertions, ({ place }) => place);
  const cheapestCost = new Float64Array(insertions.length);
  const cheapestSong = new Int32Array(insertions.length);

  function priceInsertions(prices: Float64Array, insertionPrice: number): void {
    for (const [i, insertion] of insertions.entries()) {
      let best = { cost: Number.POSITIVE_INFINITY, song: 0 };
      for (const { song, penalty } of insertion.ways) {
        const cost = penalty - prices[song]! + insertionPrice;
        if (cost < best.cost) best = { cost, song };
      }
      cheapestCost[i] = best.cost;
      cheapestSong[i] = best.song;
    }
  }

  type Taken = { value: number; song: number; insertion: boolean; next: number };

  /** The cheapest thing to do in one state; where `taken` is given, what it is. */
  function best(
    prices: Float64Array,
    followed: number,
    inserted: number,
    skipped: number,
    place: number,
    hand: number,
    taken: Taken | null,
  ): number {
    let value = followed === songs ? 0 : Number.POSITIVE_INFINITY;
    const take = (cost: number, song: number, insertion: boolean, next: number) => {
      value = cost;
      if (taken) Object.assign(taken, { value: cost, song, insertion, next });
    };
    if (taken) Object.assign(taken, { value, song: -1, insertion: false, next: -1 });
    const ground = inserted === 0 && skipped === 0 && followed === 0;
    if (hand === 1) {
      const laidAside = stateOf(followed, inserted, skipped, place, 0);
      if (least[laidAside]! < value) take(least[laidAside]!, -1, false, laidAside);
    }
    if (followed < songs) {
      const left = stateOf(followed + 1, inserted, skipped, place, 0);
      if (least[left]! < value) take(least[left]!, -1, false, left);
      if (skipped < most) {
        const passed = stateOf(followed + 1, inserted, skipped + 1, place, hand);
        if (least[passed]! < value) take(least[passed]!, -1, false, passed);
      }
      const from = ((followed * rows + place) * 2 + hand) * mostWays;
      const list = kept[followed]!;
      for (let w = 0; w < list.length; w += 1) {
        const way = list[w]!;
        const next = stateOf(followed + 1, inserted, skipped, way.place, 1);
        const going = ground
          ? step(place, way.place, model.cover[followed]!, 0, true) + way.penalty
          : keptStep[from + w]!;
        const cost = going - prices[followed]! + least[next]!;
        if (cost < value) take(cost, followed, false, next);
      }
    }
    if (inserted < most) {
      const from = (place * 2 + hand) * insertions.length;
      for (let i = 0; i < insertions.length; i += 1) {
        const insertion = insertions[i]!;
        const next = stateOf(followed, inserted + 1, skipped, insertion.place, 1);
        const going = ground
          ? step(place, insertion.place, insertion.cover, 0, true)
          : insertionStep[from + i]!;
        const cost = going + cheapestCost[i]! + least[next]!;
        if (cost < value) take(cost, cheapestSong[i]!, true, next);
      }
    }
    return value;
  }

  /** Fills one neck's two states where the set has been followed and counted so far; not for the very first song. */
  function fill(
    prices: Float64Array,
    followed: number,
    inserted: number,
    skipped: number,
    place: number,
  ): void {
    const at = stateOf(followed, inserted, skipped, place, 0);
    const leave = followed < songs ? least[stateOf(followed + 1, inserted, skipped, place, 0)]! : 0;
    let resting = leave;
    let inHand = leave;
    if (followed < songs) {
      if (skipped < most) {
        const passed = stateOf(followed + 1, inserted, skipped + 1, place, 0);
        resting = Math.min(resting, least[passed]!);
        inHand = Math.min(inHand, least[passed + 1]!);
      }
      const list = kept[followed]!;
      const from = (followed * rows + place) * 2 * mostWays;
      for (let w = 0; w < list.length; w += 1) {
        const next = stateOf(followed + 1, inserted, skipped, list[w]!.place, 1);
        const rest = least[next]! - prices[followed]!;
        const picked = keptStep[from + w]! + rest;
        const stayed = keptStep[from + mostWays + w]! + rest;
        if (picked < resting) resting = picked;
        if (stayed < inHand) inHand = stayed;
      }
    }
    if (inserted < most) {
      const from = place * 2 * insertions.length;
      const base = stateOf(followed, inserted + 1, skipped, 0, 1);
      for (let i = 0; i < insertions.length; i += 1) {
        const rest = cheapestCost[i]! + least[base + insertionPlace[i]! * 2]!;
        const picked = insertionStep[from + i]! + rest;
        const stayed = insertionStep[from + insertions.length + i]! + rest;
        if (picked < resting) resting = picked;
        if (stayed < inHand) inHand = stayed;
      }
    }
    least[at] = resting;
    least[at + 1] = Math.min(inHand, resting);
  }

  function sweep(prices: Float64Array, insertionPrice: number): void {
    priceInsertions(prices, insertionPrice);
    for (let followed = songs; followed >= 0; followed -= 1)
      for (let inserted = most; inserted >= 0; inserted -= 1)
        for (let skipped = most; skipped >= 0; skipped -= 1)
          for (let place = 0; place < rows; place += 1) fill(prices, followed, inserted, skipped, place);
    for (let place = 0; place < rows; place += 1)
      for (let hand = 0; hand < 2; hand += 1)
        least[stateOf(0, 0, 0, place, hand)] = best(prices, 0, 0, 0, place, hand, null);
  }

  function trace(prices: Float64Array, insertionPrice: number, lack: Float64Array): void {
    priceInsertions(prices, insertionPrice);
    const taken: Taken = { value: 0, song: -1, insertion: false, next: -1 };
    let state = stateOf(0, 0, 0, places.get(model.start[guitar]!)!, 0);
    while (state !== -1) {
      const hand = state % 2;
      const place = Math.floor(state / 2) % rows;
      const outer = Math.floor(state / 2 / rows);
      best(
        prices,
        Math.floor(outer / counts / counts),
        Math.floor(outer / counts) % counts,
        outer % counts,
        place,
        hand,
        taken,
      );
      if (taken.song >= 0) lack[taken.song]! -= 1;
      if (taken.insertion) lack[songs]! += 1;
      state = taken.next;
    }
  }

  return { places, most, least, stateOf, sweep, trace };
}
