import { type Model, UNUSED } from "#app/domain/planning/model.ts";

/** The value of `current` and `last` where there is none. */
export const NOBODY = -1;

/**
 * Where each part of a half-built set stands in a row of whole numbers: the tech's free seconds of each guitar (two words,
 * one floating-point number, each), the songs played (a bit each), the neck of each guitar, the guitar in hand, the last
 * song as long as a rule about it is open, and where only some songs may move: how far the present order has been
 * followed and how many songs have left it. Where capos are scarce, the order in which guitars were laid aside and the capos
 * that nobody touched yet; where songs in a row in one tuning count, how many there are. These stand last, so that a state
 * without them is the first part of a state with them.
 */
export type SetLayout = {
  width: number;
  free: number;
  freeCount: number;
  played: number;
  playedWords: number;
  necks: number;
  current: number;
  last: number;
  kept: number;
  moved: number;
  limited: boolean;
  laidAside: number;
  untouched: number;
  row: number;
  rowCount: number;
};

/** The layout of a model's states; parts that its problem does not need take no room. */
export function setLayout(model: Model): SetLayout {
  const { maxMoved } = model.problem;
  const limited = maxMoved !== null && maxMoved < model.songs - 1;
  const freeCount = model.mayBeLate ? model.guitars : 0;
  const playedWords = Math.max(1, Math.ceil(model.songs / 32));
  const played = freeCount * 2;
  const necks = played + playedWords;
  const current = necks + model.guitars;
  const last = current + 1;
  const kept = last + 1;
  const laidAside = limited ? kept + 2 : kept;
  const untouched = laidAside + (model.capos?.ordered ? model.guitars : 0);
  const row = untouched + (model.capos?.kinds ?? 0);
  const rowCount = (model.wishes?.runs.length ?? 0) > 0 ? 1 : 0;
  return {
    width: row + rowCount,
    free: 0,
    freeCount,
    played,
    playedWords,
    necks,
    current,
    last,
    kept,
    moved: kept + 1,
    limited,
    laidAside,
    untouched,
    row,
    rowCount,
  };
}

/** The state before the first song: every guitar with its start, or free to be prepared. */
export function startState(model: Model, layout: SetLayout): Int32Array {
  const state = new Int32Array(layout.width);
  for (let guitar = 0; guitar < model.guitars; guitar += 1)
    state[layout.necks + guitar] = model.start[guitar] ?? UNUSED;
  state[layout.current] = NOBODY;
  state[layout.last] = NOBODY;
  if (model.capos) {
    const { kinds, counts, carried } = model.capos;
    for (let kind = 0; kind < kinds; kind += 1) {
      const onStarts = model.start.reduce(
        (sum, neck) => (neck === UNUSED ? sum : sum + carried[neck * kinds + kind]!),
        0,
      );
      state[layout.untouched + kind] = counts[kind]! - onStarts;
    }
  }
  return state;
}

export function isPlayed(layout: SetLayout, state: Int32Array, song: number): boolean {
  return ((state[layout.played + (song >>> 5)]! >>> (song & 31)) & 1) === 1;
}

export function markPlayed(layout: SetLayout, state: Int32Array, song: number): void {
  state[layout.played + (song >>> 5)]! |= 1 << (song & 31);
}

const number = new Float64Array(1);
const words = new Int32Array(number.buffer);

/** Reads the free seconds of every guitar out of a state. */
export function readFree(layout: SetLayout, state: Int32Array, free: Float64Array): void {
  for (let guitar = 0; guitar < layout.freeCount; guitar += 1) {
    words[0] = state[layout.free + guitar * 2]!;
    words[1] = state[layout.free + guitar * 2 + 1]!;
    free[guitar] = number[0]!;
  }
}

/** Writes the free seconds of every guitar into a state. */
export function writeFree(layout: SetLayout, state: Int32Array, free: Float64Array): void {
  for (let guitar = 0; guitar < layout.freeCount; guitar += 1) {
    number[0] = free[guitar]!;
    state[layout.free + guitar * 2] = words[0]!;
    state[layout.free + guitar * 2 + 1] = words[1]!;
  }
}
