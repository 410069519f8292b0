import type { Midi } from "#app/domain/music/pitch.ts";

/** A tuning that the trade has a name for. Pitches are MIDI numbers, low side first. */
export type NamedTuning = {
  name: string;
  /** Other names for it, small letters, as `readTuning` compares them. */
  also: readonly string[];
  open: readonly Midi[];
  /** Where the letters and octaves come from; "common practice, no source" where nothing was read. */
  source: string;
  /** Needs strings made for it, so its octaves stand whatever the instrument usually has. */
  ownStrings?: true;
  /** An ordinary word too ("standard", "bass"): in running text it counts only where it stands apart. */
  plainWord?: true;
  /** Its name follows from a rule ("drop", "standard" at a pitch), which reads and writes it in every naming. */
  byRule?: true;
  /** How the instrument is tuned as a matter of course. */
  standard?: true;
};

const practice = "common practice, no source";
const practiceOctaves = "letters universally given; octaves common practice, no source";
const darling = "daviddarling.info";

/** The intervals of a guitar's standard tuning, E2 A2 D3 G3 B3 E4. Source: h2g2 A87856825; W3C MusicXML 4.0. */
export const standardGuitar: readonly Midi[] = [40, 45, 50, 55, 59, 64];

/** Six-string guitar. Standard tunings at other pitches ("D standard") and "drop" tunings follow from rules as well. */
export const guitarTunings: readonly NamedTuning[] = [
  {
    name: "standard",
    also: ["e standard", "usual"],
    open: standardGuitar,
    source: "h2g2 A87856825; W3C MusicXML 4.0",
    plainWord: true,
    standard: true,
  },
  { name: "drop D", also: ["dropped d"], open: [38, 45, 50, 55, 59, 64], source: darling, byRule: true },
  {
    name: "double drop D",
    also: ["double dropped d"],
    open: [38, 45, 50, 55, 59, 62],
    source: "LilyPond regression test 71e (octaves)",
    byRule: true,
  },
  {
    name: "DADGAD",
    also: ["d modal", "dsus4", "open dsus4"],
    open: [38, 45, 50, 55, 57, 62],
    source: practiceOctaves,
  },
  { name: "open D", also: ["open d major"], open: [38, 45, 50, 54, 57, 62], source: darling },
  {
    name: "open D minor",
    also: ["open dm", "cross-note d", "cross note d"],
    open: [38, 45, 50, 53, 57, 62],
    source: darling,
  },
  {
    name: "open G",
    also: ["open g major"],
    open: [38, 43, 50, 55, 59, 62],
    source: `${darling}; Guitar Player (moves of strings 6, 5 and 1)`,
  },
  { name: "open G minor", also: ["open gm"], open: [38, 43, 50, 55, 58, 62], source: practice },
  { name: "open C", also: ["open c major"], open: [36, 43, 48, 55, 60, 64], source: darling },
  {
    name: "C6",
    plainWord: true,
    also: ["open c6"],
    open: [36, 45, 48, 55, 60, 64],
    source: "musicradar.com, Thoughts on tuning",
  },
  {
    name: "Orkney",
    also: [],
    open: [36, 43, 50, 55, 60, 62],
    source: "guitarplayer.com 2007-01-22 (exact moves)",
    plainWord: true,
  },
  {
    name: "open E",
    also: ["open e major"],
    open: [40, 47, 52, 56, 59, 64],
    source: "Guitar Player (moves of strings 5, 4 and 3)",
  },
  {
    name: "open E minor",
    also: ["open em", "cross-note e", "cross note e"],
    open: [40, 47, 52, 55, 59, 64],
    source: practice,
  },
  { name: "open A", also: ["open a major"], open: [40, 45, 52, 57, 61, 64], source: darling },
  { name: "open A minor", also: ["open am"], open: [40, 45, 52, 57, 60, 64], source: practice },
  {
    name: "all fourths",
    also: ["fourths"],
    open: [40, 45, 50, 55, 60, 65],
    source: "Wikipedia, Regular tuning",
    plainWord: true,
  },
  { name: "E♭ standard", also: [], open: [39, 44, 49, 54, 58, 63], source: "indiepanda.net", byRule: true },
  {
    name: "D standard",
    also: [],
    open: [38, 43, 48, 53, 57, 62],
    source: "Taylor, Ask Bob, 2011-12-21",
    byRule: true,
  },
  { name: "drop C", also: [], open: [36, 43, 48, 53, 57, 62], source: practice, byRule: true },
  {
    name: "B standard",
    also: ["baritone", "baritone b"],
    open: [35, 40, 45, 50, 54, 59],
    source: "Wikipedia, Standard tuning; oranjproductions.com",
    plainWord: true,
    byRule: true,
  },
  {
    name: "A standard",
    also: ["baritone a"],
    open: [33, 38, 43, 48, 52, 57],
    source: "liquisearch.com, baritone guitar",
    byRule: true,
  },
  {
    name: "Nashville",
    also: ["nashville tuning"],
    open: [52, 57, 62, 67, 59, 64],
    source: "stringsdirect.co.uk (lowest four an octave up)",
    ownStrings: true,
    plainWord: true,
  },
  {
    name: "high strung",
    also: ["high-strung"],
    open: [52, 57, 62, 55, 59, 64],
    source: "stringsdirect.co.uk (lowest three an octave up)",
    ownStrings: true,
    plainWord: true,
  },
];

/** Other instruments, each in its own octaves. */
export const otherTunings: readonly NamedTuning[] = [
  {
    name: "seven-string",
    also: ["7-string", "7 string", "seven string"],
    open: [35, 40, 45, 50, 55, 59, 64],
    source: "h2g2; Wikipedia, Standard tuning",
    ownStrings: true,
    plainWord: true,
    standard: true,
  },
  {
    name: "twelve-string",
    also: ["12-string", "12 string", "twelve string"],
    open: [40, 52, 45, 57, 50, 62, 55, 67, 59, 59, 64, 64],
    source: "h2g2; Wikipedia, Standard tuning",
    ownStrings: true,
    plainWord: true,
  },
  {
    name: "bass",
    also: ["4-string bass", "bass guitar"],
    open: [28, 33, 38, 43],
    source: "h2g2; Wikipedia, Standard tuning",
    ownStrings: true,
    plainWord: true,
    standard: true,
  },
  {
    name: "five-string bass",
    also: ["5-string bass", "bass"],
    open: [23, 28, 33, 38, 43],
    source: "Wikipedia, Standard tuning",
    ownStrings: true,
    plainWord: true,
    standard: true,
  },
  {
    name: "six-string bass",
    also: ["6-string bass", "bass"],
    open: [23, 28, 33, 38, 43, 48],
    source: "Wikipedia, Standard tuning",
    ownStrings: true,
    plainWord: true,
    standard: true,
  },
  {
    name: "ukulele",
    also: ["uke", "high g", "high g ukulele"],
    open: [67, 60, 64, 69],
    source: "h2g2; MasterClass (re-entrant)",
    ownStrings: true,
    plainWord: true,
    standard: true,
  },
  {
    name: "low G ukulele",
    also: ["low g", "low g uke"],
    open: [55, 60, 64, 69],
    source: practice,
    ownStrings: true,
    plainWord: true,
  },
  {
    name: "baritone ukulele",
    also: ["baritone uke"],
    open: [50, 55, 59, 64],
    source: "prgomez.com (a fourth below, linear)",
    ownStrings: true,
    plainWord: true,
    standard: true,
  },
  {
    name: "mandolin",
    also: [],
    open: [55, 55, 62, 62, 69, 69, 76, 76],
    source: "h2g2",
    ownStrings: true,
    plainWord: true,
    standard: true,
  },
  {
    name: "open G",
    also: ["banjo", "banjo open g", "banjo g"],
    open: [67, 50, 55, 59, 62],
    source: "everything2; firmchronicle (5th string as string 1 at fret 5)",
    ownStrings: true,
    plainWord: true,
  },
  {
    name: "double C",
    also: ["banjo double c"],
    open: [67, 48, 55, 60, 62],
    source: practice,
    ownStrings: true,
  },
  {
    name: "tenor banjo",
    also: ["tenor banjo c"],
    open: [48, 55, 62, 69],
    source: practice,
    ownStrings: true,
    standard: true,
  },
];
