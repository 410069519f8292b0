/** How far a string stands from its usual pitch: a triangle for the way and the semitones beside it. */
export function FromUsual({ semitones }: { semitones: number }) {
  if (semitones === 0) {
    return (
      <>
        <span className="sr-only">as usual</span>
        <span aria-hidden="true" className="text-grey-400">
          ·
        </span>
      </>
    );
  }
  const up = semitones > 0;
  const size = Math.abs(semitones);
  return (
    <span className={`whitespace-nowrap ${up ? "text-up" : "text-down"}`}>
      <span className="sr-only">{`${size} ${up ? "above" : "below"} usual`}</span>
      <span aria-hidden="true">
        <svg
          width="9"
          height="8"
          viewBox="0 0 10 9"
          className="mr-px inline-block align-[0.02em]"
          aria-hidden="true"
        >
          <path d={up ? "M5 0 10 9H0Z" : "M5 9 0 0H10Z"} fill="currentColor" />
        </svg>
        {size}
      </span>
    </span>
  );
}
