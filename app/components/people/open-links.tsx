import { PostButton } from "#app/components/post-button.tsx";
import { dayAndTime } from "#app/components/time-words.ts";
import { roleWords } from "#app/domain/people/role-words.ts";
import type { Role } from "#app/domain/permissions.ts";

type OpenLinksProps = {
  links: readonly { id: string; role: Role; madeBy: string | null; expiresAt: Date }[];
};

/** Join links that still let somebody in. What they say is not kept, so they are told apart by role and date. */
export function OpenLinks({ links }: OpenLinksProps) {
  return (
    <ul className="divide-y divide-grey-200 border-grey-200 border-y">
      {links.map((link) => {
        const until = dayAndTime(link.expiresAt);
        const label = roleWords[link.role].label;
        return (
          <li key={link.id} className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1 py-2">
            <p>
              <span className="font-display font-semibold text-lg">{label}</span>
              <span className="text-grey-600">
                , until {until}
                {link.madeBy ? `, made by ${link.madeBy}` : ""}
              </span>
            </p>
            <PostButton
              action={`/people/links/${link.id}/revoke`}
              look="quiet"
              aria-label={`Revoke the ${label.toLowerCase()} link that works until ${until}`}
            >
              Revoke
            </PostButton>
          </li>
        );
      })}
    </ul>
  );
}
