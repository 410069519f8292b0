import { z } from "zod";
import type { GigAim } from "#app/domain/gig/gig.ts";

const mostWeight = 100_000;
const message = `A weight is 0 to ${mostWeight}.`;
const weight = z.number({ error: "A weight is a number." }).min(0, message).max(mostWeight, message);

/** What a gig's suggestions keep low, as it comes over the wire and stands in the database. */
export const aimSchema = z.discriminatedUnion(
  "kind",
  [
    z.strictObject({ kind: z.enum(["dead-air", "strings", "capos", "guitars"]) }),
    z.strictObject({
      kind: z.literal("own"),
      weights: z.strictObject({
        exposed: weight,
        seconds: weight,
        strings: weight,
        semitones: weight,
        capoActions: weight,
        swaps: weight,
      }),
    }),
  ],
  { error: "An aim is dead-air, strings, capos, guitars or own." },
) satisfies z.ZodType<GigAim>;
