import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { leastChange } from "#app/domain/gig/least-change.ts";
import { longestRising } from "#app/domain/gig/longest-rising.ts";
import { reorderEdits } from "#app/domain/gig/order.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { caposWords } from "#app/domain/music/capo.ts";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Answer, FoundAnswer, InfeasibleAnswer, Reason, Totals } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** How much a performer gives up: only the choice of guitars, or the order too. */
export type Rung = "same-order" | "any-order";

/** A set's problem as one rung asks it. */
export function rungProblem(problem: Problem, rung: Rung): Problem {
  return { ...problem, maxMoved: rung === "same-order" ? 0 : null };
}

/**
 * The edits that make a set what an answer says: songs outside a longest common run get a new place, and songs whose
 * guitar or way changes get these. What is pinned was fixed in the problem, so it never changes.
 */
export function suggestionEdits(gig: Gig, plan: SetPlan, found: FoundAnswer): Edit[] {
  const answer = leastChange(plan.problem, plan.plays, found);
  const entries = new Map(gig.entries.map((entry) => [entry.id, entry]));
  const choices = answer.plays.flatMap(({ song, guitar, neck }): Edit[] => {
    const entry = entries.get(song);
    const neckId = plan.necks.get(song)?.[neck]?.id;
    if (!entry || neckId === undefined) return [];
    const edits: Edit[] = [];
    if (entry.guitarId !== guitar)
      edits.push({ kind: "entry.set", entryId: song, field: "guitarId", value: guitar });
    if (entry.neckId !== neckId)
      edits.push({ kind: "entry.set", entryId: song, field: "neckId", value: neckId });
    return edits;
  });
  return [...reorderEdits(gig, plan.set.id, answer.order), ...choices];
}

/** What a suggestion changes and gains, in words. */
export type Suggested = {
  /** Whether its total is less than what the set needs now. */
  gains: boolean;
  /** Seconds of dead air fewer than now. */
  saved: number;
  totals: Totals;
  /** "Night Ploughing before Glasshouse" */
  moves: string[];
  /** "To Birch: Salt on the Step, Stonecrop", "Low Meadow in DADGAD, no capo" */
  changes: string[];
  proven: boolean;
  /** How sure this is: proven least, or how much less may still be possible. */
  certainty: string;
};

function movesOf(
  present: readonly string[],
  order: readonly string[],
  title: (id: string) => string,
): string[] {
  const places = new Map(present.map((id, index) => [id, index]));
  const kept = new Set(longestRising(order.map((id) => places.get(id) ?? 0)).map((index) => order[index]));
  return order.flatMap((id, index) => {
    if (kept.has(id)) return [];
    const next = order.slice(index + 1).find((other) => kept.has(other));
    return [next === undefined ? `${title(id)} to the end` : `${title(id)} before ${title(next)}`];
  });
}

/** What each song takes up instead: one line a guitar, one a song that is played another way. */
function changesOf(
  plan: SetPlan,
  answer: FoundAnswer,
  repertoire: Repertoire,
  title: (id: string) => string,
  naming: Naming,
): string[] {
  const now = new Map(plan.plays.map((play) => [play.song, play]));
  const changed = answer.plays.filter(({ song, guitar }) => now.get(song)?.guitar !== guitar);
  const toGuitars = repertoire.guitars.flatMap((guitar) => {
    const songs = changed.filter((play) => play.guitar === guitar.id).map((play) => title(play.song));
    return songs.length > 0 ? [`To ${guitar.shortName}: ${songs.join(", ")}`] : [];
  });
  const ways = answer.plays.flatMap(({ song, neck }) => {
    const way = plan.necks.get(song)?.[neck];
    if (now.get(song)?.neck === neck || !way) return [];
    return [
      `${title(song)} in ${compactTuning(way.open, naming)}, ${caposWords(way.capos, way.open.length)}`,
    ];
  });
  return [...toGuitars, ...ways];
}

function certaintyOf(plan: SetPlan, answer: FoundAnswer, rung: Rung): string {
  if (answer.status === "optimal") {
    return rung === "any-order"
      ? "Proven: nothing needs less than this."
      : "Proven: no choice of guitars needs less in this order.";
  }
  const weight = plan.problem.aim.exposed || 1;
  const less = Math.ceil((answer.total - answer.bound) / weight);
  return `Not proven: at most ${less} s less may be possible.`;
}

/** Compares an answer with the set as it stands. */
export function describeSuggestion(
  gig: Gig,
  plan: SetPlan,
  {
    answer: found,
    rung,
    repertoire,
    naming,
  }: { answer: FoundAnswer; rung: Rung; repertoire: Repertoire; naming: Naming },
): Suggested {
  const title = titlesOf(gig, repertoire);
  const answer = leastChange(plan.problem, plan.plays, found);
  const tolerance = 1e-6 * Math.max(1, plan.evaluation.total);
  return {
    gains: plan.evaluation.breaches.length > 0 || answer.total < plan.evaluation.total - tolerance,
    saved: plan.evaluation.totals.exposed - answer.totals.exposed,
    totals: answer.totals,
    moves: movesOf(plan.problem.order, answer.order, title),
    changes: changesOf(plan, answer, repertoire, title, naming),
    proven: answer.status === "optimal",
    certainty: certaintyOf(plan, answer, rung),
  };
}

function titlesOf(gig: Gig, repertoire: Repertoire): (entryId: string) => string {
  const songs = new Map(repertoire.songs.map((song) => [song.id, song.title]));
  const titles = new Map(gig.entries.map((entry) => [entry.id, songs.get(entry.songId) ?? "A song"]));
  return (entryId) => titles.get(entryId) ?? "A song";
}

function placeWords(place: number, songs: number): string {
  if (place > songs || place < 1) return "at a place the set does not have";
  return place === 1 ? "first" : place === songs ? "last" : `at place ${place}`;
}

/** The rules among some songs, each in a few words. */
function rulesAmong(problem: Problem, songs: readonly string[], title: (id: string) => string): string[] {
  const among = new Set(songs);
  const { at, before, into, apart } = problem.rules;
  const pair =
    (words: (a: string, b: string) => string) =>
    ([a, b]: [string, string]) =>
      among.has(a) && among.has(b) ? [words(title(a), title(b))] : [];
  return [
    ...Object.entries(at).flatMap(([id, place]) =>
      among.has(id) ? [`${title(id)} ${placeWords(place, problem.songs.length)}`] : [],
    ),
    ...into.flatMap(pair((a, b) => `${a} straight into ${b}`)),
    ...before.flatMap(pair((a, b) => `${a} before ${b}`)),
    ...apart.flatMap(pair((a, b) => `${a} and ${b} apart`)),
  ];
}

function reasonWords({ code, songs }: Reason, problem: Problem, title: (id: string) => string): string {
  const names = songs.map(title).join(", ");
  if (code === "no-guitar")
    return `No guitar can play ${names}. Give it another tuning or widen a guitar's range.`;
  if (code === "keeps") {
    return `${names}: a guitar that keeps its tuning would have to be retuned. Move one to another guitar.`;
  }
  if (code === "moved")
    return `${names}: the rules ask for more songs to move than this allows. Try any order.`;
  const rules = rulesAmong(problem, songs, title);
  const what = rules.length > 0 ? rules.join(", ") : names;
  return `${what}: ${rules.length === 1 ? "this cannot be" : "these contradict each other"}. Free one of them.`;
}

/**
 * Why no order can be had, with the songs' titles and what to do.
 * @example infeasibleWords(gig, plan, answer, repertoire)
 *   // ["Ferry straight into Lamps, Lamps before Ferry: these contradict each other. Free one of them."]
 */
export function infeasibleWords(
  gig: Gig,
  plan: SetPlan,
  answer: InfeasibleAnswer,
  repertoire: Repertoire,
): string[] {
  const title = titlesOf(gig, repertoire);
  return answer.why.map((reason) => reasonWords(reason, plan.problem, title));
}

/** Whether an answer is an order at all. */
export function isFound(answer: Answer): answer is FoundAnswer {
  return answer.status !== "infeasible";
}
