import { memo } from "react";
import { AimChooser } from "#app/components/gig/suggestions/aim-chooser.tsx";
import { SetSuggestionsBlock } from "#app/components/gig/suggestions/set-suggestions.tsx";
import type { Suggestions } from "#app/components/gig/suggestions/use-suggestions.ts";
import { Dialog } from "#app/components/ui/dialog.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import type { Gig } from "#app/domain/gig/gig.ts";
import type { GigPlan } from "#app/domain/gig/plan.ts";
import type { Repertoire } from "#app/domain/gig/repertoire.ts";

type SuggestionsPanelProps = {
  gig: Gig;
  plan: GigPlan;
  repertoire: Repertoire;
  suggestions: Suggestions;
};

/** Orders and guitars that need less retuning, set by set. */
export const SuggestionsPanel = memo(function SuggestionsPanel(props: SuggestionsPanelProps) {
  const { gig, plan, repertoire, suggestions } = props;
  const { sets, begun, failed } = suggestions;
  return (
    <div className="flex flex-col gap-3">
      <AimChooser aim={gig.aim} />
      {failed ? <Warning>{failed}</Warning> : null}
      <noscript>
        <p className="text-grey-600">
          The suggestions are worked out in the browser, which needs JavaScript.
        </p>
      </noscript>
      {sets.length === 0 ? (
        <p className="text-grey-600">
          Order begins to matter with two songs in a set that a guitar of yours can play.
        </p>
      ) : null}
      {plan.sets.map((setPlan) => {
        const found = sets.find((one) => one.setId === setPlan.set.id);
        return found ? (
          <SetSuggestionsBlock
            key={setPlan.set.id}
            gig={gig}
            plan={setPlan}
            alone={plan.sets.length === 1}
            lead={gig.aim.kind}
            repertoire={repertoire}
            rungs={found.rungs}
            begun={begun && failed === null}
          />
        ) : null;
      })}
    </div>
  );
});

/** The same on a phone and on small screens, above the page. */
export function SuggestionsDialog({ onClose, ...panel }: SuggestionsPanelProps & { onClose: () => void }) {
  return (
    <Dialog open onOpenChange={(open) => (open ? null : onClose())} title="Less retuning">
      <SuggestionsPanel {...panel} />
    </Dialog>
  );
}
