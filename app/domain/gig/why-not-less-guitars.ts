import type { Lift } from "#app/domain/gig/why-not-less-lift.ts";
import { nothingInstead } from "#app/domain/gig/why-not-less-lift.ts";
import { stringsInWords } from "#app/domain/music/capo.ts";
import { type Naming, stringNameWithOctave } from "#app/domain/music/note-names.ts";
import { defaultRange } from "#app/domain/music/range.ts";
import type { FoundAnswer } from "#app/domain/planning/answer.ts";
import type { NeckChoice, Problem, ProblemGuitar } from "#app/domain/planning/problem.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

type Range = Pick<ProblemGuitar, "lowest" | "highest">;

function withGuitar(problem: Problem, id: string, changes: Partial<ProblemGuitar>): Problem {
  return {
    ...problem,
    guitars: problem.guitars.map((guitar) => (guitar.id === id ? { ...guitar, ...changes } : guitar)),
  };
}

/** The ways that a guitar may take by their number of strings and by what the songs say. */
function waysFor({ songs }: Problem, { id, strings }: ProblemGuitar): NeckChoice[] {
  return songs
    .flatMap((song) => song.necks)
    .filter((neck) => neck.open.length === strings && (neck.guitars?.includes(id) ?? true));
}

/** A range wide enough for every way that the guitar may take; null where its own is. */
function wideEnough(problem: Problem, guitar: ProblemGuitar): Range | null {
  const opens = waysFor(problem, guitar).map((neck) => neck.open);
  const lowest = guitar.lowest.map((low, index) => Math.min(low, ...opens.map((open) => open[index]!)));
  const highest = guitar.highest.map((high, index) => Math.max(high, ...opens.map((open) => open[index]!)));
  const same = lowest.join() === guitar.lowest.join() && highest.join() === guitar.highest.join();
  return same ? null : { lowest, highest };
}

/** The strings that an answer takes out of a guitar's range, with how far: "string 6 down to C2, string 1 up to F4". */
function beyondWords(
  problem: Problem,
  guitar: ProblemGuitar,
  answer: FoundAnswer,
  naming: Naming,
): string | null {
  const necks = new Map(problem.songs.map((song) => [song.id, song.necks]));
  const opens = answer.plays.flatMap((play) => {
    const open = play.guitar === guitar.id ? necks.get(play.song)?.[play.neck]?.open : undefined;
    return open ? [open] : [];
  });
  const words = guitar.lowest.flatMap((low, index) => {
    const string = guitar.strings - index;
    const pitches = opens.map((open) => open[index]!);
    const least = Math.min(low, ...pitches);
    const most = Math.max(guitar.highest[index]!, ...pitches);
    return [
      ...(least < low ? [`string ${string} down to ${stringNameWithOctave(least, naming)}`] : []),
      ...(most > guitar.highest[index]!
        ? [`string ${string} up to ${stringNameWithOctave(most, naming)}`]
        : []),
    ];
  });
  return words.length > 0 ? words.join(", ") : null;
}

/** Each guitar that keeps its tuning, as if it did not. One that was set to a single tuning could then go as far as guitars do. */
function keptLifts(problem: Problem, guitars: ReadonlyMap<string, Guitar>): Lift[] {
  return problem.guitars
    .filter((guitar) => guitar.keeps)
    .flatMap((guitar) => {
      const own = guitars.get(guitar.id);
      if (!own) return [];
      const fixed = guitar.lowest.join() === guitar.highest.join();
      const range = fixed ? defaultRange(own.usual) : { lowest: guitar.lowest, highest: guitar.highest };
      const free = withGuitar(problem, guitar.id, { keeps: false, ...range });
      return [{ name: `${own.shortName} keeps its tuning`, problem: free, instead: nothingInstead }];
    });
}

/** How far each guitar can be tuned. A guitar that is fixed in one tuning is told as one that keeps it. */
function rangeLifts(problem: Problem, guitars: ReadonlyMap<string, Guitar>, naming: Naming): Lift[] {
  return problem.guitars.flatMap((guitar) => {
    const fixed = guitar.keeps && guitar.lowest.join() === guitar.highest.join();
    const range = fixed ? null : wideEnough(problem, guitar);
    const name = `How far ${guitars.get(guitar.id)?.shortName ?? "a guitar"} can be tuned`;
    if (!range) return [];
    const wide = withGuitar(problem, guitar.id, range);
    return [{ name, problem: wide, instead: (answer) => beyondWords(wide, guitar, answer, naming) }];
  });
}

/** "Only 1 capo over strings 5-1", "Only 2 full capos". */
function capoName(count: number, strings: readonly number[], full: boolean): string {
  const capos = count === 1 ? "capo" : "capos";
  const number = count === 0 ? "No" : `Only ${count}`;
  return full ? `${number} full ${capos}` : `${number} ${capos} over strings ${stringsInWords(strings)}`;
}

/** Each kind of capo of which there may be too few. One song by itself, or as many capos as guitars, never lacks one. */
function capoLifts(problem: Problem): Lift[] {
  const { capos = [], songs, guitars } = problem;
  const kindOf = (strings: readonly number[]) => strings.toSorted((a, b) => a - b).join();
  return capos.flatMap(({ strings, count }) => {
    const uses = (neck: NeckChoice) =>
      neck.capos.filter((capo) => kindOf(capo.strings) === kindOf(strings)).length;
    const most = songs.map((song) => Math.max(0, ...song.necks.map(uses)));
    const wanted = most.filter((one) => one > 0);
    if (count >= guitars.length * Math.max(0, ...most) || (wanted.length < 2 && count >= (wanted[0] ?? 0)))
      return [];
    const full = guitars.some((guitar) => guitar.strings === strings.length);
    const others = capos.filter((kind) => kindOf(kind.strings) !== kindOf(strings));
    return [
      {
        name: capoName(count, strings, full),
        problem: { ...problem, capos: others },
        instead: nothingInstead,
      },
    ];
  });
}

/** What guitars and capos keep a set from: kept tunings, ranges, and capos that are counted. */
export function gearLifts(problem: Problem, all: readonly Guitar[], naming: Naming): Lift[] {
  const guitars = new Map(all.map((guitar) => [guitar.id, guitar]));
  return [...keptLifts(problem, guitars), ...rangeLifts(problem, guitars, naming), ...capoLifts(problem)];
}
