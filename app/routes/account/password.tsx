import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect, useNavigation } from "react-router";
import { TextInput } from "#app/components/account/text-input.tsx";
import { Button, ButtonLink } from "#app/components/ui/button.tsx";
import { FormErrors } from "#app/components/ui/form-errors.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { accountLimits, changePasswordSchema } from "#app/domain/people/account-forms.ts";
import { changePassword } from "#app/services/auth.server.ts";
import { refuseForm } from "#app/services/form-reply.server.ts";
import { requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/password";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "Change the password · Stillpeg" }];

export function loader({ context, url }: Route.LoaderArgs) {
  return { email: requireMember(context, url).email };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  const submission = parseWithZod(await request.formData(), { schema: changePasswordSchema });
  if (submission.status !== "success") return refuseForm(submission);
  const change = await changePassword(request, member, submission.value);
  if ("refused" in change) return refuseForm(submission, change);
  throw redirect("/account", { headers: { "Set-Cookie": change.cookie } });
}

export default function PasswordPage({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    id: "change-password",
    lastResult: actionData,
    constraint: getZodConstraint(changePasswordSchema),
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: changePasswordSchema }),
  });
  const busy = useNavigation().state !== "idle";
  return (
    <>
      <PageHead title="Change the password" sub="Everywhere else you are signed out" />
      <Form method="post" {...getFormProps(form)} className="flex max-w-md flex-col gap-5 px-4 py-5 md:px-6">
        <FormErrors id={form.errorId} errors={form.errors} />
        <input type="text" autoComplete="username" value={loaderData.email} readOnly hidden />
        <TextInput
          field={fields.current}
          type="password"
          label="Password you have now"
          autoComplete="current-password"
        />
        <TextInput
          field={fields.password}
          type="password"
          label="New password"
          hint={`${accountLimits.passwordLeast} characters or more.`}
          autoComplete="new-password"
        />
        <div className="flex flex-wrap gap-2">
          <Button type="submit" look="primary" disabled={busy}>
            Change the password
          </Button>
          <ButtonLink to="/account">Keep the old one</ButtonLink>
        </div>
      </Form>
    </>
  );
}
