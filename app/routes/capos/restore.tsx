import { redirect } from "react-router";
import { findCapo, restoreCapo } from "#app/models/capos.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/restore";

export function loader({ params }: Route.LoaderArgs) {
  return redirect(`/capos/${params.capoId}`);
}

export async function action({ params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "prepare");
  const done = await restoreCapo(getDb(), member, params.capoId);
  if (!done && !(await findCapo(getDb(), member, params.capoId))) notFound("capo");
  return redirect(`/guitars?capo=${params.capoId}`);
}

export default function RestoreCapo() {
  return null;
}
