import type { Model } from "#app/domain/planning/model.ts";

/*
 * How much a tech can do for a guitar by the time it is due, without keeping a list of jobs.
 *
 * A job is known when it falls due. All jobs due earlier are settled by then, and jobs due later never go first. So it
 * gets what earlier jobs left of the songs played since its guitar was laid aside, and takes the oldest of it, since the
 * tech never waits. Guitars are laid aside one after another, so their free times are nested: of two resting guitars, the
 * one that rests longer has all the free seconds of the other, and some older ones. One number a guitar is enough.
 */

/**
 * A job of `seconds` on a guitar takes what it finds: the oldest free seconds first, which guitars that rest longer lose
 * too, and what goes beyond the older part is lost to those that rest shorter.
 */
export function takeFree(free: Float64Array, guitar: number, seconds: number): void {
  const own = free[guitar]!;
  const taken = Math.min(seconds, own);
  if (taken <= 0) return;
  for (let other = 0; other < free.length; other += 1) {
    if (other === guitar) continue;
    const theirs = free[other]!;
    free[other] = theirs >= own ? theirs - taken : Math.min(theirs, own - taken);
  }
  free[guitar] = own - taken;
}

/**
 * While a song is played on one guitar, all that rest gain its seconds; more than `ceiling` is never needed.
 *
 * @param rests whether a guitar has a neck that a tech may have to change
 */
export function freeAfterSong(
  free: Float64Array,
  guitar: number,
  seconds: number,
  ceiling: number,
  rests: (guitar: number) => boolean,
): void {
  for (let other = 0; other < free.length; other += 1)
    free[other] = other === guitar || !rests(other) ? 0 : Math.min(ceiling, free[other]! + seconds);
}

/**
 * More free seconds than this are as good as this: every guitar's longest job together. A resting guitar can lose what
 * is free now to at most one job of each other guitar, since a job that starts later uses only later seconds.
 */
export function freeCeiling({ longestJobs }: Model): number {
  return longestJobs.reduce((sum, job) => sum + job, 0);
}
