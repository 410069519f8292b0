import { type FieldMetadata, getInputProps, getSelectProps, getTextareaProps } from "@conform-to/react";
import type { ComponentProps } from "react";
import { SelectField, TextArea, TextField } from "#app/components/ui/field.tsx";
import { usualPriority } from "#app/domain/repertoire/song.ts";
import { type SongFormInput, songLimits } from "#app/domain/repertoire/song-form.ts";
import { energyWords, priorityNames } from "#app/domain/repertoire/song-words.ts";

type SongFactsProps = {
  fields: {
    [Name in Exclude<keyof SongFormInput, "ways">]: FieldMetadata<SongFormInput[Name]>;
  };
};

/** A song's title and what there is to know of it beside how it is played. */
export function SongFacts({ fields }: SongFactsProps) {
  return (
    <div className="grid grid-cols-6 content-start gap-x-3 gap-y-4">
      <Line
        field={fields.title}
        label="Title"
        wrapClass="col-span-6"
        maxLength={songLimits.title}
        autoComplete="off"
      />
      <Line field={fields.credit} label="Credit" wrapClass="col-span-6" maxLength={songLimits.credit} />
      <Line
        field={fields.length}
        label="Length"
        wrapClass="col-span-2"
        placeholder="3:15"
        className="tabular"
      />
      <Line field={fields.key} label="Key" wrapClass="col-span-2" className="tabular" />
      <Line
        field={fields.tempo}
        label="Tempo"
        wrapClass="col-span-2"
        inputMode="numeric"
        className="tabular"
      />
      <Step
        field={fields.energy}
        label="Energy"
        none="not said"
        steps={([1, 2, 3, 4, 5] as const).map((step) => [step, energyWords(step)])}
      />
      <Step
        field={fields.priority}
        label="Wanted in a set"
        steps={([5, 4, 3, 2, 1] as const).map((step) => [step, priorityNames[step]])}
      />
      <Line
        field={fields.cover}
        label="Talk before it, in seconds"
        hint="The talk that introduces it covers work on guitars. Empty: as long as the gig says."
        wrapClass="col-span-6"
        className="max-w-28 tabular"
        inputMode="numeric"
      />
      <Line
        field={fields.firstLine}
        label="First line"
        wrapClass="col-span-6"
        maxLength={songLimits.firstLine}
      />
      <Notes field={fields.notes} />
    </div>
  );
}

type LineProps = { field: FieldMetadata<string | undefined> } & Omit<
  ComponentProps<typeof TextField>,
  "id" | "name"
>;

function Line({ field, ...rest }: LineProps) {
  const { key, ...input } = getInputProps(field, {
    type: "text",
    ariaAttributes: false,
  });
  return <TextField key={key} {...input} errors={field.errors} {...rest} />;
}

type StepProps = {
  field: FieldMetadata<SongFormInput["energy"]>;
  label: string;
  /** What it says where nothing is chosen; without it, one of the steps is. */
  none?: string;
  steps: [number, string][];
};

/** One of five steps, each in words. */
function Step({ field, label, none, steps }: StepProps) {
  const { key, ...select } = getSelectProps(field, { ariaAttributes: false });
  return (
    <SelectField
      key={key}
      {...select}
      defaultValue={field.initialValue ?? (none === undefined ? usualPriority : "")}
      label={label}
      errors={field.errors}
      wrapClass="col-span-3"
    >
      {none === undefined ? null : <option value="">{none}</option>}
      {steps.map(([step, words]) => (
        <option key={step} value={step}>
          {words}
        </option>
      ))}
    </SelectField>
  );
}

function Notes({ field }: { field: FieldMetadata<string | undefined> }) {
  const { key, ...area } = getTextareaProps(field, { ariaAttributes: false });
  return <TextArea key={key} {...area} label="Notes" rows={4} errors={field.errors} wrapClass="col-span-6" />;
}
