import { standardGuitar } from "#app/domain/music/named-tunings.ts";
import type { Midi } from "#app/domain/music/pitch.ts";
import { usualTuningFor } from "#app/domain/music/usual-tuning.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** A usual tuning that songs of this act can be written for, and the guitars that have it. */
export type UsualChoice = { usual: readonly Midi[]; guitars: readonly Pick<Guitar, "id" | "name">[] };

function same(one: readonly Midi[], other: readonly Midi[]): boolean {
  return one.length === other.length && one.every((midi, index) => midi === other[index]);
}

/**
 * The usual tunings among an act's guitars, those of most guitars first; standard tuning of six strings is always
 * among them. A tuning's octaves and its distances are read against one of these.
 * @example usualChoices([]) // [{ usual: [40, 45, 50, 55, 59, 64], guitars: [] }]
 */
export function usualChoices(guitars: readonly Pick<Guitar, "id" | "name" | "usual">[]): UsualChoice[] {
  const choices: { usual: readonly Midi[]; guitars: Pick<Guitar, "id" | "name">[] }[] = [];
  for (const { id, name, usual } of guitars) {
    const choice = choices.find((other) => same(other.usual, usual));
    if (choice) choice.guitars.push({ id, name });
    else choices.push({ usual, guitars: [{ id, name }] });
  }
  const standard = choices.some((choice) => same(choice.usual, standardGuitar));
  const all = standard ? choices : [...choices, { usual: standardGuitar, guitars: [] }];
  return all.toSorted((one, other) => other.guitars.length - one.guitars.length);
}

/** Within half an octave either way a string is taken for retuned; beyond, for another kind of string. */
const nearEnough = 6;

/**
 * The usual tuning that a tuning is told against, of those with as many strings: that of the guitars it is kept to;
 * else the first (most guitars have it) from which no string is more than half an octave away; else the nearest.
 * Where no guitar of the act has as many strings, a guitar's with that many.
 * @throws RangeError where no choice fits and the tuning has not 4 to 12 strings
 * @example usualFor([38, 45, 50, 55, 57, 62], usualChoices([])) // [40, 45, 50, 55, 59, 64]
 */
export function usualFor(
  open: readonly Midi[],
  choices: readonly UsualChoice[],
  keptTo: readonly string[] | null = null,
): readonly Midi[] {
  const distances = ({ usual }: UsualChoice) => usual.map((midi, index) => Math.abs(midi - open[index]!));
  const total = (choice: UsualChoice) => distances(choice).reduce((sum, distance) => sum + distance, 0);
  const fitting = choices.filter(({ usual }) => usual.length === open.length);
  const kept = fitting.find(({ guitars }) => guitars.some(({ id }) => keptTo?.includes(id)));
  const near = fitting.find((choice) => Math.max(...distances(choice)) <= nearEnough);
  const [nearest] = fitting.toSorted((one, other) => total(one) - total(other));
  return (kept ?? near ?? nearest)?.usual ?? usualTuningFor("other", open.length);
}

/**
 * A usual tuning as a form carries it.
 * @example usualCode([40, 45]) // "40-45"
 */
export function usualCode(usual: readonly Midi[]): string {
  return usual.join("-");
}

/**
 * Reads back what `usualCode` wrote; null for what is no usual tuning of 4 to 12 strings.
 * @example readUsualCode("40-45-50-55") // [40, 45, 50, 55]
 */
export function readUsualCode(code: string): Midi[] | null {
  if (!/^\d{1,3}(?:-\d{1,3}){3,11}$/.test(code)) return null;
  const usual = code.split("-").map(Number);
  return usual.every((midi) => midi <= 127) ? usual : null;
}
