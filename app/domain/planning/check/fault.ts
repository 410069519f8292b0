/** One thing that is wrong with an answer: where in it, and what. */
export type Fault = { path: string; message: string };

/** Numbers of the contract compare with a relative tolerance of one in a million. */
export function same(a: number, b: number): boolean {
  return Math.abs(a - b) <= 1e-6 * Math.max(1, Math.abs(a), Math.abs(b));
}
