import { Link } from "react-router";
import { OpenLinks } from "#app/components/people/open-links.tsx";
import { RoleForm } from "#app/components/people/role-form.tsx";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { PageHead } from "#app/components/ui/page.tsx";
import { roleWords } from "#app/domain/people/role-words.ts";
import { can, roles } from "#app/domain/permissions.ts";
import { listOpenJoinLinks } from "#app/models/join-links.server.ts";
import { listPeople } from "#app/models/memberships.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireCan, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "People · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  requireCan(member, "view");
  const manages = can(member.role, "manage");
  const [people, links] = await Promise.all([
    listPeople(getDb(), member),
    manages ? listOpenJoinLinks(getDb(), member, new Date()) : [],
  ]);
  return { people, links, manages, self: member.personId, actName: member.actName };
}

export default function PeoplePage({ loaderData }: Route.ComponentProps) {
  const { people, links, manages, self, actName } = loaderData;
  const owners = people.filter((person) => person.role === "owner").length;
  return (
    <>
      <PageHead title="People" sub={`Who is in ${actName}, and what they may do`}>
        {manages ? (
          <ButtonLink to="/people/links" look="primary">
            Make a join link
          </ButtonLink>
        ) : null}
      </PageHead>
      <div className="flex max-w-4xl flex-col gap-10 px-4 py-4 md:px-6">
        <ul className="divide-y divide-grey-200 border-grey-200 border-b">
          {people.map((person) => {
            const isSelf = person.personId === self;
            const staysOwner = person.role === "owner" && owners === 1;
            return (
              <li
                key={person.personId}
                className="flex flex-col gap-2 py-3 sm:flex-row sm:items-center sm:justify-between sm:gap-6"
              >
                <div className="min-w-0">
                  <p className="font-display font-semibold text-lg leading-tight">
                    {person.displayName}
                    {isSelf ? <span className="font-normal text-grey-600"> (you)</span> : null}
                  </p>
                  <p className="break-words text-grey-600">{person.email}</p>
                </div>
                <div className="flex flex-wrap items-center gap-2">
                  {manages && !staysOwner ? (
                    <RoleForm person={person} />
                  ) : (
                    <p>{roleWords[person.role].label}</p>
                  )}
                  {staysOwner && manages ? (
                    <p className="text-grey-600 text-sm">The only owner, so this stays</p>
                  ) : null}
                  {!staysOwner && (manages || isSelf) ? (
                    <ButtonLink
                      to={`/people/${person.personId}/remove`}
                      look="quiet"
                      aria-label={isSelf ? `Leave ${actName}` : `Remove ${person.displayName}`}
                    >
                      {isSelf ? "Leave" : "Remove"}
                    </ButtonLink>
                  ) : null}
                </div>
              </li>
            );
          })}
        </ul>
        {manages ? (
          <section className="flex flex-col gap-2">
            <h2 className="font-semibold text-xl">Open join links</h2>
            {links.length === 0 ? (
              <p className="text-grey-600">
                None.{" "}
                <Link to="/people/links" className="font-semibold text-ink underline">
                  Make a join link
                </Link>{" "}
                to let somebody into the act.
              </p>
            ) : (
              <OpenLinks links={links} />
            )}
          </section>
        ) : null}
        <section className="flex flex-col gap-2">
          <h2 className="font-semibold text-xl">Roles</h2>
          <ul className="text-grey-600">
            {roles.map((role) => (
              <li key={role}>{roleWords[role].may}</li>
            ))}
          </ul>
        </section>
      </div>
    </>
  );
}
