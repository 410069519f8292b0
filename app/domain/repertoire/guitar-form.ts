import { z } from "zod";
import type { Naming } from "#app/domain/music/note-names.ts";
import { defaultReach } from "#app/domain/music/range.ts";
import { readTuning, type TuningReading } from "#app/domain/music/tuning.ts";
import { usualTuningFor } from "#app/domain/music/usual-tuning.ts";
import {
  bareBAnswer,
  optionalText,
  optionalWhole,
  requiredText,
  tick,
} from "#app/domain/repertoire/form-fields.ts";
import {
  badgeShapes,
  type Guitar,
  type InstrumentKind,
  instrumentKinds,
} from "#app/domain/repertoire/guitar.ts";

/** What a person writes of a guitar. */
export type GuitarFields = Omit<Guitar, "id">;

export const guitarLimits = {
  name: 80,
  shortName: 6,
  strings: { least: 4, most: 12 },
  /** Semitones a string may be said to go from its usual pitch, either way. */
  reach: 24,
  channel: 40,
  notes: 4000,
} as const;

/** What reading a form needs to know beside it: the reader's naming, and the guitars this one can be a spare for. */
export type GuitarFormReader = { naming: Naming; others: readonly string[] };

const shortNameMessage =
  "Write 2 to 6 letters or digits without spaces, such as Cedar. One letter alone would read as a note.";

function shortNameField() {
  return z
    .string({ error: shortNameMessage })
    .trim()
    .refine(
      (text) => new RegExp(`^[\\p{L}\\p{N}]{2,${guitarLimits.shortName}}$`, "u").test(text.normalize("NFC")),
      {
        error: shortNameMessage,
      },
    )
    .transform((text) => text.normalize("NFC"));
}

function dateField() {
  const message = "Write a date between 1950 and 2099.";
  return z
    .string()
    .optional()
    .transform((text, context) => {
      if (!text) return null;
      const date = new Date(`${text}T00:00:00Z`);
      const real = /^(?:19[5-9]\d|20\d\d)-\d\d-\d\d$/.test(text) && !Number.isNaN(date.getTime());
      if (real && date.toISOString().startsWith(text)) return text;
      context.addIssue({ code: "custom", message });
      return z.NEVER;
    });
}

/** The fields that say together what a guitar is usually tuned to. */
type UsualParts = {
  kind: InstrumentKind;
  strings: number | null;
  usual?: string | undefined;
  bareB?: "natural" | "flat" | undefined;
};

const usualStrings = 6;

function usualReading({ kind, strings, usual, bareB }: UsualParts, naming: Naming): TuningReading {
  const own = usualTuningFor(kind, strings ?? usualStrings);
  return readTuning(usual?.trim() ? usual : "usual", { usual: own, naming, bareB });
}

/** Whether kind and strings were understood, so that a tuning can be read even where other fields are wrong. */
function saysWhatItIs(value: unknown): value is UsualParts {
  const { kind, strings } = value as Partial<UsualParts>;
  const { least, most } = guitarLimits.strings;
  const count = strings === null || (typeof strings === "number" && strings >= least && strings <= most);
  return count && instrumentKinds.some((known) => known === kind);
}

/**
 * The form of a guitar or any other stringed instrument, for the browser and the server alike. The usual tuning may
 * be left out: then it is the kind's own. How far each string goes is typed as semitones below and above its usual
 * pitch; what is left out is 6 below and 2 above.
 * @example guitarFormSchema({ naming: "english", others: [] }).parse({ name: "Cedar", shortName: "Cedar",
 *   badge: "round", kind: "acoustic", strings: "6" }).lowest // [34, 39, 44, 49, 53, 58]
 */
export function guitarFormSchema({ naming, others }: GuitarFormReader) {
  const { least, most } = guitarLimits.strings;
  const reach = optionalWhole(0, guitarLimits.reach, `Write whole semitones, 0 to ${guitarLimits.reach}.`);
  return z
    .object({
      name: requiredText("Write the guitar's name.", guitarLimits.name),
      shortName: shortNameField(),
      badge: z.enum(badgeShapes, { error: "Choose a shape." }),
      kind: z.enum(instrumentKinds, { error: "Choose a kind from the list." }),
      strings: optionalWhole(least, most, `An instrument has ${least} to ${most} strings here.`),
      usual: z.string().optional(),
      bareB: bareBAnswer,
      below: z.array(reach).max(most).optional(),
      above: z.array(reach).max(most).optional(),
      keeps: tick(),
      leftHanded: tick(),
      spareFor: z.string().max(24).optional(),
      channel: optionalText(guitarLimits.channel),
      strungOn: dateField(),
      notes: optionalText(guitarLimits.notes),
    })
    .refine((guitar) => usualReading(guitar, naming).ok, {
      path: ["usual"],
      when: ({ value }) => saysWhatItIs(value),
      error: ({ input }) => {
        const reading = usualReading(input as UsualParts, naming);
        return reading.ok ? "" : reading.message;
      },
    })
    .transform(({ bareB, below, above, ...guitar }, context): GuitarFields => {
      const reading = usualReading({ ...guitar, bareB }, naming);
      if (!reading.ok) return z.NEVER;
      const spareFor = guitar.spareFor || null;
      if (spareFor !== null && !others.includes(spareFor)) {
        const message = "That guitar is no longer in the act. Reload the page and choose again.";
        context.addIssue({ code: "custom", path: ["spareFor"], message });
        return z.NEVER;
      }
      const usual = reading.open;
      return {
        ...guitar,
        strings: usual.length,
        spareFor,
        usual,
        lowest: usual.map((midi, index) => Math.max(0, midi - (below?.[index] ?? defaultReach.below))),
        highest: usual.map((midi, index) => Math.min(127, midi + (above?.[index] ?? defaultReach.above))),
      };
    });
}

export type GuitarFormInput = z.input<ReturnType<typeof guitarFormSchema>>;
