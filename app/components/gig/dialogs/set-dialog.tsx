import { useState } from "react";
import { usePageTools } from "#app/components/gig/desk/page-context.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Dialog } from "#app/components/ui/dialog.tsx";
import { TextField } from "#app/components/ui/field.tsx";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { GigSet } from "#app/domain/gig/gig.ts";

/** As long as an interval may be, in minutes, and a set's name in characters. */
const longestInterval = 240;
const longestName = 60;

type SetDialogProps = { set: GigSet; first: boolean; onClose: () => void };

/** Name of a set and the interval before it. */
export function SetDialog({ set, first, onClose }: SetDialogProps) {
  const { edit } = usePageTools();
  const [name, setName] = useState(set.name);
  const [minutes, setMinutes] = useState(String(Math.round(set.interval / 60)));
  const [errors, setErrors] = useState<{ name?: string; minutes?: string }>({});
  const keep = () => {
    const interval = Number(minutes.trim());
    const whole = Number.isInteger(interval) && interval >= 0 && interval <= longestInterval;
    const found = {
      ...(name.trim() === "" ? { name: "Give the set a name, such as Set 1." } : {}),
      ...(first || whole ? {} : { minutes: `Write whole minutes from 0 to ${longestInterval}.` }),
    };
    setErrors(found);
    if (Object.keys(found).length > 0) return;
    const edits: Edit[] = [];
    if (name.trim() !== set.name)
      edits.push({ kind: "set.set", setId: set.id, field: "name", value: name.trim() });
    if (!first && interval * 60 !== set.interval) {
      edits.push({ kind: "set.set", setId: set.id, field: "interval", value: interval * 60 });
    }
    if (edits.length > 0) edit(edits, `Change ${set.name}`);
    onClose();
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => (open ? null : onClose())}
      title={set.name}
      closeLabel="Cancel"
      actions={
        <Button type="submit" form="set-form" look="primary">
          Keep it
        </Button>
      }
    >
      <form
        id="set-form"
        className="flex flex-col gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          keep();
        }}
      >
        <TextField
          id="set-name"
          label="Name"
          maxLength={longestName}
          value={name}
          onChange={(event) => setName(event.currentTarget.value)}
          errors={errors.name ? [errors.name] : undefined}
        />
        {first ? null : (
          <TextField
            id="set-interval"
            label="Interval before it, in minutes"
            inputMode="numeric"
            value={minutes}
            onChange={(event) => setMinutes(event.currentTarget.value)}
            hint="Every guitar is prepared freely in the interval."
            errors={errors.minutes ? [errors.minutes] : undefined}
          />
        )}
      </form>
    </Dialog>
  );
}
