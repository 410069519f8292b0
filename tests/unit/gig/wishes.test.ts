import { describe, expect, test } from "vitest";
import type { Gig, GigWish } from "#app/domain/gig/gig.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { setProblem } from "#app/domain/gig/set-problem.ts";
import { wishWords } from "#app/domain/gig/wish-words.ts";
import { wishesOf } from "#app/domain/gig/wishes.ts";
import { parseProblem } from "#app/domain/planning/problem.ts";
import type { Song } from "#app/domain/repertoire/song.ts";
import { gigOf, guitar, repertoireOf, song } from "./build-gig.ts";

const alder = guitar("alder");

function planOf(songs: Song[], wishes: GigWish[], changes: Partial<Gig> = {}) {
  const gig = gigOf([songs.map(({ id }) => ({ song: id, guitar: "alder" }))], { wishes, ...changes });
  return planGig(gig, repertoireOf(songs, [alder]));
}

function said(songs: Song[], wish: GigWish): (string | null)[] {
  return planOf(songs, [wish]).sets[0]!.rows.map((row) => row.wishes[0] ?? null);
}

describe("what a gig wishes, as the planner takes it", () => {
  const songs = [
    { id: "a", song: song("a", "DADGAD", { tempo: 64, key: "G#m", energy: 1 }) },
    { id: "b", song: song("b", "DADGAD", { tempo: 80, key: "Abm", energy: null }) },
    { id: "c", song: song("c", "DADGAD", { tempo: null, key: "", energy: 5 }) },
    { id: "d", song: song("d", "DADGAD", { tempo: 79, key: "B", energy: 4 }) },
  ];

  test("slow is below the tempo; a song without one is not slow", () => {
    expect(wishesOf([{ kind: "slow-apart", below: 80, seconds: 30 }], songs)).toEqual([
      { kind: "apart", groups: [["a", "d"]], seconds: 30 },
    ]);
  });

  // G sharp minor and A flat minor are one scale on keyed instruments: enharmonic keys, any handbook of theory. B major
  // is the relative major of G sharp minor: the same notes, another key.
  test("one key however it is spelled; relative keys are two, and no key is none", () => {
    expect(wishesOf([{ kind: "key-apart", seconds: 10 }], songs)).toEqual([
      { kind: "apart", groups: [["a", "b"], ["d"]], seconds: 10 },
    ]);
  });

  test("levels are those of songs that have one", () => {
    expect(wishesOf([{ kind: "energy", curve: [1, 5], seconds: 4 }], songs)).toEqual([
      { kind: "energy", levels: { a: 1, c: 5, d: 4 }, curve: [1, 5], seconds: 4 },
    ]);
  });

  test("a problem with wishes is one the planner accepts; without, the field is left out", () => {
    const all = songs.map((one) => one.song);
    const wishes: GigWish[] = [
      { kind: "tuning-run", most: 3, seconds: 20 },
      { kind: "slow-apart", below: 80, seconds: 30 },
      { kind: "key-apart", seconds: 10 },
      { kind: "energy", curve: [3, 2.5, 5], seconds: 4 },
    ];
    const gig = gigOf([all.map(({ id }) => ({ song: id }))], { wishes });
    const { problem } = setProblem(gig, "set1", repertoireOf(all, [alder]));
    expect(problem.wishes).toHaveLength(4);
    expect(parseProblem(JSON.parse(JSON.stringify(problem))).ok).toBe(true);
    const plain = setProblem({ ...gig, wishes: [] }, "set1", repertoireOf(all, [alder])).problem;
    expect("wishes" in plain).toBe(false);
    expect("capos" in plain).toBe(false);
  });
});

describe("what a row says of wishes that the order breaks", () => {
  test("a run in one tuning, from the first song too many", () => {
    const five = ["a", "b", "c", "d", "e"].map((id) => song(id, "DADGAD"));
    expect(said(five, { kind: "tuning-run", most: 3, seconds: 20 })).toEqual([
      null,
      null,
      null,
      "4th song in a row in DADGAD, counts as 20 s.",
      "5th song in a row in DADGAD, counts as 20 s.",
    ]);
  });

  test("a capo makes no other tuning, another pitch does", () => {
    const songs = [song("a", "EADGBE"), song("b", "EADGBE capo 2"), song("c", "DADGBE")];
    expect(said(songs, { kind: "tuning-run", most: 1, seconds: 5 })).toEqual([
      null,
      "2nd song in a row in standard, counts as 5 s.",
      null,
    ]);
  });

  test("two slow songs, and the same key twice", () => {
    const songs = [
      song("a", "DADGAD", { title: "Slow Water", tempo: 60, key: "D" }),
      song("b", "DADGAD", { tempo: 70, key: "F#" }),
      song("c", "DADGAD", { tempo: 90, key: "Gb" }),
    ];
    expect(said(songs, { kind: "slow-apart", below: 80, seconds: 30 })).toEqual([
      null,
      "Slow song right after Slow Water, also slow, counts as 30 s.",
      null,
    ]);
    expect(said(songs, { kind: "key-apart", seconds: 12 })).toEqual([
      null,
      null,
      "In G♭, as b right before it, counts as 12 s.",
    ]);
  });

  test("off the curve by a whole step or more; less counts in silence", () => {
    const songs = [
      song("a", "DADGAD", { energy: 1 }),
      song("b", "DADGAD", { energy: 3 }),
      song("c", "DADGAD", { energy: 2 }),
      song("d", "DADGAD"),
    ];
    const wish: GigWish = { kind: "energy", curve: [1, 5], seconds: 6 };
    // The line from 1 to 5 over four songs: 1, 2.33, 3.67, 5.
    expect(said(songs, wish)).toEqual([
      null,
      null,
      "Energy 2 where the curve asks for 3.7, counts as 10 s.",
      null,
    ]);
    const near = [song("a", "DADGAD", { energy: 1 }), song("b", "DADGAD", { energy: 4 })];
    const flat: GigWish = { kind: "energy", curve: [1.4, 4], seconds: 10 };
    expect(said(near, flat)).toEqual([null, null]);
    expect(planOf(near, [flat]).totals.wishes).toBeCloseTo(4);
  });

  test("totals keep wishes apart from dead air", () => {
    const songs = ["a", "b"].map((id) => song(id, "DADGAD", { key: "D" }));
    expect(planOf(songs, [{ kind: "key-apart", seconds: 10 }]).totals).toMatchObject({
      exposed: 0,
      wishes: 10,
    });
  });

  test("a set of the gig is measured by itself", () => {
    const songs = ["a", "b"].map((id) => song(id, "DADGAD", { key: "D" }));
    const gig = gigOf([[{ song: "a" }], [{ song: "b" }]], { wishes: [{ kind: "key-apart", seconds: 10 }] });
    expect(planGig(gig, repertoireOf(songs, [alder])).totals.wishes).toBe(0);
  });
});

test("a wish in words", () => {
  const words = ([] as GigWish[]).concat(
    { kind: "tuning-run", most: 3, seconds: 20 },
    { kind: "slow-apart", below: 80, seconds: 30 },
    { kind: "key-apart", seconds: 10 },
    { kind: "energy", curve: [3, 2.5, 5], seconds: 4 },
  );
  expect(words.map(wishWords)).toEqual([
    "at most 3 songs in a row in one tuning (20 s)",
    "no two songs below 80 beats a minute together (30 s)",
    "the same key not twice in a row (10 s)",
    "energy follows 3, 2.5, 5 (4 s)",
  ]);
});
