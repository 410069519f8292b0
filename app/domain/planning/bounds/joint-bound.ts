import { type Needs, needsOf } from "#app/domain/planning/bounds/needs.ts";
import { openNeedsOf } from "#app/domain/planning/bounds/open-needs.ts";
import { type Model, UNUSED } from "#app/domain/planning/model.ts";
import type { OrderRules } from "#app/domain/planning/order-rules.ts";
import type { SetLayout } from "#app/domain/planning/set-layout.ts";
import type { SetBound } from "#app/domain/planning/set-space.ts";
import { stepCost } from "#app/domain/planning/step-cost.ts";

/** A tech is never late in a bound. */
const ENOUGH = Number.POSITIVE_INFINITY;
const MOST_NEEDS = 16;
const FEWEST_NEEDS = 6;
const TABLE_STEPS = 60_000_000;
const MOST_CELLS = 8_000_000;

/** All necks of all guitars and the guitar in hand, as one number. */
type Joint = {
  count: number;
  /** Necks of each guitar; the last row of each is that of a guitar still free to be prepared. */
  necks: number[][];
  strides: number[];
  /** Row of guitar g in joint state j at `j × guitars + g`, and the guitar in hand. */
  rows: Int32Array;
  current: Int32Array;
};

function jointStates(model: Model): Joint {
  const necks = Array.from({ length: model.guitars }, (_, guitar) => {
    const own = model.options.flatMap((list) =>
      list.filter((o) => o.guitar === guitar).map(({ neck }) => neck),
    );
    return [...new Set([...own, model.start[guitar]!, UNUSED])];
  });
  const strides: number[] = [];
  let count = model.guitars;
  for (const list of necks) {
    strides.push(count);
    count *= list.length;
  }
  const rows = new Int32Array(count * model.guitars);
  const current = new Int32Array(count);
  for (let j = 0; j < count; j += 1) {
    current[j] = j % model.guitars;
    for (let guitar = 0; guitar < model.guitars; guitar += 1)
      rows[j * model.guitars + guitar] = Math.floor(j / strides[guitar]!) % necks[guitar]!.length;
  }
  return { count, necks, strides, rows, current };
}

/** One way to go on: a guitar comes to a row. Costs stand at `row it comes from × 2`, plus 1 where it is in hand. */
type Target = { guitar: number; row: number; costs: Float64Array };

function targetOf(
  model: Model,
  joint: Joint,
  guitar: number,
  neck: number,
  songs: Iterable<[number, number]>,
): Target {
  const necks = joint.necks[guitar]!;
  const costs = new Float64Array(necks.length * 2).fill(Number.POSITIVE_INFINITY);
  for (const [cover, penalty] of songs) {
    for (const [row, from] of necks.entries()) {
      for (let hand = 0; hand < 2; hand += 1) {
        const cost = stepCost(model, guitar, from, neck, cover, false, hand === 0, ENOUGH) + penalty;
        if (cost < costs[row * 2 + hand]!) costs[row * 2 + hand] = cost;
      }
    }
  }
  return { guitar, row: necks.indexOf(neck), costs };
}

/** For each neck of each guitar that a passing song can bring about, the cheapest way to it. */
function passingTargets(model: Model, joint: Joint, needs: Needs): Target[] {
  return joint.necks.flatMap((necks, guitar) =>
    necks.flatMap((neck) => {
      const songs = needs.passing.flatMap((song) =>
        model.options[song]!.filter((o) => o.guitar === guitar && o.neck === neck).map(
          (o): [number, number] => [model.cover[song]!, o.penalty],
        ),
      );
      return songs.length > 0 ? [targetOf(model, joint, guitar, neck, songs)] : [];
    }),
  );
}

/** How many needs the tables have room and time for; fewer than is worth it where there are too many joint states. */
function affordableNeeds(joint: Joint): number {
  const targets = joint.necks.reduce((sum, necks) => sum + necks.length, 0) * 2;
  const steps = Math.log2(TABLE_STEPS / (joint.count * targets));
  const cells = Math.log2(MOST_CELLS / joint.count);
  return Math.min(MOST_NEEDS, Math.floor(Math.min(steps, cells)));
}

function fill(model: Model, joint: Joint, needs: Needs): Float64Array {
  const { count, rows, current, strides } = joint;
  const { guitars } = model;
  const sets = 1 << needs.counted.length;
  const least = new Float64Array(sets * count);
  const passing = passingTargets(model, joint, needs);
  const serving = needs.counted.map(({ options, cover }) =>
    options.map(({ guitar, neck, penalty }) => targetOf(model, joint, guitar, neck, [[cover, penalty]])),
  );

  /** Takes what one target offers to every joint state of a set, if it then is in set `after`; whether any gained. */
  function offer({ guitar, row, costs }: Target, set: number, after: number): boolean {
    let gained = false;
    const stride = strides[guitar]!;
    for (let j = 0; j < count; j += 1) {
      const from = rows[j * guitars + guitar]!;
      const hand = current[j] === guitar ? 1 : 0;
      const next = j + (row - from) * stride + guitar - current[j]!;
      const cost = costs[from * 2 + hand]! + least[after * count + next]!;
      if (cost < least[set * count + j]!) {
        least[set * count + j] = cost;
        gained = true;
      }
    }
    return gained;
  }

  for (let set = 1; set < sets; set += 1) {
    least.fill(Number.POSITIVE_INFINITY, set * count, (set + 1) * count);
    for (const [need, targets] of serving.entries()) {
      if (((set >> need) & 1) === 0 || (needs.first[need]! & set) !== 0) continue;
      for (const target of targets) offer(target, set, set & ~(1 << need));
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
 * songs in between wherever they help; necks of all guitars and the guitar in hand are followed together.
 *
 * Why it bounds: from a half-built set on, let each open need be represented by its song of the greatest cover, or any
 * other if that has been played. The rest of the plan is a sequence of such songs and of passing songs, and each step
 * costs what it costs here, or more: the same necks, the same guitar in hand, at most that cover (and a tech never late).
 *
 * @returns null where there are too many joint states for the tables to count enough needs
 */
export function jointBound(model: Model, rules: OrderRules, layout: SetLayout): SetBound | null {
  const joint = jointStates(model);
  const most = affordableNeeds(joint);
  if (most < FEWEST_NEEDS) return null;
  const needs = needsOf(model, rules, most);
  const least = fill(model, joint, needs);
  const openNeeds = openNeedsOf(needs, layout);
  const rowOf = joint.necks.map((necks) => new Map(necks.map((neck, row) => [neck, row])));

  return (state, depth) => {
    if (depth === 0 || depth === model.songs) return 0;
    let j = state[layout.current]!;
    for (let guitar = 0; guitar < model.guitars; guitar += 1)
      j += rowOf[guitar]!.get(state[layout.necks + guitar]!)! * joint.strides[guitar]!;
    return least[openNeeds(state) * joint.count + j]!;
  };
}
