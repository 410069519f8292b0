/**
 * A change of a resting guitar. It may be worked on while songs `from` to `due - 1` are played (positions from 0), and is
 * needed in the gap into the song at `due`.
 */
export type TechJob = { from: number; due: number; seconds: number };

/**
 * What one person at the side gets done of a list of jobs: only while songs are played, one job at a time, always the
 * released unfinished job that is due first; a job may be interrupted. At most one job is due in a gap.
 *
 * @param lengths seconds of each song, in the order of the set
 * @returns seconds done of each job by the time it is due, in the order of `jobs`
 * @example techShift([60, 60], [{ from: 0, due: 1, seconds: 90 }]) // [60]
 */
export function techShift(lengths: number[], jobs: TechJob[]): number[] {
  const done = jobs.map(() => 0);
  const byDue = jobs.map((_, i) => i).sort((a, b) => jobs[a]!.due - jobs[b]!.due);
  for (const [position, length] of lengths.entries()) {
    let free = length;
    for (const i of byDue) {
      const job = jobs[i]!;
      if (free <= 0) break;
      if (job.from > position || job.due <= position) continue;
      const spent = Math.min(free, job.seconds - done[i]!);
      done[i]! += spent;
      free -= spent;
    }
  }
  return done;
}
