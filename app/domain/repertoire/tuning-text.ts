import { compactTuning, formatTuningWithOctaves } from "#app/domain/music/format-tuning.ts";
import { fifthsOfTuning, type Naming } from "#app/domain/music/note-names.ts";
import type { Midi } from "#app/domain/music/pitch.ts";
import { readTuning } from "#app/domain/music/tuning.ts";

/** How a tuning stands in its field: the text, and what a bare B in it means where it could mean two notes. */
export type TuningText = { text: string; bareB: "natural" | "flat" | undefined };

function same(one: readonly Midi[], other: readonly Midi[]): boolean {
  return one.length === other.length && one.every((midi, index) => midi === other[index]);
}

/**
 * Writes a tuning so that `readTuning` on the same instrument gives back exactly these pitches: plain letters where
 * they suffice, with octaves where a string stands more than half an octave from its usual pitch.
 * @example tuningText([36, 43, 48, 53, 53, 60], [40, 45, 50, 55, 59, 64], "english") // { text: "CGCFFC", … }
 * @example tuningText([38, 45, 50, 55, 65, 64], [40, 45, 50, 55, 59, 64], "english")
 * // { text: "D2 A2 D3 G3 F4 E4", … }: F4 is as near to B3 as F3 is
 */
export function tuningText(
  open: readonly Midi[],
  usual: readonly Midi[],
  naming: Naming,
  keyFifths = fifthsOfTuning(open),
): TuningText {
  const texts = [
    compactTuning(open, naming, keyFifths),
    formatTuningWithOctaves(open, naming, keyFifths).join(" "),
  ];
  for (const text of texts) {
    const plain = readTuning(text, { usual, naming });
    if (plain.ok && plain.ambiguous.length === 0 && same(plain.open, open)) return { text, bareB: undefined };
    for (const bareB of ["natural", "flat"] as const) {
      const answered = readTuning(text, { usual, naming, bareB });
      if (plain.ok && plain.ambiguous.length > 0 && answered.ok && same(answered.open, open))
        return { text, bareB };
    }
  }
  return { text: texts[1]!, bareB: undefined };
}
