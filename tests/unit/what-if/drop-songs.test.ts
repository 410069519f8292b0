import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Droppable, leastLoss } from "#app/domain/gig/what-if/drop-songs.ts";

function one(id: string, seconds: number, priority = 3, wanted = false): Droppable {
  return { id, seconds, priority, wanted };
}

describe("songs to drop", () => {
  test("one that the player wants least, long enough", () => {
    const songs = [one("a", 240, 2), one("b", 200, 1), one("c", 300, 4)];
    expect(leastLoss(songs, 180)?.choices).toEqual([["b"]]);
    expect(leastLoss(songs, 220)?.choices).toEqual([["a"]]);
    expect(leastLoss(songs, 260)?.choices).toEqual([["a", "b"]]);
    expect(leastLoss(songs, 700)?.choices).toEqual([["a", "b", "c"]]);
    expect(leastLoss(songs, 741)).toBeNull();
  });

  test("all choices that lose as little", () => {
    const songs = [one("a", 200), one("b", 210), one("c", 190)];
    expect(leastLoss(songs, 195)?.choices).toEqual([["a"], ["b"]]);
    expect(leastLoss(songs, 405)?.choices).toEqual([["a", "b"]]);
  });

  test("what the player never goes without, and what is held, goes last", () => {
    const songs = [one("a", 240, 5), one("b", 240, 1, true), one("c", 130, 4), one("d", 130, 4)];
    expect(leastLoss(songs, 240)?.choices).toEqual([["c", "d"]]);
    expect(leastLoss(songs, 300)?.choices).toEqual([
      ["b", "c"],
      ["b", "d"],
    ]);
  });

  test("nothing where nothing is asked", () => {
    expect(leastLoss([one("a", 240)], 0)?.choices).toEqual([[]]);
  });

  test("many equal choices are cut off, and that is said", () => {
    const songs = Array.from({ length: 24 }, (_, index) => one(`s${index}`, 200));
    const found = leastLoss(songs, 1200);
    expect(found?.choices).toHaveLength(2000);
    expect(found?.more).toBe(true);
  });
});

describe("always", () => {
  const songs = fc.array(
    fc.record({
      seconds: fc.integer({ min: 60, max: 400 }),
      priority: fc.integer({ min: 1, max: 5 }),
      wanted: fc.boolean(),
    }),
    { minLength: 1, maxLength: 9 },
  );

  test("enough seconds are freed, and no choice of songs that frees enough loses less: against all of them", () => {
    fc.assert(
      fc.property(songs, fc.integer({ min: 1, max: 1500 }), (drawn, asked) => {
        const set = drawn.map((song, index): Droppable => ({ ...song, id: `s${index}` }));
        // Two losses, compared one after the other: songs that are to stay, then the sum of the priorities.
        const lossOf = (ids: readonly string[]) => {
          const gone = set.filter((song) => ids.includes(song.id));
          const stay = gone.filter((song) => song.wanted || song.priority === 5);
          const priorities = gone.reduce((sum, song) => sum + song.priority, 0);
          return stay.length * 1000 + priorities;
        };
        const freed = (ids: readonly string[]) =>
          set.filter((song) => ids.includes(song.id)).reduce((sum, song) => sum + song.seconds, 0);
        const all = Array.from({ length: 2 ** set.length }, (_, bits) =>
          set.filter((_, index) => (bits >> index) & 1).map((song) => song.id),
        ).filter((ids) => freed(ids) >= asked);
        const found = leastLoss(set, asked);
        if (all.length === 0) {
          expect(found).toBeNull();
          return;
        }
        const least = Math.min(...all.map(lossOf));
        const best = all.filter((ids) => lossOf(ids) === least).map((ids) => ids.join());
        expect(found?.choices.map((ids) => ids.join()).toSorted()).toEqual(best.toSorted());
      }),
      { numRuns: 200 },
    );
  });
});
