import {
  type Joint,
  jointOf,
  jointStates,
  type Step,
  stepOf,
  type Target,
  targetOf,
} from "#app/domain/planning/bounds/joint-states.ts";
import { canBeLeft, chainsOf, needsOf, precedence } from "#app/domain/planning/bounds/needs.ts";
import { openNeedsOf } from "#app/domain/planning/bounds/open-needs.ts";
import type { Model } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import { NOBODY, type SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";

const MOST_NEEDS = 18;
const FEWEST_NEEDS = 6;
const TABLE_STEPS = 60_000_000;
/** With one guitar nothing else counts as many needs, so the tables may take longer. */
const STEPS_OF_ONE = 150_000_000;
/** Share of the needs that may go to songs of rules about which comes first. */
const ORDERED = 0.2;
const MOST_CELLS = 8_000_000;

/** For each neck of each guitar that a passing song can bring about, the cheapest way to it. */
function passingTargets(model: Model, joint: Joint, passing: number[]): Target[] {
  const targets = new Map<string, Target>();
  for (const song of passing) {
    for (const option of model.options[song]!) {
      const target = targetOf(model, joint, [stepOf(model, song, option)]);
      const key = `${option.guitar} ${option.neck}`;
      const known = targets.get(key);
      if (!known) targets.set(key, target);
      else
        for (let j = 0; j < joint.count; j += 1) known.costs[j] = Math.min(known.costs[j]!, target.costs[j]!);
    }
  }
  return [...targets.values()];
}

/** Every way to play a chain of songs. */
function chainSteps(model: Model, songs: number[]): Step[][] {
  return songs.reduce<Step[][]>(
    (ways, song) =>
      ways.flatMap((way) => model.options[song]!.map((option) => [...way, stepOf(model, song, option)])),
    [[]],
  );
}

/** How many needs the tables have room and time for; fewer than is worth it where there are too many joint states. */
function affordableNeeds(joint: Joint): number {
  const targets = joint.necks.reduce((sum, necks) => sum + necks.length, 0) * 2;
  const steps = Math.log2((joint.necks.length === 1 ? STEPS_OF_ONE : TABLE_STEPS) / (joint.count * targets));
  const cells = Math.log2(MOST_CELLS / joint.count);
  return Math.min(MOST_NEEDS, Math.floor(Math.min(steps, cells)));
}

/** What is to be served, each once: a chain or a need, with the ways to do it. */
type Unit = { songs: number[]; openWith: number[]; targets: Target[] };

function fill(joint: Joint, units: Unit[], first: Int32Array, passing: Target[]): Float64Array {
  const { count } = joint;
  const sets = 1 << units.length;
  const least = new Float64Array(sets * count);

  /** Takes what one target offers to every joint state of a set, if it then is in set `after`; whether any gained. */
  function offer({ costs, next }: Target, set: number, after: number): boolean {
    let gained = false;
    const here = set * count;
    const there = after * count;
    for (let j = 0; j < count; j += 1) {
      const cost = costs[j]! + least[there + next[j]!]!;
      if (cost < least[here + j]!) {
        least[here + j] = cost;
        gained = true;
      }
    }
    return gained;
  }

  for (let set = 1; set < sets; set += 1) {
    least.fill(Number.POSITIVE_INFINITY, set * count, (set + 1) * count);
    if (!canBeLeft(set, first)) continue;
    for (const [unit, { targets }] of units.entries()) {
      if (((set >> unit) & 1) === 0 || (first[unit]! & set) !== 0) continue;
      for (const target of targets) offer(target, set, set & ~(1 << unit));
    }
    for (let gained = true; gained; ) {
      gained = false;
      for (const target of passing) gained = offer(target, set, set) || gained;
    }
  }
  return least;
}

/**
 * Every open need is served once, by whichever guitar, in any order that rules between whole needs allow, with passing
 * songs in between wherever they help; necks of all guitars and the guitar in hand are followed together. Songs that lead
 * straight into each other are one need, served in one go.
 *
 * Why it bounds: from a half-built set on, let each open need be represented by its song of the greatest cover, or any
 * other if that has been played, and each chain that is not begun by all of its songs. The rest of the plan is a sequence
 * of these and of passing songs, and each step costs what it costs here, or more: the same necks, the same guitar in hand,
 * at most that cover (and a tech never late). The rest of a chain that is begun is left out, which only lowers the sum.
 *
 * @returns null where there are too many joint states for the tables to count enough needs
 */
export function jointBound(model: Model, rules: OrderRules, layout: SetLayout): SetBound | null {
  const joint = jointStates(model);
  const most = joint ? affordableNeeds(joint) : 0;
  if (!joint || most < FEWEST_NEEDS) return null;
  const chains = chainsOf(model, rules).slice(0, Math.floor(most / 2));
  const inChains = new Set(chains.flatMap(({ songs }) => songs));
  const needs = needsOf(model, rules, most - chains.length, inChains, new Set(), ORDERED);
  const units: Unit[] = [
    ...chains.map(({ songs }) => ({
      songs,
      openWith: songs.slice(0, 1),
      targets: chainSteps(model, songs).map((steps) => targetOf(model, joint, steps)),
    })),
    ...needs.counted.map(({ songs, options, cover }) => ({
      songs,
      openWith: songs,
      targets: options.map((option) => targetOf(model, joint, [{ ...option, cover }])),
    })),
  ];
  const least = fill(joint, units, precedence(rules, units), passingTargets(model, joint, needs.passing));
  const leastOfAll = Float64Array.from({ length: 1 << units.length }, (_, set) =>
    least.subarray(set * joint.count, (set + 1) * joint.count).reduce((a, b) => Math.min(a, b)),
  );
  const openUnits = openNeedsOf(
    units.map(({ openWith }) => openWith),
    layout,
  );

  return (state, depth) => {
    if (depth === 0 || depth === model.songs) return 0;
    const j = jointOf(joint, (guitar) => state[layout.necks + guitar]!, state[layout.current]!);
    const open = openUnits(state);
    const last = state[layout.last]!;
    const begun = last !== NOBODY && rules.next[last] !== -1 && inChains.has(last);
    return begun ? leastOfAll[open]! : least[open * joint.count + j]!;
  };
}
