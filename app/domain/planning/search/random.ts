/** A repeatable stream of numbers from 0 up to 1. */
export type Random = () => number;

/**
 * The stream that a seed gives, the same on every machine (mulberry32, Tommy Ettinger, 2017, public domain).
 *
 * @example seededRandom(1)() === seededRandom(1)() // true
 */
export function seededRandom(seed: number): Random {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

/** A whole number from 0 up to, not including, `count`. */
export function below(random: Random, count: number): number {
  return Math.floor(random() * count);
}
