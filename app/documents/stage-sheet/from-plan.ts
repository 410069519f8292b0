import { fifthsOf, stageWords } from "#app/domain/gig/gap-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import { dateWords, localTime } from "#app/domain/gig/local-time.ts";
import type { GigPlan, Row, SetPlan } from "#app/domain/gig/plan.ts";
import { caposWords, isFullCapo, stringsInWords } from "#app/domain/music/capo.ts";
import { formatTuning } from "#app/domain/music/format-tuning.ts";
import type { Capo } from "#app/domain/music/neck.ts";
import { fifthsOfTuning, type Naming } from "#app/domain/music/note-names.ts";
import type { SheetRow, SheetSet, SheetString, StageSheet } from "./sheet.ts";

/** Strings that stand in pairs (twelve-string, mandolin) are shown as one letter a course. */
function inCourses(open: readonly number[]): boolean {
  return (
    open.length >= 8 &&
    open.length % 2 === 0 &&
    open.every((pitch, index) => index % 2 === 1 || ((open[index + 1] ?? 0) - pitch) % 12 === 0)
  );
}

function tuningOf(row: Row, naming: Naming): SheetString[] {
  if (!row.neck || !row.guitar) return [];
  const turned = new Map(
    row.gap?.work
      .filter((work) => work.guitar === row.guitar?.id)
      .flatMap((work) =>
        work.strings.map((one) => [one.string, one.to > one.from ? ("up" as const) : ("down" as const)]),
      ),
  );
  const count = row.neck.open.length;
  const strings = formatTuning(row.neck.open, naming, fifthsOf(row)).map((letter, index) => ({
    letter,
    turned: turned.get(count - index) ?? null,
  }));
  if (!inCourses(row.neck.open)) return strings;
  return strings.flatMap((string, index) =>
    index % 2 === 1
      ? []
      : [{ letter: string.letter, turned: string.turned ?? strings[index + 1]?.turned ?? null }],
  );
}

/** "CAPO 3", and for a partial capo the strings it leaves, or those it covers where these are fewer. */
function capoLines(capo: Capo, strings: number): string[] {
  if (isFullCapo(capo, strings)) return [`CAPO ${capo.fret}`];
  const free = Array.from({ length: strings }, (_, index) => index + 1).filter(
    (string) => !capo.strings.includes(string),
  );
  const words =
    free.length <= capo.strings.length
      ? `leave ${stringsInWords(free)}`
      : `on ${stringsInWords(capo.strings)}`;
  return [`CAPO ${capo.fret}`, words];
}

function sheetRow(row: Row, previous: Row | null, naming: Naming): SheetRow {
  const takesUp = row.guitar !== null && (row.gap?.swap || row.gap === null);
  return {
    number: row.number,
    title: row.song?.title ?? "A song that is no longer in the library",
    guitar: takesUp && row.guitar ? { name: row.guitar.shortName, shape: row.guitar.badge } : null,
    action: row.left !== null ? "no guitar can play this" : stageWords(row, naming),
    tuning: tuningOf(row, naming),
    capos:
      row.guitar && row.neck
        ? row.neck.capos.flatMap((capo) => capoLines(capo, row.guitar?.strings ?? 6))
        : [],
    encore: row.section === 1 && previous?.section === 0,
  };
}

function doorsWords(plan: SetPlan, first: boolean, naming: Naming): string {
  if (plan.before.length === 0) return "";
  const guitars = plan.before.map(({ guitar, neck }) => {
    const letters = formatTuning(neck.open, naming, fifthsOfTuning(neck.open)).join(" ");
    return `${guitar.shortName} ${letters}, ${caposWords(neck.capos, guitar.strings)}`;
  });
  return `${first ? "At doors" : "In the interval"}: ${guitars.join(" | ")}`;
}

/** The time on the wall, so many seconds into the gig. */
function wallTime(gig: Gig, seconds: number): string {
  return localTime(new Date(Date.parse(gig.startsAt) + Math.round(seconds) * 1000).toISOString(), gig.zone)
    .time;
}

function sheetSet(gig: Gig, plan: SetPlan, index: number, sets: number, naming: Naming): SheetSet {
  const heading = sets > 1 ? `${plan.set.name || `Set ${index + 1}`} of ${sets}` : "";
  return {
    heading,
    doors: doorsWords(plan, index === 0, naming),
    time: `${wallTime(gig, plan.startSecond)} to ${wallTime(gig, plan.startSecond + plan.seconds)}`,
    rows: plan.rows.map((row, place) => sheetRow(row, plan.rows[place - 1] ?? null, naming)),
  };
}

/**
 * What a gig's stage sheet says, in the reader's naming.
 * @example stageSheetOf(gig, planGig(gig, repertoire), "english").sets[0].rows[3].capos // ["CAPO 3", "leave 6"]
 */
export function stageSheetOf(gig: Gig, plan: GigPlan, naming: Naming): StageSheet {
  return {
    title: gig.name,
    date: dateWords(localTime(gig.startsAt, gig.zone).date),
    curfew: gig.curfew === null ? "" : `curfew ${gig.curfew}`,
    sets: plan.sets.map((set, index) => sheetSet(gig, set, index, plan.sets.length, naming)),
  };
}
