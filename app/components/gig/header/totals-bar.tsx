import { memo } from "react";
import type { Totals } from "#app/domain/gig/plan.ts";
import { formatDuration } from "#app/domain/repertoire/read-duration.ts";

type TotalsBarProps = {
  totals: Totals;
  clock: { seconds: number; slot: number | null; over: boolean };
  /** The totals before a drag began; each figure then shows by how much it would change. */
  before: Totals | null;
};

/** What the order costs, in six figures; a seventh where it breaks wishes, which are no dead air. */
export const TotalsBar = memo(function TotalsBar({ totals, clock, before }: TotalsBarProps) {
  const against = (key: keyof Totals) => (before ? totals[key] - before[key] : null);
  return (
    <dl className="grid grid-cols-6 gap-x-2 lg:flex lg:gap-x-6">
      <Figure value={totals.exposed} unit="s" change={against("exposed")} label="dead air" strong />
      <Figure
        value={totals.longestGap}
        unit="s"
        change={against("longestGap")}
        label="longest gap"
        short="longest"
      />
      <Figure value={totals.strings} change={against("strings")} label="strings retuned" short="strings" />
      <Figure value={totals.capoActions} change={against("capoActions")} label="capo changes" short="capo" />
      <Figure value={totals.swaps} change={against("swaps")} label="guitar changes" short="guitars" />
      {totals.wishes > 0 || (before && before.wishes > 0) ? (
        <Figure
          value={totals.wishes}
          unit="s"
          change={against("wishes")}
          label="wishes"
          className="max-lg:hidden"
        />
      ) : null}
      <Figure
        value={formatDuration(clock.seconds)}
        change={null}
        label={clock.slot === null ? "in all" : `of ${formatDuration(clock.slot)}`}
        alarm={clock.over}
      />
    </dl>
  );
});

type FigureProps = {
  value: number | string;
  unit?: string;
  change: number | null;
  label: string;
  /** The label where there is little room. */
  short?: string;
  strong?: boolean;
  alarm?: boolean;
  className?: string;
};

function shown(value: number | string): string {
  return typeof value === "number" ? String(Math.round(value)) : value;
}

function signed(change: number): string {
  const whole = Math.round(change);
  return whole > 0 ? `+${whole}` : whole < 0 ? `−${-whole}` : "±0";
}

function Figure({ value, unit, change, label, short, strong, alarm, className = "" }: FigureProps) {
  return (
    <div className={`flex min-w-0 flex-col-reverse justify-end ${strong ? "lg:pr-3" : ""} ${className}`}>
      <dt className="truncate font-display font-medium text-grey-600 text-sm lg:text-[15px] lg:leading-tight">
        {short ? (
          <>
            <span className="lg:hidden">{short}</span>
            <span className="hidden lg:inline">{label}</span>
          </>
        ) : (
          label
        )}
      </dt>
      <dd
        className={`tabular relative w-fit whitespace-nowrap font-semibold leading-tight ${strong ? "text-xl lg:text-[30px] lg:leading-8" : "text-lg lg:text-2xl lg:leading-8"} ${alarm ? "text-warning underline decoration-2 underline-offset-4" : ""}`}
      >
        {shown(value)}
        {unit ? <span className="font-medium"> {unit}</span> : null}
        {change !== null ? (
          <span className="absolute bottom-0 left-full pl-1 max-lg:hidden font-medium text-base text-grey-600 leading-6">
            {signed(change)}
          </span>
        ) : null}
      </dd>
    </div>
  );
}
