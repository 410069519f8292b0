import type { Model } from "#app/domain/planning/model.ts";
import { stepCost } from "#app/domain/planning/step-cost.ts";

/** A tech is never late in a bound. */
const ENOUGH = Number.POSITIVE_INFINITY;

/**
 * How a guitar stands where it comes to a slot: laid aside, or in hand since the kept song before. And how in a slot that
 * has been opened: in hand since it inserted a song there, or laid aside.
 */
export const RESTING = 0;
export const HELD = 1;
export const INSERTED = 2;
export const OPENED = 3;
const HANDS = 4;

/** What one guitar pays and earns; a number for each song or each slot. */
export type PartPrices = {
  /** Earned for playing a song at its place. */
  kept: Float64Array;
  /** Earned for playing a song elsewhere. */
  moved: Float64Array;
  /** Earned for each song that is inserted in a slot. */
  inserted: Float64Array;
  /** Paid for passing over a song that moved. */
  pass: Float64Array;
  /** Paid for going through a slot that is opened. */
  open: Float64Array;
  /** Paid for staying in hand across a slot that is not. */
  hold: Float64Array;
};

/** How often a guitar's cheapest way does each of these. */
export type PartCounts = PartPrices;

type Way = { song: number; place: number; penalty: number };
/** Ways that bring the guitar to the same neck under the same cover: they differ in price and penalty alone. */
type Insertion = { place: number; cover: number; ways: Way[] };

/**
 * One guitar in a set of which at most `most` songs may leave the present order. A state says how far the present order
 * has been followed, how many songs have been inserted, the guitar's neck, and how it stands.
 */
export type KeptOrderPart = {
  places: Map<number, number>;
  /** Least cost from each state on, see `stateOf`. */
  least: Float64Array;
  stateOf(followed: number, inserted: number, place: number, hand: number): number;
  /** Fills `least`. Returns the least cost of the whole set, for this guitar playing its first song and not playing it. */
  sweep(prices: PartPrices): { first: number; later: number };
  /** Follows the cheapest way of the last sweep, and counts what it does. */
  trace(prices: PartPrices, plays: "first" | "later", counts: PartCounts): void;
};

/** @param allows see `moveSlots` */
export function keptOrderPart(model: Model, guitar: number, most: number, allows: Uint8Array): KeptOrderPart {
  const { songs } = model;
  const own = model.options.map((options) => options.filter((option) => option.guitar === guitar));
  const start = model.start[guitar]!;
  const necks = [...new Set([...own.flat().map(({ neck }) => neck), start])];
  const places = new Map(necks.map((neck, place) => [neck, place]));
  const rows = necks.length;
  const startPlace = places.get(start)!;
  const kept = own.map((list, song) =>
    list.map(({ neck, penalty }): Way => ({ song, place: places.get(neck)!, penalty })),
  );
  const insertions: Insertion[] = [];
  for (const way of kept.flat()) {
    const cover = model.cover[way.song]!;
    const known = insertions.find((other) => other.place === way.place && other.cover === cover);
    if (known) known.ways.push(way);
    else insertions.push({ place: way.place, cover, ways: [way] });
  }
  const kinds = insertions.length;

  const step = (from: number, to: number, cover: number, changing: boolean, first = false) =>
    stepCost(model, guitar, necks[from]!, necks[to]!, cover, first, changing, ENOUGH);
  const pickInsertion = new Float64Array(rows * kinds);
  const stayInsertion = new Float64Array(rows * kinds);
  for (let place = 0; place < rows; place += 1)
    for (const [i, { place: to, cover }] of insertions.entries()) {
      pickInsertion[place * kinds + i] = step(place, to, cover, true);
      stayInsertion[place * kinds + i] = step(place, to, cover, false);
    }
  const mostWays = Math.max(1, ...kept.map((list) => list.length));
  const wayCount = Int32Array.from(kept, (list) => list.length);
  const wayPlace = new Int32Array(songs * mostWays);
  const pickKept = new Float64Array(songs * rows * mostWays);
  const stayKept = new Float64Array(songs * rows * mostWays);
  for (const way of kept.flatMap((list) => list.map((way, w) => ({ ...way, w })))) {
    wayPlace[way.song * mostWays + way.w] = way.place;
    for (let place = 0; place < rows; place += 1) {
      const cell = (way.song * rows + place) * mostWays + way.w;
      const cover = model.cover[way.song]!;
      pickKept[cell] = step(place, way.place, cover, true) + way.penalty;
      stayKept[cell] = step(place, way.place, cover, false) + way.penalty;
    }
  }

  /** A song can be left to others only where another guitar can play it. */
  const leave = Float64Array.from(model.options, (options) =>
    options.some((option) => option.guitar !== guitar) ? 0 : Number.POSITIVE_INFINITY,
  );

  const stateOf = (followed: number, inserted: number, place: number, hand: number) =>
    ((followed * (most + 1) + inserted) * rows + place) * HANDS + hand;
  const least = new Float64Array((songs + 1) * (most + 1) * rows * HANDS);
  const insertionPlace = Int32Array.from(insertions, ({ place }) => place);
  const cheapest = new Float64Array((songs + 1) * kinds);
  const cheapestSong = new Int32Array((songs + 1) * kinds);

  function priceInsertions({ moved, inserted }: PartPrices): void {
    for (let slot = 0; slot <= songs; slot += 1)
      for (let i = 0; i < kinds; i += 1) {
        let cost = Number.POSITIVE_INFINITY;
        let song = -1;
        for (const way of insertions[i]!.ways) {
          if (allows[slot * songs + way.song] === 0) continue;
          const price = way.penalty - moved[way.song]! - inserted[slot]!;
          if (price < cost) {
            cost = price;
            song = way.song;
          }
        }
        cheapest[slot * kinds + i] = cost;
        cheapestSong[slot * kinds + i] = song;
      }
  }

  function fill(prices: PartPrices, followed: number, inserted: number, place: number): void {
    const at = stateOf(followed, inserted, place, 0);
    const rowSize = rows * HANDS;
    let rests = 0;
    let stays = 0;
    if (followed < songs) {
      const next = at + (most + 1) * rowSize;
      const nextRow = next - place * HANDS + HELD;
      const pass = prices.pass[followed]!;
      const left = least[next + RESTING]! + leave[followed]!;
      rests = Math.min(left, least[next + RESTING]! + pass);
      stays = Math.min(left, least[next + HELD]! + pass);
      const price = prices.kept[followed]!;
      const from = (followed * rows + place) * mostWays;
      for (let w = 0; w < wayCount[followed]!; w += 1) {
        const rest = least[nextRow + wayPlace[followed * mostWays + w]! * HANDS]! - price;
        const picked = pickKept[from + w]! + rest;
        const stayed = stayKept[from + w]! + rest;
        if (picked < rests) rests = picked;
        if (stayed < stays) stays = stayed;
      }
    }
    let pick = Number.POSITIVE_INFINITY;
    let stay = Number.POSITIVE_INFINITY;
    if (inserted < most) {
      const base = at - place * HANDS + rowSize + INSERTED;
      for (let i = 0; i < kinds; i += 1) {
        const rest = cheapest[followed * kinds + i]! + least[base + insertionPlace[i]! * HANDS]!;
        const picked = pickInsertion[place * kinds + i]! + rest;
        const stayed = stayInsertion[place * kinds + i]! + rest;
        if (picked < pick) pick = picked;
        if (stayed < stay) stay = stayed;
      }
    }
    const open = prices.open[followed]!;
    const opened = Math.min(rests, pick);
    least[at + OPENED] = opened;
    least[at + RESTING] = Math.min(rests, opened + open);
    least[at + HELD] = Math.min(stays + prices.hold[followed]!, stay + open, opened + open);
    least[at + INSERTED] = Math.min(stays, stay, opened);
  }

  /** The cheapest way to play the set's very first song on this guitar, after passing over those before it. */
  function firstSong(prices: PartPrices): { cost: number; song: number; moved: boolean; next: number } {
    let best = { cost: Number.POSITIVE_INFINITY, song: -1, moved: false, next: -1 };
    let passed = 0;
    for (let song = 0; song <= most && song < songs; song += 1) {
      for (const way of kept[song]!) {
        const next = stateOf(song + 1, 0, way.place, HELD);
        const going = step(startPlace, way.place, model.cover[song]!, false, true) + way.penalty;
        const cost = passed + going - prices.kept[song]! + least[next]!;
        if (cost < best.cost) best = { cost, song, moved: false, next };
      }
      passed += prices.pass[song]!;
    }
    for (const [i, { place, cover }] of insertions.entries()) {
      const song = cheapestSong[i]!;
      if (song === -1) continue;
      const next = stateOf(0, 1, place, INSERTED);
      const going = step(startPlace, place, cover, false, true) + cheapest[i]!;
      const cost = going + prices.open[0]! + least[next]!;
      if (cost < best.cost) best = { cost, song, moved: true, next };
    }
    return best;
  }

  function sweep(prices: PartPrices): { first: number; later: number } {
    priceInsertions(prices);
    for (let followed = songs; followed >= 0; followed -= 1)
      for (let inserted = most; inserted >= 0; inserted -= 1)
        for (let place = 0; place < rows; place += 1) fill(prices, followed, inserted, place);
    return { first: firstSong(prices).cost, later: least[stateOf(0, 0, startPlace, RESTING)]! };
  }

  /** Goes one step on from a state, as its least cost says; counts what that is; -1 at the end. */
  function follow(prices: PartPrices, state: number, counts: PartCounts): number {
    const hand = state % HANDS;
    const place = Math.floor(state / HANDS) % rows;
    const outer = Math.floor(state / HANDS / rows);
    const followed = Math.floor(outer / (most + 1));
    const inserted = outer % (most + 1);
    const value = least[state]!;
    const inHand = hand === HELD || hand === INSERTED;
    const hold = hand === HELD ? prices.hold[followed]! : 0;
    if (followed === songs && value === hold) {
      if (hand === HELD) counts.hold[followed]! += 1;
      return -1;
    }
    if (followed < songs) {
      const held = hand === HELD ? 1 : 0;
      const left = stateOf(followed + 1, inserted, place, RESTING);
      if (least[left]! + leave[followed]! + hold === value) {
        counts.hold[followed]! += held;
        return left;
      }
      const passed = inHand ? stateOf(followed + 1, inserted, place, HELD) : left;
      if (least[passed]! + prices.pass[followed]! + hold === value) {
        counts.hold[followed]! += held;
        counts.pass[followed]! += 1;
        return passed;
      }
      const steps = inHand ? stayKept : pickKept;
      for (let w = 0; w < wayCount[followed]!; w += 1) {
        const next = stateOf(followed + 1, inserted, wayPlace[followed * mostWays + w]!, HELD);
        const rest = least[next]! - prices.kept[followed]!;
        if (steps[(followed * rows + place) * mostWays + w]! + rest + hold !== value) continue;
        counts.hold[followed]! += held;
        counts.kept[followed]! += 1;
        return next;
      }
    }
    const opens = hand === RESTING || hand === HELD;
    const open = opens ? prices.open[followed]! : 0;
    if (opens) counts.open[followed]! += 1;
    const steps = inHand ? stayInsertion : pickInsertion;
    for (let i = 0; inserted < most && i < kinds; i += 1) {
      const next = stateOf(followed, inserted + 1, insertionPlace[i]!, INSERTED);
      const rest = cheapest[followed * kinds + i]! + least[next]!;
      if (steps[place * kinds + i]! + rest + open !== value) continue;
      counts.inserted[followed]! += 1;
      counts.moved[cheapestSong[followed * kinds + i]!]! += 1;
      return next;
    }
    return hand === OPENED ? -1 : stateOf(followed, inserted, place, OPENED);
  }

  function trace(prices: PartPrices, plays: "first" | "later", counts: PartCounts): void {
    let state = stateOf(0, 0, startPlace, RESTING);
    if (plays === "first") {
      const { song, moved, next } = firstSong(prices);
      if (next === -1) return;
      if (moved) {
        counts.open[0]! += 1;
        counts.inserted[0]! += 1;
        counts.moved[song]! += 1;
      } else {
        counts.kept[song]! += 1;
        for (let passed = 0; passed < song; passed += 1) counts.pass[passed]! += 1;
      }
      state = next;
    }
    while (state !== -1) state = follow(prices, state, counts);
  }

  return { places, least, stateOf, sweep, trace };
}
