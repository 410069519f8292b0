import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { withoutRetuningKept } from "#app/domain/planning/kept-tunings.ts";
import { improve } from "#app/domain/planning/local-search.ts";
import { modelOf } from "#app/domain/planning/model.ts";
import { changeRun } from "#app/domain/planning/moves/change-run.ts";
import { changeWay, changeWayAndPlace } from "#app/domain/planning/moves/change-way.ts";
import type { Draft, Move } from "#app/domain/planning/moves/draft.ts";
import { moveAnother } from "#app/domain/planning/moves/move-another.ts";
import { moveBlock } from "#app/domain/planning/moves/move-block.ts";
import { swapSongs } from "#app/domain/planning/moves/swap-songs.ts";
import { turnBlock } from "#app/domain/planning/moves/turn-block.ts";
import { orderTest } from "#app/domain/planning/order-holds.ts";
import { compileRules } from "#app/domain/planning/order-rules.ts";
import { scoreOf } from "#app/domain/planning/score.ts";
import { beam } from "#app/domain/planning/search/beam.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import { seededRandom } from "#app/domain/planning/search/random.ts";
import type { Space } from "#app/domain/planning/search/space.ts";
import { StateTable } from "#app/domain/planning/search/state-table.ts";
import { keepsOrderRules } from "#tests/support/planning-brute-force.ts";
import { seededRandom as problemRandom, randomProblem } from "#tests/support/planning-random.ts";

/** A way across a strip of numbers, `depth` columns of `rows`: steps go to the next column, one row up, level or down. */
function strip(random: () => number, depth: number, rows: number, share: number) {
  const costs = Array.from({ length: depth }, () =>
    Array.from({ length: rows }, () => Math.floor(random() * 20)),
  );
  const rest = Array.from({ length: depth + 1 }, () => new Array<number>(rows).fill(0));
  for (let column = depth - 1; column >= 0; column -= 1)
    for (let row = 0; row < rows; row += 1)
      rest[column]![row] = Math.min(
        ...[row - 1, row, row + 1]
          .filter((to) => to >= 0 && to < rows)
          .map((to) => costs[column]![to]! + rest[column + 1]![to]!),
      );
  const guess = rest.map((column) => column.map((value) => value * share * random()));
  const space: Space = {
    width: 2,
    depth,
    start: Int32Array.of(Math.floor(rows / 2), 0),
    expand(state, column, child, emit) {
      for (let to = state[0]! - 1; to <= state[0]! + 1; to += 1) {
        if (to < 0 || to >= rows) continue;
        child[0] = to;
        child[1] = column + 1;
        emit(costs[column]![to]!, to);
      }
    },
    bound: (state, column) => (column === depth ? 0 : guess[column]![state[0]!]!),
  };
  return { space, least: rest[0]![Math.floor(rows / 2)]! };
}

describe("best first", () => {
  test("finds the cheapest way with any bound that is not too high, consistent or not", () => {
    fc.assert(
      fc.property(fc.integer(), fc.double({ min: 0, max: 1, noNaN: true }), (seed, share) => {
        const { space, least } = strip(seededRandom(seed), 9, 7, share);
        const run = new BestFirst(space, 1000);
        while (!run.exhausted) {
          run.run(5);
          expect(run.floor()).toBeLessThanOrEqual(least + 1e-9);
        }
        expect(run.found!.cost).toBeCloseTo(least, 9);
        expect(run.found!.moves).toHaveLength(9);
      }),
      { numRuns: 300 },
    );
  });

  test("says that nothing lies below a limit, and keeps a true floor when its room is used up", () => {
    fc.assert(
      fc.property(fc.integer(), fc.integer({ min: 2, max: 30 }), (seed, room) => {
        const { space, least } = strip(seededRandom(seed), 9, 7, 0.5);
        const limited = new BestFirst(space, 1000);
        limited.setLimit(least);
        limited.run(100_000);
        expect(limited.found).toBeNull();
        expect(limited.exhausted).toBe(true);
        const cramped = new BestFirst(space, room);
        cramped.run(100_000);
        expect(cramped.floor()).toBeLessThanOrEqual(least + 1e-9);
      }),
      { numRuns: 200 },
    );
  });
});

test("a beam that keeps everything finds the cheapest way, a narrow one a way", () => {
  for (let seed = 1; seed <= 50; seed += 1) {
    const { space, least } = strip(seededRandom(seed), 9, 7, 0.5);
    expect(beam(space, 100).way!.cost).toBe(least);
    expect(beam(space, 1).way!.cost).toBeGreaterThanOrEqual(least);
  }
});

test("a table numbers rows in the order they come and finds them again", () => {
  const table = new StateTable(2);
  const row = (i: number) => Int32Array.of(i % 97, Math.floor(i / 97));
  for (let i = 0; i < 5000; i += 1) {
    expect(table.find(row(i))).toBe(-1);
    expect(table.add(row(i))).toBe(i);
  }
  const read = new Int32Array(2);
  for (let i = 0; i < 5000; i += 7) {
    expect(table.find(row(i))).toBe(i);
    table.read(i, read);
    expect([...read]).toEqual([...row(i)]);
  }
});

const moves: [string, Move][] = [
  ["move block", moveBlock],
  ["move another", moveAnother],
  ["swap songs", swapSongs],
  ["turn block", turnBlock],
  ["change way", changeWay],
  ["change way and place", changeWayAndPlace],
  ["change run", changeRun],
];

/** A made-up set that can be played, its songs in the present order, each in its first way. */
function draftOf(seed: number) {
  const problem = randomProblem(problemRandom(seed), {
    songs: 12,
    guitars: 3,
    necks: 6,
    rules: "light",
    realistic: true,
    maxMoved: seed % 2 ? null : 2,
    kept: false,
  });
  const compiled = compileRules(problem);
  if (!compiled.ok) throw new Error("These rules hold in the order of the songs' numbers.");
  const model = withoutRetuningKept(modelOf(problem));
  const songs = Int32Array.from({ length: 12 }, (_, i) => i);
  const draft: Draft = { songs, ways: new Int32Array(12), model, rules: compiled.rules };
  return { problem, draft };
}

test.each(moves)(
  "%s leaves every song once, each in a way it has, and changes something now and then",
  (_, move) => {
    let changes = 0;
    for (let seed = 1; seed <= 20; seed += 1) {
      const { draft } = draftOf(seed);
      const random = seededRandom(seed);
      for (let i = 0; i < 50; i += 1) {
        const before = [...draft.songs, ...draft.ways].join();
        const moved = move(draft, random);
        if (moved && [...draft.songs, ...draft.ways].join() !== before) changes += 1;
        expect([...draft.songs].sort((a, b) => a - b)).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11]);
        for (const song of draft.songs) expect(draft.model.options[song]![draft.ways[song]!]).toBeDefined();
      }
    }
    expect(changes).toBeGreaterThan(200);
  },
);

test("the quick test of an order and the rules by the letter agree", () => {
  let held = 0;
  for (let seed = 1; seed <= 40; seed += 1) {
    const { problem, draft } = draftOf(seed);
    const holds = orderTest(draft.rules, problem.maxMoved);
    const random = seededRandom(seed);
    const sorted = [...problem.order].sort((a, b) => Number(a.slice(1)) - Number(b.slice(1)));
    draft.songs.set(sorted.map((id) => problem.order.indexOf(id)));
    for (let i = 0; i < 60; i += 1) {
      const order = [...draft.songs].map((song) => problem.order[song]!);
      const byLetter = keepsOrderRules(problem, order);
      expect(holds(draft.songs), `seed ${seed}: ${order}`).toBe(byLetter);
      if (byLetter) held += 1;
      else draft.songs.set(sorted.map((id) => problem.order.indexOf(id)));
      swapSongs(draft, random);
    }
  }
  expect(held).toBeGreaterThan(100);
});

test("small changes never make a plan worse, and keep the rules", () => {
  let better = 0;
  for (let seed = 1; seed <= 20; seed += 1) {
    const { problem, draft } = draftOf(seed);
    const songs = [...draft.songs];
    if (!orderTest(draft.rules, problem.maxMoved)(draft.songs)) continue;
    const score = scoreOf(draft.model);
    const plan = { songs, options: songs.map((song) => draft.model.options[song]![0]!) };
    const random = seededRandom(seed);
    const improved = improve(draft.model, draft.rules, plan, { random, steps: 2000, heat: 1 });
    const ways = new Int32Array(12);
    for (const [i, song] of improved.songs.entries())
      ways[song] = draft.model.options[song]!.indexOf(improved.options[i]!);
    const before = score(draft.songs, draft.ways);
    const after = score(Int32Array.from(improved.songs), ways);
    expect(after).toBeLessThanOrEqual(before);
    if (after < before) better += 1;
    expect(
      keepsOrderRules(
        problem,
        improved.songs.map((song) => problem.order[song]!),
      ),
    ).toBe(true);
  }
  expect(better).toBeGreaterThan(3);
});
