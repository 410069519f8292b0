import type { Problem, ProblemSong } from "#app/domain/planning/problem.ts";

/** What an order of a set asks for at the very most. Seconds and counts over the whole set. */
export type MostWork = {
  /** On stage, with guitar changes and penalties. */
  seconds: number;
  /** Of work that talk covers. */
  talk: number;
  strings: number;
  semitones: number;
  capoActions: number;
  swaps: number;
};

type Retuning = { strings: number; semitones: number };

function retuning(from: readonly number[], to: readonly number[]): Retuning {
  const steps = to.map((pitch, index) => Math.abs(pitch - from[index]!));
  return {
    strings: steps.filter((step) => step > 0).length,
    semitones: steps.reduce((sum, step) => sum + step, 0),
  };
}

/** The most retuning that a guitar can need for a song, whichever song of the set it was used for last. */
function mostInto(song: ProblemSong, opens: readonly (readonly number[])[]): Retuning {
  const all = song.necks.flatMap(({ open }) =>
    opens.filter((from) => from.length === open.length).map((from) => retuning(from, open)),
  );
  return {
    strings: Math.max(0, ...all.map(({ strings }) => strings)),
    semitones: Math.max(0, ...all.map(({ semitones }) => semitones)),
  };
}

/**
 * Upper bounds on what any order of a set asks for. Why they are: in a gap one guitar is changed, for the song that it
 * leads into; the first song has no gap, unless guitars stand in some way already. A capo that was put on for a song comes
 * off once, whether taken off, moved or taken away. Talk covers no more than it lasts.
 *
 * @example mostWork(problem).swaps // 11, for 12 songs on two guitars
 */
export function mostWork({ songs, guitars, times, rules }: Problem): MostWork {
  const starts = guitars.flatMap(({ start }) => (start ? [start] : []));
  const opens = [...songs.flatMap((song) => song.necks), ...starts].map(({ open }) => open);
  const distinct = [...new Map(opens.map((open) => [open.join(), open])).values()];
  const led = songs.map((song) => {
    const { strings, semitones } = mostInto(song, distinct);
    const talk = song.cover ?? times.cover;
    const seconds = strings * times.string + semitones * times.semitone + times.check;
    return { first: rules.at[song.id] === 1, strings, semitones, talk, seconds };
  });
  const begun = starts.length > 0;
  const held = led.find(({ first }) => first);
  const overGaps = (key: "strings" | "semitones" | "talk" | "seconds") => {
    const sum = led.reduce((total, one) => total + one[key], 0);
    const least = held?.[key] ?? Math.min(...led.map((one) => one[key]));
    return begun || led.length === 0 ? sum : sum - least;
  };
  const gaps = begun ? songs.length : Math.max(0, songs.length - 1);
  const swaps = guitars.length > 1 ? gaps : 0;
  const capos = songs.reduce(
    (sum, song) => sum + Math.max(0, ...song.necks.map((neck) => neck.capos.length)),
    0,
  );
  const carried = starts.reduce((sum, start) => sum + start.capos.length, 0);
  const penalties = songs.reduce(
    (sum, song) => sum + Math.max(0, ...song.necks.map((neck) => neck.penalty)),
    0,
  );
  return {
    seconds:
      overGaps("seconds") +
      swaps * times.swap +
      capos * Math.max(times.capoMove, times.capoOn) +
      (capos + carried) * times.capoOff +
      penalties,
    talk: overGaps("talk"),
    strings: overGaps("strings"),
    semitones: overGaps("semitones"),
    capoActions: 2 * capos + carried,
    swaps,
  };
}
