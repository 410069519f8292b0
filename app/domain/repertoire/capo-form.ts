import { z } from "zod";
import { optionalWhole, requiredText } from "#app/domain/repertoire/form-fields.ts";
import type { ActCapo } from "#app/domain/repertoire/guitar.ts";

/** What a person writes of a capo. */
export type CapoFields = Omit<ActCapo, "id">;

export const capoLimits = { name: 80, count: 20, strings: 12 } as const;

/**
 * The form of a kind of capo. It covers all strings or those that are ticked; how many the act owns is one where
 * nothing is written.
 * @example capoFormSchema().parse({ name: "Short cut", covers: "some", strings: ["5", "4", "3"] })
 * // { name: "Short cut", strings: [5, 4, 3], count: 1 }
 */
export function capoFormSchema() {
  return z
    .object({
      name: requiredText("Write a name, such as Short cut.", capoLimits.name),
      covers: z.enum(["all", "some"], { error: "Choose whether it covers all strings." }),
      strings: z
        .array(z.string().regex(/^(?:[1-9]|1[0-2])$/, "Strings are numbered 1 to 12."))
        .max(capoLimits.strings)
        .optional(),
      count: optionalWhole(1, capoLimits.count, `Write how many the act owns, 1 to ${capoLimits.count}.`),
    })
    .transform(({ name, covers, strings, count }, context): CapoFields => {
      if (covers === "all") return { name, strings: null, count: count ?? 1 };
      const chosen = [...new Set((strings ?? []).map(Number))].sort((one, other) => other - one);
      if (chosen.length > 0) return { name, strings: chosen, count: count ?? 1 };
      context.addIssue({ code: "custom", path: ["strings"], message: "Tick the strings that it covers." });
      return z.NEVER;
    });
}

export type CapoFormInput = z.input<ReturnType<typeof capoFormSchema>>;
