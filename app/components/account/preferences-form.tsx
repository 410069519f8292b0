import {
  type FieldMetadata,
  getFormProps,
  getSelectProps,
  type SubmissionResult,
  useForm,
} from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { Form, useNavigation } from "react-router";
import { TextInput } from "#app/components/account/text-input.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { SelectField } from "#app/components/ui/field.tsx";
import { FormErrors } from "#app/components/ui/form-errors.tsx";
import { type Preferences, preferencesSchema } from "#app/domain/people/account-forms.ts";

const namingLabels: Record<Preferences["naming"], string> = {
  english: "English: C D E F G A B, B♭",
  german: "German: C D E F G A H, B",
  "fixed-do": "Fixed do: Do Re Mi Fa Sol La Si, Si♭",
};

const paperLabels: Record<Preferences["paper"], string> = {
  a4: "A4, 210 × 297 mm",
  letter: "Letter, 8.5 × 11 in",
};

const handLabels: Record<Preferences["hand"], string> = {
  right: "Right-handed: low string on the left",
  left: "Left-handed: low string on the right",
};

type PreferencesFormProps = { preferences: Preferences; lastResult: SubmissionResult<string[]> | undefined };

/** How a person is called, and how notes, sheets and necks are shown to them. */
export function PreferencesForm({ preferences, lastResult }: PreferencesFormProps) {
  const navigation = useNavigation();
  const [form, fields] = useForm<Preferences>({
    id: "preferences",
    lastResult,
    defaultValue: preferences,
    constraint: getZodConstraint(preferencesSchema),
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: preferencesSchema }),
  });
  const saved = navigation.state === "idle" && lastResult?.status === "success" && !form.dirty;
  return (
    <Form method="post" {...getFormProps(form)} className="flex flex-col gap-4">
      <FormErrors id={form.errorId} errors={form.errors} />
      <TextInput field={fields.displayName} label="Your name" autoComplete="name" />
      <Choice field={fields.naming} label="Note names" options={namingLabels} />
      <Choice field={fields.paper} label="Paper for sheets" options={paperLabels} />
      <Choice field={fields.hand} label="Necks are drawn" options={handLabels} />
      <div className="flex items-center gap-4">
        <Button type="submit" look="primary" disabled={navigation.state !== "idle"}>
          Save
        </Button>
        <p role="status" className="text-grey-600">
          {saved ? "Saved" : ""}
        </p>
      </div>
    </Form>
  );
}

type ChoiceProps<Value extends string> = {
  field: FieldMetadata<Value>;
  label: string;
  options: Record<Value, string>;
};

function Choice<Value extends string>({ field, label, options }: ChoiceProps<Value>) {
  const { key, ...select } = getSelectProps(field, { ariaAttributes: false });
  return (
    <SelectField key={key} {...select} label={label} errors={field.errors}>
      {(Object.entries(options) as [Value, string][]).map(([value, words]) => (
        <option key={value} value={value}>
          {words}
        </option>
      ))}
    </SelectField>
  );
}
