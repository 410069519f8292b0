import type { GigWish } from "#app/domain/gig/gig.ts";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import { nameKey } from "#app/domain/music/key.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { nameTuning } from "#app/domain/music/tuning-names.ts";
import type { BrokenWish } from "#app/domain/planning/answer.ts";
import { curveAt } from "#app/domain/planning/wishes.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

type Told = { entry: { id: string }; song: Song | null; guitar: Guitar | null; neck: Neck | null };

/** A row is silent about less than a whole step from the energy curve; it counts all the same. */
const silent = 1;

function ordinal(count: number): string {
  const teen = count % 100 > 10 && count % 100 < 14;
  return `${count}${teen ? "th" : (["th", "st", "nd", "rd"][count % 10] ?? "th")}`;
}

function tuningWords({ neck, guitar }: Told, naming: Naming): string {
  if (!neck) return "one tuning";
  return (guitar && nameTuning(neck.open, guitar.usual, naming)) ?? compactTuning(neck.open, naming);
}

const tenth = (value: number) => String(Math.round(value * 10) / 10);

/** What is broken, told about the last of the songs it concerns; null where a row is silent about it. */
function brokenWords(
  wish: GigWish,
  songs: readonly Told[],
  { place, of, naming }: { place: number; of: number; naming: Naming },
): string | null {
  const last = songs.at(-1)!;
  const before = songs.at(-2)?.song?.title ?? "the song before";
  switch (wish.kind) {
    case "tuning-run":
      return `${ordinal(songs.length)} song in a row in ${tuningWords(last, naming)}`;
    case "slow-apart":
      return `Slow song right after ${before}, also slow`;
    case "key-apart":
      return `In ${nameKey(last.song?.key ?? "", naming)}, as ${before} right before it`;
    case "energy": {
      const asked = curveAt(wish.curve, place, of);
      const energy = last.song?.energy ?? asked;
      const quiet = Math.abs(energy - asked) < silent;
      return quiet ? null : `Energy ${energy} where the curve asks for ${tenth(asked)}`;
    }
  }
}

/**
 * Wishes that an order breaks, with titles, tunings and keys, as the rows say them.
 * @param rows those that are in the plan, in their order
 * @example wishBreaches(evaluation.broken, gig.wishes, rows, "english")
 *   // [{ entryId: "e4", message: "4th song in a row in DADGAD, counts as 20 s." }]
 */
export function wishBreaches(
  broken: readonly BrokenWish[],
  wishes: readonly GigWish[],
  rows: readonly Told[],
  naming: Naming,
): { entryId: string; message: string }[] {
  const places = new Map(rows.map((row, place) => [row.entry.id, place]));
  return broken.flatMap(({ wish: number, songs, seconds }) => {
    const wish = wishes[number];
    const told = songs.flatMap((id) => rows[places.get(id) ?? -1] ?? []);
    const entryId = told.at(-1)?.entry.id;
    if (!wish || entryId === undefined) return [];
    const what = brokenWords(wish, told, { place: places.get(entryId) ?? 0, of: rows.length, naming });
    return what === null
      ? []
      : [{ entryId, message: `${what}, counts as ${Math.max(1, Math.round(seconds))} s.` }];
  });
}

/**
 * A wish in words, as settings and conflicts tell it.
 * @example wishWords({ kind: "tuning-run", most: 3, seconds: 20 })
 *   // "at most 3 songs in a row in one tuning (20 s)"
 */
export function wishWords(wish: GigWish): string {
  const seconds = `(${wish.seconds} s)`;
  switch (wish.kind) {
    case "tuning-run":
      return `at most ${wish.most} ${wish.most === 1 ? "song" : "songs"} in a row in one tuning ${seconds}`;
    case "slow-apart":
      return `no two songs below ${wish.below} beats a minute together ${seconds}`;
    case "key-apart":
      return `the same key not twice in a row ${seconds}`;
    case "energy":
      return `energy follows ${wish.curve.map(tenth).join(", ")} ${seconds}`;
  }
}
