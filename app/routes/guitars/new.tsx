import { parseWithZod } from "@conform-to/zod/v4";
import { data, redirect } from "react-router";
import { GuitarForm } from "#app/components/guitars/guitar-form.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { guitarFormSchema } from "#app/domain/repertoire/guitar-form.ts";
import { newGuitarValues } from "#app/domain/repertoire/guitar-form-values.ts";
import { createGuitar, listGuitars } from "#app/models/guitars.server.ts";
import { getDb, transact } from "#app/services/db.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/new";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "New guitar · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "prepare");
  const guitars = await listGuitars(getDb(), member);
  return { others: guitars.map(({ id, name }) => ({ id, name })), naming: member.naming };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "prepare");
  const others = (await listGuitars(getDb(), member)).map(({ id }) => id);
  const submission = parseWithZod(await request.formData(), {
    schema: guitarFormSchema({ naming: member.naming, others }),
  });
  if (submission.status !== "success") {
    return data({ result: submission.reply() }, { status: submission.status === "error" ? 400 : 200 });
  }
  const kept = await transact(getDb(), (trx) => createGuitar(trx, member, submission.value));
  if (kept.outcome === "short-name-taken") {
    const message = `${kept.by} has this short name already. Choose another.`;
    return data({ result: submission.reply({ fieldErrors: { shortName: [message] } }) }, { status: 400 });
  }
  return redirect(`/guitars/${kept.id}?saved`);
}

export default function NewGuitar({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="New guitar" />
      <GuitarForm
        id="new-guitar"
        defaultValue={newGuitarValues}
        lastResult={actionData?.result}
        others={loaderData.others}
        naming={loaderData.naming}
        version={null}
        saveLabel="Add guitar"
      />
    </>
  );
}
