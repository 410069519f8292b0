import type { Move } from "#app/domain/planning/moves/draft.ts";
import { below } from "#app/domain/planning/search/random.ts";

const LONGEST = 6;

/** A few songs in a row are played on one guitar, those that can be. */
export const changeRun: Move = ({ songs, ways, model }, random) => {
  const from = below(random, songs.length);
  const end = Math.min(songs.length, from + 2 + below(random, LONGEST - 1));
  const guitar = below(random, model.guitars);
  let changed = false;
  for (let position = from; position < end; position += 1) {
    const song = songs[position]!;
    const options = model.options[song]!;
    if (options[ways[song]!]!.guitar === guitar) continue;
    const way = options.findIndex((option) => option.guitar === guitar);
    if (way === -1) continue;
    ways[song] = way;
    changed = true;
  }
  return changed;
};
