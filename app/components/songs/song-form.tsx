import { FormProvider, getFormProps, type SubmissionResult, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Plus } from "lucide-react";
import type { ReactNode } from "react";
import { Form, useNavigation } from "react-router";
import { SaveBar } from "#app/components/save-bar.tsx";
import { SongFacts } from "#app/components/songs/song-facts.tsx";
import { WayFields } from "#app/components/songs/way-fields.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Warning } from "#app/components/ui/warning.tsx";
import { UnsavedGuard } from "#app/components/unsaved-guard.tsx";
import { useUnsaved } from "#app/components/use-unsaved.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import type { FormGuitar } from "#app/domain/repertoire/form-guitar.ts";
import {
  type SongFields,
  type SongFormInput,
  songFormSchema,
  songLimits,
} from "#app/domain/repertoire/song-form.ts";
import { emptyWay } from "#app/domain/repertoire/song-form-values.ts";
import { usualChoices } from "#app/domain/repertoire/usual-choices.ts";

type SongFormProps = {
  /** Tells one form from the next: a new one begins where this changes. */
  id: string;
  defaultValue: SongFormInput;
  lastResult: SubmissionResult<string[]> | undefined;
  guitars: readonly FormGuitar[];
  naming: Naming;
  /** The version that was read, to be sent along; null for a new song. */
  version: number | null;
  /** True where the song was deleted meanwhile: saving puts it back. */
  restore?: boolean;
  saveLabel: string;
  /** Stands beside the save button: what became of the last save. */
  status?: ReactNode;
};

/** The form of a song, new or kept: facts on the left, ways to play it on the right. */
export function SongForm({
  id,
  defaultValue,
  lastResult,
  guitars,
  naming,
  version,
  restore,
  saveLabel,
  status,
}: SongFormProps) {
  const navigation = useNavigation();
  const { unsaved, watch } = useUnsaved(id);
  const [form, fields] = useForm<SongFormInput, SongFields>({
    id,
    lastResult,
    defaultValue,
    shouldValidate: "onBlur",
    shouldRevalidate: "onInput",
    onValidate: ({ formData }) => parseWithZod(formData, { schema: songFormSchema({ naming, guitars }) }),
  });
  const choices = usualChoices(guitars.filter((guitar) => !guitar.deleted));
  const ways = fields.ways.getFieldList();
  const saving = navigation.state !== "idle" && navigation.formMethod === "POST";
  return (
    <FormProvider context={form.context}>
      <UnsavedGuard unsaved={unsaved && !saving} />
      <Form method="post" {...getFormProps(form)} {...watch} className="pb-20 md:pb-0">
        {/* The first button of a form is the one that Enter in a field presses: it must save, not move or remove. */}
        <button type="submit" className="hidden" tabIndex={-1} aria-hidden="true" />
        {version === null ? null : <input type="hidden" name="version" value={version} />}
        {restore ? <input type="hidden" name="restore" value="yes" /> : null}
        <div className="grid gap-x-10 gap-y-8 px-4 py-5 md:px-6 lg:grid-cols-[20rem_minmax(0,1fr)]">
          <SongFacts fields={fields} />
          <div className="flex flex-col gap-5 lg:border-grey-200 lg:border-l lg:pl-10">
            <h2 className="sr-only">Ways to play it, in order of preference</h2>
            {ways.map((way, index) => (
              <WayFields
                key={way.key}
                form={form}
                list={fields.ways}
                way={way}
                index={index}
                count={ways.length}
                choices={choices}
                guitars={guitars}
                naming={naming}
                typedKey={fields.key.value ?? ""}
              />
            ))}
            {fields.ways.errors?.map((error) => (
              <Warning key={error}>{error}</Warning>
            ))}
            {ways.length < songLimits.ways ? (
              <Button
                small
                className="self-start"
                type="submit"
                {...form.insert.getButtonProps({
                  name: fields.ways.name,
                  defaultValue: emptyWay(choices),
                })}
              >
                <Plus size={16} aria-hidden="true" />
                {ways.length === 0 ? "Add a way to play it" : "Add another way to play it"}
              </Button>
            ) : null}
          </div>
        </div>
        <SaveBar form={form} saving={saving} unsaved={unsaved} label={saveLabel} status={status} />
      </Form>
    </FormProvider>
  );
}
