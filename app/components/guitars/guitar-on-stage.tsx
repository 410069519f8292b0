import { type FieldMetadata, getInputProps, getSelectProps, getTextareaProps } from "@conform-to/react";
import type { GuitarFieldset } from "#app/components/guitars/guitar-fields.ts";
import { CheckField, SelectField, TextArea, TextField } from "#app/components/ui/field.tsx";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import { guitarLimits } from "#app/domain/repertoire/guitar-form.ts";

type GuitarOnStageProps = { fields: GuitarFieldset; others: readonly Pick<Guitar, "id" | "name">[] };

/** How a guitar is used in a show. */
export function GuitarOnStage({ fields, others }: GuitarOnStageProps) {
  const { key: channelKey, ...channel } = getInputProps(fields.channel, {
    type: "text",
    ariaAttributes: false,
  });
  const { key: strungKey, ...strung } = getInputProps(fields.strungOn, {
    type: "date",
    ariaAttributes: false,
  });
  const { key: spareKey, ...spare } = getSelectProps(fields.spareFor, { ariaAttributes: false });
  const { key: notesKey, ...notes } = getTextareaProps(fields.notes, { ariaAttributes: false });
  return (
    <section aria-labelledby="stage-title" className="flex max-w-3xl flex-col gap-4">
      <h2 id="stage-title" className="font-semibold text-xl">
        On stage
      </h2>
      <div className="grid gap-x-8 sm:grid-cols-2">
        <Tick
          field={fields.keeps}
          label="Keeps its tuning during the show"
          hint="No string is retuned once a set has begun: a slide guitar, a twelve-string, a floating bridge."
        />
        <Tick field={fields.leftHanded} label="Left-handed" />
      </div>
      <div className="grid gap-x-8 gap-y-4 sm:grid-cols-3">
        <SelectField key={spareKey} {...spare} label="Spare for" errors={fields.spareFor.errors}>
          <option value="">No guitar</option>
          {others.map((guitar) => (
            <option key={guitar.id} value={guitar.id}>
              {guitar.name}
            </option>
          ))}
        </SelectField>
        <TextField
          key={channelKey}
          {...channel}
          label="Input or DI channel"
          errors={fields.channel.errors}
          maxLength={guitarLimits.channel}
        />
        <TextField key={strungKey} {...strung} label="Strings fitted on" errors={fields.strungOn.errors} />
      </div>
      <TextArea key={notesKey} {...notes} label="Notes" rows={3} errors={fields.notes.errors} />
    </section>
  );
}

function Tick({
  field,
  label,
  hint,
}: {
  field: FieldMetadata<boolean | undefined>;
  label: string;
  hint?: string;
}) {
  const { key, ...input } = getInputProps(field, { type: "checkbox", ariaAttributes: false });
  return <CheckField key={key} {...input} label={label} hint={hint} />;
}
