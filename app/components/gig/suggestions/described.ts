import type { Rung } from "#app/domain/gig/rungs.ts";
import type { Suggested } from "#app/domain/gig/suggest.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";

/** A rung with what it would change and gain. */
export type Described = { rung: Rung; answer: FoundAnswer; said: Suggested; done: boolean };
