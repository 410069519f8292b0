import { parseWithZod } from "@conform-to/zod/v4";
import { data, Link, redirect } from "react-router";
import { SignUpForm } from "#app/components/account/sign-up-form.tsx";
import { PlainPage } from "#app/components/plain-page.tsx";
import { PostButton } from "#app/components/post-button.tsx";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { joinSchema } from "#app/domain/people/account-forms.ts";
import { roleWords } from "#app/domain/people/role-words.ts";
import { findJoinLink } from "#app/models/join-links.server.ts";
import { joinAct, linkWords, signUpToJoin } from "#app/services/auth.server.ts";
import { clientIpContext } from "#app/services/client-ip.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { orAway, refuseForm } from "#app/services/form-reply.server.ts";
import { memberContext, personContext } from "#app/services/member.server.ts";
import { startSession } from "#app/services/session.server.ts";
import type { Route } from "./+types/join";

export const meta: Route.MetaFunction = () => [{ title: "Join an act · Stillpeg" }];

export async function loader({ params, context }: Route.LoaderArgs) {
  const link = await findJoinLink(getDb(), params.token, new Date());
  const refused = link?.state === "open" ? null : linkWords[link?.state ?? "unknown"];
  const person = context.get(personContext);
  const isIn = context.get(memberContext)?.acts.some((act) => act.id === link?.actId) ?? false;
  return data(
    { link, refused, token: params.token, signedInAs: person?.displayName ?? null, isIn },
    refused ? { status: link ? 410 : 404 } : undefined,
  );
}

export async function action({ request, params, context }: Route.ActionArgs) {
  const person = context.get(personContext);
  const token = params.token;
  if (person) {
    const cookie = await joinAct(request, person.id, token);
    throw redirect(
      cookie ? "/gigs" : `/join/${encodeURIComponent(token)}`,
      cookie ? { headers: { "Set-Cookie": cookie } } : {},
    );
  }
  const submission = parseWithZod(await request.formData(), { schema: joinSchema });
  if (submission.status !== "success") return refuseForm(submission);
  const entry = await orAway(() => signUpToJoin(submission.value, token, context.get(clientIpContext)));
  if ("refused" in entry) return refuseForm(submission, entry);
  const cookie = await startSession(request, entry.personId, entry.actId);
  throw redirect("/gigs", { headers: { "Set-Cookie": cookie } });
}

export default function JoinPage({ loaderData, actionData }: Route.ComponentProps) {
  const { link, refused, token, signedInAs, isIn } = loaderData;
  if (refused || !link) {
    return (
      <PlainPage title={link ? `Join ${link.actName}` : "Join an act"}>
        <Warning className="text-base">{refused}</Warning>
        <ButtonLink to="/" className="self-start">
          {signedInAs ? "Go to your gigs" : "Go to the start"}
        </ButtonLink>
      </PlainPage>
    );
  }
  const { label, may } = roleWords[link.role];
  if (isIn) {
    return (
      <PlainPage title={`Join ${link.actName}`}>
        <p>You are in this act already. The link is still good for somebody else.</p>
        <ButtonLink to="/gigs" className="self-start">
          Go to your gigs
        </ButtonLink>
      </PlainPage>
    );
  }
  return (
    <PlainPage title={`Join ${link.actName}`} sub={`You come in as ${label.toLowerCase()}. ${may}`}>
      {signedInAs ? (
        <div className="flex flex-col items-start gap-3">
          <p>You are signed in as {signedInAs}.</p>
          <PostButton action={`/join/${token}`} look="primary">
            Join {link.actName}
          </PostButton>
        </div>
      ) : (
        <>
          <p>
            Have an account?{" "}
            <Link
              to={`/sign-in?to=${encodeURIComponent(`/join/${token}`)}`}
              className="font-semibold text-ink underline"
            >
              Sign in to join
            </Link>
          </p>
          <SignUpForm lastResult={actionData} withAct={false} submitLabel="Sign up and join" />
        </>
      )}
    </PlainPage>
  );
}
