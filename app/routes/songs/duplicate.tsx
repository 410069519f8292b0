import { redirect } from "react-router";
import { duplicateSong } from "#app/models/songs.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/duplicate";

export function loader({ params }: Route.LoaderArgs) {
  return redirect(`/songs/${params.songId}`);
}

export async function action({ params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const copy = (await duplicateSong(getDb(), member, params.songId)) ?? notFound("song");
  return redirect(`/songs/${copy}`);
}

export default function DuplicateSong() {
  return null;
}
