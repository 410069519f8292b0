import type { Rule } from "#app/domain/gig/gig.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { raisedStrings } from "#app/domain/music/range.ts";
import type { Work } from "#app/domain/planning/answer.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

/** Something worth a second look that costs nothing in the plan. */
export type RowWarning = {
  code: "plain-raised" | "far" | "raised-at-an-end" | "into-retuned";
  message: string;
};

type Warned = {
  entry: { id: string };
  guitar: Guitar | null;
  neck: Neck | null;
  gap: { fromEntryId: string; work: Work[] } | null;
};

type Place = {
  /** The song opens or closes the main part of a set or its encore. */
  ends: boolean;
  into: readonly Rule[];
  naming: Naming;
};

/** How many of the highest strings are plain: three as a rule, none of a bass (common practice, no source). */
function plainStrings(guitar: Guitar): number {
  return guitar.kind === "bass" ? 0 : 3;
}

/** A peg turned this far in one gap drifts (common practice, no source). */
const far = 4;

const list = (strings: readonly number[]) => strings.join(", ");
const plural = (strings: readonly number[]) => (strings.length === 1 ? "string" : "strings");

/**
 * What to warn about at one row. Raising a plain string above its usual pitch, four semitones or more in one gap,
 * strings raised into a song that opens or closes, and any retuning where one song goes straight into the next.
 */
export function rowWarnings(row: Warned, { ends, into, naming }: Place): RowWarning[] {
  const { guitar, neck, gap } = row;
  if (!guitar || !neck) return [];
  const warnings: RowWarning[] = [];
  const raised = raisedStrings(neck.open, guitar.usual, naming).filter(
    (one) => one.string <= plainStrings(guitar),
  );
  if (raised.length > 0) {
    const strings = raised.map((one) => one.string);
    warnings.push({
      code: "plain-raised",
      message: `Plain ${plural(strings)} ${list(strings)} above usual pitch: wear eye protection when raising, and watch for breaks.`,
    });
  }
  const turned = gap?.work.filter((work) => work.guitar === guitar.id).flatMap((work) => work.strings) ?? [];
  const strings = [...new Map(turned.map((one) => [one.string, one])).values()];
  const wide = strings.filter((one) => Math.abs(one.to - one.from) >= far);
  if (wide.length > 0) {
    const most = Math.max(...wide.map((one) => Math.abs(one.to - one.from)));
    const who = wide.length === 1 ? "String" : "Strings";
    const turns = wide.length === 1 ? `turns ${most} semitones` : `turn as far as ${most} semitones`;
    warnings.push({
      code: "far",
      message: `${who} ${list(wide.map((one) => one.string))} ${turns} in one gap: check again after the first verse.`,
    });
  }
  const up = strings.filter((one) => one.to > one.from);
  if (ends && up.length > 0) {
    warnings.push({
      code: "raised-at-an-end",
      message: `${up.length === 1 ? "A string is" : `${up.length} strings are`} raised into a song that opens or closes: raised strings drift.`,
    });
  }
  const straight = into.some(
    (rule) => rule.kind === "into" && rule.b === row.entry.id && rule.a === gap?.fromEntryId,
  );
  const onStage = gap?.work.some((work) => work.guitar === guitar.id && work.by === "player");
  if (straight && onStage && strings.length > 0) {
    warnings.push({
      code: "into-retuned",
      message: `Goes straight in, but ${strings.length === 1 ? "a string has" : `${strings.length} strings have`} to be retuned first.`,
    });
  }
  return warnings;
}
