import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { entriesOf, placeEdits } from "#app/domain/gig/order.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { betweenSets } from "#app/domain/gig/what-if/between-sets.ts";
import { needsOf } from "#app/domain/gig/what-if/needs.ts";
import { gigOf, guitar, pairRule, repertoireOf, song } from "../gig/build-gig.ts";

const alder = guitar("alder", { shortName: "Alder" });
const birch = guitar("birch", { shortName: "Birch" });
const on = (id: string) => ({ song: id, guitar: "alder" });

describe("which set a song should be in", () => {
  const songs = [
    song("Lamps", "EADGBE"),
    song("Ferry", "DADGAD"),
    song("Meadow", "EADGBE"),
    song("Home", "EADGBE"),
    song("Gate", "DADGAD"),
    song("Quarry", "DADGAD"),
    song("Stile", "EADGBE"),
    song("Rook", "DADGAD"),
  ];
  const repertoire = repertoireOf(songs, [alder]);
  const gig = gigOf([
    ["Lamps", "Ferry", "Meadow", "Home"].map(on),
    ["Gate", "Stile", "Quarry", "Rook"].map(on),
  ]);

  test("an exchange that leaves each set in one tuning comes first", () => {
    const now = planGig(gig, repertoire);
    const [best] = betweenSets(gig, now, repertoire, 300);
    expect(best?.goes.map(({ title, to }) => [title, to])).toEqual([
      ["Ferry", "Set 2"],
      ["Stile", "Set 1"],
    ]);
    expect(best?.needs).toMatchObject({ exposed: 0, strings: 0 });
    const applied = applyEdits(gig, best!.supposed.edits);
    if (!applied.ok) throw new Error(applied.conflict.message);
    expect(
      entriesOf(applied.gig, "set1")
        .map((entry) => entry.id)
        .toSorted(),
    ).toEqual(["Home", "Lamps", "Meadow", "Stile"]);
    expect(entriesOf(applied.gig, "set1")[0]?.id).toBe("Lamps");
    expect(entriesOf(applied.gig, "set1").at(-1)?.id).toBe("Home");
  });

  test("no set becomes longer than it may", () => {
    const long = repertoireOf(
      songs.map((one) => (one.id === "Ferry" ? { ...one, seconds: 420 } : one)),
      [alder],
    );
    const now = planGig(gig, long);
    const limits = (tolerance: number) =>
      betweenSets(gig, now, long, tolerance).map((change) => {
        const then = planGig(change.supposed.gig, long);
        return Math.max(...then.sets.map((set, index) => set.seconds - now.sets[index]!.seconds));
      });
    expect(betweenSets(gig, now, long, 300)[0]?.goes[0]?.title).toBe("Ferry");
    expect(
      betweenSets(gig, now, long, 120).every((change) => change.goes.every(({ title }) => title !== "Ferry")),
    ).toBe(true);
    for (const most of limits(120)) expect(most).toBeLessThanOrEqual(120);
  });

  test("songs that are held or ruled stay where they are", () => {
    const ruled: Gig = { ...gig, rules: [pairRule("before", "Ferry", "Meadow")] };
    const changes = betweenSets(ruled, planGig(ruled, repertoire), repertoire, 600);
    expect(changes.flatMap((change) => change.goes.map(({ title }) => title))).not.toContain("Ferry");
    expect(changes.flatMap((change) => change.goes.map(({ title }) => title))).not.toContain("Lamps");
  });

  test("one set has nothing to exchange with", () => {
    const single = gigOf([["Lamps", "Ferry", "Home"].map(on)]);
    expect(betweenSets(single, planGig(single, repertoire), repertoire, 300)).toEqual([]);
  });
});

/** Every gig that one move or one exchange can make, planned afresh each time. */
function everyChange(gig: Gig, repertoire: Repertoire): Gig[] {
  const [one, two] = [entriesOf(gig, "set1"), entriesOf(gig, "set2")];
  const made: Gig[] = [];
  const put = (of: Gig, entryId: string, setId: string): Gig[] => {
    const others = entriesOf(of, setId).length;
    return Array.from({ length: Math.max(0, others - 1) }, (_, index) => index + 1).flatMap((index) =>
      repertoire.guitars.flatMap(({ id }) => {
        const applied = applyEdits(of, [
          ...placeEdits(of, entryId, { setId, section: 0, index }),
          { kind: "entry.set", entryId, field: "guitarId", value: id },
        ]);
        return applied.ok ? [applied.gig] : [];
      }),
    );
  };
  for (const a of one.slice(1, -1)) {
    made.push(...put(gig, a.id, "set2"));
    for (const b of two.slice(1, -1))
      for (const there of put(gig, a.id, "set2")) made.push(...put(there, b.id, "set1"));
  }
  for (const b of two.slice(1, -1)) made.push(...put(gig, b.id, "set1"));
  const ends = (of: Gig) =>
    ["set1", "set2"].flatMap((id) => [entriesOf(of, id)[0]?.id, entriesOf(of, id).at(-1)?.id]);
  return made.filter((of) => ends(of).join() === ends(gig).join());
}

describe("always", () => {
  const ways = ["EADGBE", "DADGAD", "DADGBE capo 2", "DGDGBD"];
  const set = fc.array(fc.tuple(fc.constantFrom(...ways), fc.constantFrom("alder", "birch")), {
    minLength: 3,
    maxLength: 4,
  });

  test("no single move or exchange needs less than the first: against planning every one", () => {
    fc.assert(
      fc.property(set, set, (first, second) => {
        const drawn = [first, second];
        const songs = drawn.flatMap((of, number) =>
          of.map(([way], index) => song(`${number}-${index}`, way)),
        );
        const repertoire = repertoireOf(songs, [alder, birch]);
        const gig = gigOf(
          drawn.map((of, number) =>
            of.map(([, guitarId], index) => ({ song: `${number}-${index}`, guitar: guitarId })),
          ),
        );
        const now = needsOf(planGig(gig, repertoire).sets).total;
        const totals = everyChange(gig, repertoire).map((of) => needsOf(planGig(of, repertoire).sets).total);
        const least = Math.min(now, ...totals);
        const [best] = betweenSets(gig, planGig(gig, repertoire), repertoire, 36_000);
        expect(best?.needs.total ?? now).toBeCloseTo(least, 6);
      }),
      { numRuns: 40 },
    );
  });
});
