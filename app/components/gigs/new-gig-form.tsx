import { getFormProps, type SubmissionResult, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { useEffect } from "react";
import { Form, useNavigation } from "react-router";
import { GigFields, Line } from "#app/components/gig/details/gig-fields.tsx";
import { zoneHere } from "#app/components/gig/details/zones.ts";
import { SaveBar } from "#app/components/save-bar.tsx";
import { UnsavedGuard } from "#app/components/unsaved-guard.tsx";
import { useUnsaved } from "#app/components/use-unsaved.ts";
import {
  type NewGigFields,
  type NewGigFormInput,
  newGigFormSchema,
  newGigValues,
} from "#app/domain/gig/gig-form.ts";

type NewGigFormProps = {
  /** The zone of the act's last gig; null where it has none: then the browser's own is taken. */
  zone: string | null;
  zones: readonly string[];
  lastResult: SubmissionResult<string[]> | undefined;
};

/** The form of a new gig: its details, how many sets it has, and the interval between them. */
export function NewGigForm({ zone, zones, lastResult }: NewGigFormProps) {
  const navigation = useNavigation();
  const [form, fields] = useForm<NewGigFormInput, NewGigFields>({
    id: "new-gig",
    lastResult,
    defaultValue: newGigValues(zone ?? "UTC"),
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: newGigFormSchema }),
  });
  const { unsaved, watch } = useUnsaved("new-gig");
  const saving = navigation.state !== "idle" && navigation.formMethod === "POST";
  const zoneId = fields.zone.id;
  useEffect(() => {
    const select = document.getElementById(zoneId);
    // Set past the form, which would take it for something typed.
    if (zone === null && select instanceof HTMLSelectElement) select.value = zoneHere();
  }, [zone, zoneId]);
  return (
    <Form method="post" {...getFormProps(form)} {...watch} className="pb-20 md:pb-0">
      <UnsavedGuard unsaved={unsaved && !saving} />
      <div className="flex max-w-2xl flex-col gap-4 px-4 py-5 md:px-6">
        <GigFields fields={fields} zones={zones}>
          <div className="grid grid-cols-2 gap-4">
            <Line field={fields.sets} label="Sets" inputMode="numeric" />
            <Line field={fields.interval} label="Interval, minutes" inputMode="numeric" />
          </div>
        </GigFields>
      </div>
      <SaveBar form={form} saving={saving} unsaved={unsaved} label="Add gig" />
    </Form>
  );
}
