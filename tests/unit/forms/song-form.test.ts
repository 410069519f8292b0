import { parseWithZod } from "@conform-to/zod/v4";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { namings } from "#app/domain/music/note-names.ts";
import { type SongFields, songFormSchema, songLimits } from "#app/domain/repertoire/song-form.ts";
import { comparableSong, songFormValues } from "#app/domain/repertoire/song-form-values.ts";
import { usualChoices } from "#app/domain/repertoire/usual-choices.ts";

const cedar = { id: "cedar", name: "Cedar", strings: 6 };
const twelve = { id: "twelve", name: "Twelve", strings: 12 };
const reader = { naming: "english" as const, guitars: [cedar, twelve] };
const standardCode = "40-45-50-55-59-64";

const filled = {
  title: "Low Meadow",
  length: "3:15",
  "ways[0].usual": standardCode,
  "ways[0].tuning": "DADGBE",
};

function submit(changes: Record<string, string>) {
  const form = new FormData();
  for (const [name, value] of Object.entries({ ...filled, ...changes })) form.append(name, value);
  return parseWithZod(form, { schema: songFormSchema(reader) });
}

function errorsOf(changes: Record<string, string>) {
  const submission = submit(changes);
  return submission.status === "error" ? submission.error : undefined;
}

describe("a song as it is typed", () => {
  test("needs a title, a length and one tuning; everything else may be left out", () => {
    const submission = submit({ credit: "", key: "", tempo: "", cover: "", notes: "", firstLine: "" });
    expect(submission.status === "success" && submission.value).toEqual({
      title: "Low Meadow",
      credit: "",
      seconds: 195,
      key: "",
      tempo: null,
      energy: null,
      priority: 3,
      notes: "",
      firstLine: "",
      cover: null,
      necks: [{ id: null, open: [38, 45, 50, 55, 59, 64], capos: [], guitars: null, penalty: 0 }],
    } satisfies SongFields);
  });

  test("how lively it is and how much it is wanted come as steps of five", () => {
    const submission = submit({ energy: "5", priority: "1" });
    expect(submission.status === "success" && submission.value).toMatchObject({ energy: 5, priority: 1 });
  });

  // The tuning, the capo and what they are read as: ../shared/facts.md §10 (common practice, no source).
  test("reads a tuning and a partial capo as players write them", () => {
    const submission = submit({ "ways[0].tuning": "CGCFFC", "ways[0].capos": "capo 3, leave 6", key: "Eb" });
    expect(submission.status === "success" && submission.value).toMatchObject({
      key: "Eb",
      necks: [{ open: [36, 43, 48, 53, 53, 60], capos: [{ fret: 3, strings: [5, 4, 3, 2, 1] }] }],
    });
  });

  test("tells all that is wrong at once, each beside its field", () => {
    expect(
      Object.keys(errorsOf({ title: " ", length: "", tempo: "fast", "ways[0].tuning": "XYZ" }) ?? {}),
    ).toEqual(["title", "length", "tempo", "ways[0].tuning"]);
  });

  test.each([
    ["title", "", "Write a title."],
    ["title", "x".repeat(121), "This is longer than 120 characters. Shorten it."],
    ["credit", "x".repeat(121), "This is longer than 120 characters. Shorten it."],
    ["firstLine", "x".repeat(201), "This is longer than 200 characters. Shorten it."],
    ["notes", "x".repeat(4001), "This is longer than 4000 characters. Shorten it."],
    ["length", "", "Write the song's length, such as 3:15."],
    ["length", "0:00", "A song is between 1 second and 3 hours long."],
    ["length", "3:00:01", "A song is between 1 second and 3 hours long."],
    ["length", "long", '"long" is no length that can be read. Write minutes and seconds, such as 3:15.'],
    ["key", "H major?", '"H major?" is no key that can be read. Write it like G, F#m or Bb minor.'],
    ["tempo", "19", "Write the tempo as whole beats a minute, 20 to 400."],
    ["tempo", "401", "Write the tempo as whole beats a minute, 20 to 400."],
    ["tempo", "9.5", "Write the tempo as whole beats a minute, 20 to 400."],
    ["energy", "6", "Choose how lively it is, from calm to full, or not said."],
    ["energy", "2.5", "Choose how lively it is, from calm to full, or not said."],
    ["priority", "0", "Choose how much you want it in the set."],
    ["cover", "1801", "Write whole seconds of talk, 0 to 1800."],
    ["cover", "-1", "Write whole seconds of talk, 0 to 1800."],
    [
      "ways[0].tuning",
      "",
      "Write a tuning from the lowest string up, such as DADGAD, or a name, such as drop D.",
    ],
    ["ways[0].usual", "40-45", "Choose an instrument from the list."],
    ["ways[0].capos", "capo 25", "Fret 25 is outside 1 to 24, where a capo can go."],
    [
      "ways[0].capos",
      "capo 1; capo 2; capo 3; capo 4; capo 5",
      "A neck carries at most 4 capos here. Leave one out.",
    ],
    ["ways[0].penalty", "601", "Write whole seconds, 0 to 600."],
    [
      "ways[0].guitars[0]",
      "gone",
      "One of these guitars is no longer in the act. Reload the page and choose again.",
    ],
    ["ways[0].guitars[0]", "twelve", "Twelve has 12 strings, this tuning 6. Leave it out."],
  ])("%s = %j is refused: %s", (field, value, message) => {
    const shown = field.replace(/\[0\]$/, "");
    expect(errorsOf({ [field]: value })).toEqual({ [shown]: [message] });
  });

  test.each([
    ["length", "3:00:00"],
    ["tempo", "20"],
    ["tempo", "400"],
    ["cover", "0"],
    ["cover", "1800"],
    ["title", "x".repeat(120)],
  ])("%s = %s is the last that is taken", (field, value) => {
    expect(submit({ [field]: value }).status).toBe("success");
  });

  test("needs a way to play it, takes eight, and no two alike", () => {
    const ways = (tunings: string[]) =>
      Object.fromEntries(
        tunings.flatMap((tuning, index) => [
          [`ways[${index}].usual`, standardCode],
          [`ways[${index}].tuning`, tuning],
        ]),
      );
    const form = new FormData();
    form.append("title", "Low Meadow");
    form.append("length", "3:15");
    expect(parseWithZod(form, { schema: songFormSchema(reader) })).toMatchObject({
      error: { ways: ["Add one way to play the song."] },
    });
    const tunings = [
      "EADGBE",
      "DADGAD",
      "DADGBE",
      "CGCGCE",
      "DGDGBD",
      "DADF#AD",
      "EBEG#BE",
      "EADGBE down 1",
      "CGDGCD",
    ];
    expect(submit(ways(tunings.slice(0, songLimits.ways))).status).toBe("success");
    expect(errorsOf(ways(tunings))).toEqual({ ways: ["A song has at most 8 ways to play it. Remove one."] });
    expect(errorsOf(ways(["DADGBE", "drop D"]))).toEqual({
      "ways[1].tuning": ["This is the same as choice 1. Change it or remove it."],
    });
  });

  test("the first choice costs nothing, whatever stood in its field", () => {
    const submission = submit({
      "ways[0].penalty": "9",
      "ways[1].usual": standardCode,
      "ways[1].tuning": "DADGAD",
      "ways[1].penalty": "7",
    });
    const penalties =
      submission.status === "success" ? submission.value.necks.map((neck) => neck.penalty) : [];
    expect(penalties).toEqual([0, 7]);
  });
});

describe("a kept song in its form", () => {
  const choices = usualChoices([
    { id: "cedar", name: "Cedar", usual: [40, 45, 50, 55, 59, 64] },
    { id: "low", name: "Low", usual: [35, 40, 45, 50, 54, 59] },
    { id: "uke", name: "Uke", usual: [67, 60, 64, 69] },
  ]);
  const pitches = fc.constantFrom(4, 6).chain((strings) => {
    return fc.array(fc.integer({ min: 30, max: 76 }), { minLength: strings, maxLength: strings });
  });
  const neck = pitches.chain((open) =>
    fc.record({
      id: fc.constant("n1"),
      open: fc.constant(open),
      capos: fc
        .uniqueArray(fc.integer({ min: 1, max: 12 }), { maxLength: 2 })
        .chain((frets) =>
          fc.tuple(
            ...frets.map((fret) =>
              fc
                .subarray(
                  open.map((_, index) => open.length - index),
                  { minLength: 1 },
                )
                .map((strings) => ({ fret, strings })),
            ),
          ),
        )
        .map((capos) => capos.toSorted((one, other) => one.fret - other.fret)),
      guitars: fc.constant(null),
      penalty: fc.constant(0),
    }),
  );
  const keys = ["", "G", "F#m", "Bb", "Ebm", "D dorian", "Bm", "B"];

  test("what the form shows is read back to the same song, in every naming", () => {
    fc.assert(
      fc.property(
        neck,
        fc.constantFrom(...keys),
        fc.integer({ min: 1, max: songLimits.longestSeconds }),
        fc.constantFrom(...namings),
        fc.constantFrom(null, 1 as const, 5 as const),
        (way, key, seconds, naming, energy) => {
          const song = {
            id: "s1",
            title: "Low Meadow",
            credit: "Trad.",
            seconds,
            key,
            tempo: 96,
            energy,
            priority: 4 as const,
            notes: "",
            firstLine: "",
            cover: 12,
            necks: [way],
            deleted: false,
          };
          const read = songFormSchema({ naming, guitars: [] }).safeParse(
            songFormValues(song, choices, naming),
          );
          const { id: _, deleted: __, ...fields } = song;
          expect(read.error?.issues).toBeUndefined();
          expect(read.data).toEqual(fields);
        },
      ),
      { numRuns: 120 },
    );
  });

  test("two states can be laid side by side, each way in one line", () => {
    const form = {
      title: "A",
      ways: [{ tuning: "CGCFFC", capos: "capo 3", guitars: ["cedar", "gone"], penalty: "4" }],
    };
    expect(comparableSong(form, [cedar]).ways).toEqual([
      "CGCFFC, capo 3, only on Cedar, a deleted guitar, counts as 4 s",
    ]);
  });
});
