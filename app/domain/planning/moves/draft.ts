import type { Model } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import type { Random } from "#app/domain/planning/search/random.ts";

/** A plan that is being changed: songs in order, and for each song number which of its options it takes. */
export type Draft = { songs: Int32Array; ways: Int32Array; model: Model; rules: OrderRules };

/** Changes a draft in place; false where there was nothing to change. Rules may be broken: who uses it looks. */
export type Move = (draft: Draft, random: Random) => boolean;

/** Takes `length` songs out at `from` and puts them in so that they begin at `to`. */
export function shift(songs: Int32Array, from: number, length: number, to: number): void {
  const block = songs.slice(from, from + length);
  if (to > from) songs.copyWithin(from, from + length, to + length);
  else songs.copyWithin(to + length, to, from);
  songs.set(block, to);
}
