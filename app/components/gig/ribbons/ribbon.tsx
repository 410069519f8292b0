import { memo } from "react";
import { usePointAt } from "#app/components/gig/rows/gap-focus.tsx";
import type { Knot, RibbonLane, RibbonString } from "#app/domain/gig/ribbon.ts";
import type { CapoBar } from "#app/domain/gig/ribbon-capos.ts";
import type { StepLabel } from "#app/domain/gig/ribbon-labels.ts";

type RibbonProps = {
  lane: RibbonLane;
  /** What happens in the gap into an entry. The same function for as long as the page is open. */
  tell: (entryId: string) => string;
};

/**
 * What a ribbon shows, for those who hear it.
 * @example ribbonWords(lane) // "Alder: 12 strings retuned in 5 gaps, capo put on 4 times"
 */
export function ribbonWords(lane: RibbonLane): string {
  const gaps = new Set(lane.labels.map((label) => label.entryId)).size;
  const strings = lane.labels.length === 1 ? "1 string" : `${lane.labels.length} strings`;
  const retuned =
    lane.labels.length === 0
      ? "no string retuned"
      : `${strings} retuned in ${gaps === 1 ? "1 gap" : `${gaps} gaps`}`;
  const capos = lane.capos.length;
  return `${lane.guitar.name}: ${retuned}${capos > 0 ? `, capo put on ${capos === 1 ? "once" : `${capos} times`}` : ""}`;
}

/** One guitar's strings through the set. Marks are known by where they stand, so that most stay when a row is moved. */
export const Ribbon = memo(function Ribbon({ lane, tell }: RibbonProps) {
  return (
    <g transform={`translate(${lane.x} 0)`}>
      {lane.strings.map((string) => (
        <StringLine key={string.string} string={string} folded={lane.folded} />
      ))}
      {lane.capos.map((capo) => (
        <CapoShape key={`${capo.y1}/${capo.fret}/${capo.runs[0]?.x1}`} capo={capo} />
      ))}
      {lane.labels.map((label) => (
        <StepMark
          key={`${label.x}/${label.y}`}
          direction={label.direction}
          semitones={label.semitones}
          x={label.x}
          y={label.y}
        />
      ))}
      {lane.knots.map((knot) => (
        <KnotArea
          key={knot.y1}
          entryId={knot.entryId}
          y1={knot.y1}
          y2={knot.y2}
          width={lane.width}
          tell={tell}
        />
      ))}
    </g>
  );
});

const rounded = (value: number) => Math.round(value * 10) / 10;

type Look = "rest" | "played" | "up" | "down";

const colours: Record<Look, string> = {
  rest: "stroke-grey-300",
  played: "stroke-ink",
  up: "stroke-up",
  down: "stroke-down",
};

/** What of a string looks alike, as one path each; looks that it has nowhere are left out. */
function pathsOf(string: RibbonString): [Look, string][] {
  const paths = new Map<Look, string>();
  for (const { x1, y1, x2, y2, active, step } of string.pieces) {
    const look = step ?? (active ? "played" : "rest");
    const line = `M${rounded(x1)} ${rounded(y1)}L${rounded(x2)} ${rounded(y2)}`;
    paths.set(look, (paths.get(look) ?? "") + line);
  }
  return [...paths].sort(([a], [b]) => drawnFirst.indexOf(a) - drawnFirst.indexOf(b));
}

const drawnFirst: readonly Look[] = ["rest", "played", "up", "down"];

/** A string: full where the guitar is played, thinned where it rests, coloured where it steps. */
export function StringLine({ string, folded }: { string: RibbonString; folded: boolean }) {
  const thinned = folded ? 1.2 : Math.max(0.7, string.weight * 0.4);
  return pathsOf(string).map(([look, path]) => (
    <path
      key={look}
      d={path}
      fill="none"
      className={colours[look]}
      strokeWidth={look === "rest" ? thinned : string.weight}
      strokeLinecap={look === "up" || look === "down" ? "round" : undefined}
    />
  ));
}

/** A capo: a brass bar over the covered strings with its fret, and a frame down to the last song it stays on for. */
function CapoShape({ capo }: { capo: CapoBar }) {
  const { fret, runs, y1, y2, endY } = capo;
  const widest = runs.reduce((best, run) => (run.x2 - run.x1 > best.x2 - best.x1 ? run : best), runs[0]!);
  return (
    <g>
      {runs.map(({ x1, x2 }) => (
        <g key={x1}>
          {endY === null ? null : (
            <path
              d={`M${x1 + 1} ${y2 - 2}V${endY - 1}H${x2 - 1}V${y2 - 2}`}
              fill="none"
              className="stroke-brass"
              strokeWidth="2"
            />
          )}
          <rect x={x1} y={y1} width={x2 - x1} height={y2 - y1} rx="2" className="fill-brass" />
        </g>
      ))}
      <text
        x={(widest.x1 + widest.x2) / 2}
        y={(y1 + y2) / 2 + 5}
        textAnchor="middle"
        fontSize="14"
        fontWeight="600"
        className="fill-white"
      >
        {fret}
      </text>
    </g>
  );
}

/** A triangle and the semitones beside a step. */
const StepMark = memo(function StepMark({
  direction,
  semitones,
  x,
  y,
}: Omit<StepLabel, "entryId" | "string">) {
  const tip = direction === "up" ? `M${x} ${y + 3.5}l4-7l4 7z` : `M${x} ${y - 3.5}l4 7l4-7z`;
  return (
    <g className={direction === "up" ? "fill-up" : "fill-down"}>
      <path d={tip} stroke="var(--color-ground)" strokeWidth="3" paintOrder="stroke" strokeLinejoin="round" />
      <text
        x={x + 9}
        y={y + 4.2}
        fontSize="12"
        fontWeight="600"
        stroke="var(--color-ground)"
        strokeWidth="3"
        paintOrder="stroke"
      >
        {semitones}
      </text>
    </g>
  );
});

type KnotAreaProps = Pick<Knot, "entryId" | "y1" | "y2"> & { width: number } & Pick<RibbonProps, "tell">;

/** Where a knot can be pointed at. The gap line beside it says the same to a keyboard. */
const KnotArea = memo(function KnotArea({ entryId, y1, y2, width, tell }: KnotAreaProps) {
  const { show, hide } = usePointAt();
  const point = (anchor: Element) => show({ key: entryId, sentence: tell(entryId), anchor });
  return (
    <rect
      x={0}
      y={y1 - 3}
      width={width}
      height={y2 - y1 + 6}
      fill="transparent"
      onPointerEnter={(event) => point(event.currentTarget)}
      onPointerLeave={() => hide(entryId)}
    />
  );
});
