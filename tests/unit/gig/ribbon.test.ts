import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { defaultTimes } from "#app/domain/gig/gig.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { type RibbonFrame, type RibbonLane, ribbonLanes } from "#app/domain/gig/ribbon.ts";
import { placeLabels } from "#app/domain/gig/ribbon-labels.ts";
import { gigOf, guitar, repertoireOf, song } from "./build-gig.ts";

const guitars = [
  guitar("alder"),
  guitar("birch"),
  guitar("cedar"),
  guitar("dogwd"),
  guitar("elm"),
  guitar("tin", { keeps: true }),
];

function frameFor(rows: number, hand: "left" | "right" = "right"): RibbonFrame {
  const tops = Array.from({ length: rows }, (_, index) => index * 64);
  return {
    tops,
    heights: tops.map(() => 40),
    bottom: rows * 64,
    laneWidth: 160,
    foldedWidth: 40,
    hand,
    labelWidth: 20,
    labelHeight: 11,
  };
}

function lanesOf(
  songs: [string, string][],
  changes: Parameters<typeof gigOf>[1] = {},
  hand: "left" | "right" = "right",
): RibbonLane[] {
  const all = songs.map(([way], index) => song(`s${index}`, way));
  const gig = gigOf([songs.map(([, on], index) => ({ song: `s${index}`, guitar: on }))], changes);
  const rows = planGig(gig, repertoireOf(all, guitars)).sets[0]!.rows;
  return ribbonLanes(rows, guitars, frameFor(songs.length, hand));
}

describe("a ribbon", () => {
  test("a calm set is straight lines", () => {
    const [lane] = lanesOf([
      ["EADGBE", "alder"],
      ["EADGBE", "alder"],
      ["EADGBE", "alder"],
    ]);
    expect(lane?.strings).toHaveLength(6);
    for (const string of lane?.strings ?? []) {
      expect(new Set(string.pieces.flatMap((piece) => [piece.x1, piece.x2])).size).toBe(1);
    }
    expect(lane?.labels).toEqual([]);
  });

  test("a string tuned down steps left in its gap, one tuned up steps right, each labelled with its semitones", () => {
    const [lane] = lanesOf([
      ["EADGBE", "alder"],
      ["DADGCE", "alder"],
    ]);
    const steps = lane?.strings.flatMap((string) =>
      string.pieces
        .filter((piece) => piece.step)
        .map((piece) => [string.string, piece.step, piece.x2 < piece.x1]),
    );
    expect(steps).toEqual([
      [6, "down", true],
      [2, "up", false],
    ]);
    expect(lane?.labels.map((label) => [label.string, label.direction, label.semitones])).toEqual([
      [6, "down", 2],
      [2, "up", 1],
    ]);
    const step = lane?.strings[0]?.pieces.find((piece) => piece.step);
    expect(step?.y1).toBeGreaterThanOrEqual(40);
    expect(step?.y2).toBeLessThanOrEqual(64);
  });

  test("the step grows less than the interval", () => {
    const size = (way: string) => {
      const piece = lanesOf([
        ["EADGBE", "alder"],
        [way, "alder"],
      ])[0]?.strings[0]?.pieces.find((one) => one.step);
      return Math.abs((piece?.x2 ?? 0) - (piece?.x1 ?? 0));
    };
    expect(size("CADGBE")).toBeGreaterThan(size("DADGBE"));
    expect(size("CADGBE")).toBeLessThan(2 * size("DADGBE"));
  });

  test("a capo is a bar over exactly its strings, with sides down to the last song it stays on for", () => {
    const [lane] = lanesOf([
      ["EADGBE capo 3 leave 6", "alder"],
      ["EADGBE capo 3 leave 6", "alder"],
      ["EADGBE", "alder"],
    ]);
    const capo = lane?.capos[0];
    const at = (string: number) =>
      lane?.strings.find((one) => one.string === string)?.pieces[0]?.x1 ?? Number.NaN;
    expect(lane?.capos).toHaveLength(1);
    expect(capo?.fret).toBe(3);
    expect(capo?.runs).toHaveLength(1);
    expect(capo?.runs[0]?.x1).toBeGreaterThan(at(6));
    for (const string of [5, 4, 3, 2, 1]) {
      expect(at(string)).toBeGreaterThan(capo?.runs[0]?.x1 ?? Number.POSITIVE_INFINITY);
      expect(at(string)).toBeLessThan(capo?.runs[0]?.x2 ?? Number.NEGATIVE_INFINITY);
    }
    expect(capo?.endY).toBe(64 + 40 - 2);
  });

  test("a capo that another guitar takes ends at the gap where it is taken, and begins anew when put on again", () => {
    const one = [{ id: "k", name: "Steel", strings: null, count: 1 }];
    const ways: [string, string][] = [
      ["EADGBE capo 2", "alder"],
      ["EADGBE", "birch"],
      ["EADGBE capo 4", "birch"],
      ["EADGBE capo 2", "alder"],
    ];
    const all = ways.map(([way], index) => song(`s${index}`, way));
    const gig = gigOf([ways.map(([, on], index) => ({ song: `s${index}`, guitar: on }))]);
    const bars = (capos: typeof one) => {
      const rows = planGig(gig, repertoireOf(all, guitars, capos)).sets[0]!.rows;
      return ribbonLanes(rows, guitars, frameFor(4)).map((lane) =>
        lane.capos.map(({ fret, y1, endY }) => [fret, Math.floor(y1 / 64), endY]),
      );
    };
    // Rows are 64 apart and 40 high. Alder rests with its capo during the second song; the gap into the third takes it.
    expect(bars(one)).toEqual([
      [
        [2, 0, 64 + 40 - 2],
        [2, 3, null],
      ],
      [[4, 2, null]],
    ]);
    expect(bars([{ ...one[0]!, count: 2 }])).toEqual([[[2, 0, 3 * 64 + 40 - 2]], [[4, 2, null]]]);
  });

  test("mirrored for the left hand: the low string on the right", () => {
    const first = (lanes: RibbonLane[], string: number) =>
      lanes[0]?.strings.find((one) => one.string === string)?.pieces[0]?.x1 ?? Number.NaN;
    const right = lanesOf([["EADGBE", "alder"]]);
    const left = lanesOf([["EADGBE", "alder"]], {}, "left");
    expect(first(right, 6)).toBeLessThan(first(right, 1));
    expect(first(left, 6)).toBeGreaterThan(first(left, 1));
  });

  test("full where the guitar is played, thin where it rests", () => {
    const lanes = lanesOf([
      ["EADGBE", "alder"],
      ["EADGBE", "birch"],
      ["EADGBE", "alder"],
    ]);
    const active = lanes[0]?.strings[0]?.pieces
      .filter((piece) => piece.active)
      .map((piece) => [piece.y1, piece.y2]);
    expect(active).toEqual([
      [0, 40],
      [128, 168],
    ]);
  });

  test("a tech's work stands beside the song it is done during", () => {
    const lanes = lanesOf(
      [
        ["EADGBE", "alder"],
        ["EADGBE", "birch"],
        ["DADGBE", "alder"],
      ],
      { crew: "tech", times: defaultTimes.tech },
    );
    const [knot] = lanes[0]?.knots ?? [];
    expect(knot).toMatchObject({ atSide: true, entryId: "s2" });
    expect(knot?.y1).toBeGreaterThanOrEqual(64);
    expect(knot?.y2).toBeLessThanOrEqual(104);
  });

  test("a guitar that keeps its tuning folds to one lane, and so do all but the four most used", () => {
    const lanes = lanesOf([
      ["EADGBE", "alder"],
      ["EADGBE", "birch"],
      ["EADGBE", "cedar"],
      ["EADGBE", "dogwd"],
      ["EADGBE", "elm"],
      ["EADGBE", "tin"],
      ["EADGBE", "elm"],
    ]);
    expect(lanes.map((lane) => [lane.guitar.id, lane.folded])).toEqual([
      ["alder", false],
      ["birch", false],
      ["cedar", false],
      ["dogwd", true],
      ["elm", false],
      ["tin", true],
    ]);
    expect(lanes.map((lane) => lane.x)).toEqual([0, 160, 320, 480, 520, 680]);
  });
});

describe("labels of one gap", () => {
  const labels = (xs: number[]) =>
    xs.map((x, index) => ({ string: index + 1, direction: "up" as const, semitones: 2, x, entryId: "e" }));
  const room = { y1: 0, y2: 20, width: 160, labelWidth: 20, labelHeight: 11 };

  test("stand beside their steps where these leave room", () => {
    expect(placeLabels(labels([10, 60, 120]), room).map(({ x, y }) => [x, y])).toEqual([
      [10, 10],
      [60, 10],
      [120, 10],
    ]);
  });

  test("take a second line where two steps are close", () => {
    expect(placeLabels(labels([10, 18]), room).map(({ x, y }) => [x, y])).toEqual([
      [10, 4.5],
      [18, 15.5],
    ]);
  });

  test("of twelve strings in a narrow lane cover nobody and stay inside", () => {
    const placed = placeLabels(labels(Array.from({ length: 12 }, (_, index) => 20 + index * 11)), room);
    expect(placed).toHaveLength(12);
    placed.forEach((a, index) => {
      expect(a.x).toBeGreaterThanOrEqual(0);
      expect(a.x + 20).toBeLessThanOrEqual(160);
      for (const b of placed.slice(index + 1))
        expect(Math.abs(a.x - b.x) >= 20 || Math.abs(a.y - b.y) >= 11).toBe(true);
    });
  });
});

describe("always", () => {
  const ways = [
    "EADGBE",
    "DADGAD",
    "DADGBE capo 2",
    "CGCFFC capo 3 leave 6",
    "CGCGCE capo 4",
    "DGDGBD",
    "EADGBE capo 2 on 5-3",
    "EADGAD capo 2 on 5-3",
  ];
  const sets = fc.array(fc.tuple(fc.constantFrom(...ways), fc.constantFrom("alder", "birch", "cedar")), {
    minLength: 1,
    maxLength: 14,
  });

  /** Fret and covered strings, read from the way as it is written. */
  const coverOf = (way: string): [number, number[]] | [] => {
    const read = /capo (\d+)( leave 6| on 5-3)?$/.exec(way);
    if (!read) return [];
    const covered = read[2] === " leave 6" ? [5, 4, 3, 2, 1] : read[2] ? [5, 4, 3] : [6, 5, 4, 3, 2, 1];
    return [Number(read[1]), covered];
  };

  test("strings are unbroken from top to bottom, labels never cover each other, nothing leaves its lane", () => {
    fc.assert(
      fc.property(sets, fc.constantFrom("alone" as const, "tech" as const), (songs, crew) => {
        for (const lane of lanesOf(songs, { crew })) {
          const ofLane = songs.flatMap(([way, on], row) => (on === lane.guitar.id ? [{ way, row }] : []));
          for (const { way, row } of ofLane) {
            const bars = lane.capos.filter(
              (bar) => bar.y1 < row * 64 + 40 && (bar.endY ?? bar.y2) > row * 64,
            );
            const [fret = 0, covered = []] = coverOf(way);
            expect(bars.map((bar) => bar.fret)).toEqual(fret === 0 ? [] : [fret]);
            for (const { string, pieces } of lane.strings) {
              const piece = pieces.find((one) => one.y1 <= row * 64 + 20 && one.y2 >= row * 64 + 20);
              const x = piece?.x1 ?? Number.NaN;
              const under = bars.some((bar) => bar.runs.some((run) => x >= run.x1 && x <= run.x2));
              expect(under, `${way}, string ${string}`).toBe(covered.includes(string));
              expect(piece?.active).toBe(true);
            }
          }
          for (const { pieces } of lane.strings) {
            expect(pieces[0]?.y1).toBe(0);
            expect(pieces.at(-1)?.y2).toBe(songs.length * 64);
            pieces.forEach((piece, index) => {
              const next = pieces[index + 1];
              if (next) expect([next.x1, next.y1]).toEqual([piece.x2, piece.y2]);
              for (const x of [piece.x1, piece.x2]) {
                expect(x).toBeGreaterThanOrEqual(0);
                expect(x).toBeLessThanOrEqual(lane.width);
              }
            });
          }
          lane.labels.forEach((a, index) => {
            expect(a.x + 20).toBeLessThanOrEqual(lane.width + 1e-9);
            for (const b of lane.labels.slice(index + 1)) {
              const apart = Math.abs(a.x - b.x) >= 20 - 1e-6 || Math.abs(a.y - b.y) >= 11 - 1e-6;
              expect(apart || a.entryId !== b.entryId, `${a.x},${a.y} ${b.x},${b.y}`).toBe(true);
            }
          });
        }
      }),
      { seed: 7, numRuns: 150 },
    );
  });
});
