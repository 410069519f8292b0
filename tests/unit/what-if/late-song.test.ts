import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { entriesOf } from "#app/domain/gig/order.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { setProblem } from "#app/domain/gig/set-problem.ts";
import { latePlaces } from "#app/domain/gig/what-if/late-song.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { gigOf, guitar, pairRule, placeRule, repertoireOf, song } from "../gig/build-gig.ts";

const alder = guitar("alder", { shortName: "Alder" });
const birch = guitar("birch", { shortName: "Birch" });

describe("a song added late", () => {
  const songs = [
    song("Lamps", "EADGBE"),
    song("Meadow", "EADGBE"),
    song("Ferry", "DADGAD"),
    song("Quarry", "DADGAD"),
    song("Home", "EADGBE"),
    song("Late", "DADGAD"),
  ];
  const repertoire = repertoireOf(songs, [alder]);
  const gig = gigOf([["Lamps", "Meadow", "Ferry", "Home"].map((id) => ({ song: id, guitar: "alder" }))]);
  const late = songs[5]!;

  test("comes beside the song in its own tuning, and costs nothing there", () => {
    const now = planGig(gig, repertoire);
    const places = latePlaces(gig, now, repertoire, { song: late, entryId: "late" });
    // Before or after Ferry nothing more is to be done: the same two changes of tuning as now.
    expect(places.slice(0, 2).map(({ index }) => index)).toEqual([2, 3]);
    expect(places[0]!.needs.exposed).toBe(now.totals.exposed);
    // Between two songs in standard it is retuned twice: 2 × (35 - 12) s more.
    expect(places.at(-1)).toMatchObject({ index: 1, needs: { exposed: now.totals.exposed + 46 } });
  });

  test("takes no held place, breaks no rule, and may come into the encore", () => {
    const set = [
      { song: "Lamps", guitar: "alder" },
      { song: "Meadow", guitar: "alder" },
      { song: "Ferry", guitar: "alder" },
      { song: "Quarry", guitar: "alder", encore: true as const },
      { song: "Home", guitar: "alder", encore: true as const },
    ];
    const placesOf = (of: ReturnType<typeof gigOf>) =>
      latePlaces(of, planGig(of, repertoire), repertoire, { song: late, entryId: "late" })
        .map(({ section, index }) => `${section}/${index}`)
        .toSorted();
    expect(placesOf(gigOf([set]))).toEqual(["0/1", "0/2", "0/3", "1/1"]);
    const straight = gigOf([set], { rules: [pairRule("into", "Lamps", "Meadow")] });
    expect(placesOf(straight)).toEqual(["0/2", "0/3", "1/1"]);
    const third = gigOf([set], { rules: [placeRule("Meadow", 2)] });
    expect(placesOf(third)).toEqual(["0/2", "0/3", "1/1"]);
    const loose = gigOf([set]);
    loose.sets[0] = { ...loose.sets[0]!, holdFirst: false, holdLast: false };
    expect(placesOf(loose)).toEqual(["0/0", "0/1", "0/2", "0/3", "1/1", "1/2"]);
  });

  test("added by its edits it stands where it was said, and the others stay as they are", () => {
    const [best] = latePlaces(gig, planGig(gig, repertoire), repertoire, { song: late, entryId: "late" });
    const applied = applyEdits(gig, best!.supposed.edits);
    if (!applied.ok) throw new Error(applied.conflict.message);
    expect(entriesOf(applied.gig, "set1").map((entry) => entry.id)).toEqual([
      "Lamps",
      "Meadow",
      "late",
      "Ferry",
      "Home",
    ]);
    expect(best!.supposed.edits).toHaveLength(1);
  });

  test("nowhere, where no guitar can play it", () => {
    const low = { ...late, necks: [{ ...late.necks[0]!, open: [28, 33, 38, 43, 47, 52] }] };
    expect(latePlaces(gig, planGig(gig, repertoire), repertoire, { song: low, entryId: "late" })).toEqual([]);
  });
});

describe("always", () => {
  const ways = ["EADGBE", "DADGAD", "DADGBE capo 2", "CGCFFC capo 3 leave 6", "DGDGBD"];
  const drawn = fc.array(fc.tuple(fc.constantFrom(...ways), fc.constantFrom("alder", "birch")), {
    minLength: 2,
    maxLength: 7,
  });

  test("no place and guitar costs less than the first: against evaluating every one", () => {
    fc.assert(
      fc.property(drawn, fc.constantFrom(...ways), (picked, way) => {
        const songs = picked.map(([tuning], index) => song(`s${index}`, tuning));
        const repertoire = repertoireOf([...songs, song("late", way)], [alder, birch]);
        const gig = gigOf([picked.map(([, on], index) => ({ song: `s${index}`, guitar: on }))]);
        const late = repertoire.songs.at(-1)!;
        const [best] = latePlaces(gig, planGig(gig, repertoire), repertoire, { song: late, entryId: "late" });
        const last = gigOf([
          [
            ...picked.map(([, on], index) => ({ song: `s${index}`, guitar: on })),
            { song: "late", guitar: "alder" },
          ],
        ]);
        const { problem, plays } = setProblem(last, "set1", repertoire);
        const totals = Array.from({ length: picked.length - 1 }, (_, index) =>
          ["alder", "birch"].map((on) => {
            const order = problem.order.filter((id) => id !== "late").toSpliced(index + 1, 0, "late");
            const chosen = plays.map((play) => (play.song === "late" ? { ...play, guitar: on } : play));
            return evaluate(problem, order, chosen).total;
          }),
        ).flat();
        expect(best?.needs.total).toBeCloseTo(Math.min(...totals), 6);
      }),
      { numRuns: 60 },
    );
  });
});
