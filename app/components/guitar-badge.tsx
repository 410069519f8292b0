import type { BadgeShape } from "#app/domain/repertoire/guitar.ts";

/** The outline of each badge on a 72 × 24 field. */
const outlines: Record<BadgeShape, string> = {
  round: "M12 1h48a11 11 0 0 1 0 22H12a11 11 0 0 1 0-22z",
  square: "M1 1h70v22H1z",
  hexagon: "M10 1h52l9 11-9 11H10L1 12z",
  cut: "M7 1h58l6 6v10l-6 6H7l-6-6V7z",
  slant: "M9 1h62l-8 22H1z",
  double: "M1 1h70v22H1zM4 4h64v16H4z",
};

/** A guitar's short name in its shape. The shape tells guitars apart where letters are too small to read. */
export function GuitarBadge({ shortName, shape, title }: { shortName: string; shape: BadgeShape; title?: string }) {
  return (
    <svg viewBox="0 0 72 24" width="60" height="20" role="img" aria-label={title ?? shortName} className="shrink-0">
      <path d={outlines[shape]} fill="white" stroke="currentColor" strokeWidth="1.500" />
      <text
        x="36"
        y="16.500"
        textAnchor="middle"
        fontSize="14"
        fontWeight="600"
        fill="currentColor"
        className="font-display"
      >
        {shortName}
      </text>
    </svg>
  );
}
