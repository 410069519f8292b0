import type { Aim } from "#app/domain/planning/problem.ts";

/** Seconds that each kind of work on a guitar takes, and the talk that covers a gap. See {@link defaultTimes}. */
export type GigTimes = {
  string: number;
  semitone: number;
  capoOn: number;
  capoOff: number;
  capoMove: number;
  check: number;
  swap: number;
  cover: number;
  encoreCover: number;
  intoCover: number;
};

/** Defaults without and with a tech; common practice, no source. */
export const defaultTimes: Record<Crew, GigTimes> = {
  alone: {
    string: 8,
    semitone: 1,
    capoOn: 5,
    capoOff: 3,
    capoMove: 6,
    check: 5,
    swap: 15,
    cover: 12,
    encoreCover: 40,
    intoCover: 0,
  },
  tech: {
    string: 8,
    semitone: 1,
    capoOn: 5,
    capoOff: 3,
    capoMove: 6,
    check: 5,
    swap: 8,
    cover: 12,
    encoreCover: 40,
    intoCover: 0,
  },
};

export type Crew = "alone" | "tech";

/** What of an entry's choice the planner may not change. */
export type Pinned = "none" | "guitar" | "neck" | "both";

/** 0 is the main section of a set, 1 its encore. */
export type Section = 0 | 1;

/**
 * One song standing in a set. Its own id lets a song stand twice. `rank` orders entries inside (set, section):
 * a fractional index compared as a plain string, ties broken by id, so that two people can move two songs
 * at once and both moves hold.
 */
export type Entry = {
  id: string;
  songId: string;
  setId: string;
  section: Section;
  rank: string;
  /** Chosen guitar; null: none chosen yet. */
  guitarId: string | null;
  /** Chosen way to play the song (SongNeck id); null: none chosen yet. */
  neckId: string | null;
  pinned: Pinned;
  /** Seconds of talk before this song in this gig; null: the song's, else the gig's. */
  cover: number | null;
  /** What the tech should know, for this song in this set. */
  techNote: string;
};

/** A set of the gig. `interval` is the seconds of pause before it (0 for the first). Ordered by (rank, id). */
export type GigSet = {
  id: string;
  name: string;
  rank: string;
  interval: number;
  /** The first song of the set stays first in any suggestion. On by default. */
  holdFirst: boolean;
  /** The last song of the set stays last in any suggestion. On by default. */
  holdLast: boolean;
};

/**
 * A rule about entries. `at`: fixed place inside the entry's section, 1-based, negative from its end
 * (opener 1, closer -1). `before`: a comes anywhere before b. `into`: b directly follows a. `apart`: not neighbours.
 * The id is made from its parts (see ruleId), so that two people adding the same rule add one. A rule that names an
 * entry which is not there, or two entries of different sets, sleeps.
 */
export type Rule =
  | { id: string; kind: "at"; entry: string; place: number }
  | { id: string; kind: "before" | "into" | "apart"; a: string; b: string };

/** What suggestions keep low: one thing before all others, or the player's own weights. See `aims.ts`. */
export type GigAim = { kind: "dead-air" | "strings" | "capos" | "guitars" } | { kind: "own"; weights: Aim };

/**
 * What every set of the gig should rather be like, and the seconds that each break of it counts as. `tuning-run`: no
 * more than `most` songs in a row in one tuning. `slow-apart`: no two neighbours slower than `below` beats a minute.
 * `key-apart`: no two neighbours in one key. `energy`: songs follow a curve of values 1 (calm) to 5 (full), which stand
 * at even distances from the first song of a set to its last.
 */
export type GigWish =
  | { kind: "tuning-run"; most: number; seconds: number }
  | { kind: "slow-apart"; below: number; seconds: number }
  | { kind: "key-apart"; seconds: number }
  | { kind: "energy"; curve: number[]; seconds: number };

/** A gig with its sets: the document that edits apply to. `revision` counts the batches applied so far. */
export type Gig = {
  id: string;
  revision: number;
  name: string;
  venue: string;
  /** UTC instant, ISO 8601 with Z. */
  startsAt: string;
  /** IANA zone, e.g. "Europe/Dublin". */
  zone: string;
  /** Seconds; null: no slot. */
  slot: number | null;
  /** Local wall time "22:30" in `zone`; null: none. */
  curfew: string | null;
  crew: Crew;
  times: GigTimes;
  aim: GigAim;
  /** At most one of each kind. */
  wishes: GigWish[];
  notes: string;
  sets: GigSet[];
  entries: Entry[];
  rules: Rule[];
};
