import { describe, expect, it } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { defaultTimes } from "#app/domain/gig/gig.ts";
import {
  gigFieldEdits,
  gigFormSchema,
  gigFormValues,
  newGigFormSchema,
  newGigValues,
} from "#app/domain/gig/gig-form.ts";
import { gigLines } from "#app/domain/gig/gig-lines.ts";
import { sampleGig } from "#tests/unit/gig-edits/sample-gig.ts";

function messages(form: unknown): Record<string, string> {
  const read = gigFormSchema.safeParse(form);
  if (read.success) return {};
  return Object.fromEntries(read.error.issues.map(({ path, message }) => [path.join("."), message]));
}

const filled = {
  name: "Spring evening",
  date: "2027-07-02",
  time: "20:30",
  zone: "Europe/Dublin",
  crew: "alone",
};

describe("the form of a gig", () => {
  it("reads what a person writes", () => {
    expect(gigFormSchema.parse({ ...filled, slot: "60", curfew: "23:00" })).toEqual({
      name: "Spring evening",
      venue: "",
      startsAt: "2027-07-02T19:30:00.000Z",
      zone: "Europe/Dublin",
      slot: 3600,
      curfew: "23:00",
      crew: "alone",
      times: defaultTimes.alone,
      notes: "",
    });
  });

  /** The usual times are those of the plan: string 8, semitone 1, capo 5/3/6, check 5, change 15 or 8, talk 12, 40, 0. */
  it("takes the usual times for the crew where a field is empty", () => {
    expect(gigFormSchema.parse(filled).times).toMatchObject({
      string: 8,
      swap: 15,
      cover: 12,
      encoreCover: 40,
    });
    expect(gigFormSchema.parse({ ...filled, crew: "tech", times: { check: "0" } }).times).toEqual({
      ...defaultTimes.tech,
      check: 0,
    });
  });

  it("says what is wrong beside its field", () => {
    expect(messages({})).toMatchObject({ name: expect.stringContaining("name"), date: "Choose the day." });
    expect(messages({ ...filled, slot: "1441" })).toEqual({ slot: "Write whole minutes, 1 to 1440." });
    expect(messages({ ...filled, curfew: "11pm" })).toEqual({
      curfew: "Write the curfew as 22:30, or leave it empty.",
    });
    expect(messages({ ...filled, times: { swap: "601" } })).toEqual({
      "times.swap": "Write whole seconds, 0 to 600.",
    });
    expect(messages({ ...filled, times: { encoreCover: "1801" } })).toHaveProperty(["times.encoreCover"]);
    expect(messages({ ...filled, date: "2027-03-28", time: "01:30" })).toHaveProperty("time");
    expect(messages({ ...filled, date: "2027-02-30" })).toHaveProperty("date");
    expect(messages({ ...filled, date: "1999-12-31" })).toEqual({
      date: "Choose a day between 2000 and 2100.",
    });
  });

  it("shows a gig as it was written, and times of one's own alone", () => {
    const gig = sampleGig({ times: { ...defaultTimes.alone, swap: 20 } });
    const values = gigFormValues(gig);
    expect(values).toMatchObject({ date: "2027-07-02", time: "20:30", slot: "60", curfew: "" });
    expect(Object.entries(values.times).filter(([, value]) => value !== "")).toEqual([["swap", "20"]]);
    expect(gigFormSchema.parse({ ...values, slot: "60", curfew: undefined })).toMatchObject({
      times: gig.times,
    });
  });

  it("makes an edit for each field that differs, and none where nothing does", () => {
    const gig = sampleGig({ slot: 3630, startsAt: "2027-07-02T19:30:20.000Z" });
    const { curfew: _, ...values } = gigFormValues(gig);
    const same = gigFormSchema.parse(values);
    expect(gigFieldEdits(gig, same)).toEqual([]);
    const tech = gigFormSchema.parse({ ...values, crew: "tech", zone: "Europe/Paris", name: "Late" });
    const edits = gigFieldEdits(gig, tech);
    expect(edits.map((edit) => edit.kind === "gig.set" && edit.field)).toEqual([
      "name",
      "zone",
      "startsAt",
      "crew",
      "times",
    ]);
    const applied = applyEdits(gig, edits);
    expect(applied.ok && applied.gig).toMatchObject({
      startsAt: "2027-07-02T18:30:00.000Z",
      times: { swap: 8 },
    });
  });

  it("of a new gig counts sets and the minutes between them", () => {
    const values = { ...newGigValues("Europe/Dublin"), name: "Late", date: "2027-07-02" };
    const blank = Object.fromEntries(Object.entries(values).filter(([, value]) => value !== ""));
    expect(newGigFormSchema.parse(blank)).toMatchObject({ sets: 1, interval: 1200, fields: { slot: null } });
    expect(newGigFormSchema.safeParse({ ...blank, sets: "7" }).success).toBe(false);
    expect(newGigFormSchema.safeParse({ ...blank, sets: "0" }).success).toBe(false);
  });
});

describe("the list of gigs", () => {
  it("puts the next first, the last past first, and tonight's stays until the night is over", () => {
    const gig = (id: string, startsAt: string) => ({ ...sampleGig({ id, startsAt }), sets: [{ songs: 1 }] });
    const gigs = [
      gig("next", "2027-07-09T19:30:00.000Z"),
      gig("tonight", "2027-07-02T19:30:00.000Z"),
      gig("old", "2027-05-02T19:30:00.000Z"),
      gig("older", "2027-04-02T19:30:00.000Z"),
    ];
    const { coming, past } = gigLines(gigs, Date.parse("2027-07-03T01:00:00.000Z"));
    expect(coming.map((line) => line.id)).toEqual(["tonight", "next"]);
    expect(past.map((line) => line.id)).toEqual(["old", "older"]);
    expect(coming[0]).toMatchObject({ day: "Fri 2 July 2027", time: "20:30", contents: "1 set, 1 song" });
  });
});
