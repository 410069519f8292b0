import type { Reason } from "#app/domain/planning/answer.ts";
import {
  narrow,
  propagateWindows,
  sectionWindows,
  type Windows,
} from "#app/domain/planning/order-windows.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

/** Song numbers are those of the model: places in the present order. Positions count from 0. */
export type OrderRules = {
  /** First and last position at which a song may stand, as far as sections, `at` and what comes before tell. */
  earliest: Int32Array;
  latest: Int32Array;
  /** Songs that must have been played before this one: all of `before` and `into`, chained. */
  predecessors: number[][];
  /** The song that must follow directly, or -1; and the one that must stand directly before. */
  next: Int32Array;
  previous: Int32Array;
  /** Songs that may not stand next to this one. */
  apart: number[][];
};

export type CompiledRules = { ok: true; rules: OrderRules } | { ok: false; why: Reason[] };

type Draft = OrderRules & Windows & { problem: Problem; why: Reason[] };

function refuse(draft: Draft, songs: number[], message: string): void {
  const ids = [...new Set(songs)].map((song) => draft.problem.order[song]!);
  draft.why.push({ code: "rules", songs: ids, message });
}

const quoted = (draft: Draft, song: number) => JSON.stringify(draft.problem.order[song]!);

function linkChains(draft: Draft, into: [number, number][]): void {
  const { next, previous } = draft;
  for (const [a, b] of into) {
    const names = `${quoted(draft, a)} straight into ${quoted(draft, b)}`;
    if (a === b) refuse(draft, [a], `${names}: a song cannot lead into itself.`);
    else if (next[a] !== -1 && next[a] !== b)
      refuse(
        draft,
        [a, next[a]!, b],
        `${names}, and also into ${quoted(draft, next[a]!)}: only one can follow.`,
      );
    else if (previous[b] !== -1 && previous[b] !== a)
      refuse(
        draft,
        [previous[b]!, a, b],
        `${names}, and ${quoted(draft, previous[b]!)} too: only one can stand right before.`,
      );
    else {
      next[a] = b;
      previous[b] = a;
    }
  }
}

/** Follows `after` from one song until it comes back; the shortest way round, or null. */
function circleThrough(draft: Draft, song: number): number[] | null {
  const cameFrom = new Map<number, number>();
  let edge = [song];
  while (edge.length > 0) {
    const reached: number[] = [];
    for (const at of edge) {
      for (const to of draft.after[at]!) {
        if (to === song) {
          const circle = [at];
          while (circle[0] !== song) circle.unshift(cameFrom.get(circle[0]!)!);
          return circle;
        }
        if (!cameFrom.has(to)) {
          cameFrom.set(to, at);
          reached.push(to);
        }
      }
    }
    edge = reached;
  }
  return null;
}

function refuseCircle(draft: Draft): void {
  const circles = draft.after
    .map((_, song) => circleThrough(draft, song))
    .filter((circle) => circle !== null)
    .sort((a, b) => a.length - b.length);
  const circle = circles[0];
  if (!circle) return;
  const links = circle.map((song, i) => {
    const to = circle[(i + 1) % circle.length]!;
    const link = draft.next[song] === to ? "straight into" : "before";
    return `${quoted(draft, song)} ${link} ${quoted(draft, to)}`;
  });
  const end = links.length === 1 ? "a song cannot come before itself." : "these contradict each other.";
  refuse(draft, circle, `${links.join(", ")}: ${end}`);
}

/** What comes before a song of a chain comes before the whole chain, and what comes after one comes after all. */
function spreadOverChains(draft: Draft): void {
  const { next, previous, after } = draft;
  for (let changed = true; changed; ) {
    changed = false;
    for (const [a, followers] of after.entries()) {
      for (const b of followers) {
        const forward = next[a]! !== -1 && next[a] !== b ? ([next[a]!, b] as const) : null;
        const backward = previous[b]! !== -1 && previous[b] !== a ? ([a, previous[b]!] as const) : null;
        for (const pair of [forward, backward]) {
          if (pair && !after[pair[0]]!.has(pair[1])) {
            after[pair[0]]!.add(pair[1]);
            changed = true;
          }
        }
      }
    }
  }
}

function closeBefore(draft: Draft): void {
  const count = draft.after.length;
  for (let through = 0; through < count; through += 1) {
    for (const followers of draft.after) {
      if (followers.has(through)) for (const last of draft.after[through]!) followers.add(last);
    }
  }
  for (const [a, followers] of draft.after.entries())
    for (const b of followers) draft.predecessors[b]!.push(a);
}

function placeFixed(draft: Draft, at: [number, number][]): void {
  const count = draft.after.length;
  const holder = new Map<number, number>();
  for (const [song, place] of at) {
    const position = place < 0 ? count + place : place - 1;
    const name = quoted(draft, song);
    if (position < 0 || position >= count) {
      refuse(
        draft,
        [song],
        `${name} at place ${place}: this set has ${count} songs, so there is no such place.`,
      );
    } else if (position < draft.earliest[song]! || position > draft.latest[song]!) {
      refuse(
        draft,
        [song],
        `${name} at place ${place}: that place belongs to another section than the song.`,
      );
    } else if (holder.has(position) && holder.get(position) !== song) {
      const other = holder.get(position)!;
      refuse(
        draft,
        [other, song],
        `${quoted(draft, other)} and ${name} are both fixed at place ${position + 1}.`,
      );
    } else {
      holder.set(position, song);
      narrow(draft, song, position, position);
    }
  }
}

/**
 * The rules of a problem made ready for a search, or why they contradict each other where that is seen at once. What
 * takes trying orders to be seen is left to the search.
 */
export function compileRules(problem: Problem): CompiledRules {
  const count = problem.order.length;
  const number = new Map(problem.order.map((id, i) => [id, i]));
  const pairs = (list: [string, string][]) =>
    list.map(([a, b]): [number, number] => [number.get(a)!, number.get(b)!]);
  const into = pairs(problem.rules.into);
  const before = pairs(problem.rules.before);
  const apart = pairs(problem.rules.apart).filter(([a, b]) => a !== b);
  const draft: Draft = {
    problem,
    ...sectionWindows(problem),
    predecessors: problem.order.map(() => []),
    next: new Int32Array(count).fill(-1),
    previous: new Int32Array(count).fill(-1),
    apart: problem.order.map(() => []),
    after: problem.order.map(() => new Set<number>()),
    why: [],
  };
  linkChains(draft, into);
  for (const [a, b] of before) draft.after[a]!.add(b);
  for (const [a, b] of into) if (a !== b) draft.after[a]!.add(b);
  refuseCircle(draft);
  for (const [a, b] of apart) {
    draft.apart[a]!.push(b);
    draft.apart[b]!.push(a);
    if (draft.next[a] === b || draft.next[b] === a)
      refuse(
        draft,
        [a, b],
        `${quoted(draft, a)} and ${quoted(draft, b)} lead straight into each other and are kept apart.`,
      );
  }
  const at = Object.entries(problem.rules.at).map(([id, place]): [number, number] => [
    number.get(id)!,
    place,
  ]);
  placeFixed(draft, at);
  if (draft.why.length > 0) return { ok: false, why: draft.why };

  spreadOverChains(draft);
  refuseCircle(draft);
  if (draft.why.length > 0) return { ok: false, why: draft.why };
  closeBefore(draft);
  propagateWindows(draft);
  const { earliest, latest, predecessors, next, previous } = draft;
  return { ok: true, rules: { earliest, latest, predecessors, next, previous, apart: draft.apart } };
}
