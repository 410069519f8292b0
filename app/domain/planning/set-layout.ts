import { type Model, UNUSED } from "#app/domain/planning/model.ts";

/** The value of `current` and `last` where there is none. */
export const NOBODY = -1;

/**
 * Where each part of a half-built set stands in a row of whole numbers: the tech's free seconds of each guitar (two words,
 * one floating-point number, each), the songs played (a bit each), the neck of each guitar, the guitar in hand, the last
 * song as long as a rule about it is open, and where only some songs may move: how far the present order has been
 * followed and how many songs have left it.
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
  const width = limited ? kept + 2 : kept;
  return {
    width,
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
  };
}

/** The state before the first song: every guitar with its start, or free to be prepared. */
export function startState(model: Model, layout: SetLayout): Int32Array {
  const state = new Int32Array(layout.width);
  for (let guitar = 0; guitar < model.guitars; guitar += 1)
    state[layout.necks + guitar] = model.start[guitar] ?? UNUSED;
  state[layout.current] = NOBODY;
  state[layout.last] = NOBODY;
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
