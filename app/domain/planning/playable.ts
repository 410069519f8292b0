import type { Neck } from "#app/domain/music/neck.ts";
import type { NeckChoice, ProblemGuitar, ProblemSong, Times } from "#app/domain/planning/problem.ts";

/**
 * Seconds of the gap into a song that talk and applause fill anyway.
 *
 * @example coverInto({ cover: 12 }, { cover: null }) // 12
 */
export function coverInto(times: Pick<Times, "cover">, song: Pick<ProblemSong, "cover">): number {
  return song.cover ?? times.cover;
}

/**
 * Whether a guitar can be tuned to a neck: as many strings, and each open pitch within its string's range.
 * Which guitars a song names is another question, see `mayPlay`.
 *
 * @example fitsGuitar({ strings: 1, lowest: [38], highest: [42] }, { open: [40] }) // true
 */
export function fitsGuitar(
  guitar: Pick<ProblemGuitar, "strings" | "lowest" | "highest">,
  neck: Pick<Neck, "open">,
): boolean {
  return (
    neck.open.length === guitar.strings &&
    neck.open.every((pitch, i) => pitch >= guitar.lowest[i]! && pitch <= guitar.highest[i]!)
  );
}

/** Whether a song may be played in this way on this guitar: the song allows the guitar, and the neck fits it. */
export function mayPlay(guitar: ProblemGuitar, neck: NeckChoice): boolean {
  return (neck.guitars === null || neck.guitars.includes(guitar.id)) && fitsGuitar(guitar, neck);
}
