import { type BadProblem, bad } from "#app/domain/planning/bad-problem.ts";
import { kindOf } from "#app/domain/planning/capo-kinds.ts";
import { field, list, record } from "#app/domain/planning/raw-values.ts";

const numbersOf = (values: unknown): number[] => list(values).filter((value) => typeof value === "number");

/** What is wrong with the list of capos: kinds that stand twice, and starts that carry more than there are. */
export function checkStock(input: unknown): BadProblem[] {
  const onStarts = new Map<string, number>();
  for (const guitar of list(field(input, "guitars")))
    for (const capo of list(field(field(guitar, "start"), "capos"))) {
      const kind = kindOf(numbersOf(field(capo, "strings")));
      onStarts.set(kind, (onStarts.get(kind) ?? 0) + 1);
    }
  const seen = new Set<string>();
  return list(field(input, "capos")).flatMap((capo, i) => {
    const path = ["capos", i];
    const strings = numbersOf(field(capo, "strings"));
    const kind = kindOf(strings);
    const count = field(capo, "count");
    const problems: BadProblem[] = [];
    if (new Set(strings).size !== strings.length)
      problems.push(bad("repeated-string", path, "A string stands here twice.", "Name each string once."));
    else if (seen.has(kind))
      problems.push(
        bad("repeated-capo", path, "Another entry has the same strings.", "Count each kind of capo once."),
      );
    seen.add(kind);
    const needed = onStarts.get(kind) ?? 0;
    if (typeof count === "number" && needed > count)
      problems.push(
        bad(
          "too-few-capos",
          [...path, "count"],
          `Guitars start with ${needed} of these capos, and there are ${count}.`,
          "Raise the count, or take capos off a start.",
        ),
      );
    return problems;
  });
}

/** What is wrong with the wishes between their fields: songs that do not exist or stand in two groups, levels that are none. */
export function checkWishes(wishes: unknown, songs: Set<string>): BadProblem[] {
  return list(wishes).flatMap((wish, i) => {
    const path = ["wishes", i];
    const unknown = (id: unknown, at: (string | number)[]) =>
      typeof id === "string" && !songs.has(id)
        ? [bad("unknown-id", at, `There is no song ${JSON.stringify(id)}.`, "Name a song of this problem.")]
        : [];
    const seen = new Set<unknown>();
    const groups = list(field(wish, "groups")).flatMap((group, g) =>
      list(group).flatMap((id, k) => {
        const at = [...path, "groups", g, k];
        const twice = seen.has(id);
        seen.add(id);
        if (!twice) return unknown(id, at);
        const name = JSON.stringify(id);
        return [bad("repeated-song", at, `The song ${name} stands here twice.`, "Name each song once.")];
      }),
    );
    const levels = Object.entries(record(field(wish, "levels"))).flatMap(([id, level]) => {
      const at = [...path, "levels", id];
      const fits = typeof level === "number" && level >= 1 && level <= 5;
      const wrong = bad(
        "out-of-range",
        at,
        "This is not a number from 1 to 5.",
        "Give a number from 1 to 5.",
      );
      return [...unknown(id, at), ...(fits ? [] : [wrong])];
    });
    return [...groups, ...levels];
  });
}
