import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, useNavigation } from "react-router";
import { TextInput } from "#app/components/account/text-input.tsx";
import { Button, ButtonLink } from "#app/components/ui/button.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { actSchema } from "#app/domain/people/account-forms.ts";
import { renameAct } from "#app/models/acts.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { refuseForm } from "#app/services/form-reply.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/edit";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "Act settings · Stillpeg" }];

export function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "manage");
  return { actId: member.actId, actName: member.actName };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "manage");
  const submission = parseWithZod(await request.formData(), { schema: actSchema });
  if (submission.status !== "success") return refuseForm(submission);
  await renameAct(getDb(), member, submission.value.actName);
  return data(submission.reply());
}

export default function ActPage({ loaderData, actionData }: Route.ComponentProps) {
  const navigation = useNavigation();
  const [form, fields] = useForm({
    id: `act-${loaderData.actId}`,
    lastResult: actionData,
    defaultValue: { actName: loaderData.actName },
    constraint: getZodConstraint(actSchema),
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: actSchema }),
  });
  const saved = navigation.state === "idle" && actionData?.status === "success" && !form.dirty;
  return (
    <>
      <PageHead title="Act settings" sub={loaderData.actName} />
      <div className="flex max-w-md flex-col gap-12 px-4 py-5 md:px-6">
        <Form method="post" {...getFormProps(form)} className="flex flex-col gap-4">
          <TextInput field={fields.actName} label="Name of the act" autoComplete="organization" />
          <div className="flex items-center gap-4">
            <Button type="submit" look="primary" disabled={navigation.state !== "idle"}>
              Save
            </Button>
            <p role="status" className="text-grey-600">
              {saved ? "Saved" : ""}
            </p>
          </div>
        </Form>
        <section className="flex flex-col items-start gap-2 border-grey-200 border-t pt-5">
          <h2 className="font-semibold text-xl">Delete the act</h2>
          <p>With its gigs, songs and guitars, for everybody in it.</p>
          <ButtonLink to="/act/delete" look="danger">
            Delete the act
          </ButtonLink>
        </section>
      </div>
    </>
  );
}
