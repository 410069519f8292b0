import type { Neck } from "#app/domain/music/neck.ts";
import { caposOn, scarceKinds, withoutCapo } from "#app/domain/planning/capo-kinds.ts";
import { emptyShelf, prepareGuitar, putCaposOn } from "#app/domain/planning/capo-shelf.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** A capo that one guitar gives another: its kind, and the number of the guitar that gives it. */
export type Taken = { kind: string; from: number };

/** How a guitar stands before a song, and which capos others have to give for it. `null`: it is ready for the song. */
export type Handed = { from: Neck | null; taken: Taken[] };

/**
 * Follows the necks of all guitars through a set, song by song. Where capos are scarce a guitar may be found with fewer than
 * it was left with.
 *
 * @returns what is called for each song with the number of its guitar and the neck it needs
 */
export function followNecks(problem: Problem): (guitar: number, to: Neck) => Handed {
  const necks: (Neck | null)[] = problem.guitars.map(({ start }) => start);
  const kinds = scarceKinds(problem);
  if (kinds.length === 0) {
    return (guitar, to) => {
      const from = necks[guitar]!;
      necks[guitar] = to;
      return { from, taken: [] };
    };
  }
  const counts = kinds.map(({ count }) => count);
  const shelf = emptyShelf(counts, necks.length);
  const needsOf = (neck: Neck) => {
    const on = caposOn(neck);
    return kinds.map(({ kind }) => on.get(kind) ?? 0);
  };
  for (const [guitar, neck] of necks.entries()) if (neck) prepareGuitar(shelf, guitar, needsOf(neck));
  let songs = 0;
  return (guitar, to) => {
    songs += 1;
    const needs = needsOf(to);
    let from = necks[guitar]!;
    if (from === null) {
      prepareGuitar(shelf, guitar, needs);
      const missing = needs.map((need, kind) => need - shelf.carried[guitar * kinds.length + kind]!);
      if (missing.some((count) => count > 0))
        from = missing.reduce<Neck>((neck, count, kind) => {
          let bare = neck;
          for (let i = 0; i < count; i += 1) bare = withoutCapo(bare, kinds[kind]!.kind);
          return bare;
        }, to);
    }
    const taken: Taken[] = [];
    putCaposOn(shelf, guitar, needs, (kind, giver) => {
      taken.push({ kind: kinds[kind]!.kind, from: giver });
      necks[giver] = withoutCapo(necks[giver]!, kinds[kind]!.kind);
    });
    shelf.laidAside[guitar] = songs;
    necks[guitar] = to;
    return { from, taken };
  };
}
