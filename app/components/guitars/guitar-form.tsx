import { getFormProps, type SubmissionResult, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import type { ReactNode } from "react";
import { Form, useNavigation } from "react-router";
import { GuitarIdentity } from "#app/components/guitars/guitar-identity.tsx";
import { GuitarOnStage } from "#app/components/guitars/guitar-on-stage.tsx";
import { GuitarTuning } from "#app/components/guitars/guitar-tuning.tsx";
import { SaveBar } from "#app/components/save-bar.tsx";
import { UnsavedGuard } from "#app/components/unsaved-guard.tsx";
import { useUnsaved } from "#app/components/use-unsaved.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { Guitar } from "#app/domain/repertoire/guitar.ts";
import {
  type GuitarFields,
  type GuitarFormInput,
  guitarFormSchema,
} from "#app/domain/repertoire/guitar-form.ts";

type GuitarFormProps = {
  /** Tells one form from the next: a new one begins where this changes. */
  id: string;
  defaultValue: GuitarFormInput;
  lastResult: SubmissionResult<string[]> | undefined;
  /** The act's other guitars, which this one can be a spare for. */
  others: readonly Pick<Guitar, "id" | "name">[];
  naming: Naming;
  /** The version that was read, to be sent along; null for a new guitar. */
  version: number | null;
  /** True where the guitar was deleted meanwhile: saving puts it back. */
  restore?: boolean;
  saveLabel: string;
  status?: ReactNode;
};

/** The form of a guitar or any other stringed instrument, new or kept. */
export function GuitarForm(props: GuitarFormProps) {
  const { id, defaultValue, lastResult, others, naming, version, restore, saveLabel, status } = props;
  const navigation = useNavigation();
  const { unsaved, watch } = useUnsaved(id);
  const ids = others.map((guitar) => guitar.id);
  const [form, fields] = useForm<GuitarFormInput, GuitarFields>({
    id,
    lastResult,
    defaultValue,
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) =>
      parseWithZod(formData, { schema: guitarFormSchema({ naming, others: ids }) }),
  });
  const saving = navigation.state !== "idle" && navigation.formMethod === "POST";
  return (
    <Form method="post" {...getFormProps(form)} {...watch} className="pb-20 md:pb-0">
      <UnsavedGuard unsaved={unsaved && !saving} />
      {version === null ? null : <input type="hidden" name="version" value={version} />}
      {restore ? <input type="hidden" name="restore" value="yes" /> : null}
      <div className="grid gap-x-10 gap-y-8 px-4 py-5 md:px-6 lg:grid-cols-[20rem_minmax(0,1fr)]">
        <GuitarIdentity form={form} fields={fields} />
        <div className="flex flex-col gap-8 lg:border-grey-200 lg:border-l lg:pl-10">
          <GuitarTuning form={form} fields={fields} naming={naming} />
          <GuitarOnStage fields={fields} others={others} />
        </div>
      </div>
      <SaveBar form={form} saving={saving} unsaved={unsaved} label={saveLabel} status={status} />
    </Form>
  );
}
