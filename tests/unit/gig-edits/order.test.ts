import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig, Section } from "#app/domain/gig/gig.ts";
import { longestRising } from "#app/domain/gig/longest-rising.ts";
import {
  entriesOf,
  isRank,
  lastRanks,
  placeEdits,
  reorderEdits,
  ruleId,
  setsOf,
} from "#app/domain/gig/order.ts";
import { entry, sampleGig } from "#tests/unit/gig-edits/sample-gig.ts";

function edited(gig: Gig, edits: Edit[]): Gig {
  const applied = applyEdits(gig, edits);
  if (!applied.ok) throw new Error(applied.conflict.message);
  return applied.gig;
}

function order(gig: Gig, setId: string, section?: Section): string[] {
  return entriesOf(gig, setId)
    .filter((one) => section === undefined || one.section === section)
    .map((one) => one.id);
}

/** A set of songs with these ranks, named e0, e1 … in that order of ids. */
function ranked(...ranks: string[]): Gig {
  return sampleGig({
    entries: ranks.map((rank, index) => entry(`e${String(index).padStart(2, "0")}`, { rank })),
  });
}

describe("order", () => {
  it("is section, then rank as plain text, then id", () => {
    const gig = sampleGig({
      entries: [
        entry("c", { rank: "a0" }),
        entry("b", { rank: "a0" }),
        entry("a", { rank: "a1" }),
        entry("z", { section: 1, rank: "Zz" }),
        entry("n", { rank: "Zz" }),
      ],
    });
    expect(order(gig, "s1")).toEqual(["n", "b", "c", "a", "z"]);
    expect(setsOf(sampleGig({ sets: sampleGig().sets.toReversed() })).map((set) => set.id)).toEqual([
      "s1",
      "s2",
    ]);
  });

  it("names a rule by its parts, apart in either order, a fixed place without the place", () => {
    expect(ruleId("into", "b", "a")).toBe("into.b.a");
    expect(ruleId("apart", "b", "a")).toBe(ruleId("apart", "a", "b"));
    expect(ruleId("at", "a")).toBe("at.a");
  });

  it("knows ranks from other text", () => {
    expect(["a0", "Zz", "a0V", "b00"].map(isRank)).toEqual([true, true, true, true]);
    expect(["", "a", "a00", "?1", "0"].map(isRank)).toEqual([false, false, false, false, false]);
  });

  it("gives new songs ranks after the last of their section", () => {
    const ranks = lastRanks(sampleGig(), "s1", 0, 3);
    expect(ranks.toSorted()).toEqual(ranks);
    expect(ranks[0]! > "a2").toBe(true);
  });
});

describe("placeEdits", () => {
  it("is one edit, of the moved song alone", () => {
    const gig = sampleGig();
    const edits = placeEdits(gig, "e3", { setId: "s1", section: 0, index: 0 });
    expect(edits).toHaveLength(1);
    expect(order(edited(gig, edits), "s1")).toEqual(["e3", "e1", "e2", "e4"]);
  });

  it("is no edit where the song stands there", () => {
    expect(placeEdits(sampleGig(), "e2", { setId: "s1", section: 0, index: 1 })).toEqual([]);
  });

  it("moves into the encore and into another set", () => {
    const gig = sampleGig();
    const encore = edited(gig, placeEdits(gig, "e1", { setId: "s1", section: 1, index: 1 }));
    expect(order(encore, "s1")).toEqual(["e2", "e3", "e4", "e1"]);
    const other = edited(gig, placeEdits(gig, "e1", { setId: "s2", section: 0, index: 1 }));
    expect(order(other, "s2")).toEqual(["e5", "e1", "e6"]);
  });

  it("tells equal neighbours apart where a song goes between them", () => {
    const gig = ranked("a0", "a0", "a1");
    const edits = placeEdits(gig, "e02", { setId: "s1", section: 0, index: 1 });
    expect(order(edited(gig, edits), "s1")).toEqual(["e00", "e02", "e01"]);
  });

  it("keeps ranks short however often songs go into one spot", () => {
    let gig = ranked("a0", "a1", "a2", "a3");
    for (let step = 0; step < 400; step++) {
      const last = order(gig, "s1").at(-1)!;
      gig = edited(gig, placeEdits(gig, last, { setId: "s1", section: 0, index: 1 }));
    }
    expect(Math.max(...gig.entries.map((one) => one.rank.length))).toBeLessThanOrEqual(40);
  });

  it("does what moving in a list does, wherever the song comes from", () => {
    fc.assert(
      fc.property(
        fc.array(fc.constantFrom("Zz", "a0", "a0V", "a1", "a1G", "a2"), { minLength: 1, maxLength: 12 }),
        fc.array(fc.tuple(fc.nat(11), fc.nat(12)), { minLength: 1, maxLength: 12 }),
        (ranks, moves) => {
          let gig = ranked(...ranks);
          for (const [from, to] of moves) {
            const list = order(gig, "s1");
            const id = list[from % list.length]!;
            const others = list.filter((one) => one !== id);
            const index = to % (others.length + 1);
            gig = edited(gig, placeEdits(gig, id, { setId: "s1", section: 0, index }));
            expect(order(gig, "s1")).toEqual(others.toSpliced(index, 0, id));
          }
        },
      ),
      { numRuns: 300 },
    );
  });

  it("of two songs at once holds for both, whichever comes first", () => {
    const gig = sampleGig();
    const mine = placeEdits(gig, "e1", { setId: "s1", section: 0, index: 2 });
    const theirs = placeEdits(gig, "e3", { setId: "s1", section: 0, index: 0 });
    const oneWay = order(edited(edited(gig, mine), theirs), "s1");
    expect(order(edited(edited(gig, theirs), mine), "s1")).toEqual(oneWay);
    expect(oneWay).toEqual(["e3", "e2", "e1", "e4"]);
  });
});

describe("reorderEdits", () => {
  it("touches only the songs outside a longest common subsequence", () => {
    const gig = ranked("a0", "a1", "a2", "a3", "a4", "a5");
    const next = ["e00", "e03", "e01", "e02", "e05", "e04"];
    const edits = reorderEdits(gig, "s1", next);
    expect(edits).toHaveLength(2);
    expect(order(edited(gig, edits), "s1")).toEqual(next);
  });

  it("keeps songs in their sections, and songs that are not named in their places", () => {
    const gig = sampleGig();
    const next = edited(gig, reorderEdits(gig, "s1", ["e3", "e1"]));
    expect(order(next, "s1")).toEqual(["e3", "e2", "e1", "e4"]);
    expect(order(next, "s1", 1)).toEqual(["e4"]);
  });

  it("refuses an order that names a song twice, or one of another set", () => {
    expect(() => reorderEdits(sampleGig(), "s1", ["e1", "e1"])).toThrow("once");
    expect(() => reorderEdits(sampleGig(), "s1", ["e5"])).toThrow("e5");
  });

  it("gives any order, from any ranks, with no more edits than it must", () => {
    const shuffled = fc
      .array(fc.constantFrom("Zz", "a0", "a0V", "a1", "a1G", "a2", "a3"), { minLength: 1, maxLength: 14 })
      .chain((ranks) =>
        fc.tuple(fc.constant(ranks), fc.shuffledSubarray([...ranks.keys()], { minLength: ranks.length })),
      );
    fc.assert(
      fc.property(shuffled, ([ranks, places]) => {
        const gig = ranked(...ranks);
        const next = places.map((place) => `e${String(place).padStart(2, "0")}`);
        const edits = reorderEdits(gig, "s1", next);
        expect(order(edited(gig, edits), "s1")).toEqual(next);
        const distinct = new Set(ranks).size === ranks.length;
        if (distinct) expect(edits).toHaveLength(next.length - longestCommon(order(gig, "s1"), next));
      }),
      { numRuns: 500 },
    );
  });
});

/** Length of a longest common subsequence, by the textbook table: Wagner and Fischer, J. ACM 21 (1974). */
function longestCommon(a: string[], b: string[]): number {
  const rows = Array.from({ length: a.length + 1 }, () => new Array<number>(b.length + 1).fill(0));
  for (let i = 1; i <= a.length; i++) {
    for (let j = 1; j <= b.length; j++) {
      rows[i]![j] =
        a[i - 1] === b[j - 1] ? rows[i - 1]![j - 1]! + 1 : Math.max(rows[i - 1]![j]!, rows[i]![j - 1]!);
    }
  }
  return rows[a.length]![b.length]!;
}

describe("longestRising", () => {
  it("finds a longest strictly rising run", () => {
    expect(longestRising([])).toEqual([]);
    expect(longestRising(["b", "b", "b"])).toHaveLength(1);
    expect(longestRising(["d", "a", "b", "e", "c"])).toHaveLength(3);
  });
});
