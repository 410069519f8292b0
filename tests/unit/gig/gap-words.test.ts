import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { gapSentence, gapTokens, stageWords } from "#app/domain/gig/gap-words.ts";
import { defaultTimes } from "#app/domain/gig/gig.ts";
import { planGig, type Row } from "#app/domain/gig/plan.ts";
import { gigOf, guitar, repertoireOf, song } from "./build-gig.ts";

const alder = guitar("alder", { shortName: "Alder" });
const birch = guitar("birch", { shortName: "Birch" });

/** The last of a few songs, each on a guitar, as its row stands. */
function rowOf(ways: [string, "alder" | "birch"][], changes: Parameters<typeof gigOf>[1] = {}): Row {
  const songs = ways.map(([way], index) => song(`s${index}`, way));
  const gig = gigOf([ways.map(([, on], index) => ({ song: `s${index}`, guitar: on }))], changes);
  return planGig(gig, repertoireOf(songs, [alder, birch])).sets[0]!.rows.at(-1)!;
}

const capoOffOneDown = rowOf([
  ["EADGBE capo 2", "alder"],
  ["DADGBE", "alder"],
]);

describe("a gap in words", () => {
  test("for hover, focus and screen readers", () => {
    // By hand: off 3, string 8 + 2 × 1, check 5 = 18; talk covers 12.
    expect(gapSentence(capoOffOneDown, "english")).toBe(
      "Capo off. String 6 down 2, to D. About 18 s, 6 s longer than the talk covers.",
    );
  });

  test("covered by the talk, no talk at all, and nothing to do", () => {
    expect(
      gapSentence(
        rowOf([
          ["EADGBE", "alder"],
          ["EADGBE capo 2", "alder"],
        ]),
        "english",
      ),
    ).toBe("Capo on 2. About 10 s, covered by the talk.");
    const silent = { times: { ...defaultTimes.alone, cover: 0 } };
    expect(
      gapSentence(
        rowOf(
          [
            ["EADGBE", "alder"],
            ["DADGBE", "alder"],
          ],
          silent,
        ),
        "english",
      ),
    ).toBe("String 6 down 2, to D. About 15 s of dead air.");
    expect(
      gapSentence(
        rowOf([
          ["EADGBE", "alder"],
          ["EADGBE", "alder"],
        ]),
        "english",
      ),
    ).toBe("Nothing to do.");
  });

  test("a change of guitar comes first", () => {
    const row = rowOf([
      ["EADGBE", "alder"],
      ["DADGAD", "birch"],
      ["DADGBE", "alder"],
    ]);
    expect(gapSentence(row, "english")).toBe(
      "Change to Alder. String 6 down 2, to D. About 30 s, 18 s longer than the talk covers.",
    );
    expect(gapTokens(row, "english").map((token) => token.kind)).toEqual(["swap", "string"]);
  });

  test("in the order in which hands work: capo off, strings down, strings up, capo on", () => {
    const row = rowOf([
      ["DADGBE capo 2", "alder"],
      ["EADGBD capo 3 leave 6", "alder"],
    ]);
    expect(
      gapTokens(row, "english").map((token) =>
        token.kind === "string"
          ? `${token.string} ${token.direction}`
          : token.kind === "capo"
            ? token.words
            : "",
      ),
    ).toEqual(["capo off", "1 down", "6 up", "capo on 3, leave 6"]);
  });

  test("a capo that moves", () => {
    expect(
      gapTokens(
        rowOf([
          ["EADGBE capo 2", "alder"],
          ["EADGBE capo 5", "alder"],
        ]),
        "english",
      ),
    ).toEqual([{ kind: "capo", words: "capo to 5" }]);
  });

  test("notes follow the reader's naming", () => {
    const row = rowOf([
      ["EADGBE", "alder"],
      ["EADGA#E", "alder"],
    ]);
    const to = (naming: "english" | "german" | "fixed-do") =>
      gapTokens(row, naming).map((token) => token.kind === "string" && token.to);
    expect(to("english")).toEqual(["B♭"]);
    expect(to("german")).toEqual(["B"]);
    expect(to("fixed-do")).toEqual(["Si♭"]);
  });

  test("work at the side is the tech's", () => {
    const row = rowOf(
      [
        ["EADGBE", "alder"],
        ["DADGAD", "birch"],
        ["DADGBE", "alder"],
      ],
      { crew: "tech", times: defaultTimes.tech },
    );
    expect(gapSentence(row, "english")).toBe(
      "Change to Alder. String 6 down 2, to D. The tech does this at the side, once s0 is over. About 8 s, covered by the talk.",
    );
    expect(stageWords(row, "english")).toBe("");
  });
});

describe("work that a tech cannot finish in time", () => {
  // By hand: five strings down, 5 × 8 + (4 + 2 + 2 + 2 + 4 semitones) + check 5 = 59 s; s1 lasts 30 s, so 29 s are left.
  const songs = [
    song("s0", "EADGBE"),
    song("s1", "EADGBE", { seconds: 30 }),
    song("s2", "C2 G2 C3 G3 A3 C4"),
  ];
  const gig = gigOf(
    [
      [
        { song: "s0", guitar: "alder" },
        { song: "s1", guitar: "birch" },
        { song: "s2", guitar: "alder" },
      ],
    ],
    { crew: "tech", times: defaultTimes.tech },
  );
  const row = planGig(gig, repertoireOf(songs, [alder, birch])).sets[0]!.rows[2]!;

  test("says from when the tech works, what is done and what is left for the stage", () => {
    expect(gapSentence(row, "english")).toContain(
      "The tech does 30 s of this at the side, once s0 is over; 29 s are left for the stage. About 37 s, 25 s longer than the talk covers.",
    );
    expect(gapTokens(row, "english").at(-1)).toEqual({ kind: "tech", words: "late at the side" });
    expect(stageWords(row, "english")).toBe("5 down");
  });
});

describe("what the stage sheet says", () => {
  test("counts of strings, since the letters to tune to stand beside them", () => {
    expect(stageWords(capoOffOneDown, "english")).toBe("capo off, 1 down");
    expect(
      stageWords(
        rowOf([
          ["DGDGBD", "alder"],
          ["DADGAD", "alder"],
        ]),
        "english",
      ),
    ).toBe("1 down, 1 up");
  });

  test("a capo's strings stand beside its number, so the words name the fret alone", () => {
    expect(
      stageWords(
        rowOf([
          ["CGCFFC", "alder"],
          ["CGCFFC capo 3 leave 6", "alder"],
        ]),
        "english",
      ),
    ).toBe("capo on 3");
  });

  test("what the tuner reads where a string is retuned under a capo that stays", () => {
    expect(
      stageWords(
        rowOf([
          ["EADGBE capo 2", "alder"],
          ["DADGBE capo 2", "alder"],
        ]),
        "english",
      ),
    ).toBe("1 down, 6 reads E");
  });

  test("a capo that moves over retuned strings comes off first and goes on last, so that the tuner reads the letters", () => {
    expect(
      stageWords(
        rowOf([
          ["DADGAD capo 5", "alder"],
          ["DGDGBD capo 3", "alder"],
        ]),
        "english",
      ),
    ).toBe("capo off, 1 down, 1 up, capo on 3");
    expect(
      stageWords(
        rowOf([
          ["DADGAD capo 5 leave 6", "alder"],
          ["CADGAD capo 3 leave 6", "alder"],
        ]),
        "english",
      ),
    ).toBe("1 down, capo to 3");
    expect(
      stageWords(
        rowOf([
          ["EADGBE capo 2", "alder"],
          ["EADGBE capo 5", "alder"],
        ]),
        "english",
      ),
    ).toBe("capo to 5");
  });

  test("of two capos the one that goes is told by its fret", () => {
    expect(
      stageWords(
        rowOf([
          ["EADGBE capo 2 capo 4 on 5-3", "alder"],
          ["EADGBE capo 2", "alder"],
        ]),
        "english",
      ),
    ).toBe("capo off 4");
  });

  test("a string that a partial capo leaves reads as itself", () => {
    expect(
      stageWords(
        rowOf([
          ["EADGBE capo 3 leave 6", "alder"],
          ["DADGBE capo 3 leave 6", "alder"],
        ]),
        "english",
      ),
    ).toBe("1 down");
  });
});

describe("always", () => {
  const ways = [
    "EADGBE",
    "DADGAD",
    "DADGBE capo 2",
    "DADGBE capo 5",
    "CGCFFC capo 3 leave 6",
    "EADGBE capo 2 capo 4 on 5-3",
    "DGDGBD",
  ];
  const sets = fc.array(
    fc.tuple(fc.constantFrom(...ways), fc.constantFrom("alder" as const, "birch" as const)),
    { minLength: 2, maxLength: 10 },
  );

  test("words are never empty where there is work, tell every string, and hold no hole", () => {
    fc.assert(
      fc.property(sets, fc.constantFrom("alone" as const, "tech" as const), (picked, crew) => {
        const songs = picked.map(([way], index) => song(`s${index}`, way, { seconds: 40 }));
        const gig = gigOf([picked.map(([, on], index) => ({ song: `s${index}`, guitar: on }))], { crew });
        for (const row of planGig(gig, repertoireOf(songs, [alder, birch])).sets[0]!.rows) {
          const sentence = gapSentence(row, "english");
          const tokens = gapTokens(row, "english");
          expect(sentence + stageWords(row, "english")).not.toMatch(/undefined|NaN|null| {2}|,,|\.\./);
          if (!row.gap) {
            expect(sentence).toBe("");
            continue;
          }
          expect(sentence).toMatch(/^[A-Z].*\.$/);
          const strings = new Set(row.gap.work.flatMap((work) => work.strings.map((one) => one.string)));
          expect(new Set(tokens.flatMap((one) => (one.kind === "string" ? [one.string] : [])))).toEqual(
            strings,
          );
          for (const string of strings) expect(sentence).toContain(`String ${string} `);
          if (row.gap.swap) expect(tokens[0]?.kind).toBe("swap");
          const mine = row.gap.work.some((work) => work.by === "player");
          expect(stageWords(row, "english") !== "").toBe(mine);
          if (row.gap.work.length > 0) expect(tokens.length).toBeGreaterThan(0);
        }
      }),
      { seed: 19, numRuns: 200 },
    );
  });
});

describe("a capo that another guitar gives", () => {
  const one = [{ id: "k", name: "Steel", strings: null, count: 1 }];
  const ways: [string, "alder" | "birch"][] = [
    ["EADGBE capo 2", "alder"],
    ["DADGBE capo 4", "birch"],
    ["EADGBE", "birch"],
    ["EADGBE", "alder"],
    ["EADGBE capo 1", "alder"],
  ];
  const songs = ways.map(([way], index) => song(`s${index}`, way));

  function rowsWith(order: number[], changes: Parameters<typeof gigOf>[1] = {}): Row[] {
    const placed = order.map((index) => ({ song: `s${index}`, guitar: ways[index]![1] }));
    return planGig(gigOf([placed], changes), repertoireOf(songs, [alder, birch], one)).sets[0]!.rows;
  }

  test("of the guitar just played: the capo goes along", () => {
    const [, row] = rowsWith([0, 1]);
    // By hand: guitar 15, off 3, on 5, check 5 = 28; talk covers 12. Birch was prepared in drop D, without a capo.
    expect(gapSentence(row!, "english")).toBe(
      "Change to Birch. Take the capo off Alder. Capo on 4. About 28 s, 16 s longer than the talk covers.",
    );
    expect(gapTokens(row!, "english").map((token) => ("words" in token ? token.words : token.kind))).toEqual([
      "swap",
      "capo off Alder",
      "capo on 4",
    ]);
    expect(stageWords(row!, "english")).toBe("take the capo with you, capo on 4");
  });

  test("of a guitar that rests: from whom", () => {
    const rows = rowsWith([1, 3, 4]);
    expect(gapSentence(rows[2]!, "english")).toBe(
      "Take the capo off Birch. Capo on 1. About 13 s, 1 s longer than the talk covers.",
    );
    expect(stageWords(rows[2]!, "english")).toBe("capo from Birch, capo on 1");
  });

  test("with a tech: only what waits for the gap is the player's, the rest is ready", () => {
    const deep = [
      song("a", "EADGBE", { title: "Harrow" }),
      song("b", "EADGBE capo 2", { title: "Copper" }),
      song("c", "DADGAD capo 4", { title: "Slow Water" }),
    ];
    const gig = gigOf(
      [
        [
          { song: "a", guitar: "birch" },
          { song: "b", guitar: "alder" },
          { song: "c", guitar: "birch" },
        ],
      ],
      { crew: "tech", times: defaultTimes.tech },
    );
    const row = planGig(gig, repertoireOf(deep, [alder, birch], one)).sets[0]!.rows[2]!;
    expect(row.gap).toMatchObject({ late: false, restsAfter: "Harrow", givers: [{ justPlayed: true }] });
    // Three strings down 2 each and a check at the side: 3 × (8 + 2) + 5; off 3 and on 5 wait for the gap.
    expect(gapSentence(row, "english")).toContain(
      "The tech does 35 s of this at the side, once Harrow is over; 8 s are left for the stage.",
    );
    expect(gapTokens(row, "english").at(-1)).toEqual({ kind: "tech", words: "the rest at the side" });
    expect(stageWords(row, "english")).toBe("take the capo with you, capo on 4");
  });
});
