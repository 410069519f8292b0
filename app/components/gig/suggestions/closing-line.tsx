import type { Closing } from "#app/components/gig/suggestions/rung-words.ts";

type ClosingLineProps = {
  closing: Closing;
  /** What leads, as the set stands now: the right end of the line. */
  now: number;
};

const height = 9;

/**
 * While a search runs: a line from nothing to what is needed now, thick as far as it is proven that nothing needs so
 * little, with a mark at the best that is found. The two draw near each other.
 */
export function ClosingLine({ closing, now }: ClosingLineProps) {
  const { found, least, words } = closing;
  const end = Math.max(now, found, 1);
  const at = (value: number) => `${Math.min(100, (value / end) * 100)}%`;
  const moving = "transition-[width,left] duration-300 motion-reduce:transition-none";
  return (
    <div className="pt-1.5">
      <div aria-hidden="true" className="relative w-full" style={{ height }}>
        <span className="absolute inset-x-0 top-1 border-grey-300 border-t" />
        <span
          className={`absolute top-[3px] left-0 h-[3px] bg-grey-600 ${moving}`}
          style={{ width: at(least) }}
        />
        <span
          className={`absolute top-0 -ml-px h-[9px] w-0.5 bg-ink ${moving}`}
          style={{ left: at(found) }}
        />
      </div>
      <p className="text-grey-600 text-sm">{words}</p>
    </div>
  );
}
