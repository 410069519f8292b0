import { useMemo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { usePlannerAnswers } from "#app/components/gig/planner/use-planner-answers.ts";
import { Answers, Caution } from "#app/components/gig/what-if/answers.tsx";
import { type QuestionProps, useUnsupposed } from "#app/components/gig/what-if/question.ts";
import { eachOnce, freedoms, type Outcomes, outcomesOf } from "#app/components/gig/what-if/use-outcomes.ts";
import { ButtonLink } from "#app/components/ui/button.tsx";
import {
  type NewGuitar,
  newGuitars,
  standingOf,
  standingWords,
} from "#app/domain/gig/what-if/one-more-guitar.ts";
import {
  type Asked,
  askedOf,
  foundOutcome,
  needsNow,
  type Outcome,
} from "#app/domain/gig/what-if/outcome.ts";
import { type Freedom, type Job, jobsOf, type Known } from "#app/domain/gig/what-if/supposed.ts";
import { usualEffort } from "#app/domain/planning/search.ts";

type Tried = { guitar: NewGuitar; asked: Asked; jobs: Job[] };

/** The best that any of the guitars makes of a freedom, once all of them are known. */
function bestOf(
  tried: readonly Tried[],
  freedom: Freedom,
  known: ReadonlyMap<string, Known>,
): { outcome: Outcome; tried: Tried } | null {
  const found = tried.map((one) => ({ tried: one, ...foundOutcome(one.asked, freedom, known) }));
  const best = found
    .flatMap(({ outcome, tried: one }) => (outcome ? [{ outcome, tried: one }] : []))
    .toSorted((a, b) => a.outcome.needs.total - b.outcome.needs.total)[0];
  return found.every(({ outcome, refused }) => outcome || refused.length > 0) ? (best ?? null) : null;
}

/** What one guitar more would save, which it should be, how it should stand, and what it takes. */
export function OneMoreGuitarQuestion(props: QuestionProps) {
  const { gig, plan, repertoire } = props;
  const { naming, may } = usePageTools();
  const tried = useMemo(
    () =>
      newGuitars(gig, plan, repertoire, naming).map((guitar): Tried => {
        const asked = askedOf(gig, plan, guitar.supposed, naming);
        const all = jobsOf(asked.planned, guitar.supposed.setIds);
        return {
          guitar,
          asked,
          jobs: guitar.retuned ? all : all.filter((job) => job.freedom === "same-order"),
        };
      }),
    [gig, plan, repertoire, naming],
  );
  const unsupposed = useUnsupposed(props, tried[0]?.guitar.supposed.setIds ?? []);
  const jobs = useMemo(() => {
    const own = jobsOf(unsupposed.planned, unsupposed.supposed.setIds);
    const all = [...tried.flatMap((one) => one.jobs), ...own];
    return eachOnce([
      ...all.filter((job) => job.freedom === "same-order"),
      ...all.filter((job) => job.freedom === "any-order"),
    ]);
  }, [tried, unsupposed]);
  const { known, begun, failed } = usePlannerAnswers(jobs, { effort: usualEffort });
  const free = useMemo(() => tried.filter(({ guitar }) => guitar.retuned), [tried]);
  const best = useMemo(
    () => freedoms.flatMap((freedom) => bestOf(free, freedom, known) ?? []),
    [free, known],
  );
  const working = begun && jobs.some((job) => !known.get(job.key)?.done);
  const found: Outcomes = {
    outcomes: best.map(({ outcome }) => outcome),
    unsupposed: outcomesOf(unsupposed, known),
    refused: [],
    working,
    failed,
  };
  const first = tried[0];
  if (!first) return <p className="text-grey-600">The planner takes 12 guitars, and the act has as many.</p>;
  const of = (outcome: Outcome) => best.find((one) => one.outcome === outcome)!.tried;
  return (
    <Answers
      found={found}
      now={needsNow(first.asked)}
      guitars={(outcome) => of(outcome).asked.supposed.repertoire.guitars}
      unsupposed="Without it"
      use={null}
      head={(outcome) => (
        <div className="leading-snug">
          <p className="font-semibold">{of(outcome).guitar.words}</p>
          {standingWords(standingOf(outcome), naming).map((words) => (
            <p key={words}>{words}</p>
          ))}
        </div>
      )}
      next={
        <>
          {may.prepare ? (
            <ButtonLink to="/guitars/new" className="self-start max-lg:min-h-12 lg:min-h-9">
              Add a guitar
            </ButtonLink>
          ) : null}
          <Staying tried={tried} known={known} />
          <Caution quiet />
        </>
      }
    />
  );
}

/** As many tunings are listed. */
const tuningsListed = 6;

/** What the guitar saves where it is never retuned: each tuning of the set with the dead air that is left. */
function Staying({ tried, known }: { tried: readonly Tried[]; known: ReadonlyMap<string, Known> }) {
  const rows = useMemo(
    () =>
      tried
        .filter(({ guitar }) => !guitar.retuned)
        .flatMap(({ guitar, asked }) => {
          const { outcome } = foundOutcome(asked, "same-order", known);
          return outcome ? [{ guitar, needs: outcome.needs }] : [];
        })
        .toSorted((a, b) => a.needs.total - b.needs.total)
        .slice(0, tuningsListed),
    [tried, known],
  );
  if (rows.length === 0) return null;
  return (
    <div>
      <h4 className="font-semibold text-base">If it stays in one tuning, in this order</h4>
      <dl className="font-display text-base">
        {rows.map(({ guitar, needs }) => (
          <div key={guitar.key} className="flex justify-between border-grey-200 border-t py-1">
            <dt>{guitar.words}</dt>
            <dd className="tabular">{Math.round(needs.exposed)} s</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}
