import { useMemo, useState } from "react";
import { Answers } from "#app/components/gig/what-if/answers.tsx";
import { Choices } from "#app/components/gig/what-if/choices.tsx";
import { MinutesField, readMinutes } from "#app/components/gig/what-if/minutes-field.tsx";
import { type QuestionProps, useAsked } from "#app/components/gig/what-if/question.ts";
import { useOutcomes } from "#app/components/gig/what-if/use-outcomes.ts";
import { signedSeconds, undoWords } from "#app/components/gig/what-if/what-if-words.ts";
import { betweenSets, type SetChange } from "#app/domain/gig/what-if/between-sets.ts";
import { needsOf } from "#app/domain/gig/what-if/needs.ts";
import { needsNow } from "#app/domain/gig/what-if/outcome.ts";

const mostMinutes = 60;

/** Songs that would better stand in another set. */
export function BetweenSetsQuestion(props: QuestionProps) {
  const [text, setText] = useState("5");
  const minutes = readMinutes(text, 0, mostMinutes);
  return (
    <>
      <MinutesField
        id="what-if-sets"
        label="Minutes a set may become longer"
        least={0}
        most={mostMinutes}
        text={text}
        onText={setText}
      />
      {minutes === null ? null : <Between {...props} tolerance={minutes * 60} />}
    </>
  );
}

const keyOf = ({ goes }: SetChange) => goes.map(({ entryId }) => entryId).join();

/** "Slow Water to Set 2", the set's name in one piece. */
const wordsOf = ({ goes }: SetChange) =>
  goes.map(({ title, to }) => `${title} to\u00a0${to.replaceAll(" ", "\u00a0")}`).join(", ");

function Between({ tolerance, ...props }: QuestionProps & { tolerance: number }) {
  const { gig, plan, repertoire } = props;
  const changes = useMemo(
    () => betweenSets(gig, plan, repertoire, tolerance),
    [gig, plan, repertoire, tolerance],
  );
  const [picked, setPicked] = useState("");
  const change = changes.find((one) => keyOf(one) === picked) ?? changes[0];
  const now = needsOf(plan.sets).exposed;
  if (!change) return <p>No song that moves, and no two that change places, would need less than now.</p>;
  return (
    <>
      <Choices
        legend="Best changes, nothing else moved"
        chosen={keyOf(change)}
        onChoose={setPicked}
        choices={changes.map((one) => ({
          key: keyOf(one),
          words: wordsOf(one),
          figure: signedSeconds(now, one.needs.exposed),
        }))}
      />
      {gig.wishes.length > 0 ? (
        <p className="text-grey-600 text-sm leading-snug">
          Found by what hands must do, then weighed with your wishes.
        </p>
      ) : null}
      <Changed key={keyOf(change)} {...props} change={change} />
    </>
  );
}

function Changed({ change, ...props }: QuestionProps & { change: SetChange }) {
  const asked = useAsked(props, change.supposed);
  const found = useOutcomes(asked, true);
  return (
    <Answers
      found={found}
      now={needsNow(asked)}
      names={{ "as-it-is": "Just move" }}
      guitars={() => props.repertoire.guitars}
      use={() =>
        undoWords(
          "Move",
          change.goes.map(({ title, to }) => `${title} to ${to}`),
        )
      }
    />
  );
}
