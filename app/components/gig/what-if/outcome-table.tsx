import { useId } from "react";
import { outcomeNames } from "#app/components/gig/what-if/what-if-words.ts";
import type { Needs } from "#app/domain/gig/what-if/needs.ts";
import type { Outcome } from "#app/domain/gig/what-if/outcome.ts";

type OutcomeTableProps = {
  now: Needs;
  /** What the first row is called: "Now", "Rest of the set now". */
  nowName?: string;
  outcomes: readonly Outcome[];
  names?: Partial<Record<Outcome["kind"], string>>;
  chosen: Outcome["kind"] | null;
  onChoose: (kind: Outcome["kind"]) => void;
};

const figures = [
  ["exposed", "dead air"],
  ["strings", "strings"],
  ["capoActions", "capo"],
  ["swaps", "guitars"],
] as const satisfies readonly (readonly [keyof Needs, string])[];

/** What each answer needs, side by side with the present plan; the row that is chosen is told below. */
export function OutcomeTable({ now, nowName = "Now", outcomes, names, chosen, onChoose }: OutcomeTableProps) {
  const group = useId();
  return (
    <table className="w-full border-collapse font-display lg:-mx-2 lg:w-[calc(100%+1rem)]">
      <thead>
        <tr className="text-[13px] text-grey-600 leading-none">
          <td />
          {figures.map(([key, name]) => (
            <th
              key={key}
              scope="col"
              className="pb-1 pl-1.5 text-right align-bottom lg:pl-1 font-medium last:lg:pr-2"
            >
              {name}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        <tr className="border-grey-200 border-t">
          <th
            scope="row"
            className="whitespace-nowrap py-2 pl-7 text-left lg:pl-7.5 font-medium text-base text-grey-600 leading-tight"
          >
            {nowName}
          </th>
          <Figures needs={now} />
        </tr>
        {outcomes.map(({ kind, needs }) => (
          <tr
            key={kind}
            className={`border-grey-200 border-t ${kind === chosen ? "bg-grey-100" : ""}`}
            onClick={() => onChoose(kind)}
          >
            <th scope="row" className="whitespace-nowrap p-0 text-left font-semibold text-base leading-tight">
              <label className="flex min-h-11 items-center gap-2 max-lg:pl-1 lg:min-h-9 lg:gap-1.5 lg:pl-2">
                <input
                  type="radio"
                  name={group}
                  className="size-4 shrink-0 accent-ink"
                  checked={kind === chosen}
                  onChange={() => onChoose(kind)}
                />
                {names?.[kind] ?? outcomeNames[kind]}
              </label>
            </th>
            <Figures needs={needs} strong />
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Figures({ needs, strong = false }: { needs: Needs; strong?: boolean }) {
  return figures.map(([key]) => (
    <td
      key={key}
      className={`tabular whitespace-nowrap pl-1.5 lg:pl-1 last:pr-1 lg:last:pr-2 text-right text-base ${strong ? "font-semibold" : "text-grey-600"}`}
    >
      {Math.round(needs[key])}
      {key === "exposed" ? " s" : ""}
    </td>
  ));
}
