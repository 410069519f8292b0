import { breachWords, type RuleBreach } from "#app/domain/gig/breach-words.ts";
import { type CapoShortage, capoShortages, unlistedCapos } from "#app/domain/gig/capo-stock.ts";
import { type Clock, clockOf } from "#app/domain/gig/clock.ts";
import type { Entry, Gig, GigSet, Rule, Section } from "#app/domain/gig/gig.ts";
import { setsOf } from "#app/domain/gig/order.ts";
import { type Look, rowsOf } from "#app/domain/gig/plan-rows.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { setProblem } from "#app/domain/gig/set-problem.ts";
import type { RowWarning } from "#app/domain/gig/warnings.ts";
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
  /** Title of the song after which a tech may begin on this guitar; null where all is done on stage. */
  restsAfter: string | null;
  /** The tech cannot be ready in time with what can be done at the side. */
  late: boolean;
  /** Guitars that capos are taken off in this gap, for the guitar of the song. */
  givers: Giver[];
};

/** A guitar that gives capos, and how many. `justPlayed`: it is in hand until this gap. */
export type Giver = { guitar: Guitar; capos: number; justPlayed: boolean };

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
  /** Wishes that it breaks where it stands, each in a sentence. */
  wishes: string[];
  /** Per string, low side first: differs from how this guitar was last used in the set. */
  retuned: boolean[];
  rules: Rule[];
};

/** What a set or a gig asks of hands and of the room. Seconds and counts. */
export type Totals = {
  exposed: number;
  /** The most dead air in one gap, as the gap's own line shows it. */
  longestGap: number;
  strings: number;
  semitones: number;
  capoActions: number;
  swaps: number;
  seconds: number;
  /** Seconds that broken wishes count as; no part of dead air. */
  wishes: number;
};

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

export type GigPlan = {
  sets: SetPlan[];
  totals: Totals;
  clock: Clock;
  shortages: CapoShortage[];
  /** Something to say once about the whole gig; null where there is nothing. */
  note: string | null;
};

/** Totals of nothing at all. */
export const noTotals: Totals = {
  exposed: 0,
  longestGap: 0,
  strings: 0,
  semitones: 0,
  capoActions: 0,
  swaps: 0,
  seconds: 0,
  wishes: 0,
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
      wishes: sum.wishes + one.wishes,
    }),
    noTotals,
  );
}

function totalsOf({ totals, gaps }: Evaluation): Totals {
  const { exposed, strings, semitones, capoActions, swaps, seconds, wishes = 0 } = totals;
  return {
    exposed,
    strings,
    semitones,
    capoActions,
    swaps,
    seconds,
    wishes,
    longestGap: Math.max(0, ...gaps.map((gap) => gap.exposed)),
  };
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
    breaches: breachWords(evaluation.breaches, {
      gig: look.gig,
      entries: rows.flatMap((row) => (row.left === null ? [row.entry] : [])),
      title: (id) => rows.find((row) => row.entry.id === id)?.song?.title ?? "A song",
    }),
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
    note: unlistedCapos(
      sets.flatMap((set) => set.rows),
      repertoire.capos,
    ),
  };
}
