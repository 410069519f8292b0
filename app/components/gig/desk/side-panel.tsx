import { type ComponentProps, useId, useRef } from "react";
import { SuggestionsPanel } from "#app/components/gig/suggestions/suggestions-panel.tsx";
import { WhatIf } from "#app/components/gig/what-if/what-if-section.tsx";

type SidePanelProps = ComponentProps<typeof SuggestionsPanel>;

/** Beside the sets on a wide screen: what needs less retuning, and below it what would be if. */
export function SidePanel(props: SidePanelProps) {
  const { gig, plan, repertoire } = props;
  const lessId = useId();
  const whatIfId = useId();
  const panel = useRef<HTMLElement>(null);
  const whatIf = useRef<HTMLElement>(null);
  const toWhatIf = () => {
    panel.current?.scrollTo({ top: whatIf.current?.offsetTop ?? 0 });
    whatIf.current?.querySelector("button")?.focus({ preventScroll: true });
  };
  return (
    <aside
      ref={panel}
      aria-labelledby={lessId}
      className="sticky top-[81px] hidden h-[calc(100dvh-81px)] overflow-y-auto border-grey-200 border-l bg-white py-5 pr-4 pl-5 min-[85rem]:block"
    >
      <div className="flex items-baseline justify-between gap-2 pb-1">
        <h2 id={lessId} className="font-semibold text-xl leading-tight">
          Less retuning
        </h2>
        <button
          type="button"
          onClick={toWhatIf}
          className="font-display font-medium text-base underline underline-offset-2 hover:text-grey-800"
        >
          What if
        </button>
      </div>
      <SuggestionsPanel {...props} />
      <section ref={whatIf} aria-labelledby={whatIfId} className="pt-6">
        <h2 id={whatIfId} className="pb-1 font-semibold text-xl leading-tight">
          What if
        </h2>
        <WhatIf gig={gig} plan={plan} repertoire={repertoire} />
      </section>
    </aside>
  );
}
