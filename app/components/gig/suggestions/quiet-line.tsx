import type { ReactNode } from "react";

/** A line of the ladder that offers nothing. */
export function QuietLine({ children }: { children: ReactNode }) {
  return <li className="border-grey-200 border-t py-2 text-grey-600 text-sm leading-snug">{children}</li>;
}
