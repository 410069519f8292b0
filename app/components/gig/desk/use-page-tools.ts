import { Menu } from "@base-ui/react/menu";
import { Popover } from "@base-ui/react/popover";
import { type RefObject, useMemo, useState } from "react";
import type { EntryPayload, OpenDialog, PageTools } from "#app/components/gig/desk/page-context.tsx";
import { partsOf, placeBeside } from "#app/components/gig/sets/moves.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { placeEdits } from "#app/domain/gig/order.ts";
import type { Naming } from "#app/domain/music/note-names.ts";

/** What the tools act on, always the newest: they are made once, so that rows need not be drawn again for them. */
export type Latest = {
  gig: Gig;
  openEncores: ReadonlySet<string>;
  titleOf: (entryId: string) => string;
  edit: (edits: Edit[], label: string) => void;
  /** Tells what was removed and offers to take it back. */
  tellRemoved: (title: string) => void;
};

type PageToolsOptions = {
  latest: RefObject<Latest>;
  naming: Naming;
  hand: "left" | "right";
  mayPlan: boolean;
  mayPrepare: boolean;
  openDialog: (dialog: OpenDialog) => void;
  showEncore: (setId: string) => void;
};

/** The tools every part of the page shares; they stay the same for as long as the page is open. */
export function usePageToolsValue(options: PageToolsOptions): PageTools {
  const { latest, naming, hand, mayPlan, mayPrepare, openDialog, showEncore } = options;
  const [rowMenu] = useState(() => Menu.createHandle<EntryPayload>());
  const [chooser] = useState(() => Popover.createHandle<EntryPayload>());
  return useMemo(() => {
    const edit = (edits: Edit[], label: string) => {
      if (edits.length > 0) latest.current.edit(edits, label);
    };
    const move: PageTools["move"] = (entryId, place) =>
      edit(placeEdits(latest.current.gig, entryId, place), `Move ${latest.current.titleOf(entryId)}`);
    return {
      naming,
      hand,
      may: { plan: mayPlan, prepare: mayPrepare },
      rowMenu,
      chooser,
      edit,
      move,
      step: (entryId, by) => {
        const { gig, openEncores } = latest.current;
        const place = placeBeside(partsOf(gig, openEncores), entryId, by);
        if (place) move(entryId, place);
      },
      remove: (entryId) => {
        const title = latest.current.titleOf(entryId);
        edit([{ kind: "entry.remove", entryId }], `Remove ${title}`);
        latest.current.tellRemoved(title);
      },
      openDialog,
      showEncore,
    };
  }, [latest, naming, hand, mayPlan, mayPrepare, rowMenu, chooser, openDialog, showEncore]);
}
