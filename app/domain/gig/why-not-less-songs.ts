import type { Gig } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Lift } from "#app/domain/gig/why-not-less-lift.ts";
import { problemAfter } from "#app/domain/gig/why-not-less-rules.ts";
import { caposWords } from "#app/domain/music/capo.ts";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import type { NeckChoice, Problem } from "#app/domain/planning/problem.ts";

type Words = { title: (id: string) => string; naming: Naming };

function neckWords(neck: Neck, naming: Naming): string {
  const tuning = compactTuning(neck.open, naming);
  return neck.capos.length > 0 ? `${tuning}, ${caposWords(neck.capos, neck.open.length)}` : tuning;
}

const keyOf = ({ open, capos }: Neck) =>
  JSON.stringify([open, capos.map(({ fret, strings }) => [fret, strings.toSorted()]).toSorted()]);

/** How an answer plays a song: "in EADGBE, capo 2". */
function playedIn(problem: Problem, id: string, answer: FoundAnswer, naming: Naming): string | null {
  const play = answer.plays.find((one) => one.song === id);
  const neck = play && problem.songs.find((song) => song.id === id)?.necks[play.neck];
  return neck ? `in ${neckWords(neck, naming)}` : null;
}

/** Each song that is pinned to a guitar or to a way, where that leaves out another. */
export function pinLifts(gig: Gig, plan: SetPlan, repertoire: Repertoire, { title, naming }: Words): Lift[] {
  const guitars = new Map(repertoire.guitars.map((guitar) => [guitar.id, guitar.shortName]));
  return plan.rows.flatMap(({ entry, neck, guitar }) => {
    if (entry.pinned === "none" || !plan.necks.has(entry.id)) return [];
    const free = problemAfter(gig, plan, repertoire, [
      { kind: "entry.set", entryId: entry.id, field: "pinned", value: "none" },
    ]);
    const ways = (problem: Problem) => JSON.stringify(problem.songs.find((song) => song.id === entry.id));
    if (!free || ways(free) === ways(plan.problem)) return [];
    const to = entry.pinned === "neck" ? [] : [guitars.get(guitar?.id ?? "") ?? "its guitar"];
    const as = entry.pinned === "guitar" || !neck ? [] : [neckWords(neck, naming)];
    return [
      {
        name: `${title(entry.id)} pinned to ${[...to, ...as].join(" in ")}`,
        problem: free,
        instead: (answer) => (as.length > 0 ? playedIn(free, entry.id, answer, naming) : null),
      },
    ];
  });
}

/** As many ways as one song of a problem may have. */
const mostWays = 12;

/** Songs that stand between two like them: no hand moves for them. */
function calm(answer: FoundAnswer): Set<string> {
  const still = new Map(answer.gaps.map((gap) => [gap.into, !gap.swap && gap.work.length === 0]));
  return new Set(
    answer.order.filter((id, index) => {
      const next = answer.order[index + 1];
      const before = index === 0 || still.get(id);
      return before && (next === undefined || still.get(next));
    }),
  );
}

/** The ways of a problem's songs, each once, those of most songs first. */
function waysByUse({ songs }: Problem): NeckChoice[] {
  const uses = new Map<string, { neck: NeckChoice; count: number }>();
  for (const neck of songs.flatMap((song) => song.necks)) {
    const known = uses.get(keyOf(neck));
    uses.set(keyOf(neck), { neck, count: (known?.count ?? 0) + 1 });
  }
  return [...uses.values()].toSorted((a, b) => b.count - a.count).map(({ neck }) => neck);
}

/** Each song with one way only, as if it could also be played as any other song of the set is. */
export function onlyWayLifts(
  problem: Problem,
  pinned: ReadonlySet<string>,
  best: FoundAnswer,
  { title, naming }: Words,
): Lift[] {
  const unmoved = calm(best);
  const ways = waysByUse(problem);
  return problem.songs.flatMap((song) => {
    const [only, second] = song.necks;
    if (!only || second || pinned.has(song.id) || unmoved.has(song.id)) return [];
    const others = ways.filter((way) => keyOf(way) !== keyOf(only)).slice(0, mostWays - 1);
    if (others.length === 0) return [];
    const necks = [only, ...others.map((way) => ({ ...way, guitars: null, penalty: 0 }))];
    const songs = problem.songs.map((one) => (one.id === song.id ? { ...one, necks } : one));
    const free = { ...problem, songs };
    return [
      {
        name: `${title(song.id)} only in ${neckWords(only, naming)}`,
        problem: free,
        instead: (answer) => playedIn(free, song.id, answer, naming),
      },
    ];
  });
}
