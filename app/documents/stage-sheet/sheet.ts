import type { BadgeShape } from "#app/domain/repertoire/guitar.ts";

/** One string of a tuning as the sheet shows it: the letter to tune to, and which way the peg turns to get there. */
export type SheetString = { letter: string; turned: "up" | "down" | null };

/** One song of a set. */
export type SheetRow = {
  number: number;
  title: string;
  /** Set where hands take up this guitar: at the first song and at every change. */
  guitar: { name: string; shape: BadgeShape } | null;
  /** What hands must do before the song, in the order in which they work; "" for nothing. */
  action: string;
  /** Low side first; one letter a course where strings stand in pairs. Empty where no guitar plays the song. */
  tuning: SheetString[];
  /** Lines of the capo column: "CAPO 3", "leave 6". */
  capos: string[];
  /** True for the first song of the encore. */
  encore: boolean;
};

export type SheetSet = {
  /** "Set 1 of 2", or "" where there is one. */
  heading: string;
  /** How each guitar stands before the set. */
  doors: string;
  /** "21:15 to 22:12" */
  time: string;
  rows: SheetRow[];
};

/** All that a stage sheet says, in the reader's naming. What it looks like is the layout's. */
export type StageSheet = {
  title: string;
  date: string;
  /** "curfew 22:30", or "". */
  curfew: string;
  sets: SheetSet[];
};
