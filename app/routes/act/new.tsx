import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect, useNavigation } from "react-router";
import { TextInput } from "#app/components/account/text-input.tsx";
import { PlainPage } from "#app/components/plain-page.tsx";
import { PostButton } from "#app/components/post-button.tsx";
import { Button, ButtonLink } from "#app/components/ui/button.tsx";
import { FormErrors } from "#app/components/ui/form-errors.tsx";
import { actSchema } from "#app/domain/people/account-forms.ts";
import { startAct } from "#app/services/auth.server.ts";
import { orAway, refuseForm } from "#app/services/form-reply.server.ts";
import { memberContext, requirePerson } from "#app/services/member.server.ts";
import type { Route } from "./+types/new";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "Start an act · Stillpeg" }];

/** Also for a person who belongs to no act, so it stands outside the rail. */
export function loader({ context, url }: Route.LoaderArgs) {
  const person = requirePerson(context, url);
  return { displayName: person.displayName, hasAct: context.get(memberContext) !== null };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const person = requirePerson(context, url);
  const submission = parseWithZod(await request.formData(), { schema: actSchema });
  if (submission.status !== "success") return refuseForm(submission);
  const started = await orAway(() => startAct(request, person.id, submission.value.actName));
  if (typeof started !== "string") return refuseForm(submission, started);
  throw redirect("/gigs", { headers: { "Set-Cookie": started } });
}

export default function NewActPage({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    id: "new-act",
    lastResult: actionData,
    constraint: getZodConstraint(actSchema),
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: actSchema }),
  });
  const busy = useNavigation().state !== "idle";
  const { hasAct, displayName } = loaderData;
  return (
    <PlainPage
      title="Start an act"
      sub={
        hasAct
          ? "With its own songs, guitars, gigs and people."
          : `${displayName}, you are in no act now. Start one, or open a join link that an owner has sent you.`
      }
    >
      <Form method="post" {...getFormProps(form)} className="flex flex-col gap-5">
        <FormErrors id={form.errorId} errors={form.errors} />
        <TextInput field={fields.actName} label="Your act" autoComplete="organization" />
        <Button type="submit" look="primary" disabled={busy}>
          Start the act
        </Button>
      </Form>
      {hasAct ? (
        <ButtonLink to="/account" className="self-start">
          Back to your account
        </ButtonLink>
      ) : (
        <PostButton action="/sign-out">Sign out</PostButton>
      )}
    </PlainPage>
  );
}
