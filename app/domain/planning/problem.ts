import type { Neck } from "#app/domain/music/neck.ts";

/** `alone`: the performer does everything on stage. `tech`: somebody changes resting guitars while songs play. */
export type Crew = "alone" | "tech";

/** All in seconds. `semitone` is for each semitone of each retuned string; `check` once a change; see `changeSeconds`. */
export type Times = {
  string: number;
  semitone: number;
  capoMove: number;
  capoOn: number;
  capoOff: number;
  swap: number;
  check: number;
  cover: number;
};

/** The weight of each count in the total that is kept low. */
export type Aim = {
  exposed: number;
  seconds: number;
  strings: number;
  semitones: number;
  capoActions: number;
  swaps: number;
};

/**
 * One guitar of the set. `lowest` and `highest` are MIDI numbers for each string, low side first. `start` is the neck
 * it has before the set, `null` where it is prepared freely. `keeps`: no string is retuned once the set has begun.
 */
export type ProblemGuitar = {
  id: string;
  strings: number;
  lowest: number[];
  highest: number[];
  start: Neck | null;
  keeps: boolean;
};

/** One way to play a song, on the guitars named (`null`: on any that can), at a price of `penalty` seconds. */
export type NeckChoice = Neck & { guitars: string[] | null; penalty: number };

/** One song of the set. `cover` is the seconds of talk and applause before it; `null` takes `times.cover`. */
export type ProblemSong = {
  id: string;
  seconds: number;
  section: number;
  cover: number | null;
  necks: NeckChoice[];
};

/** `at`: song id to position from 1, or from the end with -1 last. The pairs are [first, second]. */
export type Rules = {
  at: Record<string, number>;
  before: [string, string][];
  into: [string, string][];
  apart: [string, string][];
};

/** One set to be planned: what `parseProblem` returns, with nothing left out. */
export type Problem = {
  version: 1;
  crew: Crew;
  times: Times;
  aim: Aim;
  guitars: ProblemGuitar[];
  songs: ProblemSong[];
  order: string[];
  rules: Rules;
  maxMoved: number | null;
};

/** Least dead air first; the small weights see to it that nothing pointless is proposed. */
export const defaultAim: Aim = {
  exposed: 100,
  seconds: 1,
  strings: 1,
  semitones: 0,
  capoActions: 1,
  swaps: 1,
};

/**
 * Seconds of the gap into a song that talk and applause fill anyway.
 *
 * @example coverInto({ cover: 12 }, { cover: null }) // 12
 */
export function coverInto(times: Pick<Times, "cover">, song: Pick<ProblemSong, "cover">): number {
  return song.cover ?? times.cover;
}

/**
 * Whether a guitar can be tuned to a neck: as many strings, and each open pitch within its string's range.
 * Which guitars a song names is another question, see `mayPlay`.
 *
 * @example fitsGuitar({ strings: 1, lowest: [38], highest: [42] }, { open: [40] }) // true
 */
export function fitsGuitar(
  guitar: Pick<ProblemGuitar, "strings" | "lowest" | "highest">,
  neck: Pick<Neck, "open">,
): boolean {
  return (
    neck.open.length === guitar.strings &&
    neck.open.every((pitch, i) => pitch >= guitar.lowest[i]! && pitch <= guitar.highest[i]!)
  );
}

/** Whether a song may be played in this way on this guitar: the song allows the guitar, and the neck fits it. */
export function mayPlay(guitar: ProblemGuitar, neck: NeckChoice): boolean {
  return (neck.guitars === null || neck.guitars.includes(guitar.id)) && fitsGuitar(guitar, neck);
}
