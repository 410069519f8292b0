import type { Menu } from "@base-ui/react/menu";
import type { Popover } from "@base-ui/react/popover";
import { createContext, use } from "react";
import type { Place } from "#app/components/gig/drag/drop-place.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Naming } from "#app/domain/music/note-names.ts";

/** Which of a song's dialogs is meant: its rules, the talk before it, or the note for the tech. */
export type EntryTopic = "rules" | "cover" | "note";

export type OpenDialog =
  | { kind: "entry"; entryId: string; topic: EntryTopic }
  | { kind: "set"; setId: string }
  | { kind: "add"; setId: string }
  | { kind: "paste"; setId: string }
  | { kind: "suggestions" }
  | { kind: "wishes" }
  | { kind: "what-if" }
  | { kind: "details" };

export type EntryPayload = { entryId: string };

/** What every part of the gig page may need and what stays the same while the gig changes. */
export type PageTools = {
  naming: Naming;
  hand: "left" | "right";
  may: { plan: boolean; prepare: boolean };
  /** One menu and one chooser serve all rows; the row that opens them says which entry is meant. */
  rowMenu: Menu.Handle<EntryPayload>;
  chooser: Popover.Handle<EntryPayload>;
  edit: (edits: Edit[], label: string) => void;
  move: (entryId: string, place: Place) => void;
  step: (entryId: string, by: -1 | 1) => void;
  remove: (entryId: string) => void;
  openDialog: (dialog: OpenDialog) => void;
  showEncore: (setId: string) => void;
};

const ToolsContext = createContext<PageTools | null>(null);

export const PageToolsProvider = ToolsContext.Provider;

export function usePageTools(): PageTools {
  const tools = use(ToolsContext);
  if (!tools) throw new Error("A part of the gig page stands outside the gig page");
  return tools;
}
