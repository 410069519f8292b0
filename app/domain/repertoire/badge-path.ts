import type { BadgeShape } from "./guitar.ts";

/**
 * The outline of a guitar's badge as an SVG path inside `width` × `height`, `inset` away from its edge.
 * `double` is a square; whoever draws it adds a second one inside.
 * @example badgePath("square", 72, 24, 1) // "M1 1H71V23H1Z"
 */
export function badgePath(shape: BadgeShape, width: number, height: number, inset = 0): string {
  const left = inset;
  const top = inset;
  const right = width - inset;
  const bottom = height - inset;
  const middle = height / 2;
  const tall = bottom - top;
  switch (shape) {
    case "round": {
      const r = tall / 2;
      return `M${left + r} ${top}H${right - r}A${r} ${r} 0 0 1 ${right - r} ${bottom}H${left + r}A${r} ${r} 0 0 1 ${left + r} ${top}Z`;
    }
    case "square":
    case "double":
      return `M${left} ${top}H${right}V${bottom}H${left}Z`;
    case "hexagon": {
      const point = tall * 0.4;
      return `M${left + point} ${top}H${right - point}L${right} ${middle}L${right - point} ${bottom}H${left + point}L${left} ${middle}Z`;
    }
    case "cut": {
      const corner = tall * 0.3;
      return `M${left + corner} ${top}H${right - corner}L${right} ${top + corner}V${bottom - corner}L${right - corner} ${bottom}H${left + corner}L${left} ${bottom - corner}V${top + corner}Z`;
    }
    case "slant": {
      const lean = tall * 0.35;
      return `M${left + lean} ${top}H${right}L${right - lean} ${bottom}H${left}Z`;
    }
  }
}
