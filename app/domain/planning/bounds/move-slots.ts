import type { OrderRules } from "#app/domain/planning/order-rules.ts";

/**
 * Where a song that leaves the present order can go: the slots, each before the kept song of its number and the last one
 * after all. `allows[slot × songs + song]`.
 *
 * A song does not go back to where it stood, which would be no move. Its position is that of the slot, give or take the
 * other songs that move, so the first and last position that the rules leave it tell which slots are out of reach. What
 * must come before it and stands between has to move as well, and so does what must come after it.
 */
export function moveSlots(
  { earliest, latest, predecessors, next, previous }: OrderRules,
  most: number,
): Uint8Array {
  const songs = next.length;
  const allows = new Uint8Array((songs + 1) * songs);
  for (let song = 0; song < songs; song += 1) {
    const followers = predecessors.flatMap((before, other) => (before.includes(song) ? [other] : []));
    for (let slot = 0; slot <= songs; slot += 1) {
      if (slot === song || slot === song + 1) continue;
      const early = slot < song;
      const first = early ? slot - most + 1 : slot - most;
      const last = early ? slot + most - 1 : slot + most - 2;
      if (last < earliest[song]! || first > latest[song]!) continue;
      const inTheWay = early
        ? predecessors[song]!.filter((other) => other >= slot && other < song)
        : followers.filter((other) => other > song && other < slot);
      if (inTheWay.length >= most) continue;
      const follows = next[song]!;
      const leads = previous[song]!;
      if (most === 1 && ((follows !== -1 && follows !== slot) || (leads !== -1 && leads !== slot - 1)))
        continue;
      allows[slot * songs + song] = 1;
    }
  }
  return allows;
}
