import type { Neck } from "#app/domain/music/neck.ts";
import type { Work } from "#app/domain/planning/answer.ts";
import { kindOf, withoutCapo } from "#app/domain/planning/capo-kinds.ts";
import { type Evaluation, evaluate } from "#app/domain/planning/evaluate.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** Puts what some work leaves behind into the necks: the guitar as its song needs it, others without what it took. */
function leave(necks: Map<string, Neck>, guitar: string, neck: Neck, work: readonly Work[]): void {
  for (const capo of work.find((one) => one.guitar === guitar)?.capos ?? []) {
    const giver = capo.action === "on" ? capo.takenFrom : undefined;
    const was = giver === undefined ? undefined : necks.get(giver);
    if (giver !== undefined && was) necks.set(giver, withoutCapo(was, kindOf(capo.strings)));
  }
  necks.set(guitar, neck);
}

/**
 * How each guitar that a set uses stands once the songs before a place have been played: as it was last used or prepared,
 * and changed already where a tech is quite ready with it. Work that a tech has only begun counts as not begun.
 * @param place index in the order, 0 for how they stand before the set
 * @example necksBefore(problem, evaluation, 2).get("alder") // { open: [38, 45, 50, 55, 57, 62], capos: [] }
 */
export function necksBefore(
  problem: Problem,
  { order, plays, before }: Pick<Evaluation, "order" | "plays" | "before">,
  place: number,
): Map<string, Neck> {
  const played = new Set(order.slice(0, place));
  const stopped = evaluate(
    {
      ...problem,
      songs: problem.songs.map((song) => (played.has(song.id) ? song : { ...song, seconds: 0 })),
    },
    [...order],
    [...plays],
  );
  const gaps = new Map(stopped.gaps.map((gap) => [gap.into, gap]));
  const choices = new Map(plays.map((play) => [play.song, play]));
  const songs = new Map(problem.songs.map((song) => [song.id, song]));
  const necks = new Map(before.map(({ guitar, open, capos }) => [guitar, { open, capos }]));
  const ahead = new Set<string>();
  order.forEach((id, index) => {
    const play = choices.get(id)!;
    const { open, capos } = songs.get(id)!.necks[play.neck]!;
    const work = gaps.get(id)?.work.filter((one) => one.guitar === play.guitar) ?? [];
    const ready = work.length > 0 && work.every((one) => one.by === "tech") && !ahead.has(play.guitar);
    if (index < place || ready) leave(necks, play.guitar, { open, capos }, work);
    if (index >= place) ahead.add(play.guitar);
  });
  return necks;
}
