import { type BadProblem, bad } from "#app/domain/planning/bad-problem.ts";
import { parseProblem } from "#app/domain/planning/problem.ts";
import { usualEffort } from "#app/domain/planning/search.ts";
import { methodNotAllowed } from "#app/services/api-replies.server.ts";
import { requireApiMember } from "#app/services/member.server.ts";
import { mostSeconds, solveInPool } from "#app/services/planner-pool.server.ts";
import { readJsonBody } from "#app/services/request-body.server.ts";
import { QueueFull } from "#app/services/worker-pool.server.ts";
import type { Route } from "./+types/plan";

/** More than this is more than the pool gives one plan time for. */
const mostEffort = 100_000_000;

export function loader({ context }: Route.LoaderArgs) {
  requireApiMember(context);
  return methodNotAllowed("POST");
}

/** Plans a problem. The answer is that of the browser's planner: the code is the same. */
export async function action({ request, context, url }: Route.ActionArgs) {
  requireApiMember(context);
  if (request.method !== "POST") return methodNotAllowed("POST");
  const effort = url.searchParams.get("effort") ?? String(usualEffort);
  if (!/^[1-9]\d{0,8}$/.test(effort) || Number(effort) > mostEffort) {
    const message = `effort is a whole number from 1 to ${mostEffort}, not ${JSON.stringify(effort.slice(0, 40))}.`;
    return refused([bad("effort", ["effort"], message, "Leave it out, or send such a number.")]);
  }
  const body = await readJsonBody(request);
  if (!body.ok) {
    const remedy = body.status === 413 ? "Send one set at a time." : "Send one JSON value in UTF-8.";
    const code = body.status === 413 ? "too-long" : "json";
    return refused([bad(code, [], body.message, remedy)], body.status);
  }
  const parsed = parseProblem(body.value);
  if (!parsed.ok) return refused(parsed.problems);
  try {
    const { answer, ended } = await solveInPool(parsed.problem, {
      effort: Number(effort),
      signal: request.signal,
    });
    // What it might cost and why it ended stand beside the answer, which is the format's own.
    const limits = { "Plan-Effort": effort, "Plan-Seconds": String(mostSeconds), "Plan-Ended": ended };
    return Response.json(answer, { headers: limits });
  } catch (error) {
    if (request.signal.aborted) return new Response(null, { status: 499 });
    if (!(error instanceof QueueFull)) throw error;
    return Response.json({ message: error.message }, { status: 429, headers: { "Retry-After": "5" } });
  }
}

/** A body that is too long is not read to its end, so nothing else can be sent on its connection. */
function refused(problems: BadProblem[], status = 400): Response {
  const headers = status === 413 ? { Connection: "close" } : undefined;
  return Response.json({ problems }, { status, headers });
}
