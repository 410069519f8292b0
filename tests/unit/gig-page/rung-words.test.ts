import { expect, test } from "vitest";
import { closingOf, foldedWords } from "#app/components/gig/suggestions/rung-words.ts";
import { aimOf } from "#app/domain/gig/aims.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { gigOf, guitar, repertoireOf, song } from "#tests/unit/gig/build-gig.ts";

const songs = ["Lamps", "Ferry", "Home"].map((id) => song(id, "EADGBE"));
const gig = gigOf([songs.map(({ id }) => ({ song: id }))]);
const { problem, evaluation } = planGig(gig, repertoireOf(songs, [guitar("alder")])).sets[0]!;

function standing(total: number, bound: number, changes: Partial<typeof evaluation.totals>) {
  return { status: "feasible" as const, total, bound, totals: { ...evaluation.totals, ...changes } };
}

test("rungs that gain nothing stand in one line", () => {
  expect(foldedWords(["move-three", "any-order"])).toBe("Move three, any order: nothing less.");
  expect(foldedWords(["same-order"])).toBe("Same order, other guitars: nothing less.");
});

test("while it runs: what is found, and what is proven impossible", () => {
  // The songs are alike, so besides dead air there is at most 24 s of talk: (7904 - 24) / 101 = 78.02.
  const closing = closingOf("dead-air", problem, standing(8004, 7904, { exposed: 79 }));
  expect(closing).toEqual({ found: 79, least: 79, words: "Found 79 s. Less than 79 s is impossible." });
  expect(closingOf("dead-air", problem, standing(8004, 6185, { exposed: 79 })).words).toBe(
    "Found 79 s. Less than 61 s is impossible.",
  );
  expect(closingOf("dead-air", problem, standing(8004, 0, { exposed: 79 })).words).toBe("Found 79 s.");
  const strings = { ...problem, aim: aimOf({ kind: "strings" }) };
  expect(closingOf("strings", strings, standing(900_000, 700_500, { strings: 9 })).words).toBe(
    "Found 9 strings. Fewer than 8 are impossible.",
  );
  expect(closingOf("own", problem, standing(51.25, 40, {})).words).toBe(
    "Found 51.3 weighed. Less than 40 is impossible.",
  );
});
