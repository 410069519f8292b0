import { ChevronDown, ChevronRight } from "lucide-react";
import { type ComponentType, memo, useId, useRef, useState } from "react";
import { AnotherCapoQuestion } from "#app/components/gig/what-if/another-capo-question.tsx";
import { BetweenSetsQuestion } from "#app/components/gig/what-if/between-sets-question.tsx";
import { LateSongQuestion } from "#app/components/gig/what-if/late-song-question.tsx";
import { OneGuitarFewerQuestion } from "#app/components/gig/what-if/one-guitar-fewer-question.tsx";
import { OneMoreGuitarQuestion } from "#app/components/gig/what-if/one-more-guitar-question.tsx";
import { OtherCrewQuestion } from "#app/components/gig/what-if/other-crew-question.tsx";
import type { QuestionProps } from "#app/components/gig/what-if/question.ts";
import { ShorterSlotQuestion } from "#app/components/gig/what-if/shorter-slot-question.tsx";
import { StringBreaksQuestion } from "#app/components/gig/what-if/string-breaks-question.tsx";
import { UsedProvider } from "#app/components/gig/what-if/used-context.tsx";
import { Dialog } from "#app/components/ui/dialog.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";

type Question = { key: string; words: string; Ask: ComponentType<QuestionProps> };

/** The questions in a player's words, the most urgent first. */
function questionsFor(gig: Gig): Question[] {
  return [
    { key: "break", words: "A string breaks", Ask: StringBreaksQuestion },
    { key: "cut", words: "The slot is cut", Ask: ShorterSlotQuestion },
    { key: "late", words: "A song is added", Ask: LateSongQuestion },
    ...(gig.sets.length > 1 ? [{ key: "sets", words: "A song changes sets", Ask: BetweenSetsQuestion }] : []),
    {
      key: "crew",
      words: gig.crew === "tech" ? "There is no tech" : "There is a tech",
      Ask: OtherCrewQuestion,
    },
    { key: "more", words: "There is one guitar more", Ask: OneMoreGuitarQuestion },
    { key: "fewer", words: "There is one guitar fewer", Ask: OneGuitarFewerQuestion },
    { key: "capo", words: "There is one capo more", Ask: AnotherCapoQuestion },
  ];
}

/** What would be if: questions to open, each answered beside the plan as it stands. */
export const WhatIf = memo(function WhatIf({ onUsed, ...props }: QuestionProps & { onUsed?: () => void }) {
  const [open, setOpen] = useState<string | null>(null);
  const [said, setSaid] = useState("");
  const list = useRef<HTMLUListElement>(null);
  const used = (label: string) => {
    list.current?.querySelector<HTMLButtonElement>("h3 > button[aria-expanded=true]")?.focus();
    setOpen(null);
    setSaid(`Done: ${label}. Undo takes it back.`);
    onUsed?.();
  };
  if (props.plan.sets.every((set) => set.problem.songs.length === 0))
    return <p className="text-grey-600">Ask once a set has songs that a guitar of yours can play.</p>;
  return (
    <UsedProvider value={used}>
      <p role="status" className="text-grey-600 text-sm empty:hidden">
        {said}
      </p>
      <ul ref={list} className="flex flex-col">
        {questionsFor(props.gig).map((question) => (
          <Item
            key={question.key}
            {...props}
            question={question}
            open={question.key === open}
            onOpen={() => {
              setSaid("");
              setOpen(question.key === open ? null : question.key);
            }}
          />
        ))}
      </ul>
    </UsedProvider>
  );
});

type ItemProps = QuestionProps & { question: Question; open: boolean; onOpen: () => void };

function Item({ question, open, onOpen, ...props }: ItemProps) {
  const id = useId();
  const { words, Ask } = question;
  const Mark = open ? ChevronDown : ChevronRight;
  return (
    <li className="border-grey-200 border-t">
      <h3>
        <button
          type="button"
          aria-expanded={open}
          aria-controls={open ? id : undefined}
          onClick={onOpen}
          className="flex min-h-12 w-full items-center gap-1.5 text-left font-semibold text-lg leading-tight hover:bg-grey-100 lg:min-h-10"
        >
          <Mark size={18} aria-hidden="true" className="shrink-0 text-grey-600" />
          {words}
        </button>
      </h3>
      {open ? (
        <div id={id} className="flex flex-col gap-3 pb-4">
          <Ask {...props} />
        </div>
      ) : null}
    </li>
  );
}

/** The same on a phone and on small screens, above the page. */
export function WhatIfDialog({ onClose, ...props }: QuestionProps & { onClose: () => void }) {
  return (
    <Dialog open onOpenChange={(open) => (open ? null : onClose())} title="What if">
      <WhatIf {...props} onUsed={onClose} />
    </Dialog>
  );
}
