import { z } from "zod";
import { aimSchema } from "#app/domain/gig/aim-schema.ts";
import type { Batch, Edit } from "#app/domain/gig/edit.ts";
import type { Rule } from "#app/domain/gig/gig.ts";
import { clockTime, isZone } from "#app/domain/gig/local-time.ts";
import { idOfRule, isRank } from "#app/domain/gig/order.ts";
import { wishesSchema } from "#app/domain/gig/wish-schema.ts";

/** What a gig's fields may hold. Forms and the API keep to the same limits. */
export const gigFieldLimits = {
  name: 120,
  venue: 120,
  notes: 4000,
  setName: 60,
  techNote: 500,
  label: 160,
  shortestSlotSeconds: 60,
  longestSlotSeconds: 24 * 3600,
  longestIntervalSeconds: 4 * 3600,
  coverSeconds: 1800,
  workSeconds: 600,
} as const;

const limits = gigFieldLimits;

function text(what: string, least: number, most: number) {
  return z
    .string({ error: `${what} is text.` })
    .max(most, `${what} is longer than ${most} characters. Shorten it.`)
    .refine((value) => value.trim().length >= least, `${what} is empty. Write one.`);
}

function whole(what: string, least: number, most: number) {
  const message = `${what} is a whole number of seconds, ${least} to ${most}.`;
  return z.int({ error: message }).min(least, message).max(most, message);
}

const idMessage = "An id is 1 to 24 letters, digits, hyphens or underscores.";
export const idSchema = z.string({ error: idMessage }).regex(/^[\w-]{1,24}$/, idMessage);

const yesOrNo = z.boolean({ error: "This is true or false." });
const section = z.union([z.literal(0), z.literal(1)], {
  error: "A section is 0 (main) or 1 (encore).",
});
const rank = z
  .string({ error: "A rank is text." })
  .max(120, "This rank is longer than 120 characters.")
  .refine(isRank, "This is no rank: ranks are fractional indexes such as a0 or a0V.");
const pinned = z.enum(["none", "guitar", "neck", "both"], {
  error: "Pinned is none, guitar, neck or both.",
});
const cover = whole("The talk", 0, limits.coverSeconds).nullable();
const interval = whole("An interval", 0, limits.longestIntervalSeconds);
const setName = text("The name of a set", 1, limits.setName);
const techNote = text("A tech note", 0, limits.techNote);

const startsAt = z.string({ error: "The start is text." }).refine((value) => {
  const at = Date.parse(value);
  const year = new Date(at).getUTCFullYear();
  return !Number.isNaN(at) && new Date(at).toISOString() === value && year >= 2000 && year <= 2100;
}, "The start is an instant in UTC, such as 2027-03-12T20:30:00.000Z, between 2000 and 2100.");

const seconds = whole("This time", 0, limits.workSeconds);
const talk = whole("This talk", 0, limits.coverSeconds);

export const timesSchema = z.strictObject({
  string: seconds,
  semitone: seconds,
  capoOn: seconds,
  capoOff: seconds,
  capoMove: seconds,
  check: seconds,
  swap: seconds,
  cover: talk,
  encoreCover: talk,
  intoCover: talk,
});

export const setSchema = z.strictObject({
  id: idSchema,
  name: setName,
  rank,
  interval,
  holdFirst: yesOrNo,
  holdLast: yesOrNo,
});

export const entrySchema = z.strictObject({
  id: idSchema,
  songId: idSchema,
  setId: idSchema,
  section,
  rank,
  guitarId: idSchema.nullable(),
  neckId: idSchema.nullable(),
  pinned,
  cover,
  techNote,
});

const place = z
  .int({ error: "A place is a whole number." })
  .min(-100)
  .max(100)
  .refine((value) => value !== 0, "Places count from 1, or from -1 at the end.");

export const ruleSchema = z
  .discriminatedUnion("kind", [
    z.strictObject({
      id: z.string(),
      kind: z.literal("at"),
      entry: idSchema,
      place,
    }),
    z.strictObject({
      id: z.string(),
      kind: z.enum(["before", "into", "apart"]),
      a: idSchema,
      b: idSchema,
    }),
  ])
  .refine((rule: Rule) => rule.kind === "at" || rule.a !== rule.b, "A rule is about two different songs.")
  .refine((rule: Rule) => rule.id === idOfRule(rule), "The id of a rule is made of its parts.");

function field<Name extends string, Value extends z.ZodType>(name: Name, value: Value) {
  return { field: z.literal(name), value };
}

const gigSet = { kind: z.literal("gig.set") };
const setSet = { kind: z.literal("set.set"), setId: idSchema };
const entrySet = { kind: z.literal("entry.set"), entryId: idSchema };
const noSuchField = "There is no such field.";

/** One edit as it comes over the wire, every field checked. */
export const editSchema = z.discriminatedUnion(
  "kind",
  [
    z.discriminatedUnion(
      "field",
      [
        z.strictObject({
          ...gigSet,
          ...field("name", text("The name", 1, limits.name)),
        }),
        z.strictObject({
          ...gigSet,
          ...field("venue", text("The venue", 0, limits.venue)),
        }),
        z.strictObject({ ...gigSet, ...field("startsAt", startsAt) }),
        z.strictObject({
          ...gigSet,
          ...field("zone", z.string().refine(isZone, "This is no IANA time zone, such as Europe/Dublin.")),
        }),
        z.strictObject({
          ...gigSet,
          ...field(
            "slot",
            whole("The slot", limits.shortestSlotSeconds, limits.longestSlotSeconds).nullable(),
          ),
        }),
        z.strictObject({
          ...gigSet,
          ...field("curfew", z.string().regex(clockTime, "A curfew is a time such as 22:30.").nullable()),
        }),
        z.strictObject({
          ...gigSet,
          ...field("crew", z.enum(["alone", "tech"], { error: "Crew is alone or tech." })),
        }),
        z.strictObject({ ...gigSet, ...field("times", timesSchema) }),
        z.strictObject({ ...gigSet, ...field("aim", aimSchema) }),
        z.strictObject({ ...gigSet, ...field("wishes", wishesSchema) }),
        z.strictObject({
          ...gigSet,
          ...field("notes", text("The notes", 0, limits.notes)),
        }),
      ],
      { error: noSuchField },
    ),
    z.strictObject({ kind: z.literal("set.add"), set: setSchema }),
    z.strictObject({ kind: z.literal("set.remove"), setId: idSchema }),
    z.discriminatedUnion(
      "field",
      [
        z.strictObject({ ...setSet, ...field("name", setName) }),
        z.strictObject({ ...setSet, ...field("interval", interval) }),
        z.strictObject({ ...setSet, ...field("holdFirst", yesOrNo) }),
        z.strictObject({ ...setSet, ...field("holdLast", yesOrNo) }),
        z.strictObject({ ...setSet, ...field("rank", rank) }),
      ],
      { error: noSuchField },
    ),
    z.strictObject({ kind: z.literal("entry.add"), entry: entrySchema }),
    z.strictObject({ kind: z.literal("entry.remove"), entryId: idSchema }),
    z.strictObject({
      kind: z.literal("entry.place"),
      entryId: idSchema,
      setId: idSchema,
      section,
      rank,
    }),
    z.discriminatedUnion(
      "field",
      [
        z.strictObject({
          ...entrySet,
          ...field("guitarId", idSchema.nullable()),
        }),
        z.strictObject({
          ...entrySet,
          ...field("neckId", idSchema.nullable()),
        }),
        z.strictObject({ ...entrySet, ...field("pinned", pinned) }),
        z.strictObject({ ...entrySet, ...field("cover", cover) }),
        z.strictObject({ ...entrySet, ...field("techNote", techNote) }),
      ],
      { error: noSuchField },
    ),
    z.strictObject({ kind: z.literal("rule.add"), rule: ruleSchema }),
    z.strictObject({
      kind: z.literal("rule.remove"),
      ruleId: z.string().max(80),
    }),
  ],
  { error: "There is no such kind of edit." },
) satisfies z.ZodType<Edit>;

const revision = z.int({ error: "A revision is a whole number, 0 or more." }).min(0);

/** A batch as it comes over the wire. */
export const batchSchema = z.strictObject({
  id: idSchema,
  client: idSchema,
  on: revision,
  label: text("The label", 0, limits.label),
  undoes: idSchema.nullable(),
  edits: z
    .array(editSchema)
    .min(1, "A batch holds at least one edit.")
    .max(500, "A batch holds at most 500 edits."),
}) satisfies z.ZodType<Batch>;

/**
 * What a window posts: its batches in their order, and the revision up to which it knows the gig. `person` is whose
 * edits they are, where the sender says so.
 */
export const editsRequestSchema = z.strictObject({
  person: idSchema.optional(),
  batches: z
    .array(batchSchema)
    .min(1, "Send at least one batch.")
    .max(100, "Send at most 100 batches at once."),
  since: revision,
});
