import fc from "fast-check";

/**
 * Properties are tried on the same cases every time; FAST_CHECK_SEED tries others. A failing property prints its seed,
 * its path and the smallest case that fails.
 */
const seed = Number(process.env.FAST_CHECK_SEED ?? 20_261_201);

fc.configureGlobal({ seed, endOnFailure: false });
