import { describe, expect, test } from "vitest";
import { expectedBoxes } from "#app/components/gig/ribbons/use-row-boxes.ts";
import { rowTroubles } from "#app/components/gig/rows/row-troubles.ts";
import { sameRow } from "#app/components/gig/rows/same-row.ts";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { placeEdits } from "#app/domain/gig/order.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { gigOf, guitar, pairRule, repertoireOf, song } from "#tests/unit/gig/build-gig.ts";

const repertoire = repertoireOf(
  [
    song("a", "EADGBE"),
    song("b", "DADGBE"),
    song("c", "DADGAD"),
    song("d", "EADGBE capo 2"),
    song("low", "A1 E2 A2 D3 G3 B3"),
  ],
  [guitar("alder")],
);
const gig = gigOf([[{ song: "a" }, { song: "b" }, { song: "c" }, { song: "d" }]]);

function moved(from: Gig, entryId: string, index: number): Gig {
  const applied = applyEdits(from, placeEdits(from, entryId, { setId: "set1", section: 0, index }));
  if (!applied.ok) throw new Error(applied.conflict.message);
  return applied.gig;
}

describe("rows that need not be drawn again", () => {
  test("two plans of one gig have the same rows, though not the same objects", () => {
    const one = planGig(gig, repertoire).sets[0]!.rows;
    const two = planGig(gig, repertoire).sets[0]!.rows;
    expect(one[1]).not.toBe(two[1]);
    expect(one.map((row, index) => sameRow(row, two[index]!))).toEqual([true, true, true, true]);
  });

  test("a move changes the rows that it renumbers or whose gap it changes, and no others", () => {
    const before = new Map(planGig(gig, repertoire).sets[0]!.rows.map((row) => [row.entry.id, row]));
    const after = planGig(moved(gig, "d", 2), repertoire).sets[0]!.rows;
    const changed = after
      .filter((row) => !sameRow(before.get(row.entry.id)!, row))
      .map((row) => row.entry.id);
    expect(changed).toEqual(["d", "c"]);
  });

  test("another cover changes the row it belongs to", () => {
    const before = planGig(gig, repertoire).sets[0]!.rows;
    const applied = applyEdits(gig, [{ kind: "entry.set", entryId: "b", field: "cover", value: 60 }]);
    if (!applied.ok) throw new Error(applied.conflict.message);
    const after = planGig(applied.gig, repertoire).sets[0]!.rows;
    expect(before.map((row, index) => sameRow(row, after[index]!))).toEqual([true, false, true, true]);
  });
});

describe("what must be mended", () => {
  test("a song no guitar can play says why, at its own row", () => {
    const plan = planGig(gigOf([[{ song: "a" }, { song: "low" }]]), repertoire).sets[0]!;
    const troubles = rowTroubles(plan, repertoire.guitars.length);
    expect([...troubles.keys()]).toEqual(["low"]);
    expect(troubles.get("low")?.[0]).toMatch(/^No guitar can play this/);
  });

  test("without any guitar the page says so once, the rows do not", () => {
    const plan = planGig(gig, { ...repertoire, guitars: [] }).sets[0]!;
    expect(rowTroubles(plan, 0).size).toBe(0);
  });

  test("a broken rule stands at the first of its songs", () => {
    const ruled = { ...gig, rules: [pairRule("into", "c", "a")] };
    const plan = planGig(ruled, repertoire).sets[0]!;
    expect(rowTroubles(plan, 1).get("c")).toEqual(["c should go straight into a."]);
  });
});

describe("where rows stand before anything is measured", () => {
  test("rows and gap lines of the styles, a line more for each trouble", () => {
    const { rows } = planGig(gig, repertoire).sets[0]!;
    expect(expectedBoxes(rows, new Map())).toEqual({
      tops: [36, 99, 162, 225],
      heights: [40, 40, 40, 40],
      bottom: 265,
    });
    const boxes = expectedBoxes(rows, new Map([["b", ["One.", "Two."]]]));
    expect(boxes.heights).toEqual([40, 86, 40, 40]);
    expect(boxes.tops[2]).toBe(162 + 46);
  });
});
