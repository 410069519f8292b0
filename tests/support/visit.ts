import { RouterContextProvider } from "react-router";
import type { Role } from "#app/domain/permissions.ts";
import { type Member, memberContext, personContext } from "#app/services/member.server.ts";

/** Somebody of an act in a role, as the root middleware would have found them. */
export function memberOf(act: { actId: string }, role: Role): Member {
  return {
    personId: `person-${role}`,
    displayName: "Ivo Tarrant",
    email: `${role}@example.test`,
    actId: act.actId,
    actName: "The Emmer Road",
    role,
    naming: "english",
    paper: "a4",
    hand: "right",
    acts: [{ id: act.actId, name: "The Emmer Road", role }],
  };
}

type Arguments = {
  request: Request;
  url: URL;
  params: never;
  context: RouterContextProvider;
  pattern: never;
};

/** What a route's loader or action is called with; `fields` make it a post. */
export function visit(
  member: Member | null,
  path: string,
  params: Record<string, string> = {},
  fields?: Record<string, string> | [string, string][],
): Arguments {
  const url = new URL(path, "http://stillpeg.test");
  const context = new RouterContextProvider();
  context.set(memberContext, member);
  context.set(personContext, member && { ...member, id: member.personId });
  const body = fields ? new URLSearchParams(fields) : undefined;
  const request = new Request(url, { method: body ? "POST" : "GET", ...(body ? { body } : {}) });
  return { request, url, params: params as never, context, pattern: "" as never };
}

/** What came back of a loader or an action, thrown or returned: the status, where it leads, and the data. */
export async function answerOf(
  work: Promise<unknown>,
): Promise<{ status: number; to: string | null; data: unknown }> {
  const answer: unknown = await work.catch((thrown: unknown) => {
    if (thrown instanceof Error) throw thrown;
    return thrown;
  });
  if (answer instanceof Response) {
    return { status: answer.status, to: answer.headers.get("Location"), data: null };
  }
  if (typeof answer === "object" && answer && "data" in answer && "init" in answer) {
    const { data, init } = answer as { data: unknown; init: ResponseInit | null };
    return { status: init?.status ?? 200, to: null, data };
  }
  return { status: 200, to: null, data: answer };
}
