import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { usePointer } from "#app/components/gig/rows/gap-focus.tsx";
import { Octagon, Warning } from "#app/components/ui/warning.tsx";
import type { RowWarning } from "#app/domain/gig/warnings.ts";

const short: Record<RowWarning["code"], string> = {
  "plain-raised": "above usual pitch",
  far: "wide turn",
  "raised-at-an-end": "may drift",
  "into-retuned": "stops to retune",
};

/** Things worth a second look, a word or two each. @example warningWords([{ code: "far", … }]) // "wide turn" */
export function warningWords(warnings: readonly RowWarning[]): string {
  return warnings.map((warning) => short[warning.code]).join(", ");
}

/**
 * Things worth a second look about a song that no gap leads into; where one does, its line says them. In a word beside
 * the title; the whole sentence on hover, focus or tap.
 */
export function RowWarnings({ entryId, warnings }: { entryId: string; warnings: readonly RowWarning[] }) {
  const sentence = warnings.map((warning) => warning.message).join(" ");
  const pointer = usePointer(`${entryId}/warnings`, sentence);
  if (warnings.length === 0) return null;
  return (
    <button
      type="button"
      className="inline-flex min-h-6 min-w-6 shrink-999 items-center gap-1 self-center whitespace-nowrap font-display font-medium text-[15px] text-warning"
      {...pointer}
    >
      <span className="sr-only">{sentence}</span>
      <span className="shrink-0">
        <Octagon size={13} />
      </span>
      <span aria-hidden="true" className="truncate">
        {warningWords(warnings)}
      </span>
    </button>
  );
}

type RowTroublesProps = {
  troubles: readonly string[];
  wishes: readonly string[];
  /** Without anything to press. */
  plain: boolean;
};

/** What must be mended about a row, a line each, and the wishes it breaks. */
export function RowTroubles({ troubles, wishes, plain }: RowTroublesProps) {
  if (troubles.length + wishes.length === 0) return null;
  return (
    <div className="flex flex-col pr-3 pb-1.5 pl-3 [grid-area:warn] lg:pl-3.5">
      {troubles.map((message) => (
        <Warning key={message}>{message}</Warning>
      ))}
      {wishes.length > 0 ? <BrokenWishes words={wishes.join(" ")} plain={plain} /> : null}
    </div>
  );
}

const quiet = "text-left text-grey-800 text-sm leading-5";

/** Which wishes a row breaks. A press opens them, for those who may change them. */
function BrokenWishes({ words, plain }: { words: string; plain: boolean }) {
  const { may, openDialog } = usePageTools();
  if (plain || !may.plan) return <p className={quiet}>{words}</p>;
  return (
    <button
      type="button"
      className={`${quiet} min-h-6 self-start hover:underline`}
      onClick={() => openDialog({ kind: "wishes" })}
    >
      {words}
      <span className="sr-only"> Change the wishes</span>
    </button>
  );
}
