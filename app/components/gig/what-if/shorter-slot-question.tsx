import { useMemo, useState } from "react";
import { Answers } from "#app/components/gig/what-if/answers.tsx";
import { Choices } from "#app/components/gig/what-if/choices.tsx";
import { MinutesField, readMinutes } from "#app/components/gig/what-if/minutes-field.tsx";
import { type QuestionProps, useAsked } from "#app/components/gig/what-if/question.ts";
import { useOutcomes } from "#app/components/gig/what-if/use-outcomes.ts";
import { lengthWords, setsNow, signedSeconds, undoWords } from "#app/components/gig/what-if/what-if-words.ts";
import { needsNow, type Outcome } from "#app/domain/gig/what-if/outcome.ts";
import { type Drop, shorterSlot } from "#app/domain/gig/what-if/shorter-slot.ts";

const mostMinutes = 240;

/** The slot is cut: which songs to drop. */
export function ShorterSlotQuestion(props: QuestionProps) {
  const { gig } = props;
  const [text, setText] = useState("10");
  const minutes = readMinutes(text, 1, mostMinutes);
  return (
    <>
      <MinutesField
        id="what-if-cut"
        label="Minutes cut"
        hint={gig.slot === null ? undefined : `The slot is ${lengthWords(gig.slot)} now.`}
        least={1}
        most={mostMinutes}
        text={text}
        onText={setText}
      />
      {minutes === null ? null : <Cut {...props} seconds={minutes * 60} />}
    </>
  );
}

function Cut({ seconds, ...props }: QuestionProps & { seconds: number }) {
  const { gig, plan, repertoire } = props;
  const cut = useMemo(() => shorterSlot(gig, plan, repertoire, seconds), [gig, plan, repertoire, seconds]);
  const [picked, setPicked] = useState("");
  if (cut.kind === "fits")
    return <p>The gig still fits, with {lengthWords(cut.spare)} to spare. Nothing has to go.</p>;
  if (cut.kind === "impossible")
    return <p>So much cannot be cut: {lengthWords(cut.asked)} would have to go, more than there is.</p>;
  const { drops, equal, more, asked } = cut;
  const drop = drops.find(({ entryIds }) => entryIds.join() === picked) ?? drops[0]!;
  return (
    <>
      <p className="text-grey-600 text-sm leading-snug">
        {lengthWords(asked)} have to go. Songs you want least go first, then those that leave least dead air.
      </p>
      <Choices
        legend="Drop"
        chosen={drop.entryIds.join()}
        onChoose={setPicked}
        choices={drops.map(({ entryIds, titles, freed, exposed }) => ({
          key: entryIds.join(),
          words: (
            <>
              {titles.join(", ")}
              <span className="block text-grey-600 text-sm">{lengthWords(freed)} freed</span>
            </>
          ),
          figure: signedSeconds(plan.totals.exposed, exposed),
        }))}
      />
      {equal > drops.length ? (
        <p className="text-grey-600 text-sm leading-snug">
          {more ? `More than ${equal}` : equal} choices would be missed as little; these leave least dead air.
          How much you want a song is kept with the song.
        </p>
      ) : null}
      <Dropped key={drop.entryIds.join()} {...props} drop={drop} />
    </>
  );
}

function Dropped({ drop, ...props }: QuestionProps & { drop: Drop }) {
  const { plan, repertoire } = props;
  const asked = useAsked(props, drop.supposed);
  const found = useOutcomes(asked, true);
  const shorter = (outcome: Outcome) => needsNow(asked).length - outcome.needs.length;
  return (
    <Answers
      found={found}
      now={needsNow(asked)}
      nowName={setsNow(asked)}
      names={{ "as-it-is": "Just drop" }}
      guitars={() => repertoire.guitars}
      use={() => undoWords("Drop", drop.titles)}
      head={(outcome) => (
        <p>
          The gig then takes {lengthWords(plan.clock.seconds - shorter(outcome))},{" "}
          {lengthWords(shorter(outcome))} less than now.
        </p>
      )}
    />
  );
}
