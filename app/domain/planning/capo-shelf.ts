/**
 * Where the capos of the scarce kinds are while a set is played. `carried` is read at `guitar × kinds + kind`;
 * `untouched` is how many of a kind have lain loose ever since the set began; `laidAside` ranks the guitars by when they
 * were last played, the longest ago lowest.
 */
export type CapoShelf = {
  counts: Int32Array;
  carried: Int32Array;
  untouched: Int32Array;
  laidAside: Int32Array;
};

/** A shelf before the set, when no guitar carries anything. */
export function emptyShelf(counts: readonly number[], guitars: number): CapoShelf {
  return {
    counts: Int32Array.from(counts),
    carried: new Int32Array(guitars * counts.length),
    untouched: Int32Array.from(counts),
    laidAside: new Int32Array(guitars),
  };
}

/**
 * Prepares a guitar before the set with what its first song needs, as far as there are capos that nobody has touched since.
 *
 * @param needs how many capos of each kind the song needs
 */
export function prepareGuitar(shelf: CapoShelf, guitar: number, needs: ArrayLike<number>): void {
  const kinds = shelf.counts.length;
  for (let kind = 0; kind < kinds; kind += 1) {
    const given = Math.min(needs[kind]!, shelf.untouched[kind]!);
    shelf.untouched[kind]! -= given;
    shelf.carried[guitar * kinds + kind] = given;
  }
}

function giverOf({ counts, carried, laidAside }: CapoShelf, guitar: number, kind: number): number {
  let giver = -1;
  for (let other = 0; other < laidAside.length; other += 1) {
    if (other === guitar || carried[other * counts.length + kind] === 0) continue;
    if (giver === -1 || laidAside[other]! < laidAside[giver]!) giver = other;
  }
  return giver;
}

function carriedByAll({ counts, carried, laidAside }: CapoShelf, kind: number): number {
  let sum = 0;
  for (let guitar = 0; guitar < laidAside.length; guitar += 1) sum += carried[guitar * counts.length + kind]!;
  return sum;
}

/**
 * Gives a guitar the capos that a song needs, from what it carries, what lies loose and, where that is not enough, from the
 * resting guitar that was laid aside first. What it no longer needs becomes loose.
 *
 * @param taken is told the kind and the guitar of every capo that is taken from another
 */
export function putCaposOn(
  shelf: CapoShelf,
  guitar: number,
  needs: ArrayLike<number>,
  taken: (kind: number, from: number) => void,
): void {
  const kinds = shelf.counts.length;
  for (let kind = 0; kind < kinds; kind += 1) {
    const cell = guitar * kinds + kind;
    const more = needs[kind]! - shelf.carried[cell]!;
    if (more > 0) {
      const loose = Math.max(0, shelf.counts[kind]! - carriedByAll(shelf, kind));
      const fromLoose = Math.min(more, loose);
      const handled = loose - shelf.untouched[kind]!;
      shelf.untouched[kind]! -= Math.max(0, fromLoose - handled);
      for (let left = more - fromLoose; left > 0; left -= 1) {
        const giver = giverOf(shelf, guitar, kind);
        if (giver === -1) break;
        shelf.carried[giver * kinds + kind]! -= 1;
        taken(kind, giver);
      }
    }
    shelf.carried[cell] = needs[kind]!;
  }
}
