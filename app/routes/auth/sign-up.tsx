import { parseWithZod } from "@conform-to/zod/v4";
import { Link, redirect } from "react-router";
import { SignUpForm } from "#app/components/account/sign-up-form.tsx";
import { PlainPage } from "#app/components/plain-page.tsx";
import { signUpSchema } from "#app/domain/people/account-forms.ts";
import { signUp } from "#app/services/auth.server.ts";
import { clientIpContext } from "#app/services/client-ip.server.ts";
import { orAway, refuseForm } from "#app/services/form-reply.server.ts";
import { personContext } from "#app/services/member.server.ts";
import { startSession } from "#app/services/session.server.ts";
import type { Route } from "./+types/sign-up";

export const meta: Route.MetaFunction = () => [{ title: "Sign up · Stillpeg" }];

export function loader({ context }: Route.LoaderArgs) {
  if (context.get(personContext)) throw redirect("/gigs");
  return null;
}

export async function action({ request, context }: Route.ActionArgs) {
  const submission = parseWithZod(await request.formData(), { schema: signUpSchema });
  if (submission.status !== "success") return refuseForm(submission);
  const entry = await orAway(() => signUp(submission.value, context.get(clientIpContext)));
  if ("refused" in entry) return refuseForm(submission, entry);
  const cookie = await startSession(request, entry.personId, entry.actId);
  throw redirect("/gigs", { headers: { "Set-Cookie": cookie } });
}

export default function SignUpPage({ actionData }: Route.ComponentProps) {
  return (
    <PlainPage
      title="Sign up"
      sub={
        <>
          Have an account?{" "}
          <Link to="/sign-in" className="font-semibold text-ink underline">
            Sign in
          </Link>
        </>
      }
    >
      <SignUpForm lastResult={actionData} withAct submitLabel="Start your act" />
    </PlainPage>
  );
}
