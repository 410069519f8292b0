import { parseWithZod } from "@conform-to/zod/v4";
import { data, redirect } from "react-router";
import { DuplicateGigForm } from "#app/components/gigs/duplicate-gig-form.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { duplicateFormSchema } from "#app/domain/gig/gig-form.ts";
import { addDays, localTime } from "#app/domain/gig/local-time.ts";
import { duplicateGig, findGig } from "#app/models/gigs.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/duplicate";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "Duplicate gig · Stillpeg" }];

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const gig = (await findGig(getDb(), member, params.gigId)) ?? notFound("gig");
  const { date, time } = localTime(gig.startsAt, gig.zone);
  return { name: gig.name, zone: gig.zone, next: { name: gig.name, date: addDays(date, 7), time } };
}

export async function action({ request, params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const gig = (await findGig(getDb(), member, params.gigId)) ?? notFound("gig");
  const submission = parseWithZod(await request.formData(), { schema: duplicateFormSchema(gig.zone) });
  if (submission.status !== "success") {
    return data({ result: submission.reply() }, { status: submission.status === "error" ? 400 : 200 });
  }
  const copy = await duplicateGig(getDb(), member, gig.id, submission.value);
  return redirect(`/gigs/${copy ?? notFound("gig")}`);
}

export default function DuplicateGig({ loaderData, actionData }: Route.ComponentProps) {
  const { name, zone, next } = loaderData;
  return (
    <>
      <PageHead title={`Duplicate ${name}`} />
      <DuplicateGigForm zone={zone} defaultValue={next} lastResult={actionData?.result} />
    </>
  );
}
