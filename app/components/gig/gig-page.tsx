import { GapFocus } from "#app/components/gig/gap-focus.tsx";
import { GigDesk } from "#app/components/gig/gig-desk.tsx";
import type { GigDeskProps } from "#app/components/gig/use-gig-desk.ts";
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
