import { Form, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/ui/button.tsx";
import { FormErrors } from "#app/components/ui/form-errors.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { isLastOwner, removeMembership } from "#app/models/memberships.server.ts";
import { getDb, transact } from "#app/services/db.server.ts";
import { type Member, requireCan, requireMember } from "#app/services/member.server.ts";
import { membershipRefusal, noOwnerLeft, requireActPerson } from "#app/services/people.server.ts";
import type { Route } from "./+types/remove";

export const meta: Route.MetaFunction = () => [{ title: "Remove from the act · Stillpeg" }];

/** Anybody may leave; owners may remove others. */
function requireMayRemove(member: Member, personId: string): void {
  if (personId !== member.personId) requireCan(member, "manage");
}

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireMayRemove(member, params.personId);
  const person = await requireActPerson(member, params.personId);
  const stays = await isLastOwner(getDb(), member, params.personId);
  return {
    name: person.displayName,
    actName: member.actName,
    leaving: person.personId === member.personId,
    refused: stays ? noOwnerLeft(member.actName) : null,
  };
}

export async function action({ params, context, url }: Route.ActionArgs) {
  const member = requireMember(context, url);
  requireMayRemove(member, params.personId);
  const change = await transact(getDb(), (trx) => removeMembership(trx, member, params.personId));
  const refusal = membershipRefusal(change, member.actName);
  if (refusal) return refusal;
  throw redirect(params.personId === member.personId ? "/account" : "/people");
}

export default function RemovePage({ loaderData, actionData }: Route.ComponentProps) {
  const { name, actName, leaving } = loaderData;
  const refused = actionData?.refused ?? loaderData.refused;
  const title = leaving ? `Leave ${actName}` : `Remove ${name}`;
  return (
    <>
      <PageHead title={title} />
      <div className="flex max-w-xl flex-col items-start gap-4 px-4 py-5 md:px-6">
        {refused ? (
          <>
            <FormErrors errors={[refused]} />
            <ButtonLink to="/people">Go to people</ButtonLink>
          </>
        ) : (
          <>
            <p>
              {leaving
                ? "You will no longer see its gigs, songs and guitars. To come back you need a join link from an owner."
                : `${name} will no longer see the gigs, songs and guitars of ${actName}. What they wrote stays. To come back they need a join link.`}
            </p>
            <Form method="post" className="flex flex-wrap gap-2">
              <Button type="submit" look="danger">
                {title}
              </Button>
              <ButtonLink to="/people">{leaving ? "Stay" : "Keep"}</ButtonLink>
            </Form>
          </>
        )}
      </div>
    </>
  );
}
