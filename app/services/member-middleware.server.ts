import type { MiddlewareFunction } from "react-router";
import { findPersonWithActs } from "#app/models/people.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { type Member, memberContext, type Person, personContext } from "#app/services/member.server.ts";
import { prolong, readSession, sessionHash, sessionHashContext } from "#app/services/session.server.ts";

/**
 * Who is asking, loaded once for each request: two look-ups with a session, none without. The act is the one that the
 * session remembers, or the person's first where they have left that one.
 */
export const memberMiddleware: MiddlewareFunction<Response> = async ({ request, context }, next) => {
  const session = await readSession(request);
  const personId = session.get("personId");
  const found = personId ? await findPersonWithActs(getDb(), personId) : null;
  if (!found) return next();

  context.set(sessionHashContext, sessionHash(session.id));
  context.set(personContext, found.person);
  context.set(memberContext, memberOf(found, session.get("actId")));

  const cookie = await prolong(session.id, session.get("seenAt") ?? "");
  const response = await next();
  if (cookie && !response.headers.has("Set-Cookie")) response.headers.append("Set-Cookie", cookie);
  return response;
};

type Found = NonNullable<Awaited<ReturnType<typeof findPersonWithActs>>>;

function memberOf({ person, acts }: Found, actId: string | undefined): Member | null {
  const act = acts.find((one) => one.id === actId) ?? acts[0];
  if (!act) return null;
  const { id: personId, ...rest } = person satisfies Person;
  return { ...rest, personId, actId: act.id, actName: act.name, role: act.role, acts };
}
