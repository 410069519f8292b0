import { parseWithZod } from "@conform-to/zod/v4";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { namings } from "#app/domain/music/note-names.ts";
import { capoFormSchema } from "#app/domain/repertoire/capo-form.ts";
import { badgeShapes, instrumentKinds } from "#app/domain/repertoire/guitar.ts";
import { type GuitarFields, guitarFormSchema } from "#app/domain/repertoire/guitar-form.ts";
import { capoFormValues, guitarFormValues } from "#app/domain/repertoire/guitar-form-values.ts";

const filled = { name: "Cedar", shortName: "Cedar", badge: "round", kind: "acoustic", strings: "6" };

function submit(changes: Record<string, string>) {
  const form = new FormData();
  for (const [name, value] of Object.entries({ ...filled, ...changes })) form.append(name, value);
  return parseWithZod(form, { schema: guitarFormSchema({ naming: "english", others: ["birch"] }) });
}

function errorsOf(submission: { status?: string; error?: unknown }) {
  return submission.status === "error" ? submission.error : undefined;
}

function read(changes: Record<string, string>): GuitarFields {
  const submission = submit(changes);
  if (submission.status !== "success") throw new Error(JSON.stringify(errorsOf(submission)));
  return submission.value;
}

describe("a guitar as it is typed", () => {
  // E2 A2 D3 G3 B3 E4: h2g2 A87856825, W3C MusicXML 4.0. The reach is common practice, no source.
  test("is a six-string in its usual tuning, 6 down and 2 up, where nothing else is written", () => {
    expect(read({})).toMatchObject({
      strings: 6,
      usual: [40, 45, 50, 55, 59, 64],
      lowest: [34, 39, 44, 49, 53, 58],
      highest: [42, 47, 52, 57, 61, 66],
      keeps: false,
      leftHanded: false,
      spareFor: null,
      strungOn: null,
    });
  });

  // E1 A1 D2 G2 and G4 C4 E4 A4 (re-entrant): h2g2 A87856825.
  test.each([
    ["bass", "4", [28, 33, 38, 43]],
    ["ukulele", "4", [67, 60, 64, 69]],
  ])("a %s has its own usual tuning", (kind, strings, usual) => {
    expect(read({ kind, strings }).usual).toEqual(usual);
  });

  test("reads its usual tuning as players write it, and the reach string by string", () => {
    const guitar = read({
      usual: "open G",
      "below[0]": "0",
      "below[1]": "4",
      "above[0]": "",
      "above[5]": "0",
    });
    expect(guitar.usual).toEqual([38, 43, 50, 55, 59, 62]);
    expect(guitar.lowest).toEqual([38, 39, 44, 49, 53, 56]);
    expect(guitar.highest).toEqual([40, 45, 52, 57, 61, 62]);
  });

  test("reaches of strings that it does not have are left out", () => {
    const eight = Object.fromEntries(Array.from({ length: 8 }, (_, index) => [`below[${index}]`, "1"]));
    expect(read({ ...eight, strings: "4" }).lowest).toHaveLength(4);
  });

  test.each([
    ["name", " ", "Write the guitar's name."],
    ["name", "x".repeat(81), "This is longer than 80 characters. Shorten it."],
    ["badge", "star", "Choose a shape."],
    ["kind", "lute", "Choose a kind from the list."],
    ["strings", "3", "An instrument has 4 to 12 strings here."],
    ["strings", "13", "An instrument has 4 to 12 strings here."],
    ["strings", "six", "An instrument has 4 to 12 strings here."],
    [
      "usual",
      "EADGB",
      "5 notes were read; this instrument needs 6. Write one for each string, lowest first.",
    ],
    ["below[2]", "25", "Write whole semitones, 0 to 24."],
    ["above[0]", "-1", "Write whole semitones, 0 to 24."],
    ["spareFor", "gone", "That guitar is no longer in the act. Reload the page and choose again."],
    ["channel", "x".repeat(41), "This is longer than 40 characters. Shorten it."],
    ["strungOn", "2026-02-30", "Write a date between 1950 and 2099."],
    ["strungOn", "1949-12-31", "Write a date between 1950 and 2099."],
    ["notes", "x".repeat(4001), "This is longer than 4000 characters. Shorten it."],
  ])("%s = %j is refused: %s", (field, value, message) => {
    expect(errorsOf(submit({ [field]: value }))).toEqual({ [field]: [message] });
  });

  test.each(["E", "", "Cedars7", "Ce dar", "C-dar"])("the short name %j is refused", (shortName) => {
    expect(errorsOf(submit({ shortName }))).toEqual({
      shortName: [
        "Write 2 to 6 letters or digits without spaces, such as Cedar. One letter alone would read as a note.",
      ],
    });
  });

  test.each(["Cedar", "Élan", "12", "Twelve"])("the short name %j is taken", (shortName) => {
    expect(read({ shortName }).shortName).toBe(shortName);
  });

  test("an unread usual tuning is told together with the other fields", () => {
    expect(Object.keys(errorsOf(submit({ name: "", usual: "EADG?" })) ?? {}).toSorted()).toEqual([
      "name",
      "usual",
    ]);
  });
});

describe("a kept guitar in its form", () => {
  const guitar = fc.integer({ min: 4, max: 12 }).chain((strings) =>
    fc
      .record({
        kind: fc.constantFrom(...instrumentKinds),
        badge: fc.constantFrom(...badgeShapes),
        usual: fc.array(fc.integer({ min: 28, max: 80 }), { minLength: strings, maxLength: strings }),
        below: fc.array(fc.integer({ min: 0, max: 24 }), { minLength: strings, maxLength: strings }),
        above: fc.array(fc.integer({ min: 0, max: 24 }), { minLength: strings, maxLength: strings }),
        keeps: fc.boolean(),
        leftHanded: fc.boolean(),
        spareFor: fc.constantFrom(null, "birch"),
        strungOn: fc.constantFrom(null, "2026-11-20"),
      })
      .map(({ below, above, ...rest }) => ({
        ...rest,
        strings,
        name: "Cedar",
        shortName: "Cedar",
        channel: "DI 1",
        notes: "Spruce top.",
        lowest: rest.usual.map((midi, index) => midi - below[index]!),
        highest: rest.usual.map((midi, index) => midi + above[index]!),
      })),
  );

  test("what the form shows is read back to the same guitar, in every naming", () => {
    fc.assert(
      fc.property(guitar, fc.constantFrom(...namings), (fields, naming) => {
        const form = guitarFormValues({ id: "g1", ...fields }, naming);
        const read = guitarFormSchema({ naming, others: ["birch"] }).safeParse(form);
        expect(read.error?.issues).toBeUndefined();
        expect(read.data).toEqual(fields);
      }),
      { numRuns: 120 },
    );
  });
});

describe("a capo as it is typed", () => {
  const typed = (fields: [string, string][]) => {
    const form = new FormData();
    for (const [name, value] of fields) form.append(name, value);
    return parseWithZod(form, { schema: capoFormSchema() });
  };

  test("is one where nothing says how many, over the strings that are ticked", () => {
    const submission = typed([
      ["name", "Short cut"],
      ["covers", "some"],
      ["strings", "3"],
      ["strings", "5"],
      ["strings", "4"],
      ["count", ""],
    ]);
    const value = submission.status === "success" ? submission.value : null;
    expect(value).toEqual({ name: "Short cut", strings: [5, 4, 3], count: 1 });
    expect(capoFormSchema().parse(capoFormValues({ id: "c1", ...value! }))).toEqual(value);
  });

  test("over all strings leaves out what is ticked", () => {
    const submission = typed([
      ["name", "Steel capo"],
      ["covers", "all"],
      ["strings", "3"],
      ["count", "2"],
    ]);
    expect(submission.status === "success" && submission.value).toEqual({
      name: "Steel capo",
      strings: null,
      count: 2,
    });
  });

  test.each([
    [{ name: "" }, { name: ["Write a name, such as Short cut."] }],
    [{ covers: "none" }, { covers: ["Choose whether it covers all strings."] }],
    [{ covers: "some" }, { strings: ["Tick the strings that it covers."] }],
    [{ covers: "some", strings: "13" }, { "strings[0]": ["Strings are numbered 1 to 12."] }],
    [{ count: "0" }, { count: ["Write how many the act owns, 1 to 20."] }],
    [{ count: "21" }, { count: ["Write how many the act owns, 1 to 20."] }],
  ])("%j is refused", (changes, errors) => {
    const fields = Object.entries({ name: "Short cut", covers: "all", ...changes });
    expect(errorsOf(typed(fields as [string, string][]))).toEqual(errors);
  });
});
