import { setsOf } from "#app/domain/gig/order.ts";
import { setProblem } from "#app/domain/gig/set-problem.ts";
import { findGig } from "#app/models/gigs.server.ts";
import { loadRepertoire } from "#app/models/repertoire.server.ts";
import { apiNotFound, methodNotAllowed } from "#app/services/api-replies.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireApiMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/plan-problem";

/** The planning problem of one set of a gig: the sets count from 1 in the order in which they are played. */
export async function loader({ params, context, url }: Route.LoaderArgs) {
  const member = requireApiMember(context);
  const gig = (await findGig(getDb(), member, params.gigId)) ?? apiNotFound("gig");
  const asked = url.searchParams.get("set") ?? "1";
  const sets = setsOf(gig);
  const set = /^[1-9]\d?$/.test(asked) ? sets[Number(asked) - 1] : undefined;
  if (!set) {
    const message = `This gig has no set ${asked}. Its sets are numbered 1 to ${sets.length}.`;
    return Response.json({ message }, { status: 404 });
  }
  const { problem } = setProblem(gig, set.id, await loadRepertoire(getDb(), member));
  return Response.json(problem);
}

export function action({ context }: Route.ActionArgs) {
  requireApiMember(context);
  return methodNotAllowed("GET");
}
