import type { Neck } from "#app/domain/music/neck.ts";

/** Which guitar a song is played on, and which of its necks (index into the song's `necks`). */
export type Play = { song: string; guitar: string; neck: number };

/** One string retuned: its number (1 is the highest-sounding side) and MIDI pitches. */
export type StringWork = { string: number; from: number; to: number };

/**
 * One capo action; `from` and `to` are frets. `takenFrom`: the resting guitar that the capo is taken off first, an action
 * of its own whose seconds are in this work; left out where a loose one is put on.
 */
export type CapoWork =
  | { action: "move"; strings: number[]; from: number; to: number }
  | { action: "on"; strings: number[]; to: number; takenFrom?: string }
  | { action: "off"; strings: number[]; from: number };

/** Work on one guitar. Of a job that the tech could not finish, one item each says what each of the two spends. */
export type Work = {
  guitar: string;
  by: "player" | "tech";
  strings: StringWork[];
  capos: CapoWork[];
  seconds: number;
};

/** What happens before a song. `seconds` is what the audience waits, cover included: guitar swap and work on stage. */
export type Gap = { into: string; swap: boolean; seconds: number; work: Work[] };

/**
 * Totals over the whole set, whoever does the work. `moved`: songs that left the present order. `wishes`: seconds that
 * broken wishes count as, where the problem has any.
 */
export type Totals = {
  exposed: number;
  seconds: number;
  strings: number;
  semitones: number;
  capoActions: number;
  swaps: number;
  moved: number;
  wishes?: number;
};

/** A wish that a plan breaks: its number in the problem, the songs in the order of the set, what it counts as. */
export type BrokenWish = { wish: number; songs: string[]; seconds: number };

/** The neck a guitar has when the set begins. */
export type GuitarBefore = { guitar: string } & Neck;

/** A plan that may be played. `bound` is proven: no valid plan has a lower total. */
export type FoundAnswer = {
  status: "optimal" | "feasible";
  total: number;
  bound: number;
  totals: Totals;
  order: string[];
  plays: Play[];
  before: GuitarBefore[];
  gaps: Gap[];
  /** Where the problem has wishes: those that this plan breaks. */
  broken?: BrokenWish[];
};

export type ReasonCode = "no-guitar" | "rules" | "keeps" | "moved";

/** Songs that cannot be had together. Song ids stand in double quotes in `message`, so that a page can put titles there. */
export type Reason = { code: ReasonCode; songs: string[]; message: string };

export type InfeasibleAnswer = { status: "infeasible"; why: Reason[] };

export type Answer = FoundAnswer | InfeasibleAnswer;
