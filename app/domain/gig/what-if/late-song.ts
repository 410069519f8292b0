import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Entry, Gig, GigSet, Section } from "#app/domain/gig/gig.ts";
import { entriesOf, lastRank, placeEdits, setsOf } from "#app/domain/gig/order.ts";
import { type GigPlan, planGig } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { setProblem } from "#app/domain/gig/set-problem.ts";
import { type Needs, needsOf } from "#app/domain/gig/what-if/needs.ts";
import type { Supposed } from "#app/domain/gig/what-if/supposed.ts";
import { canPlay } from "#app/domain/gig/why-left.ts";
import { evaluate } from "#app/domain/planning/evaluate.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song, SongNeck } from "#app/domain/repertoire/song.ts";

/** One place for a song that is added, on the guitar and in the way that cost least there. */
export type LatePlace = {
  setId: string;
  section: Section;
  /** 0 first, inside its section. */
  index: number;
  guitar: Guitar;
  neck: SongNeck;
  /** What the whole gig needs then, everything else as it is. */
  needs: Needs;
  supposed: Supposed;
};

type Place = Pick<LatePlace, "setId" | "section" | "index">;

/** Places in a set where a song may come without taking one that is held: a first song stays first, and a last one last. */
function placesIn(set: GigSet, entries: readonly Entry[]): Place[] {
  const main = entries.filter((entry) => entry.section === 0).length;
  const encore = entries.length - main;
  const ends = encore > 0 ? 1 : 0;
  const places: Place[] = [];
  for (const section of encore > 0 ? ([0, 1] as const) : ([0] as const)) {
    const songs = section === 0 ? main : encore;
    for (let index = 0; index <= songs; index += 1) {
      const opens = index === 0 && songs > 0 && (section === 1 || set.holdFirst);
      const closes = index === songs && songs > 0 && section === ends && set.holdLast;
      if (!opens && !closes) places.push({ setId: set.id, section, index });
    }
  }
  return places;
}

/** The edits that add an entry at a place: one, where ranks allow. */
function addingEdits(gig: Gig, entry: Entry, place: Place): Edit[] {
  const last = { ...entry, setId: place.setId, section: place.section };
  const standing = { ...last, rank: lastRank(gig, place.setId, place.section) };
  const moves = placeEdits({ entries: [...gig.entries, standing] }, entry.id, place);
  const own = moves.findLast((edit) => edit.kind === "entry.place" && edit.entryId === entry.id);
  const others = moves.filter((edit) => edit !== own);
  const rank = own?.kind === "entry.place" ? own.rank : standing.rank;
  return [...others, { kind: "entry.add", entry: { ...standing, rank } }];
}

/** What a set costs as it stands, rules aside. */
function setTotal(gig: Gig, setId: string, repertoire: Repertoire): number {
  const { problem, plays } = setProblem(gig, setId, repertoire);
  return evaluate(problem, problem.order, plays).total;
}

type Way = { guitar: Guitar; neck: SongNeck };

/** A song at a place in the way that costs least there, everything else as it is; null where that cannot be. */
function leastAt(
  gig: Gig,
  repertoire: Repertoire,
  { entry, ways, place }: { entry: Entry; ways: readonly Way[]; place: Place },
): { way: Way; gig: Gig; edits: Edit[] } | null {
  let best: { way: Way; gig: Gig; edits: Edit[]; total: number } | null = null;
  for (const way of ways) {
    const edits = addingEdits(gig, { ...entry, guitarId: way.guitar.id, neckId: way.neck.id }, place);
    const applied = applyEdits(gig, edits);
    if (!applied.ok) continue;
    const total = setTotal(applied.gig, place.setId, repertoire);
    if (!best || total < best.total) best = { way, gig: applied.gig, edits, total };
  }
  return best;
}

/**
 * Every place at which a song may be added to a gig, the best first; the other songs stay as they are, on their guitars.
 * Held songs stay first and last, and no rule is broken that holds now. Empty where no guitar can play the song.
 * @param entryId the id that its entry is to have
 * @example latePlaces(gig, plan, repertoire, { song, entryId: "e9" })[0]?.index // 3
 */
export function latePlaces(
  gig: Gig,
  plan: GigPlan,
  repertoire: Repertoire,
  { song, entryId }: { song: Song; entryId: string },
): LatePlace[] {
  const ways = song.necks.flatMap((neck) =>
    repertoire.guitars.filter((guitar) => canPlay(guitar, neck)).map((guitar) => ({ guitar, neck })),
  );
  const entry: Entry = {
    id: entryId,
    songId: song.id,
    setId: "",
    section: 0,
    rank: "",
    guitarId: null,
    neckId: null,
    pinned: "none",
    cover: null,
    techNote: "",
  };
  const broken = (of: GigPlan) => of.sets.reduce((sum, set) => sum + set.breaches.length, 0);
  const places = setsOf(gig).flatMap((set) => placesIn(set, entriesOf(gig, set.id)));
  return places
    .flatMap((place): LatePlace[] => {
      const best = leastAt(gig, repertoire, { entry, ways, place });
      if (!best) return [];
      const then = planGig(best.gig, repertoire);
      if (broken(then) > broken(plan)) return [];
      const supposed = { gig: best.gig, repertoire, edits: best.edits, setIds: [place.setId] };
      return [{ ...place, ...best.way, needs: needsOf(then.sets), supposed }];
    })
    .toSorted((a, b) => a.needs.total - b.needs.total);
}
