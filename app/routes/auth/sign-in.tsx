import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { Form, Link, redirect, useNavigation } from "react-router";
import { TextInput } from "#app/components/account/text-input.tsx";
import { PlainPage } from "#app/components/plain-page.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { FormErrors } from "#app/components/ui/form-errors.tsx";
import { signInSchema } from "#app/domain/people/account-forms.ts";
import { signIn } from "#app/services/auth.server.ts";
import { clientIpContext } from "#app/services/client-ip.server.ts";
import { orAway, refuseForm } from "#app/services/form-reply.server.ts";
import { personContext } from "#app/services/member.server.ts";
import { returnTo } from "#app/services/return-to.server.ts";
import { startSession } from "#app/services/session.server.ts";
import type { Route } from "./+types/sign-in";

export const meta: Route.MetaFunction = () => [{ title: "Sign in · Stillpeg" }];

export function loader({ context, url }: Route.LoaderArgs) {
  const to = returnTo(url.searchParams.get("to"), "/gigs");
  if (context.get(personContext)) throw redirect(to);
  return { to };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const submission = parseWithZod(await request.clone().formData(), { schema: signInSchema });
  if (submission.status !== "success") return refuseForm(submission);
  const entry = await orAway(() => signIn(request, context.get(clientIpContext)));
  if ("refused" in entry) return refuseForm(submission, entry);
  const cookie = await startSession(request, entry.personId);
  throw redirect(returnTo(url.searchParams.get("to"), "/gigs"), { headers: { "Set-Cookie": cookie } });
}

export default function SignInPage({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    id: "sign-in",
    lastResult: actionData,
    constraint: getZodConstraint(signInSchema),
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: signInSchema }),
  });
  const busy = useNavigation().state !== "idle";
  const asked = loaderData.to !== "/gigs";
  return (
    <PlainPage
      title="Sign in"
      sub={
        <>
          {asked ? "The page you asked for opens afterwards. " : ""}New here?{" "}
          <Link to="/sign-up" className="font-semibold text-ink underline">
            Sign up
          </Link>
        </>
      }
    >
      <Form
        method="post"
        action={`/sign-in?to=${encodeURIComponent(loaderData.to)}`}
        {...getFormProps(form)}
        className="flex flex-col gap-5"
      >
        <FormErrors id={form.errorId} errors={form.errors} />
        <TextInput field={fields.email} type="email" label="E-mail" autoComplete="username" />
        <TextInput field={fields.password} type="password" label="Password" autoComplete="current-password" />
        <Button type="submit" look="primary" disabled={busy}>
          Sign in
        </Button>
      </Form>
    </PlainPage>
  );
}
