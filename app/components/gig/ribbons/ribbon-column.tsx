import { useCallback, useLayoutEffect, useMemo, useRef, useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { Ribbon, ribbonWords } from "#app/components/gig/ribbons/ribbon.tsx";
import { RibbonHead } from "#app/components/gig/ribbons/ribbon-head.tsx";
import type { RowBoxes } from "#app/components/gig/ribbons/use-row-boxes.ts";
import { usePointedKey } from "#app/components/gig/rows/gap-focus.tsx";
import { gapSentence } from "#app/domain/gig/gap-words.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import { ribbonLanes } from "#app/domain/gig/ribbon.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";

type RibbonColumnProps = { plan: SetPlan; guitars: Guitar[]; boxes: RowBoxes };

/** Room for all ribbons of a set side by side, and what one takes at least and at most, in CSS pixels. */
const room = 322;
const narrowest = 104;
const widest = 176;
const foldedWidth = 66;
/** So many stand open at once unless more are opened by hand. */
const mostOpen = 4;

function laneWidthFor(guitars: readonly Guitar[], opened: ReadonlySet<string>): number {
  const folding = guitars.filter((guitar) => guitar.keeps && !opened.has(guitar.id)).length;
  const open = Math.max(1, Math.min(guitars.length - folding, mostOpen + opened.size));
  return Math.max(narrowest, Math.min(widest, (room - (guitars.length - open) * foldedWidth) / open));
}

/** A ribbon for each guitar of a set, its strings running down beside the rows. */
export function RibbonColumn({ plan, guitars, boxes }: RibbonColumnProps) {
  const { hand, naming } = usePageTools();
  const [opened, setOpened] = useState<ReadonlySet<string>>(new Set());
  const used = plan.before.map(({ guitar }) => guitar);
  const laneWidth = laneWidthFor(used, opened);
  const lanes = useMemo(
    () =>
      ribbonLanes(plan.rows, guitars, {
        tops: boxes.tops,
        heights: boxes.heights,
        bottom: boxes.bottom,
        laneWidth,
        foldedWidth,
        hand,
        opened,
        labelWidth: 20,
        labelHeight: 11,
      }),
    [plan.rows, guitars, boxes, laneWidth, hand, opened],
  );
  const rows = useRef(plan.rows);
  useLayoutEffect(() => {
    rows.current = plan.rows;
  });
  const tell = useCallback(
    (entryId: string) => {
      const row = rows.current.find((one) => one.entry.id === entryId);
      return row ? gapSentence(row, naming) : "";
    },
    [naming],
  );
  const width = lanes.reduce((sum, lane) => sum + lane.width, 0);
  const toggle = (guitarId: string) =>
    setOpened(
      (now) => new Set(now.has(guitarId) ? [...now].filter((id) => id !== guitarId) : [...now, guitarId]),
    );
  return (
    <div className="relative" style={{ width, height: boxes.bottom }}>
      {lanes.map((lane) => (
        <RibbonHead key={lane.guitar.id} lane={lane} opened={opened.has(lane.guitar.id)} onToggle={toggle} />
      ))}
      <PointedBand plan={plan} boxes={boxes} />
      <svg
        width={width}
        height={boxes.bottom}
        role="img"
        aria-label={lanes.map(ribbonWords).join(". ")}
        className="absolute inset-0 overflow-visible font-display"
      >
        {lanes.map((lane) => (
          <Ribbon key={lane.guitar.id} lane={lane} tell={tell} />
        ))}
      </svg>
    </div>
  );
}

/** The gap that is pointed at, marked across all ribbons. */
function PointedBand({ plan, boxes }: { plan: SetPlan; boxes: RowBoxes }) {
  const key = usePointedKey();
  const index = key === null ? -1 : plan.rows.findIndex((row) => row.entry.id === key);
  if (index < 1) return null;
  const from = boxes.tops[index - 1]! + boxes.heights[index - 1]!;
  return (
    <div
      className="absolute inset-x-0 -ml-6 bg-grey-100"
      style={{ top: from, height: boxes.tops[index]! - from }}
    />
  );
}
