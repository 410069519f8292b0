import { redirect } from "react-router";
import { findGuitar, restoreGuitar } from "#app/models/guitars.server.ts";
import { getDb, transact } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/restore";

export function loader({ params }: Route.LoaderArgs) {
  return redirect(`/guitars/${params.guitarId}`);
}

export async function action({ params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "prepare");
  const restored = await transact(getDb(), (trx) => restoreGuitar(trx, member, params.guitarId));
  if (restored.outcome === "gone" && !(await findGuitar(getDb(), member, params.guitarId)))
    notFound("guitar");
  const taken = restored.outcome === "short-name-taken" ? "&taken" : "";
  return redirect(`/guitars?guitar=${params.guitarId}${taken}`);
}

export default function RestoreGuitar() {
  return null;
}
