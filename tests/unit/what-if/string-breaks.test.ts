import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { defaultTimes, type Gig } from "#app/domain/gig/gig.ts";
import { entriesOf } from "#app/domain/gig/order.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { replannedOutcome, restJobs, spareOutcome } from "#app/domain/gig/what-if/break-outcomes.ts";
import { necksBefore } from "#app/domain/gig/what-if/necks-before.ts";
import { restAsPlanned } from "#app/domain/gig/what-if/rest-plan.ts";
import { afterBreak } from "#app/domain/gig/what-if/string-breaks.ts";
import { parseProblem } from "#app/domain/planning/problem.ts";
import type { ActCapo } from "#app/domain/repertoire/guitar.ts";
import { gigOf, guitar, repertoireOf, song } from "../gig/build-gig.ts";
import { solved } from "./ask.ts";

const alder = guitar("alder", { shortName: "Alder" });
const birch = guitar("birch", { shortName: "Birch" });
const aspen = guitar("aspen", { shortName: "Aspen", spareFor: "alder" });
const songs = [
  song("Lamps", "EADGBE"),
  song("Ferry", "DADGAD"),
  song("Meadow", "EADGBE"),
  song("Quarry", "DADGAD"),
  song("Home", "EADGBE"),
];
const gig = gigOf([
  [
    { song: "Lamps", guitar: "alder" },
    { song: "Ferry", guitar: "birch" },
    { song: "Meadow", guitar: "alder" },
    { song: "Quarry", guitar: "birch" },
    { song: "Home", guitar: "alder" },
  ],
]);

function breaks(of: Gig, repertoire: Repertoire, entryId: string, guitarId: string) {
  const plan = planGig(of, repertoire).sets[0]!;
  const rest = afterBreak(of, plan, repertoire, { entryId, guitarId });
  const now = restAsPlanned(plan, entryId);
  const about = { gig: of, plan, rest, repertoire, naming: "english" as const };
  const jobs = restJobs(about);
  const known = solved(jobs);
  const anew = (freedom: "same-order" | "any-order") => {
    const { outcome, refused } = replannedOutcome(about, now, freedom, known);
    if (!outcome) throw new Error(`The rest can be had. ${refused.join(" ")}`);
    return outcome;
  };
  const freedoms = jobs.map((job) => job.freedom);
  return { plan, rest, now, spare: spareOutcome(about, now), anew, freedoms };
}

describe("how guitars stand after some songs", () => {
  test("as they were last used, or prepared", () => {
    const { problem, evaluation } = planGig(gig, repertoireOf(songs, [alder, birch])).sets[0]!;
    const open = (place: number) =>
      Object.fromEntries(
        [...necksBefore(problem, evaluation, place)].map(([id, neck]) => [id, neck.open[0]]),
      );
    expect(open(0)).toEqual({ alder: 40, birch: 38 });
    expect(open(3)).toEqual({ alder: 40, birch: 38 });
  });

  test("a tech is ready with a resting guitar or has only begun", () => {
    const act = repertoireOf(
      songs.map((one) => (one.id === "Ferry" ? { ...one, seconds: 20 } : one)),
      [alder, birch],
    );
    const one = gigOf(
      [
        [
          { song: "Lamps", guitar: "alder" },
          { song: "Ferry", guitar: "birch" },
          { song: "Quarry", guitar: "alder" },
          { song: "Meadow", guitar: "birch" },
        ],
      ],
      { crew: "tech", times: defaultTimes.tech },
    );
    const { problem, evaluation } = planGig(one, act).sets[0]!;
    // Alder rests while Ferry is played, 20 s, and needs 35 s for DADGAD.
    expect(necksBefore(problem, evaluation, 2).get("alder")?.open[0]).toBe(40);
    const longer = repertoireOf(songs, [alder, birch]);
    const { problem: p, evaluation: e } = planGig(one, longer).sets[0]!;
    expect(necksBefore(p, e, 2).get("alder")?.open[0]).toBe(38);
    expect(necksBefore(p, e, 1).get("alder")?.open[0]).toBe(40);
  });

  test("without a capo that another guitar took", () => {
    const steel = { id: "steel", name: "Steel", strings: null, count: 1 };
    const act = repertoireOf(
      [song("Slate", "EADGBE capo 2"), song("Gate", "EADGBE capo 5"), song("Home", "EADGBE")],
      [alder, birch],
      [steel],
    );
    const capoed = gigOf([
      [
        { song: "Slate", guitar: "alder" },
        { song: "Gate", guitar: "birch" },
        { song: "Home", guitar: "alder" },
      ],
    ]);
    const { problem, evaluation } = planGig(capoed, act).sets[0]!;
    const necks = necksBefore(problem, evaluation, 2);
    expect(necks.get("alder")?.capos).toEqual([]);
    expect(necks.get("birch")?.capos).toHaveLength(1);
  });
});

describe("a string breaks", () => {
  test("the spare, prepared like it, takes over at the price of a change of guitar", () => {
    const act = repertoireOf(songs, [alder, birch, aspen]);
    const { rest, now, spare } = breaks(gig, act, "Meadow", "alder");
    expect(rest.spare).toMatchObject({ takes: ["Meadow", "Home"], cannot: [] });
    expect(rest.spare?.neck.open).toEqual(alder.usual);
    // Three changes of guitar, 3 s beyond the talk each, as planned.
    expect(now.totals).toMatchObject({ exposed: 9, swaps: 3, strings: 0 });
    expect(spare?.needs).toMatchObject({ exposed: 9, swaps: 3, strings: 0 });
    expect(spare?.changes).toEqual(["To Aspen: Meadow, Home"]);
  });

  test("without a spare the rest is planned anew from the necks as they are", () => {
    const { rest, spare, anew } = breaks(gig, repertoireOf(songs, [alder, birch]), "Meadow", "alder");
    expect(spare).toBeNull();
    expect(parseProblem(rest.problem).ok).toBe(true);
    expect(rest.problem.order).toEqual(["Ferry", "Meadow", "Quarry", "Home"]);
    expect(rest.problem.guitars.find(({ id }) => id === "birch")?.start?.open[0]).toBe(38);
    // All on Birch: retuned into Meadow, Quarry and Home, 35 s each, 23 beyond the talk.
    expect(anew("same-order").needs).toMatchObject({ exposed: 3 * 23, strings: 9, swaps: 0 });
    // Quarry first: one retuning is enough.
    const free = anew("any-order");
    expect(free.needs).toMatchObject({ exposed: 23, strings: 3, swaps: 0 });
    const applied = applyEdits(gig, free.edits);
    if (!applied.ok) throw new Error(applied.conflict.message);
    expect(entriesOf(applied.gig, "set1").map((entry) => entry.id)).toEqual([
      "Lamps",
      "Ferry",
      "Quarry",
      "Meadow",
      "Home",
    ]);
    expect(
      entriesOf(applied.gig, "set1")
        .slice(2)
        .map((entry) => entry.guitarId),
    ).toEqual(["birch", "birch", "birch"]);
  });

  test("on the guitar in hand: the change to another counts", () => {
    const set = gigOf([["Lamps", "Meadow", "Home"].map((id) => ({ song: id, guitar: "alder" }))]);
    const { anew, now } = breaks(set, repertoireOf(songs, [alder, birch]), "Meadow", "alder");
    expect(now.totals).toMatchObject({ exposed: 0, swaps: 0 });
    expect(anew("same-order").needs).toMatchObject({ exposed: 3, swaps: 1 });
  });

  test("before the first song: the others are prepared as they are", () => {
    const { rest, anew } = breaks(gig, repertoireOf(songs, [alder, birch]), "Lamps", "alder");
    expect(rest.justPlayed).toBeNull();
    // Birch stands in DADGAD for Ferry: 35 s into Lamps, then into every song, and no change of guitar.
    expect(anew("same-order").needs).toMatchObject({ exposed: 5 * 23, swaps: 0, strings: 15 });
  });

  test("songs that nothing else plays are named; what is kept to the guitar its spare may take", () => {
    const kept = songs.map((one) =>
      one.id === "Home" ? { ...one, necks: [{ ...one.necks[0]!, guitars: ["alder"] }] } : one,
    );
    const without = breaks(gig, repertoireOf(kept, [alder, birch]), "Meadow", "alder");
    expect(without.rest.unplayable).toEqual(["Home"]);
    expect(without.anew("same-order").unplayable).toEqual(["Home"]);
    const withIt = breaks(gig, repertoireOf(kept, [alder, birch, aspen]), "Meadow", "alder");
    expect(withIt.rest.unplayable).toEqual([]);
    expect(withIt.spare?.unplayable).toEqual([]);
  });

  test("a spare does not carry a capo that there is only once", () => {
    const steel = { id: "steel", name: "Steel", strings: null, count: 1 };
    const act = repertoireOf(
      [song("Slate", "EADGBE capo 2"), song("Gate", "EADGBE capo 2")],
      [alder, aspen],
      [steel],
    );
    const set = gigOf([["Slate", "Gate"].map((id) => ({ song: id, guitar: "alder" }))]);
    const { rest, spare } = breaks(set, act, "Gate", "alder");
    expect(parseProblem(rest.problem).ok).toBe(true);
    expect(rest.spare?.neck.capos).toEqual([]);
    // Change of guitar 15 s, the capo off the broken one 3 s, on 5 s, a look at the tuner 5 s; 12 s are covered.
    expect(spare?.needs).toMatchObject({ exposed: 16, capoActions: 2 });
  });

  test("the spare cannot take what it cannot be tuned to", () => {
    const high = { ...aspen, lowest: aspen.usual, highest: aspen.usual };
    const set = gigOf([["Lamps", "Ferry", "Home"].map((id) => ({ song: id, guitar: "alder" }))]);
    const { rest, spare } = breaks(set, repertoireOf(songs, [alder, birch, high]), "Ferry", "alder");
    expect(rest.spare).toMatchObject({ takes: ["Home"], cannot: ["Ferry"] });
    expect(spare?.unplayable).toEqual(["Ferry"]);
  });
});

describe("always", () => {
  const ways = ["EADGBE", "DADGAD", "DADGBE capo 2", "CGCFFC capo 3 leave 6", "DGDGBD", "EADGBE capo 2"];
  const drawn = fc.array(fc.tuple(fc.constantFrom(...ways), fc.constantFrom("alder", "birch", "cedar")), {
    minLength: 2,
    maxLength: 8,
  });
  const capos = fc.constantFrom<ActCapo[]>(
    [],
    [{ id: "steel", name: "Steel", strings: null, count: 1 }],
    [
      { id: "steel", name: "Steel", strings: null, count: 1 },
      { id: "five", name: "Five", strings: [1, 2, 3, 4, 5], count: 1 },
    ],
  );
  const cedar = guitar("cedar", { shortName: "Cedar" });

  test("where the guitar is not needed any more, the rest costs what was planned, gap by gap", () => {
    fc.assert(
      fc.property(drawn, capos, fc.nat(7), (picked, owned, at) => {
        const place = at % picked.length;
        const act = repertoireOf(
          picked.map(([way], index) => song(`s${index}`, way)),
          [alder, birch, cedar, aspen],
          owned,
        );
        const set = gigOf([picked.map(([, on], index) => ({ song: `s${index}`, guitar: on }))]);
        const plan = planGig(set, act).sets[0]!;
        const later = new Set(picked.slice(place).map(([, on]) => on));
        fc.pre(!later.has("alder") && plan.evaluation.breaches.length === 0);
        const { rest, now, spare, anew, freedoms } = breaks(set, act, `s${place}`, "alder");
        expect(parseProblem(rest.problem).ok).toBe(true);
        expect(spare?.needs.total).toBeCloseTo(now.evaluation.total, 6);
        expect(spare?.needs).toMatchObject({
          strings: now.totals.strings,
          capoActions: now.totals.capoActions,
        });
        const totals = freedoms.map((freedom) => anew(freedom).needs.total);
        expect(totals[0]).toBeLessThanOrEqual(now.evaluation.total + 1e-6);
        expect(totals[1] ?? 0).toBeLessThanOrEqual(totals[0]! + 1e-6);
      }),
      { numRuns: 120 },
    );
  });

  test("used, no song still to come is on the broken guitar, and what was played stays", () => {
    fc.assert(
      fc.property(drawn, capos, fc.nat(7), fc.boolean(), (picked, owned, at, tech) => {
        const place = at % picked.length;
        const act = repertoireOf(
          picked.map(([way], index) => song(`s${index}`, way)),
          [alder, birch, cedar],
          owned,
        );
        const crew = tech ? "tech" : "alone";
        const set = gigOf([picked.map(([, on], index) => ({ song: `s${index}`, guitar: on }))], {
          crew,
          times: defaultTimes[crew],
        });
        const { anew, freedoms } = breaks(set, act, `s${place}`, "alder");
        for (const freedom of freedoms) {
          const applied = applyEdits(set, anew(freedom).edits);
          if (!applied.ok) throw new Error(applied.conflict.message);
          const entries = entriesOf(applied.gig, "set1");
          expect(entries.slice(0, place)).toEqual(entriesOf(set, "set1").slice(0, place));
          expect(entries.slice(place).map((entry) => entry.guitarId)).not.toContain("alder");
          const first = anew(freedom).sets[0]!.after.rows[place === 0 ? 0 : 1];
          expect(first?.entry.id).toBe(entries[place]?.id);
        }
      }),
      { numRuns: 80 },
    );
  });
});
