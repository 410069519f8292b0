import { GigList } from "#app/components/gigs/gig-list.tsx";
import { ButtonLink } from "#app/components/ui/button.tsx";
import { EmptyState, PageHead } from "#app/components/ui/page.tsx";
import { UndoBar } from "#app/components/undo-bar.tsx";
import { gigLines } from "#app/domain/gig/gig-lines.ts";
import { can } from "#app/domain/permissions.ts";
import { findGigName, listGigs } from "#app/models/gigs.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Gigs · Stillpeg" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  const gigs = await listGigs(getDb(), member);
  return {
    ...gigLines(gigs, Date.now()),
    note: await noteOf(url, member),
    mayPlan: can(member.role, "plan"),
  };
}

/** What the address says was just done, in words; null where nothing was or the act has no such gig. */
async function noteOf(url: URL, member: { actId: string }): Promise<{ text: string; undo?: string } | null> {
  const id = url.searchParams.get("deleted") ?? url.searchParams.get("restored");
  const gig = id ? await findGigName(getDb(), member, id) : null;
  if (!gig) return null;
  return gig.deleted
    ? { text: `${gig.name} deleted.`, undo: `/gigs/${id}/restore` }
    : { text: `${gig.name} is back.` };
}

export default function Gigs({ loaderData }: Route.ComponentProps) {
  const { coming, past, note, mayPlan } = loaderData;
  const none = coming.length + past.length === 0;
  return (
    <>
      {note ? <UndoBar undo={mayPlan ? note.undo : undefined}>{note.text}</UndoBar> : null}
      <PageHead title="Gigs">
        {mayPlan && !none ? (
          <ButtonLink to="/gigs/new" look="primary">
            New gig
          </ButtonLink>
        ) : null}
      </PageHead>
      {none ? <NoGigs mayPlan={mayPlan} /> : null}
      {coming.length > 0 ? <GigList id="coming" title="Coming" gigs={coming} mayPlan={mayPlan} /> : null}
      {past.length > 0 ? <GigList id="past" title="Past" gigs={past} mayPlan={mayPlan} /> : null}
    </>
  );
}

function NoGigs({ mayPlan }: { mayPlan: boolean }) {
  return (
    <EmptyState title="No gigs yet">
      {mayPlan ? (
        <>
          <p>Add a gig, put songs into its sets, and see what every gap between two songs costs.</p>
          <div className="flex flex-wrap gap-2">
            <ButtonLink to="/gigs/new" look="primary">
              New gig
            </ButtonLink>
            <ButtonLink to="/songs">Songs first</ButtonLink>
          </div>
        </>
      ) : (
        <p>When a performer adds gigs, they stand here with their sets.</p>
      )}
    </EmptyState>
  );
}
