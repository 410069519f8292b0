import type { Capo, Neck } from "#app/domain/music/neck.ts";
import type { CapoWork, StringWork } from "#app/domain/planning/answer.ts";
import type { Times } from "#app/domain/planning/problem.ts";

/** What is done to one guitar's neck: strings from the low side; capos taken off or moved, then put on. */
export type NeckChange = { strings: StringWork[]; capos: CapoWork[] };

const byFret = (a: Capo, b: Capo) => a.fret - b.fret;

/** The covered strings as one comparable word, in whatever order they were written. */
function coverKey(capo: Capo): string {
  return [...capo.strings].sort((a, b) => a - b).join(",");
}

function retunedStrings(from: number[], to: number[]): StringWork[] {
  const strings: StringWork[] = [];
  const count = Math.min(from.length, to.length);
  for (let string = count; string >= 1; string -= 1) {
    const was = from[from.length - string]!;
    const is = to[to.length - string]!;
    if (was !== is) strings.push({ string, from: was, to: is });
  }
  return strings;
}

function capoActions(from: Capo[], to: Capo[]): CapoWork[] {
  if (from.length === 0 && to.length === 0) return [];
  const covers = new Map<string, { off: Capo[]; on: Capo[] }>();
  const at = (key: string) => {
    const known = covers.get(key) ?? { off: [], on: [] };
    covers.set(key, known);
    return known;
  };
  for (const capo of from) at(coverKey(capo)).off.push(capo);
  for (const capo of to) at(coverKey(capo)).on.push(capo);

  const taken: CapoWork[] = [];
  const ons: CapoWork[] = [];
  for (const { off, on } of covers.values()) {
    const leaving = off.filter((capo) => !on.some((other) => other.fret === capo.fret)).sort(byFret);
    const coming = on.filter((capo) => !off.some((other) => other.fret === capo.fret)).sort(byFret);
    const pairs = Math.min(leaving.length, coming.length);
    for (const [i, { fret, strings }] of leaving.entries()) {
      const to = i < pairs ? coming[i]!.fret : null;
      if (to === null) taken.push({ action: "off", strings: [...strings], from: fret });
      else taken.push({ action: "move", strings: [...strings], from: fret, to });
    }
    for (const { fret, strings } of coming.slice(pairs))
      ons.push({ action: "on", strings: [...strings], to: fret });
  }
  return [...taken, ...ons];
}

/**
 * What must be done to one guitar to turn its neck from one state into another. Capos with the same fret and the same
 * strings stay; of the others, one taken off and one put on over the same strings pair up as a move, as many as
 * possible (which with which makes no difference to any count).
 *
 * @example neckChange({ open: [36], capos: [] }, { open: [38], capos: [] })
 * // { strings: [{ string: 1, from: 36, to: 38 }], capos: [] }
 */
export function neckChange(from: Neck, to: Neck): NeckChange {
  return { strings: retunedStrings(from.open, to.open), capos: capoActions(from.capos, to.capos) };
}

/** Whether there is anything to do at all. */
export function isChange(change: NeckChange): boolean {
  return change.strings.length > 0 || change.capos.length > 0;
}

/**
 * Semitones of all retuned strings together.
 *
 * @example semitonesOf({ strings: [{ string: 6, from: 36, to: 38 }], capos: [] }) // 2
 */
export function semitonesOf(change: NeckChange): number {
  return change.strings.reduce((sum, { from, to }) => sum + Math.abs(to - from), 0);
}

/**
 * Seconds of work: for each retuned string `string` and `semitone` × its semitones; each capo action its time; and
 * `check` once if a string is retuned or a capo is put on or moved.
 *
 * @example changeSeconds(times, neckChange(a, b)) // 8 + 2 × 1 + 6 + 5 = 21 for one string up 2 and one capo moved
 */
export function changeSeconds(times: Times, change: NeckChange): number {
  let seconds = change.strings.length * times.string + semitonesOf(change) * times.semitone;
  let check = change.strings.length > 0;
  for (const { action } of change.capos) {
    if (action === "off") {
      seconds += times.capoOff;
    } else {
      seconds += action === "move" ? times.capoMove : times.capoOn;
      check = true;
    }
  }
  return check ? seconds + times.check : seconds;
}
