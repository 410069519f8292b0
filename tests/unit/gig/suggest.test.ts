import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { certaintyWords, leastDeadAir } from "#app/domain/gig/certainty.ts";
import { infeasibleWords } from "#app/domain/gig/infeasible-words.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { type Rung, rungProblem, rungs } from "#app/domain/gig/rungs.ts";
import { describeSuggestion, isFound, suggestionEdits } from "#app/domain/gig/suggest.ts";
import { solve } from "#app/domain/planning/solve.ts";
import { gigOf, guitar, pairRule, repertoireOf, song } from "./build-gig.ts";

const alder = guitar("alder", { shortName: "Alder" });
const birch = guitar("birch", { shortName: "Birch" });

function suggest(gig: ReturnType<typeof gigOf>, repertoire: ReturnType<typeof repertoireOf>, rung: Rung) {
  const plan = planGig(gig, repertoire).sets[0]!;
  const answer = solve(rungProblem(plan.problem, rung), { effort: 200_000 });
  if (!isFound(answer)) throw new Error("This set can be had");
  const said = describeSuggestion(gig, plan, {
    answer,
    rung,
    lead: "dead-air",
    repertoire,
    naming: "english",
  });
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
    expect(said).toMatchObject({ moves: [], changes: ["To Birch: Ferry, Quarry"] });
    expect(answer.status).toBe("optimal");
    expect(said.certainty).toBe("Proven: in this order, no choice of guitars needs less dead air.");
    expect(after.evaluation.total).toBeCloseTo(answer.total, 6);
  });

  test("any order: names the songs that move and where to", () => {
    const only = repertoireOf(repertoire.songs, [alder]);
    const { said, after, answer } = suggest(gig, only, "any-order");
    expect(said.moves).toHaveLength(1);
    expect(said.moves[0]).toMatch(/^(Ferry|Meadow|Quarry) (before|to)/);
    expect(said.saved[0]).toBe(`${planGig(gig, only).totals.exposed - answer.totals.exposed} s less`);
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
    expect(said.saved).toEqual([]);
    expect(said.changes).toEqual([]);
  });

  test("what is pinned stays", () => {
    const pinned = { ...gig, entries: gig.entries.map((entry) => ({ ...entry, pinned: "guitar" as const })) };
    const { said } = suggest(pinned, repertoire, "same-order");
    expect(said.changes).toEqual([]);
  });

  test("a song that stands twice is told apart by its place", () => {
    const again = { ...gig.entries[3]!, id: "again", songId: "Ferry" };
    const twice = { ...gig, entries: gig.entries.map((entry) => (entry.id === "Quarry" ? again : entry)) };
    expect(suggest(twice, repertoire, "same-order").said.changes).toEqual([
      "To Birch: Ferry (song 2), Ferry (song 4)",
    ]);
  });

  test("a song played another way says which", () => {
    const two = song("Ferry", "DADGAD");
    two.necks.push({ ...song("x", "EADGBE").necks[0]!, id: "second", penalty: 4 });
    const only = repertoireOf(
      repertoire.songs.map((one) => (one.id === "Ferry" ? two : one)),
      [alder],
    );
    const short = gigOf([["Lamps", "Ferry", "Home"].map((id) => ({ song: id, guitar: "alder" }))]);
    const { said, after } = suggest(short, only, "same-order");
    expect(said.changes).toEqual(["Ferry in EADGBE, no capo"]);
    expect(after.rows[1]?.neck?.id).toBe("second");
  });

  test("songs that come to stand side by side are told in one line, and stay in their part of the set", () => {
    const set = [
      { song: "Lamps", guitar: "alder" },
      { song: "Ferry", guitar: "alder" },
      { song: "Quarry", guitar: "alder" },
      { song: "Meadow", guitar: "alder" },
      { song: "Home", guitar: "alder", encore: true as const },
    ];
    const only = repertoireOf(repertoire.songs, [alder]);
    const ruled = gigOf([set], {
      rules: [pairRule("before", "Meadow", "Ferry"), pairRule("into", "Ferry", "Quarry")],
    });
    const { said, after } = suggest(ruled, only, "any-order");
    expect(after.problem.order).toEqual(["Lamps", "Meadow", "Ferry", "Quarry", "Home"]);
    expect(said.moves).toEqual(["Meadow before Ferry"]);
    const apart = gigOf([[set[0]!, set[1]!, set[3]!, set[2]!, set[4]!]], {
      rules: [pairRule("before", "Meadow", "Ferry"), pairRule("before", "Quarry", "Ferry")],
    });
    expect(suggest(apart, only, "any-order").said.moves).toEqual(["Ferry just before the encore"]);
  });

  test("what is not proven says how much less dead air there may be at most", () => {
    const plan = planGig(gig, repertoire).sets[0]!;
    const answer = solve(rungProblem(plan.problem, "any-order"), { effort: 200_000 });
    if (!isFound(answer)) throw new Error("This set can be had");
    const unsure = (exposed: number, bound: number) =>
      certaintyWords(
        plan.problem,
        { ...answer, status: "feasible", bound, totals: { ...answer.totals, exposed } },
        "any-order",
        "dead-air",
      );
    // By hand: besides dead air at most 48 s of talk (the first song is held, its talk is before the set), 4 gaps × (3
    // strings that differ + 1 change of guitar) = 16; (3094 - 64) / 101 = 30.
    expect(unsure(44, 3094)).toBe("Not proven: at most 14 s less is possible.");
    expect(unsure(44, 0)).toBe("Not proven: at most 44 s less is possible.");
    expect(unsure(0, 0)).toBe("Not proven: no less dead air is possible, fewer strings or changes may be.");
  });

  test("a rule against the encore says so", () => {
    const set = gig.entries.map((entry) => (entry.id === "Home" ? { ...entry, section: 1 as const } : entry));
    const ruled = { ...gig, entries: set, rules: [pairRule("before", "Home", "Ferry")] };
    const plan = planGig(ruled, repertoire).sets[0]!;
    const answer = solve(rungProblem(plan.problem, "any-order"), { effort: 50_000 });
    if (isFound(answer)) throw new Error("This cannot be had");
    expect(infeasibleWords(ruled, plan, answer, repertoire)[0]).toContain(
      "Home before Ferry, Home in the encore",
    );
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

  test("no plan has less dead air than is said to be possible", () => {
    fc.assert(
      fc.property(sets, fc.constantFrom(...rungs), (picked, rung) => {
        const songs = picked.map(([way], index) => song(`s${index}`, way));
        const gig = gigOf([picked.map(([, on], index) => ({ song: `s${index}`, guitar: on }))]);
        const problem = rungProblem(planGig(gig, repertoireOf(songs, [alder, birch])).sets[0]!.problem, rung);
        const best = solve(problem, { effort: 200_000 });
        const aim = { exposed: 1, seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 };
        const quiet = solve({ ...problem, aim }, { effort: 200_000 });
        if (!isFound(best) || !isFound(quiet)) throw new Error("These sets can be had");
        expect(leastDeadAir(problem, best.bound)).toBeLessThanOrEqual(quiet.totals.exposed + 1e-6);
      }),
      { seed: 5, numRuns: 40 },
    );
  });

  test("what is pinned is never touched", () => {
    const pins = fc.array(
      fc.constantFrom("none" as const, "guitar" as const, "neck" as const, "both" as const),
      {
        minLength: 7,
        maxLength: 7,
      },
    );
    fc.assert(
      fc.property(sets, pins, (picked, pinned) => {
        const songs = picked.map(([way], index) => {
          const one = song(`s${index}`, way);
          return {
            ...one,
            necks: [...one.necks, { ...one.necks[0]!, id: `s${index}-2`, capos: [], penalty: 3 }],
          };
        });
        const set = picked.map(([, on], index) => ({
          song: `s${index}`,
          guitar: on,
          pinned: pinned[index] ?? "none",
        }));
        const gig = gigOf([set]);
        const chosen = { ...gig, entries: gig.entries.map((one) => ({ ...one, neckId: `${one.songId}-1` })) };
        const { plan, answer } = suggest(chosen, repertoireOf(songs, [alder, birch]), "any-order");
        for (const edit of suggestionEdits(chosen, plan, answer)) {
          if (edit.kind !== "entry.set") continue;
          const pin = chosen.entries.find((one) => one.id === edit.entryId)?.pinned ?? "none";
          expect(["both", edit.field === "guitarId" ? "guitar" : "neck"]).not.toContain(pin);
        }
      }),
      { seed: 29, numRuns: 60 },
    );
  });

  test("used, a suggestion gives the answer's order, guitars and total, and never more than now", () => {
    fc.assert(
      fc.property(sets, fc.constantFrom(...rungs), (picked, rung) => {
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
