import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig, Rule } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import { pairWords, placeName } from "#app/domain/gig/rule-names.ts";
import type { InfeasibleAnswer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** One thing that ties a set's order, and what frees it. */
export type Freeing = {
  /** "Harrow Weather held first", "Ferry straight into Lamps" */
  name: string;
  songs: string[];
  edits: Edit[];
};

/** What takes back that a song is held at a place: its rule, and that the set holds its first or last song. */
function freeingEdits(gig: Gig, { set, problem }: SetPlan, id: string, place: number): Edit[] {
  const ruled = gig.rules.filter((rule) => rule.kind === "at" && rule.entry === id);
  const edits = ruled.map((rule): Edit => ({ kind: "rule.remove", ruleId: rule.id }));
  const setId = set.id;
  if (place === 1 && set.holdFirst) edits.push({ kind: "set.set", setId, field: "holdFirst", value: false });
  if (place === problem.songs.length && set.holdLast)
    edits.push({ kind: "set.set", setId, field: "holdLast", value: false });
  return edits;
}

/** The encore's first place is always held: the applause before an encore belongs to it, whoever opens it. */
function opensEncore({ songs }: Problem, id: string, place: number): boolean {
  const main = songs.filter((song) => song.section === 0).length;
  return main > 0 && place === main + 1 && songs.some((song) => song.id === id && song.section === 1);
}

/** Sections see to it already that what belongs to the set comes before what belongs to the encore. */
function saysNothing({ songs }: Problem, rule: Rule): boolean {
  if (rule.kind !== "before") return false;
  const section = (id: string) => songs.find((song) => song.id === id)?.section ?? 0;
  return section(rule.a) < section(rule.b);
}

/**
 * Each song of a set that is held at a place, and each rule between two of its songs, with the edits that free it.
 * @example freeingsOf(gig, plan, title).map(({ name }) => name) // ["Lamps held first", "Ferry before Home"]
 */
export function freeingsOf(gig: Gig, plan: SetPlan, title: (id: string) => string): Freeing[] {
  const { problem } = plan;
  const inSet = new Set(problem.order);
  const held = Object.entries(problem.rules.at)
    .filter(([id, place]) => !opensEncore(problem, id, place))
    .map(([id, place]) => ({
      name: `${title(id)} held ${placeName(place, problem)}`,
      songs: [id],
      edits: freeingEdits(gig, plan, id, place),
    }));
  const pairs = gig.rules.flatMap((rule): Freeing[] => {
    if (rule.kind === "at" || !inSet.has(rule.a) || !inSet.has(rule.b) || saysNothing(problem, rule))
      return [];
    const { kind, a, b } = rule;
    const edits: Edit[] = [{ kind: "rule.remove", ruleId: rule.id }];
    return [{ name: pairWords(kind, title(a), title(b)), songs: [a, b], edits }];
  });
  return [...held, ...pairs].filter(({ edits }) => edits.length > 0);
}

/**
 * What may be freed so that a set without any order gets one: of rules that contradict each other, each of them.
 * @example mendsOf(gig, plan, answer, title).map(({ name }) => name) // ["Ferry straight into Lamps", "Lamps before Ferry"]
 */
export function mendsOf(
  gig: Gig,
  plan: SetPlan,
  answer: InfeasibleAnswer,
  title: (id: string) => string,
): Freeing[] {
  const among = answer.why.filter(({ code }) => code === "rules").map(({ songs }) => new Set(songs));
  return freeingsOf(gig, plan, title).filter(({ songs }) =>
    among.some((named) => songs.every((id) => named.has(id))),
  );
}
