import { defaultAim } from "#app/domain/planning/aim.ts";
import type {
  Aim,
  NeckChoice,
  Problem,
  ProblemGuitar,
  ProblemSong,
  Rules,
} from "#app/domain/planning/problem.ts";

/** A repeatable stream of numbers in [0, 1): mulberry32, public domain (Tommy Ettinger, 2017). */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

export type RandomSize = {
  songs: number;
  guitars: number;
  necks: number;
  rules: "none" | "light" | "heavy";
  crew?: "alone" | "tech";
  maxMoved?: number | null;
  /** Songs of 150 to 300 seconds, so that a tech is never late. */
  longSongs?: boolean;
  /** Usual times and weights, one string count, no odd starts: what a player's set looks like. */
  realistic?: boolean;
  kept?: boolean;
};

const tunings = [
  [40, 45, 50, 55, 59, 64],
  [38, 45, 50, 55, 59, 64],
  [38, 45, 50, 55, 57, 62],
  [38, 43, 50, 55, 59, 62],
  [36, 43, 48, 55, 60, 64],
  [38, 45, 50, 54, 57, 62],
  [36, 43, 48, 53, 53, 60],
  [39, 44, 49, 54, 58, 63],
];
const covers = [
  [1, 2, 3, 4, 5, 6],
  [1, 2, 3, 4, 5],
  [2, 3, 4],
  [3, 4, 5],
];
const aims: Aim[] = [
  defaultAim,
  { exposed: 0, seconds: 1, strings: 0, semitones: 0, capoActions: 0, swaps: 0 },
  { exposed: 1, seconds: 0, strings: 0, semitones: 0, capoActions: 0, swaps: 0 },
  { exposed: 1, seconds: 0, strings: 20, semitones: 1, capoActions: 2, swaps: 3 },
  { exposed: 0.5, seconds: 1.25, strings: 0.1, semitones: 0.3, capoActions: 0, swaps: 40 },
];

/** A problem made up from a stream of numbers: the same stream, the same problem. */
export function randomProblem(random: () => number, size: RandomSize): Problem {
  const below = (count: number) => Math.floor(random() * count);
  const pick = <T>(items: T[]): T => items[below(items.length)]!;
  const maybe = (share: number) => random() < share;

  const capos = () => {
    const first = { fret: 1 + below(7), strings: [...pick(covers)] };
    if (maybe(0.45)) return [];
    const second = { fret: 1 + below(7), strings: [...pick(covers)] };
    const same = second.fret === first.fret && second.strings.join() === first.strings.join();
    return maybe(0.25) && !same ? [first, second] : [first];
  };
  const pool = Array.from({ length: size.necks }, () => ({ open: [...pick(tunings)], capos: capos() }));
  const copy = (neck: (typeof pool)[number]) => structuredClone(neck);

  const guitars = Array.from({ length: size.guitars }, (_, i): ProblemGuitar => {
    const plain = size.realistic && i === 0;
    const wide = maybe(0.7) || plain;
    return {
      id: String.fromCharCode(97 + i),
      strings: 6,
      lowest: wide ? [34, 39, 44, 49, 53, 58] : [38, 41, 46, 51, 55, 60],
      highest: wide ? [42, 47, 52, 57, 61, 66] : [42, 47, 52, 57, 61, 66],
      start: !size.realistic && maybe(0.25) ? copy(pick(pool)) : null,
      keeps: size.kept !== false && !plain && maybe(size.realistic ? 0.2 : 0.15),
    };
  });
  const encore = size.songs - (size.realistic ? below(3) : 2);
  const songs = Array.from({ length: size.songs }, (_, i): ProblemSong => {
    const way = (penalty: number): NeckChoice => ({
      ...copy(pick(pool)),
      guitars: maybe(0.15) ? [(size.realistic ? guitars[0]! : pick(guitars)).id] : null,
      penalty,
    });
    const second = maybe(0.2) ? [way(below(30))] : [];
    return {
      id: `s${i + 1}`,
      seconds: size.longSongs ? 150 + below(150) : below(120),
      section: size.rules === "none" ? 0 : Number(i >= encore && (size.realistic || maybe(0.6))),
      cover: maybe(0.75) ? null : below(4) * 15,
      necks: [way(0), ...second],
    };
  });
  const ids = songs.map(({ id }) => id);
  const maxMoved = size.maxMoved === undefined ? pick([null, null, 0, 1, 2, 3]) : size.maxMoved;
  const order = [...ids];
  const shuffles = size.realistic ? (maxMoved ?? 3) : order.length;
  for (let i = 0; i < shuffles; i += 1)
    order.splice(below(order.length), 0, ...order.splice(below(order.length), 1));
  const crew = size.crew ?? pick(["alone", "tech"] as const);
  return {
    version: 1,
    crew,
    times: {
      string: size.realistic ? 8 : 6 + below(7),
      semitone: size.realistic ? 1 : below(3),
      capoMove: size.realistic ? 6 : 4,
      capoOn: 5,
      capoOff: 3,
      swap: size.realistic ? (crew === "tech" ? 8 : 15) : pick([0, 7, 12, 20]),
      check: size.realistic ? 5 : pick([0, 5]),
      cover: size.realistic ? 12 : pick([0, 12, 25]),
    },
    aim: size.realistic ? { ...defaultAim } : { ...pick(aims) },
    guitars,
    songs,
    order,
    rules: rulesFor(ids, size, below, maybe),
    maxMoved,
  };
}

/** Rules at random; where the set is to be realistic, such as the order of the songs' numbers keeps. */
function rulesFor(
  ids: string[],
  size: RandomSize,
  below: (count: number) => number,
  maybe: (share: number) => boolean,
): Rules {
  const rules: Rules = { at: {}, before: [], into: [], apart: [] };
  if (size.rules === "none" || ids.length < 2) return rules;
  const pair = (gap: (places: number) => [number, number]): [string, string] => {
    const a = below(ids.length);
    const b = (a + 1 + below(ids.length - 1)) % ids.length;
    const [i, k] = size.realistic ? gap(ids.length) : [a, b];
    return [ids[i]!, ids[k]!];
  };
  const inOrder =
    (least: number) =>
    (places: number): [number, number] => {
      const i = below(places - least);
      return [i, i + least + below(places - i - least)];
    };
  const neighbours = (places: number): [number, number] => {
    const i = below(places - 1);
    return [i, i + 1];
  };
  const times = size.rules === "heavy" ? Math.max(1, Math.floor(ids.length / 5)) : 1;
  if (maybe(0.5)) rules.at[ids[size.realistic ? 0 : below(ids.length)]!] = 1;
  if (maybe(0.5)) rules.at[ids[ids.length - 1]!] ??= -1;
  if (size.rules === "heavy" && maybe(0.3)) {
    const i = below(ids.length);
    rules.at[ids[i]!] ??= 1 + (size.realistic ? i : below(ids.length));
  }
  for (let i = 0; i < times; i += 1) {
    if (maybe(0.6)) rules.before.push(pair(inOrder(1)));
    if (maybe(0.5)) rules.into.push(pair(neighbours));
    if (maybe(0.4) && ids.length > 3) rules.apart.push(pair(inOrder(2)));
  }
  return rules;
}
