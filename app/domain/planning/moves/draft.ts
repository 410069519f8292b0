import type { Random } from "#app/domain/planning/search/random.ts";

/** A plan that is being changed: songs in order, and for each song number which of its options it takes. */
export type Draft = { songs: Int32Array; ways: Int32Array; optionCounts: Int32Array };

/** Changes a draft in place; false where there was nothing to change. */
export type Move = (draft: Draft, random: Random) => boolean;
