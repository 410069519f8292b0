import { useMemo } from "react";
import { Answers } from "#app/components/gig/what-if/answers.tsx";
import { type QuestionProps, useAsked, useUnsupposed } from "#app/components/gig/what-if/question.ts";
import { useOutcomes } from "#app/components/gig/what-if/use-outcomes.ts";
import { otherCrew } from "#app/domain/gig/what-if/other-crew.ts";
import { needsNow } from "#app/domain/gig/what-if/outcome.ts";

/** A tech at the side where there is none, or none where there is one. */
export function OtherCrewQuestion(props: QuestionProps) {
  const { gig, plan, repertoire } = props;
  const supposed = useMemo(() => otherCrew(gig, plan, repertoire), [gig, plan, repertoire]);
  const asked = useAsked(props, supposed);
  const found = useOutcomes(asked, true, useUnsupposed(props, supposed.setIds));
  const comes = supposed.gig.crew === "tech";
  return (
    <>
      <p className="text-grey-600 text-sm leading-snug">
        {comes
          ? `Resting guitars are changed at the side while songs are played. A change of guitar takes ${supposed.gig.times.swap}\u00a0s.`
          : `You do everything on stage. A change of guitar takes ${supposed.gig.times.swap}\u00a0s.`}
      </p>
      <Answers
        found={found}
        now={needsNow(asked)}
        guitars={() => repertoire.guitars}
        unsupposed={comes ? "Without a tech" : "With the tech"}
        use={() => (comes ? "Bring a tech" : "Do without a tech")}
      />
    </>
  );
}
