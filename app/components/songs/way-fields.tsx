import { type FieldMetadata, type FormMetadata, getInputProps, getSelectProps } from "@conform-to/react";
import { CapoRows } from "#app/components/songs/capo-rows.tsx";
import { GuitarTicks } from "#app/components/songs/guitar-ticks.tsx";
import { WayHead } from "#app/components/songs/way-head.tsx";
import { WayReading } from "#app/components/songs/way-reading.tsx";
import { choiceName, instrumentLabel } from "#app/components/songs/way-words.ts";
import { TuningField } from "#app/components/tuning/tuning-field.tsx";
import { SelectField, TextField } from "#app/components/ui/field.tsx";
import { caposWords } from "#app/domain/music/capo.ts";
import { readKey } from "#app/domain/music/key.ts";
import type { Naming } from "#app/domain/music/note-names.ts";
import { readCapos } from "#app/domain/music/read-capos.ts";
import { readTuning } from "#app/domain/music/tuning.ts";
import { nameTuning } from "#app/domain/music/tuning-names.ts";
import type { FormGuitar } from "#app/domain/repertoire/form-guitar.ts";
import { type SongFormInput, songLimits } from "#app/domain/repertoire/song-form.ts";
import type { WayInput } from "#app/domain/repertoire/song-form-values.ts";
import { readUsualCode, type UsualChoice, usualCode } from "#app/domain/repertoire/usual-choices.ts";

type WayFieldsProps = {
  form: FormMetadata<SongFormInput>;
  list: FieldMetadata<SongFormInput["ways"], SongFormInput>;
  way: FieldMetadata<WayInput, SongFormInput>;
  index: number;
  count: number;
  choices: readonly UsualChoice[];
  guitars: readonly FormGuitar[];
  naming: Naming;
  /** The key as typed: what sounds is spelled in it. */
  typedKey: string;
};

/** One way to play a song: tuning and capos as typed, what was understood of them, and the guitars it is kept to. */
export function WayFields({
  form,
  list,
  way,
  index,
  count,
  choices,
  guitars,
  naming,
  typedKey,
}: WayFieldsProps) {
  const fields = way.getFieldset();
  const usual = readUsualCode(fields.usual.value ?? "") ?? choices[0]!.usual;
  const typed = fields.tuning.value ?? "";
  const bareB = fields.bareB.value as "natural" | "flat" | undefined;
  const reading = typed.trim() === "" ? null : readTuning(typed, { usual, naming, bareB });
  const capos = readCapos(fields.capos.value ?? "", usual.length);
  const only = [fields.guitars.value ?? []].flat().filter((id) => id !== undefined);
  const name = choiceName(index);
  const { key: idKey, ...id } = getInputProps(fields.id, { type: "hidden" });
  const { key: capoKey, ...capoInput } = getInputProps(fields.capos, {
    type: "text",
    ariaAttributes: false,
  });
  const write = (field: "tuning" | "capos", value: string) =>
    form.update({ name: fields[field].name, value });
  const sameStrings = guitars.filter(
    (guitar) => guitar.strings === usual.length && (!guitar.deleted || only.includes(guitar.id)),
  );
  return (
    <section
      aria-labelledby={`${way.id}-title`}
      className="flex flex-col gap-4 border-grey-200 border-b pb-6"
    >
      <input key={idKey} {...id} />
      <WayHead form={form} list={list} titleId={`${way.id}-title`} index={index} count={count}>
        {reading?.ok ? nameTuning(reading.open, usual, naming) : null}
      </WayHead>
      <div className="grid gap-x-8 gap-y-4 xl:grid-cols-[22rem_minmax(0,1fr)]">
        <div className="flex flex-col gap-4">
          <Instrument field={fields.usual} choices={choices} usual={usual} naming={naming} />
          <TuningField
            field={fields.tuning}
            bareB={fields.bareB}
            label="Tuning"
            hint={
              reading === null
                ? "From the lowest string up, such as DADGAD, or by name, such as drop D."
                : undefined
            }
            reading={reading}
            naming={naming}
            onRewrite={(text) => write("tuning", text)}
          />
          <TextField
            key={capoKey}
            {...capoInput}
            label="Capo"
            placeholder="None"
            errors={fields.capos.errors}
            hint={capos.ok ? undefined : "Such as capo 2, or capo 3, leave 6."}
            autoComplete="off"
          />
          {capos.ok ? (
            <div className="noscript:hidden -mt-2">
              <CapoRows
                capos={capos.capos}
                strings={usual.length}
                most={songLimits.caposPerWay}
                within={name}
                onChange={(changed) =>
                  write("capos", changed.length === 0 ? "" : caposWords(changed, usual.length))
                }
              />
            </div>
          ) : null}
        </div>
        <div className="xl:col-start-2 xl:row-span-2 xl:row-start-1">
          {reading?.ok ? (
            <WayReading
              strings={reading.notes}
              capos={capos.ok ? capos.capos : []}
              only={only.length > 0 ? only : null}
              guitars={guitars}
              naming={naming}
              songKey={keptKey(typedKey, naming)}
              caption={`${name}, string by string`}
            />
          ) : (
            <p className="text-grey-600" aria-live="polite">
              {reading
                ? !fields.tuning.errors && reading.message
                : "What is understood of the tuning shows here."}
            </p>
          )}
        </div>
        <div className="flex flex-col gap-4">
          {sameStrings.length > 0 ? <GuitarTicks field={fields.guitars} guitars={sameStrings} /> : null}
          <Penalty field={fields.penalty} first={index === 0} />
        </div>
      </div>
    </section>
  );
}

function keptKey(typed: string, naming: Naming): string {
  const reading = readKey(typed, naming);
  return reading.ok ? reading.key : "";
}

type InstrumentProps = {
  field: FieldMetadata<string>;
  choices: readonly UsualChoice[];
  usual: readonly number[];
  naming: Naming;
};

/** Which usual tuning the letters are read against. There is nothing to choose where the act has one kind only. */
function Instrument({ field, choices, usual, naming }: InstrumentProps) {
  const code = usualCode(usual);
  const listed = choices.some((choice) => usualCode(choice.usual) === code);
  const all = listed ? choices : [...choices, { usual, guitars: [] }];
  const { key, ...select } = getSelectProps(field, { ariaAttributes: false });
  if (all.length === 1) return <input key={key} type="hidden" name={field.name} defaultValue={code} />;
  return (
    <SelectField key={key} {...select} label="Written for" errors={field.errors}>
      {all.map((choice) => (
        <option key={usualCode(choice.usual)} value={usualCode(choice.usual)}>
          {instrumentLabel(choice, naming)}
        </option>
      ))}
    </SelectField>
  );
}

function Penalty({ field, first }: { field: FieldMetadata<string | undefined>; first: boolean }) {
  const { key, ...input } = getInputProps(field, {
    type: first ? "hidden" : "text",
    ariaAttributes: false,
  });
  if (first) return <input key={key} {...input} />;
  return (
    <TextField
      key={key}
      {...input}
      label="Counts as, in seconds"
      hint="Seconds of dead air that playing it this way counts as. Empty: none."
      errors={field.errors}
      inputMode="numeric"
      className="max-w-32 tabular"
    />
  );
}
