import { useId, useState } from "react";
import { Button } from "#app/components/ui/button.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { aimSchema } from "#app/domain/gig/aim-schema.ts";
import type { Aim } from "#app/domain/planning/problem.ts";

const fields: readonly [keyof Aim, string][] = [
  ["exposed", "Second of dead air"],
  ["seconds", "Second on stage"],
  ["strings", "String retuned"],
  ["semitones", "Semitone"],
  ["capoActions", "Capo change"],
  ["swaps", "Guitar change"],
];

type Written = Record<keyof Aim, string>;

/** Weights as they are written, or what is wrong with them. */
function readWeights(written: Written): { weights: Aim } | { message: string } {
  const value = (text: string) => (text.trim() === "" ? Number.NaN : Number(text.trim().replace(",", ".")));
  const weights = Object.fromEntries(fields.map(([key]) => [key, value(written[key])])) as Aim;
  const wrong = fields.find(([key]) => Number.isNaN(weights[key]));
  if (wrong) return { message: `${wrong[1]}: write a number, 0 where it does not matter.` };
  const read = aimSchema.safeParse({ kind: "own", weights });
  if (!read.success) return { message: read.error.issues[0]?.message ?? "These weights cannot be used." };
  if (fields.every(([key]) => weights[key] === 0)) return { message: "Give at least one of them a weight." };
  return { weights };
}

/** How much each thing counts in a total of the player's own. */
export function OwnWeightsForm({ weights, onUse }: { weights: Aim; onUse: (weights: Aim) => void }) {
  const id = useId();
  const [written, setWritten] = useState(
    () => Object.fromEntries(fields.map(([key]) => [key, String(weights[key])])) as Written,
  );
  const [message, setMessage] = useState<string | null>(null);
  return (
    <form
      className="flex flex-col gap-2 pt-2"
      onSubmit={(event) => {
        event.preventDefault();
        const read = readWeights(written);
        if ("message" in read) setMessage(read.message);
        else onUse(read.weights);
      }}
    >
      <p className="text-grey-600 text-sm leading-snug">
        How much each counts in the total that is kept low.
      </p>
      {fields.map(([key, label]) => (
        <label key={key} htmlFor={`${id}-${key}`} className="flex items-center justify-between gap-3 text-sm">
          {label}
          <input
            id={`${id}-${key}`}
            inputMode="decimal"
            value={written[key]}
            onChange={(event) => setWritten({ ...written, [key]: event.currentTarget.value })}
            className="tabular min-h-11 w-20 rounded-sm border border-grey-400 bg-white px-2 text-right text-base lg:min-h-8"
          />
        </label>
      ))}
      <div role="alert">{message ? <Warning>{message}</Warning> : null}</div>
      <Button type="submit" look="plain" className="self-start lg:min-h-9">
        Use these weights
      </Button>
    </form>
  );
}
