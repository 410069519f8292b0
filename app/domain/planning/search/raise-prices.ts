/** What a relaxed problem gives for some prices: its least cost, and by how much each demand is missed or overfilled. */
export type Priced = { value: number; lack: Float64Array };

/** How much of the last direction is kept: it damps the zigzag of plain subgradients. */
const STEADINESS = 0.85;
const PATIENCE = 15;

/**
 * Prices that make a Lagrangian bound high: raised where a demand lacks, lowered where it is overfilled, by deflected
 * subgradient steps of Polyak's length. The bound holds for any prices, so that rounding or stopping early does no harm.
 *
 * @param start prices to start from
 * @param relax solves the relaxed problem for some prices
 * @param target value that the bound cannot exceed, such as the cost of a known solution
 * @param free how many of the prices may be negative; the rest, at the end, are kept at 0 or more
 * @returns the best prices met
 */
export function raisePrices(
  start: Float64Array,
  relax: (prices: Float64Array) => Priced,
  { target, rounds, free }: { target: number; rounds: number; free: number },
): Float64Array {
  const prices = start.slice();
  const heading = new Float64Array(prices.length);
  let best = { value: Number.NEGATIVE_INFINITY, prices: prices.slice() };
  let pace = 1;
  let stale = 0;
  for (let round = 0; round < rounds; round += 1) {
    const { value, lack } = relax(prices);
    stale = value > best.value ? 0 : stale + 1;
    if (value > best.value) best = { value, prices: prices.slice() };
    if (value >= target || lack.every((by) => by === 0)) break;
    if (stale === PATIENCE) {
      pace /= 2;
      stale = 0;
      prices.set(best.prices);
      heading.fill(0);
    }
    let length = 0;
    for (let i = 0; i < prices.length; i += 1) {
      heading[i] = lack[i]! + STEADINESS * heading[i]!;
      length += heading[i]! ** 2;
    }
    const step = (pace * (target - value)) / Math.max(length, 1e-9);
    for (let i = 0; i < prices.length; i += 1) {
      prices[i]! += step * heading[i]!;
      if (i >= free && prices[i]! < 0) prices[i] = 0;
    }
  }
  return best.prices;
}
