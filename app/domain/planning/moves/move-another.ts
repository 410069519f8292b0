import { type Move, shift } from "#app/domain/planning/moves/draft.ts";
import { below } from "#app/domain/planning/search/random.ts";

/** Songs outside a longest run that follows the present order, in which songs are numbered. */
function movedSongs(songs: Int32Array): number[] {
  const length = new Int32Array(songs.length).fill(1);
  const before = new Int32Array(songs.length).fill(-1);
  let last = 0;
  for (let i = 0; i < songs.length; i += 1) {
    for (let k = 0; k < i; k += 1) {
      if (songs[k]! < songs[i]! && length[k]! + 1 > length[i]!) {
        length[i] = length[k]! + 1;
        before[i] = k;
      }
    }
    if (length[i]! > length[last]!) last = i;
  }
  const kept = new Set<number>();
  for (let at = last; at !== -1; at = before[at]!) kept.add(songs[at]!);
  return [...songs].filter((song) => !kept.has(song));
}

/** One of the songs that left the present order goes back to its place, and another song leaves it instead. */
export const moveAnother: Move = ({ songs }, random) => {
  const moved = movedSongs(songs);
  if (moved.length > 0) {
    const back = moved[below(random, moved.length)]!;
    const from = songs.indexOf(back);
    let to = 0;
    for (let i = 0; i < songs.length; i += 1)
      if (songs[i]! < back && !moved.includes(songs[i]!)) to = i < from ? i + 1 : i;
    shift(songs, from, 1, to);
  }
  const from = below(random, songs.length);
  shift(songs, from, 1, below(random, songs.length));
  return true;
};
