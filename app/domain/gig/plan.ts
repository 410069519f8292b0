import { type CapoShortage, capoShortages } from "#app/domain/gig/capo-stock.ts";
import { type Clock, clockOf } from "#app/domain/gig/clock.ts";
import type { Entry, Gig, GigSet, Rule, Section } from "#app/domain/gig/gig.ts";
import { entriesOf, setsOf } from "#app/domain/gig/order.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { type SetProblem, setProblem } from "#app/domain/gig/set-problem.ts";
import { type RowWarning, rowWarnings } from "#app/domain/gig/warnings.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Play, Work } from "#app/domain/planning/answer.ts";
import { type Evaluation, evaluate } from "#app/domain/planning/evaluate.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song, SongNeck } from "#app/domain/repertoire/song.ts";

/** What happens between the song before (that some guitar can play) and this one. Seconds; `exposed` is dead air. */
export type Gap = {
  fromEntryId: string;
  swap: boolean;
  seconds: number;
  cover: number;
  exposed: number;
  work: Work[];
};

/** One song standing in a set, with what the plan makes of it. */
export type Row = {
  entry: Entry;
  song: Song | null;
  /** 1-based within the set. */
  number: number;
  section: Section;
  guitar: Guitar | null;
  neck: SongNeck | null;
  /** Null for the first song of the set that a guitar can play, and for songs left out. */
  gap: Gap | null;
  /** Why the song is left out of the plan; null where it is in it. */
  left: string | null;
  /** Seconds from the start of the gig at which the song begins. */
  startSecond: number;
  warnings: RowWarning[];
  /** Per string, low side first: differs from how this guitar was last used in the set. */
  retuned: boolean[];
  rules: Rule[];
};

/** What a set or a gig asks of hands and of the room. Seconds and counts. */
export type Totals = {
  exposed: number;
  longestGap: number;
  strings: number;
  semitones: number;
  capoActions: number;
  swaps: number;
  seconds: number;
};

export type RuleBreach = { entryIds: string[]; message: string };

export type SetPlan = {
  set: GigSet;
  rows: Row[];
  totals: Totals;
  problem: Problem;
  plays: Play[];
  /** Entry id → the song's ways in the order in which the problem lists them. */
  necks: Map<string, SongNeck[]>;
  evaluation: Evaluation;
  /** Rules that the present order breaks, in words. */
  breaches: RuleBreach[];
  /** Seconds from the first song of the set to the end of its last. */
  seconds: number;
  /** Seconds from the start of the gig. */
  startSecond: number;
  /** How each guitar that is used stands when the set begins. */
  before: { guitar: Guitar; neck: Neck }[];
  shortages: CapoShortage[];
};

export type GigPlan = { sets: SetPlan[]; totals: Totals; clock: Clock; shortages: CapoShortage[] };

const nothing: Totals = {
  exposed: 0,
  longestGap: 0,
  strings: 0,
  semitones: 0,
  capoActions: 0,
  swaps: 0,
  seconds: 0,
};

function sumOf(totals: readonly Totals[]): Totals {
  return totals.reduce(
    (sum, one) => ({
      exposed: sum.exposed + one.exposed,
      longestGap: Math.max(sum.longestGap, one.longestGap),
      strings: sum.strings + one.strings,
      semitones: sum.semitones + one.semitones,
      capoActions: sum.capoActions + one.capoActions,
      swaps: sum.swaps + one.swaps,
      seconds: sum.seconds + one.seconds,
    }),
    nothing,
  );
}

function totalsOf({ totals, gaps }: Evaluation): Totals {
  const { exposed, strings, semitones, capoActions, swaps, seconds } = totals;
  return {
    exposed,
    strings,
    semitones,
    capoActions,
    swaps,
    seconds,
    longestGap: Math.max(0, ...gaps.map((gap) => gap.seconds)),
  };
}

function gapsByEntry(evaluation: Evaluation): Map<string, Gap> {
  const gaps = new Map<string, Gap>();
  for (const gap of evaluation.gaps) {
    const place = evaluation.order.indexOf(gap.into);
    const { swap, seconds, cover, exposed, work } = gap;
    if (place > 0)
      gaps.set(gap.into, { fromEntryId: evaluation.order[place - 1]!, swap, seconds, cover, exposed, work });
  }
  return gaps;
}

function rulesAbout(gig: Gig, entryId: string): Rule[] {
  return gig.rules.filter((rule) =>
    rule.kind === "at" ? rule.entry === entryId : rule.a === entryId || rule.b === entryId,
  );
}

function retunedStrings(guitar: Guitar | null, gap: Gap | null): boolean[] {
  if (!guitar) return [];
  const changed = new Set(
    gap?.work.flatMap((work) => (work.guitar === guitar.id ? work.strings.map((one) => one.string) : [])),
  );
  return Array.from({ length: guitar.strings }, (_, index) => changed.has(guitar.strings - index));
}

type Look = { gig: Gig; songs: Map<string, Song>; guitars: Map<string, Guitar>; naming: Naming };

/** Rows without their place on the clock, and how long each song's row takes with the gap before it. */
function rowsOf(
  look: Look,
  set: GigSet,
  given: SetProblem,
  evaluation: Evaluation,
): { rows: Row[]; lengths: number[] } {
  const { gig, songs, guitars, naming } = look;
  const gaps = gapsByEntry(evaluation);
  const plays = new Map(given.plays.map((play) => [play.song, play]));
  const covers = new Map(given.problem.songs.map((song) => [song.id, song.cover]));
  const entries = entriesOf(gig, set.id);
  const lengths: number[] = [];
  const rows = entries.map((entry, index): Row => {
    const song = songs.get(entry.songId) ?? null;
    const play = plays.get(entry.id);
    const guitar = (play && guitars.get(play.guitar)) ?? null;
    const neck = (play && given.necks.get(entry.id)?.[play.neck]) ?? null;
    const gap = gaps.get(entry.id) ?? null;
    const cover = covers.get(entry.id) ?? gig.times.cover;
    lengths.push(index === 0 ? 0 : Math.max(cover, gap?.seconds ?? 0));
    const row = {
      entry,
      song,
      number: index + 1,
      section: entry.section,
      guitar,
      neck,
      gap,
      left: given.left.get(entry.id) ?? null,
      startSecond: 0,
      retuned: retunedStrings(guitar, gap),
      rules: rulesAbout(gig, entry.id),
    };
    const ends = index === 0 || index === entries.length - 1 || entries[index - 1]?.section !== entry.section;
    return { ...row, warnings: rowWarnings(row, { ends, into: gig.rules, naming, crew: gig.crew }) };
  });
  return { rows, lengths };
}

function breachesOf(evaluation: Evaluation, look: Look): RuleBreach[] {
  const titles = new Map(
    look.gig.entries.map((entry) => [entry.id, look.songs.get(entry.songId)?.title ?? "A song"]),
  );
  const name = (id: string | undefined) => (id && titles.get(id)) ?? "A song";
  return evaluation.breaches.map(({ code, songs: [a, b, ...rest] }) => {
    const entryIds = [a, b, ...rest].filter((id): id is string => id !== undefined);
    const words: Record<string, string> = {
      at: `${name(a)} does not stand where its rule says.`,
      before: `${name(a)} should come before ${name(b)}.`,
      into: `${name(a)} should go straight into ${name(b)}.`,
      apart: `${name(a)} and ${name(b)} should not stand next to each other.`,
      section: `${name(b)} belongs to a later part of the set.`,
      sections: `${name(b)} belongs to a later part of the set.`,
      keeps: `${name(a)} would retune a guitar that keeps its tuning. Play it on another, or another way.`,
    };
    return { entryIds, message: words[code] ?? `${name(a)} breaks a rule.` };
  });
}

function planSet(look: Look, set: GigSet, repertoire: Repertoire, startSecond: number): SetPlan {
  const given = setProblem(look.gig, set.id, repertoire, look.naming);
  const evaluation = evaluate(given.problem, given.problem.order, given.plays);
  const { rows, lengths } = rowsOf(look, set, given, evaluation);
  let at = startSecond;
  const timed = rows.map((row, index) => {
    const begins = at + lengths[index]!;
    at = begins + (row.song?.seconds ?? 0);
    return { ...row, startSecond: begins };
  });
  const before = evaluation.before.flatMap(({ guitar: id, open, capos }) => {
    const guitar = look.guitars.get(id);
    return guitar ? [{ guitar, neck: { open, capos } }] : [];
  });
  return {
    set,
    rows: timed,
    totals: totalsOf(evaluation),
    problem: given.problem,
    plays: given.plays,
    necks: given.necks,
    evaluation,
    breaches: breachesOf(evaluation, look),
    seconds: at - startSecond,
    startSecond,
    before,
    shortages: capoShortages(timed, before, repertoire.capos),
  };
}

/**
 * A gig as it is planned now: every row with its gap, every total, the clock and what to warn about. The page, the
 * sheets and the tests read this one value; it is cheap enough to be made anew at each move of a drag.
 * @example planGig(gig, repertoire).totals.exposed // 251
 */
export function planGig(gig: Gig, repertoire: Repertoire, naming: Naming = "english"): GigPlan {
  const look: Look = {
    gig,
    songs: new Map(repertoire.songs.map((song) => [song.id, song])),
    guitars: new Map(repertoire.guitars.map((guitar) => [guitar.id, guitar])),
    naming,
  };
  const sets: SetPlan[] = [];
  let at = 0;
  setsOf(gig).forEach((set, index) => {
    at += index === 0 ? 0 : set.interval;
    const plan = planSet(look, set, repertoire, at);
    sets.push(plan);
    at += plan.seconds;
  });
  return {
    sets,
    totals: sumOf(sets.map((set) => set.totals)),
    clock: clockOf(gig, at),
    shortages: sets.flatMap((set) => set.shortages),
  };
}
