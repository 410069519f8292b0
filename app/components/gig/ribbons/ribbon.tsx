import { memo } from "react";
import { usePointAt } from "#app/components/gig/rows/gap-focus.tsx";
import type { Knot, RibbonLane, RibbonString } from "#app/domain/gig/ribbon.ts";
import type { CapoBar } from "#app/domain/gig/ribbon-capos.ts";
import type { StepLabel } from "#app/domain/gig/ribbon-labels.ts";

type RibbonProps = { lane: RibbonLane; sentences: ReadonlyMap<string, string> };

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

/** One guitar's strings through the set. */
export const Ribbon = memo(function Ribbon({ lane, sentences }: RibbonProps) {
  return (
    <g transform={`translate(${lane.x} 0)`}>
      {lane.strings.map((string) => (
        <StringLine key={string.string} string={string} folded={lane.folded} />
      ))}
      {lane.capos.map((capo) => (
        <CapoShape key={`${capo.y1}/${capo.fret}/${capo.runs[0]?.x1}`} capo={capo} />
      ))}
      {lane.labels.map((label) => (
        <StepMark key={`${label.entryId}/${label.string}`} label={label} />
      ))}
      {lane.knots.map((knot) => (
        <KnotArea
          key={knot.entryId}
          knot={knot}
          width={lane.width}
          sentence={sentences.get(knot.entryId) ?? ""}
        />
      ))}
    </g>
  );
});

const rounded = (value: number) => Math.round(value * 10) / 10;

function pathOf(string: RibbonString, take: (piece: RibbonString["pieces"][number]) => boolean): string {
  return string.pieces
    .filter(take)
    .map(({ x1, y1, x2, y2 }) => `M${rounded(x1)} ${rounded(y1)}L${rounded(x2)} ${rounded(y2)}`)
    .join("");
}

/** A string: full where the guitar is played, thinned where it rests, coloured where it steps. */
export const StringLine = memo(function StringLine({
  string,
  folded,
}: {
  string: RibbonString;
  folded: boolean;
}) {
  return (
    <g fill="none">
      <path
        d={pathOf(string, (piece) => piece.step === null && !piece.active)}
        className="stroke-grey-300"
        strokeWidth={folded ? 1.2 : Math.max(0.7, string.weight * 0.4)}
      />
      <path
        d={pathOf(string, (piece) => piece.step === null && piece.active)}
        className="stroke-ink"
        strokeWidth={string.weight}
      />
      <path
        d={pathOf(string, (piece) => piece.step === "up")}
        className="stroke-up"
        strokeWidth={string.weight}
        strokeLinecap="round"
      />
      <path
        d={pathOf(string, (piece) => piece.step === "down")}
        className="stroke-down"
        strokeWidth={string.weight}
        strokeLinecap="round"
      />
    </g>
  );
});

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
function StepMark({ label }: { label: StepLabel }) {
  const { direction, semitones, x, y } = label;
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
}

/** Where a knot can be pointed at. The gap line beside it says the same to a keyboard. */
function KnotArea({ knot, width, sentence }: { knot: Knot; width: number; sentence: string }) {
  const { show, hide } = usePointAt();
  const point = (anchor: Element) => show({ key: knot.entryId, sentence, anchor });
  return (
    <rect
      x={0}
      y={knot.y1 - 3}
      width={width}
      height={knot.y2 - knot.y1 + 6}
      fill="transparent"
      onPointerEnter={(event) => point(event.currentTarget)}
      onPointerLeave={() => hide(knot.entryId)}
    />
  );
}
