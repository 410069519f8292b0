import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { defaultTimes } from "#app/domain/gig/gig.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { gigOf, guitar, pairRule, repertoireOf, song } from "./build-gig.ts";

const alder = guitar("alder");
const birch = guitar("birch");

describe("a gig as it is planned now", () => {
  // By hand with the usual times: string 8, semitone 1, check 5, capo on 5, off 3, move 6, swap 15, cover 12.
  const repertoire = repertoireOf(
    [
      song("one", "EADGBE"),
      song("two", "EADGBE capo 2"),
      song("three", "DADGBE capo 2"),
      song("four", "CGCFFC capo 3 leave 6"),
    ],
    [alder, birch],
  );
  const gig = gigOf([
    [
      { song: "one", guitar: "alder" },
      { song: "two", guitar: "alder" },
      { song: "three", guitar: "alder" },
      { song: "four", guitar: "birch" },
    ],
  ]);
  const plan = planGig(gig, repertoire);
  const rows = plan.sets[0]?.rows ?? [];

  test("every gap: what is done, how long, how much of it the room waits for", () => {
    expect(rows.map((row) => row.gap && [row.gap.swap, row.gap.seconds, row.gap.exposed])).toEqual([
      null,
      [false, 5 + 5, 0],
      [false, 8 + 2 + 5, 3],
      [true, 15, 3],
    ]);
  });

  test("totals: dead air, longest gap, strings, capo changes, guitar changes", () => {
    expect(plan.totals).toMatchObject({
      exposed: 6,
      longestGap: 15,
      strings: 1,
      semitones: 2,
      capoActions: 1,
      swaps: 1,
    });
  });

  test("which strings differ from how the guitar was last used, low side first", () => {
    expect(rows[2]?.retuned).toEqual([true, false, false, false, false, false]);
    expect(rows[3]?.retuned).toEqual([false, false, false, false, false, false]);
  });

  test("how each guitar stands at doors", () => {
    expect(
      plan.sets[0]?.before.map(({ guitar: one, neck }) => [one.id, neck.open, neck.capos.length]),
    ).toEqual([
      ["alder", [40, 45, 50, 55, 59, 64], 0],
      ["birch", [36, 43, 48, 53, 53, 60], 1],
    ]);
  });

  test("the clock: lengths, the longer of talk and gap before each song but the first, intervals", () => {
    expect(rows.map((row) => row.startSecond)).toEqual([0, 212, 427, 642]);
    expect(plan.clock.seconds).toBe(842);
    const two = planGig(gigOf([[{ song: "one" }], [{ song: "two" }]]), repertoire);
    expect(two.sets[1]?.startSecond).toBe(200 + 1200);
    expect(two.clock.seconds).toBe(200 + 1200 + 200);
  });

  test("a rule that the present order breaks is named with the songs' titles", () => {
    const ruled = planGig({ ...gig, rules: [pairRule("before", "three", "one")] }, repertoire);
    expect(ruled.sets[0]?.breaches).toEqual([
      { entryIds: ["three", "one"], message: "three should come before one." },
    ]);
  });

  test("a guitar that keeps its tuning and would be retuned is named", () => {
    const kept = repertoireOf(repertoire.songs, [guitar("alder", { keeps: true }), birch]);
    expect(planGig(gig, kept).sets[0]?.breaches[0]?.message).toContain("keeps its tuning");
  });

  test("an empty gig and an empty set are fine", () => {
    expect(planGig(gigOf([[]]), repertoire).totals.exposed).toBe(0);
    expect(planGig(gigOf([]), repertoire).clock.seconds).toBe(0);
  });
});

describe("slot and curfew", () => {
  const repertoire = repertoireOf([song("one", "EADGBE", { seconds: 3600 })], [alder]);

  test("over the slot by the seconds that are too many", () => {
    expect(planGig(gigOf([[{ song: "one" }]], { slot: 3000 }), repertoire).clock.overSlot).toBe(600);
  });

  test("the curfew is wall time in the gig's zone: Dublin in summer is an hour ahead of UTC", () => {
    const summer = { startsAt: "2027-07-02T21:30:00.000Z", curfew: "23:00" };
    expect(planGig(gigOf([[{ song: "one" }]], summer), repertoire).clock.overCurfew).toBe(1800);
    const winter = { startsAt: "2027-01-08T21:30:00.000Z", curfew: "23:00" };
    expect(planGig(gigOf([[{ song: "one" }]], winter), repertoire).clock.overCurfew).toBe(0);
  });

  test("a curfew after midnight belongs to the night of the gig", () => {
    const late = { startsAt: "2027-01-08T23:30:00.000Z", curfew: "00:30" };
    expect(planGig(gigOf([[{ song: "one" }]], late), repertoire).clock).toMatchObject({
      curfewAt: "2027-01-09T00:30:00.000Z",
      overCurfew: 0,
    });
  });
});

describe("what is warned about and not costed", () => {
  const codes = (ways: string[], rules: Parameters<typeof gigOf>[1] = {}) => {
    const songs = ways.map((way, index) => song(`s${index}`, way));
    const gig = gigOf([songs.map((one) => ({ song: one.id, guitar: "alder" }))], rules);
    return planGig(gig, repertoireOf(songs, [alder])).sets[0]?.rows.map((row) =>
      row.warnings.map((warning) => warning.code),
    );
  };

  test("a plain string above its usual pitch", () => {
    expect(codes(["E2 A2 D3 G3 C4 E4"])).toEqual([["plain-raised"]]);
    expect(codes(["E2 B2 D3 G3 B3 E4"])).toEqual([[]]);
  });

  test("four semitones or more in one gap", () => {
    expect(codes(["EADGBE", "CGDGBE", "EADGBE", "EADGBE"])).toEqual([[], ["far"], ["far"], []]);
  });

  test("strings raised into a song that closes", () => {
    expect(codes(["EADGBE", "DADGBE", "EADGBE"])).toEqual([[], [], ["raised-at-an-end"]]);
  });

  test("any retuning inside a straight-into", () => {
    expect(
      codes(["EADGBE", "EADGBE", "DADGBE", "DADGBE"], { rules: [pairRule("into", "s1", "s2")] }),
    ).toEqual([[], [], ["into-retuned"], []]);
  });
});

describe("capos on necks at once", () => {
  const songs = [song("a", "EADGBE capo 2"), song("b", "EADGBE capo 3"), song("c", "EADGBE")];
  const set = [
    { song: "a", guitar: "alder" },
    { song: "b", guitar: "birch" },
    { song: "c", guitar: "alder" },
  ];

  test("one full capo owned, two on necks from the start: the second is missing", () => {
    const plan = planGig(
      gigOf([set]),
      repertoireOf(songs, [alder, birch], [{ id: "k", name: "Steel", strings: null, count: 1 }]),
    );
    expect(plan.shortages).toMatchObject([{ entryId: "a", needed: 2, owned: 1, kind: "full capos" }]);
  });

  test("enough capos, or an act that listed none: nothing to say", () => {
    expect(
      planGig(
        gigOf([set]),
        repertoireOf(songs, [alder, birch], [{ id: "k", name: "Steel", strings: null, count: 2 }]),
      ).shortages,
    ).toEqual([]);
    expect(planGig(gigOf([set]), repertoireOf(songs, [alder, birch])).shortages).toEqual([]);
  });

  test("a partial capo is a kind of its own", () => {
    const partial = [song("a", "EADGBE capo 3 leave 6")];
    const plan = planGig(
      gigOf([[{ song: "a", guitar: "alder" }]]),
      repertoireOf(partial, [alder], [{ id: "k", name: "Steel", strings: null, count: 4 }]),
    );
    expect(plan.shortages[0]?.message).toBe(
      "At a 1 capos over 5-1 are on necks at once; the act has none. Take one off a resting guitar, or borrow one.",
    );
  });
});

describe("with a tech", () => {
  test("a guitar that rests is retuned at the side and costs the room nothing", () => {
    const songs = [song("a", "EADGBE"), song("b", "DADGAD"), song("c", "CGCGCE")];
    const gig = gigOf(
      [
        [
          { song: "a", guitar: "alder" },
          { song: "b", guitar: "birch" },
          { song: "c", guitar: "alder" },
        ],
      ],
      { crew: "tech", times: defaultTimes.tech },
    );
    const gap = planGig(gig, repertoireOf(songs, [alder, birch])).sets[0]?.rows[2]?.gap;
    expect(gap).toMatchObject({ swap: true, seconds: 8, exposed: 0, work: [{ by: "tech" }] });
  });
});

describe("always", () => {
  const ways = ["EADGBE", "DADGAD", "DADGBE capo 2", "CGCFFC capo 3 leave 6", "DGDGBD", "A1 D2 G2 C3 E3 A3"];
  const gigs = fc
    .array(
      fc.record({
        way: fc.constantFrom(...ways),
        guitar: fc.constantFrom("alder", "birch", "nobody"),
        seconds: fc.integer({ min: 1, max: 600 }),
      }),
      { maxLength: 12 },
    )
    .chain((picked) =>
      fc.record({
        picked: fc.constant(picked),
        crew: fc.constantFrom("alone" as const, "tech" as const),
        encoreFrom: fc.integer({ min: 0, max: picked.length }),
      }),
    );

  test("totals are evaluate's, the clock adds up, every song stands once, nothing is NaN", () => {
    fc.assert(
      fc.property(gigs, ({ picked, crew, encoreFrom }) => {
        const songs = picked.map((one, index) => song(`s${index}`, one.way, { seconds: one.seconds }));
        const set = picked.map((one, index) => ({
          song: `s${index}`,
          guitar: one.guitar,
          ...(index >= encoreFrom ? { encore: true as const } : {}),
        }));
        const plan = planGig(gigOf([set], { crew }), repertoireOf(songs, [alder, birch]));
        const only = plan.sets[0]!;
        const scored = evaluate(only.problem, only.problem.order, only.plays);
        expect(plan.totals.exposed).toBe(scored.totals.exposed);
        expect(only.rows.map((row) => row.entry.id)).toEqual(songs.map((one) => one.id));
        only.rows.forEach((row, index) => {
          expect(row.left === null).toBe(row.guitar !== null);
          const previous = only.rows[index - 1];
          const wait = previous
            ? row.startSecond - previous.startSecond - (previous.song?.seconds ?? 0)
            : row.startSecond;
          if (!previous) expect(wait).toBe(0);
          expect(wait).toBeGreaterThanOrEqual((row.gap?.seconds ?? 0) - 1e-9);
        });
        const last = only.rows.at(-1);
        expect(plan.clock.seconds).toBe(last ? last.startSecond + (last.song?.seconds ?? 0) : 0);
        expect(JSON.stringify(plan)).not.toContain("null,null,null");
      }),
      { seed: 41, numRuns: 150 },
    );
  });
});
