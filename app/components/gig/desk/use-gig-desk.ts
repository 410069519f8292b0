import { nanoid } from "nanoid";
import { useCallback, useLayoutEffect, useMemo, useRef, useState } from "react";
import type { OpenDialog } from "#app/components/gig/desk/page-context.tsx";
import { useOthersTold } from "#app/components/gig/desk/use-others-told.ts";
import { type Latest, usePageToolsValue } from "#app/components/gig/desk/use-page-tools.ts";
import { useGigEdits } from "#app/components/gig/edits/use-gig-edits.ts";
import type { Part } from "#app/components/gig/sets/moves.ts";
import { newEntries } from "#app/components/gig/sets/new-entry.ts";
import { useToasts } from "#app/components/ui/toasts.tsx";
import type { Edit, LoggedBatch } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { repertoireNames } from "#app/domain/gig/repertoire-names.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { can, type Role } from "#app/domain/permissions.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

export type GigDeskProps = {
  gig: Gig;
  log: LoggedBatch[];
  repertoire: Repertoire;
  reader: {
    personId: string;
    role: Role;
    naming: Naming;
    hand: "left" | "right";
    paper: "a4" | "letter";
  };
};

/** Title of an entry's song; an entry whose song is nowhere in the repertoire keeps its place under this name. */
function useTitles(gig: Gig, songs: readonly Song[]): (entryId: string) => string {
  const titles = useMemo(() => {
    const bySong = new Map(songs.map((song) => [song.id, song.title]));
    return new Map(gig.entries.map((entry) => [entry.id, bySong.get(entry.songId)]));
  }, [gig.entries, songs]);
  return useCallback((entryId) => titles.get(entryId) ?? "a song that is gone", [titles]);
}

/** The gig with everything that can be done to it on this page. */
export function useGigDesk({ gig: loaded, log, repertoire, reader }: GigDeskProps) {
  const names = useMemo(() => repertoireNames(repertoire, reader.naming), [repertoire, reader.naming]);
  const edits = useGigEdits({ gig: loaded, log, personId: reader.personId, names });
  const { gig } = edits;
  const toasts = useToasts();
  useOthersTold(edits.others);
  const [dialog, setDialog] = useState<OpenDialog | null>(null);
  const [openEncores, setOpenEncores] = useState<ReadonlySet<string>>(new Set());
  const titleOf = useTitles(gig, repertoire.songs);
  const standing = useMemo(() => new Set(gig.entries.map((entry) => entry.songId)), [gig.entries]);

  const tellRemoved = (title: string) => {
    const id = toasts.add({
      title: `${title} removed`,
      actionProps: {
        children: "Undo",
        onClick: () => {
          edits.undo();
          toasts.close(id);
        },
      },
    });
  };
  const newest: Latest = { gig, openEncores, titleOf, edit: edits.edit, tellRemoved };
  const latest = useRef(newest);
  useLayoutEffect(() => {
    latest.current = newest;
  });

  const showEncore = useCallback((setId: string) => setOpenEncores((now) => new Set([...now, setId])), []);
  const tools = usePageToolsValue({
    latest,
    naming: reader.naming,
    hand: reader.hand,
    mayPlan: can(reader.role, "plan"),
    mayPrepare: can(reader.role, "prepare"),
    openDialog: setDialog,
    showEncore,
  });

  const add = useCallback(
    (songs: Song[], { setId, section }: Pick<Part, "setId" | "section">) => {
      const made = newEntries({
        gig: latest.current.gig,
        repertoire,
        songs,
        setId,
        section,
        newId: () => nanoid(16),
      });
      const label = songs.length === 1 ? `Add ${songs[0]!.title}` : `Add ${songs.length} songs`;
      latest.current.edit(
        made.map((entry): Edit => ({ kind: "entry.add", entry })),
        label,
      );
    },
    [repertoire],
  );

  return { edits, tools, latest, titleOf, openEncores, standing, add, dialog, setDialog };
}
