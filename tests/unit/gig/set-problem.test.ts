import { describe, expect, test } from "vitest";
import { usualCover } from "#app/domain/gig/cover.ts";
import { defaultChoice } from "#app/domain/gig/default-choice.ts";
import type { Rule } from "#app/domain/gig/gig.ts";
import { setProblem } from "#app/domain/gig/set-problem.ts";
import { parseProblem } from "#app/domain/planning/problem.ts";
import { gigOf, guitar, pairRule, placeRule, repertoireOf, song } from "./build-gig.ts";

const alder = guitar("alder");
const birch = guitar("birch");
const songs = ["a", "b", "c", "d"].map((id) => song(id, "DADGAD"));

function problemOf(gig: ReturnType<typeof gigOf>, repertoire = repertoireOf(songs, [alder, birch])) {
  return setProblem(gig, "set1", repertoire);
}

describe("a set as a planning problem", () => {
  const four = [{ song: "a" }, { song: "b" }, { song: "c" }, { song: "d" }];

  test("is one the planner accepts, with every guitar prepared freely", () => {
    const { problem, left } = problemOf(gigOf([four]));
    expect(parseProblem(JSON.parse(JSON.stringify(problem))).ok).toBe(true);
    expect(problem.guitars.map((one) => one.start)).toEqual([null, null]);
    expect(problem.order).toEqual(["a", "b", "c", "d"]);
    expect(left.size).toBe(0);
  });

  test("holds its first and last song, and frees them where the set says so", () => {
    const gig = gigOf([four]);
    expect(problemOf(gig).problem.rules.at).toEqual({ a: 1, d: 4 });
    const free = { ...gig, sets: gig.sets.map((set) => ({ ...set, holdFirst: false, holdLast: false })) };
    expect(problemOf(free).problem.rules.at).toEqual({});
  });

  test("a rule for a place wins over holding the song that stands there", () => {
    const gig = gigOf([four], { rules: [placeRule("c", 1), placeRule("b", -1)] });
    expect(problemOf(gig).problem.rules.at).toEqual({ c: 1, b: 4 });
  });

  test("places count inside a section", () => {
    const set = [
      { song: "a" },
      { song: "b" },
      { song: "c", encore: true as const },
      { song: "d", encore: true as const },
    ];
    const gig = gigOf([set], { rules: [placeRule("b", -1), placeRule("d", 1)] });
    expect(problemOf(gig).problem.rules.at).toEqual({ a: 1, b: 2, d: 3 });
    expect(problemOf(gig).problem.songs.map((one) => one.section)).toEqual([0, 0, 1, 1]);
  });

  test("a place that its section does not have is a contradiction, not a place in the next", () => {
    const set = [{ song: "a" }, { song: "b" }, { song: "c", encore: true as const }];
    const gig = gigOf([set], { rules: [placeRule("b", 3)] });
    expect(problemOf(gig).problem.rules.at.b).toBe(4);
  });

  test("rules about songs of another set sleep", () => {
    const gig = gigOf([[{ song: "a" }, { song: "b" }], [{ song: "c" }]], {
      rules: [pairRule("before", "a", "c"), pairRule("apart", "a", "b")],
    });
    expect(problemOf(gig).problem.rules).toMatchObject({ before: [], apart: [["a", "b"]] });
  });

  test("cover: the entry's, else the song's, else the gig's; none straight into; the applause before the encore", () => {
    const talky = songs.map((one) => (one.id === "b" ? { ...one, cover: 30 } : one));
    const set = [{ song: "a", cover: 5 }, { song: "b" }, { song: "c" }, { song: "d", encore: true as const }];
    const gig = gigOf([set], { rules: [pairRule("into", "b", "c")] });
    const { problem } = setProblem(gig, "set1", repertoireOf(talky, [alder]));
    expect(problem.songs.map((one) => one.cover)).toEqual([5, 30, 0, 40]);
    expect(problem.times.cover).toBe(12);
  });

  test("the song that opens the encore is held there, since the applause belongs to its gap", () => {
    const set = [
      { song: "a" },
      { song: "b" },
      { song: "c", encore: true as const },
      { song: "d", encore: true as const },
    ];
    const gig = gigOf([set]);
    const free = { ...gig, sets: gig.sets.map((one) => ({ ...one, holdFirst: false, holdLast: false })) };
    expect(problemOf(free).problem.rules.at).toEqual({ c: 3 });
  });

  test("an entry's own talk counts everywhere, before the encore and straight into too", () => {
    const set = [
      { song: "a" },
      { song: "b", cover: 7 },
      { song: "c", encore: true as const, cover: 60 },
      { song: "d", encore: true as const },
    ];
    const { problem } = problemOf(gigOf([set], { rules: [pairRule("into", "a", "b")] }));
    expect(problem.songs.map((one) => one.cover)).toEqual([null, 7, 60, null]);
    expect(usualCover(gigOf([set]), gigOf([set]).entries[2]!, songs[2]!)).toBe(40);
  });

  test("the encore is opened by the song that rules put there, else the first that none keeps from it", () => {
    const set = [
      { song: "a" },
      { song: "b", encore: true as const },
      { song: "c", encore: true as const },
      { song: "d", encore: true as const },
    ];
    const held = (...rules: Rule[]) => {
      const { problem } = problemOf(gigOf([set], { rules }));
      const opener = problem.songs.find((one) => one.cover === 40)?.id ?? "none";
      return [opener, problem.rules.at[opener]];
    };
    expect(held()).toEqual(["b", 2]);
    expect(held(placeRule("c", 1))).toEqual(["c", 2]);
    expect(held(placeRule("d", -3))).toEqual(["d", 2]);
    expect(held(placeRule("b", 2))).toEqual(["c", 2]);
    expect(held(pairRule("before", "c", "b"))).toEqual(["c", 2]);
    expect(held(pairRule("into", "a", "d"))[0]).toBe("none");
    expect(problemOf(gigOf([set], { rules: [pairRule("into", "a", "d")] })).problem.rules.at).toMatchObject({
      d: 2,
    });
  });

  test("a pinned guitar that cannot play the song is named as pinned", () => {
    const low = song("low", "A1 D2 G2 C3 E3 A3");
    const baritone = guitar("bari", { usual: [33, 38, 43, 48, 52, 57] });
    const all = repertoireOf([low], [alder, baritone]);
    const gig = gigOf([[{ song: "low", guitar: "alder", pinned: "guitar" }]]);
    expect(setProblem(gig, "set1", all).left.get("low")).toBe(
      "As pinned, this cannot be played. Needs string 6 at A1; alder goes down to B♭1.",
    );
    expect(setProblem(gigOf([[{ song: "low" }]]), "set1", all).plays).toEqual([
      { song: "low", guitar: "bari", neck: 0 },
    ]);
  });

  test("how far each guitar goes stands in the reason, or what each lacks where that differs", () => {
    const low = song("low", "B1 A2 D3 G3 B3 E4");
    const deep = guitar("birch", { lowest: [38, 39, 44, 49, 53, 58] });
    const why = (guitars: (typeof alder)[]) =>
      setProblem(gigOf([[{ song: "low" }]]), "set1", repertoireOf([low], guitars)).left.get("low");
    expect(why([guitar("alder", { lowest: [36, 39, 44, 49, 53, 58] }), deep])).toBe(
      "No guitar can play this. Needs string 6 at B1; alder goes down to C2, birch to D2.",
    );
    const four = guitar("uke", { usual: [67, 60, 64, 69] });
    expect(why([four])).toContain("the tuning has 6 strings; the instrument has 4");
  });

  test("only what is pinned binds", () => {
    const two = song("a", "DADGAD");
    two.necks.push({ id: "a-2", open: [38, 45, 50, 55, 59, 64], capos: [], guitars: ["birch"], penalty: 6 });
    const all = repertoireOf([two, ...songs.slice(1)], [alder, birch]);
    const gig = gigOf([[{ song: "a", guitar: "birch" }, { song: "b" }]]);
    expect(setProblem(gig, "set1", all).problem.songs[0]?.necks.map((neck) => neck.guitars)).toEqual([
      null,
      ["birch"],
    ]);
    const guitarPinned = {
      ...gig,
      entries: gig.entries.map((one) => ({ ...one, pinned: "guitar" as const, guitarId: "alder" })),
    };
    expect(setProblem(guitarPinned, "set1", all).problem.songs[0]?.necks.map((neck) => neck.guitars)).toEqual(
      [["alder"], []],
    );
    const neckPinned = {
      ...gig,
      entries: gig.entries.map((one) => ({
        ...one,
        pinned: "neck" as const,
        neckId: one.id === "a" ? "a-2" : null,
      })),
    };
    expect(setProblem(neckPinned, "set1", all).problem.songs[0]?.necks).toHaveLength(1);
    expect(setProblem(neckPinned, "set1", all).plays[0]).toEqual({ song: "a", guitar: "birch", neck: 0 });
  });

  test("a song no guitar can play stays out, named with what is missing, and stops nothing else", () => {
    const low = song("low", "A1 D2 G2 C3 E3 A3");
    const gig = gigOf([[{ song: "a" }, { song: "low" }, { song: "b" }]]);
    const { problem, left, plays } = setProblem(gig, "set1", repertoireOf([...songs, low], [alder]));
    expect(problem.order).toEqual(["a", "b"]);
    expect(plays.map((play) => play.song)).toEqual(["a", "b"]);
    expect(left.get("low")).toBe("No guitar can play this. Needs string 6 at A1; alder goes down to B♭1.");
  });

  test("a song without a guitar of its own takes the one that costs least there", () => {
    const own = [song("a", "EADGBE"), song("b", "CGCFFC"), song("c", "EADGBD"), song("d", "CGCFFC")];
    const all = repertoireOf(own, [alder, birch]);
    const gig = gigOf([
      [{ song: "a", guitar: "alder" }, { song: "b", guitar: "birch" }, { song: "c" }, { song: "d" }],
    ]);
    // By hand, alone: c costs 15 + 8 + 2 + 5 = 30 s on alder, 6 strings on birch; d 15 s on birch, ready as it stands.
    expect(setProblem(gig, "set1", all).plays.map((play) => play.guitar)).toEqual([
      "alder",
      "birch",
      "alder",
      "birch",
    ]);
  });

  test("a new song: the player's first way that a guitar can play, on the guitar that costs least, spares last", () => {
    const two = song("two", "A1 D2 G2 C3 E3 A3");
    two.necks.push({ id: "two-2", open: [38, 45, 50, 55, 59, 64], capos: [], guitars: null, penalty: 6 });
    const spare = guitar("aspen", { spareFor: "alder" });
    const all = repertoireOf([...songs, two], [spare, alder, birch]);
    const gig = gigOf([
      [
        { song: "a", guitar: "alder" },
        { song: "b", guitar: "birch" },
      ],
    ]);
    const where = { setId: "set1", section: 0 as const };
    expect(defaultChoice(gig, all, { song: two, ...where })).toEqual({ guitarId: "birch", neckId: "two-2" });
    expect(defaultChoice(gigOf([[]]), all, { song: two, ...where }).guitarId).toBe("alder");
    const kept = repertoireOf(all.songs, [
      guitar("alder", { keeps: true }),
      guitar("birch", { keeps: true }),
      spare,
    ]);
    expect(defaultChoice(gig, kept, { song: two, ...where }).guitarId).toBe("aspen");
    const none = song("none", "A1 D2 G2 C3 E3 A3");
    expect(defaultChoice(gig, all, { song: none, ...where })).toEqual({ guitarId: null, neckId: null });
  });

  test("a gig without guitars and a song that is gone say so", () => {
    const gig = gigOf([[{ song: "a" }, { song: "gone" }]]);
    expect(setProblem(gig, "set1", repertoireOf(songs, [])).left.get("a")).toContain("no guitars yet");
    expect(setProblem(gig, "set1", repertoireOf(songs, [alder])).left.get("gone")).toContain(
      "no longer in the library",
    );
  });

  test("a song that stands twice is two songs of the problem", () => {
    const gig = gigOf([[{ song: "a" }, { song: "b" }]]);
    const twice = { ...gig, entries: [...gig.entries, { ...gig.entries[0]!, id: "a-again", rank: "b0" }] };
    expect(problemOf(twice).problem.order).toEqual(["a", "b", "a-again"]);
  });

  test("an unknown set is an error", () => {
    expect(() => setProblem(gigOf([[]]), "set9", repertoireOf([], []))).toThrow(RangeError);
  });
});
