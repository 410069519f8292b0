import type { FieldMetadata } from "@conform-to/react";
import { getInputProps } from "@conform-to/react";
import type { ReactNode } from "react";
import { TextField } from "#app/components/ui/field.tsx";
import { type Naming, stringNameWithOctave } from "#app/domain/music/note-names.ts";
import { pitchClassOf } from "#app/domain/music/pitch.ts";
import type { TuningReading } from "#app/domain/music/tuning.ts";

type TuningFieldProps = {
  field: FieldMetadata<string | undefined>;
  bareB: FieldMetadata<"natural" | "flat" | undefined>;
  label: ReactNode;
  hint?: ReactNode;
  reading: TuningReading | null;
  naming: Naming;
  placeholder?: string;
  /** Writes another text into the field, with octaves. */
  onRewrite: (text: string) => void;
};

/** A tuning as players type it, with the questions that its letters leave open asked right below it. */
export function TuningField({
  field,
  bareB,
  label,
  hint,
  reading,
  naming,
  placeholder,
  onRewrite,
}: TuningFieldProps) {
  const { key, ...input } = getInputProps(field, {
    type: "text",
    ariaAttributes: false,
  });
  return (
    <div className="flex flex-col gap-2">
      <TextField
        key={key}
        {...input}
        label={label}
        hint={hint}
        errors={field.errors}
        placeholder={placeholder}
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        className="font-display font-semibold text-lg"
      />
      {reading?.ok ? (
        <>
          <BareBQuestion field={bareB} reading={reading} naming={naming} />
          <OctaveQuestion reading={reading} naming={naming} onRewrite={onRewrite} />
        </>
      ) : null}
    </div>
  );
}

type Understood = Extract<TuningReading, { ok: true }>;

function BareBQuestion({
  field,
  reading,
  naming,
}: {
  field: TuningFieldProps["bareB"];
  reading: Understood;
  naming: Naming;
}) {
  if (reading.ambiguous.length === 0 && !field.value) return null;
  const taken =
    reading.ambiguous[0] && pitchClassOf(reading.ambiguous[0].options[0]!) === 11 ? "natural" : "flat";
  const [flat, natural] = naming === "german" ? ["B", "H"] : ["B♭", "B"];
  return (
    <fieldset className="flex flex-wrap items-center gap-x-4 border-grey-300 border-l-2 pl-3">
      <legend className="float-left mr-4 font-semibold text-sm">The letter B means</legend>
      {(["flat", "natural"] as const).map((meaning) => (
        <label key={meaning} className="inline-flex min-h-8 items-center gap-2 text-sm">
          <input
            type="radio"
            name={field.name}
            value={meaning}
            defaultChecked={(field.initialValue ?? taken) === meaning}
            className="size-4 accent-ink"
          />
          {meaning === "flat" ? `${flat} (B flat)` : `${natural} (B natural)`}
        </label>
      ))}
    </fieldset>
  );
}

function OctaveQuestion({
  reading,
  naming,
  onRewrite,
}: {
  reading: Understood;
  naming: Naming;
  onRewrite: (text: string) => void;
}) {
  const open = reading.open;
  return reading.notes.flatMap(({ string, midi, alternatives }) =>
    alternatives.map((other) => {
      const rewritten = open
        .map((pitch, index) => stringNameWithOctave(open.length - index === string ? other : pitch, naming))
        .join(" ");
      const taken = stringNameWithOctave(midi, naming);
      const instead = stringNameWithOctave(other, naming);
      return (
        <p key={string} className="text-grey-600 text-sm">
          {`String ${string} is taken as ${taken}; ${instead} is as near to usual. `}
          <button
            type="button"
            onClick={() => onRewrite(rewritten)}
            className="font-semibold text-ink underline underline-offset-4 noscript:hidden"
          >
            {`Take ${instead}`}
          </button>
        </p>
      );
    }),
  );
}
