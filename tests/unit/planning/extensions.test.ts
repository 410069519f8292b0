import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Play } from "#app/domain/planning/answer.ts";
import { greatest } from "#app/domain/planning/bounds/greatest.ts";
import { jointBound } from "#app/domain/planning/bounds/joint-bound.ts";
import { keptOrderBound } from "#app/domain/planning/bounds/kept-order-bound.ts";
import { overLooseCapos } from "#app/domain/planning/bounds/loose-capos.ts";
import { partitionBound } from "#app/domain/planning/bounds/partition-bound.ts";
import { throughChains } from "#app/domain/planning/bounds/through-chains.ts";
import { check } from "#app/domain/planning/check.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { fixedOrderSpace } from "#app/domain/planning/fixed-order.ts";
import { modelOf } from "#app/domain/planning/model.ts";
import { type Problem, parseProblem } from "#app/domain/planning/problem.ts";
import { scoreOf } from "#app/domain/planning/score.ts";
import { setSpace } from "#app/domain/planning/set-space.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { bruteForce, planCount, scorePlan } from "#tests/support/planning-brute-force.ts";
import { extendedProblem } from "#tests/support/planning-extended.ts";
import { expectBelow, ready } from "#tests/support/planning-prefixes.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

const close = (a: number, b: number) => Math.abs(a - b) <= 1e-6 * Math.max(1, Math.abs(b));
const weights = ["none", "light", "heavy"] as const;

function smallProblem(seed: number): Problem {
  const random = seededRandom(seed);
  const below = (count: number) => Math.floor(random() * count);
  const problem = randomProblem(random, {
    songs: 1 + below(6),
    guitars: 1 + below(4),
    necks: 2 + below(5),
    rules: weights[below(3)]!,
  });
  const extended = extendedProblem(random, problem);
  return seed % 2 ? extended : eachOnItsGuitar(extended);
}

/** The same with a guitar for each song in turn, all in want of one kind of capo: it cannot but be taken now and then. */
function eachOnItsGuitar(problem: Problem): Problem {
  const strings = [1, 2, 3, 4, 5];
  const songs = problem.songs.map((song, i) => {
    const own = problem.guitars[i % problem.guitars.length]!.id;
    const capos = i % 4 === 3 ? [] : [{ fret: 1 + ((i * 5) % 7), strings }];
    return { ...song, necks: song.necks.map((neck) => ({ ...neck, capos, guitars: [own] })) };
  });
  const guitars = problem.guitars.map((guitar) => ({ ...guitar, start: null }));
  const count = 1 + (problem.songs.length % 2);
  return { ...problem, songs, guitars, capos: [{ strings, count }] };
}

/* The examples are worked out by hand from "The planning contract beyond version 1" in DEVELOPERS.md. */

const standard = [40, 45, 50, 55, 59, 64];
const five = [1, 2, 3, 4, 5];

function setOf(
  songs: { fret?: number; on: string; open?: number[] }[],
  more: Partial<Problem> = {},
): { problem: Problem; plays: Play[] } {
  const guitar = (id: string) => ({
    id,
    strings: 6,
    lowest: standard.map((pitch) => pitch - 6),
    highest: standard,
    start: null,
    keeps: false,
  });
  const problem: Problem = {
    version: 1,
    crew: "alone",
    times: { string: 8, semitone: 1, capoMove: 6, capoOn: 5, capoOff: 3, swap: 15, check: 5, cover: 12 },
    aim: { exposed: 1, seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 },
    guitars: ["a", "b", "c"].map(guitar),
    songs: songs.map(({ fret, open = standard }, i) => ({
      id: `s${i + 1}`,
      seconds: 200,
      section: 0,
      cover: null,
      necks: [{ open, capos: fret ? [{ fret, strings: five }] : [], guitars: null, penalty: 0 }],
    })),
    order: songs.map((_, i) => `s${i + 1}`),
    rules: { at: {}, before: [], into: [], apart: [] },
    maxMoved: null,
    capos: [{ strings: five, count: 1 }],
    ...more,
  };
  return { problem, plays: songs.map(({ on }, i) => ({ song: `s${i + 1}`, guitar: on, neck: 0 })) };
}

describe("scarce capos", () => {
  test("a capo that no guitar has to spare is taken with the guitar that is laid aside", () => {
    const { problem, plays } = setOf([
      { fret: 3, on: "a" },
      { fret: 5, on: "b" },
    ]);
    const { before, gaps, totals } = evaluate(problem, problem.order, plays);
    expect(before.map(({ capos }) => capos.length)).toEqual([1, 0]);
    expect(gaps[0]).toMatchObject({ seconds: 28, exposed: 16 });
    expect(gaps[0]!.work).toEqual([
      {
        guitar: "b",
        by: "player",
        strings: [],
        capos: [{ action: "on", strings: five, to: 5, takenFrom: "a" }],
        seconds: 13,
      },
    ]);
    expect(totals.capoActions).toBe(2);
  });

  test("who gave a capo has to have one put on again, and one that lies loose is used first", () => {
    const { problem, plays } = setOf(
      [{ fret: 3, on: "a" }, { fret: 3, on: "b" }, { on: "b" }, { fret: 3, on: "a" }],
      { capos: [{ strings: five.toReversed(), count: 1 }] },
    );
    const { gaps } = evaluate(problem, problem.order, plays);
    expect(gaps.map(({ work }) => work.map(({ capos }) => capos))).toEqual([
      [[{ action: "on", strings: five, to: 3, takenFrom: "a" }]],
      [[{ action: "off", strings: five, from: 3 }]],
      [[{ action: "on", strings: five, to: 3 }]],
    ]);
  });

  test("of two that carry one, the guitar laid aside first gives it", () => {
    const { problem, plays } = setOf(
      [
        { fret: 2, on: "a" },
        { fret: 2, on: "b" },
        { fret: 2, on: "c" },
      ],
      { capos: [{ strings: five, count: 2 }] },
    );
    const { gaps } = evaluate(problem, problem.order, plays);
    expect(gaps[1]!.work[0]!.capos).toEqual([{ action: "on", strings: five, to: 2, takenFrom: "a" }]);
  });

  test("a tech takes it beforehand, but for what the guitar in hand has to give", () => {
    const songs = [{ fret: 2, on: "a" }, { fret: 2, on: "b" }, { on: "c" }, { fret: 2, on: "a" }];
    const { problem, plays } = setOf(songs, { crew: "tech" });
    const { gaps } = evaluate(problem, problem.order, plays);
    // From a, played until the gap: off 3 and on 5 wait for it, the look at the tuner is done before.
    expect(gaps[0]).toMatchObject({ seconds: 15 + 8 });
    expect(gaps[0]!.work.map(({ by, seconds }) => [by, seconds])).toEqual([
      ["tech", 5],
      ["player", 8],
    ]);
    // From b, which rests while c is played: all of it is done in time.
    expect(gaps[2]).toMatchObject({ seconds: 15 });
    expect(gaps[2]!.work.map(({ by, seconds }) => [by, seconds])).toEqual([["tech", 13]]);
  });

  test("a song in want of more capos than there are cannot be played", () => {
    const { problem } = setOf([{ fret: 3, on: "a" }], { capos: [{ strings: five, count: 0 }] });
    const answer = solve(problem);
    expect(answer).toEqual({
      status: "infeasible",
      why: [{ code: "no-guitar", songs: ["s1"], message: 'There are fewer capos than "s1" needs at once.' }],
    });
    expect(check(problem, answer)).toEqual([]);
  });

  test("a guitar that is named wrongly is found out", () => {
    const { problem } = setOf([
      { fret: 3, on: "a" },
      { fret: 5, on: "b" },
    ]);
    const pinned = problem.songs.map((song, i) => ({
      ...song,
      necks: song.necks.map((neck) => ({ ...neck, guitars: [i === 0 ? "a" : "b"] })),
    }));
    const asked = { ...problem, songs: pinned, maxMoved: 0 };
    const answer = solve(asked);
    expect(check(asked, answer)).toEqual([]);
    const other = JSON.parse(JSON.stringify(answer).replace('"takenFrom":"a"', '"takenFrom":"c"'));
    expect(check(asked, other)).toEqual([
      { path: "gaps.0.work.0", message: "capos are taken: 5-4-3-2-1 from a" },
    ]);
  });
});

describe("wishes", () => {
  const dropped = [38, ...standard.slice(1)];
  const wished = (wishes: Problem["wishes"]) => {
    const songs = [{ on: "a" }, { on: "a", fret: 2 }, { on: "b" }, { on: "a", open: dropped }];
    const { problem, plays } = setOf(songs, { wishes });
    const { broken, totals, total } = evaluate(problem, problem.order, plays);
    expect(total).toBe(totals.exposed + totals.wishes!);
    return broken;
  };

  test("no more than so many songs in a row in one tuning, whatever guitar and capo", () => {
    expect(wished([{ kind: "run", most: 2, seconds: 20 }])).toEqual([
      { wish: 0, songs: ["s1", "s2", "s3"], seconds: 20 },
    ]);
    expect(wished([{ kind: "run", most: 3, seconds: 20 }])).toEqual([]);
  });

  test("two of a group not side by side", () => {
    const groups = [
      ["s3", "s2"],
      ["s1", "s4"],
    ];
    expect(wished([{ kind: "apart", groups, seconds: 30 }])).toEqual([
      { wish: 0, songs: ["s2", "s3"], seconds: 30 },
    ]);
  });

  test("an energy curve: each step that a song is away from it", () => {
    // The curve over four songs is 1, 2, 3, 4.
    const levels = { s1: 1, s2: 5, s4: 3.5 };
    expect(wished([{ kind: "energy", levels, curve: [1, 4], seconds: 4 }])).toEqual([
      { wish: 0, songs: ["s2"], seconds: 12 },
      { wish: 0, songs: ["s4"], seconds: 2 },
    ]);
  });

  test("an order that breaks none is found, and proven, where there is one", () => {
    const songs = [{ on: "a" }, { on: "a" }, { on: "a", open: dropped }, { on: "a", open: dropped }];
    const { problem } = setOf(songs, {
      wishes: [{ kind: "apart", groups: [["s1", "s2"]], seconds: 600 }],
    });
    const answer = solve(problem);
    expect(answer).toMatchObject({ status: "optimal", broken: [], totals: { wishes: 0 } });
    expect(check(problem, answer)).toEqual([]);
    const silent = { ...answer, broken: [{ wish: 0, songs: ["s1", "s2"], seconds: 600 }] };
    expect(check(problem, silent)).toEqual([{ path: "broken", message: "no wish is broken" }]);
  });
});

test.each([
  [
    {
      capos: [
        { strings: [1, 2], count: 1 },
        { strings: [2, 1], count: 1 },
      ],
    },
    "repeated-capo",
    "capos[1]",
  ],
  [{ capos: [{ strings: [1, 1], count: 1 }] }, "repeated-string", "capos[0]"],
  [{ capos: [{ strings: [], count: 1 }] }, "empty", "capos[0].strings"],
  [{ capos: [{ strings: [13], count: 1 }] }, "out-of-range", "capos[0].strings[0]"],
  [{ capos: [{ strings: [1], count: 0.5 }] }, "out-of-range", "capos[0].count"],
  [{ capos: [{ strings: [1] }] }, "missing-field", "capos[0].count"],
  [{ wishes: [{ kind: "run", most: 0, seconds: 1 }] }, "out-of-range", "wishes[0].most"],
  [{ wishes: [{ kind: "run", most: 2, seconds: -1 }] }, "negative", "wishes[0].seconds"],
  [{ wishes: [{ kind: "loud", seconds: 1 }] }, "unknown-value", "wishes[0].kind"],
  [
    { wishes: [{ kind: "apart", groups: [["s1", "no"]], seconds: 1 }] },
    "unknown-id",
    "wishes[0].groups[0][1]",
  ],
  [
    { wishes: [{ kind: "apart", groups: [["s1"], ["s1"]], seconds: 1 }] },
    "repeated-song",
    "wishes[0].groups[1][0]",
  ],
  [
    { wishes: [{ kind: "energy", levels: { s1: 6 }, curve: [3], seconds: 1 }] },
    "out-of-range",
    "wishes[0].levels.s1",
  ],
  [{ wishes: [{ kind: "energy", levels: {}, curve: [], seconds: 1 }] }, "empty", "wishes[0].curve"],
  [
    { wishes: [{ kind: "energy", levels: {}, curve: [0], seconds: 1 }] },
    "out-of-range",
    "wishes[0].curve[0]",
  ],
])("refused as a bad problem: %j", (more, code, path) => {
  const { problem } = setOf([{ on: "a" }]);
  const parsed = parseProblem({ ...problem, ...more });
  expect(parsed.ok ? [] : parsed.problems.map((bad) => [bad.code, bad.path])).toEqual([[code, path]]);
});

test("starts that carry more capos than there are are refused", () => {
  const { problem } = setOf([{ on: "a" }]);
  const start = { open: standard, capos: [{ fret: 1, strings: five }] };
  const guitars = problem.guitars.map((guitar) => ({ ...guitar, start }));
  const parsed = parseProblem({ ...problem, guitars });
  expect(parsed.ok ? [] : parsed.problems.map(({ path, message }) => [path, message])).toEqual([
    ["capos[0].count", "Guitars start with 3 of these capos, and there are 1."],
  ]);
});

describe("against brute force, written straight from the contract", () => {
  test("300 random problems with scarce capos and wishes: same optimum, proven, and clean", () => {
    let compared = 0;
    let takes = 0;
    let wished = 0;
    for (let seed = 1; compared < 300; seed += 1) {
      const problem = smallProblem(seed);
      if (planCount(problem) > 50_000) continue;
      compared += 1;
      const parsed = parseProblem(problem);
      expect(parsed.ok ? [] : parsed.problems, `seed ${seed}`).toEqual([]);
      const least = bruteForce(problem);
      const answer = solve(problem);
      expect(check(problem, answer), `seed ${seed}`).toEqual([]);
      if (answer.status === "infeasible" || least === null) {
        expect(answer.status === "infeasible" ? null : answer.total, `seed ${seed}`).toBe(least);
        continue;
      }
      expect(answer.status, `seed ${seed}`).toBe("optimal");
      expect(close(answer.total, least), `seed ${seed}: ${answer.total}, not ${least}`).toBe(true);
      if (JSON.stringify(answer.gaps).includes("takenFrom")) takes += 1;
      if ((answer.totals.wishes ?? 0) > 0) wished += 1;
    }
    expect(takes).toBeGreaterThan(30);
    expect(wished).toBeGreaterThan(50);
  });
});

test("evaluate, the fast score and the letter of the contract agree on any plan", () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 1_000_000 }), (seed) => {
      const random = seededRandom(seed);
      const below = (count: number) => Math.floor(random() * count);
      const base = randomProblem(random, {
        songs: 1 + below(12),
        guitars: 1 + below(4),
        necks: 2 + below(6),
        rules: "none",
        maxMoved: null,
      });
      const problem = extendedProblem(random, base);
      const model = modelOf(problem);
      if (model.options.some((options) => options.length === 0)) return;
      const songs = Int32Array.from(model.options.keys());
      for (let i = songs.length - 1; i > 0; i -= 1) {
        const k = below(i + 1);
        [songs[i], songs[k]] = [songs[k]!, songs[i]!];
      }
      const ways = Int32Array.from(model.options, (options) => below(options.length));
      const order = [...songs].map((number) => problem.order[number]!);
      const plays = [...songs].map((number): Play => {
        const { guitar, choice } = model.options[number]![ways[number]!]!;
        return { song: problem.order[number]!, guitar: problem.guitars[guitar]!.id, neck: choice };
      });
      const evaluation = evaluate(problem, order, plays);
      const byLetter = scorePlan(
        problem,
        plays.map(({ song: id, guitar: name, neck }) => {
          const played = problem.songs.find((one) => one.id === id)!;
          const guitar = problem.guitars.find((one) => one.id === name)!;
          return { song: played, guitar, neck: played.necks[neck]! };
        }),
      );
      const fast = scoreOf(model)(songs, ways);
      if (byLetter === null) {
        expect(fast).toBe(Number.POSITIVE_INFINITY);
        return;
      }
      expect(close(fast, byLetter)).toBe(true);
      expect(close(evaluation.total, byLetter)).toBe(true);
    }),
    { numRuns: 500 },
  );
});

test("other names, another list of guitars and all pitches higher change no proven total", () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 100_000 }), (seed) => {
      const small = smallProblem(seed);
      // Starts that carry capos give them in the order of the list, so this needs guitars that are prepared freely.
      const problem = { ...small, guitars: small.guitars.map((guitar) => ({ ...guitar, start: null })) };
      const renamed: Problem = JSON.parse(JSON.stringify(problem).replaceAll(/"s(\d+)"/g, '"song $1"'));
      const up = (pitches: number[]) => pitches.map((pitch) => pitch + 3);
      const other: Problem = {
        ...renamed,
        guitars: renamed.guitars.toReversed().map((guitar) => ({
          ...guitar,
          lowest: up(guitar.lowest),
          highest: up(guitar.highest),
        })),
        songs: renamed.songs
          .toReversed()
          .map((song) => ({ ...song, necks: song.necks.map((neck) => ({ ...neck, open: up(neck.open) })) })),
      };
      const mine = solve(problem);
      const theirs = solve(other);
      expect(theirs.status).toBe(mine.status);
      if (mine.status === "infeasible" || theirs.status === "infeasible") return;
      expect(close(theirs.total, mine.total)).toBe(true);
    }),
    { numRuns: 100 },
  );
});

test("along every prefix of a plan proven optimal, the bound is at most what remains", () => {
  let prefixes = 0;
  for (let seed = 1; seed <= 240; seed += 1) {
    const random = seededRandom(seed);
    const base = randomProblem(random, {
      songs: 3 + Math.floor(random() * 6),
      guitars: 1 + Math.floor(random() * 4),
      necks: 3 + Math.floor(random() * 4),
      rules: weights[seed % 3]!,
      maxMoved: seed % 4 === 0 ? 2 : seed % 5 === 0 ? 0 : null,
    });
    const extended = extendedProblem(random, base);
    const problem = seed % 2 ? extended : eachOnItsGuitar(extended);
    const parts = ready(problem);
    if (!parts) continue;
    const { model, rules } = parts;
    const all = overLooseCapos(model, (plain, layout) => {
      const bounds = [partitionBound(plain, rules, layout, "dear")];
      const joint = jointBound(plain, rules, layout);
      if (joint) bounds.push(joint);
      if (layout.limited) bounds.push(keptOrderBound(plain, layout, { target: 0, rounds: 20 }));
      return throughChains(plain, rules, layout, greatest(...bounds));
    });
    prefixes += expectBelow(setSpace(model, rules, all), `seed ${seed}`);
    if (problem.maxMoved === 0)
      prefixes += expectBelow(fixedOrderSpace(model, rules), `seed ${seed}, order kept`);
  }
  expect(prefixes).toBeGreaterThan(500);
});
