import { type Model, type Option, UNUSED } from "#app/domain/planning/model.ts";
import { stepCost } from "#app/domain/planning/step-cost.ts";

/** A tech is never late in a bound. */
const ENOUGH = Number.POSITIVE_INFINITY;
const MOST_JOINT_STATES = 20_000;

/** All necks of all guitars and the guitar in hand, as one number. */
export type Joint = {
  count: number;
  /** Necks of each guitar; the last row of each is that of a guitar still free to be prepared. */
  necks: number[][];
  strides: number[];
  /** Row of guitar g in joint state j at `j × guitars + g`, and the guitar in hand. */
  rows: Int32Array;
  current: Int32Array;
  /** The row of each neck number, guitar by guitar. */
  rowOfNeck: Map<number, number>[];
};

/** Null where there are too many to be followed together. */
export function jointStates(model: Model): Joint | null {
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
  if (count > MOST_JOINT_STATES) return null;
  const rows = new Int32Array(count * model.guitars);
  const current = new Int32Array(count);
  for (let j = 0; j < count; j += 1) {
    current[j] = j % model.guitars;
    for (let guitar = 0; guitar < model.guitars; guitar += 1)
      rows[j * model.guitars + guitar] = Math.floor(j / strides[guitar]!) % necks[guitar]!.length;
  }
  const rowOfNeck = necks.map((list) => new Map(list.map((neck, row) => [neck, row])));
  return { count, necks, strides, rows, current, rowOfNeck };
}

/** The number of a joint state. */
export function jointOf(
  { strides, rowOfNeck }: Joint,
  neckOf: (guitar: number) => number,
  current: number,
): number {
  let number = current;
  for (const [guitar, stride] of strides.entries())
    number += rowOfNeck[guitar]!.get(neckOf(guitar))! * stride;
  return number;
}

export type Step = { guitar: number; neck: number; cover: number; penalty: number };

/** One way to go on: what it costs from each joint state, and which state it leads to. */
export type Target = { costs: Float64Array; next: Int32Array };

export function stepOf(model: Model, song: number, option: Option): Step {
  return { guitar: option.guitar, neck: option.neck, cover: model.cover[song]!, penalty: option.penalty };
}

/** Songs played one right after the other, each in one of its ways. */
export function targetOf(model: Model, joint: Joint, steps: Step[]): Target {
  const costs = new Float64Array(joint.count);
  const next = Int32Array.from(costs, (_, j) => j);
  for (const { guitar, neck, cover, penalty } of steps) {
    const necks = joint.necks[guitar]!;
    const row = necks.indexOf(neck);
    for (let j = 0; j < joint.count; j += 1) {
      const at = next[j]!;
      const from = joint.rows[at * model.guitars + guitar]!;
      const changing = joint.current[at] !== guitar;
      costs[j]! += stepCost(model, guitar, necks[from]!, neck, cover, false, changing, ENOUGH) + penalty;
      next[j] = at + (row - from) * joint.strides[guitar]! + guitar - joint.current[at]!;
    }
  }
  return { costs, next };
}
