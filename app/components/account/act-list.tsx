import { Form } from "react-router";
import { Button, ButtonLink } from "#app/components/ui/button.tsx";
import { roleWords } from "#app/domain/people/role-words.ts";
import { can, type Role } from "#app/domain/permissions.ts";

type ActListProps = {
  acts: readonly { id: string; name: string; role: Role }[];
  /** The act that is looked at now. */
  actId: string;
  personId: string;
};

/** The acts of a person: which one is open, a way to the others, settings and leaving for the open one. */
export function ActList({ acts, actId, personId }: ActListProps) {
  return (
    <ul className="divide-y divide-grey-200 border-grey-200 border-y">
      {acts.map((act) => (
        <li key={act.id} className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 py-2">
          <div className="min-w-0">
            <p className="break-words font-display font-semibold text-lg leading-tight">{act.name}</p>
            <p className="text-grey-600">
              {roleWords[act.role].label}
              {act.id === actId ? ", open now" : ""}
            </p>
          </div>
          {act.id === actId ? (
            <div className="flex gap-1">
              {can(act.role, "manage") ? (
                <ButtonLink to="/act" look="quiet" aria-label={`Settings of ${act.name}`}>
                  Settings
                </ButtonLink>
              ) : null}
              <ButtonLink to={`/people/${personId}/remove`} look="quiet" aria-label={`Leave ${act.name}`}>
                Leave
              </ButtonLink>
            </div>
          ) : (
            <Form method="post" action="/act/switch">
              <Button type="submit" name="actId" value={act.id} aria-label={`Switch to ${act.name}`}>
                Switch
              </Button>
            </Form>
          )}
        </li>
      ))}
    </ul>
  );
}
