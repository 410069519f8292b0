import { certaintyWords } from "#app/domain/gig/certainty.ts";
import type { Edit } from "#app/domain/gig/edit.ts";
import { entryTitles } from "#app/domain/gig/entry-titles.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { Lead } from "#app/domain/gig/lead.ts";
import { leastChange } from "#app/domain/gig/least-change.ts";
import { moveWords, type Standing } from "#app/domain/gig/move-words.ts";
import { reorderEdits } from "#app/domain/gig/order.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Rung } from "#app/domain/gig/rungs.ts";
import { savedWords } from "#app/domain/gig/saved-words.ts";
import { caposWords } from "#app/domain/music/capo.ts";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Answer, FoundAnswer, Totals } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/**
 * The edits that make a set what an answer says: songs outside a longest common run get a new place, and songs whose
 * guitar or way changes get these. What is pinned was fixed in the problem, so it never changes.
 */
export function suggestionEdits(gig: Gig, plan: SetPlan, found: FoundAnswer): Edit[] {
  const answer = leastChange(plan.problem, plan.plays, found);
  const entries = new Map(gig.entries.map((entry) => [entry.id, entry]));
  const choices = answer.plays.flatMap(({ song, guitar, neck }): Edit[] => {
    const entry = entries.get(song);
    const neckId = plan.necks.get(song)?.[neck]?.id;
    if (!entry || neckId === undefined) return [];
    const edits: Edit[] = [];
    if (entry.guitarId !== guitar)
      edits.push({ kind: "entry.set", entryId: song, field: "guitarId", value: guitar });
    if (entry.neckId !== neckId)
      edits.push({ kind: "entry.set", entryId: song, field: "neckId", value: neckId });
    return edits;
  });
  return [...reorderEdits(gig, plan.set.id, answer.order), ...choices];
}

/** What a suggestion changes and gains, in words. */
export type Suggested = {
  totals: Totals;
  /** "34 s less", "2 strings fewer": against now, what leads first. */
  saved: string[];
  /** "Night Ploughing before Glasshouse", "Stonecrop, then Lamps to the end" */
  moves: string[];
  /** "To Birch: Salt on the Step, Stonecrop", "Low Meadow in DADGAD, no capo" */
  changes: string[];
  /** Which total is proven to be the least, or how much less may still be possible. */
  certainty: string;
};

function standingIn({ songs }: Problem, order: readonly string[]): Standing[] {
  const sections = new Map(songs.map((song) => [song.id, song.section]));
  return order.map((id) => ({ id, section: sections.get(id)! }));
}

/** What each song takes up instead: one line a guitar, one a song that is played another way. */
function changesOf(
  plan: SetPlan,
  answer: FoundAnswer,
  repertoire: Repertoire,
  title: (id: string) => string,
  naming: Naming,
): string[] {
  const now = new Map(plan.plays.map((play) => [play.song, play]));
  const changed = answer.plays.filter(({ song, guitar }) => now.get(song)?.guitar !== guitar);
  const toGuitars = repertoire.guitars.flatMap((guitar) => {
    const songs = changed.filter((play) => play.guitar === guitar.id).map((play) => title(play.song));
    return songs.length > 0 ? [`To ${guitar.shortName}: ${songs.join(", ")}`] : [];
  });
  const ways = answer.plays.flatMap(({ song, neck }) => {
    const way = plan.necks.get(song)?.[neck];
    if (now.get(song)?.neck === neck || !way) return [];
    return [
      `${title(song)} in ${compactTuning(way.open, naming)}, ${caposWords(way.capos, way.open.length)}`,
    ];
  });
  return [...toGuitars, ...ways];
}

/** Compares an answer with the set as it stands. */
export function describeSuggestion(
  gig: Gig,
  plan: SetPlan,
  {
    answer: found,
    rung,
    lead,
    repertoire,
    naming,
  }: { answer: FoundAnswer; rung: Rung; lead: Lead; repertoire: Repertoire; naming: Naming },
): Suggested {
  const title = entryTitles(gig, plan.set.id, repertoire);
  const answer = leastChange(plan.problem, plan.plays, found);
  return {
    totals: answer.totals,
    saved: savedWords(lead, plan.evaluation, answer),
    moves: moveWords(plan.problem.order, standingIn(plan.problem, answer.order), title),
    changes: changesOf(plan, answer, repertoire, title, naming),
    certainty: certaintyWords(plan.problem, answer, rung, lead),
  };
}

/** Whether an answer is an order at all. */
export function isFound(answer: Answer): answer is FoundAnswer {
  return answer.status !== "infeasible";
}
