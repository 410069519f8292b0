import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { useState } from "react";
import { GigFields } from "#app/components/gig/details/gig-fields.tsx";
import { zonesHere } from "#app/components/gig/details/zones.ts";
import { Button } from "#app/components/ui/button.tsx";
import { Dialog } from "#app/components/ui/dialog.tsx";
import type { Edit } from "#app/domain/gig/edit.ts";
import { gigWords } from "#app/domain/gig/edit-words.ts";
import type { Gig } from "#app/domain/gig/gig.ts";
import {
  type GigFields as GigFieldValues,
  type GigFormInput,
  gigFieldEdits,
  gigFormSchema,
  gigFormValues,
} from "#app/domain/gig/gig-form.ts";

const formId = "gig-details";

type GigDetailsFormProps = {
  gig: Gig;
  /** As `edit` of useGigEdits: `on` is the revision that the form was opened on. */
  edit: (edits: Edit[], label: string, on?: number) => void;
  /** Called when the edits are made, or there was nothing to change. */
  onDone: () => void;
};

/**
 * A gig's details as a form that makes edits: one for each field that differs from the gig as it was when the form was
 * opened. What others change meanwhile in other fields stays; in the same fields it is asked about.
 */
export function GigDetailsForm({ gig, edit, onDone }: GigDetailsFormProps) {
  const [opened] = useState(gig);
  const [form, fields] = useForm<GigFormInput, GigFieldValues>({
    id: formId,
    defaultValue: gigFormValues(opened),
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: gigFormSchema }),
    onSubmit: (event, { submission }) => {
      event.preventDefault();
      if (submission?.status !== "success") return;
      const edits = gigFieldEdits(opened, submission.value);
      if (edits.length > 0) edit(edits, labelOf(edits), opened.revision);
      onDone();
    },
  });
  return (
    <form {...getFormProps(form)} className="flex flex-col gap-4">
      <GigFields fields={fields} zones={zonesHere()} />
    </form>
  );
}

function labelOf([first, ...more]: readonly Edit[]): string {
  return first?.kind === "gig.set" && more.length === 0
    ? `Change ${gigWords[first.field]}`
    : "Change gig details";
}

type GigDetailsDialogProps = Omit<GigDetailsFormProps, "onDone"> & { onClose: () => void };

/** The form of a gig's details in a dialog. Shown while it is mounted. */
export function GigDetailsDialog({ gig, edit, onClose }: GigDetailsDialogProps) {
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title="Gig details"
      closeLabel="Cancel"
      actions={
        <Button type="submit" form={formId} look="primary">
          Save details
        </Button>
      }
    >
      <GigDetailsForm gig={gig} edit={edit} onDone={onClose} />
    </Dialog>
  );
}
