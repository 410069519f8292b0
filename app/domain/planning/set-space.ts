import type { Model, Option } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import type { Space } from "#app/domain/planning/search/space.ts";
import { isPlayed, NOBODY, type SetLayout, setLayout, startState } from "#app/domain/planning/set-layout.ts";
import { setStep } from "#app/domain/planning/set-step.ts";
import { elderTwins, sortTwins, twinGuitars } from "#app/domain/planning/twins.ts";
import { wishesAbout } from "#app/domain/planning/wish-tables.ts";

/** A lower bound on what the rest of a half-built set costs. */
export type SetBound = (state: Int32Array, depth: number) => number;

export type SetSpace = Space & {
  model: Model;
  rules: OrderRules;
  layout: SetLayout;
  /** What a way's moves mean: songs in order, and the option of each. */
  planOf(moves: number[]): { songs: number[]; options: Option[] };
};

/**
 * Sets that are built from the first song on: a state is what matters of the songs played so far, a move plays one more
 * song in one of its ways.
 *
 * @param closerOf a bound that takes longer, for states that are about to be expanded
 */
export function setSpace(
  model: Model,
  rules: OrderRules,
  boundOf: (layout: SetLayout) => SetBound,
  closerOf?: (layout: SetLayout) => SetBound,
): SetSpace {
  const layout = setLayout(model);
  const songs = model.songs;
  const most = Math.max(1, ...model.options.map((options) => options.length));
  const elder = layout.limited ? new Int32Array(songs).fill(-1) : elderTwins(model, rules);
  const groups = twinGuitars(model);
  const fixedAt = new Int32Array(songs).fill(NOBODY);
  for (let song = 0; song < songs; song += 1)
    if (rules.earliest[song] === rules.latest[song]) fixedAt[rules.earliest[song]!] = song;
  const maxMoved = model.problem.maxMoved ?? songs;

  const step = setStep(model, layout);

  function mayFollow(state: Int32Array, depth: number, song: number, last: number): boolean {
    if (fixedAt[depth] !== NOBODY && fixedAt[depth] !== song) return false;
    if (isPlayed(layout, state, song) || depth < rules.earliest[song]! || depth > rules.latest[song]!)
      return false;
    if (rules.previous[song]! !== -1 && rules.previous[song] !== last) return false;
    if (elder[song]! !== -1 && !isPlayed(layout, state, elder[song]!)) return false;
    if (last !== NOBODY && rules.apart[last]!.includes(song)) return false;
    return rules.predecessors[song]!.every((other) => isPlayed(layout, state, other));
  }

  function lastMatters(state: Int32Array, song: number): boolean {
    if (rules.next[song] !== -1 || rules.apart[song]!.some((other) => !isPlayed(layout, state, other)))
      return true;
    return (
      model.wishes !== null && wishesAbout(model.wishes, song, (other) => !isPlayed(layout, state, other))
    );
  }

  /** Songs from `from` to `to` of the present order that have not been played: they are left behind. */
  function leftBehind(state: Int32Array, from: number, to: number): number {
    let count = 0;
    for (let song = from; song < to; song += 1) if (!isPlayed(layout, state, song)) count += 1;
    return count;
  }

  function play(
    state: Int32Array,
    depth: number,
    song: number,
    kept: number,
    moved: number,
    leaves: boolean,
    child: Int32Array,
    emit: (cost: number, move: number) => void,
  ): void {
    for (const [i, option] of model.options[song]!.entries()) {
      const cost = step(state, depth, song, option, child);
      if (cost === Number.POSITIVE_INFINITY) continue;
      child[layout.last] = lastMatters(child, song) ? song : NOBODY;
      if (layout.limited) {
        child[layout.kept] = kept;
        child[layout.moved] = moved;
      }
      for (const group of groups) sortTwins(child, layout, group);
      emit(cost, (song * most + i) * 2 + (leaves ? 1 : 0));
    }
  }

  function follow(
    state: Int32Array,
    depth: number,
    song: number,
    child: Int32Array,
    emit: (cost: number, move: number) => void,
  ): void {
    if (!layout.limited) {
      play(state, depth, song, 0, 0, false, child, emit);
      return;
    }
    const kept = state[layout.kept]!;
    const moved = state[layout.moved]!;
    if (song < kept) {
      play(state, depth, song, kept, moved, true, child, emit);
      return;
    }
    const skipped = moved + leftBehind(state, kept, song);
    if (skipped <= maxMoved) play(state, depth, song, song + 1, skipped, false, child, emit);
    if (song > kept && moved + 1 <= maxMoved) play(state, depth, song, kept, moved + 1, true, child, emit);
  }

  function expand(
    state: Int32Array,
    depth: number,
    child: Int32Array,
    emit: (cost: number, move: number) => void,
  ): void {
    const last = state[layout.last]!;
    const forced = last !== NOBODY && rules.next[last] !== -1 ? rules.next[last]! : fixedAt[depth]!;
    if (forced !== NOBODY) {
      if (mayFollow(state, depth, forced, last)) follow(state, depth, forced, child, emit);
      return;
    }
    for (let song = 0; song < songs; song += 1)
      if (mayFollow(state, depth, song, last)) follow(state, depth, song, child, emit);
  }

  function planOf(moves: number[]) {
    const owner = Int32Array.from({ length: model.guitars }, (_, guitar) => guitar);
    const row = startState(model, layout);
    const child = new Int32Array(layout.width);
    const plan = { songs: [] as number[], options: [] as Option[] };
    for (const [depth, move] of moves.entries()) {
      const way = Math.floor(move / 2);
      const song = Math.floor(way / most);
      const slot = model.options[song]![way % most]!;
      plan.songs.push(song);
      plan.options.push(
        model.options[song]!.find(
          (option) =>
            option.guitar === owner[slot.guitar] &&
            option.neck === slot.neck &&
            option.penalty === slot.penalty,
        )!,
      );
      step(row, depth, song, slot, child);
      for (const group of groups) sortTwins(child, layout, group, owner);
      row.set(child);
    }
    return plan;
  }

  return {
    model,
    rules,
    layout,
    width: layout.width,
    depth: songs,
    start: startState(model, layout),
    expand,
    bound: boundOf(layout),
    ...(closerOf ? { closer: closerOf(layout) } : {}),
    planOf,
  };
}
