import { parseWithZod } from "@conform-to/zod/v4";
import { data } from "react-router";
import { ActList } from "#app/components/account/act-list.tsx";
import { PreferencesForm } from "#app/components/account/preferences-form.tsx";
import { PostButton } from "#app/components/post-button.tsx";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { preferencesSchema } from "#app/domain/people/account-forms.ts";
import { updatePreferences } from "#app/models/people.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { refuseForm } from "#app/services/form-reply.server.ts";
import { requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/show";

export { clientAction, shouldRevalidate } from "#app/components/keep-typed.ts";

export const meta: Route.MetaFunction = () => [{ title: "Account · Stillpeg" }];

export function loader({ context, url }: Route.LoaderArgs) {
  const { displayName, email, naming, paper, hand, acts, actId, personId } = requireMember(context, url);
  return { email, acts, actId, personId, preferences: { displayName, naming, paper, hand } };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  const submission = parseWithZod(await request.formData(), { schema: preferencesSchema });
  if (submission.status !== "success") return refuseForm(submission);
  await updatePreferences(getDb(), member.personId, submission.value);
  return data(submission.reply());
}

export default function AccountPage({ loaderData, actionData }: Route.ComponentProps) {
  const { email, acts, actId, personId, preferences } = loaderData;
  return (
    <>
      <PageHead title="Account" sub={email}>
        <PostButton action="/sign-out">Sign out</PostButton>
      </PageHead>
      <div className="grid max-w-5xl gap-x-16 gap-y-10 px-4 py-5 md:px-6 lg:grid-cols-2">
        <div className="flex flex-col gap-10">
          <section className="flex flex-col gap-3">
            <h2 className="font-semibold text-xl">Your acts</h2>
            <ActList acts={acts} actId={actId} personId={personId} />
            <ButtonLink to="/act/new" className="self-start">
              Start another act
            </ButtonLink>
          </section>
          <section className="flex flex-col items-start gap-3">
            <h2 className="font-semibold text-xl">Signing in</h2>
            <div className="flex flex-wrap gap-2">
              <ButtonLink to="/account/password">Change the password</ButtonLink>
              <ButtonLink to="/account/sessions">See where you are signed in</ButtonLink>
            </div>
          </section>
        </div>
        <section className="flex flex-col gap-3">
          <h2 className="font-semibold text-xl">You and how you read</h2>
          <PreferencesForm preferences={preferences} lastResult={actionData} />
        </section>
      </div>
    </>
  );
}
