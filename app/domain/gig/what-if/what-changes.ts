import { entryTitles } from "#app/domain/gig/entry-titles.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { moveWords } from "#app/domain/gig/move-words.ts";
import type { Row, SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import { caposWords } from "#app/domain/music/capo.ts";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Naming } from "#app/domain/music/note-names.ts";

export type Title = (entryId: string) => string;

/** What a reader calls the entries of a set, those of a supposed gig first, those that it lost after. */
export function titlesOf(gigs: readonly Gig[], setId: string, repertoire: Repertoire): Title {
  const looks = gigs.map((gig) => ({
    ids: new Set(gig.entries.filter((entry) => entry.setId === setId).map((entry) => entry.id)),
    title: entryTitles(gig, setId, repertoire),
  }));
  return (id) => looks.find(({ ids }) => ids.has(id))?.title(id) ?? "A song";
}

const neckWords = ({ open, capos }: Neck, naming: Naming) =>
  `${compactTuning(open, naming)}, ${caposWords(capos, open.length)}`;

/** One line a song that was not in the set: where it comes, on which guitar and how. */
function comingOf(
  now: ReadonlyMap<string, Row>,
  after: readonly Row[],
  title: Title,
  naming: Naming,
): string[] {
  return after.flatMap(({ entry, guitar, neck }, index) => {
    if (now.has(entry.id) || !guitar || !neck) return [];
    const before = after[index - 1];
    const where = before ? `after ${title(before.entry.id)}` : "first";
    return [`${title(entry.id)} ${where}, on ${guitar.shortName} in ${neckWords(neck, naming)}`];
  });
}

/** One line a guitar with the songs that come to it. */
function guitarsOf(now: ReadonlyMap<string, Row>, after: readonly Row[], title: Title): string[] {
  const taken = new Map<string, string[]>();
  for (const row of after) {
    const was = now.get(row.entry.id);
    if (!row.guitar || !was || was.guitar?.id === row.guitar.id) continue;
    const songs = taken.get(row.guitar.shortName) ?? [];
    taken.set(row.guitar.shortName, [...songs, title(row.entry.id)]);
  }
  return [...taken].map(([name, songs]) => `To ${name}: ${songs.join(", ")}`);
}

/** One line a song that is played another way. */
function waysOf(
  now: ReadonlyMap<string, Row>,
  after: readonly Row[],
  title: Title,
  naming: Naming,
): string[] {
  return after.flatMap(({ entry, neck }) => {
    const was = now.get(entry.id)?.neck;
    if (!neck || !was || was.id === neck.id) return [];
    return [`${title(entry.id)} in ${neckWords(neck, naming)}`];
  });
}

/**
 * What is done otherwise in one set than now, in words: songs that come, that move, that go to another guitar, that are
 * played another way. Songs that go are the question's own to tell.
 * @example changeWords(before, after, titles, "english") // ["Slow Water before Stonecrop", "To Birch: Lamps"]
 */
export function changeWords(
  before: Pick<SetPlan, "rows">,
  after: Pick<SetPlan, "rows">,
  title: Title,
  naming: Naming,
): string[] {
  const now = new Map(before.rows.map((row) => [row.entry.id, row]));
  return [
    ...comingOf(now, after.rows, title, naming),
    ...moveWords(
      before.rows.map(({ entry }) => entry.id),
      after.rows.map(({ entry, section }) => ({ id: entry.id, section })),
      title,
    ),
    ...guitarsOf(now, after.rows, title),
    ...waysOf(now, after.rows, title, naming),
  ];
}

/**
 * Titles of songs that no guitar can play any more.
 * @example nowUnplayable(before, after, titles) // ["The Weighbridge"]
 */
export function nowUnplayable(
  before: readonly Pick<Row, "entry" | "left">[],
  after: readonly Pick<Row, "entry" | "left">[],
  title: Title,
): string[] {
  const was = new Set(before.filter((row) => row.left !== null).map((row) => row.entry.id));
  return after.filter((row) => row.left !== null && !was.has(row.entry.id)).map((row) => title(row.entry.id));
}

/** Warnings about strings under strain that stand in a plan and not in the one before it. */
export function newStrain(before: readonly SetPlan[], after: readonly SetPlan[]): boolean {
  const strained = (sets: readonly SetPlan[]) =>
    sets.flatMap(({ rows }) =>
      rows.flatMap((row) =>
        row.warnings.some((one) => one.code === "plain-raised") ? [`${row.entry.id} ${row.guitar?.id}`] : [],
      ),
    );
  const known = new Set(strained(before));
  return strained(after).some((one) => !known.has(one));
}
