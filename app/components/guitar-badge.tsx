import { badgePath } from "#app/domain/repertoire/badge-path.ts";
import type { BadgeShape } from "#app/domain/repertoire/guitar.ts";

/** What a badge holds between its corners, whatever its shape. */
const room = 52;

/** About how wide a short name is in the badge's type; only wide ones are drawn narrower. */
function widthOf(shortName: string): number {
  return [...shortName].reduce(
    (width, letter) => width + (/[MWmw@]/.test(letter) ? 10.5 : /[A-Z0-9]/.test(letter) ? 7.4 : 6.4),
    0,
  );
}

/** A guitar's short name in its shape. The shape tells guitars apart where letters are too small to read. */
export function GuitarBadge({
  shortName,
  shape,
  title,
}: {
  shortName: string;
  shape: BadgeShape;
  title?: string;
}) {
  return (
    <svg
      viewBox="0 0 72 24"
      width="60"
      height="20"
      role="img"
      aria-label={title ?? shortName}
      className="shrink-0"
    >
      <path d={badgePath(shape, 72, 24, 1)} fill="white" stroke="currentColor" strokeWidth="1.5" />
      {shape === "double" ? <path d={badgePath(shape, 72, 24, 4)} fill="none" stroke="currentColor" /> : null}
      <text
        x="36"
        y="16.5"
        textAnchor="middle"
        fontSize="14"
        fontWeight="600"
        fill="currentColor"
        className="font-display"
        {...(widthOf(shortName) > room ? { textLength: room, lengthAdjust: "spacingAndGlyphs" } : {})}
      >
        {shortName}
      </text>
    </svg>
  );
}
