import type { Move } from "#app/domain/planning/moves/draft.ts";
import { below } from "#app/domain/planning/search/random.ts";

/** Songs in a row are played in the opposite order. */
export const turnBlock: Move = ({ songs }, random) => {
  const a = below(random, songs.length);
  const b = below(random, songs.length);
  if (a === b) return false;
  songs.subarray(Math.min(a, b), Math.max(a, b) + 1).reverse();
  return true;
};
