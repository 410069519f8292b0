import { memo } from "react";
import type { Gap, Row } from "#app/domain/gig/plan.ts";

type GapStrokesProps = { row: Row; gap: Gap; mirrored: boolean };

const step = 10;
const height = 18;

/**
 * The ribbon folded into a gap line, for a phone: a short stroke for each string of the guitar that comes next, low
 * string on the left, mirrored for the left hand; a turned one is a triangle.
 */
export const GapStrokes = memo(function GapStrokes({ row, gap, mirrored }: GapStrokesProps) {
  const strings = row.guitar?.strings ?? 0;
  const turned = new Map(
    gap.work
      .filter((work) => work.guitar === row.guitar?.id)
      .flatMap((work) => work.strings)
      .map((one) => [one.string, one.to > one.from ? "up" : "down"] as const),
  );
  const shown = Array.from({ length: strings }, (_, index) => (mirrored ? index + 1 : strings - index));
  return (
    <svg
      width={Math.max(strings, 6) * step + 2}
      height={height}
      viewBox={`0 0 ${Math.max(strings, 6) * step + 2} ${height}`}
      aria-hidden="true"
      className="shrink-0 lg:hidden"
    >
      {shown.map((string, index) => {
        const x = index * step + step / 2 + 1;
        const turn = turned.get(string);
        if (!turn)
          return (
            <path key={string} d={`M${x} 1V${height - 1}`} className="stroke-grey-400" strokeWidth="1.500" />
          );
        return turn === "up" ? (
          <path key={string} d={`M${x} 4l5.500 10h-11z`} className="fill-up" />
        ) : (
          <path key={string} d={`M${x} 14l-5.500-10h11z`} className="fill-down" />
        );
      })}
    </svg>
  );
});
