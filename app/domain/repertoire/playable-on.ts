import type { Naming } from "#app/domain/music/note-names.ts";
import { playable } from "#app/domain/music/range.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import type { SongNeck } from "#app/domain/repertoire/song.ts";

/** The guitars that can play a song one way, and why the others cannot. */
export type PlayableOn<G> = {
  can: G[];
  cannot: { guitar: G; reason: string }[];
};

/**
 * Which guitars a way to play a song can be had on: those it is kept to, of these those with as many strings whose
 * range reaches every pitch.
 * @example playableOn({ open: [38, 45, 50, 55, 59, 64], capos: [], guitars: null }, [cedar]).can // [cedar]
 */
export function playableOn<G extends Pick<Guitar, "id" | "lowest" | "highest">>(
  way: Pick<SongNeck, "open" | "capos" | "guitars">,
  guitars: readonly G[],
  naming: Naming,
): PlayableOn<G> {
  const answer: PlayableOn<G> = { can: [], cannot: [] };
  for (const guitar of guitars) {
    const reach = playable(way, guitar, naming);
    if (way.guitars !== null && !way.guitars.includes(guitar.id)) {
      answer.cannot.push({ guitar, reason: "not ticked for this choice" });
    } else if (reach.ok) answer.can.push(guitar);
    else
      answer.cannot.push({
        guitar,
        reason: reach.reasons.map(({ message }) => message).join("; "),
      });
  }
  return answer;
}
