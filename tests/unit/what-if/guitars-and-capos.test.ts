import { describe, expect, test } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { defaultTimes } from "#app/domain/gig/gig.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { anotherCapo } from "#app/domain/gig/what-if/another-capo.ts";
import { oneGuitarFewer } from "#app/domain/gig/what-if/one-guitar-fewer.ts";
import { newGuitars, standingOf, standingWords } from "#app/domain/gig/what-if/one-more-guitar.ts";
import { otherCrew } from "#app/domain/gig/what-if/other-crew.ts";
import { asItIs, needsNow } from "#app/domain/gig/what-if/outcome.ts";
import { gigOf, guitar, repertoireOf, song } from "../gig/build-gig.ts";
import { ask } from "./ask.ts";

const alder = guitar("alder", { shortName: "Alder" });
const birch = guitar("birch", { shortName: "Birch" });
const tin = guitar("tin", {
  shortName: "Tin",
  kind: "resonator",
  usual: [38, 43, 50, 55, 59, 62],
  lowest: [38, 43, 50, 55, 59, 62],
  highest: [38, 43, 50, 55, 59, 62],
  keeps: true,
});
const songs = [
  song("Lamps", "EADGBE"),
  song("Ferry", "DADGAD"),
  song("Meadow", "EADGBE"),
  song("Quarry", "DADGAD"),
  song("Home", "EADGBE"),
];
const five = ["Lamps", "Ferry", "Meadow", "Quarry", "Home"].map((id) => ({ song: id, guitar: "alder" }));

// By hand, usual times without a tech: standard to DADGAD turns strings 6, 2 and 1 down 2: 3 × (8 + 2) + 5 = 35 s,
// 23 of them beyond the 12 s of talk; a change of guitar alone takes 15 s, 3 beyond.
describe("one more guitar", () => {
  const gig = gigOf([five]);
  const repertoire = repertoireOf(songs, [alder]);

  test("stands in the tuning that saves most, and says which songs it takes", () => {
    const now = planGig(gig, repertoire);
    expect(now.totals.exposed).toBe(4 * 23);
    const [best] = newGuitars(gig, now, repertoire, "english");
    expect(best?.words).toBe("A guitar like Alder");
    const { answer } = ask(gig, repertoire, () => best!.supposed);
    const kept = answer("same-order");
    expect(kept.needs).toMatchObject({ exposed: 4 * 3, strings: 0, swaps: 4 });
    expect(standingWords(standingOf(kept), "english")).toEqual([
      "Stands in DADGAD, no capo. Takes Ferry, Quarry.",
    ]);
    // One change of guitar is enough where the order is free: the first and the last song are held.
    expect(answer("any-order").needs).toMatchObject({ exposed: 2 * 3, strings: 0, swaps: 2 });
  });

  test("is tried as one that stays in each tuning of the set", () => {
    const all = newGuitars(gig, planGig(gig, repertoire), repertoire, "english");
    expect(all.filter((one) => !one.retuned).map((one) => one.words)).toEqual(["EADGBE", "DADGAD"]);
    const stays = all.find((one) => one.words === "DADGAD")!;
    expect(ask(gig, repertoire, () => stays.supposed).answer("same-order").needs.exposed).toBe(4 * 3);
    const standard = all.find((one) => one.words === "EADGBE")!;
    const held = ask(gig, repertoire, () => standard.supposed).answer("same-order");
    expect(held.needs.exposed).toBe(4 * 3);
    expect(standingOf(held)[0]?.songs).toEqual(["Lamps", "Meadow", "Home"]);
  });

  test("takes what is kept to guitars like it", () => {
    const slide = song("Slide", "DGDGBD");
    slide.necks[0] = { ...slide.necks[0]!, open: tin.usual, guitars: ["tin"] };
    const act = repertoireOf([...songs, slide], [alder, birch, tin]);
    const set = gigOf([[...five, { song: "Slide", guitar: "tin" }]]);
    const all = newGuitars(set, planGig(set, act), act, "english").filter((one) => one.retuned);
    expect(all.map((one) => one.words)).toEqual(["A guitar like Alder or Birch", "A guitar like Tin"]);
    const another = all[1]!.supposed.repertoire;
    expect(another.songs.find((one) => one.id === "Slide")?.necks[0]?.guitars).toEqual(["tin", "one-more"]);
    expect(all[0]!.supposed.repertoire.songs.find((one) => one.id === "Slide")?.necks[0]?.guitars).toEqual([
      "tin",
    ]);
  });

  test("is strung for songs that no guitar can play", () => {
    const low = song("Low", "EADGBE");
    low.necks[0] = { ...low.necks[0]!, open: [28, 33, 38, 43, 47, 52] };
    const act = repertoireOf([...songs, low], [alder]);
    const set = gigOf([[...five, { song: "Low" }]]);
    const strung = newGuitars(set, planGig(set, act), act, "english").find((one) =>
      one.words.startsWith("A guitar strung"),
    )!;
    const { answer } = ask(set, act, () => strung.supposed);
    expect(answer("same-order").sets[0]?.after.rows.at(-1)?.left).toBeNull();
    expect(standingOf(answer("same-order"))[0]?.songs).toEqual(["Low"]);
  });
});

describe("one guitar fewer", () => {
  test("its songs go to others, and those that nothing else plays are named", () => {
    const slide = song("Slide", "DGDGBD");
    slide.necks[0] = { ...slide.necks[0]!, open: tin.usual, guitars: ["tin"] };
    const act = repertoireOf([...songs, slide], [alder, birch, tin]);
    const gig = gigOf([
      [
        { song: "Lamps", guitar: "alder" },
        { song: "Ferry", guitar: "birch" },
        { song: "Slide", guitar: "tin" },
        { song: "Home", guitar: "alder" },
      ],
      [{ song: "Meadow", guitar: "alder" }],
    ]);
    const tinGone = ask(gig, act, (...of) => oneGuitarFewer(...of, "tin"));
    expect(tinGone.asked.supposed.setIds).toEqual(["set1"]);
    expect(tinGone.answer("same-order").unplayable).toEqual(["Slide"]);
    const birchGone = ask(gig, act, (...of) => oneGuitarFewer(...of, "birch")).answer("same-order");
    expect(birchGone.unplayable).toEqual([]);
    // Ferry on Alder: 23 s beyond the talk; then to Tin and back to Alder, which wants its three strings up again.
    expect(birchGone.needs).toMatchObject({ exposed: 23 + 3 + (15 + 35 - 12), strings: 6, swaps: 2 });
    expect(birchGone.changes).toEqual(["To Alder: Ferry"]);
  });

  test("what is pinned to it is free to go elsewhere", () => {
    const act = repertoireOf(songs, [alder, birch]);
    const gig = gigOf([
      [
        { song: "Lamps", guitar: "alder" },
        { song: "Ferry", guitar: "birch", pinned: "both" },
      ],
    ]);
    const outcome = ask(gig, act, (...of) => oneGuitarFewer(...of, "birch")).answer("same-order");
    expect(outcome.changes).toEqual(["To Alder: Ferry"]);
    const applied = applyEdits(gig, outcome.edits);
    expect(applied.ok && applied.gig.entries[1]?.guitarId).toBe("alder");
  });
});

describe("another capo", () => {
  test("where one has to travel between guitars a second one saves taking it off", () => {
    const capoed = [
      song("Slate", "EADGBE capo 2"),
      song("Ferry", "DADGAD capo 5"),
      song("Gate", "EADGBE capo 2"),
    ];
    const steel = { id: "steel", name: "Steel", strings: null, count: 1 };
    const act = repertoireOf(capoed, [alder, birch], [steel]);
    const gig = gigOf([
      [
        { song: "Slate", guitar: "alder" },
        { song: "Ferry", guitar: "birch" },
        { song: "Gate", guitar: "alder" },
      ],
    ]);
    const { asked, answer } = ask(gig, act, (...of) => anotherCapo(...of, "steel"));
    // One capo: in each gap it is taken off (3 s) and put on (5 s), the tuner looked at (5 s), guitars changed (15 s).
    expect(needsNow(asked)).toMatchObject({ exposed: 2 * 16, capoActions: 4 });
    expect(answer("same-order").needs).toMatchObject({ exposed: 2 * 3, capoActions: 0, swaps: 2 });
  });
});

describe("a tech", () => {
  const act = repertoireOf(songs, [alder, birch]);

  test("comes with the times of a crew, and all work that fits is done at the side", () => {
    const gig = gigOf([five], { times: { ...defaultTimes.alone, string: 11 } });
    const { asked, answer } = ask(gig, act, otherCrew);
    expect(asked.supposed.gig).toMatchObject({ crew: "tech", times: { swap: 8, string: 11 } });
    expect(answer("same-order").needs).toMatchObject({ exposed: 0, swaps: 4 });
    expect(asItIs(asked).needs.exposed).toBe(4 * (3 * 13 + 5 - 12));
    const applied = applyEdits(gig, answer("same-order").edits);
    expect(applied.ok && planGig(applied.gig, act).totals.exposed).toBe(0);
  });

  test("goes where there is one", () => {
    const gig = gigOf([five], { crew: "tech", times: defaultTimes.tech });
    const { asked } = ask(gig, act, otherCrew);
    expect(asked.supposed.gig).toMatchObject({ crew: "alone", times: defaultTimes.alone });
  });
});
