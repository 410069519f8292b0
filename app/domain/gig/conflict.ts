import { type Edit, type LoggedBatch, writeOf } from "#app/domain/gig/edit.ts";

/** A thing that was written twice: what these edits write to it, and the batch that wrote something else since. */
export type Clash = {
  key: string;
  /** JSON; null: taken away. */
  mine: string | null;
  theirs: string | null;
  by: LoggedBatch;
};

/**
 * The batches of a piece of log whose effect stands: without those that were taken back inside it, and without what
 * took them back. `log` is in the order of revisions.
 * @example standing([edit, undoOfEdit]) // []
 * @example standing([edit, undoOfEdit, redoOfUndo]) // [edit]
 */
export function standing(log: readonly LoggedBatch[]): LoggedBatch[] {
  const ids = new Set(log.map((batch) => batch.id));
  const out = new Set<string>();
  for (const batch of log.toReversed()) {
    if (out.has(batch.id) || batch.undoes === null || !ids.has(batch.undoes)) continue;
    out.add(batch.id);
    out.add(batch.undoes);
  }
  return log.filter((batch) => !out.has(batch.id));
}

/**
 * What clashes when edits meet batches that were applied since they were made: the same field written with another
 * value. What was taken back again in the meantime clashes with nothing. That a thing is gone is told by applying.
 * @param edits what is to be applied
 * @param later the batches of other windows since the revision that `edits` were made on, in their order
 * @example clashes([choose("alder")], [batchOf(choose("birch"))]) // [{ key: "entry:e1:guitarId", mine: '"alder"', … }]
 */
export function clashes(edits: readonly Edit[], later: readonly LoggedBatch[]): Clash[] {
  return clashesWhere(edits, later, (key, other) => key === other);
}

/**
 * What forbids taking a batch back: a field that was written again since. Taking back an addition also meets whatever
 * was done since to what was added. What its maker wrote since without changing anything forbids nothing.
 * @param target the batch to take back
 * @param later every batch that was applied after it, in their order
 * @example undoClashes(batchThatAdds("e1"), [batchOf(choose("birch"))]) // [{ key: "entry:e1:guitarId", … }]
 */
export function undoClashes(target: LoggedBatch, later: readonly LoggedBatch[]): Clash[] {
  const idle = (one: LoggedBatch) =>
    one.personId === target.personId && one.undoes === null && one.inverse.length === 0;
  const changing = later.filter((one) => !idle(one));
  return clashesWhere(target.inverse, changing, (key, other) => other === key || other.startsWith(`${key}:`));
}

function clashesWhere(
  edits: readonly Edit[],
  later: readonly LoggedBatch[],
  meets: (key: string, other: string) => boolean,
): Clash[] {
  const mine = new Map<string, string | null>();
  for (const edit of edits) {
    const { key, value } = writeOf(edit);
    mine.set(key, value);
  }
  const theirs = new Map<string, { value: string | null; by: LoggedBatch }>();
  for (const batch of standing(later)) {
    for (const edit of batch.edits) {
      const { key, value } = writeOf(edit);
      theirs.set(key, { value, by: batch });
    }
  }
  const found: Clash[] = [];
  for (const [key, value] of mine) {
    for (const [other, write] of theirs) {
      if (!meets(key, other) || (key === other && value === write.value)) continue;
      found.push({
        key: other,
        mine: value,
        theirs: write.value,
        by: write.by,
      });
    }
  }
  return found;
}
