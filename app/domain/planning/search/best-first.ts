import { Heap } from "#app/domain/planning/search/heap.ts";
import type { Space, Way } from "#app/domain/planning/search/space.ts";
import { StateTable } from "#app/domain/planning/search/state-table.ts";

const NONE = -1;

/** Ways whose costs differ by less than this share are equally cheap: sums of the same numbers in another order. */
const ROUNDING = 1e-12;

function doubled<T extends Int32Array | Float64Array | Uint8Array>(made: T, old: T): T {
  made.set(old as never);
  return made;
}

/**
 * A* over a space, run in portions. Each state is kept once, with the cheapest way to it; a cheaper way opens it again, so
 * that the bound need not be consistent. Ties go to the deeper state.
 *
 * `floor()` is a lower bound on every complete way that costs less than the limit: such a way has, until it is found, a
 * state in the heap (or one that was turned away for want of room) whose value is at most the way's cost. A value is
 * never lowered below that of the state it came from, since all completions of a state complete the one before, too.
 */
export class BestFirst {
  private capacity = 1024;
  private costs = new Float64Array(this.capacity);
  private values = new Float64Array(this.capacity);
  private parents = new Int32Array(this.capacity);
  private moves = new Int32Array(this.capacity);
  private depths = new Uint8Array(this.capacity);
  private closed = new Uint8Array(this.capacity);
  private judged = new Uint8Array(this.capacity);
  private readonly table: StateTable;
  private readonly heap = new Heap((a, b) => this.depths[a]! > this.depths[b]!);
  private readonly state: Int32Array;
  private readonly child: Int32Array;
  private limit = Number.POSITIVE_INFINITY;
  private turnedAway = Number.POSITIVE_INFINITY;
  /** Children that have been looked at. */
  reached = 0;
  found: Way | null = null;

  /** @param room how many states may be kept */
  constructor(
    private readonly space: Space,
    private readonly room: number,
  ) {
    this.table = new StateTable(space.width);
    this.state = new Int32Array(space.width);
    this.child = new Int32Array(space.width);
    this.child.set(space.start);
    this.reach(0, 0, NONE, NONE, 0);
  }

  /** Ways that cost this much or more are of no interest. */
  setLimit(limit: number): void {
    this.limit = Math.min(this.limit, limit);
  }

  /** Nothing is left to expand below the limit. */
  get exhausted(): boolean {
    return this.found !== null || this.heap.leastKey() >= this.limit;
  }

  floor(): number {
    const open = this.found ? this.found.cost : this.heap.leastKey();
    return Math.min(open, this.turnedAway);
  }

  /** Looks at so many children or a few more; stops at the first complete way, the cheapest of all not turned away. */
  run(children: number): void {
    const end = this.reached + children;
    while (this.reached < end && !this.exhausted) {
      const node = this.heap.pop();
      if (this.closed[node]) continue;
      this.closed[node] = 1;
      const depth = this.depths[node]!;
      const cost = this.costs[node]!;
      if (depth === this.space.depth) {
        this.found = { cost, moves: this.wayTo(node) };
        return;
      }
      this.table.read(node, this.state);
      if (!this.judge(node, depth)) continue;
      const least = this.values[node]!;
      this.space.expand(this.state, depth, this.child, (step, move) => {
        this.reach(cost + step, least, node, move, depth + 1);
      });
    }
  }

  /** Asks for the closer bound of the state in `state` where that was not done yet; whether it is still its turn. */
  private judge(node: number, depth: number): boolean {
    const { closer } = this.space;
    if (!closer || this.judged[node]) return true;
    this.judged[node] = 1;
    const value = this.costs[node]! + closer(this.state, depth);
    if (value <= this.values[node]!) return true;
    this.values[node] = value;
    this.closed[node] = 0;
    if (value < this.limit) this.heap.push(value, node);
    return false;
  }

  private wayTo(node: number): number[] {
    const moves: number[] = [];
    for (let at = node; this.parents[at] !== NONE; at = this.parents[at]!) moves.push(this.moves[at]!);
    return moves.reverse();
  }

  /** Takes note of a way to the state in `child`; `least` is the value of the state it came from. */
  private reach(cost: number, least: number, parent: number, move: number, depth: number): void {
    this.reached += 1;
    if (cost >= this.limit) return;
    const known = this.table.find(this.child);
    if (known !== NONE) {
      const saved = this.costs[known]! - cost;
      if (saved <= ROUNDING * cost) return;
      this.closed[known] = 0;
      this.enter(known, cost, Math.max(least, this.values[known]! - saved), parent, move, depth);
      return;
    }
    const value = Math.max(least, cost + this.space.bound(this.child, depth));
    if (value >= this.limit) return;
    if (this.table.count >= this.room) {
      this.turnedAway = Math.min(this.turnedAway, value);
      return;
    }
    if (this.table.count === this.capacity) this.grow();
    this.enter(this.table.add(this.child), cost, value, parent, move, depth);
  }

  private enter(
    node: number,
    cost: number,
    value: number,
    parent: number,
    move: number,
    depth: number,
  ): void {
    this.costs[node] = cost;
    this.values[node] = value;
    this.parents[node] = parent;
    this.moves[node] = move;
    this.depths[node] = depth;
    this.heap.push(value, node);
  }

  private grow(): void {
    this.capacity *= 2;
    this.costs = doubled(new Float64Array(this.capacity), this.costs);
    this.values = doubled(new Float64Array(this.capacity), this.values);
    this.parents = doubled(new Int32Array(this.capacity), this.parents);
    this.moves = doubled(new Int32Array(this.capacity), this.moves);
    this.depths = doubled(new Uint8Array(this.capacity), this.depths);
    this.closed = doubled(new Uint8Array(this.capacity), this.closed);
    this.judged = doubled(new Uint8Array(this.capacity), this.judged);
  }
}
