import { z } from "zod";

export const LIMITS = {
  songs: 100,
  guitars: 12,
  strings: 12,
  necks: 12,
  fret: 24,
  capoKinds: 40,
  capoCount: 1000,
  wishes: 20,
} as const;

const whole = z.number().refine(Number.isInteger, { params: { code: "not-whole" } });
const notNegative = z.number().nonnegative();
const wholeBetween = (low: number, high: number) =>
  z.number().refine((value) => Number.isInteger(value) && value >= low && value <= high, {
    params: { code: "out-of-range", low, high },
  });
const between = (low: number, high: number) =>
  z.number().refine((value) => value >= low && value <= high, {
    params: { code: "out-of-range", low, high, number: true },
  });

const midi = wholeBetween(0, 127);

const capo = z.strictObject({
  fret: wholeBetween(1, LIMITS.fret),
  strings: z.array(whole).min(1),
});

const neckFields = { open: z.array(midi), capos: z.array(capo) };

const guitar = z.strictObject({
  id: z.string(),
  strings: wholeBetween(1, LIMITS.strings),
  lowest: z.array(midi),
  highest: z.array(midi),
  start: z.strictObject(neckFields).nullable(),
  keeps: z.boolean().default(false),
});

const song = z.strictObject({
  id: z.string(),
  seconds: notNegative,
  section: whole,
  cover: notNegative.nullable().default(null),
  necks: z
    .array(z.strictObject({ ...neckFields, guitars: z.array(z.string()).nullable(), penalty: notNegative }))
    .max(LIMITS.necks),
});

const record = () =>
  z.custom<Record<string, number>>(isPlainRecord, { params: { code: "wrong-type", wanted: "an object" } });

const capoKind = z.strictObject({
  strings: z.array(wholeBetween(1, LIMITS.strings)).min(1),
  count: wholeBetween(0, LIMITS.capoCount),
});

const wish = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("run"), most: wholeBetween(1, LIMITS.songs), seconds: notNegative }),
  z.strictObject({ kind: z.literal("apart"), groups: z.array(z.array(z.string())), seconds: notNegative }),
  z.strictObject({
    kind: z.literal("energy"),
    levels: record(),
    curve: z.array(between(1, 5)).min(1).max(LIMITS.songs),
    seconds: notNegative,
  }),
]);

const pair = z.tuple([z.string(), z.string()]);

/** The shape of a problem; what needs two fields to be seen is in `problem-cross-checks.ts`. */
export const problemShape = z.strictObject({
  version: z.literal(1),
  crew: z.enum(["alone", "tech"]),
  times: z.strictObject({
    string: notNegative,
    semitone: notNegative,
    capoMove: notNegative,
    capoOn: notNegative,
    capoOff: notNegative,
    swap: notNegative,
    check: notNegative.default(0),
    cover: notNegative.default(0),
  }),
  aim: z.strictObject({
    exposed: notNegative.default(0),
    seconds: notNegative,
    strings: notNegative,
    semitones: notNegative,
    capoActions: notNegative,
    swaps: notNegative,
  }),
  guitars: z.array(guitar).max(LIMITS.guitars),
  songs: z.array(song).max(LIMITS.songs),
  order: z.array(z.string()),
  rules: z.strictObject({
    at: record(),
    before: z.array(pair),
    into: z.array(pair),
    apart: z.array(pair),
  }),
  maxMoved: whole.nonnegative().nullable(),
  capos: z.array(capoKind).max(LIMITS.capoKinds).optional(),
  wishes: z.array(wish).max(LIMITS.wishes).optional(),
});

function isPlainRecord(value: unknown): boolean {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
