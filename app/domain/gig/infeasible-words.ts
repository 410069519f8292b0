import { entryTitles } from "#app/domain/gig/entry-titles.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { pairWords, placeName } from "#app/domain/gig/rule-names.ts";
import type { InfeasibleAnswer, Reason } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** The rules among some songs, each in a few words. */
function rulesAmong(problem: Problem, songs: readonly string[], title: (id: string) => string): string[] {
  const among = new Set(songs);
  const { at, before, into, apart } = problem.rules;
  const pair =
    (kind: "before" | "into" | "apart") =>
    ([a, b]: [string, string]) =>
      among.has(a) && among.has(b) ? [pairWords(kind, title(a), title(b))] : [];
  return [
    ...Object.entries(at).flatMap(([id, place]) =>
      among.has(id) ? [`${title(id)} ${placeName(place, problem)}`] : [],
    ),
    ...into.flatMap(pair("into")),
    ...before.flatMap(pair("before")),
    ...apart.flatMap(pair("apart")),
  ];
}

/** The songs of a reason that belong to the encore, where others do not. */
function inEncore(problem: Problem, songs: readonly string[]): string[] {
  const encore = new Set(problem.songs.flatMap((song) => (song.section === 1 ? [song.id] : [])));
  const later = songs.filter((id) => encore.has(id));
  return later.length < songs.length ? later : [];
}

function reasonWords({ code, songs }: Reason, problem: Problem, title: (id: string) => string): string {
  const names = songs.map(title).join(", ");
  if (code === "no-guitar")
    return `No guitar can play ${names}. Give it another tuning or widen a guitar's range.`;
  if (code === "keeps")
    return `${names}: a guitar that keeps its tuning would have to be retuned. Move one to another guitar.`;
  if (code === "moved")
    return `${names}: the rules ask for more songs to move than this allows. Try any order.`;
  const rules = rulesAmong(problem, songs, title);
  const encore = inEncore(problem, songs).map((id) => `${title(id)} in the encore`);
  const what = rules.length > 0 ? [...rules, ...encore].join(", ") : names;
  if (rules.length + encore.length === 1) return `${what}: this cannot be. Change its rule.`;
  return `${what}: these contradict each other. Free one of them.`;
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
  const title = entryTitles(gig, plan.set.id, repertoire);
  return answer.why.map((reason) => reasonWords(reason, plan.problem, title));
}
