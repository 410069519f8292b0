import { useMemo, useState } from "react";
import { Answers } from "#app/components/gig/what-if/answers.tsx";
import { type QuestionProps, useAsked, useUnsupposed } from "#app/components/gig/what-if/question.ts";
import { useOutcomes } from "#app/components/gig/what-if/use-outcomes.ts";
import { SelectField } from "#app/components/ui/field.tsx";
import { oneGuitarFewer } from "#app/domain/gig/what-if/one-guitar-fewer.ts";
import { needsNow } from "#app/domain/gig/what-if/outcome.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** One of the guitars stays at home. */
export function OneGuitarFewerQuestion(props: QuestionProps) {
  const { repertoire } = props;
  const [picked, setPicked] = useState("");
  const guitar = repertoire.guitars.find(({ id }) => id === picked) ?? repertoire.guitars[0];
  if (!guitar) return <p className="text-grey-600">The act has no guitars yet.</p>;
  return (
    <>
      <SelectField
        id="what-if-fewer"
        label="Without"
        value={guitar.id}
        onChange={(event) => setPicked(event.currentTarget.value)}
      >
        {repertoire.guitars.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </SelectField>
      <Without key={guitar.id} {...props} guitar={guitar} />
    </>
  );
}

function Without({ guitar, ...props }: QuestionProps & { guitar: Guitar }) {
  const { gig, plan, repertoire } = props;
  const supposed = useMemo(
    () => oneGuitarFewer(gig, plan, repertoire, guitar.id),
    [gig, plan, repertoire, guitar.id],
  );
  const asked = useAsked(props, supposed);
  const found = useOutcomes(asked, false, useUnsupposed(props, supposed.setIds));
  if (supposed.setIds.length === 0) return <p>No song of this gig is on {guitar.name}. Leave it at home.</p>;
  return (
    <Answers
      found={found}
      now={needsNow(asked)}
      guitars={() => repertoire.guitars}
      unsupposed={`With ${guitar.name}`}
      use={() => `Do without ${guitar.name}`}
    />
  );
}
