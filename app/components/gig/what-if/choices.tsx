import { type ReactNode, useId } from "react";

type ChoicesProps = {
  legend: string;
  choices: readonly { key: string; words: ReactNode; figure: string }[];
  chosen: string;
  onChoose: (key: string) => void;
};

/** A few answers to choose one of, each with how it changes dead air. */
export function Choices({ legend, choices, chosen, onChoose }: ChoicesProps) {
  const group = useId();
  return (
    <fieldset>
      <legend className="flex w-full items-baseline gap-2 pb-1">
        <span className="min-w-0 flex-1 font-semibold text-base">{legend}</span>
        <span className="shrink-0 font-display font-medium text-grey-600 text-sm">dead air</span>
      </legend>
      {choices.map(({ key, words, figure }) => (
        <label
          key={key}
          className={`flex min-h-11 items-center gap-2 border-grey-200 border-t py-1 leading-tight max-lg:px-1 lg:-mx-2 lg:min-h-9 lg:gap-1.5 lg:px-2 ${key === chosen ? "bg-grey-100" : ""}`}
        >
          <input
            type="radio"
            name={group}
            className="size-4 shrink-0 accent-ink"
            checked={key === chosen}
            onChange={() => onChoose(key)}
          />
          <span className="min-w-0 flex-1">{words}</span>
          <span className="tabular shrink-0 font-display font-semibold text-base">{figure}</span>
        </label>
      ))}
    </fieldset>
  );
}
