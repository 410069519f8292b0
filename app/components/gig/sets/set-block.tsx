import { memo, useId, useMemo, useRef } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import type { Drag } from "#app/components/gig/drag/use-row-drag.ts";
import { RibbonColumn } from "#app/components/gig/ribbons/ribbon-column.tsx";
import { useRowBoxes } from "#app/components/gig/ribbons/use-row-boxes.ts";
import { rowTroubles } from "#app/components/gig/rows/row-troubles.ts";
import { AddLine } from "#app/components/gig/sets/add-line.tsx";
import type { Part } from "#app/components/gig/sets/moves.ts";
import { IntervalLine, SetHeading } from "#app/components/gig/sets/set-heading.tsx";
import { SetSection } from "#app/components/gig/sets/set-section.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

type SetBlockProps = {
  /** As it is kept: of it the block needs what a drag does not change. */
  gig: Gig;
  plan: SetPlan;
  first: boolean;
  /** The sections of all sets. */
  allParts: readonly Part[];
  repertoire: Repertoire;
  standing: ReadonlySet<string>;
  drag: Drag | null;
  keptPlaces: ReadonlyMap<string, number>;
  onAdd: (songs: Song[], part: Pick<Part, "setId" | "section">) => void;
};

/** One set: its songs with their gaps, and beside them a ribbon for each guitar. */
export const SetBlock = memo(function SetBlock(props: SetBlockProps) {
  const { gig, plan, first, allParts, repertoire, standing, drag, keptPlaces, onAdd } = props;
  const { may } = usePageTools();
  const headingId = useId();
  const parts = allParts.filter((part) => part.setId === plan.set.id);
  const column = useRef<HTMLDivElement>(null);
  const troubles = useMemo(() => rowTroubles(plan, repertoire.guitars.length), [plan, repertoire.guitars]);
  const boxes = useRowBoxes(column, plan.rows, troubles);
  const firstId = plan.rows[0]?.entry.id;
  const lastId = plan.rows.at(-1)?.entry.id;
  return (
    <section aria-labelledby={headingId}>
      {first ? null : <IntervalLine seconds={plan.set.interval} />}
      <div className="min-[74rem]:grid min-[74rem]:grid-cols-[minmax(0,1fr)_auto] min-[74rem]:gap-x-6">
        <div ref={column} className="relative min-w-0">
          <SetHeading
            id={headingId}
            gig={gig}
            plan={plan}
            alone={gig.sets.length === 1}
            hasEncore={parts.length > 1}
          />
          {parts.map((part) => (
            <SetSection
              key={part.section}
              part={part}
              set={plan.set}
              rows={plan.rows.filter((row) => row.section === part.section)}
              firstId={firstId}
              lastId={lastId}
              troubles={troubles}
              drag={drag}
              keptPlaces={keptPlaces}
            />
          ))}
          {may.plan ? (
            <AddLine
              setId={plan.set.id}
              setName={plan.set.name}
              hasEncore={parts.length > 1}
              songs={repertoire.songs}
              standing={standing}
              onAdd={onAdd}
            />
          ) : null}
        </div>
        {plan.rows.length > 0 ? (
          <div className="hidden min-[74rem]:block">
            <RibbonColumn plan={plan} guitars={repertoire.guitars} boxes={boxes} />
          </div>
        ) : null}
      </div>
    </section>
  );
});
