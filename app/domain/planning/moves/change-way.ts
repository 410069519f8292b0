import { type Draft, type Move, shift } from "#app/domain/planning/moves/draft.ts";
import { below, type Random } from "#app/domain/planning/search/random.ts";

function anotherWay({ ways, model }: Draft, song: number, random: Random): boolean {
  const count = model.options[song]!.length;
  if (count < 2) return false;
  ways[song] = (ways[song]! + 1 + below(random, count - 1)) % count;
  return true;
}

/** One song is played on another guitar or in another of its ways. */
export const changeWay: Move = (draft, random) =>
  anotherWay(draft, draft.songs[below(random, draft.songs.length)]!, random);

/** One song is played in another way and put in somewhere else. */
export const changeWayAndPlace: Move = (draft, random) => {
  const { songs } = draft;
  const from = below(random, songs.length);
  if (!anotherWay(draft, songs[from]!, random)) return false;
  shift(songs, from, 1, below(random, songs.length));
  return true;
};
