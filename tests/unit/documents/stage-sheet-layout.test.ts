import { describe, expect, test } from "vitest";
import { textWidth } from "#app/documents/fonts.ts";
import { readingDistance } from "#app/documents/legibility.ts";
import { margin, paperSizes } from "#app/documents/paper.ts";
import { layoutStageSheet } from "#app/documents/stage-sheet/layout.ts";
import type { Mark, SheetPage } from "#app/documents/stage-sheet/marks.ts";
import type { SheetRow, StageSheet } from "#app/documents/stage-sheet/sheet.ts";

const options = { paper: "a4", version: "plan 7f3a2c", printed: "12 Mar 17:02" } as const;

function row(number: number, more: Partial<SheetRow> = {}): SheetRow {
  return {
    number,
    title: `Lamp Number ${number}`,
    guitar: null,
    action: "1 down",
    tuning: [..."DADGBE"].map((letter, index) => ({ letter, turned: index === 0 ? "down" : null })),
    capos: [],
    encore: false,
    ...more,
  };
}

function sheet(rows: SheetRow[]): StageSheet {
  return {
    title: "The Slipway",
    date: "Fri 12 March",
    curfew: "curfew 22:30",
    sets: [{ heading: "", doors: "At doors: Cedar E A D G B E, no capo", time: "21:15 to 22:12", rows }],
  };
}

type TextMark = Extract<Mark, { kind: "text" }>;
const texts = (page: SheetPage) => page.marks.filter((mark): mark is TextMark => mark.kind === "text");

/** Where a text's ink is: from its left to its right, from the top of its capitals to the foot of its descenders. */
function ink(mark: TextMark) {
  const wide = textWidth(mark.text, mark.weight) * mark.size;
  const slack = { left: 0, center: (mark.width - wide) / 2, right: mark.width - wide }[mark.align];
  return {
    left: mark.x + slack,
    right: mark.x + slack + wide,
    top: mark.y - 0.75 * mark.size,
    bottom: mark.y + 0.2 * mark.size,
  };
}

function overlaps(page: SheetPage): string[] {
  const boxes = texts(page).map((mark) => ({ text: mark.text, ...ink(mark) }));
  const found: string[] = [];
  boxes.forEach((a, index) => {
    for (const b of boxes.slice(index + 1)) {
      if (
        a.left < b.right - 0.5 &&
        b.left < a.right - 0.5 &&
        a.top < b.bottom - 0.5 &&
        b.top < a.bottom - 0.5
      ) {
        found.push(`${a.text} over ${b.text}`);
      }
    }
  });
  return found;
}

const long =
  "The Long Slow Walk Home Along the Canal Towpath After the Last Bus Has Gone and the Rain Has Come On Again";
const shapes: [string, (number: number) => SheetRow][] = [
  ["short titles", (number) => row(number)],
  ["long titles", (number) => row(number, { title: long })],
  [
    "one unbroken word",
    (number) => row(number, { title: "Llanfairpwllgwyngyllgogerychwyrndrobwllllantysiliogogogoch" }),
  ],
  [
    "everything at once",
    (number) =>
      row(number, {
        title: long,
        guitar: { name: "Blonde", shape: "hexagon" },
        action: "capo off, 3 down, 3 up, capo on 3, leave 6, check, 6 reads E♭",
        capos: ["CAPO 1", "CAPO 3", "leave 6"],
        tuning: ["Sol♯", "Re♭", "Mi", "Fa", "Si♭", "La"].map((letter) => ({ letter, turned: "up" })),
      }),
  ],
  [
    "twelve strings",
    (number) => row(number, { tuning: [..."EEAADDGGBBEE"].map((letter) => ({ letter, turned: "up" })) }),
  ],
];

describe.each(["a4", "letter"] as const)("on %s", (paper) => {
  describe.each([1, 12, 25, 60])("%i songs", (count) => {
    test.each(shapes)("with %s stay on the page, apart, and say how far they read", (_, make) => {
      const rows = Array.from({ length: count }, (__, index) => make(index + 1));
      const pages = layoutStageSheet(sheet(rows), { ...options, paper });
      const { width, height } = paperSizes[paper];
      const numbers = pages.flatMap((page) =>
        texts(page)
          .filter((mark) => mark.role === "number")
          .map((mark) => Number(mark.text)),
      );
      expect(numbers).toEqual(rows.map((each) => each.number));
      for (const page of pages) {
        expect(overlaps(page)).toEqual([]);
        for (const mark of texts(page)) {
          const box = ink(mark);
          expect(box.left, mark.text).toBeGreaterThanOrEqual(margin - 1);
          expect(box.right, mark.text).toBeLessThanOrEqual(width - margin + 1);
          expect(box.bottom, mark.text).toBeLessThanOrEqual(height - margin + 4);
        }
        const sizes = texts(page)
          .filter((mark) => ["title", "tuning", "capo", "action"].includes(mark.role))
          .map((mark) => mark.size);
        expect(page.smallest).toBeCloseTo(Math.min(...sizes), 6);
        const stated = texts(page)
          .find((mark) => mark.text.startsWith("Reads at"))
          ?.text.match(/Reads at ([\d.]+) m/)?.[1];
        const real = readingDistance(Math.min(...sizes));
        expect(Number(stated)).toBeLessThanOrEqual(real + 1e-9);
        expect(Number(stated)).toBeGreaterThan(real - 0.1);
      }
    });
  });
});

describe("as large as fits", () => {
  test("twelve songs stand on one page, larger than thirty do", () => {
    const twelve = layoutStageSheet(sheet(Array.from({ length: 12 }, (_, index) => row(index + 1))), options);
    const thirty = layoutStageSheet(sheet(Array.from({ length: 30 }, (_, index) => row(index + 1))), options);
    expect(twelve).toHaveLength(1);
    expect(twelve[0]?.smallest).toBeGreaterThan(24);
    expect(Math.min(...thirty.map((page) => page.smallest))).toBeLessThan(twelve[0]?.smallest ?? 0);
  });

  test("songs that need no work before them take one line, so that the type grows", () => {
    const busy = layoutStageSheet(sheet(Array.from({ length: 14 }, (_, index) => row(index + 1))), options);
    const calm = layoutStageSheet(
      sheet(Array.from({ length: 14 }, (_, index) => row(index + 1, { action: "" }))),
      options,
    );
    expect(calm[0]?.smallest).toBeGreaterThan(busy[0]?.smallest ?? 0);
  });

  test("each set starts a page, and an empty one says so", () => {
    const two = sheet([row(1)]);
    two.sets.push({ heading: "Set 2 of 2", doors: "", time: "", rows: [] });
    const pages = layoutStageSheet(two, options);
    expect(pages).toHaveLength(2);
    expect(
      texts(pages[1] as SheetPage).some((mark) => mark.text.startsWith("No songs in this set yet")),
    ).toBe(true);
  });
});
