/** Stillpeg's mark: a string that runs straight through its post, and the button of the peg that stands still. */
export function Mark({ size = 32 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" aria-hidden="true">
      <g fill="none" stroke="currentColor" strokeWidth="2.4" strokeLinecap="round">
        <path d="M10 4v8.5M10 19.5V28M13.5 16h4" />
        <circle cx="10" cy="16" r="3.5" />
      </g>
      <rect x="17.5" y="9" width="9.5" height="14" rx="4.5" fill="currentColor" />
    </svg>
  );
}
