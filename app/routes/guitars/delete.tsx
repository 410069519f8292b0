import { redirect } from "react-router";
import { deleteGuitar, findGuitar } from "#app/models/guitars.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/delete";

export function loader({ params }: Route.LoaderArgs) {
  return redirect(`/guitars/${params.guitarId}`);
}

export async function action({ params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "prepare");
  const done = await deleteGuitar(getDb(), member, params.guitarId);
  if (!done && !(await findGuitar(getDb(), member, params.guitarId))) notFound("guitar");
  return redirect(`/guitars?guitar=${params.guitarId}`);
}

export default function DeleteGuitar() {
  return null;
}
