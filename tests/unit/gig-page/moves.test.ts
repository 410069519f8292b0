import { describe, expect, test } from "vitest";
import { partName, partsOf, placeBeside, placeOf, toPart } from "#app/components/gig/sets/moves.ts";
import { gigOf } from "#tests/unit/gig/build-gig.ts";

describe("moving without dragging", () => {
  const gig = gigOf([[{ song: "a" }, { song: "b" }, { song: "c", encore: true }], [{ song: "d" }]]);
  const parts = partsOf(gig);

  test("an encore without songs is no section until it is asked for", () => {
    expect(parts.map((part) => [partName(part), part.entryIds])).toEqual([
      ["Set 1", ["a", "b"]],
      ["Encore of Set 1", ["c"]],
      ["Set 2", ["d"]],
    ]);
    expect(partsOf(gig, new Set(["set2"])).map(partName)).toContain("Encore of Set 2");
  });

  test("up and down inside a section", () => {
    expect(placeBeside(parts, "a", 1)).toEqual({ setId: "set1", section: 0, index: 1 });
    expect(placeBeside(parts, "b", -1)).toEqual({ setId: "set1", section: 0, index: 0 });
  });

  test("over the edge into the next section and set", () => {
    expect(placeBeside(parts, "b", 1)).toEqual({ setId: "set1", section: 1, index: 0 });
    expect(placeBeside(parts, "c", -1)).toEqual({ setId: "set1", section: 0, index: 2 });
    expect(placeBeside(parts, "c", 1)).toEqual({ setId: "set2", section: 0, index: 0 });
    expect(placeBeside(parts, "d", -1)).toEqual({ setId: "set1", section: 1, index: 1 });
  });

  test("the first song has nowhere to go up, the last nowhere down", () => {
    expect(placeBeside(parts, "a", -1)).toBeNull();
    expect(placeBeside(parts, "d", 1)).toBeNull();
    expect(placeBeside(parts, "gone", 1)).toBeNull();
  });

  test("sections by name", () => {
    expect(toPart({ setName: "Set 1", section: 0 }, 2)).toBe("Set 1");
    expect(toPart({ setName: "Set 1", section: 1 }, 2)).toBe("the encore of Set 1");
    expect(toPart({ setName: "Set 1", section: 1 }, 1)).toBe("the encore");
  });

  test("where an entry stands", () => {
    expect(placeOf(parts, "c")).toEqual({ setId: "set1", section: 1, index: 0 });
    expect(placeOf(parts, "gone")).toBeNull();
  });
});
