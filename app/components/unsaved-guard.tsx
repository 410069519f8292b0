import { useEffect } from "react";
import { useBlocker } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { Dialog } from "#app/components/ui/dialog.tsx";

/** Asks before a page with something typed and not saved is left, inside the application or out of it. */
export function UnsavedGuard({ unsaved }: { unsaved: boolean }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => unsaved && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    if (!unsaved) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [unsaved]);
  return (
    <Dialog
      open={blocker.state === "blocked"}
      onOpenChange={(open) => {
        if (!open) blocker.reset?.();
      }}
      title="Leave without saving?"
      closeLabel="Stay here"
      actions={
        <Button look="danger" onClick={() => blocker.proceed?.()}>
          Leave it unsaved
        </Button>
      }
    >
      <p>What you typed on this page is not saved.</p>
    </Dialog>
  );
}
