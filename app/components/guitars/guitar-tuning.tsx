import type { FormMetadata } from "@conform-to/react";
import type { GuitarFieldset } from "#app/components/guitars/guitar-fields.ts";
import { type ReachInputs, ReachTable } from "#app/components/guitars/reach-table.tsx";
import { TuningField } from "#app/components/tuning/tuning-field.tsx";
import { Octagon } from "#app/components/ui/warning.tsx";
import { compactTuning } from "#app/domain/music/format-tuning.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { readTuning } from "#app/domain/music/tuning.ts";
import { usualTuningFor } from "#app/domain/music/usual-tuning.ts";
import { type InstrumentKind, instrumentKinds } from "#app/domain/repertoire/guitar.ts";
import { type GuitarFormInput, guitarLimits } from "#app/domain/repertoire/guitar-form.ts";

type GuitarTuningProps = { form: FormMetadata<GuitarFormInput>; fields: GuitarFieldset; naming: Naming };

/** What a guitar is usually tuned to, string by string, and how far each string may go from there. */
export function GuitarTuning({ form, fields, naming }: GuitarTuningProps) {
  const kind = instrumentKinds.find((known) => known === fields.kind.value) ?? "acoustic";
  const own = ownTuning(kind, fields.strings.value);
  const typed = fields.usual.value?.trim() || "usual";
  const bareB = fields.bareB.value as "natural" | "flat" | undefined;
  const reading = own ? readTuning(typed, { usual: own, naming, bareB }) : null;
  const inputs = (name: "below" | "above"): ReachInputs => ({
    name: fields[name].name,
    initial: listOf(fields[name].initialValue),
    typed: listOf(fields[name].value),
    errors: fields[name].allErrors,
  });
  return (
    <section aria-labelledby="usual-title" className="flex flex-col gap-4">
      <h2 id="usual-title" className="font-semibold text-xl">
        Usual tuning and range
      </h2>
      <div className="max-w-sm">
        <TuningField
          field={fields.usual}
          bareB={fields.bareB}
          label="Usual tuning"
          hint="From the lowest string up, or by name. Empty: what this kind usually has."
          placeholder={own ? compactTuning(own, naming) : undefined}
          reading={reading}
          naming={naming}
          onRewrite={(text) => form.update({ name: fields.usual.name, value: text })}
        />
      </div>
      {reading?.ok ? (
        <>
          <ReachTable usual={reading.open} below={inputs("below")} above={inputs("above")} naming={naming} />
          <Raised above={listOf(fields.above.value)} count={reading.open.length} />
        </>
      ) : (
        <p className="text-grey-600" aria-live="polite">
          {reading?.message ??
            `Write ${guitarLimits.strings.least} to ${guitarLimits.strings.most} strings to see them here.`}
        </p>
      )}
    </section>
  );
}

function ownTuning(kind: InstrumentKind, strings: string | undefined): number[] | null {
  const count = Number(strings ?? "6");
  const { least, most } = guitarLimits.strings;
  return Number.isInteger(count) && count >= least && count <= most ? usualTuningFor(kind, count) : null;
}

function listOf(value: unknown): (string | undefined)[] {
  return Array.isArray(value) ? value : [];
}

/** What raising a string above its usual pitch risks; says which strings are let go further than is common. */
function Raised({ above, count }: { above: readonly (string | undefined)[]; count: number }) {
  const far = above.slice(0, count).flatMap((typed, index) => (Number(typed) > 2 ? [count - index] : []));
  return (
    <div className="flex max-w-prose items-start gap-1.5 text-sm">
      <span className="mt-0.5">
        <Octagon />
      </span>
      <p>
        {far.length > 0 ? `More than 2 up on string ${far.join(", ")} is a lot. ` : ""}A string raised above
        its usual pitch may break, plain strings first, and pulls harder on the neck. Every plan that does so
        warns. Wear eye protection; a qualified repairer decides what the instrument bears.
      </p>
    </div>
  );
}
