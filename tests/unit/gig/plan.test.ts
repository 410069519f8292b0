import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { defaultTimes } from "#app/domain/gig/gig.ts";
import { planGig } from "#app/domain/gig/plan.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import { gigOf, guitar, pairRule, placeRule, repertoireOf, song } from "./build-gig.ts";

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
      longestGap: 3,
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

  test("a song that would retune a guitar that keeps its tuning is named", () => {
    const kept = repertoireOf(repertoire.songs, [guitar("alder", { keeps: true }), birch]);
    expect(planGig(gig, kept).sets[0]?.breaches).toEqual([
      {
        entryIds: ["three", "two"],
        message: "three would retune a guitar that keeps its tuning. Play it on another, or another way.",
      },
    ]);
  });

  test("a broken place says where the song should stand, in its own part of the set", () => {
    const said = (rule: ReturnType<typeof placeRule>, encore = false) => {
      const entries = gig.entries.map((entry) =>
        encore && entry.id > "s" ? { ...entry, section: 1 as const } : entry,
      );
      return planGig({ ...gig, entries, rules: [rule] }, repertoire).sets[0]?.breaches[0]?.message;
    };
    expect(said(placeRule("two", 1))).toBe("two should open the set.");
    expect(said(placeRule("two", -1))).toBe("two should close the set.");
    expect(said(placeRule("two", 3))).toBe("two should stand at place 3.");
    expect(said(placeRule("two", 9))).toBe(
      "two is to stand at place 9, but there are 4 songs. Change its rule.",
    );
    expect(said(placeRule("one", -1), true)).toBe("one should close the main part.");
    expect(said(placeRule("three", 1), true)).toBe("three should open the encore.");
    expect(said(placeRule("two", 2), true)).toBe("two should stand at place 2 of the encore.");
  });

  test("an empty gig and an empty set are fine", () => {
    expect(planGig(gigOf([[]]), repertoire).totals.exposed).toBe(0);
    expect(planGig(gigOf([]), repertoire).clock.seconds).toBe(0);
  });
});

// The drawing of the planning view gives these twelve tunings on two guitars with their figures: dead air of each gap,
// 251 s in all, 50 s in the worst, 19 strings, 7 capo changes, 6 guitar changes, 56:53 on the clock.
describe("a whole set whose figures are known", () => {
  const lengths = [
    "3:40",
    "4:05",
    "3:15",
    "3:55",
    "3:50",
    "5:10",
    "3:30",
    "4:20",
    "4:30",
    "4:45",
    "4:00",
    "5:30",
  ];
  const ways: [string, string][] = [
    ["alder", "EADGBE"],
    ["alder", "EADGBE capo 2"],
    ["alder", "DADGBE capo 2"],
    ["birch", "CGCFFC capo 3 leave 6"],
    ["alder", "DGDGBD"],
    ["alder", "DADGAD"],
    ["birch", "CGCGCE"],
    ["birch", "CGCFFC"],
    ["alder", "DADGAD capo 5"],
    ["birch", "CGCGCE capo 4"],
    ["alder", "DGDGBD capo 3"],
    ["alder", "EADGBE"],
  ];
  const far = { lowest: [34, 39, 44, 49, 53, 58], highest: [42, 47, 52, 57, 60, 65] };
  const songs = ways.map(([, way], index) => {
    const [minutes = 0, seconds = 0] = (lengths[index] ?? "").split(":").map(Number);
    return song(`song${index + 1}`, way, { seconds: minutes * 60 + seconds });
  });
  const gig = gigOf([ways.map(([on], index) => ({ song: `song${index + 1}`, guitar: on }))]);
  const plan = planGig(gig, repertoireOf(songs, [guitar("alder", far), guitar("birch", far)]));

  test("the dead air of each gap", () => {
    const exposed = plan.sets[0]?.rows.map((row) => row.gap?.exposed ?? null);
    expect(exposed).toEqual([null, 0, 3, 3, 31, 13, 48, 30, 13, 50, 34, 26]);
  });

  test("the totals and the clock", () => {
    expect(plan.totals).toMatchObject({
      exposed: 251,
      longestGap: 50,
      strings: 19,
      capoActions: 7,
      swaps: 6,
    });
    expect(plan.clock.seconds).toBe(56 * 60 + 53);
  });

  test("the strings that differ from how their guitar was last used", () => {
    const letters = (row: number) =>
      plan.sets[0]?.rows[row]?.retuned.map((one) => (one ? "x" : "-")).join("");
    expect([2, 4, 5, 6, 7, 8, 9, 10, 11].map(letters)).toEqual([
      "x-----",
      "-x---x",
      "-x--x-",
      "---xxx",
      "---xxx",
      "------",
      "---xxx",
      "-x--x-",
      "xx---x",
    ]);
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

  // The IANA data base: Dublin's clocks go from 01:00 to 02:00 on 28 March 2027, at 01:00 UTC.
  test("a curfew that the clock is put forward over falls at the change", () => {
    const spring = { startsAt: "2027-03-27T22:00:00.000Z", curfew: "01:30" };
    expect(planGig(gigOf([[{ song: "one" }]], spring), repertoire).clock.curfewAt).toBe(
      "2027-03-28T01:00:00.000Z",
    );
  });

  // Dublin's clocks go back from 02:00 to 01:00 on 31 October 2027, at 01:00 UTC.
  test("a curfew that the clock shows twice falls at the first", () => {
    const autumn = { startsAt: "2027-10-30T21:00:00.000Z", curfew: "01:30" };
    expect(planGig(gigOf([[{ song: "one" }]], autumn), repertoire).clock.curfewAt).toBe(
      "2027-10-31T00:30:00.000Z",
    );
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

  test("the main part's closer and the encore's opener are ends too", () => {
    const songs = ["EADGBE", "DADGBE", "EADGBE", "DADGBE", "EADGBE", "EADGBE"].map((way, at) =>
      song(`s${at}`, way),
    );
    const set = songs.map((one, at) => ({
      song: one.id,
      guitar: "alder",
      ...(at > 3 ? { encore: true as const } : {}),
    }));
    const rows = planGig(gigOf([set]), repertoireOf(songs, [alder])).sets[0]!.rows;
    expect(rows.map((row) => row.warnings.length)).toEqual([0, 0, 0, 0, 1, 0]);
    const short = planGig(gigOf([[set[0]!, set[1]!, set[2]!, set[4]!]]), repertoireOf(songs, [alder]));
    expect(short.sets[0]!.rows.map((row) => row.warnings.length)).toEqual([0, 0, 1, 0]);
  });

  test("a bass has no plain strings", () => {
    const bass = guitar("bass", { kind: "bass", usual: [28, 33, 38, 43] });
    const low = {
      ...song("low", "EADGBE"),
      necks: [{ id: "n", open: [28, 33, 38, 45], capos: [], guitars: null, penalty: 0 }],
    };
    const plan = planGig(gigOf([[{ song: "low" }]]), repertoireOf([low], [bass]));
    expect(plan.sets[0]?.rows[0]?.warnings).toEqual([]);
  });

  test("one string that turns far is told with its number", () => {
    const songs = [song("a", "EADGBE"), song("b", "CADGBE"), song("c", "CADGBE")];
    const gig = gigOf([songs.map((one) => ({ song: one.id, guitar: "alder" }))]);
    expect(planGig(gig, repertoireOf(songs, [alder])).sets[0]?.rows[1]?.warnings[0]?.message).toBe(
      "String 6 turns 4 semitones in one gap: check again after the first verse.",
    );
  });

  test("straight into is no matter while its songs do not follow each other, nor where a tech retunes beforehand", () => {
    expect(
      codes(["EADGBE", "EADGBE", "EADGBE", "DADGBE", "DADGBE"], { rules: [pairRule("into", "s1", "s3")] }),
    ).toEqual([[], [], [], [], []]);
    const songs = [song("a", "EADGBE"), song("b", "EADGBE"), song("c", "DADGBE")];
    const gig = gigOf(
      [
        [
          { song: "a", guitar: "alder" },
          { song: "b", guitar: "birch" },
          { song: "c", guitar: "alder" },
        ],
      ],
      { crew: "tech", times: defaultTimes.tech, rules: [pairRule("into", "b", "c")] },
    );
    expect(planGig(gig, repertoireOf(songs, [alder, birch])).sets[0]?.rows[2]?.warnings).toEqual([]);
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

  const one = [{ id: "k", name: "Steel", strings: null, count: 1 }];

  test("one full capo owned: it goes to the first guitar at doors, and is taken off it for the second", () => {
    const plan = planGig(gigOf([set]), repertoireOf(songs, [alder, birch], one)).sets[0]!;
    expect(plan.before.map(({ guitar: on, neck }) => [on.id, neck.capos.length])).toEqual([
      ["alder", 1],
      ["birch", 0],
    ]);
    // By hand: off 3, on 5, check 5, guitar 15 = 28; talk covers 12.
    expect(plan.rows[1]?.gap).toMatchObject({
      seconds: 28,
      exposed: 16,
      givers: [{ guitar: { id: "alder" }, capos: 1, justPlayed: true }],
    });
    // Alder has no capo left to take off for its last song.
    expect(plan.rows[2]?.gap).toMatchObject({ seconds: 15, work: [], givers: [] });
    expect(plan.totals.capoActions).toBe(2);
    expect(plan.shortages).toEqual([]);
  });

  test("a guitar that waits with its capo gives it, and has it put on again when its own song comes", () => {
    const later = [
      song("d", "EADGBE capo 2"),
      song("e", "EADGBE"),
      song("f", "EADGBE capo 2"),
      song("g", "EADGBE capo 4"),
    ];
    const guitars = ["birch", "alder", "alder", "birch"];
    const gig = gigOf([later.map(({ id }, at) => ({ song: id, guitar: guitars[at]! }))]);
    const { rows, shortages } = planGig(gig, repertoireOf(later, [alder, birch], one)).sets[0]!;
    expect(rows.map((row) => row.gap?.givers.map((giver) => giver.guitar.id) ?? null)).toEqual([
      null,
      [],
      ["birch"],
      ["alder"],
    ]);
    expect(rows[2]?.gap?.givers[0]?.justPlayed).toBe(false);
    expect(shortages).toEqual([]);
  });

  test("a full capo on guitars of two widths is one thing, and the second is missing", () => {
    const tenor = guitar("tenor", { usual: [48, 55, 62, 69] });
    const wide = song("w", "EADGBE capo 2");
    const narrow = song("n", "EADGBE");
    const four = {
      ...narrow,
      necks: [{ ...narrow.necks[0]!, open: tenor.usual, capos: [{ fret: 2, strings: [1, 2, 3, 4] }] }],
    };
    const gig = gigOf([
      [
        { song: "w", guitar: "alder" },
        { song: "n", guitar: "tenor" },
      ],
    ]);
    expect(planGig(gig, repertoireOf([wide, four], [alder, tenor], one)).shortages).toEqual([
      {
        entryId: "w",
        needed: 2,
        owned: 1,
        kind: "full capos",
        message:
          "At w 2 full capos are on necks at once; the act has 1. Take one off a resting guitar, or borrow one.",
      },
    ]);
  });

  test("a song that needs more of a kind at once than there are is left out, with what would mend it", () => {
    const both = song("t", "EADGBE");
    const capos = [2, 5].map((fret) => ({ fret, strings: [1, 2, 3, 4, 5, 6] }));
    const twice = { ...both, necks: [{ ...both.necks[0]!, capos }] };
    const gig = gigOf([[{ song: "t", guitar: "alder" }]]);
    expect(planGig(gig, repertoireOf([twice], [alder], one)).sets[0]?.rows[0]?.left).toBe(
      "Needs 2 full capos at once; the act has 1. List another under Guitars, or play it another way.",
    );
    expect(planGig(gig, repertoireOf([twice], [alder])).sets[0]?.rows[0]?.left).toBeNull();
  });

  test("enough capos: nothing to say; an act that listed none is told so once", () => {
    expect(
      planGig(
        gigOf([set]),
        repertoireOf(songs, [alder, birch], [{ id: "k", name: "Steel", strings: null, count: 2 }]),
      ).shortages,
    ).toEqual([]);
    const unlisted = planGig(gigOf([set]), repertoireOf(songs, [alder, birch]));
    expect(unlisted.shortages).toEqual([]);
    expect(unlisted.note).toContain("none are listed");
    expect(planGig(gigOf([[{ song: "c" }]]), repertoireOf(songs, [alder])).note).toBeNull();
  });

  test("a partial capo is a kind of its own", () => {
    const partial = [song("a", "EADGBE capo 3 leave 6")];
    const plan = planGig(
      gigOf([[{ song: "a", guitar: "alder" }]]),
      repertoireOf(partial, [alder], [{ id: "k", name: "Steel", strings: null, count: 4 }]),
    );
    expect(plan.shortages[0]?.message).toBe(
      "a needs 1 capo over 5-1; the act has none. Borrow one, or play it another way.",
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

/** Where a value holds a number that is none, or is without end. */
function notNumbers(value: unknown, path = "plan"): string[] {
  if (typeof value === "number") return Number.isFinite(value) ? [] : [path];
  if (value instanceof Map) return notNumbers([...value.values()], path);
  if (value === null || typeof value !== "object") return [];
  return Object.entries(value).flatMap(([key, one]) => notNumbers(one, `${path}.${key}`));
}

test("a number that is none is found where it stands", () => {
  expect(notNumbers({ a: [1, { b: Number.NaN }], c: new Map([["d", 1 / 0]]) })).toEqual([
    "plan.a.1.b",
    "plan.c.0",
  ]);
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
        expect(plan.totals).toMatchObject({
          strings: scored.totals.strings,
          semitones: scored.totals.semitones,
          capoActions: scored.totals.capoActions,
          swaps: scored.totals.swaps,
          seconds: scored.totals.seconds,
        });
        expect(notNumbers(plan)).toEqual([]);
      }),
      { seed: 41, numRuns: 150 },
    );
  });
});
