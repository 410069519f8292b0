import { describe, expect, test } from "vitest";
import { renderStageSheet } from "#app/documents/stage-sheet/render.tsx";
import type { StageSheet } from "#app/documents/stage-sheet/sheet.ts";
import { readPdf } from "#tests/support/read-pdf.ts";

const sheet: StageSheet = {
  title: "The Slipway, Łódź ♭ side",
  date: "Fri 12 March",
  curfew: "curfew 22:30",
  sets: [
    {
      heading: "Set 1 of 2",
      doors: "At doors: Alder E A D G B E, no capo | Birch C G C F F C, capo 3 leaving 6",
      time: "21:15 to 22:12",
      rows: [
        {
          number: 1,
          title: "Harrow Weather",
          guitar: { name: "Alder", shape: "round" },
          action: "",
          tuning: [..."EADGBE"].map((letter) => ({ letter, turned: null })),
          capos: [],
          encore: false,
        },
        {
          number: 2,
          title: "Señal en la ría",
          guitar: { name: "Birch", shape: "double" },
          action: "capo on 3, leave 6",
          tuning: ["E♭", "A♭", "D♭", "G♭", "B♭", "E♭"].map((letter) => ({ letter, turned: "down" })),
          capos: ["CAPO 3", "leave 6"],
          encore: false,
        },
      ],
    },
    { heading: "Set 2 of 2", doors: "", time: "", rows: [] },
  ],
};

const options = { paper: "a4", version: "plan 7f3a2c", printed: "12 Mar 17:02" } as const;
const at = new Date("2027-03-12T17:02:00Z");

describe("the stage sheet as a PDF", () => {
  test("says what the sheet says, in selectable text, with its fonts inside", async () => {
    const read = await readPdf(await renderStageSheet(sheet, options, "The Emmer Road", at));
    expect(read.pages).toHaveLength(2);
    const text = read.pages[0]?.text ?? "";
    for (const expected of [
      "Harrow Weather",
      "Señal en la ría",
      "capo on 3, leave 6",
      "CAPO 3",
      "leave 6",
      "Alder",
      "Birch",
      "capo 3 leaving 6",
      "Reads at",
      "plan 7f3a2c",
      "Łódź",
    ]) {
      expect(text.replace(/\s+/g, " ")).toContain(expected);
    }
    expect(text.match(/♭/g)?.length).toBe(7);
    expect(read.fontsEmbedded).toBe(true);
    expect(read.title).toBe("Stage sheet, The Slipway, Łódź ♭ side");
    expect(read.author).toBe("The Emmer Road");
  });

  // ISO 216 A4 is 210 × 297 mm; US Letter is 8.5 × 11 in.
  test.each([
    ["a4", 210 / 25.4, 297 / 25.4],
    ["letter", 8.5, 11],
  ] as const)("%s has its size", async (paper, width, height) => {
    const read = await readPdf(await renderStageSheet(sheet, { ...options, paper }, "The Emmer Road", at));
    expect((read.pages[0]?.width ?? 0) / 72).toBeCloseTo(width, 2);
    expect((read.pages[0]?.height ?? 0) / 72).toBeCloseTo(height, 2);
  });

  test("text stands where the layout put it: inside the margins, the title under its action", async () => {
    const read = await readPdf(await renderStageSheet(sheet, options, "The Emmer Road", at));
    const items = read.pages[0]?.items ?? [];
    const action = items.find((item) => item.text.startsWith("capo on 3"));
    const title = items.find((item) => item.text.startsWith("Señal"));
    expect(title?.y).toBeGreaterThan(action?.y ?? Number.POSITIVE_INFINITY);
    for (const item of items) {
      expect(item.x).toBeGreaterThanOrEqual(33);
      expect(item.y).toBeLessThanOrEqual(842 - 33);
    }
  });

  test("the same sheet, options and hour give the same bytes", async () => {
    const [first, second] = await Promise.all([
      renderStageSheet(sheet, options, "A", at),
      renderStageSheet(sheet, options, "A", at),
    ]);
    expect(first.equals(second)).toBe(true);
  });
});
