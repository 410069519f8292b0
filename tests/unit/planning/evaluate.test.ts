import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Play } from "#app/domain/planning/answer.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { modelOf } from "#app/domain/planning/model.ts";
import type { Problem, ProblemGuitar, ProblemSong } from "#app/domain/planning/problem.ts";
import { scoreOf } from "#app/domain/planning/score.ts";
import { scorePlan } from "#tests/support/planning-brute-force.ts";
import { randomProblem, seededRandom } from "#tests/support/planning-random.ts";

/* Values here are worked out by hand from the planning contract, on one-string guitars to keep them readable. */

const guitar = (id: string, more: Partial<ProblemGuitar> = {}): ProblemGuitar => ({
  id,
  strings: 1,
  lowest: [0],
  highest: [127],
  start: null,
  keeps: false,
  ...more,
});
const song = (id: string, pitch: number, seconds = 100, more: Partial<ProblemSong> = {}): ProblemSong => ({
  id,
  seconds,
  section: 0,
  cover: null,
  necks: [{ open: [pitch], capos: [], guitars: null, penalty: 0 }],
  ...more,
});

function setOf(songs: ProblemSong[], guitars: ProblemGuitar[], more: Partial<Problem> = {}): Problem {
  return {
    version: 1,
    crew: "alone",
    times: { string: 10, semitone: 1, capoMove: 0, capoOn: 0, capoOff: 0, swap: 15, check: 5, cover: 12 },
    aim: { exposed: 1, seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 },
    guitars,
    songs,
    order: songs.map(({ id }) => id),
    rules: { at: {}, before: [], into: [], apart: [] },
    maxMoved: null,
    ...more,
  };
}

const on = (...pairs: [song: string, guitar: string][]): Play[] =>
  pairs.map(([id, g]) => ({ song: id, guitar: g, neck: 0 }));

describe("alone", () => {
  test("a change of guitar and the retuning of the one taken up stand in the same gap", () => {
    const problem = setOf([song("1", 40), song("2", 50), song("3", 42)], [guitar("a"), guitar("b")]);
    const { gaps, totals } = evaluate(problem, problem.order, on(["1", "a"], ["2", "b"], ["3", "a"]));
    expect(gaps.map(({ seconds, exposed }) => [seconds, exposed])).toEqual([
      [15, 3],
      [15 + 10 + 2 + 5, 32 - 12],
    ]);
    expect(totals).toEqual({
      exposed: 23,
      seconds: 47,
      strings: 1,
      semitones: 2,
      capoActions: 0,
      swaps: 2,
      moved: 0,
    });
  });

  test("a start that does not fit the first song is an entry at the head, covered like a gap", () => {
    const start = { open: [39], capos: [] };
    const problem = setOf([song("1", 40, 100, { cover: 10 }), song("2", 40)], [guitar("a", { start })]);
    const { gaps, before, totals } = evaluate(problem, problem.order, on(["1", "a"], ["2", "a"]));
    expect(gaps.map(({ into, swap, seconds, exposed }) => [into, swap, seconds, exposed])).toEqual([
      ["1", false, 16, 6],
      ["2", false, 0, 0],
    ]);
    expect(before).toEqual([{ guitar: "a", open: [39], capos: [] }]);
    expect(totals.exposed).toBe(6);
  });

  test("a penalty is part of the seconds and of the dead air, whatever the cover", () => {
    const dear = song("2", 40);
    dear.necks[0]!.penalty = 7;
    const problem = setOf([song("1", 40), dear], [guitar("a")]);
    const { totals } = evaluate(problem, problem.order, on(["1", "a"], ["2", "a"]));
    expect(totals).toMatchObject({ exposed: 7, seconds: 7 });
  });
});

describe("with a tech", () => {
  const crew = "tech" as const;

  test("a resting guitar is retuned while the other is played, and a late job is finished on stage", () => {
    const songs = [song("1", 40), song("2", 50, 9), song("3", 42)];
    const problem = setOf(songs, [guitar("a"), guitar("b")], { crew });
    const { gaps } = evaluate(problem, problem.order, on(["1", "a"], ["2", "b"], ["3", "a"]));
    expect(gaps[1]).toMatchObject({ seconds: 15 + 8, exposed: 11 });
    expect(gaps[1]!.work.map(({ by, seconds }) => [by, seconds])).toEqual([
      ["tech", 9],
      ["player", 8],
    ]);
  });

  test("the job that is due first goes first, and one begun earlier waits", () => {
    /* a (17 s, due 4) opens at 2, b (16 s, due 3) at 3: song 3 gives a's job 0 to 6, then b's; see below. */
    const songs = [song("1", 40), song("2", 60, 6), song("3", 50, 10), song("4", 61, 6), song("5", 42)];
    const guitars = [guitar("a"), guitar("b"), guitar("c")];
    const problem = setOf(songs, guitars, { crew });
    const plays = on(["1", "a"], ["2", "b"], ["3", "c"], ["4", "b"], ["5", "a"]);
    const { gaps } = evaluate(problem, problem.order, plays);
    /* Song 2 (6 s): a's job does 6 of 17. Song 3 (10 s): b's job (10 + 1 + 5 = 16, due first) does 10, 6 left on stage.
       Song 4 (6 s): a's job goes on, 12 of 17, 5 left on stage. */
    expect(gaps[2]!.work.map(({ by, seconds }) => [by, seconds])).toEqual([
      ["tech", 10],
      ["player", 6],
    ]);
    expect(gaps[3]!.work.map(({ by, seconds }) => [by, seconds])).toEqual([
      ["tech", 12],
      ["player", 5],
    ]);
  });

  test("the first song's guitar is brought from its start before the set; others have all of the first song", () => {
    const start = { open: [39], capos: [] };
    const songs = [song("1", 40, 16), song("2", 40)];
    const problem = setOf(songs, [guitar("a", { start }), guitar("b", { start })], { crew });
    const { gaps, totals } = evaluate(problem, problem.order, on(["1", "a"], ["2", "b"]));
    expect(gaps).toHaveLength(1);
    expect(gaps[0]).toMatchObject({ into: "2", swap: true, seconds: 15 });
    expect(gaps[0]!.work).toMatchObject([{ guitar: "b", by: "tech", seconds: 16 }]);
    expect(totals).toMatchObject({ strings: 1, semitones: 1 });
  });
});

describe("what is broken is scored and listed", () => {
  test("rules, sections, limit, kept tunings and ranges, each as a breach", () => {
    const songs = [song("1", 40), song("2", 41, 100, { section: 1 }), song("3", 42), song("4", 90)];
    const rules: Problem["rules"] = {
      at: { "3": -1 },
      before: [["3", "1"]],
      into: [["1", "2"]],
      apart: [["4", "3"]],
    };
    const guitars = [guitar("a", { keeps: true, highest: [60] })];
    const problem = setOf(songs, guitars, { rules, maxMoved: 0 });
    const order = ["2", "1", "3", "4"];
    const { breaches, total } = evaluate(problem, order, on(["1", "a"], ["2", "a"], ["3", "a"], ["4", "a"]));
    expect(breaches.map(({ code, songs: named }) => [code, named])).toEqual([
      ["section", ["2", "1"]],
      ["at", ["3"]],
      ["before", ["3", "1"]],
      ["into", ["1", "2"]],
      ["apart", ["4", "3"]],
      ["moved", []],
      ["keeps", ["2", "1"]],
      ["keeps", ["1", "3"]],
      ["keeps", ["3", "4"]],
      ["no-guitar", ["4"]],
    ]);
    expect(total).toBeGreaterThan(0);
  });

  test("an order that does not hold every song once is a mistake of the caller", () => {
    const problem = setOf([song("1", 40), song("2", 41)], [guitar("a")]);
    const plays = on(["1", "a"], ["2", "a"]);
    expect(() => evaluate(problem, ["1"], plays)).toThrow(RangeError);
    expect(() => evaluate(problem, ["1", "1"], plays)).toThrow(RangeError);
    expect(() => evaluate(problem, ["1", "2"], plays.slice(1))).toThrow(RangeError);
  });
});

/** A problem with some order and some way for each song, kept to or not. */
function anyPlan(seed: number) {
  const random = seededRandom(seed);
  const problem = randomProblem(random, {
    songs: 1 + Math.floor(random() * 9),
    guitars: 1 + Math.floor(random() * 4),
    necks: 6,
    rules: "none",
    kept: false,
  });
  const model = modelOf(problem);
  if (model.options.some((options) => options.length === 0)) return null;
  const ways = model.options.map((options) => Math.floor(random() * options.length));
  const songs = model.options.map((_, i) => i).sort(() => random() - 0.5);
  const order = songs.map((i) => problem.order[i]!);
  const plays = songs.map((i): Play => {
    const option = model.options[i]![ways[i]!]!;
    return { song: problem.order[i]!, guitar: problem.guitars[option.guitar]!.id, neck: option.choice };
  });
  return { problem, model, ways, songs, order, plays };
}

const close = (a: number, b: number) => Math.abs(a - b) <= 1e-9 * Math.max(1, Math.abs(b));

test("evaluate, the fast score and the letter of the contract agree on any plan", () => {
  fc.assert(
    fc.property(fc.integer(), (seed) => {
      const plan = anyPlan(seed);
      if (!plan) return;
      const { problem, model, songs, ways, order, plays } = plan;
      const { total } = evaluate(problem, order, plays);
      const fast = scoreOf(model)(Int32Array.from(songs), Int32Array.from(ways));
      const played = order.map((id, i) => {
        const theirs = problem.songs.find((other) => other.id === id)!;
        const theirGuitar = problem.guitars.find((other) => other.id === plays[i]!.guitar)!;
        return { song: theirs, guitar: theirGuitar, neck: theirs.necks[plays[i]!.neck]! };
      });
      expect(close(fast, total), `score ${fast}, evaluate ${total}`).toBe(true);
      expect(close(scorePlan(problem, played)!, total)).toBe(true);
    }),
    { numRuns: 1500 },
  );
});

test("naming the guitars otherwise changes no total", () => {
  fc.assert(
    fc.property(fc.integer(), (seed) => {
      const plan = anyPlan(seed);
      if (!plan) return;
      const { problem, order, plays } = plan;
      const name = (id: string) => `x${id}`;
      const renamed: Problem = {
        ...problem,
        guitars: problem.guitars.map((one) => ({ ...one, id: name(one.id) })),
        songs: problem.songs.map((one) => ({
          ...one,
          necks: one.necks.map((neck) => ({ ...neck, guitars: neck.guitars?.map(name) ?? null })),
        })),
      };
      const replayed = plays.map((play) => ({ ...play, guitar: name(play.guitar) }));
      expect(evaluate(renamed, order, replayed).totals).toEqual(evaluate(problem, order, plays).totals);
    }),
    { numRuns: 300 },
  );
});
