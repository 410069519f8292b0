/**
 * How many songs left their place: those outside a longest common subsequence of the two orders. Both hold the same
 * songs, each once, so that subsequence is the longest rising run of present positions (patience sorting).
 *
 * @example movedSongs(["a", "b", "c"], ["b", "c", "a"]) // 1
 */
export function movedSongs(present: string[], order: string[]): number {
  const place = new Map(present.map((song, i) => [song, i]));
  const tails: number[] = [];
  for (const song of order) {
    const at = place.get(song)!;
    let low = 0;
    let high = tails.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (tails[middle]! < at) low = middle + 1;
      else high = middle;
    }
    tails[low] = at;
  }
  return order.length - tails.length;
}
