import type { Naming } from "#app/domain/music/note-names.ts";
import { playable } from "#app/domain/music/range.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { Song, SongNeck } from "#app/domain/repertoire/song.ts";

/** Whether a guitar may and can take a song this way. */
export function canPlay(guitar: Guitar, neck: SongNeck): boolean {
  return (
    (neck.guitars === null || neck.guitars.includes(guitar.id)) &&
    neck.open.length === guitar.strings &&
    neck.open.every((pitch, index) => pitch >= guitar.lowest[index]! && pitch <= guitar.highest[index]!)
  );
}

function whyNot(guitar: Guitar, neck: SongNeck, naming: Naming): string {
  if (neck.guitars !== null && !neck.guitars.includes(guitar.id))
    return `${guitar.shortName}: the song is kept to others`;
  const reading = playable(neck, guitar, naming);
  return reading.ok ? "" : `${guitar.shortName}: ${reading.reasons[0]?.message ?? "cannot take it"}`;
}

/**
 * Why no guitar of the act can play a song, in words with what each guitar lacks; null where one can.
 * @example whyLeft(undefined, [], null, "english") // "This song is no longer in the library. Remove it from the set, or restore it."
 */
export function whyLeft(
  song: Song | undefined,
  guitars: readonly Guitar[],
  necks: readonly SongNeck[],
  naming: Naming = "english",
): string | null {
  if (!song) return "This song is no longer in the library. Remove it from the set.";
  if (guitars.length === 0) return "The act has no guitars yet. Add one under Guitars.";
  if (necks.length === 0) return "This song has no way to be played. Open it and add a tuning.";
  if (necks.some((neck) => guitars.some((guitar) => canPlay(guitar, neck)))) return null;
  const neck = necks[0]!;
  const reasons = guitars.map((guitar) => whyNot(guitar, neck, naming)).filter(Boolean);
  return `No guitar can play this. ${reasons.slice(0, 3).join(". ")}${reasons.length > 3 ? ", and so on" : ""}.`;
}
