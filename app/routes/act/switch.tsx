import { parseWithZod } from "@conform-to/zod/v4";
import { redirect } from "react-router";
import { switchActSchema } from "#app/domain/people/account-forms.ts";
import { notFound, requireMember } from "#app/services/member.server.ts";
import { rememberAct } from "#app/services/session.server.ts";
import type { Route } from "./+types/switch";

export function loader() {
  throw redirect("/account");
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  const submission = parseWithZod(await request.formData(), { schema: switchActSchema });
  const actId = submission.status === "success" ? submission.value.actId : null;
  const act = member.acts.find((one) => one.id === actId) ?? notFound("act of yours");
  throw redirect("/gigs", { headers: { "Set-Cookie": await rememberAct(request, act.id) } });
}
