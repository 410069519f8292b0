import { partitionBound } from "#app/domain/planning/bounds/partition-bound.ts";
import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import type { SetLayout } from "#app/domain/planning/set-layout.ts";
import { type SetBound, setSpace } from "#app/domain/planning/set-space.ts";

/** An encore is short; longer sections cost more to solve by themselves than it helps. */
const MOST_SONGS = 6;
const ROOM = 50_000;
const CHILDREN = 200_000;

/** The songs of the last section, where it is a short one after others; else none. */
function lastSection({ problem, songs }: Model): number[] {
  const section = new Map(problem.songs.map((song) => [song.id, song.section]));
  const sections = problem.order.map((id) => section.get(id)!);
  const last = Math.max(...sections);
  const found = sections.flatMap((one, song) => (one === last ? [song] : []));
  return found.length < songs && found.length <= MOST_SONGS ? found : [];
}

/** The least that some songs cost as a set of their own, with every guitar prepared freely, in the last places of the set. */
function costAlone(model: Model, rules: OrderRules, songs: number[]): number {
  const first = model.songs - songs.length;
  const pick = <T>(list: ArrayLike<T>) => songs.map((song) => list[song]!);
  const numbers = (list: ArrayLike<number>) => Array.from(list, (song) => songs.indexOf(song));
  const within = (list: number[]) => numbers(list).filter((song) => song !== -1);
  const part: Model = {
    ...model,
    songs: songs.length,
    problem: { ...model.problem, maxMoved: null },
    options: pick(model.options),
    cover: Float64Array.from(pick(model.cover)),
    seconds: Float64Array.from(pick(model.seconds)),
    start: model.start.map(() => UNUSED),
    mayBeLate: false,
  };
  const own: OrderRules = {
    earliest: Int32Array.from(pick(rules.earliest), (place) => place - first),
    latest: Int32Array.from(pick(rules.latest), (place) => place - first),
    predecessors: pick(rules.predecessors).map(within),
    next: Int32Array.from(numbers(pick(rules.next))),
    previous: Int32Array.from(numbers(pick(rules.previous))),
    apart: pick(rules.apart).map(within),
  };
  const run = new BestFirst(
    setSpace(part, own, () => () => 0),
    ROOM,
  );
  run.run(CHILDREN);
  return run.floor();
}

/**
 * The last section by itself, solved to the end, and before it the needs of the other songs shared out among the guitars.
 *
 * Why it bounds: no song of another section comes after the last one has begun, so its songs follow each other. Their steps
 * cost at least what they would cost with every guitar as it suits best, none to change for the first song, and a tech
 * never late. The other songs' steps are counted by the other bound, which takes nothing of the last section into account:
 * none of its songs can lie in between.
 *
 * @param worth what the last section must cost by itself for this to be worth its time
 * @returns null where it is not
 */
export function lastSectionBound(
  model: Model,
  rules: OrderRules,
  layout: SetLayout,
  worth: number,
): SetBound | null {
  const songs = lastSection(model);
  if (songs.length < 2) return null;
  const behind = costAlone(model, rules, songs);
  if (behind < worth) return null;
  const before = partitionBound(model, rules, layout, "dear", new Set(songs));
  const first = model.songs - songs.length;
  return (state, depth) => (depth > first ? 0 : behind + (depth < first ? before(state, depth) : 0));
}
