import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { reorderEdits } from "#app/domain/gig/order.ts";
import { noTotals, type SetPlan, type Totals } from "#app/domain/gig/plan.ts";
import { rowsOf } from "#app/domain/gig/plan-rows.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Rest } from "#app/domain/gig/what-if/string-breaks.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { weigh } from "#app/domain/planning/aim.ts";
import type { Play } from "#app/domain/planning/answer.ts";
import { type EvaluatedGap, type Evaluation, evaluate } from "#app/domain/planning/evaluate.ts";
import { wishSeconds } from "#app/domain/planning/wishes.ts";

function inGaps(
  gaps: readonly EvaluatedGap[],
  { penalties, wishes }: { penalties: number; wishes: number },
): Totals {
  const start = { ...noTotals, exposed: penalties, seconds: penalties, wishes };
  return gaps.reduce((sum, { exposed, seconds, swap, work }) => {
    const first = work[0];
    const turned = first?.strings ?? [];
    const taken = first?.capos.filter((capo) => capo.action === "on" && capo.takenFrom !== undefined) ?? [];
    return {
      exposed: sum.exposed + exposed,
      longestGap: Math.max(sum.longestGap, exposed),
      strings: sum.strings + turned.length,
      semitones: sum.semitones + turned.reduce((all, one) => all + Math.abs(one.to - one.from), 0),
      capoActions: sum.capoActions + (first?.capos.length ?? 0) + taken.length,
      swaps: sum.swaps + (swap ? 1 : 0),
      seconds: sum.seconds + seconds,
      wishes: sum.wishes,
    };
  }, start);
}

/**
 * The rest of a set as it is planned now, without the string that breaks: what the answers are set against. The song just
 * played is its first row.
 */
export function restAsPlanned(plan: SetPlan, entryId: string): SetPlan {
  const { order, gaps, totals } = plan.evaluation;
  const place = order.indexOf(entryId);
  const coming = new Set(order.slice(place));
  const first = plan.rows.findIndex((row) => row.entry.id === (order[place - 1] ?? entryId));
  const rows = plan.rows.slice(first);
  const known = new Map(plan.problem.songs.map((song) => [song.id, song]));
  const penalties = plan.plays
    .filter((play) => coming.has(play.song))
    .reduce((sum, play) => sum + (known.get(play.song)?.necks[play.neck]?.penalty ?? 0), 0);
  const broken = plan.evaluation.broken?.filter(({ songs }) => coming.has(songs.at(-1) ?? "")) ?? [];
  const left = inGaps(
    gaps.filter((gap) => coming.has(gap.into)),
    { penalties, wishes: wishSeconds(broken) },
  );
  const used = new Set(rows.map((row) => row.guitar?.id));
  return {
    ...plan,
    rows,
    totals: left,
    before: plan.before.filter(({ guitar }) => used.has(guitar.id)),
    evaluation: { ...plan.evaluation, total: weigh(plan.problem.aim, { ...totals, ...left }) },
    seconds: rows.reduce((sum, row) => sum + (row.song?.seconds ?? 0), 0),
  };
}

/** What a rest is read from, and the plan that it belongs to. */
export type RestOf = { gig: Gig; plan: SetPlan; rest: Rest; repertoire: Repertoire; naming: Naming };

/**
 * The rest of a set in an order and with guitars for each song, beginning with the song just played.
 * @param order songs of the rest's problem, those without a play left out
 */
export function restPlan(
  { gig, plan, rest, repertoire, naming }: RestOf,
  order: readonly string[],
  plays: readonly Play[],
): SetPlan {
  const played = new Set(plays.map((play) => play.song));
  const kept = order.filter((id) => played.has(id));
  const problem = {
    ...rest.problem,
    order: rest.problem.order.filter((id) => played.has(id)),
    songs: rest.problem.songs.filter((song) => played.has(song.id)),
    rules: { at: {}, before: [], into: [], apart: [] },
  };
  const evaluation: Evaluation = evaluate(problem, kept, [...plays]);
  const without = { ...gig, entries: gig.entries.filter((entry) => played.has(entry.id)) };
  const placed = applyEdits(without, reorderEdits(without, plan.set.id, kept));
  const look = {
    gig: placed.ok ? placed.gig : without,
    songs: new Map(repertoire.songs.map((song) => [song.id, song])),
    guitars: new Map(repertoire.guitars.map((guitar) => [guitar.id, guitar])),
    naming,
  };
  const given = { problem, plays: [...plays], necks: rest.necks, left: new Map<string, string>() };
  const { rows } = rowsOf(look, plan.set, given, evaluation);
  const before = evaluation.before.flatMap(({ guitar: id, open, capos }) => {
    const guitar = look.guitars.get(id);
    return guitar ? [{ guitar, neck: { open, capos } }] : [];
  });
  const longestGap = Math.max(0, ...evaluation.gaps.map((gap) => gap.exposed));
  const { exposed, strings, semitones, capoActions, swaps, seconds, wishes = 0 } = evaluation.totals;
  return {
    ...plan,
    rows,
    totals: { exposed, strings, semitones, capoActions, swaps, seconds, wishes, longestGap },
    problem,
    plays: [...plays],
    necks: rest.necks,
    evaluation,
    breaches: [],
    seconds: rows.reduce((sum, row) => sum + (row.song?.seconds ?? 0), 0),
    before,
    shortages: [],
  };
}
