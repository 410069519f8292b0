import { z } from "zod";
import type { Edit } from "#app/domain/gig/edit.ts";
import { gigFieldLimits } from "#app/domain/gig/edit-schema.ts";
import { defaultTimes, type Gig, type GigTimes } from "#app/domain/gig/gig.ts";
import { clockTime, instantOf, isZone, localTime } from "#app/domain/gig/local-time.ts";
import { optionalText, optionalWhole, requiredText } from "#app/domain/repertoire/form-fields.ts";

/** What a person writes of a gig. */
export type GigFields = Omit<Gig, "id" | "revision" | "aim" | "wishes" | "sets" | "entries" | "rules">;

const limits = gigFieldLimits;
const longestSlotMinutes = limits.longestSlotSeconds / 60;
const mostSets = 6;
const longestIntervalMinutes = limits.longestIntervalSeconds / 60;

/** The times of a gig in the order of a form, with what each is called. */
export const timeNames = {
  string: "Retune a string",
  semitone: "For each semitone",
  capoOn: "Put a capo on",
  capoOff: "Take a capo off",
  capoMove: "Move a capo",
  check: "Check the tuning",
  swap: "Change guitar",
  cover: "Talk before a song",
  encoreCover: "Applause before the encore",
  intoCover: "Straight into the next song",
} as const satisfies Record<keyof GigTimes, string>;

export const timeKeys = Object.keys(timeNames) as (keyof GigTimes)[];

/** Which of the times are talk and applause rather than work; they may be longer. */
const talk: readonly (keyof GigTimes)[] = ["cover", "encoreCover", "intoCover"];

function timeField(key: keyof GigTimes) {
  const most = talk.includes(key) ? limits.coverSeconds : limits.workSeconds;
  return optionalWhole(0, most, `Write whole seconds, 0 to ${most}.`);
}

const timesField = z.object(
  Object.fromEntries(timeKeys.map((key) => [key, timeField(key)])) as Record<
    keyof GigTimes,
    ReturnType<typeof timeField>
  >,
);

const fields = {
  name: requiredText("Write a name, such as the night or the occasion.", limits.name),
  venue: optionalText(limits.venue),
  date: z.string({ error: "Choose the day." }).regex(/^\d{4}-\d\d-\d\d$/, "Write the day as 2027-03-12."),
  time: z.string({ error: "Choose when it starts." }).regex(clockTime, "Write the time as 20:30."),
  zone: z
    .string({ error: "Choose a time zone." })
    .refine(isZone, "This is no time zone we know. Choose one from the list, such as Europe/Dublin."),
  slot: optionalWhole(1, longestSlotMinutes, `Write whole minutes, 1 to ${longestSlotMinutes}.`),
  curfew: z.string().regex(clockTime, "Write the curfew as 22:30, or leave it empty.").optional(),
  crew: z.enum(["alone", "tech"], { error: "Choose whether a tech is there." }),
  times: timesField.optional(),
  notes: optionalText(limits.notes),
};

type Parsed = z.output<z.ZodObject<typeof fields>>;

/**
 * The form of a gig's details, for the browser and the server alike. A time that is left empty is the usual one for
 * the crew.
 * @example gigFormSchema.parse({ name: "Spring evening", date: "2027-07-02", time: "20:30", zone: "Europe/Dublin",
 *   slot: "60", crew: "alone" }).startsAt // "2027-07-02T19:30:00.000Z"
 */
export const gigFormSchema = z.object(fields).transform(toFields);

/** The form of a new gig: its details, how many sets it has, and the minutes between them. */
export const newGigFormSchema = z
  .object({
    ...fields,
    sets: optionalWhole(1, mostSets, `Write how many sets, 1 to ${mostSets}.`),
    interval: optionalWhole(
      0,
      longestIntervalMinutes,
      `Write whole minutes, 0 to ${longestIntervalMinutes}.`,
    ),
  })
  .transform(({ sets, interval, ...gig }, context) => ({
    fields: toFields(gig, context),
    sets: sets ?? 1,
    interval: (interval ?? usualIntervalMinutes) * 60,
  }));

/** Common practice, no source. */
export const usualIntervalMinutes = 20;

/** The form that duplicates a gig: the name and day of the next one. */
export function duplicateFormSchema(zone: string) {
  return z
    .object({ name: fields.name, date: fields.date, time: fields.time })
    .transform(({ name, date, time }, context) => ({
      name,
      startsAt: toInstant({ date, time, zone }, context),
    }));
}

function toInstant(
  { date, time, zone }: { date: string; time: string; zone: string },
  context: z.core.$RefinementCtx,
): string {
  const instant = instantOf({ date, time }, zone);
  const year = Number(date.slice(0, 4));
  if (instant && year >= 2000 && year <= 2100) return instant;
  const message = instant
    ? "Choose a day between 2000 and 2100."
    : instantOf({ date, time: "12:00" }, zone)
      ? `On that day clocks in ${zone} skip ${time}. Choose another time.`
      : "There is no such day. Choose another.";
  const path = message.includes("clocks") ? "time" : "date";
  context.issues.push({
    code: "custom",
    message,
    path: [path],
    input: path === "time" ? time : date,
  });
  return "";
}

function toFields(form: Parsed, context: z.core.$RefinementCtx): GigFields {
  const { date, time, slot, times, ...rest } = form;
  const usual = defaultTimes[form.crew];
  return {
    name: rest.name,
    venue: rest.venue,
    startsAt: toInstant({ date, time, zone: form.zone }, context),
    zone: form.zone,
    slot: slot === null ? null : slot * 60,
    curfew: rest.curfew ?? null,
    crew: form.crew,
    times: Object.fromEntries(timeKeys.map((key) => [key, times?.[key] ?? usual[key]])) as GigTimes,
    notes: rest.notes,
  };
}

/** What stands in the fields of the form of a gig's details. */
export type GigFormValues = {
  [Field in Exclude<keyof Parsed, "times">]: string;
} & {
  times: Record<keyof GigTimes, string>;
};

/**
 * A gig as its form shows it. Times that are the usual ones for its crew are left empty.
 * @example gigFormValues({ ...gig, slot: 3600, times: defaultTimes.alone, crew: "alone" }).slot // "60"
 */
export function gigFormValues(gig: GigFields): GigFormValues {
  const usual = defaultTimes[gig.crew];
  const { date, time } = localTime(gig.startsAt, gig.zone);
  return {
    name: gig.name,
    venue: gig.venue,
    date,
    time,
    zone: gig.zone,
    slot: gig.slot === null ? "" : String(Math.round(gig.slot / 60)),
    curfew: gig.curfew ?? "",
    crew: gig.crew,
    times: Object.fromEntries(
      timeKeys.map((key) => [key, gig.times[key] === usual[key] ? "" : String(gig.times[key])]),
    ) as Record<keyof GigTimes, string>,
    notes: gig.notes,
  };
}

/**
 * The edits that bring a gig's details to what a person wrote: one for each field that differs. The form knows whole
 * minutes, so a finer start or slot that still reads the same is left as it is.
 * @example gigFieldEdits(gig, { ...gig, venue: "The Slipway" })
 *   // [{ kind: "gig.set", field: "venue", value: "The Slipway" }]
 */
export function gigFieldEdits(gig: Gig, next: GigFields): Edit[] {
  const now = gigFormValues(gig);
  const then = gigFormValues(next);
  const edits: Edit[] = [];
  if (then.name !== now.name) edits.push({ kind: "gig.set", field: "name", value: next.name });
  if (then.venue !== now.venue) edits.push({ kind: "gig.set", field: "venue", value: next.venue });
  if (then.zone !== now.zone) edits.push({ kind: "gig.set", field: "zone", value: next.zone });
  if (then.date !== now.date || then.time !== now.time || then.zone !== now.zone) {
    edits.push({ kind: "gig.set", field: "startsAt", value: next.startsAt });
  }
  if (then.slot !== now.slot) edits.push({ kind: "gig.set", field: "slot", value: next.slot });
  if (then.curfew !== now.curfew) edits.push({ kind: "gig.set", field: "curfew", value: next.curfew });
  if (then.crew !== now.crew) edits.push({ kind: "gig.set", field: "crew", value: next.crew });
  if (timeKeys.some((key) => next.times[key] !== gig.times[key])) {
    edits.push({ kind: "gig.set", field: "times", value: next.times });
  }
  if (then.notes !== now.notes) edits.push({ kind: "gig.set", field: "notes", value: next.notes });
  return edits;
}

export type GigFormInput = z.input<typeof gigFormSchema>;
export type NewGigFormInput = z.input<typeof newGigFormSchema>;
export type NewGigFields = z.output<typeof newGigFormSchema>;
export type DuplicateFormInput = z.input<ReturnType<typeof duplicateFormSchema>>;
export type DuplicateFields = z.output<ReturnType<typeof duplicateFormSchema>>;

/**
 * What stands in the form of a new gig before anything is written.
 * @example newGigValues("Europe/Dublin").crew // "alone"
 */
export function newGigValues(zone: string): NewGigFormInput {
  return {
    name: "",
    venue: "",
    date: "",
    time: "20:00",
    zone,
    slot: "",
    curfew: "",
    crew: "alone",
    notes: "",
    sets: "1",
    interval: String(usualIntervalMinutes),
  };
}
