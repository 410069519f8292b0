import type { Trouble } from "#app/components/gig/edits/edit-queue.ts";
import { Button } from "#app/components/ui/button.tsx";
import { Dialog } from "#app/components/ui/dialog.tsx";

type ConflictDialogProps = {
  troubles: Trouble[];
  keepMine: (id: string) => void;
  keepTheirs: (id: string) => void;
};

/**
 * Two people changed the same thing: what each wrote, and the choice between them. One at a time. Only its buttons
 * close it, so that nothing is decided by the way.
 */
export function ConflictDialog({ troubles, keepMine, keepTheirs }: ConflictDialogProps) {
  const trouble = troubles[0];
  if (!trouble) return null;
  const [first] = trouble.conflicts;
  const theirs = first ? `Keep ${first.by}'s` : "Leave it";
  return (
    <Dialog
      open
      onOpenChange={(_, { reason }) => (reason === "close-press" ? keepTheirs(trouble.id) : null)}
      title={first ? `Two edits of the same thing: ${trouble.label}` : `Not applied: ${trouble.label}`}
      closeLabel={theirs}
      actions={
        trouble.canKeepMine ? (
          <Button look="primary" onClick={() => keepMine(trouble.id)}>
            Keep mine
          </Button>
        ) : undefined
      }
    >
      <p>{trouble.message}</p>
      {trouble.conflicts.map((conflict) => (
        <dl
          key={conflict.key}
          className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-4 gap-y-1 border-grey-200 border-t pt-3"
        >
          <dt className="text-grey-600">Yours</dt>
          <dd className="font-semibold">{conflict.mine}</dd>
          <dt className="text-grey-600">{conflict.by}</dt>
          <dd className="font-semibold">{conflict.theirs}</dd>
        </dl>
      ))}
      {troubles.length > 1 ? (
        <p className="text-grey-600">
          {troubles.length - 1} more to decide after this one. Edits made since are kept.
        </p>
      ) : null}
    </Dialog>
  );
}
