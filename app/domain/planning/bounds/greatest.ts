import type { SetBound } from "#app/domain/planning/set-space.ts";

/** The greatest of several bounds: each is a bound, so it is one. */
export function greatest(...bounds: SetBound[]): SetBound {
  return (state, depth) => {
    let value = 0;
    for (const bound of bounds) {
      const own = bound(state, depth);
      if (own > value) value = own;
      if (value === Number.POSITIVE_INFINITY) return value;
    }
    return value;
  };
}
