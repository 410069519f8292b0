import type { BrokenWish } from "#app/domain/planning/answer.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

type Heard = { song: { id: string }; neck: { open: number[] } };

/** The wishes that a set breaks, counted from the songs as played. */
export function brokenWishes(problem: Problem, played: Heard[]): BrokenWish[] {
  const found: BrokenWish[] = [];
  const ids = played.map(({ song }) => song.id);
  for (const [wish, asked] of (problem.wishes ?? []).entries()) {
    let row: string[] = [];
    let tuning = "";
    for (const [position, { song, neck }] of played.entries()) {
      if (asked.kind === "run") {
        if (neck.open.join() !== tuning) row = [];
        tuning = neck.open.join();
        row = [...row, song.id];
        if (row.length > asked.most) found.push({ wish, songs: row, seconds: asked.seconds });
      }
      const previous = ids[position - 1];
      if (asked.kind === "apart" && previous !== undefined) {
        const shared = asked.groups.find((group) => group.includes(previous));
        if (shared?.includes(song.id))
          found.push({ wish, songs: [previous, song.id], seconds: asked.seconds });
      }
      const level =
        asked.kind === "energy" ? Object.entries(asked.levels).find(([id]) => id === song.id) : null;
      if (asked.kind === "energy" && level) {
        const seconds = asked.seconds * Math.abs(level[1] - heightAt(asked.curve, position, played.length));
        if (seconds > 0) found.push({ wish, songs: [song.id], seconds });
      }
    }
  }
  return found;
}

/** A line through equally distant points, at one of `places` equally distant positions. */
function heightAt(points: number[], position: number, places: number): number {
  if (places < 2) return points[0]!;
  const spans = (position * (points.length - 1)) / (places - 1);
  const left = Math.trunc(spans);
  const share = spans - left;
  return points[left]! * (1 - share) + (share > 0 ? points[left + 1]! * share : 0);
}
