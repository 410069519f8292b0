import { redirect } from "react-router";
import { revokeJoinLink } from "#app/models/join-links.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/revoke-link";

export function loader() {
  throw redirect("/people");
}

export async function action({ params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "manage");
  if (!(await revokeJoinLink(getDb(), member, params.linkId, new Date()))) notFound("open join link");
  throw redirect("/people");
}
