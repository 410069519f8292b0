import type { Edit } from "#app/domain/gig/edit.ts";
import { entryTitles } from "#app/domain/gig/entry-titles.ts";
import { infeasibleWords } from "#app/domain/gig/infeasible-words.ts";
import { leastChange } from "#app/domain/gig/least-change.ts";
import { reorderEdits } from "#app/domain/gig/order.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import { isFound } from "#app/domain/gig/suggest.ts";
import { needsOf } from "#app/domain/gig/what-if/needs.ts";
import { certaintyOf, type Found, type Outcome } from "#app/domain/gig/what-if/outcome.ts";
import { type RestOf, restPlan } from "#app/domain/gig/what-if/rest-plan.ts";
import { type Freedom, freed, type Job, type Known } from "#app/domain/gig/what-if/supposed.ts";
import { changeWords, newStrain } from "#app/domain/gig/what-if/what-changes.ts";
import type { Play } from "#app/domain/planning/answer.ts";

/** The problems to be solved for the rest of a set, the cheap one first. */
export function restJobs({ plan, rest }: Pick<RestOf, "plan" | "rest">): Job[] {
  const coming = rest.problem.songs.length - (rest.justPlayed === null ? 0 : 1);
  if (coming === 0) return [];
  const freedoms: Freedom[] = coming > 1 ? ["same-order", "any-order"] : ["same-order"];
  return freedoms.map((freedom) => {
    const problem = freed(rest.problem, freedom);
    return { key: JSON.stringify(problem), setId: plan.set.id, freedom, problem };
  });
}

/** The edits that have the songs still to come played so. */
function restEdits({ gig, plan, rest }: RestOf, order: readonly string[], plays: readonly Play[]): Edit[] {
  const entries = new Map(gig.entries.map((entry) => [entry.id, entry]));
  const coming = order.filter((id) => id !== rest.justPlayed);
  const choices = plays.flatMap(({ song, guitar, neck }): Edit[] => {
    const entry = entries.get(song);
    const neckId = rest.necks.get(song)?.[neck]?.id;
    if (song === rest.justPlayed || !entry || neckId === undefined) return [];
    const chosen = { kind: "entry.set", entryId: song } as const;
    return [
      ...(entry.guitarId === guitar ? [] : [{ ...chosen, field: "guitarId", value: guitar } as const]),
      ...(entry.neckId === neckId ? [] : [{ ...chosen, field: "neckId", value: neckId } as const]),
    ];
  });
  return [...reorderEdits(gig, plan.set.id, coming), ...choices];
}

function restOutcome(
  of: RestOf,
  now: SetPlan,
  { order, plays }: { order: readonly string[]; plays: readonly Play[] },
): Omit<Outcome, "kind" | "certainty" | "done" | "unplayable"> {
  const after = restPlan(of, order, plays);
  const title = entryTitles(of.gig, of.plan.set.id, of.repertoire);
  return {
    needs: needsOf([after]),
    sets: [{ before: now, after }],
    changes: changeWords(now, after, title, of.naming),
    edits: restEdits(of, order, plays),
    strain: newStrain([now], [after]),
  };
}

/** The spare takes over all that it can, and nothing else changes; null where the guitar has none. */
export function spareOutcome(of: RestOf, now: SetPlan): Outcome | null {
  const { spare, problem } = of.rest;
  if (!spare) return null;
  const title = entryTitles(of.gig, of.plan.set.id, of.repertoire);
  return {
    kind: "spare",
    ...restOutcome(of, now, { order: problem.order, plays: spare.plays }),
    unplayable: spare.cannot.map(title),
    certainty: null,
    done: true,
  };
}

/** The rest planned anew from the necks as they are, as far as it is known. */
export function replannedOutcome(
  of: RestOf,
  now: SetPlan,
  freedom: Freedom,
  known: ReadonlyMap<string, Known>,
): Found {
  const job = restJobs(of).find((one) => one.freedom === freedom);
  const { answer, done } = (job && known.get(job.key)) ?? { answer: null, done: false };
  if (!job || !answer) return { outcome: null, refused: [] };
  if (!isFound(answer)) {
    const words = infeasibleWords(of.gig, { ...of.plan, problem: job.problem }, answer, of.repertoire);
    return { outcome: null, refused: words };
  }
  const { plays, order } = leastChange(job.problem, of.plan.plays, answer);
  const title = entryTitles(of.gig, of.plan.set.id, of.repertoire);
  const outcome: Outcome = {
    kind: freedom,
    ...restOutcome(of, now, { order, plays }),
    unplayable: of.rest.unplayable.map(title),
    certainty: done ? certaintyOf(of.gig, freedom, [{ name: "", problem: job.problem, answer }]) : null,
    done,
  };
  return { outcome, refused: [] };
}
