import { listGigs } from "#app/models/gigs.server.ts";
import { methodNotAllowed } from "#app/services/api-replies.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireApiMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/gigs";

/** The act's gigs by their start: `sets` in the order in which they are played, each with the number of its songs. */
export async function loader({ context }: Route.LoaderArgs) {
  const gigs = await listGigs(getDb(), requireApiMember(context));
  return Response.json({
    gigs: gigs.map(({ id, name, startsAt, sets }) => ({ id, name, startsAt, sets })),
  });
}

export function action({ context }: Route.ActionArgs) {
  requireApiMember(context);
  return methodNotAllowed("GET");
}
