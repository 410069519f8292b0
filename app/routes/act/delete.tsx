import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect, useNavigation } from "react-router";
import { TextInput } from "#app/components/account/text-input.tsx";
import { Button, ButtonLink } from "#app/components/ui/button.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { deleteActSchema } from "#app/domain/people/account-forms.ts";
import { countActContents, deleteAct } from "#app/models/acts.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { refuseForm } from "#app/services/form-reply.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/delete";

export const meta: Route.MetaFunction = () => [{ title: "Delete the act · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "manage");
  return { actName: member.actName, contents: await countActContents(getDb(), member) };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "manage");
  const submission = parseWithZod(await request.formData(), { schema: deleteActSchema(member.actName) });
  if (submission.status !== "success") return refuseForm(submission);
  await deleteAct(getDb(), member);
  throw redirect("/gigs");
}

function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}

export default function DeleteActPage({ loaderData, actionData }: Route.ComponentProps) {
  const { actName, contents } = loaderData;
  const schema = deleteActSchema(actName);
  const [form, fields] = useForm({
    id: "delete-act",
    lastResult: actionData,
    constraint: getZodConstraint(schema),
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
  });
  const busy = useNavigation().state !== "idle";
  return (
    <>
      <PageHead title={`Delete ${actName}`} sub="This cannot be undone" />
      <Form method="post" {...getFormProps(form)} className="flex max-w-md flex-col gap-5 px-4 py-5 md:px-6">
        <p>
          {counted(contents.gigs, "gig", "gigs")}, {counted(contents.songs, "song", "songs")} and{" "}
          {counted(contents.guitars, "guitar", "guitars")} go with it, for{" "}
          {contents.people === 1 ? "you alone" : `all ${contents.people} people in it`}. Accounts and other
          acts stay.
        </p>
        <TextInput field={fields.actName} label={`Write ${actName} here`} autoComplete="off" />
        <div className="flex flex-wrap gap-2">
          <Button type="submit" look="danger" disabled={busy}>
            Delete the act
          </Button>
          <ButtonLink to="/act">Keep it</ButtonLink>
        </div>
      </Form>
    </>
  );
}
