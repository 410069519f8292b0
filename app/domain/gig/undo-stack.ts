import type { LoggedBatch } from "#app/domain/gig/edit.ts";

/** What a person can take back next, and what they can bring back next. The edits to apply are its `inverse`. */
export type UndoStacks = { undo: LoggedBatch | null; redo: LoggedBatch | null };

/**
 * Undo and redo of one person, from the log alone, so that a reload loses nothing. A new edit ends what could be
 * brought back; an undo counts as no edit. Batches whose inverse is empty changed nothing and are passed over.
 * @param log every known batch of the gig, in the order of revisions; other people's are passed over
 * @example undoStacks([move, undoOfMove], "wren") // { undo: null, redo: undoOfMove }
 */
export function undoStacks(log: readonly LoggedBatch[], personId: string): UndoStacks {
  let undo: LoggedBatch[] = [];
  let redo: LoggedBatch[] = [];
  for (const batch of log) {
    if (batch.personId !== personId) continue;
    if (batch.undoes === null) {
      if (batch.inverse.length === 0) continue;
      undo.push(batch);
      redo = [];
      continue;
    }
    const takenBack = undo.find((one) => one.id === batch.undoes);
    if (takenBack) {
      undo = undo.filter((one) => one !== takenBack);
      redo.push(batch);
      continue;
    }
    const broughtBack = redo.find((one) => one.id === batch.undoes);
    if (!broughtBack) continue;
    redo = redo.filter((one) => one !== broughtBack);
    undo.push(batch);
  }
  return { undo: undo.at(-1) ?? null, redo: redo.at(-1) ?? null };
}
