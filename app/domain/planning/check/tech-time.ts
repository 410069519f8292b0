/** A job of the tech: which seconds of playing (counted from the first song's first) it may use, and how many it needs. */
export type TimedJob = { opens: number; closes: number; seconds: number };

type Span = [from: number, to: number];

/**
 * Seconds done of each job by when it is due, on one line of playing time. Jobs are served by when they are due, each
 * takes the earliest seconds that are still free in its own span: since a job that is due earlier always goes first,
 * those due later cannot take anything from it.
 */
export function timeSpent(playing: number, jobs: TimedJob[]): number[] {
  let open: Span[] = [[0, playing]];
  const spent = jobs.map(() => 0);
  const served = jobs.map((job, i) => ({ ...job, i })).sort((a, b) => a.closes - b.closes);
  for (const { opens, closes, seconds, i } of served) {
    const still: Span[] = [];
    for (const [from, to] of open) {
      const begin = Math.max(from, opens);
      const end = Math.min(to, closes, begin + (seconds - spent[i]!));
      if (end <= begin) {
        still.push([from, to]);
        continue;
      }
      spent[i]! += end - begin;
      if (from < begin) still.push([from, begin]);
      if (end < to) still.push([end, to]);
    }
    open = still;
  }
  return spent;
}
