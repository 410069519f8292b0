import { getFormProps, type SubmissionResult, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, useNavigation } from "react-router";
import { Line } from "#app/components/gig/details/gig-fields.tsx";
import { SaveBar } from "#app/components/save-bar.tsx";
import { gigFieldLimits } from "#app/domain/gig/edit-schema.ts";
import {
  type DuplicateFields,
  type DuplicateFormInput,
  duplicateFormSchema,
} from "#app/domain/gig/gig-form.ts";

type DuplicateGigFormProps = {
  zone: string;
  defaultValue: DuplicateFormInput;
  lastResult: SubmissionResult<string[]> | undefined;
};

/** The name and day of the gig that begins as another's copy. */
export function DuplicateGigForm({ zone, defaultValue, lastResult }: DuplicateGigFormProps) {
  const navigation = useNavigation();
  const [form, fields] = useForm<DuplicateFormInput, DuplicateFields>({
    id: "duplicate-gig",
    lastResult,
    defaultValue,
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: duplicateFormSchema(zone) }),
  });
  const saving = navigation.state !== "idle" && navigation.formMethod === "POST";
  return (
    <Form method="post" {...getFormProps(form)} className="pb-20 md:pb-0">
      <div className="flex max-w-2xl flex-col gap-4 px-4 py-5 md:px-6">
        <Line field={fields.name} label="Name" required maxLength={gigFieldLimits.name} />
        <div className="grid gap-4 sm:grid-cols-2">
          <Line field={fields.date} label="Date" type="date" required />
          <Line field={fields.time} label={`Starts at, ${zone} time`} type="time" required />
        </div>
        <p className="text-grey-600">
          Sets, songs, guitars, rules and times are copied. Rules about songs that are gone are left behind.
        </p>
      </div>
      <SaveBar form={form} saving={saving} unsaved label="Duplicate gig" />
    </Form>
  );
}
