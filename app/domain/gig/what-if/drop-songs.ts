/** A song that may be dropped: the seconds that frees, how much the player wants it, and whether it is to stay. */
export type Droppable = {
  id: string;
  seconds: number;
  /** 5: never without it; 1: first to drop. */
  priority: number;
  /** Pinned, held, in a rule: dropped only where nothing else frees the time. */
  wanted: boolean;
};

/** The choices of songs that free enough time with the least loss. */
export type Drops = {
  /** Every such choice, ids in the order given. */
  choices: string[][];
  /** Whether there are more, which are left out. */
  more: boolean;
};

/** More equally good choices than this are not told apart. */
const mostChoices = 2000;

/** 5 means never: such a song, like one that is to stay, weighs more than all others together. */
const never = 5;

function losses(songs: readonly Droppable[]): number[] {
  const stays = (song: Droppable) => song.wanted || song.priority >= never;
  const others = songs.reduce((sum, song) => (stays(song) ? sum : sum + song.priority), 0);
  return songs.map((song) => (stays(song) ? others + 1 + song.priority : song.priority));
}

/**
 * Most seconds that the songs from each on can free with a loss of exactly so much; -1 where no choice has that loss.
 * `best[i][l]`: songs i and later, loss l.
 */
function mostFreed(songs: readonly Droppable[], loss: readonly number[], limit: number): Float64Array[] {
  const best = Array.from({ length: songs.length + 1 }, () => new Float64Array(limit + 1).fill(-1));
  best[songs.length]![0] = 0;
  for (let i = songs.length - 1; i >= 0; i -= 1) {
    for (let l = 0; l <= limit; l += 1) {
      const without = best[i + 1]![l]!;
      const rest = l >= loss[i]! ? best[i + 1]![l - loss[i]!]! : -1;
      best[i]![l] = Math.max(without, rest < 0 ? -1 : rest + songs[i]!.seconds);
    }
  }
  return best;
}

/**
 * The choices of songs that free at least so many seconds with the smallest loss: the sum of the priorities, where songs
 * that are to stay weigh more than all the others together. Exact.
 * @returns null where dropping everything would not do
 * @example leastLoss([{ id: "a", seconds: 200, priority: 1, wanted: false }, { id: "b", seconds: 240, priority: 3,
 *   wanted: false }], 180)?.choices // [["a"]]
 */
export function leastLoss(songs: readonly Droppable[], seconds: number): Drops | null {
  const loss = losses(songs);
  if (songs.reduce((sum, song) => sum + song.seconds, 0) < seconds) return null;
  if (seconds <= 0) return { choices: [[]], more: false };
  const best = mostFreed(
    songs,
    loss,
    loss.reduce((sum, one) => sum + one, 0),
  );
  const least = best[0]!.findIndex((most) => most >= seconds);
  const choices: string[][] = [];
  let more = false;
  const choose = (i: number, left: number, missing: number, chosen: string[]): void => {
    if (best[i]![left]! < 0 || best[i]![left]! < missing || more) return;
    if (i === songs.length) {
      more = choices.length === mostChoices;
      if (!more) choices.push(chosen);
      return;
    }
    const song = songs[i]!;
    if (left >= loss[i]!) choose(i + 1, left - loss[i]!, missing - song.seconds, [...chosen, song.id]);
    choose(i + 1, left, missing, chosen);
  };
  choose(0, least, seconds, []);
  return { choices, more };
}
