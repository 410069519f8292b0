import type { Move } from "#app/domain/planning/moves/draft.ts";
import { below } from "#app/domain/planning/search/random.ts";

/** Two songs change places. */
export const swapSongs: Move = ({ songs }, random) => {
  const a = below(random, songs.length);
  const b = below(random, songs.length);
  if (a === b) return false;
  const kept = songs[a]!;
  songs[a] = songs[b]!;
  songs[b] = kept;
  return true;
};
