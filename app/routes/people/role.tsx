import { parseWithZod } from "@conform-to/zod/v4";
import { data, redirect } from "react-router";
import { RoleForm } from "#app/components/people/role-form.tsx";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { roleSchema } from "#app/domain/people/account-forms.ts";
import { changeRole } from "#app/models/memberships.server.ts";
import { getDb, transact } from "#app/services/db.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import { membershipRefusal, requireActPerson } from "#app/services/people.server.ts";
import type { Route } from "./+types/role";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "Change a role · Stillpeg" }];

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "manage");
  return { person: await requireActPerson(member, params.personId) };
}

export async function action({ request, params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "manage");
  const submission = parseWithZod(await request.formData(), { schema: roleSchema });
  if (submission.status !== "success") {
    return data({ refused: submission.error?.role?.[0] ?? "Choose a role." }, { status: 400 });
  }
  const { role } = submission.value;
  const change = await transact(getDb(), (trx) => changeRole(trx, member, params.personId, role));
  const refusal = membershipRefusal(change, member.actName);
  if (refusal) return refusal;
  throw redirect("/people");
}

export default function RolePage({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title={`Role of ${loaderData.person.displayName}`} sub={loaderData.person.email} />
      <div className="flex flex-col items-start gap-4 px-4 py-5 md:px-6">
        <RoleForm person={loaderData.person} refused={actionData?.refused} />
        <ButtonLink to="/people">Back to people</ButtonLink>
      </div>
    </>
  );
}
