import {
  getCollectionProps,
  getFormProps,
  getInputProps,
  type SubmissionResult,
  useForm,
} from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import type { ReactNode } from "react";
import { Form, useNavigation } from "react-router";
import { SaveBar } from "#app/components/save-bar.tsx";
import { TextField } from "#app/components/ui/field.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { UnsavedGuard } from "#app/components/unsaved-guard.tsx";
import { useUnsaved } from "#app/components/use-unsaved.ts";
import { allStrings } from "#app/domain/music/capo.ts";
import {
  type CapoFields,
  type CapoFormInput,
  capoFormSchema,
  capoLimits,
} from "#app/domain/repertoire/capo-form.ts";

type CapoFormProps = {
  id: string;
  defaultValue: CapoFormInput;
  lastResult: SubmissionResult<string[]> | undefined;
  /** Strings that can be ticked: as many as the act's instrument with the most of them has. */
  strings: number;
  version: number | null;
  restore?: boolean;
  saveLabel: string;
  status?: ReactNode;
};

const covers = [
  { value: "all", label: "All strings" },
  { value: "some", label: "Only some strings" },
];

/** The form of a kind of capo. */
export function CapoForm({
  id,
  defaultValue,
  lastResult,
  strings,
  version,
  restore,
  saveLabel,
  status,
}: CapoFormProps) {
  const navigation = useNavigation();
  const { unsaved, watch } = useUnsaved(id);
  const [form, fields] = useForm<CapoFormInput, CapoFields>({
    id,
    lastResult,
    defaultValue,
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: capoFormSchema() }),
  });
  const saving = navigation.state !== "idle" && navigation.formMethod === "POST";
  const { key: nameKey, ...name } = getInputProps(fields.name, { type: "text", ariaAttributes: false });
  const { key: countKey, ...count } = getInputProps(fields.count, { type: "text", ariaAttributes: false });
  const radios = getCollectionProps(fields.covers, {
    type: "radio",
    options: covers.map(({ value }) => value),
    ariaAttributes: false,
  });
  return (
    <Form method="post" {...getFormProps(form)} {...watch} className="pb-20 md:pb-0">
      <UnsavedGuard unsaved={unsaved && !saving} />
      {version === null ? null : <input type="hidden" name="version" value={version} />}
      {restore ? <input type="hidden" name="restore" value="yes" /> : null}
      <div className="flex max-w-md flex-col gap-4 px-4 py-5 md:px-6">
        <TextField
          key={nameKey}
          {...name}
          label="Name"
          errors={fields.name.errors}
          maxLength={capoLimits.name}
          autoComplete="off"
        />
        <fieldset aria-describedby={fields.covers.errors ? fields.covers.errorId : undefined}>
          <legend className="font-semibold text-base">Covers</legend>
          <div className="flex flex-wrap gap-x-6">
            {radios.map(({ key, ...radio }, index) => (
              <label key={key} htmlFor={radio.id} className="flex min-h-11 items-center gap-2 text-base">
                <input {...radio} className="size-5 accent-ink" />
                {covers[index]!.label}
              </label>
            ))}
          </div>
          <Errors id={fields.covers.errorId} errors={fields.covers.errors} />
        </fieldset>
        {fields.covers.value === "all" ? null : <StringTicks field={fields.strings} strings={strings} />}
        <TextField
          key={countKey}
          {...count}
          label="How many the act owns"
          hint="Empty: one."
          errors={fields.count.errors}
          inputMode="numeric"
          className="max-w-24 tabular"
        />
      </div>
      <SaveBar form={form} saving={saving} unsaved={unsaved} label={saveLabel} status={status} />
    </Form>
  );
}

type StringTicksProps = { field: Parameters<typeof getCollectionProps>[0]; strings: number };

function StringTicks({ field, strings }: StringTicksProps) {
  const ticks = getCollectionProps(field, {
    type: "checkbox",
    options: allStrings(strings).map(String),
    ariaAttributes: false,
  });
  return (
    <fieldset aria-describedby={field.errors ? field.errorId : undefined}>
      <legend className="font-semibold text-base">Strings that it covers</legend>
      <p className="text-grey-600 text-sm">1 is the thinnest, as players count.</p>
      <div className="mt-1 flex flex-wrap gap-x-1">
        {ticks.map(({ key, ...tick }) => (
          <label
            key={key}
            htmlFor={tick.id}
            className="flex min-h-11 w-11 flex-col items-center justify-center text-sm tabular"
          >
            {tick.value}
            <input {...tick} className="size-5 accent-ink" />
          </label>
        ))}
      </div>
      <Errors id={field.errorId} errors={field.errors} />
    </fieldset>
  );
}

function Errors({ id, errors }: { id: string; errors: string[] | undefined }) {
  return errors ? (
    <div id={id}>
      {errors.map((error) => (
        <Warning key={error}>{error}</Warning>
      ))}
    </div>
  ) : null;
}
