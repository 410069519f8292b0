import { parseWithZod } from "@conform-to/zod/v4";
import { data, redirect } from "react-router";
import { zonesHere } from "#app/components/gig/details/zones.ts";
import { NewGigForm } from "#app/components/gigs/new-gig-form.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { newGigFormSchema } from "#app/domain/gig/gig-form.ts";
import { createGig, listGigs } from "#app/models/gigs.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/new";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "New gig · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const gigs = await listGigs(getDb(), member);
  return { zone: gigs.at(-1)?.zone ?? null, zones: zonesHere() };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const submission = parseWithZod(await request.formData(), { schema: newGigFormSchema });
  if (submission.status !== "success") {
    return data({ result: submission.reply() }, { status: submission.status === "error" ? 400 : 200 });
  }
  const id = await createGig(getDb(), member, submission.value);
  return redirect(`/gigs/${id}`);
}

export default function NewGig({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="New gig" />
      <NewGigForm zone={loaderData.zone} zones={loaderData.zones} lastResult={actionData?.result} />
    </>
  );
}
