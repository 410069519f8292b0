import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig, Rule } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { pairWords, placeName } from "#app/domain/gig/rule-names.ts";
import { setProblem } from "#app/domain/gig/set-problem.ts";
import { type Lift, nothingInstead } from "#app/domain/gig/why-not-less-lift.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** The set's problem after some edits of the gig. */
export function problemAfter(
  gig: Gig,
  plan: SetPlan,
  repertoire: Repertoire,
  edits: readonly Edit[],
): Problem | null {
  const applied = applyEdits(gig, edits);
  return applied.ok ? setProblem(applied.gig, plan.set.id, repertoire).problem : null;
}

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

/** Each song that is held at a place, and each rule between two songs. */
export function ruleLifts(
  gig: Gig,
  plan: SetPlan,
  repertoire: Repertoire,
  title: (id: string) => string,
): Lift[] {
  const { problem } = plan;
  const inSet = new Set(problem.order);
  const lift = (name: string, edits: Edit[]): Lift[] => {
    const without = edits.length > 0 ? problemAfter(gig, plan, repertoire, edits) : null;
    return without ? [{ name, problem: without, instead: nothingInstead }] : [];
  };
  const held = Object.entries(problem.rules.at)
    .filter(([id, place]) => !opensEncore(problem, id, place))
    .flatMap(([id, place]) =>
      lift(`${title(id)} held ${placeName(place, problem)}`, freeingEdits(gig, plan, id, place)),
    );
  const pairs = gig.rules.flatMap((rule) => {
    if (rule.kind === "at" || !inSet.has(rule.a) || !inSet.has(rule.b) || saysNothing(problem, rule))
      return [];
    return lift(pairWords(rule.kind, title(rule.a), title(rule.b)), [
      { kind: "rule.remove", ruleId: rule.id },
    ]);
  });
  return [...held, ...pairs];
}
