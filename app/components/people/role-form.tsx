import { useEffect, useRef, useState } from "react";
import { useFetcher } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { FormErrors } from "#app/components/ui/form-errors.tsx";
import { roleWords } from "#app/domain/people/role-words.ts";
import { type Role, roles } from "#app/domain/permissions.ts";

type RoleFormProps = {
  person: { personId: string; displayName: string; role: Role };
  /** What was wrong with the last try, where the page itself was the answer. */
  refused?: string;
};

/** Gives a person another role. The button shows once another role is chosen; without scripts it always does. */
export function RoleForm({ person, refused }: RoleFormProps) {
  const fetcher = useFetcher<{ refused: string } | null>();
  const [chosen, setChosen] = useState(person.role);
  const [before] = useState(person.role);
  const select = useRef<HTMLSelectElement>(null);
  const [scripted, setScripted] = useState(false);
  useEffect(() => setScripted(true), []);
  useEffect(() => setChosen(person.role), [person.role]);
  const wrong = fetcher.data?.refused ?? refused;
  const id = `role-${person.personId}`;
  return (
    <fetcher.Form
      method="post"
      action={`/people/${person.personId}/role`}
      onSubmit={() => select.current?.focus()}
      className="flex flex-col gap-1"
    >
      <div className="flex items-center gap-2">
        <label htmlFor={id} className="sr-only">
          Role of {person.displayName}
        </label>
        <select
          ref={select}
          id={id}
          name="role"
          value={chosen}
          onChange={(event) => setChosen(event.target.value as Role)}
          aria-describedby={wrong ? `${id}-error` : undefined}
          className="min-h-11 rounded-sm border border-grey-400 bg-white px-3"
        >
          {roles.map((role) => (
            <option key={role} value={role}>
              {roleWords[role].label}
            </option>
          ))}
        </select>
        {!scripted || chosen !== person.role ? (
          <Button type="submit" look="primary" disabled={fetcher.state !== "idle"}>
            Change role
          </Button>
        ) : null}
      </div>
      <p role="status" className="sr-only">
        {person.role === before
          ? ""
          : `${person.displayName} is now ${roleWords[person.role].label.toLowerCase()}`}
      </p>
      <FormErrors id={`${id}-error`} errors={wrong ? [wrong] : undefined} />
    </fetcher.Form>
  );
}
