import type { Problem } from "#app/domain/planning/problem.ts";

/**
 * A place of a set in a few words.
 * @param place from 1, as the planner has it
 * @example placeName(1, problem) // "first"
 */
export function placeName(place: number, problem: Pick<Problem, "songs">): string {
  const songs = problem.songs.length;
  const main = problem.songs.filter((song) => song.section === 0).length;
  if (place > songs || place < 1) return "at a place the set does not have";
  if (place === 1) return "first";
  if (place === songs) return "last";
  return place === main + 1 && main > 0 ? "first of the encore" : `at place ${place}`;
}

/**
 * A rule about two songs in a few words.
 * @example pairWords("into", "Ferry", "Lamps") // "Ferry straight into Lamps"
 */
export function pairWords(kind: "before" | "into" | "apart", a: string, b: string): string {
  if (kind === "apart") return `${a} and ${b} apart`;
  return kind === "into" ? `${a} straight into ${b}` : `${a} before ${b}`;
}
