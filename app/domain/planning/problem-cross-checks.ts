import { type BadProblem, bad } from "#app/domain/planning/bad-problem.ts";
import { checkStock, checkWishes } from "#app/domain/planning/extension-cross-checks.ts";
import { field, idsOf, list, record } from "#app/domain/planning/raw-values.ts";

type Place = readonly (string | number)[];

function repeatedIds(values: unknown[], name: string): BadProblem[] {
  const seen = new Set<unknown>();
  return values.flatMap((value, i) => {
    const id = field(value, "id");
    if (typeof id !== "string") return [];
    if (!seen.has(id)) {
      seen.add(id);
      return [];
    }
    return [
      bad(
        "repeated-id",
        [name, i, "id"],
        `The id ${JSON.stringify(id)} stands here a second time.`,
        "Give each an id of its own.",
      ),
    ];
  });
}

function checkOrder(order: unknown[], songs: string[]): BadProblem[] {
  const known = new Set(songs);
  const seen = new Set<string>();
  const problems: BadProblem[] = [];
  for (const [i, id] of order.entries()) {
    if (typeof id !== "string") continue;
    const path = ["order", i];
    if (!known.has(id))
      problems.push(
        bad("unknown-id", path, `There is no song ${JSON.stringify(id)}.`, "Name a song of this problem."),
      );
    else if (seen.has(id))
      problems.push(
        bad(
          "repeated-song",
          path,
          `The song ${JSON.stringify(id)} stands in the order twice.`,
          "Name each song once.",
        ),
      );
    seen.add(id);
  }
  for (const id of known) {
    if (!seen.has(id))
      problems.push(
        bad(
          "song-not-in-order",
          ["order"],
          `The song ${JSON.stringify(id)} is missing from the order.`,
          "Name each song once.",
        ),
      );
  }
  return problems;
}

function checkRules(rules: unknown, songs: string[]): BadProblem[] {
  const known = new Set(songs);
  const unknown = (id: unknown, path: Place) =>
    typeof id === "string" && !known.has(id)
      ? [
          bad(
            "unknown-id",
            path,
            `There is no song ${JSON.stringify(id)}.`,
            "Name a song of this problem, or remove the rule.",
          ),
        ]
      : [];
  const at = Object.entries(record(field(rules, "at"))).flatMap(([id, place]) => {
    const path = ["rules", "at", id];
    const whole =
      typeof place !== "number"
        ? [bad("wrong-type", path, "This is not a finite number.", "Give a whole number.")]
        : Number.isInteger(place)
          ? []
          : [bad("not-whole", path, "This is not a whole number.", "Give a whole number.")];
    return [...unknown(id, path), ...whole];
  });
  const pairs = ["before", "into", "apart"].flatMap((kind) =>
    list(field(rules, kind)).flatMap((pair, i) =>
      list(pair).flatMap((id, k) => unknown(id, ["rules", kind, i, k])),
    ),
  );
  return [...at, ...pairs];
}

function checkCapos(neck: unknown, path: Place): BadProblem[] {
  const strings = list(field(neck, "open")).length;
  const seen = new Set<string>();
  return list(field(neck, "capos")).flatMap((capo, i) => {
    const here = [...path, "capos", i];
    const covered = list(field(capo, "strings"));
    const named = new Set<number>();
    const problems = covered.flatMap((string, k) => {
      if (typeof string !== "number" || !Number.isInteger(string)) return [];
      const at = [...here, "strings", k];
      if (string < 1 || string > strings)
        return [
          bad(
            "unknown-string",
            at,
            `There is no string ${string} on this neck.`,
            `Give string numbers from 1 to ${strings}.`,
          ),
        ];
      if (named.has(string))
        return [
          bad("repeated-string", at, `String ${string} stands in this capo twice.`, "Name each string once."),
        ];
      named.add(string);
      return [];
    });
    const numbers = covered.filter((string) => typeof string === "number").sort((a, b) => a - b);
    const key = JSON.stringify([field(capo, "fret"), numbers]);
    if (numbers.length > 0 && seen.has(key))
      problems.push(
        bad(
          "repeated-capo",
          here,
          "Another capo of this neck has the same fret and strings.",
          "Remove one of them.",
        ),
      );
    seen.add(key);
    return problems;
  });
}

function checkGuitar(guitar: unknown, i: number): BadProblem[] {
  const path = ["guitars", i];
  const strings = field(guitar, "strings");
  const lowest = list(field(guitar, "lowest"));
  const highest = list(field(guitar, "highest"));
  const start = field(guitar, "start");
  const lengths: [Place, unknown][] = [
    [[...path, "lowest"], field(guitar, "lowest")],
    [[...path, "highest"], field(guitar, "highest")],
    [[...path, "start", "open"], field(start, "open")],
  ];
  const problems = lengths.flatMap(([at, pitches]) =>
    typeof strings === "number" && Array.isArray(pitches) && pitches.length !== strings
      ? [
          bad(
            "wrong-length",
            at,
            `There are ${pitches.length} pitches here and ${strings} strings on this guitar.`,
            "Give one pitch for each string.",
          ),
        ]
      : [],
  );
  for (const [k, low] of lowest.entries()) {
    const high = highest[k];
    if (typeof low === "number" && typeof high === "number" && low > high)
      problems.push(
        bad(
          "range-reversed",
          [...path, "lowest", k],
          `The lowest pitch, ${low}, is above the highest, ${high}.`,
          "Give a lowest pitch that is not above the highest.",
        ),
      );
  }
  return [...problems, ...checkCapos(start, [...path, "start"])];
}

function checkSong(song: unknown, i: number, guitars: Set<string>): BadProblem[] {
  return list(field(song, "necks")).flatMap((neck, k) => {
    const path = ["songs", i, "necks", k];
    const unknown = list(field(neck, "guitars")).flatMap((id, g) =>
      typeof id === "string" && !guitars.has(id)
        ? [
            bad(
              "unknown-id",
              [...path, "guitars", g],
              `There is no guitar ${JSON.stringify(id)}.`,
              "Name a guitar of this problem.",
            ),
          ]
        : [],
    );
    return [...unknown, ...checkCapos(neck, path)];
  });
}

/** What is wrong between fields: ids that repeat or lead nowhere, ranges the wrong way round, lengths, capos. */
export function crossCheck(input: unknown): BadProblem[] {
  const guitars = list(field(input, "guitars"));
  const songs = list(field(input, "songs"));
  const songIds = idsOf(songs);
  const guitarIds = new Set(idsOf(guitars));
  return [
    ...repeatedIds(guitars, "guitars"),
    ...guitars.flatMap(checkGuitar),
    ...repeatedIds(songs, "songs"),
    ...songs.flatMap((song, i) => checkSong(song, i, guitarIds)),
    ...checkOrder(list(field(input, "order")), songIds),
    ...checkRules(field(input, "rules"), songIds),
    ...checkStock(input),
    ...checkWishes(field(input, "wishes"), new Set(songIds)),
  ];
}
