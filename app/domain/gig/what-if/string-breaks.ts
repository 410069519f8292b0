import type { Gig } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { necksBefore } from "#app/domain/gig/what-if/necks-before.ts";
import { restRules, restWishes } from "#app/domain/gig/what-if/rest-rules.ts";
import { canPlay } from "#app/domain/gig/why-left.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Play } from "#app/domain/planning/answer.ts";
import { kindOf } from "#app/domain/planning/capo-kinds.ts";
import type { CapoKind, NeckChoice, Problem, ProblemSong } from "#app/domain/planning/problem.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { SongNeck } from "#app/domain/repertoire/song.ts";

/** The rest of a set from the song before which a string breaks. */
export type Rest = {
  broken: Guitar;
  /** The song just played, which the problem begins with so that the gap after it counts; null at the very start. */
  justPlayed: string | null;
  problem: Problem;
  /** Entry id → its ways in the order of the problem. */
  necks: Map<string, SongNeck[]>;
  /** Songs of the rest that no guitar but the broken one can play. */
  unplayable: string[];
  spare: Spare | null;
};

/** The spare of the broken guitar, and how the songs are played where it takes over whatever it can. */
export type Spare = { guitar: Guitar; neck: Neck; plays: Play[]; takes: string[]; cannot: string[] };

type Hands = { guitars: readonly Guitar[]; broken: Guitar; spare: Guitar | null };

/** A song's ways on all guitars but the broken one. What is kept to that one, or pinned to it, its spare may take. */
function waysOn(
  entryId: string,
  necks: readonly SongNeck[],
  gig: Gig,
  { guitars, broken, spare }: Hands,
): NeckChoice[] {
  const entry = gig.entries.find((one) => one.id === entryId);
  const pinned = entry?.pinned === "guitar" || entry?.pinned === "both" ? entry.guitarId : null;
  const others = guitars.filter((guitar) => guitar.id !== broken.id);
  const only = pinned === null || pinned === broken.id ? others : others.filter(({ id }) => id === pinned);
  return necks.map((neck) => {
    const standsIn = spare !== null && neck.guitars?.includes(broken.id);
    const names = standsIn ? [...(neck.guitars ?? []), spare.id] : neck.guitars;
    const may = only.filter((guitar) => canPlay(guitar, { ...neck, guitars: names }));
    return { open: neck.open, capos: neck.capos, guitars: may.map(({ id }) => id), penalty: neck.penalty };
  });
}

/** How the spare stands: tuned like the guitar it is for, with its capos as far as there are enough of their kinds. */
function likeIt(neck: Neck, others: Iterable<Neck>, capos: readonly CapoKind[] | undefined): Neck {
  const used = [...others].flatMap((one) => one.capos.map((capo) => kindOf(capo.strings)));
  const put = neck.capos.filter((capo) => {
    const kind = kindOf(capo.strings);
    const owned = capos?.find((one) => kindOf(one.strings) === kind)?.count ?? Number.POSITIVE_INFINITY;
    if (used.filter((one) => one === kind).length >= owned) return false;
    used.push(kind);
    return true;
  });
  return { open: neck.open, capos: put };
}

/** How every guitar stands: as the set left or prepared it, the spare like the broken one, else in its usual tuning. */
function standingOf(plan: SetPlan, place: number, { guitars, broken, spare }: Hands): Map<string, Neck> {
  const standing = necksBefore(plan.problem, plan.evaluation, place);
  const like = standing.get(broken.id);
  if (spare && like && !standing.has(spare.id))
    standing.set(spare.id, likeIt(like, standing.values(), plan.problem.capos));
  for (const { id, usual } of guitars) if (!standing.has(id)) standing.set(id, { open: usual, capos: [] });
  return standing;
}

/** Every song as planned, with the spare in the place of the broken guitar wherever it can stand in. */
function sparePlays(spare: Guitar, rest: Omit<Rest, "spare">, present: ReadonlyMap<string, Play>) {
  const takes: string[] = [];
  const cannot = [...rest.unplayable];
  const plays = rest.problem.songs.flatMap(({ id, necks }): Play[] => {
    const play = present.get(id)!;
    if (id === rest.justPlayed) return [{ ...play, neck: 0 }];
    if (play.guitar !== rest.broken.id) return [play];
    const able = necks[play.neck]?.guitars?.includes(spare.id) ?? false;
    (able ? takes : cannot).push(id);
    return able ? [{ ...play, guitar: spare.id }] : [];
  });
  return { plays, takes, cannot };
}

/**
 * The rest of a set when a string breaks on a guitar before one of its songs: every other guitar starts as it stands then,
 * one that the set does not use in its usual tuning. A spare that the set does not use is prepared like the guitar that it
 * is for. The song just played opens the problem, on its guitar and with nothing to do, so that changing from it counts.
 * @throws RangeError where the set does not play that song, or the act has no such guitar
 * @example afterBreak(gig, plan, repertoire, { entryId: "e5", guitarId: "alder" }).problem.order // ["e4", "e5", "e6"]
 */
export function afterBreak(
  gig: Gig,
  plan: SetPlan,
  repertoire: Repertoire,
  { entryId, guitarId }: { entryId: string; guitarId: string },
): Rest {
  const { order } = plan.evaluation;
  const place = order.indexOf(entryId);
  const broken = repertoire.guitars.find((guitar) => guitar.id === guitarId);
  if (place < 0 || !broken) throw new RangeError("This set has no such song, or the act no such guitar.");
  const plays = new Map(plan.plays.map((play) => [play.song, play]));
  const spare = repertoire.guitars.find((guitar) => guitar.spareFor === broken.id) ?? null;
  const hands: Hands = { guitars: repertoire.guitars, broken, spare };
  const standing = standingOf(plan, place, hands);

  const known = new Map(plan.problem.songs.map((song) => [song.id, song]));
  const justPlayed = order[place - 1] ?? null;
  const songs: ProblemSong[] = [];
  const necks = new Map<string, SongNeck[]>();
  const unplayable: string[] = [];
  if (justPlayed !== null) {
    const play = plays.get(justPlayed)!;
    const way = plan.necks.get(justPlayed)![play.neck]!;
    const neck = { open: way.open, capos: way.capos, guitars: [play.guitar], penalty: 0 };
    songs.push({ ...known.get(justPlayed)!, seconds: 0, necks: [neck] });
    necks.set(justPlayed, [way]);
  }
  for (const id of order.slice(place)) {
    const ways = plan.necks.get(id)!;
    const choices = waysOn(id, ways, gig, hands);
    if (choices.every(({ guitars }) => guitars?.length === 0)) {
      unplayable.push(id);
      continue;
    }
    songs.push({ ...known.get(id)!, necks: choices });
    necks.set(id, ways);
  }
  const left = { order: songs.map((song) => song.id), justPlayed };
  const wishes = restWishes(plan.problem, left);
  const problem: Problem = {
    ...plan.problem,
    guitars: plan.problem.guitars.map((guitar) => ({ ...guitar, start: standing.get(guitar.id) ?? null })),
    songs,
    order: left.order,
    rules: restRules(plan.problem, left),
    ...(wishes ? { wishes } : {}),
  };
  const rest = { broken, justPlayed, problem, necks, unplayable };
  const ready = spare && standing.get(spare.id);
  return {
    ...rest,
    spare: spare && ready ? { guitar: spare, neck: ready, ...sparePlays(spare, rest, plays) } : null,
  };
}
