import { type Move, shift } from "#app/domain/planning/moves/draft.ts";
import { below } from "#app/domain/planning/search/random.ts";

const LONGEST = 4;

/** Takes one song, or a few in a row, out and puts them in somewhere else; songs that lead into each other stay together. */
export const moveBlock: Move = ({ songs, rules }, random) => {
  const count = songs.length;
  let from = below(random, count);
  let end = from + 1 + (random() < 0.5 ? 0 : below(random, LONGEST));
  end = Math.min(end, count);
  while (from > 0 && rules.previous[songs[from]!] === songs[from - 1]) from -= 1;
  while (end < count && rules.next[songs[end - 1]!] === songs[end]) end += 1;
  const length = end - from;
  if (length === count) return false;
  const to = below(random, count - length + 1);
  if (to === from) return false;
  shift(songs, from, length, to);
  return true;
};
