import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { entriesOf, placeEdits } from "#app/domain/gig/order.ts";
import { type GigPlan, planGig } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { type Needs, needsOf } from "#app/domain/gig/what-if/needs.ts";
import { type Candidate, type Coming, setChanges } from "#app/domain/gig/what-if/set-exchange.ts";
import { type SongScores, songScores } from "#app/domain/gig/what-if/song-scores.ts";
import type { Supposed } from "#app/domain/gig/what-if/supposed.ts";

/** One song that goes to another set, or two that change places between sets. */
export type SetChange = {
  /** The songs, each with the name of the set that it goes to. */
  goes: { entryId: string; title: string; to: string }[];
  /** What all sets need then, other songs as they are. */
  needs: Needs;
  supposed: Supposed;
};

/** As many changes are offered. */
const offered = 5;

/** So many of the best are weighed again with what is wished of the sets, which the scores leave out. */
const weighedWithWishes = 60;

/** Before which song of its new set a song comes, as an index among all that stand in the main part there. */
function indexIn(gig: Gig, { plan, index }: Coming, leaving: ReadonlySet<string>): number {
  const follows = plan.problem.order.filter((id) => !leaving.has(id))[index];
  const standing = entriesOf(gig, plan.set.id).filter((entry) => entry.section === 0);
  const at = standing.findIndex((entry) => entry.id === follows);
  return at < 0 ? standing.length : at;
}

/** The guitar and way that a song takes, where it takes others than now. */
function choiceEdits(plan: GigPlan, scores: SongScores, entryId: string, way: number): Edit[] {
  const home = plan.sets.find((set) => set.problem.order.includes(entryId))!;
  const option = scores.options[scores.numberOf(entryId)]![way]!;
  const guitar = home.problem.guitars[option.guitar]!.id;
  const neck = home.necks.get(entryId)![option.choice]!.id;
  const now = home.rows.find((row) => row.entry.id === entryId)!;
  const chosen = { kind: "entry.set", entryId } as const;
  return [
    ...(now.entry.guitarId === guitar ? [] : [{ ...chosen, field: "guitarId", value: guitar } as const]),
    ...(now.entry.neckId === neck ? [] : [{ ...chosen, field: "neckId", value: neck } as const]),
  ];
}

/** The gig with the songs in their new sets; null where a set has no room. */
function moved(
  gig: Gig,
  plan: GigPlan,
  scores: SongScores,
  { comings }: Candidate,
): { gig: Gig; edits: Edit[]; ids: string[] } | null {
  const order = plan.sets.flatMap((set) => set.problem.order);
  const ids = comings.map((coming) => order.find((id) => scores.numberOf(id) === coming.song)!);
  const leaving = new Set(ids);
  const edits: Edit[] = [];
  let next = gig;
  for (const [at, coming] of comings.entries()) {
    const entryId = ids[at]!;
    const place = {
      setId: coming.plan.set.id,
      section: 0 as const,
      index: indexIn(next, coming, leaving),
    };
    const own = [...placeEdits(next, entryId, place), ...choiceEdits(plan, scores, entryId, coming.way)];
    const applied = applyEdits(next, own);
    if (!applied.ok) return null;
    edits.push(...own);
    next = applied.gig;
  }
  return { gig: next, edits, ids };
}

/** Whether no set is longer than it may be, and no rule is broken that holds now. */
function allowed(now: GigPlan, then: GigPlan, tolerance: number): boolean {
  return then.sets.every((set) => {
    const was = now.sets.find((one) => one.set.id === set.set.id)!;
    return set.seconds <= was.seconds + tolerance && set.breaches.length <= was.breaches.length;
  });
}

/**
 * The moves of one song to another set, and the exchanges of two, that need least; the best first. Exact over both, with
 * all other songs where and as they are. Where a gig has wishes they are found without them, and then the best of them
 * are weighed with the wishes.
 * @param tolerance seconds by which a set may become longer than it is now
 * @example betweenSets(gig, plan, repertoire, 300)[0].goes // [{ title: "Slow Water", to: "Set 2", … }]
 */
export function betweenSets(gig: Gig, plan: GigPlan, repertoire: Repertoire, tolerance: number): SetChange[] {
  if (plan.sets.length < 2) return [];
  const scores = songScores(plan.sets);
  const now = needsOf(plan.sets);
  const enough = gig.wishes.length > 0 ? weighedWithWishes : offered;
  const changes: SetChange[] = [];
  for (const candidate of setChanges(gig, plan, scores)) {
    if (changes.length === enough) break;
    const made = moved(gig, plan, scores, candidate);
    if (!made) continue;
    const then = planGig(made.gig, repertoire);
    const needs = needsOf(then.sets);
    if (needs.total >= now.total || !allowed(plan, then, tolerance)) continue;
    const titles = new Map(repertoire.songs.map((song) => [song.id, song.title]));
    const goes = made.ids.map((entryId, at) => ({
      entryId,
      title: titles.get(gig.entries.find((entry) => entry.id === entryId)?.songId ?? "") ?? "A song",
      to: candidate.comings[at]!.plan.set.name,
    }));
    const setIds = plan.sets
      .filter((set) => made.ids.some((id) => set.problem.order.includes(id)))
      .map((set) => set.set.id);
    const into = candidate.comings.map((coming) => coming.plan.set.id);
    changes.push({
      goes,
      needs,
      supposed: { gig: made.gig, repertoire, edits: made.edits, setIds: [...new Set([...setIds, ...into])] },
    });
  }
  return changes.toSorted((a, b) => a.needs.total - b.needs.total).slice(0, offered);
}
