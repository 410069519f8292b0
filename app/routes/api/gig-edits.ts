import { editsRequestSchema } from "#app/domain/gig/edit-schema.ts";
import { can } from "#app/domain/permissions.ts";
import { apiNotFound, methodNotAllowed } from "#app/services/api-replies.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { applyBatches, gigNews } from "#app/services/gig-edits.server.ts";
import { requireApiMember } from "#app/services/member.server.ts";
import { readJsonBody } from "#app/services/request-body.server.ts";
import type { Route } from "./+types/gig-edits";

/** What happened to a gig since a revision. */
export async function loader({ params, context, url }: Route.LoaderArgs) {
  const member = requireApiMember(context);
  const since = url.searchParams.get("since") ?? "";
  if (!/^\d{1,9}$/.test(since)) {
    const message = "since is a revision: a whole number, 0 or more.";
    return Response.json({ problems: [{ path: "since", message }] }, { status: 400 });
  }
  const person = url.searchParams.get("person");
  if (person !== null && person !== member.personId) return otherPerson();
  const news = (await gigNews(getDb(), member, params.gigId, Number(since))) ?? apiNotFound("gig");
  return Response.json(news, { headers: { "Cache-Control": "no-store" } });
}

/** Applies batches of edits to a gig, and answers what became of each. */
export async function action({ request, params, context }: Route.ActionArgs) {
  const member = requireApiMember(context);
  if (request.method !== "POST") return methodNotAllowed("GET, POST");
  if (!can(member.role, "prepare")) {
    const message = `Your role in ${member.actName} (${member.role}) may look at gigs, but not change them. Ask an owner.`;
    return Response.json({ message }, { status: 403 });
  }
  const body = await readJsonBody(request);
  if (!body.ok) return Response.json({ message: body.message }, { status: body.status });
  const read = editsRequestSchema.safeParse(body.value);
  if (!read.success) {
    const problems = read.error.issues.map(({ path, message }) => ({ path: path.join("."), message }));
    return Response.json({ problems }, { status: 400 });
  }
  const { person = member.personId } = read.data;
  if (person !== member.personId) return otherPerson();
  const answer = (await applyBatches(getDb(), member, params.gigId, read.data)) ?? apiNotFound("gig");
  return Response.json(answer);
}

/** The window was opened by somebody else, who has signed out since: what it sends would be taken for the member's. */
function otherPerson(): Response {
  const message = "Somebody else has signed in. Sign in as the person whose edits these are.";
  return Response.json({ message }, { status: 401 });
}
