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

/** Said aloud when edits begin to wait and when they have arrived, not at each save. */
export function SaveState({ status, pending }: { status: SaveStatus; pending: number }) {
  const words = saveWords(status, pending);
  return (
    <p
      className={`font-display font-medium text-base leading-tight ${status === "waiting" || status === "conflict" ? "text-warning" : "text-grey-600 max-lg:text-grey-300"}`}
    >
      <span aria-hidden="true">{words}</span>
      <span role="status" className="sr-only">
        {status === "saving" ? "" : words}
      </span>
    </p>
  );
}
