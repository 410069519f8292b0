/** Stillpeg's mark: a tuning peg seen from the front, standing still. */
export function Mark({ size = 32 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" aria-hidden="true">
      <g fill="none" stroke="currentColor" strokeWidth="2.6" strokeLinecap="round">
        <path d="M16 17v9" />
        <path d="M11.500 10.200a4.500 4.500 0 1 1 9 0c0 3-2 4.600-4.500 6.400-2.500-1.800-4.500-3.400-4.500-6.400z" />
        <path d="M12.500 22h7" />
      </g>
    </svg>
  );
}
