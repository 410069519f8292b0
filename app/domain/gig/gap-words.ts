import type { Gap, Row } from "#app/domain/gig/plan.ts";
import { isFullCapo, stops, stringsInWords } from "#app/domain/music/capo.ts";
import { keyFifths } from "#app/domain/music/key.ts";
import { fifthsOfTuning, type Naming, stringName } from "#app/domain/music/note-names.ts";
import type { CapoWork, StringWork } from "#app/domain/planning/answer.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** One thing that happens in a gap, ready to be drawn: a triangle for a peg, words for the rest. */
export type GapToken =
  | { kind: "swap"; guitar: Guitar }
  | { kind: "take"; words: string; said: string }
  | { kind: "capo"; words: string }
  | { kind: "string"; string: number; direction: "up" | "down"; semitones: number; to: string }
  | { kind: "tech"; words: string };

/** What of a row its words need. */
export type GapRow = Pick<Row, "guitar" | "neck" | "song" | "gap">;

/** The change of this row's guitar in its gap, whoever makes it; null where there is none. */
function changeOf(
  row: GapRow,
): { strings: StringWork[]; capos: CapoWork[]; onStage: boolean; atSide: boolean } | null {
  const works = row.gap?.work.filter((work) => work.guitar === row.guitar?.id) ?? [];
  const first = works[0];
  if (!first) return null;
  return {
    strings: first.strings,
    capos: first.capos,
    onStage: works.some((work) => work.by === "player"),
    atSide: works.some((work) => work.by === "tech"),
  };
}

/** The line of fifths to spell this row's strings on: the song's key where it has one, else what suits the tuning. */
export function fifthsOf(row: Pick<Row, "song" | "neck">): number {
  const key = row.song ? keyFifths(row.song.key) : null;
  return key ?? fifthsOfTuning(row.neck?.open ?? []);
}

/** Which strings a partial capo leaves or covers, told the shorter way; "" for a full one. */
function coverage(strings: readonly number[], count: number): string {
  if (isFullCapo({ fret: 1, strings: [...strings] }, count)) return "";
  const free = Array.from({ length: count }, (_, index) => index + 1).filter(
    (string) => !strings.includes(string),
  );
  return free.length <= strings.length ? `, leave ${stringsInWords(free)}` : ` on ${stringsInWords(strings)}`;
}

/**
 * A capo's change in words: "capo off", "capo on 3, leave 6", "capo to 5". `told`: the strings stand elsewhere.
 */
function capoWord(change: CapoWork, count: number, several: boolean, told = false): string {
  const which = told ? "" : coverage(change.strings, count);
  if (change.action === "off") return several ? `capo off ${change.from}` : "capo off";
  if (change.action === "on") return `capo on ${change.to}${which}`;
  return several ? `capo ${change.from} to ${change.to}` : `capo to ${change.to}`;
}

/** Whether more than one capo was on the neck before, so that its fret must tell which is meant. */
function hadSeveral(row: GapRow, changes: readonly CapoWork[]): boolean {
  const put = changes.filter((change) => change.action !== "off").length;
  const taken = changes.filter((change) => change.action !== "on").length;
  return (row.neck?.capos.length ?? 0) - put + taken > 1;
}

/** Changes in the order in which hands work: capos off first, strings down, strings up, then capos on or moved. */
function inOrder(strings: readonly StringWork[], capos: readonly CapoWork[]) {
  return {
    off: capos.filter((capo) => capo.action === "off"),
    down: strings.filter((string) => string.to < string.from),
    up: strings.filter((string) => string.to > string.from),
    on: capos.filter((capo) => capo.action !== "off"),
  };
}

/**
 * A gap for the planning line, in the order in which hands work.
 * @example gapTokens(row, "english") // [{ kind: "capo", words: "capo off" }, { kind: "string", string: 6, direction: "down", … }]
 */
export function gapTokens(row: GapRow, naming: Naming): GapToken[] {
  const tokens: GapToken[] = [];
  if (row.gap?.swap && row.guitar) tokens.push({ kind: "swap", guitar: row.guitar });
  for (const { guitar, capos } of row.gap?.givers ?? []) {
    const [short, long] = capos === 1 ? ["capo", "the capo"] : [`${capos} capos`, `${capos} capos`];
    const off = `off ${guitar.shortName}`;
    tokens.push({ kind: "take", words: `${short} ${off}`, said: `Take ${long} ${off}` });
  }
  const change = changeOf(row);
  if (!change || !row.guitar) return tokens;
  const count = row.guitar.strings;
  const { off, down, up, on } = inOrder(change.strings, change.capos);
  const fifths = fifthsOf(row);
  for (const capo of off)
    tokens.push({ kind: "capo", words: capoWord(capo, count, hadSeveral(row, change.capos)) });
  for (const { string, from, to } of [...down, ...up]) {
    tokens.push({
      kind: "string",
      string,
      direction: to > from ? "up" : "down",
      semitones: Math.abs(to - from),
      to: stringName(to, naming, fifths),
    });
  }
  for (const capo of on)
    tokens.push({ kind: "capo", words: capoWord(capo, count, hadSeveral(row, change.capos)) });
  if (change.atSide) tokens.push({ kind: "tech", words: sideToken(change, row.gap?.late ?? false) });
  return tokens;
}

function sideToken({ onStage }: { onStage: boolean }, late: boolean): string {
  if (late) return "late at the side";
  return onStage ? "the rest at the side" : "at the side";
}

/** What the tech does, from when on, and whether it is ready in time. */
function sideWords({ gap }: GapRow): string {
  const done = gap?.work.find((work) => work.by === "tech")?.seconds ?? 0;
  const left = gap?.work.find((work) => work.by === "player")?.seconds ?? 0;
  const since = gap?.restsAfter ? `, once ${gap.restsAfter} is over` : "";
  if (left === 0) return `The tech does this at the side${since}`;
  return `The tech does ${seconds(done)} of this at the side${since}; ${seconds(left)} are left for the stage`;
}

function upperFirst(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

function seconds(value: number): string {
  return `${Math.round(value)} s`;
}

function timeWords(gap: Gap): string {
  if (gap.seconds === 0) return gap.work.length > 0 ? "Nothing to wait for on stage" : "Nothing to do";
  const about = `About ${seconds(gap.seconds)}`;
  const exposed = Math.round(gap.exposed) > 0;
  if (exposed && gap.cover > 0) return `${about}, ${seconds(gap.exposed)} longer than the talk covers`;
  if (exposed) return `${about} of dead air`;
  return `${about}, covered by the talk`;
}

/**
 * A gap in sentences, for hover, focus and screen readers.
 * @example gapSentence(row, "english")
 *   // "Capo off. String 6 down 2, to D. About 14 s, 2 s longer than the talk covers."
 */
export function gapSentence(row: GapRow, naming: Naming): string {
  const { gap } = row;
  if (!gap) return "";
  const parts: string[] = [];
  for (const token of gapTokens(row, naming)) {
    if (token.kind === "swap") parts.push(`Change to ${token.guitar.shortName}`);
    if (token.kind === "take") parts.push(token.said);
    if (token.kind === "capo") parts.push(upperFirst(token.words));
    if (token.kind === "string")
      parts.push(`String ${token.string} ${token.direction} ${token.semitones}, to ${token.to}`);
    if (token.kind === "tech") parts.push(sideWords(row));
  }
  if (parts.length === 0 && gap.seconds === 0) return "Nothing to do.";
  parts.push(timeWords(gap));
  return `${parts.join(". ")}.`;
}

/**
 * Capos that move while strings under them are retuned: hands take them off first and put them on last, so that the
 * tuner reads the letters on the sheet.
 */
function liftedFirst(strings: readonly StringWork[], capos: readonly CapoWork[]): CapoWork[] {
  const turned = new Set(strings.map((one) => one.string));
  return capos.flatMap((capo): CapoWork[] => {
    if (capo.action !== "move" || !capo.strings.some((string) => turned.has(string))) return [capo];
    return [
      { action: "off", strings: capo.strings, from: capo.from },
      { action: "on", strings: capo.strings, to: capo.to },
    ];
  });
}

/** What of a change the player does. Of a guitar that the tech hands over in time, only capos that came with the player. */
function onStageChange(row: GapRow): { strings: StringWork[]; capos: CapoWork[] } | null {
  const change = changeOf(row);
  if (!change?.onStage) return null;
  if (!change.atSide || row.gap?.late) return change;
  const brought = new Set(row.gap?.givers.flatMap((one) => (one.justPlayed ? [one.guitar.id] : [])));
  const capos = change.capos.filter((capo) => capo.action === "on" && brought.has(capo.takenFrom ?? ""));
  return { strings: [], capos };
}

/**
 * What hands must do before a song, for the stage sheet: the guitar and the strings of a capo stand beside it, so the
 * words begin with the capo and name only its fret. Only what the player does: a guitar that the tech hands over is ready.
 * @example stageWords(row, "english") // "capo off, 2 down, 1 up"
 */
export function stageWords(row: GapRow, naming: Naming): string {
  const change = onStageChange(row);
  if (!change || !row.guitar || !row.neck) return "";
  const count = row.guitar.strings;
  const several = hadSeveral(row, changeOf(row)?.capos ?? []);
  const { off, down, up, on } = inOrder(change.strings, liftedFirst(change.strings, change.capos));
  const words = giverWords(row);
  words.push(...off.map((capo) => capoWord(capo, count, several, true)));
  if (down.length > 0) words.push(`${down.length} down`);
  if (up.length > 0) words.push(`${up.length} up`);
  words.push(...on.map((capo) => capoWord(capo, count, several, true)));
  return [...words, ...tunerWords(row, change, naming)].join(", ");
}

/** Where a capo comes from that another guitar gives: the one just played is still in hand. */
function giverWords({ gap }: GapRow): string[] {
  return (gap?.givers ?? []).map(({ guitar, capos, justPlayed }) => {
    if (justPlayed) return capos === 1 ? "take the capo with you" : `take ${capos} capos with you`;
    return capos === 1 ? `capo from ${guitar.shortName}` : `${capos} capos from ${guitar.shortName}`;
  });
}

/** What the tuner reads where a string is retuned under a capo that stays: "6 reads E". */
function tunerWords(
  row: GapRow,
  change: { strings: StringWork[]; capos: CapoWork[] },
  naming: Naming,
): string[] {
  if (!row.neck || !row.guitar) return [];
  const moved = new Set(
    change.capos.flatMap((capo) => (capo.action === "off" ? [] : [`${capo.to}:${capo.strings.join()}`])),
  );
  const staying = row.neck.capos.filter((capo) => !moved.has(`${capo.fret}:${capo.strings.join()}`));
  const stop = stops(staying, row.guitar.strings);
  const fifths = fifthsOf(row);
  return change.strings.flatMap(({ string, to }) => {
    const fret = stop[row.guitar!.strings - string] ?? 0;
    return fret === 0 ? [] : [`${string} reads ${stringName(to + fret, naming, fifths)}`];
  });
}
