import type { Gig, GigSet, GigTimes, Rule } from "#app/domain/gig/gig.ts";
import { entriesOf } from "#app/domain/gig/order.ts";
import type { Gap, Giver, Row } from "#app/domain/gig/plan.ts";
import type { SetProblem } from "#app/domain/gig/set-problem.ts";
import { rowWarnings } from "#app/domain/gig/warnings.ts";
import { wishBreaches } from "#app/domain/gig/wish-words.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Work } from "#app/domain/planning/answer.ts";
import type { Evaluation } from "#app/domain/planning/evaluate.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

/** What gaps are told with: guitars by id, what work takes, and what entries are called. */
type GapLook = {
  guitars: ReadonlyMap<string, Guitar>;
  times: Pick<GigTimes, "capoOn" | "capoOff">;
  title: (entryId: string) => string;
};

/** The guitars that give capos in a gap, in the order in which they do. `played`: the one in hand until then. */
function giversOf(
  work: readonly Work[],
  guitars: ReadonlyMap<string, Guitar>,
  played: string | undefined,
): Giver[] {
  const counts = new Map<string, number>();
  for (const capo of work[0]?.capos ?? []) {
    const from = capo.action === "on" ? capo.takenFrom : undefined;
    if (from !== undefined) counts.set(from, (counts.get(from) ?? 0) + 1);
  }
  return [...counts].flatMap(([id, capos]) => {
    const guitar = guitars.get(id);
    return guitar ? [{ guitar, capos, justPlayed: id === played }] : [];
  });
}

/** Gaps by the entry they lead into. The extra one at the head, work on the first song's guitar, is none: there is no start. */
function gapsByEntry(evaluation: Evaluation, { guitars: known, times, title }: GapLook): Map<string, Gap> {
  const byEntry = new Map(evaluation.gaps.map((gap) => [gap.into, gap]));
  const guitars = new Map(evaluation.plays.map((play) => [play.song, play.guitar]));
  const lastOn = new Map<string, string>();
  const gaps = new Map<string, Gap>();
  evaluation.order.forEach((id, place) => {
    const gap = byEntry.get(id);
    const guitar = guitars.get(id) ?? "";
    const from = evaluation.order[place - 1];
    if (gap && from !== undefined) {
      const { swap, seconds, cover, exposed, work } = gap;
      const atSide = work.some((one) => one.by === "tech");
      const rested = lastOn.get(guitar);
      const restsAfter = atSide && rested !== undefined ? title(rested) : null;
      const givers = giversOf(work, known, guitars.get(from));
      const waits = givers.reduce((sum, one) => (one.justPlayed ? sum + one.capos : sum), 0);
      const onStage = work.find((one) => one.by === "player")?.seconds ?? 0;
      const late = atSide && onStage > waits * (times.capoOff + times.capoOn) + 1e-9;
      gaps.set(id, { fromEntryId: from, swap, seconds, cover, exposed, work, restsAfter, late, givers });
    }
    lastOn.set(guitar, id);
  });
  return gaps;
}

function rulesAbout(gig: Gig, entryId: string): Rule[] {
  return gig.rules.filter((rule) =>
    rule.kind === "at" ? rule.entry === entryId : rule.a === entryId || rule.b === entryId,
  );
}

function retunedStrings(guitar: Guitar | null, gap: Gap | null): boolean[] {
  if (!guitar) return [];
  const changed = new Set(
    gap?.work.flatMap((work) => (work.guitar === guitar.id ? work.strings.map((one) => one.string) : [])),
  );
  return Array.from({ length: guitar.strings }, (_, index) => changed.has(guitar.strings - index));
}

/** Where a plan looks things up by their ids, and how its reader names notes. */
export type Look = { gig: Gig; songs: Map<string, Song>; guitars: Map<string, Guitar>; naming: Naming };

/** Rows without their place on the clock, and for each the seconds between the song before and it. */
export function rowsOf(
  look: Look,
  set: GigSet,
  given: SetProblem,
  evaluation: Evaluation,
): { rows: Row[]; lengths: number[] } {
  const { gig, songs, guitars, naming } = look;
  const entries = entriesOf(gig, set.id);
  const titles = new Map(entries.map((entry) => [entry.id, songs.get(entry.songId)?.title]));
  const gaps = gapsByEntry(evaluation, {
    guitars,
    times: gig.times,
    title: (id) => titles.get(id) ?? "the song before",
  });
  const plays = new Map(given.plays.map((play) => [play.song, play]));
  const covers = new Map(given.problem.songs.map((song) => [song.id, song.cover]));
  const lengths: number[] = [];
  const rows = entries.map((entry, index): Row => {
    const song = songs.get(entry.songId) ?? null;
    const play = plays.get(entry.id);
    const guitar = (play && guitars.get(play.guitar)) ?? null;
    const neck = (play && given.necks.get(entry.id)?.[play.neck]) ?? null;
    const gap = gaps.get(entry.id) ?? null;
    const cover = covers.get(entry.id) ?? gig.times.cover;
    lengths.push(index === 0 ? 0 : Math.max(cover, gap?.seconds ?? 0));
    const row = {
      entry,
      song,
      number: index + 1,
      section: entry.section,
      guitar,
      neck,
      gap,
      left: given.left.get(entry.id) ?? null,
      startSecond: 0,
      retuned: retunedStrings(guitar, gap),
      wishes: [],
      rules: rulesAbout(gig, entry.id),
    };
    const ends = [entries[index - 1], entries[index + 1]].some((one) => one?.section !== entry.section);
    return { ...row, warnings: rowWarnings(row, { ends, into: gig.rules, naming }) };
  });
  const inPlan = rows.filter((row) => row.left === null);
  const broken = wishBreaches(evaluation.broken ?? [], gig.wishes, inPlan, naming);
  if (broken.length === 0) return { rows, lengths };
  const of = (id: string) => broken.flatMap((one) => (one.entryId === id ? [one.message] : []));
  return { rows: rows.map((row) => ({ ...row, wishes: of(row.entry.id) })), lengths };
}
