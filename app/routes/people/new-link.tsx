import { getFormProps, getSelectProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, useNavigation } from "react-router";
import { CopyText } from "#app/components/people/copy-text.tsx";
import { OpenLinks } from "#app/components/people/open-links.tsx";
import { dayAndTime } from "#app/components/time-words.ts";
import { Button, ButtonLink } from "#app/components/ui/button.tsx";
import { SelectField } from "#app/components/ui/field.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { roleSchema } from "#app/domain/people/account-forms.ts";
import { roleWords } from "#app/domain/people/role-words.ts";
import { roles } from "#app/domain/permissions.ts";
import { createJoinLink, listOpenJoinLinks } from "#app/models/join-links.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { getEnv } from "#app/services/env.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/new-link";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "Make a join link · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "manage");
  return { actName: member.actName, links: await listOpenJoinLinks(getDb(), member, new Date()) };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "manage");
  const submission = parseWithZod(await request.formData(), { schema: roleSchema });
  if (submission.status !== "success")
    return data({ result: submission.reply(), made: null }, { status: 400 });
  const { role } = submission.value;
  const { token, expiresAt } = await createJoinLink(getDb(), member, role, new Date());
  const made = { address: `${getEnv().PUBLIC_URL}/join/${token}`, role, expiresAt };
  return data({ result: submission.reply(), made }, { headers: { "Cache-Control": "no-store" } });
}

export default function NewLinkPage({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    id: "join-link",
    lastResult: actionData?.result,
    defaultValue: { role: actionData?.made?.role ?? "performer" },
    constraint: getZodConstraint(roleSchema),
    onValidate: ({ formData }) => parseWithZod(formData, { schema: roleSchema }),
  });
  const { key, ...select } = getSelectProps(fields.role, { ariaAttributes: false });
  const busy = useNavigation().state !== "idle";
  const made = actionData?.made;
  return (
    <>
      <PageHead
        title="Make a join link"
        sub={`It lets one person into ${loaderData.actName} and works for 7 days`}
      />
      <div className="flex max-w-2xl flex-col gap-8 px-4 py-5 md:px-6">
        {made ? (
          <section className="flex flex-col gap-2 border-ink border-l-4 pl-4" aria-live="polite">
            <h2 className="font-semibold text-xl">{roleWords[made.role].label} link, shown this once</h2>
            <p>Copy it and send it to the person. It works once, until {dayAndTime(made.expiresAt)}.</p>
            <CopyText label="Join link" text={made.address} />
          </section>
        ) : null}
        <Form method="post" {...getFormProps(form)} className="flex flex-wrap items-end gap-3">
          <SelectField key={key} {...select} label="Role" errors={fields.role.errors} wrapClass="w-48">
            {roles.map((role) => (
              <option key={role} value={role}>
                {roleWords[role].label}
              </option>
            ))}
          </SelectField>
          <Button type="submit" look={made ? "plain" : "primary"} disabled={busy}>
            {made ? "Make another" : "Make the link"}
          </Button>
          <ButtonLink to="/people" look="quiet">
            Back to people
          </ButtonLink>
        </Form>
        {loaderData.links.length > 0 ? (
          <section className="flex flex-col gap-2">
            <h2 className="font-semibold text-xl">Open join links</h2>
            <OpenLinks links={loaderData.links} />
          </section>
        ) : null}
      </div>
    </>
  );
}
