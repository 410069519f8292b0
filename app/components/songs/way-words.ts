import { compactTuning } from "#app/domain/music/format-tuning.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { UsualChoice } from "#app/domain/repertoire/usual-choices.ts";

const ordinals = ["First", "Second", "Third", "Fourth", "Fifth", "Sixth", "Seventh", "Eighth"];

/** The name of a way by its place, counted from 0: "First choice". */
export function choiceName(index: number): string {
  return `${ordinals[index] ?? `${index + 1}th`} choice`;
}

/** A usual tuning as it stands in a list: "6 strings, EADGBE (Cedar, Blonde)". */
export function instrumentLabel({ usual, guitars }: UsualChoice, naming: Naming): string {
  const names = guitars.map(({ name }) => name).join(", ");
  return `${usual.length} strings, ${compactTuning(usual, naming)}${names === "" ? "" : ` (${names})`}`;
}
