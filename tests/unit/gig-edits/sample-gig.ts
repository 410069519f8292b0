import fc from "fast-check";
import type { Edit, LoggedBatch } from "#app/domain/gig/edit.ts";
import {
  defaultTimes,
  type Entry,
  type Gig,
  type GigAim,
  type GigWish,
  type Rule,
} from "#app/domain/gig/gig.ts";
import { idOfRule } from "#app/domain/gig/order.ts";
import { defaultAim } from "#app/domain/planning/aim.ts";

export function entry(id: string, given: Partial<Entry> = {}): Entry {
  return {
    id,
    songId: `song-${id}`,
    setId: "s1",
    section: 0,
    rank: "a0",
    guitarId: null,
    neckId: null,
    pinned: "none",
    cover: null,
    techNote: "",
    ...given,
  };
}

/** Two sets: e1 to e4 in the first with e4 its encore, e5 and e6 in the second. */
export function sampleGig(given: Partial<Gig> = {}): Gig {
  return {
    id: "g1",
    revision: 0,
    name: "Spring evening",
    venue: "The Slipway",
    startsAt: "2027-07-02T19:30:00.000Z",
    zone: "Europe/Dublin",
    slot: 3600,
    curfew: null,
    crew: "alone",
    times: defaultTimes.alone,
    aim: { kind: "dead-air" },
    wishes: [],
    notes: "",
    sets: [
      { id: "s1", name: "Set 1", rank: "a0", interval: 0, holdFirst: true, holdLast: true },
      { id: "s2", name: "Set 2", rank: "a1", interval: 1200, holdFirst: true, holdLast: true },
    ],
    entries: [
      entry("e1", { rank: "a0" }),
      entry("e2", { rank: "a1" }),
      entry("e3", { rank: "a2" }),
      entry("e4", { section: 1 }),
      entry("e5", { setId: "s2", rank: "a0" }),
      entry("e6", { setId: "s2", rank: "a1" }),
    ],
    rules: [],
    ...given,
  };
}

/** The same gig whatever the order in which its parts are listed: only ranks say what comes first. */
export function normal(gig: Gig): Gig {
  const byId = (a: { id: string }, b: { id: string }) => (a.id < b.id ? -1 : 1);
  return {
    ...gig,
    sets: gig.sets.toSorted(byId),
    entries: gig.entries.toSorted(byId),
    rules: gig.rules.toSorted(byId),
  };
}

/** Freezes a value through and through, so that writing into it throws. */
export function frozen<Value>(value: Value): Value {
  if (typeof value === "object" && value !== null) {
    for (const part of Object.values(value)) frozen(part);
    Object.freeze(value);
  }
  return value;
}

export function logged(revision: number, edits: Edit[], given: Partial<LoggedBatch> = {}): LoggedBatch {
  return {
    id: `b${revision}`,
    client: "other-window",
    label: "",
    undoes: null,
    edits,
    inverse: [],
    revision,
    personId: "ivo",
    displayName: "Ivo Tarrant",
    ...given,
  };
}

const setIds = fc.constantFrom("s1", "s2", "s3");
const entryIds = fc.constantFrom("e1", "e2", "e3", "e4", "e5", "e6", "n1", "n2");
const ranks = fc.constantFrom("Zz", "a0", "a0V", "a1", "a1V", "a2", "a3");
const sections = fc.constantFrom(0 as const, 1 as const);
const guitars = fc.constantFrom(null, "alder", "birch");

const someWishes: GigWish[] = [
  { kind: "tuning-run", most: 3, seconds: 20 },
  { kind: "slow-apart", below: 80, seconds: 30 },
  { kind: "key-apart", seconds: 10 },
  { kind: "energy", curve: [3, 2, 4.5, 5], seconds: 4 },
];

const rule: fc.Arbitrary<Rule> = fc
  .tuple(
    fc.constantFrom("at", "before", "into", "apart"),
    fc.uniqueArray(entryIds, { minLength: 2, maxLength: 2 }),
    fc.constantFrom(1, 2, -1),
  )
  .map(([kind, [a, b], place]) => {
    const made = (kind === "at" ? { id: "", kind, entry: a, place } : { id: "", kind, a, b }) as Rule;
    return { ...made, id: idOfRule(made) };
  });

/** Any edit of the sample gig, one that fits or one that does not. */
export const anyEdit: fc.Arbitrary<Edit> = fc.oneof(
  fc.constantFrom("First", "Second").map((value): Edit => ({ kind: "gig.set", field: "name", value })),
  fc.constantFrom(null, 1800, 3600).map((value): Edit => ({ kind: "gig.set", field: "slot", value })),
  fc
    .constantFrom(defaultTimes.alone, defaultTimes.tech)
    .map((value): Edit => ({ kind: "gig.set", field: "times", value })),
  fc
    .constantFrom<GigAim>({ kind: "dead-air" }, { kind: "strings" }, { kind: "own", weights: defaultAim })
    .map((value): Edit => ({ kind: "gig.set", field: "aim", value })),
  fc.subarray(someWishes).map((value): Edit => ({ kind: "gig.set", field: "wishes", value })),
  fc.tuple(setIds, ranks, fc.constantFrom("Set 3", "Late")).map(
    ([id, rank, name]): Edit => ({
      kind: "set.add",
      set: { id, name, rank, interval: 600, holdFirst: true, holdLast: true },
    }),
  ),
  setIds.map((setId): Edit => ({ kind: "set.remove", setId })),
  fc
    .tuple(setIds, fc.constantFrom(0, 600))
    .map(([setId, value]): Edit => ({ kind: "set.set", setId, field: "interval", value })),
  fc.tuple(entryIds, setIds, sections, ranks).map(
    ([id, setId, section, rank]): Edit => ({
      kind: "entry.add",
      entry: entry(id, { setId, section, rank }),
    }),
  ),
  entryIds.map((entryId): Edit => ({ kind: "entry.remove", entryId })),
  fc
    .tuple(entryIds, setIds, sections, ranks)
    .map(([entryId, setId, section, rank]): Edit => ({ kind: "entry.place", entryId, setId, section, rank })),
  fc
    .tuple(entryIds, guitars)
    .map(([entryId, value]): Edit => ({ kind: "entry.set", entryId, field: "guitarId", value })),
  fc
    .tuple(entryIds, fc.constantFrom("none" as const, "both" as const))
    .map(([entryId, value]): Edit => ({ kind: "entry.set", entryId, field: "pinned", value })),
  rule.map((value): Edit => ({ kind: "rule.add", rule: value })),
  rule.map(({ id }): Edit => ({ kind: "rule.remove", ruleId: id })),
);
