import { useState } from "react";
import { energyNames, energyWords } from "#app/domain/repertoire/song-words.ts";

type CurveFieldProps = {
  /** Each point is sent as `name[0]`, `name[1]` and so on. */
  name: string;
  start: readonly number[];
};

/** In CSS pixels. The thumb of a slider stops half its height short of either end of its track. */
const height = 132;
const thumb = 24;

const yOf = (level: number) => thumb / 2 + ((5 - level) / 4) * (height - thumb);

/** Where a point stands in the set. @example pointName(0, 5) // "Start of the set" */
function pointName(point: number, points: number): string {
  if (point === 0) return "Start of the set";
  if (point === points - 1) return "End of the set";
  const share = Math.round((100 * point) / (points - 1));
  return share === 50 ? "Middle of the set" : `${share} % through the set`;
}

const slider =
  "absolute inset-y-0 h-full w-11 -translate-x-1/2 cursor-ns-resize appearance-none bg-transparent outline-none [direction:rtl] [writing-mode:vertical-lr]";

/** The point that is dragged. Each browser has a name of its own for it. */
const thumbLook =
  "[&::-moz-range-thumb]:box-border [&::-moz-range-thumb]:size-6 [&::-moz-range-thumb]:rounded-full [&::-moz-range-thumb]:border-4 [&::-moz-range-thumb]:border-white [&::-moz-range-thumb]:bg-ink [&::-moz-range-track]:bg-transparent [&:focus-visible::-moz-range-thumb]:shadow-[0_0_0_2px_var(--color-ink)] [&::-webkit-slider-runnable-track]:h-full [&::-webkit-slider-thumb]:box-border [&::-webkit-slider-thumb]:size-6 [&::-webkit-slider-thumb]:appearance-none [&::-webkit-slider-thumb]:rounded-full [&::-webkit-slider-thumb]:border-4 [&::-webkit-slider-thumb]:border-white [&::-webkit-slider-thumb]:bg-ink [&:focus-visible::-webkit-slider-thumb]:shadow-[0_0_0_2px_var(--color-ink)]";

/** A curve from the start of a set to its end, drawn through points that are set up and down, each a slider of its own. */
export function CurveField({ name, start }: CurveFieldProps) {
  const [levels, setLevels] = useState(start);
  const along = (point: number) => (100 * point) / (levels.length - 1);
  const set = (point: number, level: number) =>
    setLevels((now) => now.map((one, index) => (index === point ? level : one)));
  return (
    <div className="grid max-w-96 grid-cols-[auto_minmax(0,1fr)] gap-x-3">
      <div className="relative w-11 text-right text-grey-600 text-sm" style={{ height }} aria-hidden="true">
        {([5, 3, 1] as const).map((level) => (
          <span key={level} className="absolute right-0 -translate-y-1/2" style={{ top: yOf(level) }}>
            {energyNames[level]}
          </span>
        ))}
      </div>
      <div className="relative mx-5" style={{ height }}>
        <svg
          width="100%"
          height={height}
          viewBox={`0 0 100 ${height}`}
          preserveAspectRatio="none"
          className="absolute inset-0 overflow-visible"
          aria-hidden="true"
        >
          {[1, 2, 3, 4, 5].map((level) => (
            <path
              key={level}
              d={`M-5 ${yOf(level)}H105`}
              vectorEffect="non-scaling-stroke"
              className="stroke-grey-200"
            />
          ))}
          <polyline
            points={levels.map((level, point) => `${along(point)},${yOf(level)}`).join(" ")}
            vectorEffect="non-scaling-stroke"
            className="fill-none stroke-2 stroke-ink"
          />
        </svg>
        {levels.map((level, point) => {
          const label = pointName(point, levels.length);
          return (
            <input
              key={label}
              type="range"
              name={`${name}[${point}]`}
              min={1}
              max={5}
              step={0.5}
              value={level}
              aria-label={label}
              aria-valuetext={energyWords(level)}
              className={`${slider} ${thumbLook}`}
              style={{ left: `${along(point)}%` }}
              onChange={(event) => set(point, Number(event.currentTarget.value))}
            />
          );
        })}
      </div>
      <div className="col-start-2 mx-5 flex text-grey-600 text-sm" aria-hidden="true">
        <span className="-translate-x-1/2">start</span>
        <span className="flex-1 text-center">middle</span>
        <span className="translate-x-1/2">end</span>
      </div>
    </div>
  );
}
