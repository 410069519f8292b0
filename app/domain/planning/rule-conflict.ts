import type { Reason } from "#app/domain/planning/answer.ts";
import { movesLeft } from "#app/domain/planning/bounds/moves-left.ts";
import { modelOf } from "#app/domain/planning/model.ts";
import { compileRules } from "#app/domain/planning/order-rules.ts";
import type { Problem, Rules } from "#app/domain/planning/problem.ts";
import { BestFirst } from "#app/domain/planning/search/best-first.ts";
import { setSpace } from "#app/domain/planning/set-space.ts";

/** The same songs, sections and rules with nothing to retune: what is left is the question of the order. */
function orderOnly(problem: Problem): Problem {
  const neck = { open: [60], capos: [] };
  const times = { string: 0, semitone: 0, capoMove: 0, capoOn: 0, capoOff: 0, swap: 0, check: 0, cover: 0 };
  return {
    ...problem,
    crew: "alone",
    times,
    guitars: [{ id: "any", strings: 1, lowest: [60], highest: [60], start: null, keeps: false }],
    songs: problem.songs.map((song) => ({
      ...song,
      cover: null,
      necks: [{ ...neck, guitars: null, penalty: 0 }],
    })),
  };
}

/**
 * An order that keeps all rules, sections and `maxMoved`: found, proven not to exist, or undecided within the effort.
 * Every state costs nothing, and ties go to the deeper one, so that the search goes straight down.
 *
 * @param effort states to look at
 * @returns song numbers in order, `null` where there is no such order, `undefined` where it is not decided
 */
export function orderThatHolds(problem: Problem, effort: number): number[] | null | undefined {
  const bare = orderOnly(problem);
  const compiled = compileRules(bare);
  if (!compiled.ok) return null;
  const space = setSpace(modelOf(bare), compiled.rules, (layout) =>
    layout.limited ? movesLeft(compiled.rules, layout, problem.maxMoved!) : () => 0,
  );
  const run = new BestFirst(space, effort);
  run.run(effort);
  if (run.found) return space.planOf(run.found.moves).songs;
  return run.exhausted && run.floor() === Number.POSITIVE_INFINITY ? null : undefined;
}

type Rule = { songs: string[]; words: string; without: (rules: Rules) => Rules };

function rulesOf(problem: Problem): Rule[] {
  const name = (id: string) => JSON.stringify(id);
  const pairs = (kind: "before" | "into" | "apart", words: (a: string, b: string) => string) =>
    problem.rules[kind].map(
      (pair): Rule => ({
        songs: [...pair],
        words: words(name(pair[0]), name(pair[1])),
        without: (rules) => ({ ...rules, [kind]: rules[kind].filter((other) => other !== pair) }),
      }),
    );
  const at = Object.entries(problem.rules.at).map(
    ([song, place]): Rule => ({
      songs: [song],
      words: `${name(song)} at place ${place}`,
      without: (rules) => ({
        ...rules,
        at: Object.fromEntries(Object.entries(rules.at).filter(([other]) => other !== song)),
      }),
    }),
  );
  return [
    ...pairs("apart", (a, b) => `${a} and ${b} apart`),
    ...pairs("before", (a, b) => `${a} before ${b}`),
    ...pairs("into", (a, b) => `${a} straight into ${b}`),
    ...at,
  ];
}

/**
 * Why no order keeps the rules: a set of rules of which none can be left out, found by leaving out one after another. The
 * code is `moved` where the rules alone can be kept.
 *
 * @param effort for each of the trials; a rule whose trial is not decided is kept
 */
export function ruleConflict(problem: Problem, effort: number): Reason {
  const impossible = (trial: Problem) => orderThatHolds(trial, effort) === null;
  let left = problem;
  const unlimited = { ...left, maxMoved: null };
  if (left.maxMoved !== null && impossible(unlimited)) left = unlimited;
  const oneSection = { ...left, songs: left.songs.map((song) => ({ ...song, section: 0 })) };
  const sectionsMatter = !impossible(oneSection);
  if (!sectionsMatter) left = oneSection;
  const named: Rule[] = [];
  for (const rule of rulesOf(problem)) {
    const trial = { ...left, rules: rule.without(left.rules) };
    if (impossible(trial)) left = trial;
    else named.push(rule);
  }
  const misplaced = sectionsMatter && left.maxMoved !== null ? misplacedSongs(problem) : [];
  const limit = left.maxMoved === null ? [] : [movedWords(left.maxMoved)];
  const sections = sectionsMatter ? ["the sections"] : [];
  const words = [...named.map((rule) => rule.words), ...sections, ...limit];
  return {
    code: left.maxMoved === null ? "rules" : "moved",
    songs: [...new Set([...named.flatMap((rule) => rule.songs), ...misplaced])],
    message: `${words.join(", ")}: these contradict each other.`,
  };
}

/** Songs that stand before one of an earlier section, or after one of a later. */
function misplacedSongs(problem: Problem): string[] {
  const section = new Map(problem.songs.map((song) => [song.id, song.section]));
  const sections = problem.order.map((id) => section.get(id)!);
  return problem.order.filter(
    (_, i) =>
      sections.slice(i + 1).some((later) => later < sections[i]!) ||
      sections.slice(0, i).some((earlier) => earlier > sections[i]!),
  );
}

function movedWords(most: number): string {
  if (most === 0) return "no song may move";
  return most === 1 ? "only one song may move" : `only ${most} songs may move`;
}
