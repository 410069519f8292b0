import type { Semitones } from "#app/domain/music/pitch.ts";

const words: Record<string, number> = {
  a: 1,
  an: 1,
  one: 1,
  two: 2,
  three: 3,
  four: 4,
  five: 5,
  six: 6,
  seven: 7,
  half: 0.5,
  "½": 0.5,
  "1/2": 0.5,
  "1½": 1.5,
  "1 1/2": 1.5,
  "one and a half": 1.5,
};
const count = "one and a half|1 1/2|1/2|1½|½|a half|an?|one|two|three|four|five|six|seven|half|\\d{1,2}";
const unit =
  "semi-?tones?|half[- ]?(?:steps?|tones?)|(?:whole |full )?(?:steps?|tones?)(?: and a half)?|frets?";
const amount = `(?:(?<count>${count})[ -]?)?(?<unit>${unit})|(?<bare>\\d{1,2})`;
const lead = "(?:(?:tuned|tune|all|everything|all strings) )*";
const patterns = [
  `${lead}(?<way>down|up|lower|higher) (?:by )?(?:${amount})`,
  `${lead}(?:${amount}) (?<way>down|up|lower|higher|low|high)`,
  "(?<sign>[+−-])(?<bare>\\d{1,2})",
];
const atEnd = patterns.map((pattern) => new RegExp(`(?:^|\\s|,)${pattern}$`, "iu"));
const atStart = patterns.map((pattern) => new RegExp(`^${pattern}(?:\\s|,|:)`, "iu"));
/** Beyond an octave it is a slip of the finger rather than a tuning. */
const mostSemitones = 12;

function semitonesOf(groups: Record<string, string | undefined>): Semitones | null {
  const down = groups.sign ? groups.sign !== "+" : /^(down|low)/i.test(groups.way ?? "");
  const counted = (text: string) => words[text.toLowerCase().replace(/^a half$/, "half")] ?? Number(text);
  const unitName = (groups.unit ?? "").toLowerCase();
  const semitonesPerUnit = /^(semi|half|fret)/.test(unitName) ? 1 : 2;
  const extra = unitName.endsWith("and a half") ? 1 : 0;
  const size = groups.bare ? Number(groups.bare) : counted(groups.count ?? "a") * semitonesPerUnit + extra;
  if (!Number.isInteger(size) || size < 1 || size > mostSemitones) return null;
  return down ? -size : size;
}

/**
 * Takes a move of all strings off the end or the start of a tuning: "down 1" and "half step down" are semitones −1,
 * "whole step up" is +2. A step is two semitones. `shift` is 0 where there is none, `rest` what remains.
 * @example readTuningShift("DADGAD down a half step") // { shift: -1, rest: "DADGAD" }
 */
export function readTuningShift(text: string): { shift: Semitones; rest: string } {
  for (const pattern of [...atEnd, ...atStart]) {
    const match = pattern.exec(text);
    const shift = match?.groups && semitonesOf(match.groups);
    if (match && shift) {
      const rest = `${text.slice(0, match.index)} ${text.slice(match.index + match[0].length)}`;
      return { shift, rest: rest.replace(/^[\s,:]+|[\s,:]+$/g, "") };
    }
  }
  return { shift: 0, rest: text };
}
