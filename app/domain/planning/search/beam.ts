import type { Space, Way } from "#app/domain/planning/search/space.ts";
import { StateTable } from "#app/domain/planning/search/state-table.ts";

/** States of one depth that a beam keeps, with the way to each. */
class Layer {
  readonly table: StateTable;
  readonly costs: number[] = [];
  readonly values: number[] = [];
  readonly parents: number[] = [];
  readonly moves: number[] = [];

  constructor(width: number) {
    this.table = new StateTable(width);
  }

  reach(state: Int32Array, cost: number, parent: number, move: number, bound: () => number): void {
    const known = this.table.find(state);
    if (known === -1) {
      const rest = bound();
      if (rest === Number.POSITIVE_INFINITY) return;
      this.table.add(state);
      this.costs.push(cost);
      this.values.push(cost + rest);
      this.parents.push(parent);
      this.moves.push(move);
      return;
    }
    if (cost >= this.costs[known]!) return;
    this.values[known]! -= this.costs[known]! - cost;
    this.costs[known] = cost;
    this.parents[known] = parent;
    this.moves[known] = move;
  }

  /** The numbers of the most promising states. */
  best(count: number): number[] {
    const numbers = this.costs.map((_, number) => number);
    if (numbers.length <= count) return numbers;
    return numbers.sort((a, b) => this.values[a]! - this.values[b]! || a - b).slice(0, count);
  }
}

/**
 * Goes through a space layer by layer, keeping the `width` most promising states of each. Finds a good way quickly, or
 * none where all of the kept ones end; proves nothing.
 */
export function beam(space: Space, width: number): { way: Way | null; reached: number } {
  const layers = [new Layer(space.width)];
  layers[0]!.reach(space.start, 0, -1, -1, () => 0);
  const state = new Int32Array(space.width);
  const child = new Int32Array(space.width);
  let reached = 0;
  for (let depth = 0; depth < space.depth; depth += 1) {
    const layer = layers[depth]!;
    const next = new Layer(space.width);
    for (const number of layer.best(width)) {
      layer.table.read(number, state);
      const cost = layer.costs[number]!;
      space.expand(state, depth, child, (step, move) => {
        reached += 1;
        next.reach(child, cost + step, number, move, () => space.bound(child, depth + 1));
      });
    }
    layers.push(next);
    if (next.costs.length === 0) return { way: null, reached };
  }
  const last = layers[space.depth]!;
  let number = last.best(1)[0]!;
  const cost = last.costs[number]!;
  const moves: number[] = [];
  for (let depth = space.depth; depth > 0; depth -= 1) {
    moves.push(layers[depth]!.moves[number]!);
    number = layers[depth]!.parents[number]!;
  }
  return { way: { cost, moves: moves.reverse() }, reached };
}
