import { z } from "zod";
import type { GigWish } from "#app/domain/gig/gig.ts";

/** What the numbers of a wish may be. The form keeps to the same limits, but for 0 seconds, which wish nothing. */
export const wishLimits = {
  mostSeconds: 600,
  run: { least: 1, most: 20 },
  below: { least: 20, most: 400 },
  curvePoints: { least: 1, most: 12 },
} as const;

function whole(what: string, { least, most }: { least: number; most: number }) {
  const message = `${what} is a whole number, ${least} to ${most}.`;
  return z.int({ error: message }).min(least, message).max(most, message);
}

const seconds = whole("What a break of a wish counts as, in seconds,", {
  least: 0,
  most: wishLimits.mostSeconds,
});
const point = z
  .number({ error: "A point of a curve is a number." })
  .min(1, "A point of a curve is 1 to 5.")
  .max(5, "A point of a curve is 1 to 5.");
const { least, most } = wishLimits.curvePoints;

const wishSchema = z.discriminatedUnion(
  "kind",
  [
    z.strictObject({
      kind: z.literal("tuning-run"),
      most: whole("The length of a run", wishLimits.run),
      seconds,
    }),
    z.strictObject({
      kind: z.literal("slow-apart"),
      below: whole("The tempo of a slow song", wishLimits.below),
      seconds,
    }),
    z.strictObject({ kind: z.literal("key-apart"), seconds }),
    z.strictObject({
      kind: z.literal("energy"),
      curve: z
        .array(point)
        .min(least, `A curve has ${least} to ${most} points.`)
        .max(most, `A curve has ${least} to ${most} points.`),
      seconds,
    }),
  ],
  { error: "A wish is tuning-run, slow-apart, key-apart or energy." },
);

/** A gig's wishes, as they come over the wire and stand in the database. */
export const wishesSchema = z
  .array(wishSchema)
  .refine(
    (wishes) => new Set(wishes.map((wish) => wish.kind)).size === wishes.length,
    "A gig has at most one wish of each kind.",
  ) satisfies z.ZodType<GigWish[]>;
