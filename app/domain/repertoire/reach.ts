import type { Semitones } from "#app/domain/music/pitch.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** How far each string may go from its usual pitch, in semitones, low side first. */
export type Reach = { below: Semitones[]; above: Semitones[] };

/**
 * How far each string of a guitar may go from its usual pitch.
 * @example reachOf({ usual: [40], lowest: [34], highest: [42] }) // { below: [6], above: [2] }
 */
export function reachOf({ usual, lowest, highest }: Pick<Guitar, "usual" | "lowest" | "highest">): Reach {
  return {
    below: usual.map((midi, index) => midi - lowest[index]!),
    above: usual.map((midi, index) => highest[index]! - midi),
  };
}

function span(semitones: readonly Semitones[]): string {
  const least = Math.min(...semitones);
  const most = Math.max(...semitones);
  return least === most ? `${most}` : `${least} to ${most}`;
}

/**
 * A guitar's reach in a few words; where strings differ, from the least to the most.
 * @example reachWords({ below: [6, 6], above: [2, 2] }) // "6 down, 2 up"
 * @example reachWords({ below: [6, 2], above: [0, 2] }) // "2 to 6 down, 0 to 2 up"
 */
export function reachWords({ below, above }: Reach): string {
  return `${span(below)} down, ${span(above)} up`;
}
