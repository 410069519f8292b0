import { useEffect, useRef, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { type PasteAnswer, PasteSongs } from "#app/components/songs/paste-songs.tsx";
import { Dialog } from "#app/components/ui/dialog.tsx";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Song } from "#app/domain/repertoire/song.ts";
import { usualChoices } from "#app/domain/repertoire/usual-choices.ts";

type PasteDialogProps = {
  where: string;
  repertoire: Repertoire;
  onAdd: (songs: Song[]) => void;
  onClose: () => void;
};

/**
 * A pasted list, straight into a set. Songs the library lacks are kept there first; they join the set as soon as the
 * repertoire that comes back has them. The box stays open while lines are left in it,
 * and until every song that was kept stands in the set.
 */
export function PasteDialog({ where, repertoire, onAdd, onClose }: PasteDialogProps) {
  const { naming } = usePageTools();
  const [waiting, setWaiting] = useState<PasteAnswer["kept"]>([]);
  const [closing, setClosing] = useState(false);
  const done = useRef(false);
  useEffect(() => {
    if (waiting.length === 0 || done.current) return;
    const songs = waiting.map(({ id }) => repertoire.songs.find((song) => song.id === id));
    if (!songs.every((song) => song !== undefined)) return;
    done.current = true;
    onAdd(songs);
    setWaiting([]);
    if (closing) onClose();
  }, [waiting, repertoire.songs, onAdd, onClose, closing]);
  return (
    <Dialog
      wide
      open
      onOpenChange={() => (waiting.length > 0 ? setClosing(true) : onClose())}
      title={`Paste a list into ${where}`}
      closeLabel="Done"
    >
      <PasteSongs
        naming={naming}
        choices={usualChoices(repertoire.guitars)}
        library={repertoire.songs.filter((song) => !song.deleted)}
        onKept={(kept) => {
          done.current = false;
          setWaiting(kept);
        }}
      />
    </Dialog>
  );
}
