import { GigPage } from "#app/components/gig/gig-page.tsx";
import { listLastBatches } from "#app/models/gig-batches.server.ts";
import { findGig } from "#app/models/gigs.server.ts";
import { loadRepertoire } from "#app/models/repertoire.server.ts";
import { getDb } from "#app/services/db.server.ts";
import { notFound, requireMember } from "#app/services/member.server.ts";
import type { Route } from "./+types/show";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.gig.name ?? "Gig"} · Stillpeg` },
];

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const member = requireMember(context, url);
  const db = getDb();
  const gig = (await findGig(db, member, params.gigId)) ?? notFound("gig");
  const [log, repertoire] = await Promise.all([listLastBatches(db, gig.id), loadRepertoire(db, member)]);
  const { personId, role, naming, hand, paper } = member;
  const upToGig = log.filter((batch) => batch.revision <= gig.revision);
  return { gig, log: upToGig, repertoire, reader: { personId, role, naming, hand, paper } };
}

export default function ShowGig({ loaderData }: Route.ComponentProps) {
  return <GigPage {...loaderData} />;
}
