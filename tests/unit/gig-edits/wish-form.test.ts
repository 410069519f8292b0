import { parseWithZod } from "@conform-to/zod/v4";
import { describe, expect, test } from "vitest";
import { editSchema } from "#app/domain/gig/edit-schema.ts";
import type { GigWish } from "#app/domain/gig/gig.ts";
import { unknownTo, wishEdits, wishFormSchema, wishFormValues } from "#app/domain/gig/wish-form.ts";

function submit(fields: Record<string, string>) {
  const form = new FormData();
  for (const [name, value] of Object.entries(fields)) form.append(name, value);
  return parseWithZod(form, { schema: wishFormSchema });
}

/** What the browser sends of a form as it is shown: a tick only where it is set. */
function shown(wishes: GigWish[]): Record<string, string> {
  const { run, slow, key, energy } = wishFormValues(wishes);
  const sent: Record<string, string> = {};
  for (const [name, block] of Object.entries({ run, slow, key, energy })) {
    for (const [field, value] of Object.entries(block)) {
      if (field === "on") {
        if (value === true) sent[`${name}.on`] = "on";
      } else if (Array.isArray(value)) {
        value.forEach((point, index) => {
          sent[`${name}.${field}[${index}]`] = point;
        });
      } else sent[`${name}.${field}`] = String(value);
    }
  }
  return sent;
}

const all: GigWish[] = [
  { kind: "tuning-run", most: 4, seconds: 25 },
  { kind: "slow-apart", below: 76, seconds: 40 },
  { kind: "key-apart", seconds: 15 },
  { kind: "energy", curve: [1, 2.5, 2, 4, 5], seconds: 3 },
];

describe("the form of a gig's wishes", () => {
  test.each([
    ["all", all],
    ["none", []],
    ["two", [all[0]!, all[3]!]],
  ])("%s: what it shows is read back to the same wishes", (_, wishes) => {
    const read = submit(shown(wishes));
    expect(read.status === "success" && read.value).toEqual(wishes);
    expect(wishEdits({ wishes }, wishes)).toEqual([]);
  });

  test("each off is shown with what is usual, ready to be set", () => {
    const read = submit({ ...shown([]), "energy.on": "on", "run.on": "on" });
    const wishes = read.status === "success" ? read.value : [];
    expect(wishes).toEqual([
      { kind: "tuning-run", most: 3, seconds: 20 },
      { kind: "energy", curve: [3, 4, 2, 4, 5], seconds: 5 },
    ]);
    const [edit] = wishEdits({ wishes: [] }, wishes);
    expect(editSchema.safeParse(edit).success).toBe(true);
  });

  test("what is wrong is told beside its field, where the wish is on", () => {
    const typed = { ...shown([]), "run.most": "0", "run.seconds": "", "slow.below": "fast" };
    expect(submit(typed).status).toBe("success");
    const read = submit({ ...typed, "run.on": "on", "slow.on": "on" });
    expect(read.status === "error" && read.error).toEqual({
      "run.most": ["Write how many songs, 1 to 20."],
      "run.seconds": ["Write whole seconds, 1 to 600."],
      "slow.below": ["Write whole beats a minute, 20 to 400."],
    });
    expect(read.payload).toMatchObject({ run: { most: "0" }, slow: { below: "fast" } });
  });

  test("a curve of any number of points is drawn through five, to the half step", () => {
    const [wish] = [{ kind: "energy", curve: [1, 5], seconds: 4 } satisfies GigWish];
    expect(wishFormValues([wish]).energy.curve).toEqual(["1", "2", "3", "4", "5"]);
    expect(wishFormValues([{ ...wish, curve: [3.3] }]).energy.curve).toEqual([
      "3.5",
      "3.5",
      "3.5",
      "3.5",
      "3.5",
    ]);
  });

  test("remarks how many songs nothing can be said about", () => {
    const songs = [
      { tempo: null, key: "", energy: 3 as const },
      { tempo: 90, key: "", energy: null },
    ];
    expect(unknownTo(songs)).toEqual({ of: 2, tempo: 1, key: 2, energy: 1 });
  });
});
