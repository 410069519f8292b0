import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { parseProblem } from "#app/domain/planning/problem.ts";
import { workedExample } from "#tests/support/planning-worked-example.ts";

/** The worked example with one thing changed; fields are reached as in plain JSON. */
function changed(change: (problem: unknown) => void): unknown {
  const copy = JSON.parse(JSON.stringify(workedExample));
  change(copy);
  return copy;
}

function found(input: unknown): string[] {
  const parsed = parseProblem(input);
  return parsed.ok ? [] : parsed.problems.map(({ code, path }) => `${code} ${path}`);
}

const inside = (value: unknown, ...path: (string | number)[]) =>
  path.reduce((at, key) => (at as Record<string | number, unknown>)[key], value);
const drop = (object: unknown, key: string) => {
  delete (object as Record<string, unknown>)[key];
};
const set = (object: unknown, key: string | number, value: unknown) => {
  (object as Record<string | number, unknown>)[key] = value;
};
const songs = (p: unknown) => inside(p, "songs") as unknown[];
const neck = (p: unknown) => inside(p, "songs", 0, "necks", 0);
const guitar = (p: unknown) => inside(p, "guitars", 0);
const capo = (p: unknown) => inside(p, "songs", 0, "necks", 0, "capos", 0);

/* One line for each thing that the contract refuses. */
const refusals: [string, (problem: unknown) => void, string][] = [
  ["unknown version", (p) => set(p, "version", 2), "unknown-value version"],
  ["unknown field", (p) => set(p, "tempo", 1), "unknown-field tempo"],
  ["unknown field of a song", (p) => set(songs(p)[1], "tempo", 1), "unknown-field songs[1].tempo"],
  ["unknown field of a rule list", (p) => set(inside(p, "rules"), "after", []), "unknown-field rules.after"],
  ["missing field", (p) => drop(p, "aim"), "missing-field aim"],
  ["missing weight", (p) => drop(inside(p, "aim"), "swaps"), "missing-field aim.swaps"],
  ["missing limit", (p) => drop(p, "maxMoved"), "missing-field maxMoved"],
  ["missing places", (p) => drop(inside(p, "rules"), "at"), "missing-field rules.at"],
  [
    "lowest above highest",
    (p) => set(inside(guitar(p), "lowest"), 2, 60),
    "range-reversed guitars[0].lowest[2]",
  ],
  [
    "a string twice in a capo",
    (p) => set(capo(p), "strings", [1, 2, 1]),
    "repeated-string songs[0].necks[0].capos[0].strings[2]",
  ],
  ["maxMoved not whole", (p) => set(p, "maxMoved", 1.5), "not-whole maxMoved"],
  ["maxMoved negative", (p) => set(p, "maxMoved", -1), "negative maxMoved"],
  ["section not whole", (p) => set(songs(p)[0], "section", 0.5), "not-whole songs[0].section"],
  ["place not whole", (p) => set(inside(p, "rules", "at"), "s1", 1.5), "not-whole rules.at.s1"],
  ["place not a number", (p) => set(inside(p, "rules", "at"), "s1", "1"), "wrong-type rules.at.s1"],
  ["song in the order that does not exist", (p) => set(inside(p, "order"), 1, "s3"), "unknown-id order[1]"],
  ["song missing from the order", (p) => set(p, "order", ["s1"]), "song-not-in-order order"],
  ["song twice in the order", (p) => set(p, "order", ["s1", "s2", "s1"]), "repeated-song order[2]"],
  ["song id twice", (p) => set(songs(p)[1], "id", "s1"), "repeated-id songs[1].id"],
  [
    "guitar id twice",
    (p) => set(p, "guitars", [guitar(p), structuredClone(guitar(p))]),
    "repeated-id guitars[1].id",
  ],
  ["unknown song with a place", (p) => set(inside(p, "rules", "at"), "s9", 1), "unknown-id rules.at.s9"],
  [
    "unknown song in a rule",
    (p) => set(inside(p, "rules"), "apart", [["s1", "s9"]]),
    "unknown-id rules.apart[0][1]",
  ],
  [
    "unknown guitar of a neck",
    (p) => set(neck(p), "guitars", ["b"]),
    "unknown-id songs[0].necks[0].guitars[0]",
  ],
  ["range of another length", (p) => set(guitar(p), "highest", [42, 47]), "wrong-length guitars[0].highest"],
  [
    "start of another length",
    (p) => set(guitar(p), "start", { open: [40], capos: [] }),
    "wrong-length guitars[0].start.open",
  ],
  [
    "the same capo twice",
    (p) =>
      set(neck(p), "capos", [
        { fret: 3, strings: [1, 2] },
        { fret: 3, strings: [2, 1] },
      ]),
    "repeated-capo songs[0].necks[0].capos[1]",
  ],
  ["capo without strings", (p) => set(capo(p), "strings", []), "empty songs[0].necks[0].capos[0].strings"],
  [
    "string that does not exist",
    (p) => set(capo(p), "strings", [7]),
    "unknown-string songs[0].necks[0].capos[0].strings[0]",
  ],
  ["fret below 1", (p) => set(capo(p), "fret", 0), "out-of-range songs[0].necks[0].capos[0].fret"],
  ["fret above 24", (p) => set(capo(p), "fret", 25), "out-of-range songs[0].necks[0].capos[0].fret"],
  ["negative time", (p) => set(inside(p, "times"), "swap", -1), "negative times.swap"],
  ["negative weight", (p) => set(inside(p, "aim"), "strings", -1), "negative aim.strings"],
  ["negative penalty", (p) => set(neck(p), "penalty", -1), "negative songs[0].necks[0].penalty"],
  ["negative length", (p) => set(songs(p)[0], "seconds", -1), "negative songs[0].seconds"],
  [
    "time that is not finite",
    (p) => set(inside(p, "times"), "swap", Number.POSITIVE_INFINITY),
    "wrong-type times.swap",
  ],
  ["pitch not whole", (p) => set(inside(neck(p), "open"), 0, 36.5), "out-of-range songs[0].necks[0].open[0]"],
  ["pitch above 127", (p) => set(inside(guitar(p), "highest"), 0, 128), "out-of-range guitars[0].highest[0]"],
  ["pitch below 0", (p) => set(inside(guitar(p), "lowest"), 0, -1), "out-of-range guitars[0].lowest[0]"],
  ["too many songs", (p) => set(p, "songs", Array(101).fill(songs(p)[0])), "too-many songs"],
  ["too many guitars", (p) => set(p, "guitars", Array(13).fill(guitar(p))), "too-many guitars"],
  ["too many strings", (p) => set(guitar(p), "strings", 13), "out-of-range guitars[0].strings"],
  ["too many necks", (p) => set(songs(p)[0], "necks", Array(13).fill(neck(p))), "too-many songs[0].necks"],
  [
    "three songs in a pair",
    (p) => set(inside(p, "rules"), "into", [["s1", "s2", "s1"]]),
    "wrong-length rules.into[0]",
  ],
  ["one song in a pair", (p) => set(inside(p, "rules"), "into", [["s1"]]), "wrong-length rules.into[0]"],
];

describe("refused as a bad problem", () => {
  test.each(refusals)("%s", (_, change, expected) => {
    const problems = found(changed(change));
    expect(problems).toContain(expected);
  });

  test("everything is listed at once, each with what to do", () => {
    const parsed = parseProblem(
      changed((p) => {
        set(p, "version", 2);
        set(inside(p, "order"), 0, "s9");
        set(capo(p), "fret", 99);
        set(inside(guitar(p), "lowest"), 0, 64);
      }),
    );
    if (parsed.ok) throw new Error("This problem is bad.");
    expect(parsed.problems.map(({ path }) => path).sort()).toEqual([
      "guitars[0].lowest[0]",
      "order",
      "order[0]",
      "songs[0].necks[0].capos[0].fret",
      "version",
    ]);
    for (const { message, remedy } of parsed.problems) {
      expect(message).toMatch(/^[A-Z].*\.$/);
      expect(remedy).toMatch(/^[A-Z].*\.$/);
    }
  });
});

test("what may be left out is filled in", () => {
  const parsed = parseProblem(
    changed((p) => {
      drop(inside(p, "times"), "check");
      drop(inside(p, "times"), "cover");
      drop(inside(p, "aim"), "exposed");
      drop(guitar(p), "keeps");
      drop(songs(p)[0], "cover");
    }),
  );
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problems));
  expect(parsed.problem.times).toMatchObject({ check: 0, cover: 0 });
  expect(parsed.problem.aim.exposed).toBe(0);
  expect(parsed.problem.guitars[0]!.keeps).toBe(false);
  expect(parsed.problem.songs.map(({ cover }) => cover)).toEqual([null, null]);
});

test("what only makes a set impossible is not refused", () => {
  const fine = [
    changed((p) => set(inside(p, "rules", "at"), "s1", 0)),
    changed((p) => set(inside(p, "rules", "at"), "s1", 99)),
    changed((p) => set(inside(p, "rules"), "before", [["s1", "s1"]])),
    changed((p) => set(neck(p), "open", [36])),
    changed((p) => set(songs(p)[0], "section", -3)),
    changed((p) => set(p, "guitars", [])),
  ];
  expect(fine.map((input) => found(input).filter((line) => !line.startsWith("unknown-string")))).toEqual(
    fine.map(() => []),
  );
});

describe("never throws", () => {
  test("on any JSON value", () => {
    fc.assert(
      fc.property(fc.jsonValue({ maxDepth: 6 }), (value) => {
        parseProblem(value);
      }),
      { numRuns: 1000 },
    );
  });

  test("on a problem with any value in any place", () => {
    const paths: (string | number)[][] = [];
    const walk = (value: unknown, path: (string | number)[]) => {
      paths.push(path);
      if (Array.isArray(value)) for (const [i, item] of value.entries()) walk(item, [...path, i]);
      else if (typeof value === "object" && value !== null)
        for (const [key, item] of Object.entries(value)) walk(item, [...path, key]);
    };
    walk(workedExample, []);
    const odd = fc.oneof(
      fc.jsonValue(),
      fc.constantFrom(Number.NaN, 1e308, -0, "__proto__", { toString: 1, valueOf: 2 }, [[]], [null]),
    );
    fc.assert(
      fc.property(fc.constantFrom(...paths), odd, fc.boolean(), (path, value, remove) => {
        const root = { problem: structuredClone(workedExample) as unknown };
        let holder: unknown = root;
        let last: string | number = "problem";
        for (const step of path) {
          holder = (holder as Record<string | number, unknown>)[last];
          last = step;
        }
        if (remove) delete (holder as Record<string | number, unknown>)[last];
        else set(holder, last, value);
        const parsed = parseProblem(root.problem);
        if (!parsed.ok) expect(parsed.problems.length).toBeGreaterThan(0);
      }),
      { numRuns: 3000 },
    );
  });

  test("on names that every object has", () => {
    const input = JSON.parse(
      JSON.stringify(workedExample).replaceAll('"s1"', '"__proto__"').replaceAll('"s2"', '"constructor"'),
    );
    const parsed = parseProblem(input);
    if (!parsed.ok) throw new Error(JSON.stringify(parsed.problems));
    expect(Object.entries(parsed.problem.rules.at)).toEqual([["__proto__", 1]]);
  });
});
