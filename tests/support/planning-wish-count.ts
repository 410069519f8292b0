import type { NeckChoice, Problem, ProblemSong } from "#app/domain/planning/problem.ts";

/** Seconds of all broken wishes, by the letter of the contract; shares no code with the planner. */
export function wishesBroken(problem: Problem, played: { song: ProblemSong; neck: NeckChoice }[]): number {
  let seconds = 0;
  for (const wish of problem.wishes ?? []) {
    let row = 0;
    for (let i = 0; i < played.length; i++) {
      const now = played[i]!;
      const before = played[i - 1];
      if (wish.kind === "run") {
        row = before && String(before.neck.open) === String(now.neck.open) ? row + 1 : 0;
        if (row >= wish.most) seconds += wish.seconds;
      } else if (wish.kind === "apart") {
        const together = wish.groups.filter(
          (group) => before && group.includes(before.song.id) && group.includes(now.song.id),
        );
        if (together.length > 0) seconds += wish.seconds;
      } else {
        const level = wish.levels[now.song.id];
        if (level === undefined) continue;
        const last = wish.curve.length - 1;
        const along = played.length > 1 ? (i * last) / (played.length - 1) : 0;
        const a = wish.curve[Math.floor(along)]!;
        const b = wish.curve[Math.min(last, Math.floor(along) + 1)]!;
        seconds += wish.seconds * Math.abs(level - (a + (b - a) * (along % 1)));
      }
    }
  }
  return seconds;
}
