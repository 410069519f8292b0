import type { Neck } from "#app/domain/music/neck.ts";
import { weigh } from "#app/domain/planning/aim.ts";
import type {
  BrokenWish,
  CapoWork,
  Gap,
  GuitarBefore,
  Play,
  Totals,
  Work,
} from "#app/domain/planning/answer.ts";
import { type Breach, orderBreaches } from "#app/domain/planning/breaches.ts";
import { followNecks, type Taken } from "#app/domain/planning/capo-hands.ts";
import { caposSuffice, kindOf } from "#app/domain/planning/capo-kinds.ts";
import {
  changeSeconds,
  isChange,
  type NeckChange,
  neckChange,
  semitonesOf,
} from "#app/domain/planning/change.ts";
import { movedSongs } from "#app/domain/planning/moved.ts";
import { coverInto, mayPlay } from "#app/domain/planning/playable.ts";
import type { NeckChoice, Problem, ProblemGuitar, ProblemSong } from "#app/domain/planning/problem.ts";
import { type TechJob, techShift } from "#app/domain/planning/tech-shift.ts";
import { brokenWishes, wishSeconds } from "#app/domain/planning/wishes.ts";

/** A gap with what talk covers of it and what is left as dead air, both in seconds. */
export type EvaluatedGap = Gap & { cover: number; exposed: number };

/** What one order with its guitars and necks costs, and what it breaks. Nothing broken: `breaches` is empty. */
export type Evaluation = {
  total: number;
  totals: Totals;
  order: string[];
  plays: Play[];
  before: GuitarBefore[];
  gaps: EvaluatedGap[];
  breaches: Breach[];
  /** Where the problem has wishes: those that this order breaks. */
  broken?: BrokenWish[];
};

type Step = { song: ProblemSong; guitar: ProblemGuitar; neck: NeckChoice; play: Play };

/**
 * A change that falls due in the gap into position `at`; `from` is the first song during which a tech may do it. `taken`
 * capos come from other guitars; `waits` is what of the work nobody can do before the gap.
 */
type Due = {
  at: number;
  from: number;
  guitar: string;
  change: NeckChange;
  taken: number;
  seconds: number;
  waits: number;
  resting: boolean;
};

function stepsOf(problem: Problem, order: string[], plays: Play[]): Step[] {
  const songs = new Map(problem.songs.map((song) => [song.id, song]));
  const guitars = new Map(problem.guitars.map((guitar) => [guitar.id, guitar]));
  const playOf = new Map(plays.map((play) => [play.song, play]));
  const steps = order.map((id) => {
    const song = songs.get(id);
    const play = playOf.get(id);
    if (!song || !play) throw new RangeError(`"${id}" is no song of the problem, or has no play.`);
    const guitar = guitars.get(play.guitar);
    const neck = song.necks[play.neck];
    if (!guitar || !neck)
      throw new RangeError(`The play of "${id}" names no guitar or no neck of the problem.`);
    return { song, guitar, neck, play };
  });
  if (songs.size !== order.length || new Set(order).size !== order.length)
    throw new RangeError("The order must hold every song of the problem once.");
  return steps;
}

const bareNeck = (neck: Neck): Neck => ({ open: neck.open, capos: neck.capos });

/** Names the guitars that give capos: the last of a kind to go on are those that were not loose. */
function namingGivers(capos: CapoWork[], taken: Taken[], guitars: readonly ProblemGuitar[]): CapoWork[] {
  if (taken.length === 0) return capos;
  const open = [...taken];
  return capos
    .toReversed()
    .map((capo): CapoWork => {
      const at = capo.action === "on" ? open.findLastIndex(({ kind }) => kind === kindOf(capo.strings)) : -1;
      return at === -1
        ? capo
        : ({ ...capo, takenFrom: guitars[open.splice(at, 1)[0]!.from]!.id } as CapoWork);
    })
    .toReversed();
}

/** Every change of a neck during the set, and the necks when it begins. */
function changesOf(problem: Problem, steps: Step[]) {
  const { times } = problem;
  const number = new Map(problem.guitars.map(({ id }, i) => [id, i]));
  const follow = followNecks(problem);
  const lastUse = new Map<string, number>();
  const first = new Map<string, Neck>();
  const dues: Due[] = [];
  const breaches: Breach[] = [];
  for (const [at, { song, guitar, neck }] of steps.entries()) {
    const last = lastUse.get(guitar.id);
    const { from: was, taken } = follow(number.get(guitar.id)!, neck);
    if (last === undefined) first.set(guitar.id, guitar.start ?? was ?? neck);
    lastUse.set(guitar.id, at);
    if (was === null || was === neck) continue;
    const plain = neckChange(was, neck);
    if (!isChange(plain)) continue;
    if (guitar.keeps && plain.strings.length > 0) {
      const songs = last === undefined ? [song.id] : [steps[last]!.song.id, song.id];
      const message = `"${song.id}" would have this guitar retuned, and it keeps its tuning during the set.`;
      breaches.push({ code: "keeps", songs, message });
    }
    if (at === 0 && problem.crew === "tech") continue;
    const resting = problem.crew === "tech" && last !== at - 1;
    const inHand = resting ? number.get(steps[at - 1]!.guitar.id)! : -1;
    const fromHand = taken.filter(({ from }) => from === inHand).length;
    dues.push({
      at,
      from: last === undefined ? 0 : last + 1,
      guitar: guitar.id,
      change: { strings: plain.strings, capos: namingGivers(plain.capos, taken, problem.guitars) },
      taken: taken.length,
      seconds: changeSeconds(times, plain) + taken.length * times.capoOff,
      waits: fromHand * (times.capoOff + times.capoOn),
      resting,
    });
  }
  const used = problem.guitars.filter(({ id }) => first.has(id));
  const before: GuitarBefore[] = used.map(({ id }) => ({ guitar: id, ...bareNeck(first.get(id)!) }));
  return { before, dues, breaches };
}

function workItems(due: Due, done: number): { onStage: number; work: Work[] } {
  const { guitar, seconds } = due;
  const { strings, capos } = due.change;
  const player = (left: number): Work => ({ guitar, by: "player", strings, capos, seconds: left });
  if (!due.resting) return { onStage: seconds, work: [player(seconds)] };
  const tech: Work = { guitar, by: "tech", strings, capos, seconds: done };
  const left = seconds - done;
  return left > 1e-9 * seconds ? { onStage: left, work: [tech, player(left)] } : { onStage: 0, work: [tech] };
}

/**
 * Every gap and every total of one order with its guitars and necks. Rules, ranges and kept tunings that it breaks are
 * scored all the same and listed in `breaches`.
 *
 * @param order song ids, every song of the problem once
 * @param plays one for each song, in any order
 * @throws RangeError where `order` is not such a list, or a play is missing or names something the problem lacks
 * @example evaluate(problem, ["s1", "s2"], plays).totals.exposed // seconds of dead air
 */
export function evaluate(problem: Problem, order: string[], plays: Play[]): Evaluation {
  const steps = stepsOf(problem, order, plays);
  const { before, dues, breaches } = changesOf(problem, steps);
  const jobs: TechJob[] = dues.map((due) => ({
    from: due.from,
    due: due.at,
    seconds: due.resting ? due.seconds - due.waits : 0,
  }));
  const done = techShift(
    steps.map(({ song }) => song.seconds),
    jobs,
  );

  const totals: Totals = {
    exposed: 0,
    seconds: 0,
    strings: 0,
    semitones: 0,
    capoActions: 0,
    swaps: 0,
    moved: movedSongs(problem.order, order),
  };
  const gaps: EvaluatedGap[] = [];
  let next = 0;
  for (const [at, { song, guitar, neck, play }] of steps.entries()) {
    totals.seconds += neck.penalty;
    totals.exposed += neck.penalty;
    if (!mayPlay(guitar, neck) || !caposSuffice(problem, neck)) {
      const message = `"${song.id}" cannot be played in way ${play.neck + 1} on the guitar chosen for it.`;
      breaches.push({ code: "no-guitar", songs: [song.id], message });
    }
    const due = dues[next]?.at === at ? dues[next]! : null;
    if (at === 0 && !due) continue;
    const swap = at > 0 && steps[at - 1]!.guitar !== guitar;
    const { onStage, work } = due ? workItems(due, done[next]!) : { onStage: 0, work: [] };
    if (due) {
      next += 1;
      totals.strings += due.change.strings.length;
      totals.semitones += semitonesOf(due.change);
      totals.capoActions += due.change.capos.length + due.taken;
    }
    const seconds = onStage + (swap ? problem.times.swap : 0);
    const cover = coverInto(problem.times, song);
    const exposed = Math.max(0, seconds - cover);
    totals.seconds += seconds;
    totals.exposed += exposed;
    totals.swaps += swap ? 1 : 0;
    gaps.push({ into: song.id, swap, seconds, work, cover, exposed });
  }
  const broken = brokenWishes(
    problem,
    steps.map(({ song, neck }) => ({ song: song.id, open: neck.open })),
  );
  if (problem.wishes) totals.wishes = wishSeconds(broken);
  return {
    total: weigh(problem.aim, totals),
    totals,
    order: [...order],
    plays: steps.map(({ play }) => play),
    before,
    gaps,
    breaches: [...orderBreaches(problem, order, totals.moved), ...breaches],
    ...(problem.wishes ? { broken } : {}),
  };
}
