import type { Neck } from "#app/domain/music/neck.ts";
import { caposSuffice } from "#app/domain/planning/capo-kinds.ts";
import { type CapoTables, capoTables, lessAndLess, mostTaken } from "#app/domain/planning/capo-tables.ts";
import { type ChangeTable, changeTable } from "#app/domain/planning/change-table.ts";
import { coverInto, mayPlay } from "#app/domain/planning/playable.ts";
import type { Problem } from "#app/domain/planning/problem.ts";
import { type WishTables, wishTables } from "#app/domain/planning/wish-tables.ts";

/** One way to play a song: guitar and neck as numbers of the model, `choice` its place in the song's `necks`. */
export type Option = { guitar: number; neck: number; choice: number; penalty: number };

/** The neck number of a guitar that has not been used and may still be prepared freely. */
export const UNUSED = -1;

/**
 * A problem as numbers, for searching. Songs are numbered as they stand in the present order, guitars as in the problem,
 * distinct necks from 0. `penalty` of an option is weighted, ready to be added to a total.
 */
export type Model = {
  problem: Problem;
  songs: number;
  guitars: number;
  tech: boolean;
  necks: Neck[];
  changes: ChangeTable;
  options: Option[][];
  cover: Float64Array;
  seconds: Float64Array;
  start: Int32Array;
  keeps: Uint8Array;
  /** Seconds that changing each guitar can take at most. */
  longestJobs: number[];
  /**
   * Whether a tech can fail to finish a job at all; if not, free time need not be counted. A job always finishes if none is
   * longer than the shortest song: the song before it is the tech's alone.
   */
  mayBeLate: boolean;
  /** What is counted of capos; null where there are enough of every kind. */
  capos: CapoTables | null;
  /** What the set should rather be like; null where nothing is wished. */
  wishes: WishTables | null;
};

function neckKey({ open, capos }: Neck): string {
  const written = capos.map(({ fret, strings }) => `${fret}:${[...strings].sort((a, b) => a - b)}`);
  return `${open}|${written.sort().join(" ")}`;
}

function numberNecks(): { necks: Neck[]; numberOf: (neck: Neck) => number } {
  const necks: Neck[] = [];
  const numbers = new Map<string, number>();
  const numberOf = (neck: Neck) => {
    const key = neckKey(neck);
    const known = numbers.get(key) ?? necks.length;
    if (known === necks.length) {
      numbers.set(key, known);
      necks.push({ open: neck.open, capos: neck.capos });
    }
    return known;
  };
  return { necks, numberOf };
}

/** Of several ways on the same guitar with the same neck, only the one with the least penalty is kept. */
function cheapest(options: Option[]): Option[] {
  return options.filter(
    (option, i) =>
      !options.some(
        (other, k) =>
          other.guitar === option.guitar &&
          other.neck === option.neck &&
          (other.penalty < option.penalty || (other.penalty === option.penalty && k < i)),
      ),
  );
}

/** Seconds that one change of a guitar can take at most, with all that has to be taken from others for it. */
function longestJob(
  { problem, options, start, changes, capos }: Omit<Model, "longestJobs" | "mayBeLate">,
  guitar: number,
) {
  const own = options.flat().filter((option) => option.guitar === guitar);
  const used = [...new Set(own.map(({ neck }) => neck))];
  const first = start[guitar]!;
  const whole = first === UNUSED ? used : [...used, first];
  const from = capos ? [...new Set(whole.flatMap((neck) => lessAndLess(capos, neck)))] : whole;
  let longest = 0;
  for (const x of from)
    for (const y of used) {
      const taking = capos ? mostTaken(capos, y) * problem.times.capoOff : 0;
      longest = Math.max(longest, changes.seconds[x * changes.size + y]! + taking);
    }
  return longest;
}

/** The problem as numbers. Songs that no guitar can play have no options; see `why-infeasible.ts`. */
export function modelOf(problem: Problem): Model {
  const { necks, numberOf } = numberNecks();
  const byId = new Map(problem.songs.map((song) => [song.id, song]));
  const songs = problem.order.map((id) => byId.get(id)!);
  const weight = problem.aim.seconds + problem.aim.exposed;
  const options = songs.map((song) =>
    cheapest(
      problem.guitars.flatMap((guitar, g) =>
        song.necks.flatMap((neck, choice) =>
          mayPlay(guitar, neck) && caposSuffice(problem, neck)
            ? [{ guitar: g, neck: numberOf(neck), choice, penalty: weight * neck.penalty }]
            : [],
        ),
      ),
    ),
  );
  const start = Int32Array.from(problem.guitars, ({ start }) => (start ? numberOf(start) : UNUSED));
  const capos = capoTables(problem, necks, numberOf);
  const changes = changeTable(problem, necks);
  const seconds = Float64Array.from(songs, (song) => song.seconds);
  const tech = problem.crew === "tech";
  const model: Omit<Model, "longestJobs" | "mayBeLate"> = {
    problem,
    songs: songs.length,
    guitars: problem.guitars.length,
    tech,
    necks,
    changes,
    options,
    cover: Float64Array.from(songs, (song) => coverInto(problem.times, song)),
    seconds,
    start,
    keeps: Uint8Array.from(problem.guitars, ({ keeps }) => (keeps ? 1 : 0)),
    capos,
    wishes: wishTables(problem, necks),
  };
  const longestJobs = problem.guitars.map((_, guitar) => longestJob(model, guitar));
  const shortest = Math.min(...seconds);
  return { ...model, longestJobs, mayBeLate: tech && longestJobs.some((job) => job > shortest) };
}
