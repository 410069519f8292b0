import { type Naming, stringNameWithOctave } from "#app/domain/music/note-names.ts";
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

/** More guitars than this are not told one by one. */
const mostTold = 4;

/**
 * The one string that no guitar with as many strings can take there, with how far each goes: "Needs string 6 at B1; Cedar
 * goes down to C2, Blonde to D2". Null where it is not the same string, lowest first, in the same direction.
 */
function oneString(guitars: readonly Guitar[], neck: SongNeck, naming: Naming): string | null {
  const alike = guitars.filter((guitar) => guitar.strings === neck.open.length);
  const allowed = alike.filter((guitar) => neck.guitars?.includes(guitar.id) ?? true);
  if (allowed.length === 0) return null;
  const name = (midi: number) => stringNameWithOctave(midi, naming);
  for (const [index, pitch] of neck.open.entries()) {
    for (const [limit, way] of [
      ["lowest", "down"],
      ["highest", "up"],
    ] as const) {
      const fails = (end: number) => (limit === "lowest" ? pitch < end : pitch > end);
      if (!allowed.every((guitar) => fails(guitar[limit][index]!))) continue;
      const told = allowed.slice(0, mostTold).map((guitar, at) => {
        const verb = at === 0 ? `goes ${way} to` : "to";
        return `${guitar.shortName} ${verb} ${name(guitar[limit][index]!)}`;
      });
      const rest = allowed.length > mostTold ? ", and so on" : "";
      return `Needs string ${neck.open.length - index} at ${name(pitch)}; ${told.join(", ")}${rest}.`;
    }
  }
  return null;
}

/**
 * Why no guitar of the act can play a song, in words with what each guitar lacks; null where one can.
 * @param guitars those that may be chosen: all of the act's, or the pinned one
 * @param pinned the entry is pinned to these guitars or ways
 * @example whyLeft(lowMeadow, [cedar, blonde], lowMeadow.necks)
 *   // "No guitar can play this. Needs string 6 at B1; Cedar goes down to C2, Blonde to D2."
 */
export function whyLeft(
  song: Song | undefined,
  guitars: readonly Guitar[],
  necks: readonly SongNeck[],
  naming: Naming = "english",
  pinned = false,
): string | null {
  if (!song) return "This song is no longer in the library. Remove it from the set.";
  if (guitars.length === 0) return "The act has no guitars yet. Add one under Guitars.";
  if (necks.length === 0) return "This song has no way to be played. Open it and add a tuning.";
  if (necks.some((neck) => guitars.some((guitar) => canPlay(guitar, neck)))) return null;
  const neck = necks[0]!;
  const reasons = guitars.map((guitar) => whyNot(guitar, neck, naming)).filter(Boolean);
  const why =
    oneString(guitars, neck, naming) ??
    `${reasons.slice(0, 3).join(". ")}${reasons.length > 3 ? ", and so on" : ""}.`;
  return pinned ? `As pinned, this cannot be played. ${why}` : `No guitar can play this. ${why}`;
}
