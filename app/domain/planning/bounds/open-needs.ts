import type { SetLayout } from "#app/domain/planning/set-layout.ts";

/** Reads out of a state which of these sets of songs have one that is still to be played, as bits. */
export function openNeedsOf(sets: number[][], layout: SetLayout): (state: Int32Array) => number {
  const masks = sets.map((songs) => {
    const words = new Int32Array(layout.playedWords);
    for (const song of songs) words[song >>> 5]! |= 1 << (song & 31);
    return words;
  });
  return (state) => {
    let open = 0;
    for (let need = 0; need < masks.length; need += 1) {
      const words = masks[need]!;
      for (let word = 0; word < words.length; word += 1) {
        if ((words[word]! & ~state[layout.played + word]!) !== 0) {
          open |= 1 << need;
          break;
        }
      }
    }
    return open;
  };
}
