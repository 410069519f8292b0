import { useEffect, useSyncExternalStore } from "react";
import { useLocation } from "react-router";
import { awayNotice } from "#app/components/keep-typed.ts";
import { Warning } from "#app/components/ui/warning.tsx";

/** Says on the page itself that its form could not be sent, until it is sent or left. */
export function AwayNotice() {
  const words = useSyncExternalStore(awayNotice.subscribe, awayNotice.read, () => null);
  const { pathname } = useLocation();
  // biome-ignore lint/correctness/useExhaustiveDependencies: another page has nothing to do with this form
  useEffect(() => awayNotice.clear, [pathname]);
  return (
    <div role="alert" className={words ? "sticky top-0 z-30 bg-ground px-4 py-2 md:px-6" : "contents"}>
      {words ? <Warning>{words}</Warning> : null}
    </div>
  );
}
