export type SaveStatus = "saved" | "saving" | "waiting" | "conflict";

/**
 * Whether the server has everything, in words.
 * @example saveWords("waiting", 3) // "3 edits waiting for the server"
 */
export function saveWords(status: SaveStatus, pending: number): string {
  if (status === "saved") return "Saved";
  if (status === "saving") return "Saving";
  if (status === "conflict") return "Choose between two edits";
  return pending === 1 ? "1 edit waiting for the server" : `${pending} edits waiting for the server`;
}

type SaveStateProps = { status: SaveStatus; pending: number };

/** The save state as it stands on the page. */
export function SaveState({ status, pending }: SaveStateProps) {
  const late = status === "waiting" || status === "conflict";
  return (
    <span
      aria-hidden="true"
      className={`block w-max min-w-12 max-w-[8.5rem] font-display font-medium leading-tight ${late ? "font-semibold underline underline-offset-4" : ""}`}
    >
      {saveWords(status, pending)}
    </span>
  );
}

/** The save state for a screen reader: said when edits begin to wait and when they have arrived, not at each edit. */
export function LiveSaveState({ status, pending }: SaveStateProps) {
  return (
    <p role="status" className="sr-only">
      {status === "saving" ? "" : saveWords(status, pending)}
    </p>
  );
}
