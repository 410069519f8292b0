import { z } from "zod";
import type { Answer } from "#app/domain/planning/answer.ts";
import type { Fault } from "#app/domain/planning/check/fault.ts";

const count = z.number().nonnegative();
const whole = z.number().int();
const strings = z.array(whole).min(1);
const capos = z.array(z.strictObject({ fret: whole, strings }));

const action = z.discriminatedUnion("action", [
  z.strictObject({ action: z.literal("move"), strings, from: whole, to: whole }),
  z.strictObject({ action: z.literal("on"), strings, to: whole, takenFrom: z.string().optional() }),
  z.strictObject({ action: z.literal("off"), strings, from: whole }),
]);

const work = z.strictObject({
  guitar: z.string(),
  by: z.enum(["player", "tech"]),
  strings: z.array(z.strictObject({ string: whole, from: whole, to: whole })),
  capos: z.array(action),
  seconds: count,
});

const found = z.strictObject({
  status: z.enum(["optimal", "feasible"]),
  total: count,
  bound: count,
  totals: z.strictObject({
    exposed: count,
    seconds: count,
    strings: count,
    semitones: count,
    capoActions: count,
    swaps: count,
    moved: count,
    wishes: count.optional(),
  }),
  order: z.array(z.string()),
  plays: z.array(z.strictObject({ song: z.string(), guitar: z.string(), neck: whole })),
  before: z.array(z.strictObject({ guitar: z.string(), open: z.array(whole), capos })),
  gaps: z.array(z.strictObject({ into: z.string(), swap: z.boolean(), seconds: count, work: z.array(work) })),
  broken: z.array(z.strictObject({ wish: whole, songs: z.array(z.string()), seconds: count })).optional(),
});

const infeasible = z.strictObject({
  status: z.literal("infeasible"),
  why: z
    .array(
      z.strictObject({
        code: z.enum(["no-guitar", "rules", "keeps", "moved"]),
        songs: z.array(z.string()),
        message: z.string().min(1),
      }),
    )
    .min(1),
});

/** Whether a value has the form of an answer at all; what is wrong with its form otherwise. */
export function readAnswer(value: unknown): { answer: Answer } | { faults: Fault[] } {
  const parsed = z.discriminatedUnion("status", [found, infeasible]).safeParse(value);
  if (parsed.success) return { answer: parsed.data };
  return { faults: parsed.error.issues.map(({ path, message }) => ({ path: path.join("."), message })) };
}
