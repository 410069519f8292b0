import type { GigWish } from "#app/domain/gig/gig.ts";
import { soundOfKey } from "#app/domain/music/key.ts";
import type { Wish } from "#app/domain/planning/problem.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

/** A song of a set as wishes see it, under its entry's id. */
type Wished = { id: string; song: Pick<Song, "tempo" | "key" | "energy"> };

function slowSongs(songs: readonly Wished[], below: number): string[] {
  return songs.flatMap(({ id, song }) => (song.tempo !== null && song.tempo < below ? [id] : []));
}

/** Songs that sound in one key, for each key; songs without one stand in no group. */
function keyGroups(songs: readonly Wished[]): string[][] {
  const groups = new Map<string, string[]>();
  for (const { id, song } of songs) {
    const key = soundOfKey(song.key);
    if (key !== null) groups.set(key, [...(groups.get(key) ?? []), id]);
  }
  return [...groups.values()];
}

function levelsOf(songs: readonly Wished[]): Record<string, number> {
  return Object.fromEntries(
    songs.flatMap(({ id, song }) => (song.energy === null ? [] : [[id, song.energy]])),
  );
}

function wishOf(wish: GigWish, songs: readonly Wished[]): Wish {
  const { seconds } = wish;
  switch (wish.kind) {
    case "tuning-run":
      return { kind: "run", most: wish.most, seconds };
    case "slow-apart":
      return { kind: "apart", groups: [slowSongs(songs, wish.below)], seconds };
    case "key-apart":
      return { kind: "apart", groups: keyGroups(songs), seconds };
    case "energy":
      return { kind: "energy", levels: levelsOf(songs), curve: wish.curve, seconds };
  }
}

/**
 * A gig's wishes as the planner takes them, for the songs of one set; in the order of the gig's, so that the number of a
 * broken one names it. Slow is a song whose tempo is known and below the wish's.
 * @example wishesOf([{ kind: "slow-apart", below: 80, seconds: 30 }], songs)
 *   // [{ kind: "apart", groups: [["e2", "e5"]], seconds: 30 }]
 */
export function wishesOf(wishes: readonly GigWish[], songs: readonly Wished[]): Wish[] {
  return wishes.map((wish) => wishOf(wish, songs));
}
