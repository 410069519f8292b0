import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Edit } from "#app/domain/gig/edit.ts";
import { batchSchema, editSchema, editsRequestSchema } from "#app/domain/gig/edit-schema.ts";
import { defaultTimes } from "#app/domain/gig/gig.ts";
import { anyEdit, entry } from "#tests/unit/gig-edits/sample-gig.ts";

/** What the schema says is wrong: each place with its message. */
function wrong(edit: unknown): [string, string][] {
  const read = editSchema.safeParse(edit);
  return read.success ? [] : read.error.issues.map(({ path, message }) => [path.join("."), message]);
}

const gigSet = (field: string, value: unknown) => ({ kind: "gig.set", field, value });
const entrySet = (field: string, value: unknown) => ({ kind: "entry.set", entryId: "e1", field, value });

describe("an edit over the wire", () => {
  it("is read as it was written", () => {
    fc.assert(
      fc.property(anyEdit, (edit) => {
        expect(editSchema.parse(JSON.parse(JSON.stringify(edit)))).toEqual(edit);
      }),
    );
  });

  it.each<[string, Edit]>([
    ["no slot", { kind: "gig.set", field: "slot", value: null }],
    ["a curfew at midnight", { kind: "gig.set", field: "curfew", value: "00:00" }],
    ["a zone with three parts", { kind: "gig.set", field: "zone", value: "America/Argentina/Salta" }],
    ["times", { kind: "gig.set", field: "times", value: { ...defaultTimes.tech, encoreCover: 1800 } }],
    [
      "an aim by own weights",
      {
        kind: "gig.set",
        field: "aim",
        value: {
          kind: "own",
          weights: { exposed: 2.5, seconds: 0, strings: 1, semitones: 0, capoActions: 1, swaps: 1 },
        },
      },
    ],
    ["no wishes", { kind: "gig.set", field: "wishes", value: [] }],
    ["an empty venue", { kind: "gig.set", field: "venue", value: "" }],
    [
      "a rank beyond the first 62",
      { kind: "entry.place", entryId: "e", setId: "s", section: 1, rank: "b00" },
    ],
  ])("takes %s", (_, edit) => expect(wrong(edit)).toEqual([]));

  it.each<[string, unknown, string, RegExp]>([
    ["a name of nothing", gigSet("name", "  "), "value", /empty/],
    ["a name too long", gigSet("name", "x".repeat(121)), "value", /longer than 120/],
    ["a start without zone", gigSet("startsAt", "2027-03-12T20:30"), "value", /instant in UTC/],
    ["a start on no day", gigSet("startsAt", "2027-02-30T20:30:00.000Z"), "value", /instant in UTC/],
    ["a start long ago", gigSet("startsAt", "1899-01-01T00:00:00.000Z"), "value", /between 2000 and 2100/],
    ["no zone", gigSet("zone", "Dublin"), "value", /IANA/],
    ["a slot of seconds", gigSet("slot", 59), "value", /60 to 86400/],
    ["a slot in parts of seconds", gigSet("slot", 61.5), "value", /whole number of seconds/],
    ["a curfew after midnight", gigSet("curfew", "24:00"), "value", /22:30/],
    ["a crew of two", gigSet("crew", "two"), "value", /alone or tech/],
    [
      "times with one missing",
      gigSet("times", { ...defaultTimes.alone, swap: undefined }),
      "value.swap",
      /whole/,
    ],
    [
      "times with one below 0",
      gigSet("times", { ...defaultTimes.alone, swap: -1 }),
      "value.swap",
      /0 to 600/,
    ],
    ["an aim there is not", gigSet("aim", { kind: "fun" }), "value.kind", /dead-air, strings, capos/],
    ["own weights without any", gigSet("aim", { kind: "own" }), "value.weights", /object/],
    [
      "a curve that leaves 1 to 5",
      gigSet("wishes", [{ kind: "energy", curve: [3, 5.5], seconds: 4 }]),
      "value.0.curve.1",
      /1 to 5/,
    ],
    [
      "a curve of nothing",
      gigSet("wishes", [{ kind: "energy", curve: [], seconds: 4 }]),
      "value.0.curve",
      /1 to 12 points/,
    ],
    [
      "a run of none",
      gigSet("wishes", [{ kind: "tuning-run", most: 0, seconds: 4 }]),
      "value.0.most",
      /1 to 20/,
    ],
    [
      "one wish twice",
      gigSet("wishes", [
        { kind: "key-apart", seconds: 4 },
        { kind: "key-apart", seconds: 5 },
      ]),
      "value",
      /one wish of each kind/,
    ],
    ["a field there is not", gigSet("revision", 3), "field", /no such field/],
    ["an entry's rank by itself", entrySet("rank", "a0"), "field", /no such field/],
    ["an id with a colon", entrySet("guitarId", "a:b"), "value", /letters, digits/],
    ["an id too long", { kind: "entry.remove", entryId: "x".repeat(25) }, "entryId", /1 to 24/],
    ["a talk of an hour", entrySet("cover", 3600), "value", /0 to 1800/],
    ["a note too long", entrySet("techNote", "x".repeat(501)), "value", /500/],
    ["pinned to what is not", entrySet("pinned", "capo"), "value", /none, guitar, neck or both/],
    ["no rank", { kind: "set.set", setId: "s", field: "rank", value: "1" }, "value", /no rank/],
    [
      "a third section",
      { kind: "entry.add", entry: { ...entry("e"), section: 2 } },
      "entry.section",
      /0 \(main\)/,
    ],
    ["more than an entry has", { kind: "entry.add", entry: { ...entry("e"), likes: 3 } }, "entry", /likes/],
    [
      "a place 0",
      { kind: "rule.add", rule: { id: "at.a", kind: "at", entry: "a", place: 0 } },
      "rule.place",
      /from 1/,
    ],
    [
      "a rule with one song",
      { kind: "rule.add", rule: { id: "into.a.a", kind: "into", a: "a", b: "a" } },
      "rule",
      /two different/,
    ],
    [
      "a rule by another id",
      { kind: "rule.add", rule: { id: "into.b.a", kind: "into", a: "a", b: "b" } },
      "rule",
      /made of its parts/,
    ],
    ["a kind there is not", { kind: "gig.delete" }, "kind", /no such kind/],
    ["nothing", null, "", /./],
  ])("refuses %s, and says where and why", (_, edit, path, message) => {
    const found = wrong(edit);
    expect(found.map(([where]) => where)).toContain(path);
    expect(found.find(([where]) => where === path)?.[1]).toMatch(message);
  });
});

describe("a batch over the wire", () => {
  const edit: Edit = { kind: "gig.set", field: "name", value: "x" };
  const batch = { id: "b", client: "c", on: 0, label: "", undoes: null, edits: [edit] };

  it("holds 1 to 500 edits", () => {
    expect(batchSchema.safeParse(batch).success).toBe(true);
    expect(batchSchema.safeParse({ ...batch, edits: [] }).success).toBe(false);
    expect(batchSchema.safeParse({ ...batch, edits: new Array(500).fill(edit) }).success).toBe(true);
    expect(batchSchema.safeParse({ ...batch, edits: new Array(501).fill(edit) }).success).toBe(false);
  });

  it("comes with others, in order, and the revision they are made on", () => {
    expect(editsRequestSchema.safeParse({ batches: [batch], since: 0 }).success).toBe(true);
    for (const bad of [{ batches: [], since: 0 }, { batches: [batch], since: -1 }, { batches: [batch] }]) {
      expect(editsRequestSchema.safeParse(bad).success).toBe(false);
    }
    expect(batchSchema.safeParse({ ...batch, on: 1.5 }).success).toBe(false);
    expect(batchSchema.safeParse({ ...batch, client: "" }).success).toBe(false);
  });
});
