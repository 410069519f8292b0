import { SelectField } from "#app/components/ui/field.tsx";
import type { GigPlan } from "#app/domain/gig/plan.ts";

type SongChoiceProps = {
  id: string;
  label: string;
  plan: GigPlan;
  value: string;
  onChange: (entryId: string) => void;
};

/** The songs of a gig with their numbers, set by set: those that are planned. */
export function SongChoice({ id, label, plan, value, onChange }: SongChoiceProps) {
  return (
    <SelectField
      id={id}
      label={label}
      value={value}
      onChange={(event) => onChange(event.currentTarget.value)}
    >
      {plan.sets.map((set) => (
        <optgroup key={set.set.id} label={set.set.name}>
          {set.rows
            .filter((row) => row.left === null)
            .map((row) => (
              <option key={row.entry.id} value={row.entry.id}>
                {row.number} {row.song?.title}
              </option>
            ))}
        </optgroup>
      ))}
    </SelectField>
  );
}
