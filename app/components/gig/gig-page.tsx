import { GigDesk } from "#app/components/gig/desk/gig-desk.tsx";
import type { GigDeskProps } from "#app/components/gig/desk/use-gig-desk.ts";
import { GapFocus } from "#app/components/gig/rows/gap-focus.tsx";
import { Toasts } from "#app/components/ui/toasts.tsx";

/** The page on which a gig is planned. */
export function GigPage(props: GigDeskProps) {
  return (
    <Toasts>
      <GapFocus>
        <GigDesk {...props} />
      </GapFocus>
    </Toasts>
  );
}
