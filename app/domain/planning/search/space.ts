/**
 * What a search needs to know of what it searches: states are rows of whole numbers, equal rows are equal states, and a
 * complete way through them is a list of moves, whatever these mean.
 */
export type Space = {
  /** Whole numbers in a state. */
  width: number;
  /** Moves in every complete way. */
  depth: number;
  start: Int32Array;
  /** Writes each state that one move leads to into `child` and calls `emit` with the move's cost and its number. */
  expand(
    state: Int32Array,
    depth: number,
    child: Int32Array,
    emit: (cost: number, move: number) => void,
  ): void;
  /** A cost that no completion of this state undercuts; `Infinity` where there is none. 0 for a complete state. */
  bound(state: Int32Array, depth: number): number;
  /** A closer bound that takes longer, asked for once for each state that is about to be expanded. */
  closer?(state: Int32Array, depth: number): number;
};

/** A complete way and what it costs. */
export type Way = { cost: number; moves: number[] };
