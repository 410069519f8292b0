import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { infeasibleWords } from "#app/domain/gig/infeasible-words.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { describeSuggestion, isFound, rungProblem, suggestionEdits } from "#app/domain/gig/suggest.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { gigOf, guitar, pairRule, repertoireOf, song } from "./build-gig.ts";

const alder = guitar("alder", { shortName: "Alder" });
const birch = guitar("birch", { shortName: "Birch" });

function suggest(
  gig: ReturnType<typeof gigOf>,
  repertoire: ReturnType<typeof repertoireOf>,
  rung: "same-order" | "any-order",
) {
  const plan = planGig(gig, repertoire).sets[0]!;
  const answer = solve(rungProblem(plan.problem, rung), { effort: 200_000 });
  if (!isFound(answer)) throw new Error("This set can be had");
  const said = describeSuggestion(gig, plan, { answer, rung, repertoire, naming: "english" });
  const applied = applyEdits(gig, suggestionEdits(gig, plan, answer));
  if (!applied.ok) throw new Error(applied.conflict.message);
  return { plan, answer, said, after: planGig(applied.gig, repertoire).sets[0]! };
}

describe("a suggestion", () => {
  const repertoire = repertoireOf(
    [
      song("Lamps", "EADGBE"),
      song("Ferry", "DADGAD"),
      song("Meadow", "EADGBE"),
      song("Quarry", "DADGAD"),
      song("Home", "EADGBE"),
    ],
    [alder, birch],
  );
  const gig = gigOf([
    ["Lamps", "Ferry", "Meadow", "Quarry", "Home"].map((id) => ({ song: id, guitar: "alder" })),
  ]);

  test("same order, other guitars: names what goes to which guitar, and is proven", () => {
    const { said, after, answer } = suggest(gig, repertoire, "same-order");
    expect(said).toMatchObject({
      gains: true,
      moves: [],
      changes: ["To Birch: Ferry, Quarry"],
      proven: true,
    });
    expect(said.certainty).toBe("Proven: no choice of guitars needs less in this order.");
    expect(after.evaluation.total).toBeCloseTo(answer.total, 6);
  });

  test("any order: names the songs that move and where to", () => {
    const only = repertoireOf(repertoire.songs, [alder]);
    const { said, after, answer } = suggest(gig, only, "any-order");
    expect(said.gains).toBe(true);
    expect(said.moves).toHaveLength(1);
    expect(said.moves[0]).toMatch(/^(Ferry|Meadow|Quarry) (before|to)/);
    expect(said.saved).toBe(planGig(gig, only).totals.exposed - answer.totals.exposed);
    expect(after.problem.order).toEqual(answer.order);
    expect(after.problem.order[0]).toBe("Lamps");
    expect(after.problem.order.at(-1)).toBe("Home");
  });

  test("guitars that are alike are not exchanged for nothing", () => {
    const calm = gigOf([
      [
        { song: "Lamps", guitar: "birch" },
        { song: "Ferry", guitar: "alder" },
        { song: "Home", guitar: "birch" },
      ],
    ]);
    const { said } = suggest(calm, repertoire, "same-order");
    expect(said.gains).toBe(false);
    expect(said.changes).toEqual([]);
  });

  test("what is pinned stays", () => {
    const pinned = { ...gig, entries: gig.entries.map((entry) => ({ ...entry, pinned: "guitar" as const })) };
    const { said } = suggest(pinned, repertoire, "same-order");
    expect(said.changes).toEqual([]);
  });

  test("a set that cannot be had says which rules contradict each other, by title", () => {
    const ruled = {
      ...gig,
      rules: [pairRule("into", "Ferry", "Meadow"), pairRule("before", "Meadow", "Ferry")],
    };
    const plan = planGig(ruled, repertoire).sets[0]!;
    const answer = solve(rungProblem(plan.problem, "any-order"), { effort: 50_000 });
    expect(answer.status).toBe("infeasible");
    if (isFound(answer)) return;
    expect(infeasibleWords(ruled, plan, answer, repertoire)).toEqual([
      "Ferry straight into Meadow, Meadow before Ferry: these contradict each other. Free one of them.",
    ]);
  });
});

describe("always", () => {
  const ways = ["EADGBE", "DADGAD", "DADGBE capo 2", "CGCFFC capo 3 leave 6", "DGDGBD"];
  const sets = fc.array(fc.tuple(fc.constantFrom(...ways), fc.constantFrom("alder", "birch")), {
    minLength: 2,
    maxLength: 7,
  });

  test("used, a suggestion gives the answer's order, guitars and total, and never more than now", () => {
    fc.assert(
      fc.property(sets, fc.constantFrom("same-order" as const, "any-order" as const), (picked, rung) => {
        const songs = picked.map(([way], index) => song(`s${index}`, way));
        const gig = gigOf([picked.map(([, on], index) => ({ song: `s${index}`, guitar: on }))]);
        const { plan, answer, after } = suggest(gig, repertoireOf(songs, [alder, birch]), rung);
        expect(after.problem.order).toEqual(answer.order);
        expect(after.evaluation.total).toBeCloseTo(answer.total, 6);
        expect(answer.total).toBeLessThanOrEqual(plan.evaluation.total + 1e-6);
        expect(after.plays.map((play) => play.neck)).toEqual(answer.plays.map((play) => play.neck));
      }),
      { seed: 23, numRuns: 60 },
    );
  });
});
