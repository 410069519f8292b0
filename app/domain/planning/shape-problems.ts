import type { z } from "zod";
import { type BadProblem, bad } from "#app/domain/planning/bad-problem.ts";

type Issue = z.core.$ZodIssue;

const wantedWords: Record<string, string> = {
  string: "text",
  number: "a finite number",
  boolean: "true or false",
  array: "a list",
  object: "an object",
  tuple: "a list of two song ids",
};

function valueAt(input: unknown, path: PropertyKey[]): unknown {
  let value = input;
  for (const part of path) {
    if (typeof value !== "object" || value === null || !Object.hasOwn(value, part)) return undefined;
    value = (value as Record<PropertyKey, unknown>)[part];
  }
  return value;
}

function wrongType(issue: Issue & { code: "invalid_type" }, input: unknown): BadProblem {
  const wanted = wantedWords[issue.expected] ?? issue.expected;
  if (valueAt(input, issue.path) === undefined)
    return bad("missing-field", issue.path, "This field is missing.", `Give ${wanted}.`);
  return bad("wrong-type", issue.path, `This is not ${wanted}.`, `Give ${wanted}.`);
}

function custom(issue: Issue & { code: "custom" }, input: unknown): BadProblem {
  const params = issue.params ?? {};
  if (params.code === "not-whole")
    return bad("not-whole", issue.path, "This is not a whole number.", "Give a whole number.");
  if (params.code === "out-of-range") {
    const wanted = `${params.number ? "number" : "whole number"} from ${params.low} to ${params.high}`;
    return bad("out-of-range", issue.path, `This is not a ${wanted}.`, `Give a ${wanted}.`);
  }
  const missing = valueAt(input, issue.path) === undefined;
  return missing
    ? bad("missing-field", issue.path, "This field is missing.", `Give ${params.wanted}.`)
    : bad("wrong-type", issue.path, `This is not ${params.wanted}.`, `Give ${params.wanted}.`);
}

/** What one complaint of the schema means to the person who wrote the problem. */
export function shapeProblems(issue: Issue, input: unknown): BadProblem[] {
  const { path } = issue;
  switch (issue.code) {
    case "invalid_type":
      return [wrongType(issue, input)];
    case "unrecognized_keys":
      return issue.keys.map((key) =>
        bad(
          "unknown-field",
          [...path, key],
          "This field is not known.",
          "Remove it, or check how its name is spelled.",
        ),
      );
    case "invalid_value": {
      const values = issue.values.map((value) => JSON.stringify(value)).join(" or ");
      const missing = valueAt(input, path) === undefined;
      return [
        missing
          ? bad("missing-field", path, "This field is missing.", `Give ${values}.`)
          : bad("unknown-value", path, "This value is not known.", `Give ${values}.`),
      ];
    }
    case "too_small":
      if (issue.origin === "number")
        return [bad("negative", path, "This number is negative.", "Give 0 or more.")];
      if (path.at(-1) === "strings")
        return [
          bad(
            "empty",
            path,
            "This capo covers no string.",
            "Name the strings it covers, or remove the capo.",
          ),
        ];
      if (path.at(-1) === "curve")
        return [bad("empty", path, "This curve has no values.", "Give levels from 1 to 5.")];
      return [bad("wrong-length", path, "This list is too short.", "Give a list of two song ids.")];
    case "too_big":
      if (path.length > 2 && path[0] === "rules")
        return [bad("wrong-length", path, "This list is too long.", "Give a list of two song ids.")];
      return [
        bad(
          "too-many",
          path,
          `There are more than ${issue.maximum} here.`,
          `Give ${issue.maximum} or fewer.`,
        ),
      ];
    case "invalid_union": {
      const known = path.at(-1) === "kind" ? "run, apart or energy" : "a value that is known";
      const missing = valueAt(input, path) === undefined;
      return [
        missing
          ? bad("missing-field", path, "This field is missing.", `Give ${known}.`)
          : bad("unknown-value", path, "This value is not known.", `Give ${known}.`),
      ];
    }
    case "custom":
      return [custom(issue, input)];
    default:
      return [
        bad("wrong-value", path, issue.message, "Look up this field in the description of the problem."),
      ];
  }
}
