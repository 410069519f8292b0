import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { certaintyWords } from "#app/domain/gig/certainty.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { infeasibleWords } from "#app/domain/gig/infeasible-words.ts";
import { type GigPlan, planGig, type SetPlan } from "#app/domain/gig/plan.ts";
import { isFound, suggestionEdits } from "#app/domain/gig/suggest.ts";
import { type Needs, needsOf } from "#app/domain/gig/what-if/needs.ts";
import { type Freedom, jobOf, type Known, type Supposed } from "#app/domain/gig/what-if/supposed.ts";
import { changeWords, newStrain, nowUnplayable, titlesOf } from "#app/domain/gig/what-if/what-changes.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** One answer to a question, beside the plan as it stands. */
export type Outcome = {
  /** `as-it-is`: nothing but what is supposed; `spare`: a spare takes over; else what was found with this freedom. */
  kind: "as-it-is" | "spare" | Freedom;
  needs: Needs;
  /** The sets planned anew, as they are and as they would be. */
  sets: { before: SetPlan; after: SetPlan }[];
  /** What else is done otherwise than now, in words. */
  changes: string[];
  /** Titles of songs that no guitar can play then. */
  unplayable: string[];
  /** All that makes the gig so, what is supposed included. */
  edits: Edit[];
  /** How sure it is that nothing needs less, in words; null where that was not asked. */
  certainty: string | null;
  /** Nothing better will come. */
  done: boolean;
  /** A plain string is raised where none is now. */
  strain: boolean;
};

/** A question with what its answers are set against. */
export type Asked = {
  gig: Gig;
  now: GigPlan;
  supposed: Supposed;
  /** The gig as supposed, planned. */
  planned: GigPlan;
  naming: Naming;
};

/** A question ready to be answered. */
export function askedOf(gig: Gig, now: GigPlan, supposed: Supposed, naming: Naming): Asked {
  return { gig, now, supposed, planned: planGig(supposed.gig, supposed.repertoire, naming), naming };
}

/** What the sets in question need now. */
export function needsNow({ now, supposed }: Asked): Needs {
  return needsOf(now.sets.filter((one) => supposed.setIds.includes(one.set.id)));
}

function told(
  asked: Asked,
  after: GigPlan,
): Pick<Outcome, "needs" | "sets" | "changes" | "unplayable" | "strain"> {
  const { gig, now, supposed, naming } = asked;
  const sets = now.sets.flatMap((before) => {
    const then = after.sets.find((one) => one.set.id === before.set.id);
    return then && supposed.setIds.includes(before.set.id) ? [{ before, after: then }] : [];
  });
  const titled = sets.map((pair) => ({
    ...pair,
    title: titlesOf([supposed.gig, gig], pair.before.set.id, supposed.repertoire),
  }));
  const afters = sets.map((pair) => pair.after);
  return {
    needs: needsOf(afters),
    sets,
    changes: titled.flatMap((pair) => changeWords(pair.before, pair.after, pair.title, naming)),
    unplayable: titled.flatMap((pair) => nowUnplayable(pair.before.rows, pair.after.rows, pair.title)),
    strain: newStrain(
      sets.map((pair) => pair.before),
      afters,
    ),
  };
}

/** What is supposed, with order, guitars and ways as they are now. */
export function asItIs(asked: Asked): Outcome {
  return {
    kind: "as-it-is",
    ...told(asked, asked.planned),
    edits: asked.supposed.edits,
    certainty: null,
    done: true,
  };
}

/** One answered problem and the name of its set. */
export type Answered = { name: string; problem: Problem; answer: FoundAnswer };

/**
 * How sure it is that nothing needs less, by what the gig looks at first: one sentence, or one for each set where they
 * differ.
 * @example certaintyOf(gig, "any-order", answered) // "Set 1, proven: no order needs less dead air. Set 2, not proven: …"
 */
export function certaintyOf(gig: Pick<Gig, "aim">, freedom: Freedom, answered: readonly Answered[]): string {
  const told = answered.map(({ name, problem, answer }) => ({
    name,
    words: certaintyWords(problem, answer, freedom, gig.aim.kind),
  }));
  const different = new Set(told.map(({ words }) => words));
  if (different.size <= 1) return told[0]?.words ?? "";
  return told
    .map(({ name, words }) => `${name}, ${words.charAt(0).toLowerCase()}${words.slice(1)}`)
    .join(" ");
}

/** What was found with a freedom so far. `refused`: why there is no order at all; null: nothing is known yet. */
export type Found = { outcome: Outcome | null; refused: string[] };

/**
 * The answer to a question with the freedom to choose guitars and ways, or the order too, as far as it is known.
 * @param known what the search knows, by the keys of `jobsOf`
 * @example foundOutcome(asked, "any-order", known).outcome?.needs.exposed // 20
 */
export function foundOutcome(asked: Asked, freedom: Freedom, known: ReadonlyMap<string, Known>): Found {
  const { supposed, planned, naming } = asked;
  const sets = planned.sets.filter(
    (set) => supposed.setIds.includes(set.set.id) && set.problem.songs.length > 0,
  );
  const jobs = sets.map((set) => jobOf(set, set.problem.songs.length > 1 ? freedom : "same-order"));
  const edits: Edit[] = [];
  const answered: Answered[] = [];
  for (const [index, set] of sets.entries()) {
    const answer = known.get(jobs[index]!.key)?.answer;
    if (!answer) return { outcome: null, refused: [] };
    if (!isFound(answer))
      return { outcome: null, refused: infeasibleWords(supposed.gig, set, answer, supposed.repertoire) };
    edits.push(...suggestionEdits(supposed.gig, set, answer));
    answered.push({ name: set.set.name, problem: jobs[index]!.problem, answer });
  }
  const applied = applyEdits(supposed.gig, edits);
  if (!applied.ok) return { outcome: null, refused: [applied.conflict.message] };
  const done = jobs.every((job) => known.get(job.key)?.done);
  const outcome: Outcome = {
    kind: freedom,
    ...told(asked, planGig(applied.gig, supposed.repertoire, naming)),
    edits: [...supposed.edits, ...edits],
    certainty: done ? certaintyOf(supposed.gig, freedom, answered) : null,
    done,
  };
  return { outcome, refused: [] };
}
