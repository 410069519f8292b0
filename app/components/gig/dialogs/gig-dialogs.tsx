import { lazy, Suspense } from "react";
import type { OpenDialog } from "#app/components/gig/desk/page-context.tsx";
import { AddDialog } from "#app/components/gig/dialogs/add-dialog.tsx";
import { EntryDialog } from "#app/components/gig/dialogs/entry-dialog.tsx";
import { SetDialog } from "#app/components/gig/dialogs/set-dialog.tsx";
import type { Part } from "#app/components/gig/sets/moves.ts";
import { usualCover } from "#app/domain/gig/cover.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { setsOf } from "#app/domain/gig/order.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

/** These bring a form library along, so they are loaded when they are first asked for. */
const PasteDialog = lazy(async () => {
  const { PasteDialog } = await import("#app/components/gig/dialogs/paste-dialog.tsx");
  return { default: PasteDialog };
});
const GigDetailsDialog = lazy(async () => {
  const { GigDetailsDialog } = await import("#app/components/gig/details/gig-details-form.tsx");
  return { default: GigDetailsDialog };
});

const WishesDialog = lazy(async () => {
  const { WishesDialog } = await import("#app/components/gig/wishes/wishes-dialog.tsx");
  return { default: WishesDialog };
});

type GigDialogsProps = {
  open: OpenDialog | null;
  gig: Gig;
  repertoire: Repertoire;
  parts: Part[];
  standing: ReadonlySet<string>;
  titleOf: (entryId: string) => string;
  edit: (edits: Edit[], label: string, on?: number) => void;
  onAdd: (songs: Song[], part: Pick<Part, "setId" | "section">) => void;
  onClose: () => void;
};

/** The dialog that is open, if any. One whose entry or set is gone meanwhile closes. */
export function GigDialogs(props: GigDialogsProps) {
  return (
    <Suspense fallback={null}>
      <Opened {...props} />
    </Suspense>
  );
}

function Opened(props: GigDialogsProps) {
  const { open, gig, repertoire, parts, standing, titleOf, onAdd, onClose } = props;
  if (!open) return null;
  if (open.kind === "details") return <GigDetailsDialog gig={gig} edit={props.edit} onClose={onClose} />;
  if (open.kind === "wishes") {
    const songs = repertoire.songs.filter((song) => standing.has(song.id));
    return <WishesDialog gig={gig} songs={songs} edit={props.edit} onClose={onClose} />;
  }
  if (open.kind === "entry") {
    const entry = gig.entries.find((one) => one.id === open.entryId);
    if (!entry) return null;
    const song = repertoire.songs.find((one) => one.id === entry.songId);
    return (
      <EntryDialog
        key={entry.id + open.topic}
        entry={entry}
        topic={open.topic}
        gig={gig}
        parts={parts}
        titleOf={titleOf}
        usualCover={song ? usualCover(gig, entry, song) : gig.times.cover}
        onClose={onClose}
      />
    );
  }
  const sets = setsOf(gig);
  const set = sets.find((one) => one.id === ("setId" in open ? open.setId : ""));
  if (!set) return null;
  if (open.kind === "set") return <SetDialog set={set} first={set === sets[0]} onClose={onClose} />;
  if (open.kind === "paste") {
    const end = { setId: set.id, section: 0 as const };
    return (
      <PasteDialog
        where={set.name}
        repertoire={repertoire}
        onAdd={(songs) => onAdd(songs, end)}
        onClose={onClose}
      />
    );
  }
  return (
    <AddDialog
      setId={set.id}
      parts={parts}
      songs={repertoire.songs}
      standing={standing}
      onAdd={(song, part) => onAdd([song], part)}
      onClose={onClose}
    />
  );
}
