/**
 * The indexes of a longest strictly rising subsequence, from left to right (patience sorting, O(n log n)).
 * @example longestRising(["a1", "a0", "a2"]) // [1, 2]
 */
export function longestRising<Value extends string | number>(values: readonly Value[]): number[] {
  const ends: number[] = [];
  const previous: (number | undefined)[] = [];
  values.forEach((value, index) => {
    let low = 0;
    let high = ends.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (values[ends[middle]!]! < value) low = middle + 1;
      else high = middle;
    }
    previous[index] = low > 0 ? ends[low - 1] : undefined;
    ends[low] = index;
  });
  const rising: number[] = [];
  for (let at = ends.at(-1); at !== undefined; at = previous[at]) rising.push(at);
  return rising.reverse();
}
