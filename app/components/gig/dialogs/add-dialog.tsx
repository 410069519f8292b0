import { useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { AddSong } from "#app/components/gig/sets/add-song.tsx";
import { type Part, partName, toPart } from "#app/components/gig/sets/moves.ts";
import { Button } from "#app/components/ui/button.tsx";
import { Dialog } from "#app/components/ui/dialog.tsx";
import { SelectField } from "#app/components/ui/field.tsx";
import type { Song } from "#app/domain/repertoire/song.ts";

type AddDialogProps = {
  setId: string;
  parts: Part[];
  songs: Song[];
  standing: ReadonlySet<string>;
  onAdd: (song: Song, part: Part) => void;
  onClose: () => void;
};

const keyOf = (part: Part) => `${part.setId}/${part.section}`;

/** Adding songs on a phone: where they go, and a line to type in. Stays open for several in a row. */
export function AddDialog({ setId, parts, songs, standing, onAdd, onClose }: AddDialogProps) {
  const { openDialog } = usePageTools();
  const [key, setKey] = useState(`${setId}/0`);
  const [added, setAdded] = useState<string[]>([]);
  const part = parts.find((one) => keyOf(one) === key) ?? parts[0];
  if (!part) return null;
  return (
    <Dialog
      open
      onOpenChange={(open) => (open ? null : onClose())}
      title="Add songs"
      closeLabel="Done"
      actions={<Button onClick={() => openDialog({ kind: "paste", setId: part.setId })}>Paste a list</Button>}
    >
      {parts.length > 1 ? (
        <SelectField
          id="add-where"
          label="Into"
          value={key}
          onChange={(event) => setKey(event.currentTarget.value)}
        >
          {parts.map((one) => (
            <option key={keyOf(one)} value={keyOf(one)}>
              {partName(one)}
            </option>
          ))}
        </SelectField>
      ) : null}
      <div className="rounded-sm border border-grey-400 px-3">
        <AddSong
          autoFocus
          songs={songs}
          standing={standing}
          where={toPart(part, 2)}
          onAdd={(song) => {
            onAdd(song, part);
            setAdded((before) => [song.title, ...before]);
          }}
        />
      </div>
      {added.length > 0 ? <p className="text-grey-600">Added: {added.join(", ")}</p> : null}
    </Dialog>
  );
}
