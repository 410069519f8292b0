import type { Energy, Priority } from "#app/domain/repertoire/song.ts";

/** Steps from calm to full, in the order of a list of choices. */
export const energyNames: Readonly<Record<Energy, string>> = {
  1: "calm",
  2: "gentle",
  3: "steady",
  4: "lively",
  5: "full",
};

/** How much a song is wanted in the set, most first in a list of choices. */
export const priorityNames: Readonly<Record<Priority, string>> = {
  5: "never without it",
  4: "wanted",
  3: "as it fits",
  2: "if there is room",
  1: "first to drop",
};

/**
 * A level of energy in words; between two steps, both.
 * @example energyWords(4) // "4, lively"
 * @example energyWords(2.5) // "2.5, between gentle and steady"
 */
export function energyWords(level: number): string {
  const below = energyNames[Math.floor(level) as Energy];
  const above = energyNames[Math.ceil(level) as Energy];
  return below === above ? `${level}, ${below}` : `${level}, between ${below} and ${above}`;
}
