import type { Neck } from "#app/domain/music/neck.ts";

/** One way to play a song, in order of preference. `guitars: null` means any guitar it is playable on. */
export type SongNeck = Neck & {
  id: string;
  guitars: string[] | null;
  /** Seconds that choosing this way counts as (0 for the first choice). */
  penalty: number;
};

/** How lively a song is: 1 calm to 5 full. */
export type Energy = 1 | 2 | 3 | 4 | 5;

/** How much the player wants a song in the set: 5 never without it, 1 the first to drop. */
export type Priority = 1 | 2 | 3 | 4 | 5;

/** Of a song that nobody has said anything about. */
export const usualPriority: Priority = 3;

/** A song of an act's repertoire. `key` is as tonal names it ("G", "F#m", "Bb"), or "" where unknown. */
export type Song = {
  id: string;
  title: string;
  credit: string;
  /** Length in seconds. */
  seconds: number;
  key: string;
  /** Beats a minute, or null. */
  tempo: number | null;
  /** null where unknown. */
  energy: Energy | null;
  priority: Priority;
  notes: string;
  firstLine: string;
  /** Seconds of talk that introduces the song; null: the gig's. */
  cover: number | null;
  necks: SongNeck[];
  /** True where the song was deleted from the library but still stands in a set. */
  deleted: boolean;
};
