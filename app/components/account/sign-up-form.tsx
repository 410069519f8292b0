import { getFormProps, type SubmissionResult, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { Form, useNavigation } from "react-router";
import { TextInput } from "#app/components/account/text-input.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { FormErrors } from "#app/components/ui/form-errors.tsx";
import { accountLimits, joinSchema, type SignUp, signUpSchema } from "#app/domain/people/account-forms.ts";

type SignUpFormProps = {
  lastResult: SubmissionResult<string[]> | undefined;
  /** False for somebody who joins an act that is there already. */
  withAct: boolean;
  submitLabel: string;
};

/** The form of a new person, with an act of their own or without. */
export function SignUpForm({ lastResult, withAct, submitLabel }: SignUpFormProps) {
  const schema = withAct ? signUpSchema : joinSchema;
  const [form, fields] = useForm<SignUp>({
    id: "sign-up",
    lastResult,
    constraint: getZodConstraint(schema),
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: schema as typeof signUpSchema }),
  });
  const busy = useNavigation().state !== "idle";
  return (
    <Form method="post" {...getFormProps(form)} className="flex flex-col gap-5">
      <FormErrors id={form.errorId} errors={form.errors} />
      <TextInput
        field={fields.displayName}
        label="Your name"
        hint="As the others in your act know you."
        autoComplete="name"
      />
      {withAct ? (
        <TextInput
          field={fields.actName}
          label="Your act"
          hint="The name you play under. You can be in several acts later."
          autoComplete="organization"
        />
      ) : null}
      <TextInput field={fields.email} type="email" label="E-mail" autoComplete="email" />
      <TextInput
        field={fields.password}
        type="password"
        label="Password"
        hint={`${accountLimits.passwordLeast} characters or more. A line of a song you know by heart works well.`}
        autoComplete="new-password"
      />
      <Button type="submit" look="primary" disabled={busy}>
        {submitLabel}
      </Button>
    </Form>
  );
}
