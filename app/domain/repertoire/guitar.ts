/** The outlines a guitar's badge may have. Each is drawn around its short name. */
export const badgeShapes = ["round", "square", "hexagon", "cut", "slant", "double"] as const;
export type BadgeShape = (typeof badgeShapes)[number];

export const instrumentKinds = [
  "acoustic",
  "electric",
  "classical",
  "resonator",
  "twelve-string",
  "baritone",
  "bass",
  "ukulele",
  "mandolin",
  "banjo",
  "other",
] as const;
export type InstrumentKind = (typeof instrumentKinds)[number];

/** A stringed instrument of an act. Pitches are MIDI note numbers, low side first. */
export type Guitar = {
  id: string;
  name: string;
  /** Six letters at most; stands in the badge. */
  shortName: string;
  badge: BadgeShape;
  kind: InstrumentKind;
  /** Number of strings, 4 to 12. Equals the length of usual, lowest and highest. */
  strings: number;
  usual: number[];
  lowest: number[];
  highest: number[];
  /** No string is retuned once a set has begun. */
  keeps: boolean;
  leftHanded: boolean;
  /** The id of the guitar this one is a spare for, or null. */
  spareFor: string | null;
  /** Input or DI channel as the act names it. */
  channel: string;
  /** ISO date on which the strings were fitted, or null. */
  strungOn: string | null;
  notes: string;
};

/** A kind of capo the act owns. `strings: null` covers all strings. */
export type ActCapo = { id: string; name: string; strings: number[] | null; count: number };
