import type { ReactNode } from "react";

/** A page's actions in reach of the thumb on a phone; on a wider screen they stand in the page's head. */
export function BottomActions({ children }: { children: ReactNode }) {
  return (
    <div className="fixed inset-x-0 bottom-0 z-10 flex gap-2 border-grey-200 border-t bg-white px-4 py-3 *:grow md:hidden">
      {children}
    </div>
  );
}
