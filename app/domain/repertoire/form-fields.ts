import { z } from "zod";

/** A line or more of text that must be there. `asked` is what a person is told where nothing was written. */
export function requiredText(asked: string, longest: number) {
  return z
    .string({ error: asked })
    .trim()
    .min(1, asked)
    .max(longest, `This is longer than ${longest} characters. Shorten it.`);
}

/** Text that may be left out; nothing written is "". */
export function optionalText(longest: number) {
  return z
    .string()
    .trim()
    .max(longest, `This is longer than ${longest} characters. Shorten it.`)
    .optional()
    .transform((text) => text ?? "");
}

/**
 * A whole number as it was typed, or null where nothing was.
 * @example optionalWhole(20, 400, "Write …").parse("96") // 96
 */
export function optionalWhole(least: number, most: number, message: string) {
  return z
    .string()
    .trim()
    .optional()
    .transform((text, context) => {
      if (!text) return null;
      const value = Number(text);
      if (/^\d{1,6}$/.test(text) && value >= least && value <= most) return value;
      context.addIssue({ code: "custom", message });
      return z.NEVER;
    });
}

/** A tick: browsers send "on" for one that is set and nothing for one that is not. */
export function tick() {
  return z
    .boolean()
    .optional()
    .transform((set) => set === true);
}

/** Which of the two notes a bare B was meant to be, where a person was asked. */
export const bareBAnswer = z.enum(["natural", "flat"]).optional();

/**
 * The version that a form was read at, as it comes back with the form; 0, which nothing has, for what is no version.
 * @example readVersion("3") // 3
 */
export function readVersion(sent: unknown): number {
  return typeof sent === "string" && /^\d{1,9}$/.test(sent) ? Number(sent) : 0;
}
