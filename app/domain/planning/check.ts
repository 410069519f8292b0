import type { BrokenWish, FoundAnswer } from "#app/domain/planning/answer.ts";
import { readAnswer } from "#app/domain/planning/check/answer-shape.ts";
import { enoughCapos } from "#app/domain/planning/check/capo-places.ts";
import { type Fault, same } from "#app/domain/planning/check/fault.ts";
import { gapFaults } from "#app/domain/planning/check/gap-faults.ts";
import { infeasibleFaults } from "#app/domain/planning/check/infeasible-faults.ts";
import { sameNeck } from "#app/domain/planning/check/neck-work.ts";
import { orderFaults } from "#app/domain/planning/check/order-faults.ts";
import { type Played, playedSongs, type Recount, recount } from "#app/domain/planning/check/recount.ts";
import type { Problem } from "#app/domain/planning/problem.ts";

function playFaults(problem: Problem, played: Played[]): Fault[] {
  return played.flatMap(({ song, guitar, neck }, i) => {
    const allowed = neck.guitars === null || neck.guitars.includes(guitar.id);
    const inRange =
      neck.open.length === guitar.strings &&
      neck.open.every((pitch, k) => pitch >= guitar.lowest[k]! && pitch <= guitar.highest[k]!);
    if (allowed && inRange && enoughCapos(problem, neck)) return [];
    return [{ path: `plays.${i}`, message: `${song.id} cannot be played on ${guitar.id} like this` }];
  });
}

function beforeFaults(answer: FoundAnswer, { before }: Recount): Fault[] {
  const faults: Fault[] = [];
  const listed = answer.before.map(({ guitar }) => guitar).sort();
  const used = before.map(({ guitar }) => guitar).sort();
  if (listed.join("\n") !== used.join("\n"))
    faults.push({ path: "before", message: `the guitars used are ${used.join(", ")}` });
  for (const [i, stated] of answer.before.entries()) {
    const neck = before.find(({ guitar }) => guitar === stated.guitar);
    if (neck && !sameNeck(neck, stated))
      faults.push({ path: `before.${i}`, message: "the set begins otherwise" });
  }
  return faults;
}

function totalFaults(answer: FoundAnswer, counted: Recount): Fault[] {
  const faults: Fault[] = [];
  for (const [name, value] of Object.entries(counted.totals)) {
    const stated = answer.totals[name as keyof typeof counted.totals];
    if (stated === undefined || !same(stated, value))
      faults.push({ path: `totals.${name}`, message: `this comes to ${value}` });
  }
  if (answer.totals.wishes !== undefined && counted.totals.wishes === undefined)
    faults.push({ path: "totals.wishes", message: "nothing is wished" });
  if (!same(answer.total, counted.total))
    faults.push({ path: "total", message: `this comes to ${counted.total}` });
  const proven = same(answer.bound, answer.total);
  if (answer.bound > answer.total && !proven)
    faults.push({ path: "bound", message: "the bound is above the total" });
  if (answer.status === "optimal" && !proven)
    faults.push({ path: "bound", message: "the bound is not the total" });
  return faults;
}

function wishFaults(problem: Problem, answer: FoundAnswer, { broken }: Recount): Fault[] {
  if (!problem.wishes) return answer.broken ? [{ path: "broken", message: "nothing is wished" }] : [];
  const words = ({ wish, songs, seconds }: BrokenWish) =>
    `${wish}: ${songs.join(", ")}, ${seconds.toFixed(6)} s`;
  const stated = (answer.broken ?? []).map(words).join("; ");
  const counted = broken.map(words).join("; ");
  if (answer.broken && stated === counted) return [];
  return [{ path: "broken", message: counted === "" ? "no wish is broken" : `these are broken: ${counted}` }];
}

/**
 * Everything that is wrong with an answer to a problem, worked out from the problem alone and without any of the code
 * that searches or scores. An empty list says that the plan is valid and costs what it says; it does not say that there
 * is none better, nor that an infeasible problem is.
 *
 * @param answer the answer, or whatever stands in its place
 * @example check(problem, solve(problem)) // []
 */
export function check(problem: Problem, answer: unknown): Fault[] {
  const read = readAnswer(answer);
  if ("faults" in read) return read.faults;
  if (read.answer.status === "infeasible") return infeasibleFaults(problem, read.answer);
  const found = read.answer;
  const songs = [...problem.order].sort();
  if ([...found.order].sort().join("\n") !== songs.join("\n"))
    return [{ path: "order", message: "this does not hold every song once" }];
  if (found.plays.length !== songs.length)
    return [{ path: "plays", message: "this is not one play for each song" }];
  const played = playedSongs(problem, found);
  if (!played) return [{ path: "plays", message: "a play is missing, double, or names what is not there" }];
  const unplayable = playFaults(problem, played);
  if (unplayable.length > 0) return unplayable;
  const counted = recount(problem, played);
  const kept = counted.retunedKept.map((id) => ({
    path: "plays",
    message: `a guitar that keeps its tuning is retuned for ${id}`,
  }));
  return [
    ...orderFaults(problem, found.order),
    ...kept,
    ...beforeFaults(found, counted),
    ...gapFaults(found, played, counted),
    ...totalFaults(found, counted),
    ...wishFaults(problem, found, counted),
  ];
}
