import { useMemo } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { ribbonWords, StringLine } from "#app/components/gig/ribbons/ribbon.tsx";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import { type RibbonLane, ribbonLanes } from "#app/domain/gig/ribbon.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

type RibbonThumbnailsProps = { before: SetPlan; after: SetPlan; guitars: Guitar[] };

const width = 94;
/** A song with the gap below it; less in a long set, which is to be taken in at a glance like any other. */
const tallestStep = 9;
const tallest = 108;
const foldedWidth = 12;

/** How the ribbons look now and how they would: a calm set is a page of straight lines. */
export function RibbonThumbnails({ before, after, guitars }: RibbonThumbnailsProps) {
  return (
    <div className="flex gap-3">
      <Thumbnail plan={before} guitars={guitars} label="Now" />
      <Thumbnail plan={after} guitars={guitars} label="Then" />
    </div>
  );
}

function Thumbnail({ plan, guitars, label }: { plan: SetPlan; guitars: Guitar[]; label: string }) {
  const { hand } = usePageTools();
  const step = Math.min(tallestStep, tallest / Math.max(1, plan.rows.length));
  const row = step * 0.56;
  const height = plan.rows.length * step - (step - row);
  const lanes = useMemo(() => {
    const folded = plan.before.filter(({ guitar }) => guitar.keeps).length;
    const open = Math.max(1, plan.before.length - folded);
    return ribbonLanes(plan.rows, guitars, {
      tops: plan.rows.map((_, index) => index * step),
      heights: plan.rows.map(() => row),
      bottom: height,
      laneWidth: Math.max(20, (width - folded * foldedWidth) / open),
      foldedWidth,
      hand,
      labelWidth: 6,
      labelHeight: 4,
    });
  }, [plan, guitars, hand, height, step, row]);
  return (
    <figure className="flex flex-col gap-1">
      <figcaption className="font-display font-medium text-grey-600 text-sm">
        {label}, {Math.round(plan.totals.exposed)} s
      </figcaption>
      <svg
        width={width}
        height={height}
        viewBox={`0 0 ${width} ${height}`}
        role="img"
        aria-label={`${label}: ${lanes.map(ribbonWords).join(". ")}`}
      >
        {lanes.map((lane) => (
          <Sketch key={lane.guitar.id} lane={lane} barHeight={Math.min(4, step * 0.6)} />
        ))}
      </svg>
    </figure>
  );
}

function Sketch({ lane, barHeight }: { lane: RibbonLane; barHeight: number }) {
  return (
    <g transform={`translate(${lane.x} 0)`}>
      {lane.strings.map((string) => (
        <StringLine
          key={string.string}
          string={{ ...string, weight: string.weight * 0.6 }}
          folded={lane.folded}
        />
      ))}
      {lane.capos.flatMap((capo) =>
        capo.runs.map(({ x1, x2 }) => (
          <rect
            key={`${capo.y1}/${x1}`}
            x={x1}
            y={capo.y1 - 1}
            width={x2 - x1}
            height={barHeight}
            className="fill-brass"
          />
        )),
      )}
    </g>
  );
}
