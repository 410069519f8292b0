import { redirect } from "react-router";
import { findGigName, restoreGig } from "#app/models/gigs.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/restore";

export function loader() {
  return redirect("/gigs");
}

export async function action({ params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const done = await restoreGig(getDb(), member, params.gigId);
  if (!done && !(await findGigName(getDb(), member, params.gigId))) notFound("gig");
  return redirect(`/gigs?restored=${params.gigId}`);
}

export default function RestoreGig() {
  return null;
}
