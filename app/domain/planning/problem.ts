import type { Neck } from "#app/domain/music/neck.ts";
import { type BadProblem, bad } from "#app/domain/planning/bad-problem.ts";
import { crossCheck } from "#app/domain/planning/problem-cross-checks.ts";
import { problemShape } from "#app/domain/planning/problem-shape.ts";
import { shapeProblems } from "#app/domain/planning/shape-problems.ts";

/** `alone`: the performer does everything on stage. `tech`: somebody changes resting guitars while songs play. */
export type Crew = "alone" | "tech";

/** All in seconds. `semitone` is for each semitone of each retuned string; `check` once a change; see `changeSeconds`. */
export type Times = {
  string: number;
  semitone: number;
  capoMove: number;
  capoOn: number;
  capoOff: number;
  swap: number;
  check: number;
  cover: number;
};

/** The weight of each count in the total that is kept low. */
export type Aim = {
  exposed: number;
  seconds: number;
  strings: number;
  semitones: number;
  capoActions: number;
  swaps: number;
};

/**
 * One guitar of the set. `lowest` and `highest` are MIDI numbers for each string, low side first. `start` is the neck
 * it has before the set, `null` where it is prepared freely. `keeps`: no string is retuned once the set has begun.
 */
export type ProblemGuitar = {
  id: string;
  strings: number;
  lowest: number[];
  highest: number[];
  start: Neck | null;
  keeps: boolean;
};

/** One way to play a song, on the guitars named (`null`: on any that can), at a price of `penalty` seconds. */
export type NeckChoice = Neck & { guitars: string[] | null; penalty: number };

/** One song of the set. `cover` is the seconds of talk and applause before it; `null` takes `times.cover`. */
export type ProblemSong = {
  id: string;
  seconds: number;
  section: number;
  cover: number | null;
  necks: NeckChoice[];
};

/** `at`: song id to position from 1, or from the end with -1 last. The pairs are [first, second]. */
export type Rules = {
  at: Record<string, number>;
  before: [string, string][];
  into: [string, string][];
  apart: [string, string][];
};

/** A kind of capo, known by the strings it covers, and how many of it there are. A kind not listed is unlimited. */
export type CapoKind = { strings: number[]; count: number };

/** What a set should rather be like, and the seconds that each break of it counts as. See DEVELOPERS.md. */
export type Wish =
  | { kind: "run"; most: number; seconds: number }
  | { kind: "apart"; groups: string[][]; seconds: number }
  | { kind: "energy"; levels: Record<string, number>; curve: number[]; seconds: number };

/** One set to be planned: what `parseProblem` returns, with nothing left out. */
export type Problem = {
  version: 1;
  crew: Crew;
  times: Times;
  aim: Aim;
  guitars: ProblemGuitar[];
  songs: ProblemSong[];
  order: string[];
  rules: Rules;
  maxMoved: number | null;
  capos?: CapoKind[];
  wishes?: Wish[];
};

export type ParsedProblem = { ok: true; problem: Problem } | { ok: false; problems: BadProblem[] };

const MOST_LISTED = 1000;

/**
 * Reads a problem from any JSON value. What may be left out is filled in (check, cover, aim.exposed and keeps; a song's
 * cover as `null`); otherwise all that is wrong is listed, up to a thousand lines. Never throws.
 *
 * @example parseProblem({ version: 2 }) // { ok: false, problems: [{ code: "unknown-value", path: "version", … }, …] }
 */
export function parseProblem(input: unknown): ParsedProblem {
  const parsed = problemShape.safeParse(input);
  const shape = parsed.success ? [] : parsed.error.issues.flatMap((issue) => shapeProblems(issue, input));
  const problems = [...shape, ...crossCheck(input)];
  if (parsed.success && problems.length === 0) return { ok: true, problem: parsed.data };
  if (problems.length <= MOST_LISTED) return { ok: false, problems };
  const rest = problems.length - MOST_LISTED;
  const more = bad("more", [], `${rest} more things are wrong.`, "Mend these first.");
  return { ok: false, problems: [...problems.slice(0, MOST_LISTED), more] };
}
