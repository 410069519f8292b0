import { redirect } from "react-router";
import { deleteSong, findSong } from "#app/models/songs.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/delete";

export function loader({ params }: Route.LoaderArgs) {
  return redirect(`/songs/${params.songId}`);
}

export async function action({ params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireCan(member, "plan");
  const done = await deleteSong(getDb(), member, params.songId);
  if (!done && !(await findSong(getDb(), member, params.songId))) notFound("song");
  return redirect(`/songs?deleted=${params.songId}`);
}

export default function DeleteSong() {
  return null;
}
