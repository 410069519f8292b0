import type { Gig } from "#app/domain/gig/gig.ts";
import type { GigPlan, SetPlan } from "#app/domain/gig/plan.ts";
import type { SongScores } from "#app/domain/gig/what-if/song-scores.ts";
import { heldEntries } from "#app/domain/gig/what-if/wanted.ts";

/** A song that comes to stand in a set: `index` among its planned songs, `way` the number of the song's option. */
export type Coming = { song: number; plan: SetPlan; index: number; way: number };

/** One song that goes to another set, or two that change places; `total` is what all sets cost then. */
export type Candidate = { comings: Coming[]; total: number };

/** One set as the scores know it: the numbers of its planned songs in order. */
type Line = {
  plan: SetPlan;
  order: number[];
  cost: number;
  /** First and last index at which a song may come: inside the main part, and past songs that are held. */
  from: number;
  to: number;
  /** Songs that may leave. */
  loose: number[];
};

function linesOf(gig: Gig, plan: GigPlan, scores: SongScores): Line[] {
  const held = heldEntries(gig);
  const entries = new Map(gig.entries.map((entry) => [entry.id, entry]));
  return plan.sets.map((set) => {
    const { order } = set.problem;
    const numbers = order.map(scores.numberOf);
    const main = order.filter((id) => entries.get(id)?.section === 0);
    const closes = set.set.holdLast && order.length === main.length && main.length > 0;
    return {
      plan: set,
      order: numbers,
      cost: scores.score(numbers, scores.ways),
      from: set.set.holdFirst && main.length > 0 ? 1 : 0,
      to: main.length - (closes ? 1 : 0),
      loose: main.filter((id) => !held.has(id)).map(scores.numberOf),
    };
  });
}

/** The place and way at which a song costs least in a set that another may have left; null where there is no place. */
function bestComing(
  scores: SongScores,
  line: Line,
  song: number,
  leaving: number | null,
): (Coming & { cost: number }) | null {
  const rest = line.order.filter((other) => other !== leaving);
  const last = leaving === null ? line.to : line.to - 1;
  const kept = scores.ways[song]!;
  let best: (Coming & { cost: number }) | null = null;
  for (let index = line.from; index <= last; index += 1) {
    const order = rest.toSpliced(index, 0, song);
    for (let way = 0; way < scores.options[song]!.length; way += 1) {
      scores.ways[song] = way;
      const cost = scores.score(order, scores.ways);
      if (!best || cost < best.cost) best = { song, plan: line.plan, index, way, cost };
    }
  }
  scores.ways[song] = kept;
  return best;
}

function moves(scores: SongScores, from: Line, to: Line, now: number): Candidate[] {
  return from.loose.flatMap((song) => {
    const coming = bestComing(scores, to, song, null);
    if (!coming) return [];
    const left = from.order.filter((other) => other !== song);
    const total = now - from.cost - to.cost + scores.score(left, scores.ways) + coming.cost;
    return [{ comings: [coming], total }];
  });
}

function exchanges(scores: SongScores, a: Line, b: Line, now: number): Candidate[] {
  return a.loose.flatMap((one) =>
    b.loose.flatMap((other) => {
      const there = bestComing(scores, b, one, other);
      const here = bestComing(scores, a, other, one);
      if (!there || !here) return [];
      return [{ comings: [there, here], total: now - a.cost - b.cost + there.cost + here.cost }];
    }),
  );
}

/**
 * Every move of one song to another set and every exchange of two, each at the places and in the ways that cost least,
 * those that need less than now, best first. Songs that are held, in an encore or named by a rule stay where they are; so
 * do order, guitars and ways of all others.
 * @example setChanges(gig, plan, songScores(plan.sets))[0].comings.length // 2: an exchange
 */
export function setChanges(gig: Gig, plan: GigPlan, scores: SongScores): Candidate[] {
  const lines = linesOf(gig, plan, scores);
  const now = lines.reduce((sum, line) => sum + line.cost, 0);
  const all = lines.flatMap((a, index) =>
    lines
      .slice(index + 1)
      .flatMap((b) => [
        ...moves(scores, a, b, now),
        ...moves(scores, b, a, now),
        ...exchanges(scores, a, b, now),
      ]),
  );
  return all
    .filter(({ total }) => total < now - 1e-6 * Math.max(1, now))
    .toSorted((a, b) => a.total - b.total || a.comings.length - b.comings.length);
}
