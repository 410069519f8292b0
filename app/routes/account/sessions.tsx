import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, redirect } from "react-router";
import { deviceWords } from "#app/components/account/device-words.ts";
import { dayAndTime } from "#app/components/time-words.ts";
import { Button, ButtonLink } from "#app/components/ui/button.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { revokeSessionsSchema } from "#app/domain/people/account-forms.ts";
import { listSessions } from "#app/models/sessions.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireMember } from "#app/services/member.server.ts";
import { revokeSessions, sessionHashContext } from "#app/services/session.server.ts";
import type { Route } from "./+types/sessions";

export const meta: Route.MetaFunction = () => [{ title: "Where you are signed in · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  const sessions = await listSessions(getDb(), member.personId, new Date());
  const current = context.get(sessionHashContext);
  return { sessions: sessions.map((session) => ({ ...session, isThis: session.idHash === current })) };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  const submission = parseWithZod(await request.formData(), { schema: revokeSessionsSchema });
  if (submission.status !== "success") throw data({ message: "Choose a sign-in to end." }, { status: 400 });
  await revokeSessions(member.personId, submission.value.session, context.get(sessionHashContext));
  throw redirect("/account/sessions");
}

export default function SessionsPage({ loaderData }: Route.ComponentProps) {
  const { sessions } = loaderData;
  return (
    <>
      <PageHead title="Where you are signed in" sub="A sign-in that is not used for 30 days ends by itself" />
      <Form method="post" className="flex max-w-3xl flex-col items-start gap-5 px-4 py-4 md:px-6">
        <ul className="w-full divide-y divide-grey-200 border-grey-200 border-b">
          {sessions.map((session) => (
            <li
              key={session.idHash}
              className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1 py-2"
            >
              <div>
                <p className="font-display font-semibold text-lg leading-tight">
                  {deviceWords(session.agent)}
                  {session.isThis ? <span className="font-normal text-grey-600"> (this one)</span> : null}
                </p>
                <p className="text-grey-600">
                  Since {dayAndTime(session.startedAt)}, last used {dayAndTime(session.seenAt)}
                </p>
              </div>
              {session.isThis ? null : (
                <Button type="submit" name="session" value={session.idHash} look="quiet">
                  End this sign-in
                </Button>
              )}
            </li>
          ))}
        </ul>
        <div className="flex flex-wrap gap-2">
          {sessions.length > 1 ? (
            <Button type="submit" name="session" value="others" look="primary">
              End all others
            </Button>
          ) : null}
          <ButtonLink to="/account">Back to your account</ButtonLink>
        </div>
      </Form>
    </>
  );
}
