import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { timeAfter } from "#app/components/gig/header/gig-words.ts";
import { SetMenu } from "#app/components/gig/sets/set-menu.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { SetPlan } from "#app/domain/gig/plan.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";

type SetHeadingProps = { gig: Gig; plan: SetPlan; alone: boolean; hasEncore: boolean; id: string };

/** Name of a set, when it plays and what it costs. */
export function SetHeading({ gig, plan, alone, hasEncore, id }: SetHeadingProps) {
  const { may } = usePageTools();
  const { set } = plan;
  const from = timeAfter(gig.startsAt, plan.startSecond, gig.zone);
  const to = timeAfter(gig.startsAt, plan.startSecond + plan.seconds, gig.zone);
  return (
    <div
      data-box="head"
      data-set={set.id}
      data-section={0}
      className="flex h-11 items-center gap-x-3 pl-3 lg:h-9 lg:pl-0"
    >
      <h2 id={id} className="max-w-1/2 shrink-0 truncate font-semibold text-xl leading-none">
        {set.name}
      </h2>
      <p className="tabular line-clamp-2 text-grey-600 max-lg:text-sm max-lg:leading-tight lg:line-clamp-1">
        {from} to {to}, {formatDuration(plan.seconds)}
        {alone ? "" : `, ${Math.round(plan.totals.exposed)} s dead air`}
        {plan.totals.wishes > 0 ? `, wishes ${Math.round(plan.totals.wishes)} s` : ""}
      </p>
      {may.plan ? <SetMenu set={set} gig={gig} hasEncore={hasEncore} /> : null}
    </div>
  );
}

/** The pause between two sets, in which every guitar is prepared. */
export function IntervalLine({ seconds }: { seconds: number }) {
  return (
    <p className="border-grey-200 border-t px-4 py-2 font-display font-medium text-base text-grey-600 lg:px-0">
      {seconds > 0
        ? `Interval ${Math.round(seconds / 60)} min: every guitar is prepared again`
        : "No interval"}
    </p>
  );
}
