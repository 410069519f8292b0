import type { Reason } from "#app/domain/planning/answer.ts";
import type { Model } from "#app/domain/planning/model.ts";
import { UNUSED } from "#app/domain/planning/model.ts";

const MOST_TRIES = 20_000;

/*
 * A kept guitar has one tuning for the whole set, whatever the order: that of its start, or of its first song. So whether
 * kept guitars can do their part is a question of its own: is there a tuning for each of them so that every song has a
 * guitar that is not kept, or a kept one in the right tuning?
 */

type Way = { guitar: number; tuning: string };

/** The open pitches of a neck as one word. */
export const tuningOf = (model: Model, neck: number) => model.necks[neck]!.open.join();

/** The ways of a song on kept guitars; null where a guitar that may be retuned can play it. */
function keptWays(model: Model, song: number): Way[] | null {
  const options = model.options[song]!;
  if (options.some(({ guitar }) => !model.keeps[guitar])) return null;
  return options.map(({ guitar, neck }) => ({ guitar, tuning: tuningOf(model, neck) }));
}

/** A tuning for each kept guitar that serves all of these songs; null where there is none. */
function tuningsFor(model: Model, ways: Way[][]): Map<number, string> | "undecided" | null {
  let tries = 0;
  const fixed = new Map<number, string>();
  for (const [guitar, neck] of model.start.entries())
    if (model.keeps[guitar] && neck !== UNUSED) fixed.set(guitar, tuningOf(model, neck));
  const serves = ({ guitar, tuning }: Way) => fixed.get(guitar) === tuning;
  const place = (): boolean => {
    const open = ways
      .filter((song) => !song.some(serves))
      .map((song) => song.filter(({ guitar }) => !fixed.has(guitar)));
    if (open.length === 0) return true;
    const tightest = open.reduce((a, b) => (b.length < a.length ? b : a));
    for (const { guitar, tuning } of tightest) {
      tries += 1;
      if (tries > MOST_TRIES) return false;
      fixed.set(guitar, tuning);
      if (place()) return true;
      fixed.delete(guitar);
    }
    return false;
  };
  if (place()) return fixed;
  return tries > MOST_TRIES ? "undecided" : null;
}

/** Why the kept guitars cannot serve all songs, as a set of songs of which none can be left out; null where they can. */
export function keptConflict(model: Model): Reason | null {
  let songs = model.options.map((_, song) => song).filter((song) => keptWays(model, song) !== null);
  const impossible = (list: number[]) =>
    tuningsFor(
      model,
      list.map((song) => keptWays(model, song)!),
    ) === null;
  if (!impossible(songs)) return null;
  for (const song of [...songs]) {
    const without = songs.filter((other) => other !== song);
    if (impossible(without)) songs = without;
  }
  const ids = songs.map((song) => model.problem.order[song]!);
  const names = ids.map((id) => JSON.stringify(id)).join(", ");
  const message =
    ids.length === 1
      ? `${names} needs a guitar retuned that keeps its tuning during the set.`
      : `${names} need different tunings of guitars that keep theirs during the set.`;
  return { code: "keeps", songs: ids, message };
}

/**
 * The model without ways that would retune a kept guitar whatever is played before: those that its start rules out, and
 * those that rule out every way of some other song.
 */
export function withoutRetuningKept(model: Model): Model {
  let options = model.options;
  for (let changed = true; changed; ) {
    const before = options.reduce((sum, list) => sum + list.length, 0);
    const current = options;
    options = current.map((list) =>
      list.filter(({ guitar, neck }) => {
        if (!model.keeps[guitar]) return true;
        const tuning = tuningOf(model, neck);
        const start = model.start[guitar]!;
        if (start !== UNUSED && tuningOf(model, start) !== tuning) return false;
        return current.every((others) =>
          others.some((other) => other.guitar !== guitar || tuningOf(model, other.neck) === tuning),
        );
      }),
    );
    changed = options.reduce((sum, list) => sum + list.length, 0) < before;
  }
  return { ...model, options };
}
