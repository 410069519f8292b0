import type { Energy } from "#app/domain/repertoire/song.ts";
import { energyWords } from "#app/domain/repertoire/song-words.ts";

const steps = [1, 2, 3, 4, 5] as const;

/** How lively a song is: five rising strokes, as many of them full as it has. */
export function EnergyMark({ energy }: { energy: Energy }) {
  const words = `Energy ${energyWords(energy)}`;
  return (
    <span title={words}>
      <svg width="29" height="15" viewBox="0 0 29 15" aria-hidden="true" className="block">
        {steps.map((step) => {
          const height = 3 + 2.4 * step;
          return (
            <rect
              key={step}
              x={(step - 1) * 6 + 0.5}
              y={14.5 - height}
              width="4"
              height={height}
              className={step <= energy ? "fill-ink stroke-ink" : "fill-none stroke-grey-400"}
            />
          );
        })}
      </svg>
      <span className="sr-only">{words}</span>
    </span>
  );
}
