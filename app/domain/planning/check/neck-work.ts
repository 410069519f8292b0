import type { Capo, Neck } from "#app/domain/music/neck.ts";
import type { CapoWork, StringWork } from "#app/domain/planning/answer.ts";
import type { Times } from "#app/domain/planning/problem.ts";

/** What one change of a neck comes to, counted from the two necks alone. */
export type Counted = {
  strings: number;
  semitones: number;
  moves: number;
  ons: number;
  offs: number;
  seconds: number;
};

/** A set of strings as one word, in whatever order they were written. */
export const nameOf = (strings: number[]) => [...strings].sort((a, b) => b - a).join("-");
const capoName = (fret: number, strings: number[]) => `${nameOf(strings)} at ${fret}`;
const namesOf = (capos: Capo[]) => new Set(capos.map(({ fret, strings }) => capoName(fret, strings)));

export function sameNeck(a: Neck, b: Neck): boolean {
  const mine = namesOf(a.capos);
  const theirs = namesOf(b.capos);
  return (
    a.open.length === b.open.length &&
    a.open.every((pitch, i) => pitch === b.open[i]) &&
    mine.size === theirs.size &&
    [...mine].every((name) => theirs.has(name))
  );
}

/** Counts a change by the contract: strings that differ, and over each set of strings as many moves as pairs allow. */
export function countChange(times: Times, from: Neck, to: Neck): Counted {
  const differences = from.open.map((pitch, i) => Math.abs(pitch - to.open[i]!)).filter((by) => by > 0);
  const had = namesOf(from.capos);
  const needs = namesOf(to.capos);
  const leaving = from.capos.filter(({ fret, strings }) => !needs.has(capoName(fret, strings)));
  const coming = to.capos.filter(({ fret, strings }) => !had.has(capoName(fret, strings)));
  let moves = 0;
  const unpaired = coming.map(({ strings }) => nameOf(strings));
  for (const { strings } of leaving) {
    const partner = unpaired.indexOf(nameOf(strings));
    if (partner === -1) continue;
    unpaired.splice(partner, 1);
    moves += 1;
  }
  const ons = coming.length - moves;
  const offs = leaving.length - moves;
  const semitones = differences.reduce((sum, by) => sum + by, 0);
  const toCheck = differences.length > 0 || moves > 0 || ons > 0;
  return {
    strings: differences.length,
    semitones,
    moves,
    ons,
    offs,
    seconds:
      differences.length * times.string +
      semitones * times.semitone +
      moves * times.capoMove +
      ons * times.capoOn +
      offs * times.capoOff +
      (toCheck ? times.check : 0),
  };
}

/** What is wrong with a list of actions that is said to turn one neck into the other; null where nothing is. */
export function wrongActions(from: Neck, to: Neck, strings: StringWork[], capos: CapoWork[]): string | null {
  const open = [...from.open];
  for (const { string, from: was, to: is } of strings) {
    const at = open.length - string;
    if (open[at] !== was || was === is) return `string ${string} is not retuned from ${was} to ${is}`;
    open[at] = is;
  }
  if (new Set(strings.map(({ string }) => string)).size !== strings.length) return "a string is listed twice";
  if (open.some((pitch, i) => pitch !== to.open[i])) return "the strings do not end as the song needs them";

  const needs = namesOf(to.capos);
  const left = namesOf(from.capos);
  const put = new Set<string>();
  for (const action of capos) {
    if (action.action !== "on") {
      const name = capoName(action.from, action.strings);
      if (!left.delete(name) || needs.has(name)) return `the capo ${name} is not one to take away`;
    }
    if (action.action !== "off") {
      const name = capoName(action.to, action.strings);
      if (put.has(name) || left.has(name) || !needs.has(name)) return `the capo ${name} is not one to put on`;
      put.add(name);
    }
  }
  const end = new Set([...left, ...put]);
  if (end.size !== needs.size || [...end].some((name) => !needs.has(name)))
    return "the capos do not end as the song needs them";
  return null;
}
