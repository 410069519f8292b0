import { useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { AddSong } from "#app/components/gig/sets/add-song.tsx";
import { type Part, partName } from "#app/components/gig/sets/moves.ts";
import { Button } from "#app/components/ui/button.tsx";
import type { Song } from "#app/domain/repertoire/song.ts";

type AddLineProps = {
  /** The sections of one set: main, and the encore where there is one. */
  parts: Part[];
  songs: Song[];
  standing: ReadonlySet<string>;
  onAdd: (song: Song, part: Part) => void;
};

/** At the foot of a set: a line to type songs into, for which section, and a list to paste. */
export function AddLine({ parts, songs, standing, onAdd }: AddLineProps) {
  const { openDialog } = usePageTools();
  const [section, setSection] = useState<0 | 1 | null>(null);
  const part = parts.find((one) => one.section === section) ?? parts.at(-1);
  if (!part) return null;
  return (
    <div className="hidden items-center gap-3 pl-[38px] lg:flex">
      <div className="min-w-0 flex-1">
        <AddSong
          songs={songs}
          standing={standing}
          where={partName(part)}
          onAdd={(song) => onAdd(song, part)}
        />
      </div>
      {parts.length > 1 ? (
        <select
          aria-label={`Add to which part of ${part.setName}`}
          value={part.section}
          onChange={(event) => setSection(event.currentTarget.value === "1" ? 1 : 0)}
          className="min-h-8 rounded-sm border border-grey-400 bg-white px-2 font-display text-base"
        >
          {parts.map((one) => (
            <option key={one.section} value={one.section}>
              {one.section === 1 ? "into the encore" : "into the main part"}
            </option>
          ))}
        </select>
      ) : null}
      <Button look="quiet" small onClick={() => openDialog({ kind: "paste", setId: part.setId })}>
        Paste a list
      </Button>
    </div>
  );
}
