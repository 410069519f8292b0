import { useMemo, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { Answers } from "#app/components/gig/what-if/answers.tsx";
import { type QuestionProps, useAsked, useUnsupposed } from "#app/components/gig/what-if/question.ts";
import { useOutcomes } from "#app/components/gig/what-if/use-outcomes.ts";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { SelectField } from "#app/components/ui/field.tsx";
import { anotherCapo } from "#app/domain/gig/what-if/another-capo.ts";
import { needsNow } from "#app/domain/gig/what-if/outcome.ts";
import type { ActCapo } from "#app/domain/repertoire/guitar.ts";

/** One more capo of a kind. */
export function AnotherCapoQuestion(props: QuestionProps) {
  const { capos } = props.repertoire;
  const { may } = usePageTools();
  const [picked, setPicked] = useState("");
  const capo = capos.find(({ id }) => id === picked) ?? capos[0];
  if (!capo)
    return (
      <>
        <p className="text-grey-600 text-sm">
          The act has listed no capos, so the plan takes as many as it needs. List those you have to see what
          one more saves.
        </p>
        {may.prepare ? (
          <ButtonLink to="/capos/new" className="self-start">
            Add a capo
          </ButtonLink>
        ) : null}
      </>
    );
  return (
    <>
      <SelectField
        id="what-if-capo"
        label="One more"
        value={capo.id}
        onChange={(event) => setPicked(event.currentTarget.value)}
        hint={capo.count === 1 ? "The act has 1." : `The act has ${capo.count}.`}
      >
        {capos.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </SelectField>
      <WithIt key={capo.id} {...props} capo={capo} />
    </>
  );
}

function WithIt({ capo, ...props }: QuestionProps & { capo: ActCapo }) {
  const { gig, plan, repertoire } = props;
  const { may } = usePageTools();
  const supposed = useMemo(
    () => anotherCapo(gig, plan, repertoire, capo.id),
    [gig, plan, repertoire, capo.id],
  );
  const asked = useAsked(props, supposed);
  const found = useOutcomes(asked, true, useUnsupposed(props, supposed.setIds));
  const next = may.prepare ? (
    <ButtonLink to={`/capos/${capo.id}`} className="self-start max-lg:min-h-12 lg:min-h-9">
      Change how many there are
    </ButtonLink>
  ) : null;
  return (
    <Answers
      found={found}
      now={needsNow(asked)}
      guitars={() => repertoire.guitars}
      unsupposed="Without it"
      use={null}
      next={next}
    />
  );
}
