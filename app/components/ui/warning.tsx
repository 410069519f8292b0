import type { ReactNode } from "react";

/** The octagon that marks a warning. Always stands beside words. */
export function Octagon({ size = 14 }: { size?: number }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 14 14"
      className="inline-block shrink-0 text-warning"
      aria-hidden="true"
    >
      <path d="M4.200.5h5.600l3.700 3.700v5.600l-3.700 3.700H4.200L.5 9.800V4.200z" fill="currentColor" />
      <path d="M7 3.200v4.600M7 9.700v1.300" stroke="#fff" strokeWidth="1.600" />
    </svg>
  );
}

/** An octagon and the words it warns with. */
export function Warning({ children, className = "" }: { children: ReactNode; className?: string }) {
  return (
    <p className={`flex items-start gap-1.5 text-sm text-warning ${className}`}>
      <span className="mt-0.5">
        <Octagon />
      </span>
      <span>{children}</span>
    </p>
  );
}
