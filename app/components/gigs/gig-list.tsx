import { Copy, Trash2 } from "lucide-react";
import { Link } from "react-router";
import { PostButton } from "#app/components/post-button.tsx";
import { buttonClass } from "#app/components/ui/button.tsx";
import type { GigLine } from "#app/domain/gig/gig-lines.ts";

type GigListProps = { title: string; id: string; gigs: readonly GigLine[]; mayPlan: boolean };

/** Gigs, one row each: the day, what and where, how much is in it. */
export function GigList({ title, id, gigs, mayPlan }: GigListProps) {
  return (
    <section aria-labelledby={id}>
      <h2
        id={id}
        className="border-grey-200 border-b px-4 pt-6 pb-2 font-medium text-grey-600 text-sm md:px-6"
      >
        {title}
      </h2>
      <ul>
        {gigs.map((gig) => (
          <Row key={gig.id} gig={gig} mayPlan={mayPlan} />
        ))}
      </ul>
    </section>
  );
}

function Row({ gig, mayPlan }: { gig: GigLine; mayPlan: boolean }) {
  return (
    <li className="group border-grey-200 border-b bg-white hover:bg-ground">
      <div className="relative grid min-h-14 grid-cols-[minmax(0,1fr)_auto] items-center gap-x-6 px-4 py-2 md:grid-cols-[9.5rem_3.5rem_minmax(0,1fr)_minmax(0,12rem)_auto] md:px-6">
        <p className="tabular text-base max-md:col-start-1 max-md:row-start-2 max-md:text-grey-600">
          {gig.day}
          <span className="md:hidden">, {gig.time}</span>
        </p>
        <p className="tabular text-base text-grey-600 max-md:hidden">{gig.time}</p>
        <p className="min-w-0 max-md:col-start-1 max-md:row-start-1">
          <Link
            to={`/gigs/${gig.id}`}
            className="font-display font-semibold text-lg underline-offset-4 after:absolute after:inset-0 hover:underline"
          >
            {gig.name}
          </Link>
          {gig.venue ? <span className="ml-3 text-grey-600 max-md:hidden">{gig.venue}</span> : null}
        </p>
        <p className="text-grey-600 max-md:col-start-1 max-md:row-start-3 max-md:text-sm">
          {gig.venue ? <span className="md:hidden">{gig.venue}, </span> : null}
          {gig.contents}
        </p>
        {mayPlan ? (
          <div className="relative z-10 flex max-md:col-start-2 max-md:row-span-3 max-md:row-start-1">
            <Link
              to={`/gigs/${gig.id}/duplicate`}
              aria-label={`Duplicate ${gig.name}`}
              title="Duplicate"
              className={`${buttonClass("quiet")} size-11 px-0!`}
            >
              <Copy size={18} aria-hidden="true" />
            </Link>
            <PostButton
              action={`/gigs/${gig.id}/delete`}
              look="quiet"
              className="size-11 px-0!"
              aria-label={`Delete ${gig.name}`}
              title="Delete"
            >
              <Trash2 size={18} aria-hidden="true" />
            </PostButton>
          </div>
        ) : null}
      </div>
    </li>
  );
}
