import { generateKeyBetween, generateNKeysBetween } from "fractional-indexing";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Entry, Gig, GigSet, Rule, Section } from "#app/domain/gig/gig.ts";
import { longestRising } from "#app/domain/gig/longest-rising.ts";

type Ranked = { id: string; rank: string };

/** A rank longer than this is a sign of many moves into one spot: the section's ranks are then written anew. */
const longestRank = 40;

function byRank(a: Ranked, b: Ranked): number {
  if (a.rank !== b.rank) return a.rank < b.rank ? -1 : 1;
  return a.id < b.id ? -1 : a.id > b.id ? 1 : 0;
}

/**
 * The sets of a gig in the order in which they are played.
 * @example setsOf(gig).map((set) => set.name) // ["Set 1", "Set 2"]
 */
export function setsOf(gig: Pick<Gig, "sets">): GigSet[] {
  return gig.sets.toSorted(byRank);
}

/**
 * The songs of a set in their order: main section, then encore; inside a section by rank, equal ranks by id.
 * @example entriesOf(gig, "set1").map((entry) => entry.songId) // ["harbour", "waltz"]
 */
export function entriesOf(gig: Pick<Gig, "entries">, setId: string): Entry[] {
  return gig.entries
    .filter((entry) => entry.setId === setId)
    .sort((a, b) => a.section - b.section || byRank(a, b));
}

/**
 * A rank between two neighbours; null for none on that side.
 * @example rankBetween(null, null) // "a0"
 * @throws Error where the two stand in the wrong order or are equal
 */
export function rankBetween(before: string | null, after: string | null): string {
  if (before !== null && after !== null && before >= after) {
    throw new Error(`There is no rank between ${before} and ${after}.`);
  }
  return generateKeyBetween(before, after);
}

/**
 * The rank that puts a new song last in a section of a set.
 * @example lastRank({ entries: [] }, "set1", 0) // "a0"
 */
export function lastRank(gig: Pick<Gig, "entries">, setId: string, section: Section): string {
  const last = entriesOf(gig, setId).findLast((entry) => entry.section === section);
  return rankBetween(last?.rank ?? null, null);
}

/**
 * Ranks for several new songs after the last of a section, in their order.
 * @example lastRanks({ entries: [] }, "set1", 0, 2) // ["a0", "a1"]
 */
export function lastRanks(
  gig: Pick<Gig, "entries">,
  setId: string,
  section: Section,
  count: number,
): string[] {
  const last = entriesOf(gig, setId).findLast((entry) => entry.section === section);
  return generateNKeysBetween(last?.rank ?? null, null, count);
}

/** Whether fractional-indexing can put something beside this rank. */
export function isRank(text: string): boolean {
  try {
    generateKeyBetween(text, null);
    return true;
  } catch {
    return false;
  }
}

/**
 * The edits that put an entry at an index (0 first) among the other songs of a section: one as a rule, none where it
 * stands there already, more where equal ranks of neighbours must be told apart.
 * @example placeEdits(gig, "e3", { setId: "set1", section: 0, index: 0 })
 *   // [{ kind: "entry.place", entryId: "e3", setId: "set1", section: 0, rank: "Zz" }]
 * @throws Error where the gig has no such entry
 */
export function placeEdits(
  gig: Pick<Gig, "entries">,
  entryId: string,
  to: { setId: string; section: Section; index: number },
): Edit[] {
  const entry = gig.entries.find((one) => one.id === entryId);
  if (!entry) throw new Error(`There is no entry ${entryId} in this gig.`);
  const { setId, section } = to;
  const now = entriesOf(gig, setId).filter((one) => one.section === section);
  const others = now.filter((one) => one.id !== entryId);
  const index = Math.max(0, Math.min(to.index, others.length));
  if (now[index]?.id === entryId) return [];
  const before = others[index - 1]?.rank ?? null;
  const after = others[index]?.rank ?? null;
  if (before === null || after === null || before < after) {
    const rank = rankBetween(before, after);
    if (rank.length <= longestRank) return [{ kind: "entry.place", entryId, setId, section, rank }];
    return placesFor(others.toSpliced(index, 0, entry), [], setId, section);
  }
  return placesFor(others.toSpliced(index, 0, entry), others, setId, section);
}

/**
 * The edits that put a set's songs into a new order. Songs stay in their sections, and songs that `order` does not
 * name keep their places. Only songs outside a longest common subsequence of the two orders get a new rank.
 * @example reorderEdits(gig, "set1", ["e2", "e1"]).length // 1
 * @throws Error where `order` names a song twice, or one that is not in the set
 */
export function reorderEdits(gig: Pick<Gig, "entries">, setId: string, order: readonly string[]): Edit[] {
  const entries = entriesOf(gig, setId);
  const byId = new Map(entries.map((entry) => [entry.id, entry]));
  const named = new Set(order);
  if (named.size !== order.length) throw new Error("An order names each entry once.");
  for (const id of order) if (!byId.has(id)) throw new Error(`There is no entry ${id} in set ${setId}.`);
  const sections = [...new Set(entries.map((entry) => entry.section))];
  return sections.flatMap((section) => {
    const now = entries.filter((entry) => entry.section === section);
    const wanted = order.map((id) => byId.get(id)!).filter((entry) => entry.section === section);
    let taken = 0;
    const next = now.map((entry) => (named.has(entry.id) ? wanted[taken++]! : entry));
    if (next.every((entry, index) => entry.id === now[index]!.id)) return [];
    return placesFor(next, now, setId, section);
  });
}

/** Ranks for songs in a wanted order; as many as can of those in `keepable` keep theirs. */
function placesFor(
  wanted: readonly Entry[],
  keepable: readonly Entry[],
  setId: string,
  section: Section,
): Edit[] {
  const may = new Set(keepable.map((entry) => entry.id));
  const candidates = wanted.filter((entry) => may.has(entry.id));
  const kept = new Set(
    longestRising(candidates.map((entry) => entry.rank)).map((index) => candidates[index]!.id),
  );
  const edits: Edit[] = [];
  let before: string | null = null;
  let run: Entry[] = [];
  const place = (after: string | null) => {
    const ranks = generateNKeysBetween(before, after, run.length);
    run.forEach((entry, index) => {
      edits.push({
        kind: "entry.place",
        entryId: entry.id,
        setId,
        section,
        rank: ranks[index]!,
      });
    });
    run = [];
  };
  for (const entry of wanted) {
    if (!kept.has(entry.id)) {
      run.push(entry);
      continue;
    }
    place(entry.rank);
    before = entry.rank;
  }
  place(null);
  return edits;
}

/**
 * The id of a rule, made of its parts, so that two people who add the same rule add one. A song has one fixed place, so
 * the place is not part of it. Songs that are to stand apart are named in either order.
 * @example ruleId("into", "e1", "e2") // "into.e1.e2"
 * @example ruleId("at", "e1") // "at.e1"
 * @example ruleId("apart", "e2", "e1") // "apart.e1.e2"
 */
export function ruleId(kind: Rule["kind"], a: string, b?: string): string {
  const parts = b === undefined ? [a] : kind === "apart" && b < a ? [b, a] : [a, b];
  return [kind, ...parts].join(".");
}

/**
 * The id that this rule must have.
 * @example idOfRule({ id: "", kind: "at", entry: "e1", place: 1 }) // "at.e1"
 */
export function idOfRule(rule: Rule): string {
  return rule.kind === "at" ? ruleId("at", rule.entry) : ruleId(rule.kind, rule.a, rule.b);
}
