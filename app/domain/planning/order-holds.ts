import type { OrderRules } from "#app/domain/planning/order-rules.ts";

/**
 * A test whether an order of song numbers keeps all rules and moves no more songs than may move, for use on very many
 * orders.
 */
export function orderTest(rules: OrderRules, maxMoved: number | null): (songs: Int32Array) => boolean {
  const count = rules.next.length;
  const place = new Int32Array(count);
  const tails = new Int32Array(count);

  function withinLimit(songs: Int32Array): boolean {
    let length = 0;
    for (let i = 0; i < count; i += 1) {
      const song = songs[i]!;
      let at = length;
      while (at > 0 && tails[at - 1]! > song) at -= 1;
      tails[at] = song;
      if (at === length) length += 1;
    }
    return count - length <= maxMoved!;
  }

  return (songs) => {
    for (let i = 0; i < count; i += 1) {
      const song = songs[i]!;
      if (i < rules.earliest[song]! || i > rules.latest[song]!) return false;
      place[song] = i;
    }
    for (let song = 0; song < count; song += 1) {
      const at = place[song]!;
      if (rules.next[song] !== -1 && place[rules.next[song]!] !== at + 1) return false;
      for (const other of rules.predecessors[song]!) if (place[other]! > at) return false;
      for (const other of rules.apart[song]!) if (Math.abs(place[other]! - at) === 1) return false;
    }
    return maxMoved === null || withinLimit(songs);
  };
}
