import { memo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { useIsPointed, usePointer } from "#app/components/gig/rows/gap-focus.tsx";
import { GapStrokes } from "#app/components/gig/rows/gap-strokes.tsx";
import { GapTokens } from "#app/components/gig/rows/gap-tokens.tsx";
import { warningWords } from "#app/components/gig/rows/row-warnings.tsx";
import { sameGap } from "#app/components/gig/rows/same-row.ts";
import { titleOfRow } from "#app/components/gig/rows/song-row.tsx";
import { Octagon } from "#app/components/ui/warning.tsx";
import { gapSentence, gapTokens } from "#app/domain/gig/gap-words.ts";
import type { Gap, Row } from "#app/domain/gig/plan.ts";

/** Dead air from here on is underlined: the room notices (common practice, no source). */
const longDeadAir = 20;

/**
 * What happens between two songs, in a line. Bold where the room has to wait; hover, focus or tap says it in words,
 * here and in the ribbon.
 */
export const GapRow = memo(GapRowOnce, (before, after) => sameGap(before.row, after.row));

function GapRowOnce({ row, gap }: { row: Row; gap: Gap }) {
  const { naming, hand } = usePageTools();
  const sentence = [gapSentence(row, naming), ...row.warnings.map((warning) => warning.message)].join(" ");
  const tokens = gapTokens(row, naming);
  const exposed = Math.round(gap.exposed);
  const pointer = usePointer(row.entry.id, sentence);
  const pointed = useIsPointed(row.entry.id);
  return (
    <button
      type="button"
      data-gap={row.entry.id}
      className={`flex h-8 w-full cursor-default items-center gap-2.5 pr-3 pl-[58px] text-left font-display text-base lg:h-6 lg:pr-[36px] lg:pl-[66px] ${pointed ? "bg-grey-100" : ""} ${exposed > 0 ? "font-semibold text-ink" : "font-medium text-grey-600"}`}
      {...pointer}
    >
      <span className="sr-only">
        {sentence} Before {titleOfRow(row)}
      </span>
      <GapStrokes row={row} gap={gap} mirrored={hand === "left"} />
      <GapTokens tokens={tokens} />
      {row.warnings.length > 0 ? (
        <span
          aria-hidden="true"
          className="inline-flex min-w-4 shrink-999 items-center gap-1 pl-1 text-warning"
        >
          <Octagon size={13} />
          <span className="truncate font-medium max-lg:hidden">{warningWords(row.warnings)}</span>
        </span>
      ) : null}
      <span aria-hidden="true" className="tabular ml-auto w-12 shrink-0 text-right">
        {exposed > 0 ? (
          <span className={gap.exposed >= longDeadAir ? "border-ink border-b-2 font-bold" : ""}>
            {exposed} s
          </span>
        ) : null}
      </span>
    </button>
  );
}
