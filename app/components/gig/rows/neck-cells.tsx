import { memo } from "react";
import { formatTuning, spokenTuning } from "#app/domain/music/format-tuning.ts";
import { spellingFifths } from "#app/domain/music/key.ts";
import type { Neck } from "#app/domain/music/neck.ts";
import type { Naming } from "#app/domain/music/note-names.ts";

type NeckCellsProps = {
  neck: Neck;
  songKey: string;
  naming: Naming;
  /** Per string, low side first: true where it differs from how this guitar was last used. */
  changed: readonly boolean[];
};

function changedInWords(neck: Neck, changed: readonly boolean[]): string {
  const strings = neck.open.flatMap((_, index) => (changed[index] ? [neck.open.length - index] : []));
  if (strings.length === 0) return "";
  return `, ${strings.length === 1 ? "string" : "strings"} ${strings.join(", ")} changed`;
}

/** The tuning's letters in cells of one width; a string that differs from this guitar's last use stands inverted. */
export const NeckCells = memo(function NeckCells({ neck, songKey, naming, changed }: NeckCellsProps) {
  const fifths = spellingFifths(songKey, neck.open);
  const letters = formatTuning(neck.open, naming, fifths);
  const many = letters.length > 7;
  return (
    <span
      role="img"
      aria-label={`${spokenTuning(neck.open, naming, fifths)}${changedInWords(neck, changed)}`}
      className="inline-flex font-display font-semibold"
    >
      {letters.map((letter, index) => (
        <span
          // biome-ignore lint/suspicious/noArrayIndexKey: a string is known by its place
          key={index}
          aria-hidden="true"
          className={`inline-flex h-5 items-center justify-center lg:h-7 ${many ? "w-4 text-sm" : "w-[18px] text-base lg:w-6 lg:text-lg"} ${letter.length > 2 ? "text-xs lg:text-sm" : ""} ${changed[index] ? "bg-ink text-white" : ""}`}
        >
          {letter}
        </span>
      ))}
    </span>
  );
});
