import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { useState } from "react";
import { CurveField } from "#app/components/gig/wishes/curve-field.tsx";
import { WishBlock, WishNumber } from "#app/components/gig/wishes/wish-block.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Dialog } from "#app/components/ui/dialog.tsx";
import type { Edit } from "#app/domain/gig/edit.ts";
import type { Gig, GigWish } from "#app/domain/gig/gig.ts";
import {
  unknownTo,
  type WishFormInput,
  wishEdits,
  wishFormSchema,
  wishFormValues,
} from "#app/domain/gig/wish-form.ts";
import type { Song } from "#app/domain/repertoire/song.ts";

const formId = "wishes-form";

type WishesDialogProps = {
  gig: Gig;
  /** The songs that stand in the gig. */
  songs: readonly Song[];
  /** As `edit` of useGigEdits: `on` is the revision that the form was opened on. */
  edit: (edits: Edit[], label: string, on?: number) => void;
  onClose: () => void;
};

/** What every set of the gig should rather be like, and what each break counts as. Shown while it is mounted. */
export function WishesDialog({ gig, songs, edit, onClose }: WishesDialogProps) {
  const [opened] = useState(gig);
  const [values] = useState(() => wishFormValues(gig.wishes));
  const [form, fields] = useForm<WishFormInput, GigWish[]>({
    id: formId,
    defaultValue: values,
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: wishFormSchema }),
    onSubmit: (event, { submission }) => {
      event.preventDefault();
      if (submission?.status !== "success") return;
      const edits = wishEdits(opened, submission.value);
      if (edits.length > 0) edit(edits, "Change the wishes", opened.revision);
      onClose();
    },
  });
  const run = fields.run.getFieldset();
  const slow = fields.slow.getFieldset();
  const key = fields.key.getFieldset();
  const energy = fields.energy.getFieldset();
  const unknown = unknownTo(songs);
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title="Wishes"
      closeLabel="Cancel"
      actions={
        <Button type="submit" form={formId} look="primary">
          Keep wishes
        </Button>
      }
    >
      <p className="text-grey-600">
        What every set of this gig should rather be like. A wish may be broken: each break then counts as so
        many seconds when orders are weighed against each other. It is no dead air.
      </p>
      <form {...getFormProps(form)} className="flex flex-col">
        <WishBlock on={run.on} title="Not too many songs in a row in one tuning">
          <div className="flex flex-wrap gap-4">
            <WishNumber field={run.most} label="At most" unit="songs" />
            <WishNumber field={run.seconds} label="Each further counts as" unit="s" />
          </div>
        </WishBlock>
        <WishBlock on={slow.on} title="No two slow songs together">
          <div className="flex flex-wrap gap-4">
            <WishNumber field={slow.below} label="Slow is below" unit="bpm" />
            <WishNumber field={slow.seconds} label="Each time counts as" unit="s" />
          </div>
          <Unknown count={unknown.tempo} of={unknown.of} what="a tempo" so="are never slow" />
        </WishBlock>
        <WishBlock on={key.on} title="The same key not twice in a row">
          <WishNumber field={key.seconds} label="Each time counts as" unit="s" />
          <Unknown count={unknown.key} of={unknown.of} what="a key" so="go with any" />
        </WishBlock>
        <WishBlock on={energy.on} title="Energy follows a curve">
          <CurveField name={energy.curve.name} start={values.energy.curve.map(Number)} />
          <WishNumber field={energy.seconds} label="Each step off counts as" unit="s" />
          <Unknown count={unknown.energy} of={unknown.of} what="an energy" so="may stand anywhere" />
        </WishBlock>
      </form>
    </Dialog>
  );
}

type UnknownProps = { count: number; of: number; what: string; so: string };

/** That a wish says nothing about some of the songs, since something of them is not known. */
function Unknown({ count, of, what, so }: UnknownProps) {
  if (count === 0) return null;
  const songs = of === 1 ? "song" : "songs";
  return (
    <p className="text-grey-600 text-sm">
      {`${count} of ${of} ${songs} without ${what} in the library: they ${so}.`}
    </p>
  );
}
