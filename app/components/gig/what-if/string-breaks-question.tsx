import { useMemo, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { usePlannerAnswers } from "#app/components/gig/planner/use-planner-answers.ts";
import { Answers, Caution } from "#app/components/gig/what-if/answers.tsx";
import type { QuestionProps } from "#app/components/gig/what-if/question.ts";
import { SongChoice } from "#app/components/gig/what-if/song-choice.tsx";
import { freedoms, type Outcomes } from "#app/components/gig/what-if/use-outcomes.ts";
import { SelectField } from "#app/components/ui/field.tsx";
import type { Crew } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import { replannedOutcome, restJobs, spareOutcome } from "#app/domain/gig/what-if/break-outcomes.ts";
import { needsOf } from "#app/domain/gig/what-if/needs.ts";
import type { Outcome } from "#app/domain/gig/what-if/outcome.ts";
import { restAsPlanned } from "#app/domain/gig/what-if/rest-plan.ts";
import { afterBreak, type Spare } from "#app/domain/gig/what-if/string-breaks.ts";
import { caposWords } from "#app/domain/music/capo.ts";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { usualEffort } from "#app/domain/planning/search.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** A string breaks on a guitar before a song: its spare, or the rest of the set from the necks as they are. */
export function StringBreaksQuestion(props: QuestionProps) {
  const { plan, repertoire } = props;
  const rows = plan.sets.flatMap((set) => set.rows).filter((row) => row.left === null);
  const [song, setSong] = useState("");
  const [broken, setBroken] = useState("");
  const row = rows.find(({ entry }) => entry.id === song) ?? rows[0];
  const set = plan.sets.find((one) => one.rows.some(({ entry }) => entry.id === row?.entry.id));
  const guitar = repertoire.guitars.find(({ id }) => id === broken) ?? row?.guitar;
  if (!row || !set || !guitar) return <p className="text-grey-600">No song of this gig is planned yet.</p>;
  return (
    <>
      <div className="grid grid-cols-1 gap-3 sm:max-lg:grid-cols-2">
        <SongChoice
          id="what-if-break-song"
          label="Before"
          plan={plan}
          value={row.entry.id}
          onChange={(entryId) => {
            setSong(entryId);
            setBroken("");
          }}
        />
        <SelectField
          id="what-if-break-guitar"
          label="On"
          value={guitar.id}
          onChange={(event) => setBroken(event.currentTarget.value)}
        >
          {repertoire.guitars.map(({ id, name }) => (
            <option key={id} value={id}>
              {name}
            </option>
          ))}
        </SelectField>
      </div>
      <Broken
        key={`${row.entry.id}/${guitar.id}`}
        {...props}
        set={set}
        entryId={row.entry.id}
        guitar={guitar}
      />
    </>
  );
}

/** How the spare should stand when it is taken up. */
function spareWords({ guitar, neck, takes }: Spare, crew: Crew, naming: Naming): string {
  if (takes.length === 0) return `Nothing of the rest is on the guitar, so ${guitar.name} is not needed.`;
  const verb = crew === "tech" ? "Hand over" : "Take";
  return `${verb} ${guitar.name}, prepared alike: ${compactTuning(neck.open, naming)}, ${caposWords(neck.capos, neck.open.length)}.`;
}

type BrokenProps = QuestionProps & { set: SetPlan; entryId: string; guitar: Guitar };

function Broken({ gig, set, repertoire, entryId, guitar }: BrokenProps) {
  const { naming } = usePageTools();
  const about = useMemo(() => {
    const rest = afterBreak(gig, set, repertoire, { entryId, guitarId: guitar.id });
    return { gig, plan: set, rest, repertoire, naming };
  }, [gig, set, repertoire, entryId, guitar.id, naming]);
  const now = useMemo(() => restAsPlanned(set, entryId), [set, entryId]);
  const jobs = useMemo(() => restJobs(about), [about]);
  const { known, begun, failed } = usePlannerAnswers(jobs, { effort: usualEffort });
  const found = useMemo((): Outcomes => {
    const anew = freedoms.map((freedom) => replannedOutcome(about, now, freedom, known));
    return {
      outcomes: [spareOutcome(about, now) ?? [], anew.flatMap(({ outcome }) => outcome ?? [])].flat(),
      unsupposed: [],
      refused: [...new Set(anew.flatMap(({ refused }) => refused))],
      working: begun && jobs.some((job) => !known.get(job.key)?.done),
      failed,
    };
  }, [about, now, jobs, known, begun, failed]);
  const title = set.rows.find(({ entry }) => entry.id === entryId)?.song?.title ?? "this song";
  const { spare } = about.rest;
  return (
    <>
      {spare ? null : <p className="text-sm">{guitar.name} has no spare. The rest goes to other guitars.</p>}
      {jobs.length === 0 ? <p>No guitar of yours can take what is left of the set.</p> : null}
      <Answers
        found={found}
        now={needsOf([now])}
        nowName="As planned"
        guitars={() => repertoire.guitars}
        use={() => `${guitar.name} out before ${title}`}
        head={(outcome: Outcome) =>
          outcome.kind === "spare" && spare ? (
            <p className="font-semibold">{spareWords(spare, gig.crew, naming)}</p>
          ) : null
        }
        next={<Caution />}
      />
    </>
  );
}
