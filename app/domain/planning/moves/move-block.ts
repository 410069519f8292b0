import type { Move } from "#app/domain/planning/moves/draft.ts";
import { below } from "#app/domain/planning/search/random.ts";

const LONGEST = 4;

/** Takes one song, or a few in a row, out and puts them in somewhere else. */
export const moveBlock: Move = ({ songs }, random) => {
  const count = songs.length;
  if (count < 2) return false;
  const length = 1 + (random() < 0.5 ? 0 : below(random, Math.min(LONGEST, count - 1)));
  const from = below(random, count - length + 1);
  const to = below(random, count - length + 1);
  if (from === to) return false;
  const block = songs.slice(from, from + length);
  if (to > from) songs.copyWithin(from, from + length, to + length);
  else songs.copyWithin(to + length, to, from);
  songs.set(block, to);
  return true;
};
