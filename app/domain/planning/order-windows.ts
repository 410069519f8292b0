import type { Problem } from "#app/domain/planning/problem.ts";

/** First and last position of each song, from 0, and what is known of its neighbours. */
export type Windows = {
  earliest: Int32Array;
  latest: Int32Array;
  predecessors: number[][];
  next: Int32Array;
  /** Songs that must come anywhere after each song. */
  after: Set<number>[];
};

/** Windows that sections alone leave. */
export function sectionWindows(problem: Problem): { earliest: Int32Array; latest: Int32Array } {
  const section = new Map(problem.songs.map((song) => [song.id, song.section]));
  const sections = problem.order.map((id) => section.get(id)!);
  const lower = sections.map((own) => sections.filter((other) => other < own).length);
  const same = sections.map((own) => sections.filter((other) => other === own).length);
  return {
    earliest: Int32Array.from(lower),
    latest: Int32Array.from(lower, (first, i) => first + same[i]! - 1),
  };
}

/** Makes a window smaller where it can; whether it did. */
export function narrow(draft: Windows, song: number, from: number, to: number): boolean {
  const { earliest, latest } = draft;
  const changed = from > earliest[song]! || to < latest[song]!;
  earliest[song] = Math.max(earliest[song]!, from);
  latest[song] = Math.min(latest[song]!, to);
  return changed;
}

/** Positions that a fixed song holds are no others', so windows that begin or end there shrink. */
function stepOverFixed(draft: Windows): boolean {
  const { earliest, latest } = draft;
  const holder = new Map<number, number>();
  for (const [song, first] of earliest.entries()) if (first === latest[song]) holder.set(first, song);
  const taken = (position: number, song: number) => holder.has(position) && holder.get(position) !== song;
  let changed = false;
  for (let song = 0; song < earliest.length; song += 1) {
    while (earliest[song]! < latest[song]! && taken(earliest[song]!, song)) {
      earliest[song]! += 1;
      changed = true;
    }
    while (latest[song]! > earliest[song]! && taken(latest[song]!, song)) {
      latest[song]! -= 1;
      changed = true;
    }
  }
  return changed;
}

/** Positions narrowed by neighbours in a chain and by how many songs must come before and after. */
export function propagateWindows(draft: Windows): void {
  const { earliest, latest, next, predecessors, after } = draft;
  const count = after.length;
  for (let changed = true; changed; ) {
    changed = stepOverFixed(draft);
    for (let song = 0; song < count; song += 1) {
      const before = predecessors[song]!;
      const soonest = Math.max(before.length, ...before.map((other) => earliest[other]! + 1));
      const followers = [...after[song]!];
      const last = Math.min(count - 1 - followers.length, ...followers.map((other) => latest[other]! - 1));
      changed = narrow(draft, song, soonest, last) || changed;
      if (next[song]! !== -1) {
        const follower = next[song]!;
        changed = narrow(draft, song, earliest[follower]! - 1, latest[follower]! - 1) || changed;
        changed = narrow(draft, follower, earliest[song]! + 1, latest[song]! + 1) || changed;
      }
      if (earliest[song]! > latest[song]!) return;
    }
  }
}
