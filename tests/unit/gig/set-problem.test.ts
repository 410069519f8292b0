import { describe, expect, test } from "vitest";
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
