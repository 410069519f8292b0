import { memo, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { AddSong } from "#app/components/gig/sets/add-song.tsx";
import { type Part, toPart } from "#app/components/gig/sets/moves.ts";
import { Button } from "#app/components/ui/button.tsx";
import type { Section } from "#app/domain/gig/gig.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

type AddLineProps = {
  setId: string;
  setName: string;
  hasEncore: boolean;
  songs: Song[];
  standing: ReadonlySet<string>;
  onAdd: (songs: Song[], part: Pick<Part, "setId" | "section">) => void;
};

/** At the foot of a set: a line to type songs into, for which section, and a list to paste. */
export const AddLine = memo(function AddLine(props: AddLineProps) {
  const { setId, setName, hasEncore, songs, standing, onAdd } = props;
  const { openDialog } = usePageTools();
  const [chosen, setChosen] = useState<Section | null>(null);
  const section = hasEncore ? (chosen ?? 1) : 0;
  const where = toPart({ setName, section }, 2);
  return (
    <div className="hidden items-center gap-3 pl-[38px] lg:flex">
      <div className="min-w-0 flex-1">
        <AddSong
          songs={songs}
          standing={standing}
          where={where}
          onAdd={(song) => onAdd([song], { setId, section })}
        />
      </div>
      {hasEncore ? (
        <select
          aria-label={`Add to which part of ${setName}`}
          value={section}
          onChange={(event) => setChosen(event.currentTarget.value === "1" ? 1 : 0)}
          className="min-h-8 rounded-sm border border-grey-400 bg-white px-2 font-display text-base"
        >
          <option value={0}>into the main part</option>
          <option value={1}>into the encore</option>
        </select>
      ) : null}
      <Button look="quiet" small onClick={() => openDialog({ kind: "paste", setId })}>
        Paste a list
      </Button>
    </div>
  );
});
