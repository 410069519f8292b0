import { applyEdits } from "#app/domain/gig/apply-edit.ts";
import { coversOf } from "#app/domain/gig/cover.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { entriesOf, setsOf } from "#app/domain/gig/order.ts";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { straightInto } from "#app/domain/gig/set-rules.ts";
import { type Droppable, leastLoss } from "#app/domain/gig/what-if/drop-songs.ts";
import { songScores } from "#app/domain/gig/what-if/song-scores.ts";
import type { Supposed } from "#app/domain/gig/what-if/supposed.ts";
import { heldEntries } from "#app/domain/gig/what-if/wanted.ts";
import type { Aim } from "#app/domain/planning/problem.ts";

/** One choice of songs to drop. Seconds; `freed` are the songs with the talk before them. */
export type Drop = {
  entryIds: string[];
  titles: string[];
  freed: number;
  /** Dead air of the songs that stay, in their order, on their guitars. */
  exposed: number;
  supposed: Supposed;
};

export type ShorterSlot =
  | { kind: "fits"; spare: number }
  | { kind: "impossible"; asked: number }
  /** `asked`: seconds to be freed. `equal`: choices with the same loss; the best few stand in `drops`. */
  | { kind: "drop"; asked: number; equal: number; more: boolean; drops: Drop[] };

/** As many choices are offered. */
const offered = 4;

const deadAir: Aim = { exposed: 1, seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 };

/**
 * Songs with what dropping them frees: their length and the talk that introduces them. Applause before an encore stays
 * whoever opens it, and what leads straight into another frees no talk; nor does the first song of a set.
 */
function droppable(gig: Gig, repertoire: Repertoire): Droppable[] {
  const songs = new Map(repertoire.songs.map((song) => [song.id, song]));
  const held = heldEntries(gig);
  return setsOf(gig).flatMap((set) => {
    const entries = entriesOf(gig, set.id);
    const coverBefore = coversOf(gig, entries);
    const into = straightInto(gig, entries);
    return entries.flatMap((entry, index): Droppable[] => {
      const song = songs.get(entry.songId);
      if (!song) return [];
      const opens = index === 0 || entries[index - 1]!.section !== entry.section;
      const own = entry.cover ?? coverBefore(entry, song) ?? gig.times.cover;
      return [
        {
          id: entry.id,
          seconds: song.seconds + (opens || into.has(entry.id) ? 0 : own),
          priority: song.priority,
          wanted: held.has(entry.id) || entry.pinned !== "none",
        },
      ];
    });
  });
}

/** How much dead air a choice leaves, as things stand; for many choices at once. */
function deadAirWithout(plan: GigPlan): (dropped: ReadonlySet<string>) => number {
  const sets = plan.sets.filter((set) => set.problem.songs.length > 0);
  if (sets.length === 0) return () => 0;
  const { score, numberOf, ways } = songScores(sets, deadAir);
  return (dropped) =>
    sets.reduce((sum, set) => {
      const kept = set.problem.order.filter((id) => !dropped.has(id));
      return sum + score(kept.map(numberOf), ways);
    }, 0);
}

/**
 * Which songs to drop where the slot is cut: the choices of least loss by the players' own priorities, those with least
 * dead air first, then those that free least too much. With a slot, what does not fit into what is left of it has to go;
 * without one, so much of the gig as it is.
 * @param cut seconds
 * @example shorterSlot(gig, plan, repertoire, 600).kind // "drop"
 */
export function shorterSlot(gig: Gig, plan: GigPlan, repertoire: Repertoire, cut: number): ShorterSlot {
  const slot = gig.slot === null ? null : gig.slot - cut;
  const asked = slot === null ? cut : plan.clock.seconds - slot;
  if (asked <= 0) return { kind: "fits", spare: -asked };
  const songs = droppable(gig, repertoire);
  const found = leastLoss(songs, asked);
  if (!found || (slot !== null && slot < shortestSlot)) return { kind: "impossible", asked };
  const seconds = new Map(songs.map((song) => [song.id, song.seconds]));
  const left = deadAirWithout(plan);
  const ranked = found.choices
    .map((entryIds) => ({
      entryIds,
      freed: entryIds.reduce((sum, id) => sum + seconds.get(id)!, 0),
      exposed: left(new Set(entryIds)),
    }))
    .toSorted((a, b) => a.exposed - b.exposed || a.freed - b.freed);
  return {
    kind: "drop",
    asked,
    equal: found.choices.length,
    more: found.more,
    drops: ranked.slice(0, offered).map((drop) => ({ ...drop, ...dropped(gig, repertoire, drop, slot) })),
  };
}

/** Seconds: no gig has a shorter slot. */
const shortestSlot = 60;

function dropped(
  gig: Gig,
  repertoire: Repertoire,
  { entryIds }: Pick<Drop, "entryIds">,
  slot: number | null,
): Pick<Drop, "titles" | "supposed"> {
  const titles = new Map(repertoire.songs.map((song) => [song.id, song.title]));
  const entries = gig.entries.filter((entry) => entryIds.includes(entry.id));
  const edits: Edit[] = [
    ...entryIds.map((entryId): Edit => ({ kind: "entry.remove", entryId })),
    ...(slot === null ? [] : [{ kind: "gig.set", field: "slot", value: Math.round(slot) } as const]),
  ];
  const applied = applyEdits(gig, edits);
  if (!applied.ok) throw new Error(applied.conflict.message);
  return {
    titles: entryIds.map((id) => titles.get(entries.find((one) => one.id === id)?.songId ?? "") ?? "A song"),
    supposed: {
      gig: applied.gig,
      repertoire,
      edits,
      setIds: [...new Set(entries.map((entry) => entry.setId))],
    },
  };
}
