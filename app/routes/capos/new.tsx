import { parseWithZod } from "@conform-to/zod/v4";
import { data, redirect } from "react-router";
import { CapoForm } from "#app/components/guitars/capo-form.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { capoFormSchema } from "#app/domain/repertoire/capo-form.ts";
import { createCapo } from "#app/models/capos.server.ts";
import { listGuitars } from "#app/models/guitars.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/new";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "New capo · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "prepare");
  const guitars = await listGuitars(getDb(), member);
  return { strings: Math.max(6, ...guitars.map((guitar) => guitar.strings)) };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "prepare");
  const submission = parseWithZod(await request.formData(), { schema: capoFormSchema() });
  if (submission.status !== "success") {
    return data({ result: submission.reply() }, { status: submission.status === "error" ? 400 : 200 });
  }
  const id = await createCapo(getDb(), member, submission.value);
  return redirect(`/guitars?capo=${id}`);
}

export default function NewCapo({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="New capo" />
      <CapoForm
        id="new-capo"
        defaultValue={{ name: "", covers: "all", count: "1" }}
        lastResult={actionData?.result}
        strings={loaderData.strings}
        version={null}
        saveLabel="Add capo"
      />
    </>
  );
}
