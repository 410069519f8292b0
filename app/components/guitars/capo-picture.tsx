/** A capo over the strings it covers, seen as on a neck: low string on the left. Words stand beside it. */
export function CapoPicture({ strings, count }: { strings: readonly number[] | null; count: number }) {
  const gap = 7;
  const width = gap * (count - 1) + 10;
  const at = (string: number) => 5 + gap * (count - string);
  const covered = strings ?? Array.from({ length: count }, (_, index) => index + 1);
  const bars = covered.filter((string) => string <= count);
  return (
    <svg width={width} height="26" viewBox={`0 0 ${width} 26`} aria-hidden="true" className="shrink-0">
      {Array.from({ length: count }, (_, index) => index + 1).map((string) => (
        <line
          key={string}
          x1={at(string)}
          x2={at(string)}
          y1="0"
          y2="26"
          stroke="var(--color-grey-400)"
          strokeWidth={0.8 + (1.2 * (string - 1)) / (count - 1)}
        />
      ))}
      {bars.map((string) => {
        const joins = bars.includes(string - 1);
        return (
          <rect
            key={string}
            x={at(string) - 3.5}
            y="9"
            width={joins ? gap + 7 : 7}
            height="8"
            rx="1.5"
            fill="var(--color-brass)"
          />
        );
      })}
    </svg>
  );
}
